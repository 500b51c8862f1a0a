package encounter_test

import (
	"math"
	"testing"

	"wane/plugins/encounter"
	"wane/sim/law"
)

// body is one of two that meet, or what is left of it; the zero mass is
// nothing.
type body struct {
	kind string
	mass float64
}

func use(t *testing.T, set map[string]float64) *law.Use {
	t.Helper()
	u := law.NewUse(encounter.Collisions())
	for name, v := range set {
		if err := u.Set(name, v); err != nil {
			t.Fatal(err)
		}
	}
	if _, faults := law.NewSet(u); faults != nil {
		t.Fatal(faults)
	}
	return u
}

// meet asks what two bodies leave.
func meet(t *testing.T, u *law.Use, pair [2]body) (word string, left [2]body, gas float64) {
	t.Helper()
	code := func(kind string) []uint8 {
		for i, k := range law.KindWords {
			if k == kind {
				return []uint8{uint8(i)}
			}
		}
		t.Fatalf("no kind %s", kind)
		return nil
	}
	in := law.Batch{Rows: 1, Columns: []law.Column{
		law.Codes("kind_1", code(pair[0].kind)), law.Numbers("mass_1", []float64{pair[0].mass}), law.Codes("composition_1", []uint8{law.Helium}),
		law.Codes("kind_2", code(pair[1].kind)), law.Numbers("mass_2", []float64{pair[1].mass}), law.Codes("composition_2", []uint8{law.CarbonOxygen}),
	}}
	out, err := u.Ask("meet", in)
	if err != nil {
		t.Fatal(err)
	}
	for s, end := range []string{"_1", "_2"} {
		if k := out.Words("kind" + end)[0]; k != law.NoWord {
			left[s] = body{law.KindWords[k], out.Values("mass" + end)[0]}
		}
	}
	return u.Card.Outcomes[out.Words("outcome")[0]].Word, left, out.Values("gas")[0]
}

// TestOutcomes goes through all pairs of kinds, in both orders. What the rules
// do not keep as mass or gas is radiated.
func TestOutcomes(t *testing.T) {
	none := body{}
	for _, x := range []struct {
		a, b     body
		word     string
		left     [2]body // of a, of b
		gas      float64
		radiated float64
		set      map[string]float64
	}{
		{body{"brown-dwarf", 0.05}, body{"brown-dwarf", 0.03}, "merged", [2]body{{"brown-dwarf", 0.08}, none}, 0, 0, nil},
		{body{"brown-dwarf", 0.05}, body{"brown-dwarf", 0.03}, "merged", [2]body{{"brown-dwarf", 0.072}, none}, 0.008, 0, map[string]float64{"f_loss": 0.1}},
		{body{"star", 0.3}, body{"star", 0.2}, "merged", [2]body{{"star", 0.5}, none}, 0, 0, nil},
		{body{"white-dwarf", 0.6}, body{"star", 0.3}, "torn-apart", [2]body{{"white-dwarf", 0.6}, none}, 0.3, 0, nil},
		{body{"neutron-star", 1.4}, body{"star", 0.3}, "torn-apart", [2]body{{"neutron-star", 1.4}, none}, 0.3, 0, nil},
		{body{"neutron-star", 1.4}, body{"brown-dwarf", 0.05}, "torn-apart", [2]body{{"neutron-star", 1.4}, none}, 0.05, 0, nil},
		{body{"black-hole", 10}, body{"star", 0.3}, "half-swallowed", [2]body{{"black-hole", 10.15}, none}, 0.15, 0, nil},
		{body{"black-hole", 10}, body{"brown-dwarf", 0.04}, "half-swallowed", [2]body{{"black-hole", 10.02}, none}, 0.02, 0, nil},
		{body{"white-dwarf", 0.6}, body{"white-dwarf", 0.4}, "dwarfs-merged", [2]body{{"white-dwarf", 0.99}, none}, 0.01, 0, nil},
		{body{"white-dwarf", 0.7}, body{"white-dwarf", 0.70001}, "exploded", [2]body{none, none}, 1.40001, 0, nil},
		{body{"white-dwarf", 0.7}, body{"white-dwarf", 0.70001}, "dwarfs-merged", [2]body{{"white-dwarf", 0.99 * 1.40001}, none}, 0.01 * 1.40001, 0, map[string]float64{"m_ch": 1.44}},
		{body{"white-dwarf", 0.8}, body{"white-dwarf", 0.7}, "collapsed", [2]body{{"neutron-star", 1.47}, none}, 0, 0.03, map[string]float64{"supernova": 1}},
		{body{"white-dwarf", 1.3}, body{"white-dwarf", 1.3}, "collapsed", [2]body{{"black-hole", 2.548}, none}, 0, 0.052, map[string]float64{"supernova": 1}},
		{body{"neutron-star", 1.4}, body{"white-dwarf", 0.6}, "neutron-stars-merged", [2]body{{"neutron-star", 1.96}, none}, 0, 0.04, nil},
		{body{"neutron-star", 1.4}, body{"neutron-star", 1.4}, "too-heavy", [2]body{{"black-hole", 2.744}, none}, 0, 0.056, nil},
		{body{"neutron-star", 1.2}, body{"neutron-star", 1.2}, "too-heavy", [2]body{{"black-hole", 2.352}, none}, 0, 0.048, nil},
		{body{"neutron-star", 1.2}, body{"neutron-star", 1.2}, "neutron-stars-merged", [2]body{{"neutron-star", 2.352}, none}, 0, 0.048, map[string]float64{"ns_max": 2.4}},
		{body{"black-hole", 10}, body{"white-dwarf", 0.6}, "swallowed-whole", [2]body{{"black-hole", 10.6}, none}, 0, 0, nil},
		{body{"black-hole", 10}, body{"neutron-star", 1.4}, "swallowed-whole", [2]body{{"black-hole", 11.4}, none}, 0, 0, nil},
		{body{"black-hole", 10}, body{"black-hole", 20}, "holes-merged", [2]body{{"black-hole", 28.5}, none}, 0, 1.5, nil},
		{body{"black-hole", 10}, body{"black-hole", 20}, "holes-merged", [2]body{{"black-hole", 27}, none}, 0, 3, map[string]float64{"radiated": 0.1}},
	} {
		u := use(t, x.set)
		word, left, gas := meet(t, u, [2]body{x.a, x.b})
		near := func(a, b float64) bool { return math.Abs(a-b) <= 1e-12 }
		same := func(a, b [2]body) bool {
			return a[0].kind == b[0].kind && a[1].kind == b[1].kind && near(a[0].mass, b[0].mass) && near(a[1].mass, b[1].mass)
		}
		radiated := x.a.mass + x.b.mass - gas - left[0].mass - left[1].mass
		if word != x.word || !same(left, x.left) || !near(gas, x.gas) || !near(radiated, x.radiated) {
			t.Errorf("%v with %v (%v): %s, %v, gas %v, radiated %v; want %s, %v, %v, %v", x.a, x.b, x.set, word, left, gas, radiated, x.word, x.left, x.gas, x.radiated)
		}
		// The other way round the same is left: in the place of the denser one,
		// or of the first of two alike.
		back := [2]body{x.left[1], x.left[0]}
		if x.a.kind == x.b.kind {
			back = x.left
		}
		if word, left, gas := meet(t, u, [2]body{x.b, x.a}); word != x.word || !same(left, back) || !near(gas, x.gas) {
			t.Errorf("%v with %v (%v): %s, %v, gas %v; want %s, %v, %v", x.b, x.a, x.set, word, left, gas, x.word, back, x.gas)
		}
	}
	// A star and a brown dwarf: a star, whichever sought the other.
	for _, pair := range [][2]body{{{"star", 0.2}, {"brown-dwarf", 0.05}}, {{"brown-dwarf", 0.05}, {"star", 0.2}}} {
		if word, left, _ := meet(t, use(t, nil), pair); word != "merged" || left[0].kind != "star" || !(math.Abs(left[0].mass-0.25) < 1e-15) || left[1] != (body{}) {
			t.Errorf("%v: %s, %v", pair, word, left)
		}
	}
}
