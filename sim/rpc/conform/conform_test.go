package conform

import (
	"context"
	"errors"
	"math"
	"slices"
	"strings"
	"sync/atomic"
	"testing"
	"time"

	"wane/plugins"
	"wane/sim/law"
	"wane/sim/num"
)

// process is a law that pretends to run in a process of its own.
type process struct {
	law.Law
	clock    *clock
	closing  time.Duration
	fails    error
	restarts int
	left     []string
}

func (p process) Restarts() int { return p.restarts }
func (p process) Label() string { return "./it" }
func (p process) Log() string   { return "the last line of its log" }
func (p process) Close() error {
	p.clock.pass(p.closing)
	return p.fails
}

// clock stands still but when told to pass.
type clock struct{ ns atomic.Int64 }

func (c *clock) pass(d time.Duration) { c.ns.Add(int64(d)) }
func (c *clock) now() time.Time       { return time.Unix(0, c.ns.Load()) }

// spoilt changes a law's answers, or its card.
type spoilt struct {
	law.Law
	answer func(question string, in, out law.Batch) (law.Batch, error)
	card   func(*law.Card)
}

func (s spoilt) Describe() law.Card {
	c := s.Law.Describe()
	if s.card != nil {
		c.Parameters = slices.Clone(c.Parameters)
		s.card(&c)
	}
	return c
}

func (s spoilt) Answer(question string, in law.Batch) (law.Batch, error) {
	out, err := s.Law.Answer(question, in)
	if err != nil || s.answer == nil {
		return out, err
	}
	return s.answer(question, in, out)
}

// builtin is a built-in law.
func builtin(t *testing.T, id string) law.Law {
	t.Helper()
	r, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	name, of, _ := strings.Cut(id, "/")
	l, ok := r.Find(name, of)
	if !ok {
		t.Fatalf("no law %s", id)
	}
	return l
}

// each changes every number of a column.
func each(l law.Law, question, column string, f func(in law.Batch, row int, v float64) float64) law.Law {
	return spoilt{Law: l, answer: func(q string, in, out law.Batch) (law.Batch, error) {
		if q == question {
			for row, v := range out.Values(column) {
				out.Values(column)[row] = f(in, row, v)
			}
		}
		return out, nil
	}}
}

func carded(l law.Law, change func(*law.Card)) law.Law { return spoilt{Law: l, card: change} }

// running is a subject whose processes all run one law.
func running(l law.Law) Subject {
	c := &clock{}
	return Subject{Open: func(context.Context) (Process, error) { return process{Law: l, clock: c}, nil }, now: c.now}
}

func judged(t *testing.T, s Subject) []Finding {
	t.Helper()
	findings, err := Judge(context.Background(), s)
	if err != nil {
		t.Fatal(err)
	}
	return findings
}

func TestSoundLawsPass(t *testing.T) {
	for _, id := range []string{"evaporation/page", "white-dwarf-cooling/mestel-debye", "remnant/cummings", "ejection/contracting"} {
		t.Run(id, func(t *testing.T) {
			s := running(builtin(t, id))
			s.Ready = func(context.Context) error { return nil }
			s.ByHand = func(context.Context) (string, int, error) { return "this is a law", 1, nil }
			s.Left = func(Process) []string { return nil }
			s.Among = []law.Law{builtin(t, "collapse/raithel")}
			var begun []string
			s.Begins = func(check string) { begun = append(begun, check) }
			findings := judged(t, s)
			for _, f := range findings {
				if f.Level != Pass || f.Text == "" || f.Advice != "" {
					t.Errorf("%+v", f)
				}
			}
			if !Fit(findings) || len(begun) < 15 {
				t.Errorf("fit: %v, checks begun: %v", Fit(findings), begun)
			}
			for _, c := range checks {
				told := slices.ContainsFunc(findings, func(f Finding) bool { return f.Check == c.word })
				if !told && c.word != "input" && c.word != "unset" {
					t.Errorf("nothing is told of %s", c.word)
				}
			}
		})
	}
}

// fault is a law with one fault.
type fault struct {
	name  string
	law   law.Law
	check string
	level Level
	also  string // what else the same fault may trip
	says  string // part of the text
}

func faultsOf(t *testing.T) []fault {
	page, cooling := builtin(t, "evaporation/page"), builtin(t, "white-dwarf-cooling/mestel-debye")
	remnant, kroupa := builtin(t, "remnant/cummings"), builtin(t, "mass-function/kroupa")
	lifetime := builtin(t, "lifetime/table")
	asked, described := new(atomic.Int64), new(atomic.Int64)
	return []fault{
		{"impure", each(cooling, "shine", "log10_temperature", func(_ law.Batch, _ int, v float64) float64 {
			return v + 1e-9*float64(asked.Add(1))
		}), "pure", Fail, "rows order unset monotone fresh shapes", "asked twice"},
		{"rows that look at others", each(cooling, "shine", "log10_temperature", func(in law.Batch, row int, v float64) float64 {
			return v + 1e-9*in.Values("mass")[(row+1)%in.Rows]
		}), "rows", Fail, "monotone", "in pieces"},
		{"shuffled rows", spoilt{Law: cooling, answer: func(_ string, _, out law.Batch) (law.Batch, error) {
			slices.Sort(out.Values("log10_temperature"))
			return out, nil
		}}, "order", Fail, "rows monotone", "the same values in other rows"},
		{"a quantile that falls", each(kroupa, "mass", "mass", func(in law.Batch, row int, v float64) float64 {
			if in.Values("u")[row] > 0.7 {
				return v / 2
			}
			return v
		}), "monotone", Fail, "", "mass must never fall as u rises"},
		{"chances that do not sum to 1", each(remnant, "die", "chance_white_dwarf", func(_ law.Batch, _ int, v float64) float64 {
			return 0.99 * v
		}), "chances", Fail, "", "a sum of 0.99"},
		{"foretold against worn", each(page, "foretell", "wait", func(_ law.Batch, _ int, v float64) float64 {
			return v + 0.01
		}), "foretell", Fail, "", "worn down in"},
		{"NaN in a corner", each(page, "wear", "log10_rate", func(in law.Batch, row int, v float64) float64 {
			m := in.Values("mass")[row]
			return v + 0*(1/(m*m)) // 0*Inf where the square is 0
		}), "domain", Fail, "", "NaN"},
		{"NaN at a parameter's end", each(cooling, "shine", "log10_temperature", func(in law.Batch, _ int, v float64) float64 {
			if p := cooling.Describe().Parameters[0]; in.Parameters[0] != p.Preset {
				return math.NaN()
			}
			return v
		}), "domain", Fail, "", "NaN"},
		{"an unused parameter", carded(remnant, func(c *law.Card) {
			c.Parameters = append(c.Parameters, law.Parameter{Name: "idle", Low: 0, Preset: 1, High: 2, Citation: "assumption"})
		}), "parameter", Warn, "", "idle, changes nothing"},
		{"waits in seconds", each(lifetime, "live", "wait", func(_ law.Batch, _ int, v float64) float64 {
			return v + num.Log10(3.15576e7)
		}), "size", Warn, "", "log10 years"},
		{"an unknown unit", carded(cooling, func(c *law.Card) {
			c.Parameters = append(c.Parameters, law.Parameter{Name: "width", Unit: "furlong", Low: 0, Preset: 1, High: 2, Citation: "assumption"})
		}), "units", Fail, "parameter", "furlong"},
		{"no source", carded(remnant, func(c *law.Card) { c.Sources = nil }), "card", Fail, "", "no source"},
		{"an unknown process", carded(page, func(c *law.Card) { c.Process = "weather" }), "card", Fail, "", "unknown process"},
		{"another card each time", spoilt{Law: remnant, card: func(c *law.Card) {
			c.Notes = append(slices.Clone(c.Notes), strings.Repeat("x", int(described.Add(1)%5)))
		}}, "describe", Fail, "", "differs"},
		{"afraid of no rows", spoilt{Law: remnant, answer: func(_ string, in, out law.Batch) (law.Batch, error) {
			if in.Rows == 0 {
				return out, errors.New("no rows")
			}
			return out, nil
		}}, "shapes", Fail, "", "no rows"},
		{"cut off at 32768 rows", spoilt{Law: remnant, answer: func(_ string, in, out law.Batch) (law.Batch, error) {
			if in.Rows > 32768 {
				out.Columns[0].Values = out.Columns[0].Values[:32768]
			}
			return out, nil
		}}, "shapes", Fail, "", "32768 rows"},
		{"an infinity out of place", each(cooling, "shine", "log10_temperature", func(law.Batch, int, float64) float64 {
			return math.Inf(1)
		}), "answer", Fail, "domain parameter", "+Inf"},
	}
}

// TestFindsFaults feeds the judge laws with one fault each. It must find the
// fault under its name, with advice, and nothing that is not its consequence.
func TestFindsFaults(t *testing.T) {
	for _, x := range faultsOf(t) {
		t.Run(x.name, func(t *testing.T) {
			s := running(x.law)
			s.Among = []law.Law{builtin(t, "collapse/raithel")}
			expect(t, judged(t, s), x)
		})
	}
}

func expect(t *testing.T, findings []Finding, x fault) {
	t.Helper()
	found := false
	for _, f := range findings {
		switch {
		case f.Level == Pass:
		case f.Advice == "":
			t.Errorf("no advice: %+v", f)
		case f.Check == x.check && f.Level == x.level && strings.Contains(f.Text, x.says):
			found = true
		case f.Check != x.check && !slices.Contains(strings.Fields(x.also), f.Check):
			t.Errorf("also found %+v", f)
		}
	}
	if !found {
		t.Errorf("want %s of check %s saying %q, got %+v", x.level, x.check, x.says, findings)
	}
	if fit := Fit(findings); fit != (x.level == Warn) && x.also == "" {
		t.Errorf("fit for a run: %v", fit)
	}
}
