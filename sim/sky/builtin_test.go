package sky_test

import (
	"math"
	"strconv"
	"testing"

	"wane/plugins/darkenergydecay"
	"wane/plugins/expansion"
	"wane/plugins/vacuumdecay"
	"wane/sim/draw"
	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/sky"
	"wane/testdata/published"
)

// expansions are the built-in laws of process expansion, with the name of the
// parameter of each.
func expansions() map[string]struct {
	law law.Law
	own string
} {
	return map[string]struct {
		law law.Law
		own string
	}{
		"lambda-cdm":           {expansion.LambdaCDM(), ""},
		"w-cdm":                {expansion.WCDM(), "w"},
		"phantom":              {expansion.Phantom(), "w"},
		"decaying-dark-energy": {expansion.DecayingDarkEnergy(), "half_life"},
		"matter-only":          {expansion.MatterOnly(), ""},
		"open":                 {expansion.Open(), ""},
	}
}

// in is a law in use with some parameters set.
func in(t testing.TB, l law.Law, values map[string]float64) *law.Use {
	t.Helper()
	u := law.NewUse(l)
	for name, v := range values {
		if err := u.Set(name, v); err != nil {
			t.Fatal(err)
		}
	}
	return u
}

// expanding is the built-in law of that name in use.
func expanding(t testing.TB, name string, values map[string]float64) *law.Use {
	t.Helper()
	e, ok := expansions()[name]
	if !ok {
		t.Fatalf("no law expansion/%s", name)
	}
	return in(t, e.law, values)
}

func decaysAt(t testing.TB, l float64) *law.Use {
	return in(t, darkenergydecay.Fixed(), map[string]float64{"date": l})
}

// TestAlternatives compares the other skies with Astropy and SciPy: scale
// factors, rates, horizons and four-volumes, in curved space too, up to a rip
// and across a decay of dark energy.
func TestAlternatives(t *testing.T) {
	rows := reference(t, "alternatives.py")
	if len(rows) != 414 {
		t.Fatalf("%d rows, want 414", len(rows))
	}
	skies, worst := map[string]*sky.Sky{}, map[string]float64{}
	for _, row := range rows {
		var v [3]float64
		for i, column := range []int{1, 3, 4} {
			var err error
			if v[i], err = strconv.ParseFloat(row[column], 64); err != nil {
				t.Fatal(err)
			}
		}
		parameter, date, want := v[0], v[1], v[2]
		s := skies[row[0]+row[1]]
		if s == nil {
			switch row[0] {
			case "fixed":
				s = drawn(t, lambda(t, nil), decaysAt(t, parameter))
			case "matter-only":
				s = drawn(t, expanding(t, row[0], map[string]float64{"hubble": parameter}))
			case "open":
				s = drawn(t, expanding(t, row[0], map[string]float64{"matter": parameter}))
			default:
				s = drawn(t, expanding(t, row[0], map[string]float64{expansions()[row[0]].own: parameter}))
			}
			skies[row[0]+row[1]] = s
		}
		got, allowed := 0.0, 1e-5 // log10; what the package states
		switch row[2] {
		case "ln_a":
			got, want = s.LnA(date)/num.Ln10, want/num.Ln10
		case "hubble":
			got = s.LogHubble(date)
		case "particle":
			got = s.LogParticleHorizon(date)
		case "event":
			got = s.LogEventHorizon(date)
		case "volume":
			got = s.LogFourVolume(date)
		default:
			t.Fatalf("unknown quantity %q", row[2])
		}
		worst[row[0]+" "+row[2]] = math.Max(worst[row[0]+" "+row[2]], math.Abs(got-want))
		if !(math.Abs(got-want) <= allowed) {
			t.Errorf("%s %v at 10^%v yr: %s off by %.3g dex", row[0], parameter, date, row[2], got-want)
		}
	}
	t.Logf("largest differences, dex: %v", worst)
}

// TestEndings holds the endings, and what they leave, to published and
// recomputed values.
func TestEndings(t *testing.T) {
	for _, r := range published.Rows(t, "endings.csv") {
		values := map[string]float64{}
		if own := expansions()[r.Inputs["expansion"]].own; own != "" {
			values[own] = r.Number(t, "own")
		}
		uses := []*law.Use{expanding(t, r.Inputs["expansion"], values)}
		if r.Inputs["decay"] != "none" {
			uses = append(uses, decaysAt(t, r.Number(t, "decay")))
		}
		s, at := drawn(t, uses...), r.Number(t, "at")
		if r.Inputs["quantity"] != "log10_date_of_hazard" {
			got, ok := quantity(s, r.Inputs["quantity"], at)
			if !ok {
				t.Fatalf("%s: no quantity %q", r.Where(), r.Inputs["quantity"])
			}
			r.Check(t, got)
			continue
		}
		u := map[string]*law.Use{
			"four-volume": law.NewUse(vacuumdecay.FourVolume()), "literal": law.NewUse(vacuumdecay.Literal()), "other": law.NewUse(vacuumdecay.Other()),
		}[r.Inputs["vacuum"]]
		if u == nil {
			t.Fatalf("%s: no law vacuum-decay/%s", r.Where(), r.Inputs["vacuum"])
		}
		if err := u.Set(u.Card.Parameters[0].Name, r.Number(t, "parameter")); err != nil {
			t.Fatal(err)
		}
		r.Check(t, dateOfHazard(t, s, u, at))
		// The sky draws a hazard and must find the same date for it.
		hazard := num.Log10(draw.New(1, 0, "vacuum-decay").Exp(0, 0, 0))
		if end, cause := drawn(t, append(uses, u)...).End(); cause != "vacuum-decay" || math.Abs(end-dateOfHazard(t, s, u, hazard)) > 1e-9*end {
			t.Errorf("%s: a hazard of 10^%v: ends at 10^%v yr by %q, want 10^%v", r.Where(), hazard, end, cause, dateOfHazard(t, s, u, hazard))
		}
	}
}

// dateOfHazard is the date at which a law's hazard reaches 10^at, by halving.
func dateOfHazard(t *testing.T, s *sky.Sky, u *law.Use, at float64) float64 {
	t.Helper()
	low, high := 0.0, 1e5
	for range 200 {
		l := low + (high-low)/2
		column := law.Numbers("log10_date", []float64{l})
		if u.Card.Questions[0].Inputs[0] == "log10_four_volume" {
			column = law.Numbers("log10_four_volume", []float64{s.LogFourVolume(l)})
		}
		out, err := u.Ask("end", law.Batch{Rows: 1, Columns: []law.Column{column}})
		if err != nil {
			t.Fatal(err)
		}
		if out.Columns[0].Values[0] < at {
			low = l
		} else {
			high = l
		}
	}
	return high
}
