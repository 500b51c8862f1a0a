package nucleondecay_test

import (
	"math"
	"slices"
	"strconv"
	"strings"
	"testing"

	"wane/plugins/nucleondecay"
	"wane/sim/law"
	"wane/testdata/published"
)

// inUse is a law with settings like "gone=last-nucleon;lifetime=1e37".
func inUse(t *testing.T, name, settings string) *law.Use {
	t.Helper()
	laws := []law.Law{nucleondecay.GrandUnified(), nucleondecay.HigherDimension(), nucleondecay.VirtualHoles(), nucleondecay.Sphaleron(), nucleondecay.Stable()}
	i := slices.IndexFunc(laws, func(l law.Law) bool { return l.Describe().Name == name })
	if i < 0 {
		t.Fatalf("unknown law %q", name)
	}
	u := law.NewUse(laws[i])
	for _, s := range strings.Split(settings, ";") {
		parameter, text, given := strings.Cut(s, "=")
		if !given {
			continue
		}
		p := u.Card.Parameters[slices.IndexFunc(u.Card.Parameters, func(p law.Parameter) bool { return p.Name == parameter })]
		v := float64(slices.Index(p.Words, text))
		if p.Words == nil {
			v, _ = strconv.ParseFloat(text, 64)
		}
		if p.Log10 {
			v = math.Log10(v)
		}
		if err := u.Set(parameter, v); err != nil {
			t.Fatal(err)
		}
	}
	if _, faults := law.NewSet(u); faults != nil {
		t.Fatal(faults)
	}
	return u
}

func TestPublished(t *testing.T) {
	for _, row := range published.Rows(t, "nucleondecay.csv") {
		u := inUse(t, row.Inputs["law"], row.Inputs["settings"])
		switch q := row.Inputs["quantity"]; q {
		case "least-lifetime":
			row.Check(t, u.Card.Parameters[0].Low)
		case "foretell":
			in := law.Batch{Rows: 1}
			for _, question := range u.Card.Questions {
				if question.Name == "foretell" && slices.Contains(question.Inputs, "kind") {
					in.Columns = append(in.Columns, law.Codes("kind", []uint8{uint8(slices.Index(law.KindWords, row.Inputs["body"]))}))
				}
			}
			in.Columns = append(in.Columns, law.Numbers("mass", []float64{row.Number(t, "mass_Msun")}))
			out, err := u.Ask("foretell", in)
			if err != nil {
				t.Fatal(err)
			}
			row.Check(t, out.Values("wait")[0])
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), q)
		}
	}
}
