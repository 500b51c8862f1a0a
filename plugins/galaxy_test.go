package plugins_test

import (
	"bytes"
	"math"
	"slices"
	"strings"
	"testing"

	"wane/plugins"
	"wane/sim/law"
	"wane/testdata/published"
)

// remnants are the masses that the default laws leave of quantiles of the mass
// function, once every star is dead.
type remnants struct {
	kind         []uint8
	mass, weight []float64
}

// ask asks a default law one question about objects of one kind.
func ask(t *testing.T, uses map[string]*law.Use, process, question string, kind uint8, columns map[string][]float64) law.Batch {
	t.Helper()
	u := uses[process]
	in := law.Batch{}
	for _, c := range columns {
		in.Rows = len(c)
	}
	for _, q := range u.Card.Questions {
		if q.Name != question {
			continue
		}
		for _, name := range q.Inputs {
			if name == "kind" {
				in.Columns = append(in.Columns, law.Codes(name, bytes.Repeat([]byte{kind}, in.Rows)))
				continue
			}
			if columns[name] == nil {
				t.Fatalf("%s asks for column %s", u.ID(), name)
			}
			in.Columns = append(in.Columns, law.Numbers(name, columns[name]))
		}
	}
	out, err := u.Ask(question, in)
	if err != nil {
		t.Fatal(err)
	}
	return out
}

func defaultUses(t *testing.T) map[string]*law.Use {
	registry, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	uses := map[string]*law.Use{}
	var list []*law.Use
	for process, name := range plugins.Defaults() {
		l, _ := registry.Find(process, name)
		uses[process] = law.NewUse(l)
		list = append(list, uses[process])
	}
	if _, faults := law.NewSet(list...); faults != nil {
		t.Fatal(faults)
	}
	return uses
}

// remnantsOf lays out n quantiles, each finer towards the rare heavy end.
func remnantsOf(t *testing.T, uses map[string]*law.Use, n int) remnants {
	u, weight, half, metals := make([]float64, n), make([]float64, n), make([]float64, n), make([]float64, n)
	for i := range u {
		// 1-u in equal steps of its cube root: the heavy end has small weights.
		a, b := 1-float64(i)/float64(n), 1-float64(i+1)/float64(n)
		weight[i] = a*a*a - b*b*b
		u[i] = 1 - (a*a*a+b*b*b)/2
		half[i], metals[i] = 0.5, 0.02
	}
	mass := ask(t, uses, "mass-function", "mass", law.Star, map[string][]float64{"u": u}).Values("mass")
	sort := ask(t, uses, "substellar-limit", "sort", law.Star, map[string][]float64{"mass": mass, "metals": metals}).Words("kind")
	var out remnants
	add := func(k uint8, m, w float64) {
		out.kind, out.mass, out.weight = append(out.kind, k), append(out.mass, m), append(out.weight, w)
	}
	for i, m := range mass {
		if sort[i] == law.BrownDwarf {
			add(law.BrownDwarf, m, weight[i])
			continue
		}
		process := "remnant"
		if uses["collapse"].Speaks(law.Star, m, 0.02) {
			process = "collapse"
		}
		star := map[string][]float64{"mass": mass[i : i+1], "metals": metals[:1], "u": half[:1]}
		for _, c := range ask(t, uses, process, "die", law.Star, star).Columns {
			kind := uint8(slices.IndexFunc(law.KindWords, func(w string) bool { return law.ChanceColumn(w) == c.Name }))
			if chance := c.Values[0]; chance > 0 {
				add(kind, ask(t, uses, process, "remain", kind, star).Values("mass")[0], weight[i]*chance)
			}
		}
	}
	return out
}

// TestDefaultGalaxyDisperses follows the mean evolution of the default galaxy
// (2e11 objects within 10 kpc, a central hole of 4.3e6 Msun) under the default
// laws, once its stars are dead, until the central hole outweighs what is
// bound and takes it.
func TestDefaultGalaxyDisperses(t *testing.T) {
	const real, steps = 2e11, 2000
	uses := defaultUses(t)
	pop := remnantsOf(t, uses, 4000)
	s := ask(t, uses, "ejection", "expose", law.WhiteDwarf, map[string][]float64{"mass": pop.mass}).Values("to_ejection")
	fIn := ask(t, uses, "infall", "divert", law.WhiteDwarf, map[string][]float64{"mass": {1}}).Values("share_ejection")[0]

	// at adds up what is bound once the clock reads c.
	at := func(c float64) (number, mass, sum float64) {
		for i, m := range pop.mass {
			n := real * pop.weight[i] * math.Exp(-s[i]*c)
			number, mass, sum = number+n, mass+n*m, sum+n*s[i]
		}
		return
	}
	_, founded, _ := at(0)
	frame := func(c float64) (rate, stop, number, mass float64) {
		number, mass, sum := at(c)
		one := func(v float64) []float64 { return []float64{v} }
		out := ask(t, uses, "ejection", "rate", law.WhiteDwarf, map[string][]float64{
			"number": one(number), "mass_bound": one(mass), "sum_ejection": one(sum), "carried_off": one(founded - mass),
			"central_mass": one(4.3e6 + fIn*(founded-mass)), "founded_number": one(real), "founded_radius": one(1e4),
		})
		return math.Pow(10, out.Values("log10_rate_ejection")[0]), out.Values("stop")[0], number, mass
	}
	const step = 0.004
	years, half := 0.0, 0.0
	for c := 0.0; ; c += step {
		if c > 100 {
			t.Fatal("the galaxy does not end")
		}
		rate, _, _, _ := frame(c + step/2)
		years += step / rate
		_, stop, number, mass := frame(c + step)
		if half == 0 && number <= real/2 {
			half = math.Log10(years)
		}
		if stop == 1 {
			central := 4.3e6 + fIn*(founded-mass) + mass
			t.Logf("half 10^%.4f yr, stop 10^%.4f yr at %.4f of the objects, central hole %.3g Msun", half, math.Log10(years), number/real, central)
			found := map[string]float64{
				"half": half, "stop": math.Log10(years), "share": number / real, "central": central,
				"infall-alone": 4.3e6 + fIn*founded, "remnants": founded,
			}
			for _, row := range published.Rows(t, "dynamics.csv") {
				if name, ours := strings.CutPrefix(row.Inputs["quantity"], "default-galaxy-"); ours {
					row.Check(t, found[name])
					delete(found, name)
				}
			}
			if len(found) > 0 {
				t.Errorf("no check values for %v", found)
			}
			return
		}
	}
}
