package remnants

import (
	"math"
	"testing"

	"wane/sim/physics/imf"
	"wane/testdata/published"
)

func relations() map[string]Relation {
	return map[string]Relation{"cummings-second": CummingsSecond(), "kalirai": Kalirai(), "salaris": Salaris()}
}

func TestRelationsPublished(t *testing.T) {
	kroupa, err := imf.Kroupa(0.01, 120, imf.KroupaSlopes())
	if err != nil {
		t.Fatal(err)
	}
	for _, row := range published.Rows(t, "whitedwarfs.csv") {
		r, ok := relations()[row.Inputs["relation"]]
		if !ok {
			t.Fatalf("%s: unknown relation %q", row.Where(), row.Inputs["relation"])
		}
		switch quantity := row.Inputs["quantity"]; quantity {
		case "mean":
			row.Check(t, r.Mean(row.Number(t, "mass_Msun")))
		case "helium-limit":
			row.Check(t, r.HeliumLimit())
		case "number-above":
			low, high := 4.0, Collapse // the relation rises here: bisect it
			for range 60 {
				if middle := (low + high) / 2; r.Mean(middle) < row.Number(t, "mass_Msun") {
					low = middle
				} else {
					high = middle
				}
			}
			row.Check(t, kroupa.NumberBelow(Collapse)-kroupa.NumberBelow(high))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), quantity)
		}
	}
}

// The first relation written as pieces is the default's, and pieces join to
// what their docs state.
func TestRelations(t *testing.T) {
	first := Relation{{0, 0.080, 0.489}, {2.85, 0.187, 0.184}, {3.60, 0.107, 0.471}}
	for m := 0.01; m < 9; m += 0.01 {
		for _, u := range []float64{0.01, 0.5, 0.9} {
			if got, want := first.WhiteDwarf(m, u, 0.06), WhiteDwarf(m, u, 0.06); got != want {
				t.Fatalf("white dwarf of %v at %v: %v, want %v", m, u, got, want)
			}
		}
	}
	for name, r := range relations() {
		h := r.HeliumLimit()
		for _, m := range append([]float64{h}, starts(r)...) {
			if below, above := r.Mean(math.Nextafter(m, 0)), r.Mean(m); math.Abs(below-above) > 0.004 {
				t.Errorf("%s at %v: %v below, %v above", name, m, below, above)
			}
		}
		for m := 0.01; m < 9.5; m += 0.01 {
			if mean := r.Mean(m); mean > m*(1+1e-12) {
				t.Errorf("%s: a star of %v leaves %v", name, m, mean)
			}
		}
	}
}

func starts(r Relation) []float64 {
	var out []float64
	for _, p := range r[1:] {
		out = append(out, p.From)
	}
	return out
}
