package lawtest

import (
	"fmt"
	"math"
	"slices"
	"strings"

	"wane/sim/law"
)

// size is where the median of an answer on plausible rows may be expected,
// whatever the physics: outside, the answer is probably in another unit, or a
// logarithm where the quantity is wanted, or the other way about.
type size struct {
	question, column string
	low, high        float64
	unit             string
	per              string // an input column to divide by
}

// sizes leave many decades to new physics. What scales freely (rates and
// susceptibilities of clocks, whose product alone counts) is not judged.
var sizes = []size{
	{"live", "wait", 6, 12, "log10 years", ""},          // stars of 0.08 .. 150 solMass: a few million years to 1e13
	{"birth", "log10_date", 8, 11.5, "log10 years", ""}, // stars are born between 1e8 and 1e11 years
	{"mass", "mass", 0.01, 1000, "solMass", ""},         // the commonest newborn object
	{"metals", "metals", 0, 0.2, "mass fraction", ""},   // the Sun has 0.02
	{"remain", "mass", 1e-3, 1, "solMass", "mass"},      // a remnant is a part of its star
	{"shine", "log10_temperature", 2, 9, "log10 K", ""}, // from 1 to 1e12 years of age
	{"wear", "log10_rate", math.Inf(-1), -3, "log10 solMass/yr", ""},
	{"foretell", "wait", 3, math.Inf(1), "log10 years", ""},
	{"merge", "wait", 0, math.Inf(1), "log10 years", ""}, // pairs 0.01 .. 1000 AU apart
	{"warm", "power", 0, 1e40, "W", ""},
	{"rate", "radius", 1e-6, 100, "pc", "founded_radius"},
	{"rate", "dispersion", 1e-2, 100, "km/s", "founded_dispersion"},
}

// checkSize compares the median of each answer on plausible rows with what its
// unit lets expect. A law that never acts has nothing to be of that size.
func (k *kit) checkSize(q law.Question) {
	if k.card.Idle {
		return
	}
	rows := k.entries(q, 1000)
	out, err := k.ask(q.Name, lay(q, rows))
	if err != nil {
		return // reported before
	}
	for _, s := range sizes {
		values := out.Values(s.column)
		if s.question != q.Name || values == nil {
			continue
		}
		median := middle(values, func(row int) float64 {
			if s.per == "" {
				return 1
			}
			return rows[row].value(q.Name, s.per)
		})
		if median < s.low || median > s.high {
			k.doubt("size", q.Name, "%s", s.unlike(median))
		}
	}
}

func (s size) unlike(median float64) string {
	what := s.column
	if s.per != "" {
		what += " over " + s.per
	}
	return fmt.Sprintf("the median of %s on plausible rows is %.4g, want %s: is the answer in %s?", what, median, s.span(), s.unit)
}

func (s size) span() string {
	switch {
	case math.IsInf(s.low, 0):
		return fmt.Sprintf("at most %v", s.high)
	case math.IsInf(s.high, 0):
		return fmt.Sprintf("at least %v", s.low)
	}
	return strings.TrimSpace(fmt.Sprintf("%v .. %v", s.low, s.high))
}

// middle is the median of values, each over its own unit.
func middle(values []float64, unit func(row int) float64) float64 {
	all := make([]float64, len(values))
	for i, v := range values {
		all[i] = v / unit(i)
	}
	slices.Sort(all)
	return all[len(all)/2]
}
