package verify

import (
	"context"
	"math"
	"slices"
	"strings"
	"testing"
	"unicode/utf8"

	"wane/plugins"
	"wane/sim"
	"wane/sim/ensemble"
	"wane/sim/law"
	"wane/sim/scenario"
	"wane/sim/scenario/quantity"
)

func means(t *testing.T) *Means {
	t.Helper()
	registry, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	return &Means{Registry: registry, Defaults: plugins.Defaults(),
		Run: func(ctx context.Context, sc *scenario.Scenario) (*ensemble.Summary, error) {
			return sim.Run(ctx, sc, registry, sim.Options{})
		}}
}

func dates(t *testing.T) []Date {
	t.Helper()
	dates, err := Dates()
	if err != nil {
		t.Fatal(err)
	}
	return dates
}

// Every date of the literature comes out as recorded.
func TestDatesAsRecorded(t *testing.T) {
	m := means(t)
	for _, d := range dates(t) {
		r, err := Judge(t.Context(), d, m)
		if err != nil {
			t.Fatal(err)
		}
		if !r.AsRecorded {
			t.Errorf("%s: printed 10^%.3f yr, ours 10^%.3f: %s", d.Name, d.printed, r.Ours, r.Stray)
		}
	}
}

// The famous disagreements stand among the dates, each with its reason.
func TestFamousDisagreements(t *testing.T) {
	all := dates(t)
	if len(all) < 30 {
		t.Errorf("%d dates, want 30 or more", len(all))
	}
	for name, word := range map[string]string{
		"hole-naive-by-modes": "grey-body",
		"earth-spirals-in":    "mass ratio is missing",
		"star-spirals-in":     "mass ratio is missing",
		"black-dwarf-5K":      "envelope",
		"vacuum-decays":       "fourth root of a rate",
		"half-the-nucleons":   "half-life",
	} {
		i := slices.IndexFunc(all, func(d Date) bool { return d.Name == name })
		if i < 0 || all[i].Verdict != Differs || !strings.Contains(all[i].Reason, word) {
			t.Errorf("no date %s that differs for the reason that holds %q", name, word)
		}
	}
}

// Rows fit the table, and topics are not torn apart.
func TestDatesFit(t *testing.T) {
	var topics []string
	for _, d := range dates(t) {
		if n := utf8.RuneCountInString(d.Name); n > 25 {
			t.Errorf("%s: a name of %d letters", d.Name, n)
		}
		if n := utf8.RuneCountInString(d.Printed); n > 13 {
			t.Errorf("%s: printed %q has %d letters", d.Name, d.Printed, n)
		}
		if i := slices.Index(topics, d.Topic); i < 0 {
			topics = append(topics, d.Topic)
		} else if i != len(topics)-1 {
			t.Errorf("%s: topic %q comes twice", d.Name, d.Topic)
		}
	}
}

// No agreement is with the number that ours came from: neither a setting of
// the row nor a preset of its law is the printed date.
func TestNoAgreementWithItself(t *testing.T) {
	m := means(t)
	for _, d := range dates(t) {
		if d.Verdict == Differs {
			continue // what differs is not the same number
		}
		same := func(v float64) bool { return math.Abs(v-d.printed) < 0.01 }
		for _, setting := range append(append([]string(nil), d.Given...), d.Set...) {
			_, text, _ := strings.Cut(setting, "=")
			if v, err := quantity.ParseFor(text, "yr", true); err == nil && same(v) {
				t.Errorf("%s: %s is the printed date", d.Name, setting)
			}
		}
		for _, id := range append([]string{d.Law}, d.Laws...) {
			process, name, _ := strings.Cut(strings.Replace(id, "=", "/", 1), "/")
			l, ok := m.Registry.Find(process, name)
			if !ok {
				continue
			}
			for _, p := range l.Describe().Parameters {
				if v := preset(p); p.Unit == "yr" && same(v) {
					t.Errorf("%s: the preset of %s of %s is the printed date", d.Name, p.Name, id)
				}
			}
		}
	}
}

func preset(p law.Parameter) float64 {
	if p.Log10 {
		return p.Preset
	}
	return math.Log10(p.Preset)
}

// one is a row that is right, to be spoilt.
const one = `[[date]]
name = "one"
topic = "black holes"
what = "a hole"
printed = "1e67 yr"
tolerance = 0.5
source = "a source"
locator = "a place"
kind = "published"
law = "evaporation/black-body"
given = ["mass=1Msun"]
answer = "lifetime"
verdict = "agrees"
`

func read(t *testing.T, old, with string) ([]Date, error) {
	t.Helper()
	if old != "" && !strings.Contains(one, old) {
		t.Fatalf("no %q to replace", old)
	}
	return Read([]byte(strings.Replace(one, old, with, 1)))
}

func TestReadFindsFaults(t *testing.T) {
	if _, err := read(t, "", ""); err != nil {
		t.Fatal(err)
	}
	for _, c := range []struct{ old, with, want string }{
		{`name = "one"`, `nam = "one"`, "nam"},
		{`name = "one"`, ``, "no name"},
		{`source = "a source"`, ``, "no source"},
		{`locator = "a place"`, ``, "no locator"},
		{`printed = "1e67 yr"`, `printed = "1e67 kg"`, "kg"},
		{`printed = "1e67 yr"`, `printed = "soon"`, "soon"},
		{`kind = "published"`, `kind = "rumour"`, "rumour"},
		{`kind = "published"`, "kind = \"published\"\nclock = \"noon\"", "noon"},
		{`kind = "published"`, "kind = \"published\"\nspan = [\"1e70 yr\", \"1e71 yr\"]", "between them"},
		{`kind = "published"`, "kind = \"published\"\nspan = [\"1e66 yr\"]", "between them"},
		{`tolerance = 0.5`, `tolerance = 5`, "tolerance"},
		{`tolerance = 0.5`, ``, "tolerance"},
		{`law = "evaporation/black-body"`, ``, "only one of them"},
		{`answer = "lifetime"`, "answer = \"lifetime\"\npopulation = \"stars\"", "only one of them"},
		{`answer = "lifetime"`, ``, "an answer"},
		{`law = "evaporation/black-body"`, `sky = "end"`, "a scenario"},
		{`verdict = "agrees"`, `verdict = "fine"`, "fine"},
		{`verdict = "agrees"`, `verdict = "within"`, "does not give"},
		{`verdict = "agrees"`, `verdict = "differs"`, "the reason"},
		{`verdict = "agrees"`, "verdict = \"differs\"\nreason = \"because\"", "the difference"},
		{one, one + one, "twice"},
		{one, "", "no dates"},
		{one, "[[date", "verify"},
	} {
		if _, err := read(t, c.old, c.with); err == nil || !strings.Contains(err.Error(), c.want) {
			t.Errorf("%s instead of %s: got %v, want a fault with %q", c.with, c.old, err, c.want)
		}
	}
}

// What is not as recorded is found, whatever is wrong with it.
func TestJudgeFindsStrays(t *testing.T) {
	m := means(t)
	for _, c := range []struct{ what, old, with, want string }{
		{"as recorded", "", "", ""},
		{"its spread hides no agreement", `verdict = "agrees"`, "verdict = \"within\"\nspan = [\"1e60 yr\", \"1e70 yr\"]", "now: agrees, by +0.321"},
		{"a wrong verdict", `verdict = "agrees"`, "verdict = \"differs\"\nreason = \"x\"\ndifference = 0.32", "now: agrees"},
		{"a tolerance too small", `tolerance = 0.5`, "tolerance = 0.1", "now: differs, by +0.321"},
		{"a difference that is another", `verdict = "agrees"`, "verdict = \"agrees\"\ndifference = 0.3", "now by +0.321"},
		{"a law that is none", "black-body", "green-body", "not known"},
		{"an answer that is none", `"lifetime"`, `"deathtime"`, "no deathtime that is a time"},
		{"an answer that is no time", `"lifetime"`, `"temperature"`, "no temperature that is a time"},
		{"an e-folding of what is not worn", "law = \"evaporation/black-body\"\ngiven = [\"mass=1Msun\"]\nanswer = \"lifetime\"",
			"law = \"lifetime/table\"\ngiven = [\"mass=1Msun\"]\nanswer = \"e-folding\"", "a loss rate"},
		{"a mass that is none", "1Msun", "1yr", "mass"},
		{"a scenario that is none", `law = "evaporation/black-body"`, "scenario = \"nowhere\"\npopulation = \"stars\"\nmark = \"last\"", "nowhere"},
		{"a population that is none", `law = "evaporation/black-body"`, "scenario = \"rest\"\npopulation = \"comets\"\nmark = \"last\"", "comets"},
		{"a mark that is none", `law = "evaporation/black-body"`, "scenario = \"rest\"\npopulation = \"stars\"\nmark = \"tenth\"", "tenth"},
		{"a sky that is none", `law = "evaporation/black-body"`, "scenario = \"rest\"\nsky = \"blue\"", "blue"},
		{"a vacuum that lasts", `law = "evaporation/black-body"`, "scenario = \"rest\"\nsky = \"vacuum\"", "no vacuum"},
		{"a sky that never ends", `law = "evaporation/black-body"`, "scenario = \"rest\"\nsky = \"end\"", "now: differs, by +Inf"},
	} {
		rows, err := read(t, c.old, c.with)
		if err != nil {
			t.Errorf("%s: %v", c.what, err)
			continue
		}
		r, err := Judge(t.Context(), rows[0], m)
		if err != nil || r.AsRecorded != (c.want == "") || !strings.Contains(r.Stray, c.want) {
			t.Errorf("%s: got %q, %v, want %q", c.what, r.Stray, err, c.want)
		}
	}
}

func TestJudgeStops(t *testing.T) {
	ctx, cancel := context.WithCancel(t.Context())
	cancel()
	if _, err := Judge(ctx, dates(t)[0], means(t)); err == nil {
		t.Error("worked out after the end")
	}
}
