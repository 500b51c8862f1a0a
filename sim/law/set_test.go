package law

import (
	"math"
	"strings"
	"testing"
)

func TestUseSet(t *testing.T) {
	c := card("collapse", "test", die, remain)
	c.Parameters = []Parameter{mUp(8), {Name: "mode", Words: []string{"a", "b"}, Citation: "assumption"}}
	c.Accepts = Accepts{Column: "mass", Low: AtParameter("m_up")}
	u := use(c)
	if low, high := u.Limits(); low != 8 || !math.IsInf(high, 1) {
		t.Errorf("limits %v .. %v before any set, want 8 .. +Inf", low, high)
	}
	for _, x := range []struct {
		name  string
		value float64
		ok    bool
	}{
		{"m_up", 1, true}, {"m_up", 20, true}, {"m_up", 0.99, false}, {"m_up", math.NaN(), false}, {"m_up", math.Inf(1), false},
		{"mode", 1, true}, {"mode", 2, false}, {"mode", 0.5, false}, {"mode", -1, false}, {"mode", math.NaN(), false},
		{"m_low", 1, false},
	} {
		if err := u.Set(x.name, x.value); (err == nil) != x.ok {
			t.Errorf("Set(%s, %v): %v", x.name, x.value, err)
		}
	}
	if low, _ := u.Limits(); low != 20 {
		t.Errorf("limit %v after m_up = 20", low)
	}
	if u.Speaks(Star, 19.9, 0) || !u.Speaks(Star, 20, 0) || u.Speaks(200, 30, 0) {
		t.Error("the range does not hold at its ends")
	}
}

func TestNewSet(t *testing.T) {
	collapse := card("collapse", "test", die, remain)
	collapse.Parameters = []Parameter{mUp(8)}
	remnant := stars(card("remnant", "test", die, remain), Limit{}, AtParameter("collapse.m_up"))
	relics := card("nucleon-decay", "test", Question{Name: "wear"})
	relics.Kinds = []Kind{{Name: "relic", Composition: Iron}}
	u := use(remnant)
	s, faults := NewSet(use(collapse), u, use(relics))
	if len(faults) > 0 {
		t.Fatal(faults)
	}
	if _, high := u.Limits(); high != 8 || s.Kind("relic") != StandardKinds || s.Kind("ash") != NoWord || len(KindWords) != StandardKinds {
		t.Errorf("limit %v, kinds %v", high, s.Kinds)
	}
	if all := s.All(); len(all) != 3 || all[0].Card.Process != "remnant" || s.Of("lifetime") != nil || len(s.OfRole(Stellar)) != 2 {
		t.Errorf("order of laws: %v", ids(all))
	}

	other := card("curvature", "test", Question{Name: "wear"})
	other.Kinds = []Kind{{Name: "relic", Composition: Helium}}
	strange := card("lifetime", "test", Question{Name: "live"})
	strange.Accepts.Kinds = []string{"ash"}
	for _, x := range []struct {
		uses []*Use
		want string
	}{
		{[]*Use{use(collapse), use(collapse)}, "two laws"},
		{[]*Use{use(remnant)}, "no law of process collapse is in the run"},
		{[]*Use{use(remnant), use(card("collapse", "test", die, remain))}, "which law collapse/test does not have"},
		{[]*Use{use(relics), use(other)}, "disagree on what it is made of"},
		{[]*Use{use(strange)}, `accepts kind "ash"`},
	} {
		_, faults := NewSet(x.uses...)
		if len(faults) != 1 || !strings.Contains(faults[0].Error(), x.want) {
			t.Errorf("got %v, want one fault with %q", faults, x.want)
		}
	}
}

func TestRegistry(t *testing.T) {
	good := fake{card: card("lifetime", "b", Question{Name: "live"})}
	first := fake{card: card("lifetime", "a", Question{Name: "live"})}
	early := fake{card: card("expansion", "z", Question{Name: "density"})}
	for _, p := range SkyParameters {
		early.card.Parameters = append(early.card.Parameters, Parameter{Name: p, Citation: "assumption"})
	}
	r, err := NewRegistry(good, first, early)
	if err != nil {
		t.Fatal(err)
	}
	if got := strings.Join(r.Names("lifetime"), " "); got != "a b" {
		t.Errorf("names %q", got)
	}
	if all := r.All(); len(all) != 3 || all[0].Describe().Name != "z" {
		t.Errorf("laws %v", all)
	}
	if _, ok := r.Find("lifetime", "c"); ok {
		t.Error("found a law that is not there")
	}
	if err := r.Add(good); err == nil || !strings.Contains(err.Error(), "registered twice") {
		t.Errorf("got %v", err)
	}
	if err := r.Add(fake{card: card("lifetime", "c")}); err == nil || !strings.Contains(err.Error(), `"live"`) {
		t.Errorf("got %v", err)
	}
}
