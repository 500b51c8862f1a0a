package lawtest

import (
	"math"

	"wane/sim/law"
)

const (
	subnormal = 5e-324
	almost1   = 1 - 1.0/(1<<53)
)

// cornersOf are the extremes of a column in a question. Where zero stands for
// an object that is no more (mass, radius, separation), the least is the least
// number above it.
func (k *kit) cornersOf(question, column string) []float64 {
	inf := math.Inf(1)
	base, _ := split(question, column)
	switch base {
	case "mass":
		return k.within("mass", subnormal, 1e-300, 1e-19, 1e-3, 0.08, 1, 8, 100, 1e10, 1e20)
	case "birth_mass", "radius", "separation":
		return []float64{subnormal, 1e-300, 1, 1e20}
	case "metals":
		return k.within("metals", 0, subnormal, 0.02, 1)
	case "u":
		return []float64{1.0 / (1 << 53), 0.5, almost1}
	case "e":
		return []float64{1.0 / (1 << 53), 1, 800}
	case "eccentricity":
		return []float64{0, subnormal, almost1}
	case "log10_age":
		return []float64{-inf, -300, -10, 0, 10, 1e3, 1e15, 1e300}
	case "log10_since":
		return []float64{-inf, -300, 0, 10, 1e3, 1e15}
	case "log10_four_volume":
		return []float64{-inf, -300, 0, 40, 1e3, 1e15, 1e300}
	case "ln_a":
		return []float64{-700, -70, 0, 70, 1e4, 1e15}
	case "log10_date":
		switch question {
		case "metals":
			return []float64{0, 5, 9, 10.14, 14, 100, 1e3}
		case "end":
			return []float64{-inf, -300, 0, 10, 1e3, 1e15, 1e300}
		}
		return []float64{-60, 0, 10.14, 100, 1e3, 1e15, 1e300}
	}
	return nil
}

// within keeps the values that the law accepts, and adds the two ends of what
// it accepts.
func (k *kit) within(column string, values ...float64) []float64 {
	if k.card.Accepts.Column != column {
		return values
	}
	low, high := k.use.Limits()
	var out []float64
	for _, v := range append(values, low, math.Nextafter(high, math.Inf(-1))) {
		if v >= low && v < high && v >= values[0] && v <= values[len(values)-1] {
			out = append(out, v)
		}
	}
	return out
}

// put sets a column of an entry.
func (e *entry) put(question, column string, v float64) {
	base, which := split(question, column)
	o := &e.objects[which]
	switch base {
	case "mass":
		o.mass = v
		o.birth = max(o.birth, v)
	case "birth_mass":
		o.birth = v
	case "metals":
		o.metals = v
	case "radius":
		o.radius = v
	default:
		e.loose[base] = v
	}
}

// corners are rows with one column, two, or all at an extreme.
func (k *kit) corners(q law.Question) []entry {
	if q.Name == "rate" {
		return k.cornerGalaxies(q)
	}
	var out []entry
	base := func() entry {
		e := k.entries(q, 1+len(out)%7)
		return e[len(e)-1]
	}
	type extreme struct {
		column string
		values []float64
	}
	var all []extreme
	for _, column := range q.Inputs {
		if isWords(q.Name, column) {
			continue
		}
		x := extreme{column, k.cornersOf(q.Name, column)}
		if len(x.values) == 0 {
			continue
		}
		all = append(all, x)
		for _, v := range x.values {
			for range 3 {
				e := base()
				e.put(q.Name, column, v)
				out = append(out, e)
			}
		}
	}
	if len(all) == 0 {
		return k.entries(q, 7)
	}
	r := random("corners " + q.Name)
	for range 300 {
		e := base()
		for _, x := range all {
			if r.IntN(3) > 0 {
				e.put(q.Name, x.column, x.values[r.IntN(len(x.values))])
			}
		}
		out = append(out, e)
	}
	return k.possible(q, append(out, k.otherStuff(q)...))
}

// otherStuff are plausible objects made of every composition in turn.
func (k *kit) otherStuff(q law.Question) []entry {
	out := k.entries(q, 3*len(law.CompositionWords))
	for i := range out {
		for j := range out[i].objects {
			out[i].objects[j].composition = uint8(i % len(law.CompositionWords))
		}
	}
	return out
}

// checkDomain asks in the corners of every column, at the presets and with
// each parameter at each end of its range.
func (k *kit) checkDomain() {
	k.domain("")
	for _, p := range k.card.Parameters {
		for _, v := range extremes(p) {
			k.with(p.Name, v).domain(" with " + setting(p, v))
		}
	}
}

func (k *kit) domain(when string) {
	for _, q := range k.card.Questions {
		if _, err := k.ask(q.Name, lay(q, k.corners(q))); err != nil {
			k.wrong("domain", q.Name, "in a corner"+when+": ", err)
		}
		if when == "" {
			continue
		}
		if _, err := k.ask(q.Name, k.plausible(q, 200)); err != nil {
			k.wrong("domain", q.Name, "plausible rows"+when+": ", err)
		}
	}
}

// extremes are the values of a parameter worth trying besides its preset.
func extremes(p law.Parameter) []float64 {
	var out []float64
	if len(p.Words) > 0 {
		for i := range p.Words {
			if float64(i) != p.Preset {
				out = append(out, float64(i))
			}
		}
		return out
	}
	for _, v := range []float64{p.Low, p.High, p.Preset - 1, p.Preset + 1} {
		if v >= p.Low && v <= p.High && v != p.Preset && !math.IsInf(v, 0) && !math.IsNaN(v) {
			out = append(out, v)
		}
	}
	return out
}
