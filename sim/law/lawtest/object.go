package lawtest

import (
	"math"
	"math/rand/v2"
	"slices"

	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/structure"
)

// object is one plausible object.
type object struct {
	kind, composition, place, origin uint8
	mass, birth                      float64 // solMass
	metals, radius                   float64 // radius in km
}

// span is a range of masses, solMass.
type span struct{ low, high float64 }

// masses are those in which kinds are found; wearing brings them far lower.
var masses = map[string]span{
	"star":         {0.08, 150},
	"brown-dwarf":  {0.005, 0.08},
	"white-dwarf":  {0.15, 1.44},
	"neutron-star": {0.2, 2.3},
	"black-hole":   {2, 300},
	"central-hole": {1e4, 1e11},
}

// otherMasses are those of a kind that a law adds.
var otherMasses = span{1e-3, 2}

// lightest is to where a worn object is followed: matter to a small moon, a
// hole to the last hour of its life, solMass.
var lightest = map[string]float64{"black-hole": 1e-19, "central-hole": 1e-19}

const lightestMatter = 1e-8

func logUniform(r *rand.Rand, s span) float64 {
	a, b := num.Log(s.low), num.Log(s.high)
	return min(max(num.Exp(a+(b-a)*r.Float64()), s.low), s.high)
}

// kinds lists the kinds a question may be about.
func (k *kit) kinds(question string) []string {
	switch question {
	case "live", "die", "sort":
		return []string{"star"}
	case "remain":
		var words []string
		for _, q := range k.card.Questions {
			if q.Name == "die" {
				words = q.Words
			}
		}
		if len(words) == 0 {
			return []string{"white-dwarf"}
		}
		return words
	}
	if len(k.card.Accepts.Kinds) == 0 {
		return k.set.Kinds
	}
	return k.card.Accepts.Kinds
}

// massSpan is the range of masses of a kind in a question, as far as the law
// accepts them.
func (k *kit) massSpan(question, kind string) span {
	s, ok := masses[kind]
	if !ok {
		s = otherMasses
	}
	switch question {
	case "sort":
		s = span{0.005, 150}
	case "live", "die", "remain":
		s = masses["star"]
	case "wear", "foretell", "heat":
		if role(k.card) != law.Wearing {
			break
		}
		s.low = lightestMatter
		if l, ok := lightest[kind]; ok {
			s.low = l
		}
		// An object at a threshold has crossed it: it is not asked again.
		if t, ok := k.lastThreshold(kind); ok && t > 0 {
			s.low = t * (1 + 1e-9)
		}
	}
	if k.card.Accepts.Column == "mass" {
		low, high := k.use.Limits()
		s.low, s.high = max(s.low, low), min(s.high, math.Nextafter(high, 0))
		if !(s.low < s.high) { // the law's range lies outside the usual one
			s = span{max(low, 1e-19), math.Nextafter(high, 0)}
			s.high = min(s.high, max(1e20, 10*s.low))
		}
	}
	if s.high < s.low {
		s.high = 10 * s.low
	}
	return s
}

func role(c law.Card) law.Role {
	p, _ := law.ProcessNamed(c.Process)
	return p.Role
}

func (k *kit) metalsSpan() span {
	s := span{1e-4, 0.06}
	if k.card.Accepts.Column == "metals" {
		low, high := k.use.Limits()
		s.low, s.high = max(s.low, low), min(s.high, math.Nextafter(high, 0))
	}
	return s
}

// object draws an object of a kind.
func (k *kit) object(r *rand.Rand, question, kind string) object {
	o := object{kind: k.set.Kind(kind), mass: logUniform(r, k.massSpan(question, kind)), metals: logUniform(r, k.metalsSpan())}
	o.birth = o.mass
	if r.IntN(2) == 0 && question != "remain" {
		o.birth = o.mass * (1 + r.ExpFloat64())
	}
	o.place = uint8([]int{law.Bound, law.Adrift}[r.IntN(2)])
	if kind == "central-hole" {
		o.place = law.Central
	}
	o.origin = uint8([]int{law.Founded, law.Merged}[r.IntN(2)])
	o.composition = k.composition(r, kind, o.birth)
	o.radius = radius(kind, o.mass)
	return o
}

func (k *kit) composition(r *rand.Rand, kind string, mass float64) uint8 {
	switch kind {
	case "star", "brown-dwarf":
		return uint8([]int{law.Hydrogen, law.Hydrogen, law.Helium}[r.IntN(3)])
	case "white-dwarf":
		switch {
		case mass < 0.45:
			return law.Helium
		case mass < 1.05:
			return law.CarbonOxygen
		}
		return law.OxygenNeon
	case "neutron-star":
		return law.Neutrons
	case "black-hole", "central-hole":
		return law.Pure
	}
	for _, own := range k.card.Kinds {
		if own.Name == kind {
			return own.Composition
		}
	}
	return law.Iron
}

// radius is an object's radius, km.
func radius(kind string, mass float64) float64 {
	r := 0.0
	switch kind {
	case "star":
		r = structure.MainSequenceRadius(mass)
	case "brown-dwarf":
		r = 6.4e4
	case "neutron-star":
		r = 11.5
	case "black-hole", "central-hole":
		r = structure.HoleRadius(mass)
	default:
		r = structure.WhiteDwarfRadius(mass)
	}
	if !(r > 0 && r < math.Inf(1)) { // beyond the largest mass of its kind
		return 1
	}
	return r
}

// thresholds are the masses at which a kind turns into something else at the
// present parameters, the largest first, solMass.
func (k *kit) thresholds(kind string) []float64 {
	var out []float64
	for _, t := range k.card.Thresholds {
		if t.Kind == kind {
			out = append(out, k.use.ThresholdMass(t))
		}
	}
	slices.SortFunc(out, func(a, b float64) int {
		switch {
		case a > b:
			return -1
		case a < b:
			return 1
		}
		return 0
	})
	return out
}

func (k *kit) lastThreshold(kind string) (float64, bool) {
	t := k.thresholds(kind)
	if len(t) == 0 {
		return 0, false
	}
	return t[len(t)-1], true
}
