package law

import (
	"errors"
	"math"
	"strings"
	"testing"
)

// rows builds a batch of columns of numbers.
func rows(n int, columns ...Column) Batch { return Batch{Rows: n, Columns: columns} }

func TestAskFindsFaults(t *testing.T) {
	nan, never := math.NaN(), math.Inf(1)
	lifetime := card("lifetime", "test", Question{Name: "live", Inputs: []string{"mass"}})
	remnant := card("remnant", "test", Question{Name: "die", Inputs: []string{"mass"}, Words: []string{"white-dwarf", "black-hole"}}, remain)
	turning := card("iron", "test", Question{Name: "foretell", Inputs: []string{"mass", "u"}})
	turning.Outcomes = []Outcome{{Word: "explodes", Becomes: Gone}}
	wearing := card("evaporation", "test", Question{Name: "wear", Inputs: []string{"mass"}})
	frame := card("ejection", "test", Question{Name: "rate", Inputs: []string{"number"}})
	frame.Frame = true
	sorts := card("substellar-limit", "test", Question{Name: "sort", Inputs: []string{"mass"}})

	one := func(name string, v float64) Column { return Numbers(name, []float64{v}) }
	masses, draw := one("mass", 2), one("u", 0.5)
	for _, c := range []struct {
		name     string
		card     Card
		question string
		in       Batch
		out      []Column
		rows     int // of the answer
		want     string
	}{
		{"good", lifetime, "live", rows(1, masses), []Column{one("wait", 9)}, 1, ""},
		{"never", lifetime, "live", rows(1, masses), []Column{one("wait", never)}, 1, ""},
		{"NaN", lifetime, "live", rows(1, masses), []Column{one("wait", nan)}, 1, "row 0 (mass 2 solMass): wait: got NaN, want a number or +Inf (never)"},
		{"wait of no time", lifetime, "live", rows(1, masses), []Column{one("wait", -never)}, 1, "wait: got -Inf"},
		{"too many rows", lifetime, "live", rows(1, masses), []Column{one("wait", 9)}, 2, "got 2 rows, want 1"},
		{"short column", lifetime, "live", rows(1, masses), []Column{Numbers("wait", nil)}, 1, "wait: got 0 rows, want 1"},
		{"extra column", lifetime, "live", rows(1, masses), []Column{one("wait", 9), one("wait", 9)}, 1, "got 2 columns, want 1"},
		{"other column", lifetime, "live", rows(1, masses), []Column{one("age", 9)}, 1, `got column "age" in its place`},
		{"not on the card", lifetime, "die", rows(1, masses), nil, 1, "not on its card"},
		{"input missing", lifetime, "live", rows(1), []Column{one("wait", 9)}, 1, "got a batch of 0 columns"},
		{"input misplaced", remnant, "remain", rows(1, draw, masses), nil, 1, `got a batch with column "u" in its place`},
		{"input short", remnant, "remain", rows(2, masses, draw), nil, 1, "one in each of 2 rows"},
		{"input of the wrong sort", remnant, "remain", rows(1, Codes("mass", []uint8{0}), draw), nil, 1, "mass: got a batch with 0 values"},
		{"chances", remnant, "die", rows(1, masses), []Column{one("chance_white_dwarf", 0.5), one("chance_black_hole", 0.5)}, 1, ""},
		{"chances that miss 1", remnant, "die", rows(1, masses), []Column{one("chance_white_dwarf", 0.5), one("chance_black_hole", 0.4)}, 1, "chances: got a sum of 0.9"},
		{"chance beyond 1", remnant, "die", rows(1, masses), []Column{one("chance_white_dwarf", 1.5), one("chance_black_hole", -0.5)}, 1, "chance_white_dwarf: got 1.5, want 0 .. 1"},
		{"remnant", remnant, "remain", rows(1, masses, draw), []Column{one("mass", 2), Codes("composition", []uint8{Pure})}, 1, ""},
		{"remnant too heavy", remnant, "remain", rows(1, masses, draw), []Column{one("mass", 2.1), Codes("composition", []uint8{Pure})}, 1, "no more than the 2 solMass there was"},
		{"unknown composition", remnant, "remain", rows(1, masses, draw), []Column{one("mass", 1), Codes("composition", []uint8{7})}, 1, "got code 7, want a code below 7"},
		{"mass from nowhere", turning, "foretell", rows(1, masses, draw), []Column{one("wait", 9), one("chance_explodes", 1), one("mass", 1.5), one("gas", 0.6)}, 1, "mass + gas: got 2.1 solMass"},
		{"turning", turning, "foretell", rows(1, masses, draw), []Column{one("wait", 9), one("chance_explodes", 1), one("mass", 1.5), one("gas", 0.5)}, 1, ""},
		{"rate of zero", wearing, "wear", rows(1, masses), []Column{one("log10_rate", -never), one("heat", 0)}, 1, ""},
		{"endless rate", wearing, "wear", rows(1, masses), []Column{one("log10_rate", never), one("heat", 0)}, 1, "log10_rate: got +Inf, want a number or -Inf"},
		{"heat beyond all", wearing, "wear", rows(1, masses), []Column{one("log10_rate", 0), one("heat", 2)}, 1, "heat: got 2, want 0 .. 1"},
		{"stop", frame, "rate", rows(1, one("number", 5)), []Column{one("radius", 1), one("dispersion", 0), one("stop", 1)}, 1, ""},
		{"half a stop", frame, "rate", rows(1, one("number", 5)), []Column{one("radius", 1), one("dispersion", 0), one("stop", 0.5)}, 1, "stop: got 0.5, want 0 or 1"},
		{"no radius", frame, "rate", rows(1, one("number", 5)), []Column{one("radius", 0), one("dispersion", 0), one("stop", 0)}, 1, "radius: got 0, want a finite number > 0"},
		{"unknown kind", sorts, "sort", rows(1, masses), []Column{Codes("kind", []uint8{StandardKinds})}, 1, "kind: got code 6"},
		{"no kind", sorts, "sort", rows(1, masses), []Column{Codes("kind", []uint8{NoWord})}, 1, "kind: got code 255"},
	} {
		t.Run(c.name, func(t *testing.T) {
			u := NewUse(fake{c.card, func(string, Batch) (Batch, error) { return Batch{Rows: c.rows, Columns: c.out}, nil }})
			_, err := u.Ask(c.question, c.in)
			switch {
			case c.want == "" && err != nil:
				t.Errorf("refused: %v", err)
			case c.want != "" && err == nil:
				t.Errorf("accepted, want an error with %q", c.want)
			case c.want != "" && !strings.Contains(err.Error(), c.want):
				t.Errorf("got %q, want %q in it", err, c.want)
			}
		})
	}
}

func TestAskMeet(t *testing.T) {
	c := card("encounter", "test", Question{Name: "rate"}, Question{Name: "expose", Inputs: []string{"mass"}},
		Question{Name: "meet", Inputs: []string{"mass_1", "mass_2"}})
	c.Clocks = []Clock{{Name: "hit", Fate: FateMeet}}
	c.Outcomes = []Outcome{{Word: "merged"}}
	out := func(m1 float64, kind2 uint8, m2, gas float64) Batch {
		return Batch{Rows: 1, Columns: []Column{Codes("outcome", []uint8{0}),
			Codes("kind_1", []uint8{Star}), Numbers("mass_1", []float64{m1}), Codes("composition_1", []uint8{Hydrogen}),
			Codes("kind_2", []uint8{kind2}), Numbers("mass_2", []float64{m2}), Codes("composition_2", []uint8{NoWord}),
			Numbers("gas", []float64{gas})}}
	}
	in := rows(1, Numbers("mass_1", []float64{1}), Numbers("mass_2", []float64{0.5}))
	for name, x := range map[string]struct {
		out Batch
		ok  bool
	}{
		"one survivor":        {out(1.4, NoWord, 0, 0.1), true},
		"more than there was": {out(1.5, NoWord, 0, 0.1), false},
		"unknown survivor":    {out(1.0, 99, 0.4, 0.1), false},
	} {
		u := NewUse(fake{c, func(string, Batch) (Batch, error) { return x.out, nil }})
		if _, err := u.Ask("meet", in); (err == nil) != x.ok {
			t.Errorf("%s: %v", name, err)
		}
	}
	if faults := CheckCard(c); len(faults) > 0 {
		t.Error(faults)
	}
}

func TestAskWrapsTheLawsError(t *testing.T) {
	broken := errors.New("broken")
	u := NewUse(fake{card("lifetime", "test", Question{Name: "live", Inputs: []string{"mass"}}),
		func(string, Batch) (Batch, error) { return Batch{}, broken }})
	if _, err := u.Ask("live", rows(1, Numbers("mass", []float64{1}))); !errors.Is(err, broken) {
		t.Errorf("got %v, want it to wrap the law's error", err)
	}
}

func TestAskOfNothing(t *testing.T) {
	u := NewUse(fake{card("lifetime", "test", Question{Name: "live", Inputs: []string{"mass"}}),
		func(string, Batch) (Batch, error) { t.Error("asked about no rows"); return Batch{}, nil }})
	out, err := u.Ask("live", rows(0, Numbers("mass", nil)))
	if err != nil || out.Rows != 0 || len(out.Columns) != 1 || out.Columns[0].Name != "wait" {
		t.Errorf("got %v, %v", out, err)
	}
}

func TestAskHandsOverParametersAndKinds(t *testing.T) {
	c := card("lifetime", "test", Question{Name: "live", Inputs: []string{"mass"}})
	c.Parameters = []Parameter{mUp(8)}
	u := NewUse(fake{c, func(_ string, in Batch) (Batch, error) {
		if len(in.Parameters) != 1 || in.Parameters[0] != 9 || in.Kind("black-hole") != BlackHole {
			t.Errorf("got parameters %v, kinds %v", in.Parameters, in.Kinds)
		}
		return in.Answer(Numbers("wait", in.NewValues())), nil
	}})
	if err := u.Set("m_up", 9); err != nil {
		t.Fatal(err)
	}
	if _, err := u.Ask("live", rows(1, Numbers("mass", []float64{1}))); err != nil {
		t.Error(err)
	}
}

func TestArenaLendsApart(t *testing.T) {
	var a Arena
	for range 3 {
		var lent [][]float64
		for n := range 50 {
			v := a.Values(n)
			if len(v) != n || cap(v) != n {
				t.Fatalf("lent %d of %d", len(v), n)
			}
			for i := range v {
				v[i] = float64(n)
			}
			lent = append(lent, v)
		}
		for n, v := range lent {
			for _, x := range v {
				if x != float64(n) {
					t.Fatalf("loan %d was written over by loan %v", n, x)
				}
			}
		}
		a.Reset()
	}
	if allocs := testing.AllocsPerRun(10, func() { a.Reset(); a.Values(20); a.Words(3) }); allocs != 0 {
		t.Errorf("%v allocations once warm", allocs)
	}
}

func TestObjectInWords(t *testing.T) {
	b := Batch{Rows: 1, Kinds: KindWords, Columns: []Column{
		Codes("kind_1", []uint8{WhiteDwarf}), Numbers("mass_1", []float64{0.6}), Codes("place_1", []uint8{Adrift}),
		Codes("composition_1", []uint8{CarbonOxygen}), Codes("kind_2", []uint8{NoWord})}}
	if got, want := b.Object(0), "white-dwarf, mass_1 0.6 solMass, adrift, carbon-oxygen, kind_2 255"; got != want {
		t.Errorf("got %q, want %q", got, want)
	}
}
