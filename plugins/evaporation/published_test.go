package evaporation_test

import (
	"math"
	"strconv"
	"strings"
	"testing"

	"wane/plugins/evaporation"
	"wane/sim/law"
	"wane/testdata/published"
)

func lawNamed(t *testing.T, name string) law.Law {
	t.Helper()
	for _, l := range []law.Law{
		evaporation.Page(), evaporation.BlackBody(), evaporation.ThreeNeutrinos(), evaporation.LightestNeutrinoMassless(),
		evaporation.PageKerr(), evaporation.Remnant(), evaporation.MemoryBurden(), evaporation.ExtraLightSpecies(), evaporation.None(),
	} {
		if l.Describe().Name == name {
			return l
		}
	}
	t.Fatalf("unknown law %q", name)
	return nil
}

// inUse is a law with settings like "spin=half;mass=1e-3 eV".
func inUse(t *testing.T, l law.Law, settings string) *law.Use {
	t.Helper()
	u := law.NewUse(l)
	for _, s := range strings.Split(settings, ";") {
		if s == "" {
			continue
		}
		name, text, _ := strings.Cut(s, "=")
		if err := u.Set(name, value(t, u.Card, name, text)); err != nil {
			t.Fatal(err)
		}
	}
	return u
}

// value is a parameter's value as the law takes it.
func value(t *testing.T, c law.Card, name, text string) float64 {
	for _, p := range c.Parameters {
		if p.Name != name {
			continue
		}
		for i, w := range p.Words {
			if w == text {
				return float64(i)
			}
		}
		v, err := strconv.ParseFloat(strings.TrimSpace(strings.TrimSuffix(text, p.Unit)), 64)
		if err != nil {
			t.Fatalf("%s=%s: %v", name, text, err)
		}
		if p.Log10 {
			v = math.Log10(v)
		}
		return v
	}
	t.Fatalf("%s has no parameter %s", c.Name, name)
	return 0
}

// askOne asks about one hole and returns the first number of the answer.
func askOne(t *testing.T, u *law.Use, question string, mass, birth float64) float64 {
	t.Helper()
	in := law.Batch{Rows: 1}
	for _, q := range u.Card.Questions {
		if q.Name != question {
			continue
		}
		for _, column := range q.Inputs {
			in.Columns = append(in.Columns, law.Numbers(column, []float64{map[string]float64{"mass": mass, "birth_mass": birth}[column]}))
		}
	}
	out, err := u.Ask(question, in)
	if err != nil {
		t.Fatal(err)
	}
	return out.Columns[0].Values[0]
}

func TestPublished(t *testing.T) {
	page := law.NewUse(evaporation.Page())
	for _, row := range published.Rows(t, "evaporation.csv") {
		u := inUse(t, lawNamed(t, row.Inputs["law"]), row.Inputs["settings"])
		mass := row.Number(t, "mass_Msun")
		birth := mass
		if row.Inputs["birth_Msun"] != "" {
			birth = row.Number(t, "birth_Msun")
		}
		switch q := row.Inputs["question"]; q {
		case "foretell", "wear", "heat":
			row.Check(t, askOne(t, u, q, mass, birth))
		case "over-page":
			// How many times sooner the hole comes to its end than under page.
			row.Check(t, math.Pow(10, askOne(t, page, "foretell", mass, mass)-askOne(t, u, "foretell", mass, birth)))
		default:
			t.Errorf("%s: unknown question %q", row.Where(), q)
		}
	}
}
