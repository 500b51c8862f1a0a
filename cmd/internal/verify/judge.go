package verify

import (
	"context"
	"fmt"
	"math"

	"wane/cmd/internal/inquiry"
	"wane/sim/ensemble"
	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/scenario"
)

// Means is what rows are worked out with. It remembers runs, so that the rows
// of one galaxy share one; it is for one goroutine.
type Means struct {
	Registry *law.Registry
	Defaults map[string]string // process to law
	Run      func(ctx context.Context, sc *scenario.Scenario) (*ensemble.Summary, error)

	runs map[string]*ensemble.Summary // by the digest of the scenario
}

func (m *Means) run(ctx context.Context, sc *scenario.Scenario) (*ensemble.Summary, error) {
	if s, done := m.runs[sc.Digest]; done {
		return s, nil
	}
	s, err := m.Run(ctx, sc)
	if err != nil {
		return nil, err
	}
	if m.runs == nil {
		m.runs = map[string]*ensemble.Summary{}
	}
	m.runs[sc.Digest] = s
	return s, nil
}

// Result is a row worked out.
type Result struct {
	Date       Date
	Ours       float64 // log10 yr; NaN: Fault says why
	Difference float64 // dex, ours less printed; of x for dates of 10^(10^x) yr
	Verdict    string  // empty where there is no ours
	AsRecorded bool
	Stray      string // why it is not as recorded
	Fault      error
}

// Judge works a row out and holds it against what is recorded. The error is
// that of ctx, and of nothing else.
func Judge(ctx context.Context, d Date, m *Means) (Result, error) {
	ours, err := d.ours(ctx, m)
	if ctx.Err() != nil {
		return Result{}, ctx.Err()
	}
	r := Result{Date: d, Ours: ours, Difference: math.NaN(), Fault: err}
	if err == nil && math.IsNaN(ours) {
		r.Fault = fmt.Errorf("there is no such date")
	}
	if r.Fault != nil {
		r.Ours, r.Stray = math.NaN(), r.Fault.Error()
		return r, nil
	}
	r.Difference, r.Verdict = d.difference(ours), d.verdict(ours)
	switch {
	case r.Verdict != d.Verdict:
		r.Stray = fmt.Sprintf("recorded: %s; now: %s, by %+.3f dex", d.Verdict, r.Verdict, r.Difference)
	case d.Difference != nil && !(math.Abs(r.Difference-*d.Difference) <= d.Slack):
		r.Stray = fmt.Sprintf("recorded: %s by %+.3f dex; now by %+.3f", d.Verdict, *d.Difference, r.Difference)
	default:
		r.AsRecorded = true
	}
	return r, nil
}

// ours is log10 years.
func (d *Date) ours(ctx context.Context, m *Means) (float64, error) {
	if d.Law != "" {
		return d.asked(m)
	}
	sc, _, err := scenario.Load(library(), d.Scenario+".toml", m.Registry, m.Defaults, scenario.Overrides{Laws: d.Laws, Sets: d.Set})
	if err != nil {
		return 0, err
	}
	if d.Sky != "" {
		return d.ofSky(sc, m)
	}
	s, err := m.run(ctx, sc)
	if err != nil {
		return 0, err
	}
	return d.mark(s)
}

func (d *Date) asked(m *Means) (float64, error) {
	a, err := inquiry.Ask(inquiry.Inquiry{Registry: m.Registry, Defaults: m.Defaults, ID: d.Law, Question: d.Question, Given: d.Given})
	if err != nil {
		return 0, err
	}
	if d.Answer == EFolding {
		mass, found := logOf(a, "mass", "solMass")
		rate, worn := logOf(a, "loss_rate", "solMass/yr")
		if !found || !worn {
			return 0, fmt.Errorf("law %s: want a mass and a loss rate for the time of an e-folding", d.Law)
		}
		return mass - rate, nil
	}
	t, found := logOf(a, d.Answer, "yr")
	if !found {
		return 0, fmt.Errorf("law %s: no %s that is a time in what it answers", d.Law, d.Answer)
	}
	return t, nil
}

// logOf is log10 of the value of a name and unit in an answer.
func logOf(a *inquiry.Answer, name, unit string) (float64, bool) {
	for _, v := range append(a.Outputs, a.Inputs...) {
		switch {
		case v.Name != name || v.Unit != unit || v.Word != "":
		case v.Log10:
			return v.Number, true
		default:
			return num.Log10(v.Number), true
		}
	}
	return 0, false
}

// mark is a mark of the row's population.
func (d *Date) mark(s *ensemble.Summary) (float64, error) {
	for _, p := range s.Populations {
		if p.Name != d.Population {
			continue
		}
		switch d.Mark {
		case "peak":
			return p.PeakDate, nil
		case "half":
			return p.Half.Date, nil
		case "hundredth":
			return p.Hundredth.Date, nil
		case "last":
			return p.Last.Date, nil
		case "real-last":
			return p.RealLast, nil
		}
		return 0, fmt.Errorf("mark %q: want peak, half, hundredth, last or real-last", d.Mark)
	}
	return 0, fmt.Errorf("scenario %s has no population %q", d.Scenario, d.Population)
}
