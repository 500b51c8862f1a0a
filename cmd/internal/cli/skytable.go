package cli

import (
	"math"

	"wane/sim/num"
	"wane/sim/physics/cosmology"
	"wane/sim/physics/hole"
)

// skyColumn is one column of the files. Values are log10 of the unit.
type skyColumn struct {
	name, unit, doc string
	at              func(v *skyView, l float64) float64
}

// VOUnits has lyr for the light year.
const (
	perMpc  = "km/s/Mpc"
	lightYr = "lyr"
)

func skyColumns() []skyColumn {
	return []skyColumn{
		{"log10_date", "yr", "time since the Big Bang, the age of space", func(_ *skyView, l float64) float64 { return l }},
		{"log10_scale_factor", "", "scale factor, 1 today; inf beyond the range of numbers", (*skyView).logA},
		{"log10_log10_scale_factor", "", "log10 of log10 of the scale factor, from today on", (*skyView).logLogA},
		{"log10_expansion_rate", perMpc, "expansion rate", (*skyView).logRate},
		{"log10_relic_temperature", "K", "temperature of the relic radiation; -inf beyond the range of numbers", (*skyView).LogRelic},
		{"log10_horizon_temperature", "K", "temperature of the horizon; -inf while space does not accelerate", (*skyView).LogHorizon},
		{"log10_felt_temperature", "K", "what an object feels of both", (*skyView).LogTemperature},
		{"log10_event_horizon", lightYr, "event horizon, proper distance; inf if there is none", (*skyView).LogEventHorizon},
		{"log10_hubble_radius", lightYr, "c/H, proper distance", (*skyView).LogHubbleRadius},
		{"log10_particle_horizon", lightYr, "particle horizon, comoving distance", (*skyView).LogParticleHorizon},
		{"log10_visible_limit", lightYr, "comoving distance of the farthest matter that is ever seen; inf if there is no limit",
			func(v *skyView, _ float64) float64 { return v.LogVisibleLimit() }},
	}
}

func (c skyColumn) unitInLog() string {
	if c.unit == "" {
		return ""
	}
	return "log(" + c.unit + ")"
}

func (v *skyView) logA(l float64) float64 { return v.LnA(l) / num.Ln10 }

// logLogA is NaN while the scale factor is below 1.
func (v *skyView) logLogA(l float64) float64 {
	if v.LnA(l) < 0 {
		return math.NaN()
	}
	return v.LogLnA(l) - num.Log10(num.Ln10)
}

func (v *skyView) logRate(l float64) float64 { return v.LogHubble(l) - cosmology.LogHubbleRate(1) }

// over tells whether everything has ended by the date.
func (v *skyView) over(l float64) bool {
	end, _ := v.End()
	return l > end
}

// skyMark is a date at which something changes.
type skyMark struct {
	key, doc string
	date     float64 // NaN: everything has ended before
	optional bool    // not worth a line in a text if it never comes
}

// marks lists the special dates in the order of their kinds.
func (v *skyView) marks() []skyMark {
	end, cause := v.End()
	out := []skyMark{
		{"today", "today: the scale factor is 1", v.Now(), false},
		{"relic_meets_horizon", "the relic radiation is as cold as the horizon", v.LogRelicMeetsHorizon(), false},
	}
	for _, m := range []float64{1, 10, 4.3e6, 1e9} {
		mass := shortNumber(m, 3)
		out = append(out, skyMark{"hole_" + mass + "_Msun",
			"a hole of " + mass + " Msun is warmer than the sky from now on, and loses mass", v.LogColderSince(hole.Log10Temperature(m)), false})
	}
	out = append(out,
		skyMark{"dark_energy_decays", "dark energy decays", v.DarkEnergyDecays(), true},
		skyMark{"adrift", "everything comes adrift", v.Adrift(), true})
	for i := range out {
		if d := out[i].date; d > end {
			out[i].date = math.NaN()
		}
	}
	doc := "everything ends"
	if cause != "" {
		doc += " (" + cause + ")"
	}
	return append(out, skyMark{"end", doc, end, false})
}

// why says why there is no date.
func (m skyMark) why() string {
	switch {
	case math.IsNaN(m.date):
		return "not before the end"
	case math.IsInf(m.date, 1):
		return "never"
	case math.IsInf(m.date, -1):
		return "always so"
	}
	return ""
}
