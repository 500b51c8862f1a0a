package curvature_test

import (
	"slices"
	"strings"
	"testing"

	"wane/plugins/curvature"
	"wane/sim/law"
	"wane/testdata/published"
)

func TestPublished(t *testing.T) {
	laws := map[string]law.Law{"falcke": curvature.Falcke(), "falcke-fixed-density": curvature.FalckeFixedDensity()}
	for _, row := range published.Rows(t, "curvature.csv") {
		l, ok := laws[row.Inputs["law"]]
		if !ok {
			t.Fatalf("%s: unknown law", row.Where())
		}
		u := law.NewUse(l)
		if name, word, ok := strings.Cut(row.Inputs["settings"], "="); ok {
			for _, p := range u.Card.Parameters {
				if i := slices.Index(p.Words, word); p.Name == name && i >= 0 {
					if err := u.Set(name, float64(i)); err != nil {
						t.Fatal(err)
					}
				}
			}
		}
		if _, faults := law.NewSet(u); faults != nil {
			t.Fatal(faults)
		}
		kind := slices.Index(law.KindWords, row.Inputs["body"])
		if kind < 0 {
			t.Fatalf("%s: unknown kind", row.Where())
		}
		mass := []float64{row.Number(t, "mass_Msun")}
		out, err := u.Ask("foretell", law.Batch{Rows: 1, Columns: []law.Column{
			law.Codes("kind", []uint8{uint8(kind)}), law.Numbers("mass", mass), law.Numbers("birth_mass", mass)}})
		if err != nil {
			t.Fatal(err)
		}
		row.Check(t, out.Values("wait")[0])
	}
}
