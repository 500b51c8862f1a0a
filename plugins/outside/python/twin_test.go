package python_test

import (
	"context"
	"fmt"
	"math"
	"math/rand/v2"
	"os"
	"testing"

	"github.com/google/go-cmp/cmp"
	"github.com/google/go-cmp/cmp/cmpopts"

	"wane/plugins"
	kit "wane/plugins/outside/python"
	"wane/scenarios"
	"wane/sim"
	"wane/sim/ensemble"
	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/rpc"
	"wane/sim/scenario"
)

// open starts a law of testdata in a folder of its own, as a person would have
// it.
func open(t testing.TB, name string, o rpc.Options) *rpc.Law {
	t.Helper()
	needsAll(t)
	dir := t.TempDir()
	if err := os.CopyFS(dir, os.DirFS("testdata/"+name)); err != nil {
		t.Fatal(err)
	}
	if err := kit.Copy(dir); err != nil {
		t.Fatal(err)
	}
	l, err := rpc.Open(context.Background(), rpc.Start{Name: "./" + name, Args: []string{interpreter, "-B", "law.py"}, Dir: dir, Options: o})
	if err != nil {
		t.Fatal(err)
	}
	t.Cleanup(func() {
		if err := l.Close(); err != nil {
			t.Error(err)
		}
	})
	return l
}

// builtin is the law of which there is a twin.
func builtin(t testing.TB) law.Law {
	t.Helper()
	registry, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	l, known := registry.Find("evaporation", "black-body")
	if !known {
		t.Fatal("no law evaporation/black-body")
	}
	return l
}

// TestTwinCard: the card of the Python twin is that of the built-in law.
func TestTwinCard(t *testing.T) {
	got, want := open(t, "blackbody", rpc.Options{}).Describe(), builtin(t).Describe()
	if fmt.Sprintf("%+v", got) != fmt.Sprintf("%+v", want) {
		t.Errorf("card\n%+v\nwant\n%+v", got, want)
	}
}

// masses are holes of every size a hole may have, and what is none.
func masses(n int) []float64 {
	r := rand.New(rand.NewPCG(3, 5))
	m := []float64{0, math.SmallestNonzeroFloat64, 0x1p-1022, 1e-30, 1, 10, 4.3e6, 1e20}
	for len(m) < n {
		m = append(m, num.Exp10(50*r.Float64()-30), 3+100*r.Float64())
	}
	return m[:n]
}

func batch(m []float64) law.Batch {
	return law.Batch{Rows: len(m), Columns: []law.Column{law.Numbers("mass", m)}, Kinds: law.KindWords}
}

// TestTwinRows: the Python twin answers as the built-in law, to the bit,
// however the rows are cut into calls.
func TestTwinRows(t *testing.T) {
	in := batch(masses(50_001))
	for _, rows := range []int{0, 1000, 65536} {
		outside := open(t, "blackbody", rpc.Options{Rows: rows})
		for _, question := range []string{"wear", "foretell", "heat"} {
			got, err := law.NewUse(outside).Ask(question, in)
			if err != nil {
				t.Fatal(err)
			}
			want, err := law.NewUse(builtin(t)).Ask(question, in)
			if err != nil {
				t.Fatal(err)
			}
			for i, c := range want.Columns {
				for row, v := range c.Values {
					if w := got.Columns[i].Values[row]; math.Float64bits(w) != math.Float64bits(v) {
						t.Fatalf("%s, %x solMass: %s %x, want %x", question, in.Columns[0].Values[row], c.Name, w, v)
					}
				}
			}
		}
	}
}

// lamp runs two realisations of Little Lamp with a law of evaporation.
func lamp(t *testing.T, l law.Law, workers int) *ensemble.Summary {
	t.Helper()
	registry, err := plugins.Builtin()
	if err == nil {
		err = registry.Put(l)
	}
	if err != nil {
		t.Fatal(err)
	}
	o := scenario.Overrides{Realisations: 2, Laws: []string{"evaporation=black-body"}}
	sc, _, err := scenario.Load(scenarios.FS, "little-lamp.toml", registry, plugins.Defaults(), o)
	if err != nil {
		t.Fatal(err)
	}
	s, err := sim.Run(context.Background(), sc, registry, sim.Options{Workers: workers})
	if err != nil {
		t.Fatal(err)
	}
	s.Laws = nil // they say that one of them is not built in
	return s
}

// TestTwinRun: with the Python twin a galaxy ends as with the built-in law, to
// the last bit of every population, mark and cause.
func TestTwinRun(t *testing.T) {
	want := lamp(t, builtin(t), 1)
	for _, workers := range []int{1, 2} {
		got := lamp(t, open(t, "blackbody", rpc.Options{Rows: 100}), workers)
		if diff := cmp.Diff(want, got, cmpopts.EquateNaNs()); diff != "" {
			t.Errorf("%d workers: built in -, Python +:\n%s", workers, diff)
		}
	}
}
