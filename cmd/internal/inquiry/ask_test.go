package inquiry

import (
	"math"
	"strings"
	"testing"

	"wane/sim/law"
)

// odd is a law made up for tests: an answer that rises and falls again with
// the mass, one that leaps, one that is flat, and a range that hangs on a
// parameter.
type odd struct{}

func (odd) Describe() law.Card {
	return law.Card{
		Process: "lifetime", Name: "odd", Version: "1", Summary: "made up", Sources: []string{"assumption"},
		Accepts:   law.Accepts{Kinds: []string{"star"}, Column: "mass", Low: law.At(0.1), High: law.AtParameter("top")},
		Questions: []law.Question{{Name: "live", Inputs: []string{"mass", "metals"}}},
		Parameters: []law.Parameter{
			{Name: "top", Unit: "solMass", Low: 1, High: 1000, Preset: 100, Citation: "assumption"},
			{Name: "shape", Words: []string{"line", "hill", "leap", "flat"}, Citation: "assumption"},
		},
	}
}

func (odd) Answer(_ string, in law.Batch) (law.Batch, error) {
	m, out := in.Values("mass"), in.NewValues()
	for i := range m {
		switch int(in.Parameters[1]) {
		case 0:
			out[i] = 10 - 3*math.Log10(m[i])
		case 1:
			out[i] = 10 - math.Abs(math.Log10(m[i]))
		case 2:
			out[i] = 9
			if m[i] > 1 {
				out[i] = 11
			}
		case 3:
			out[i] = 10
		}
	}
	return in.Answer(law.Numbers("wait", out)), nil
}

func registry(t *testing.T) *law.Registry {
	t.Helper()
	r, err := law.NewRegistry(odd{})
	if err != nil {
		t.Fatal(err)
	}
	return r
}

func ask(t *testing.T, given ...string) (*Answer, error) {
	t.Helper()
	return Ask(Inquiry{Registry: registry(t), ID: "lifetime/odd", Given: given})
}

func TestAskForwards(t *testing.T) {
	a, err := ask(t, "mass=10Msun")
	if err != nil {
		t.Fatal(err)
	}
	if len(a.Outputs) != 1 || a.Outputs[0].Name != "lifetime" || math.Abs(a.Outputs[0].Number-7) > 1e-12 {
		t.Errorf("lifetime is %+v, want 10^7 yr", a.Outputs)
	}
	metals := a.Inputs[1]
	if metals.Name != "metals" || metals.Number != 0.02 || metals.Why == "" {
		t.Errorf("metals are filled in as %+v, want 0.02 and why", metals)
	}
}

func TestAskBackwards(t *testing.T) {
	a, err := ask(t, "lifetime=1e8.5yr")
	if err == nil {
		t.Fatalf("read 1e8.5 as a number: %+v", a.Inputs)
	}
	a, err = ask(t, "lifetime=10^8.5yr")
	if err != nil {
		t.Fatal(err)
	}
	// 10 - 3 log m = 8.5
	if got, want := a.Inputs[0].Number, math.Sqrt(10); math.Abs(got/want-1) > 1e-12 {
		t.Errorf("mass %v, want %v", got, want)
	}
}

func TestAskRefuses(t *testing.T) {
	for _, c := range []struct{ what, given, want string }{
		{"two masses", "shape=hill lifetime=10^9.5yr", "does not rise or fall throughout"},
		{"a leap", "shape=leap lifetime=1e10yr", "leaps over"},
		{"a flat answer", "shape=flat lifetime=1e10yr", "more than one mass"},
		{"a lifetime beyond the range", "lifetime=1e20yr", "no mass leads to it"},
		{"a mass beyond the range", "mass=200Msun", "outside its range"},
		{"a mass at the end of a narrower range", "mass=50Msun top=50Msun", "outside its range"},
		{"all known", "mass=1Msun lifetime=1e10yr", "nothing is left to find"},
		{"nothing", "", "wants mass"},
		{"a word that is none", "shape=hil mass=1Msun", `did you mean "hill"`},
		{"a negative lifetime", "lifetime=-1yr", "want >= 0"},
		{"no value", "mass=", "want key=value"},
		{"no key", "=3", "want key=value"},
	} {
		_, err := ask(t, strings.Fields(c.given)...)
		if err == nil || !strings.Contains(err.Error(), c.want) {
			t.Errorf("%s: got %v, want a fault with %q", c.what, err, c.want)
		}
	}
}

// A parameter moves the range: what was outside is inside.
func TestAskRangeFollowsParameter(t *testing.T) {
	if _, err := ask(t, "mass=200Msun", "top=300Msun"); err != nil {
		t.Error(err)
	}
}

func TestFormat(t *testing.T) {
	for _, c := range []struct {
		v    Value
		want string
	}{
		{Value{Number: 70.06400334, Unit: "yr", Log10: true}, "10^70.064 yr"},
		{Value{Number: 9, Unit: "yr", Log10: true}, "10^9.000 yr (1e9 yr)"},
		{Value{Number: 1e26, Unit: "yr", Log10: true}, "10^(10^26.000) yr"},
		{Value{Number: -1000, Unit: "yr", Log10: true}, "at once"},
		{Value{Number: -5e19, Unit: "K", Log10: true}, "10^(-5e19) K"},
		{Value{Number: math.Inf(1), Unit: "yr", Log10: true}, "never"},
		{Value{Number: math.Inf(-1), Unit: "yr", Log10: true}, "0 yr"},
		{Value{Number: 6.1703e-9, Unit: "K"}, "6.1703e-9 K"},
		{Value{Number: 0.6, Unit: "solMass"}, "0.6 Msun"},
		{Value{Word: "helium"}, "helium"},
	} {
		if got := Format(c.v); got != c.want {
			t.Errorf("Format(%+v) = %q, want %q", c.v, got, c.want)
		}
	}
}

// No text makes the reader of keys panic.
func FuzzAsk(f *testing.F) {
	for _, s := range []string{"mass=1Msun", "mass=10^(10^30)kg", "lifetime=never", "=", "mass==1", "shape=line", "kind=star", "log10_x=1", "\xff=\xff"} {
		f.Add(s)
	}
	r, err := law.NewRegistry(odd{})
	if err != nil {
		f.Fatal(err)
	}
	f.Fuzz(func(_ *testing.T, given string) {
		_, _ = Ask(Inquiry{Registry: r, ID: "lifetime/odd", Given: []string{given}})
	})
}
