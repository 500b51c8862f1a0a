package engine_test

import (
	"context"
	"math"
	"testing"

	"wane/sim/engine"
	"wane/sim/engine/enginetest"
	"wane/sim/galaxy"
	"wane/sim/law"
)

// Problems with closed answers. False alarms are held to 5 sigma.

// decaying is a galaxy of objects alike, all born in the first year, that
// leave by the clocks of one law.
func decaying(t *testing.T, n int, mass float64, clocks int, rates ...enginetest.Rates) engine.Setup {
	t.Helper()
	f := enginetest.Frame{Rates: rates}
	for k := range clocks {
		f.Clocks = append(f.Clocks, law.Clock{Name: "clock" + string(rune('a'+k)), Outcome: "went" + string(rune('a'+k)), Fate: law.FateAdrift})
		f.Touches = append(f.Touches, enginetest.Touch{Scale: 1})
	}
	s := set(t, enginetest.Masses(mass, mass), enginetest.Births(0, 0), enginetest.Metals(false), enginetest.Sort(100),
		enginetest.Lifetimes(1, 0, 0), enginetest.Remnants(), f.Law())
	return engine.Setup{Set: s, Objects: n, Real: float64(n), Radius: 1, Until: math.Inf(1), Seed: 20,
		Populations: []galaxy.Population{{Name: "bound", Condition: galaxy.Condition{Places: []string{"bound"}}}}}
}

// outcomes runs realisations 0 .. n-1.
func outcomes(t *testing.T, s engine.Setup, n int) []*engine.Outcome {
	t.Helper()
	m, err := engine.Compile(s)
	if err != nil {
		t.Fatal(err)
	}
	w := m.NewWorkspace()
	var out []*engine.Outcome
	for r := range uint64(n) {
		o, err := w.Run(context.Background(), r)
		if err != nil {
			t.Fatal(err)
		}
		if c := o.Ledger.Closes(); c > 1e-12 {
			t.Errorf("realisation %d: the ledger is %v off", r, c)
		}
		out = append(out, o)
	}
	return out
}

func within(t *testing.T, what string, got, want, sigma float64) {
	t.Helper()
	if !(math.Abs(got-want) <= 5*sigma) {
		t.Errorf("%s: got %.6g, want %.6g: %.1f sigma", what, got, want, (got-want)/sigma)
	}
}

// The last of N objects of rate 1 goes after H_N on average, with a spread
// that tends to pi/sqrt(6) = 1.2825 (the sum of independent E_k/k).
func TestLastOfMany(t *testing.T) {
	const n, runs, log10Rate = 500, 400, -9
	mean, square, harmonic, variance := 0.0, 0.0, 0.0, 0.0
	for k := 1.0; k <= n; k++ {
		harmonic += 1 / k
		variance += 1 / (k * k)
	}
	for _, o := range outcomes(t, decaying(t, n, 1, 1, enginetest.Rates{Log10: log10Rate}), runs) {
		x := math.Pow(10, o.Populations[0].Last+log10Rate)
		mean += x / runs
		square += x * x / runs
	}
	sd := math.Sqrt(variance)
	within(t, "mean", mean, harmonic, sd/math.Sqrt(runs))
	// The fourth moment of a Gumbel law is 5.4 sd^4: the spread of the variance is sd^2 sqrt(4.4/n).
	within(t, "variance", square-mean*mean, variance, variance*math.Sqrt(4.4/runs))
	if math.Abs(sd-1.2825) > 1e-3 {
		t.Errorf("spread of the closed form %v", sd)
	}
}

// Of two clocks whose rates are as 1 to 3, the first takes a quarter.
func TestTwoClocks(t *testing.T) {
	const n = 40000
	o := outcomes(t, decaying(t, n, 1, 2, enginetest.Rates{Log10: -9}, enginetest.Rates{Log10: -9 + math.Log10(3)}), 1)[0]
	left := o.Populations[0].Left
	if left["ejection:wenta"]+left["ejection:wentb"] != n {
		t.Fatalf("left: %v", left)
	}
	within(t, "share", float64(left["ejection:wenta"])/n, 0.25, math.Sqrt(0.25*0.75/n))
}

// A hazard r (t/1000 yr)^p has run up to ln 2 when half are gone; the median
// of n exponentials has a spread of 1/sqrt(n).
func TestHazardThatMovesWithTime(t *testing.T) {
	const n = 40000
	for _, p := range []float64{1, 0.5, -0.5} {
		o := outcomes(t, decaying(t, n, 1, 1, enginetest.Rates{Log10: -9, Date: p}), 1)[0]
		half := math.Pow(10, o.Populations[0].Half)
		hazard := 1e-9 * 1e3 * (math.Pow(half/1e3, p+1) - math.Pow(1e-3, p+1)) / (p + 1)
		within(t, "hazard", hazard, math.Ln2, 1/math.Sqrt(n))
	}
}

// A contracting galaxy of equal masses at fixed Coulomb logarithm. With
// dN/dt = -xi N/t_rh, t_rh ~ N^(1/2) R^(3/2) and R ~ N^2, the share left is
// f = (1 - 7/2 xi t/t_rh0)^(2/7). With xi = 1/140 (Spitzer 1987: 0.0074) half
// is gone at 36.46 t_rh0 and all at 40. The spread is that of a sum of
// independent exponentials, (t_rh0/xi) sqrt((1 - f^6)/(6 N)).
func TestContractingGalaxy(t *testing.T) {
	const n, runs, relaxation = 20000, 12, 1e6
	half, last := 0.0, 0.0
	s := decaying(t, n, 1, 1, enginetest.Rates{Log10: -math.Log10(140 * relaxation), Number: -0.5, Mass: -3})
	for _, o := range outcomes(t, s, runs) {
		half += math.Pow(10, o.Populations[0].Half) / relaxation / runs
		last += math.Pow(10, o.Populations[0].Last) / relaxation / runs
	}
	within(t, "half", half, 40*(1-math.Pow(2, -3.5)), 140*math.Sqrt((1-1./64)/6/n/runs))
	within(t, "last", last, 40, 140*math.Sqrt(1./6/n/runs))
	if got := 40 * (1 - math.Pow(2, -3.5)); math.Abs(got-36.46) > 0.01 {
		t.Errorf("the closed form gives %v", got)
	}
}

// Another law of evaporation or of infall leaves every date that it does not
// decide as it was, to the bit.
func TestSwappingALawLeavesTheRest(t *testing.T) {
	histories := func(swap map[string]string) [][]engine.Change {
		m, err := engine.Compile(builtin(t, 2000, 2000, 30, 30, swap))
		if err != nil {
			t.Fatal(err)
		}
		w := m.NewWorkspace()
		o, err := w.Run(context.Background(), 1)
		if err != nil {
			t.Fatal(err)
		}
		return w.Histories(o.End)
	}
	page, black := histories(nil), histories(map[string]string{"evaporation": "black-body"})
	moved := 0
	for i := range page {
		if len(page[i]) != len(black[i]) {
			t.Fatalf("object %d: %v, then %v", i, page[i], black[i])
		}
		for j, a := range page[i] {
			switch b := black[i][j]; {
			case a == b:
			case a.Cause == "evaporation:evaporated" && b.Cause == a.Cause:
				moved++
			default:
				t.Fatalf("object %d: %v, then %v", i, a, b)
			}
		}
	}
	if moved == 0 {
		t.Error("no date moved at all")
	}
	stable := histories(map[string]string{"nucleon-decay": "stable", "ejection": "balanced"})
	for i := range page {
		for j, a := range page[i] {
			if birthOrDeath := j == 0 || j < len(stable[i]) && a.From != "" && a.From[:4] == "star" && a.To != "" && a.To[:4] != "star" &&
				stable[i][j-1].To == a.From; birthOrDeath && (stable[i][j].Date != a.Date || stable[i][j].Cause != a.Cause) {
				t.Fatalf("object %d: %v, then %v", i, a, stable[i][j])
			}
		}
	}
}
