package ejection_test

import (
	"math"
	"testing"

	"wane/plugins/ejection"
	"wane/sim/law"
	"wane/sim/physics/dynamics"
	"wane/testdata/published"
)

// history is the mean evolution of a galaxy of equal masses under a law, in
// steps of equal loss of ln N.
type history struct {
	law      law.Law
	set      map[string]float64 // parameters
	n, m, r  float64            // objects, their mass (solMass), radius (pc)
	infall   float64            // share that falls to the centre
	central  float64            // solMass
	fineness float64            // steps per e-fold
}

// until calls done after each step with the years gone by, the number left and
// the answer of the law, and ends when it says so.
func (h history) until(t *testing.T, done func(years, number float64, answer law.Batch) bool) {
	t.Helper()
	u := law.NewUse(h.law)
	for name, v := range h.set {
		if err := u.Set(name, v); err != nil {
			t.Fatal(err)
		}
	}
	if _, faults := law.NewSet(u); faults != nil {
		t.Fatal(faults)
	}
	rate := u.Card.Questions[0]
	years, lnLeft, c := 0.0, 0.0, 0.0
	ask := func(lnLeft, c float64) law.Batch {
		number := h.n * math.Exp(lnLeft)
		gone := (h.n - number) * h.m
		values := map[string]float64{
			"number": number, "mass_bound": number * h.m, "sum_ejection": number, "carried_off": gone,
			"central_mass": h.central + h.infall*gone, "founded_number": h.n, "founded_radius": h.r, "reading_relaxation": c,
		}
		in := law.Batch{Rows: 1}
		for _, name := range rate.Inputs {
			in.Columns = append(in.Columns, law.Numbers(name, []float64{values[name]}))
		}
		out, err := u.Ask("rate", in)
		if err != nil {
			t.Fatal(err)
		}
		return out
	}
	xi, _ := u.Parameter("xi")
	step := 1 / h.fineness
	for range int(400 * h.fineness) {
		middle := ask(lnLeft-step/2, c+step/2/xi)
		years += step / math.Pow(10, middle.Values("log10_rate_ejection")[0])
		lnLeft -= step
		c += step / xi
		if done(years, h.n*math.Exp(lnLeft), ask(lnLeft, c)) {
			return
		}
	}
	t.Fatal("the history does not end")
}

// TestPublishedHistories follows the default galaxy with equal masses to the
// dates of the literature's formulas.
func TestPublishedHistories(t *testing.T) {
	found := map[string]float64{}
	galaxy := history{
		law: ejection.Contracting(), set: map[string]float64{"beta": 0},
		n: 2e11, m: 0.218, r: 1e4, infall: 0.05, central: 4.3e6, fineness: 2000,
	}
	galaxy.until(t, func(years, number float64, answer law.Batch) bool {
		if _, half := found["galaxy-half-beta-0"]; !half && number <= galaxy.n/2 {
			found["galaxy-half-beta-0"] = math.Log10(years)
		}
		if answer.Values("stop")[0] == 1 {
			found["galaxy-stop-beta-0"] = math.Log10(years)
			found["galaxy-stop-share-beta-0"] = number / galaxy.n
			return true
		}
		return false
	})
	checked := 0
	for _, row := range published.Rows(t, "dynamics.csv") {
		if got, ok := found[row.Inputs["quantity"]]; ok {
			row.Check(t, got)
			checked++
		}
	}
	if checked != 3 {
		t.Errorf("%d rows checked, want 3", checked)
	}
}

// TestClosedForms follows galaxies so small that the Coulomb logarithm stands
// on its floor, so that the closed forms hold: 18 objects, treated as a
// continuous number.
func TestClosedForms(t *testing.T) {
	const n, m, r, xi = 18, 1, 1, 1. / 140
	trh := math.Pow(10, dynamics.Log10HalfMassRelaxation(n, n*m, r, 1))
	for _, c := range []struct {
		law    law.Law
		set    map[string]float64
		closed func(x float64) float64
	}{
		{ejection.Contracting(), map[string]float64{"n_stop": 1e-3}, func(x float64) float64 { return dynamics.ContractingTime(x, xi) }},
		{ejection.FixedRadius(), nil, func(x float64) float64 { return dynamics.FixedRadiusTime(x, xi) }},
		{ejection.Balanced(), nil, func(x float64) float64 { return dynamics.BalancedTime(x, xi, 0.1) }},
		{ejection.Balanced(), map[string]float64{"zeta": 0.05}, func(x float64) float64 { return dynamics.BalancedTime(x, xi, 0.05) }},
		{ejection.Balanced(), map[string]float64{"zeta": 0}, func(x float64) float64 { return dynamics.ContractingTime(x, xi) }},
	} {
		name := c.law.Describe().Name
		history{law: c.law, set: c.set, n: n, m: m, r: r, fineness: 4000}.until(t, func(years, number float64, _ law.Batch) bool {
			x := number / n
			if got, want := years/trh, c.closed(x); math.Abs(got/want-1) > 1e-4 {
				t.Errorf("%s %v: %.4f left after %.6g t_rh, closed form %.6g", name, c.set, x, got, want)
				return true
			}
			return x < 0.02
		})
	}
}

// TestFixedHalo follows the default galaxy in its halo, whose time scale is
// 3.76e16 yr, down the closed form.
func TestFixedHalo(t *testing.T) {
	const xi = 1. / 140
	var relaxation float64
	for _, row := range published.Rows(t, "dynamics.csv") {
		if row.Inputs["quantity"] == "relaxation" && row.Number(t, "number") == 2e11 {
			relaxation = row.Value
		}
	}
	history{law: ejection.FixedHalo(), n: 2e11, m: 0.218, r: 1e4, fineness: 4000}.until(t, func(years, number float64, answer law.Batch) bool {
		x := number / 2e11
		// Three digits are published.
		if got, want := years/relaxation, dynamics.FixedHaloTime(x, xi); math.Abs(got/want-1) > 2e-3 {
			t.Errorf("%.4f left after %.6g relaxation times, closed form %.6g", x, got, want)
			return true
		}
		if v := answer.Values("dispersion")[0]; v != 200 {
			t.Errorf("dispersion %v km/s, want 200", v)
		}
		return x < 0.005
	})
}

// TestNone: nothing is hit, and the galaxy is where it was.
func TestNone(t *testing.T) {
	u := law.NewUse(ejection.None())
	out, err := u.Ask("rate", law.Batch{Rows: 1, Columns: []law.Column{
		law.Numbers("mass_bound", []float64{4.36e10}), law.Numbers("founded_mass", []float64{4 * 4.36e10}),
		law.Numbers("founded_radius", []float64{1e4}), law.Numbers("founded_dispersion", []float64{2 * 86.6}),
	}})
	if err != nil {
		t.Fatal(err)
	}
	if rate := out.Values("log10_rate_ejection")[0]; !math.IsInf(rate, -1) || out.Values("radius")[0] != 1e4 {
		t.Errorf("rate 10^%v /yr, radius %v pc", rate, out.Values("radius")[0])
	}
	if got, want := out.Values("dispersion")[0], dynamics.Dispersion(4.36e10, 1e4); math.Abs(got/want-1) > 1e-3 {
		t.Errorf("dispersion %v km/s, want %v of virial balance", got, want)
	}
}

// TestHazardsAverage: whatever beta, the mean hazard of what is bound is
// xi/t_rh.
func TestHazardsAverage(t *testing.T) {
	masses := []float64{0.06, 0.2, 0.6, 1.4, 10}
	for _, beta := range []float64{0, 0.5, 1} {
		u := law.NewUse(ejection.Contracting())
		if err := u.Set("beta", beta); err != nil {
			t.Fatal(err)
		}
		exposed, err := u.Ask("expose", law.Batch{Rows: len(masses), Columns: []law.Column{law.Numbers("mass", masses)}})
		if err != nil {
			t.Fatal(err)
		}
		sum, mass := 0.0, 0.0
		for i, s := range exposed.Values("to_ejection") {
			if want := math.Pow(masses[i], -beta); math.Abs(s/want-1) > 1e-14 {
				t.Errorf("beta %v: susceptibility of %v solMass %v, want %v", beta, masses[i], s, want)
			}
			sum, mass = sum+s, mass+masses[i]
		}
		n := float64(len(masses))
		one := func(v float64) []float64 { return []float64{v} }
		out, err := u.Ask("rate", law.Batch{Rows: 1, Columns: []law.Column{
			law.Numbers("number", one(n)), law.Numbers("mass_bound", one(mass)), law.Numbers("sum_ejection", one(sum)),
			law.Numbers("carried_off", one(0)), law.Numbers("central_mass", one(0)), law.Numbers("founded_number", one(n)), law.Numbers("founded_radius", one(1)),
		}})
		if err != nil {
			t.Fatal(err)
		}
		mean := math.Pow(10, out.Values("log10_rate_ejection")[0]) * sum / n
		want := 1. / 140 / math.Pow(10, dynamics.Log10HalfMassRelaxation(n, mass, 1, 1))
		if math.Abs(mean/want-1) > 1e-12 {
			t.Errorf("beta %v: mean hazard %v /yr, want xi/t_rh = %v", beta, mean, want)
		}
	}
}
