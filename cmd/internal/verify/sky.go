package verify

import (
	"fmt"
	"math"

	"wane/cmd/internal/inquiry"
	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/scenario"
	"wane/sim/scenario/quantity"
	"wane/sim/sky"
)

// farthest is the log10 date up to which the sky is searched.
const farthest = 1e5

// ofSky is a date of the background of a scenario.
func (d *Date) ofSky(sc *scenario.Scenario, m *Means) (float64, error) {
	set, err := sc.Set(m.Registry)
	if err != nil {
		return 0, err
	}
	prepared, err := sky.Prepare(set)
	if err != nil {
		return 0, err
	}
	s, err := prepared.Draw(sc.Seed, 0)
	if err != nil {
		return 0, err
	}
	date, err := d.inSky(s, set, m)
	if err == nil && d.Clock == "now" {
		date = num.Sub10(date, s.Now())
	}
	return date, err
}

func (d *Date) inSky(s *sky.Sky, set *law.Set, m *Means) (float64, error) {
	switch d.Sky {
	case "end": // of everything
		end, _ := s.End()
		return end, nil
	case "horizon-shines": // the relic radiation is as cold as the horizon
		return s.LogRelicMeetsHorizon(), nil
	case "colder": // than a hole of mass Of
		a, err := inquiry.Ask(inquiry.Inquiry{
			Registry: m.Registry, Defaults: m.Defaults, ID: "evaporation/" + m.Defaults["evaporation"], Question: "heat", Given: []string{"mass=" + d.Of},
		})
		if err != nil {
			return 0, err
		}
		return s.LogColderSince(num.Log10(a.Outputs[0].Number)), nil
	case "lost": // a thing now at distance Of crosses the event horizon
		ly, err := quantity.ParseFor(d.Of, "lyr", true)
		if err != nil {
			return 0, err
		}
		return after(s.Now(), func(l float64) bool { return s.LogEventHorizon(l)-s.LnA(l)/num.Ln10 <= ly }), nil
	case "vacuum": // mean number of decays in the past light cone is one
		u := set.Of("vacuum-decay")
		if u == nil || u.Card.Idle {
			return 0, fmt.Errorf("scenario %s has no vacuum that decays", d.Scenario)
		}
		var fault error
		date := after(s.Now(), func(l float64) bool {
			hazard, err := hazard(u, s, l)
			if err != nil {
				fault = err
			}
			return err != nil || hazard >= 0
		})
		return date, fault
	}
	return 0, fmt.Errorf("sky %q: want end, horizon-shines, colder, lost or vacuum", d.Sky)
}

// hazard is log10 of the cumulative hazard of an ending at date l.
func hazard(u *law.Use, s *sky.Sky, l float64) (float64, error) {
	in := law.Batch{Rows: 1}
	for _, q := range u.Card.Questions {
		if q.Name != "end" {
			continue
		}
		for _, name := range q.Inputs {
			v := l
			if name == "log10_four_volume" {
				v = s.LogFourVolume(l)
			}
			in.Columns = append(in.Columns, law.Numbers(name, []float64{v}))
		}
	}
	out, err := u.Ask("end", in)
	if err != nil {
		return 0, err
	}
	return out.Columns[0].Values[0], nil
}

// after is the first log10 date found, from low on, at which something holds;
// once it holds, it must hold for good. +Inf if it never does.
func after(low float64, holds func(float64) bool) float64 {
	high := low
	for step := 1.0; !holds(high); step *= 2 {
		if low, high = high, high+step; high > farthest {
			return math.Inf(1)
		}
	}
	for {
		mid := low + (high-low)/2
		switch {
		case !(low < mid && mid < high):
			return high
		case holds(mid):
			high = mid
		default:
			low = mid
		}
	}
}
