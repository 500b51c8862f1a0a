package inquiry

import (
	"fmt"
	"math"
	"strings"

	"wane/sim/law"
	"wane/sim/scenario/quantity"
)

// sweep replaces one input by a column of values.
type sweep struct {
	raw    string
	values []float64
}

// today is the age of the universe, log10 yr: 13.79e9 yr (Planck Collaboration
// 2020, A&A 641, A6).
const today = 10.13956

// batch builds the question's input columns. It returns the plain names of
// those that are neither given nor can be filled in.
func (a *asking) batch(q law.Question, rows int, s *sweep) (law.Batch, []string, error) {
	b := law.Batch{Rows: rows}
	var missing []string
	for _, c := range inputs(q) {
		if c.list != "" {
			words, ok, err := a.fillWords(c, rows, s)
			if err != nil {
				return b, nil, err
			}
			if !ok {
				missing = append(missing, c.name)
			}
			b.Columns = append(b.Columns, law.Codes(c.raw, words))
			continue
		}
		values, ok := a.fillNumbers(c, rows, s)
		if !ok {
			missing = append(missing, c.name)
		}
		b.Columns = append(b.Columns, law.Numbers(c.raw, values))
	}
	return b, missing, nil
}

func (a *asking) fillNumbers(c column, rows int, s *sweep) ([]float64, bool) {
	if s != nil && s.raw == c.raw {
		return s.values, true
	}
	out := make([]float64, rows)
	if g, ok := a.numbers[c.raw]; ok {
		for i := range out {
			out[i] = g.value
		}
		return out, true
	}
	constant := func(v float64, why string) ([]float64, bool) {
		for i := range out {
			out[i] = v
		}
		a.why[c.raw] = why
		return out, true
	}
	switch strings.TrimSuffix(strings.TrimSuffix(c.raw, "_1"), "_2") {
	case "metals":
		return constant(0.02, "as in the Sun")
	case "u":
		return constant(0.5, "the median draw")
	case "e":
		return constant(math.Ln2, "the median draw")
	case "eccentricity":
		return constant(0, "a circle")
	case "log10_since":
		return constant(math.Inf(-1), "dark energy has not decayed")
	case "ln_a":
		if _, dated := a.numbers["log10_date"]; !dated {
			return constant(0, "today")
		}
	case "log10_date":
		if _, scaled := a.numbers["ln_a"]; !scaled && a.use.Card.Process == "expansion" {
			return constant(today, "today")
		}
	case "birth_mass":
		if m, ok := a.fillNumbers(column{raw: "mass"}, rows, s); ok {
			a.why[c.raw] = "as the mass"
			return m, true
		}
	case "radius":
		return a.fillRadius(c, rows, s)
	}
	return out, false
}

func (a *asking) fillRadius(c column, rows int, s *sweep) ([]float64, bool) {
	mass, ok := a.fillNumbers(column{raw: "mass"}, rows, s)
	if !ok {
		return nil, false
	}
	kinds, ok, err := a.fillWords(column{raw: "kind", list: "kind"}, rows, s)
	if err != nil || !ok {
		return nil, false
	}
	out := make([]float64, rows)
	for i := range out {
		out[i] = radius(a.kinds[kinds[i]], mass[i])
	}
	a.why[c.raw] = "of a " + a.kinds[kinds[0]] + " of this mass"
	return out, true
}

func (a *asking) fillWords(c column, rows int, s *sweep) ([]uint8, bool, error) {
	out := make([]uint8, rows)
	if code, ok := a.codes[c.raw]; ok {
		for i := range out {
			out[i] = code
		}
		return out, true, nil
	}
	switch c.list {
	case "place":
		a.why[c.raw] = "assumed"
		for i := range out {
			out[i] = law.Bound
		}
		return out, true, nil
	case "origin":
		a.why[c.raw] = "assumed"
		for i := range out {
			out[i] = law.Founded
		}
		return out, true, nil
	case "kind":
		code, why, err := a.kind(c.raw)
		if err != nil {
			return nil, false, err
		}
		a.why[c.raw] = why
		for i := range out {
			out[i] = code
		}
		return out, true, nil
	case "composition":
		kindColumn := "kind" + strings.TrimPrefix(c.raw, "composition")
		massColumn := "mass" + strings.TrimPrefix(c.raw, "composition")
		kinds, ok, err := a.fillWords(column{raw: kindColumn, list: "kind"}, rows, s)
		if err != nil || !ok {
			return nil, ok, err
		}
		mass, ok := a.fillNumbers(column{raw: massColumn}, rows, s)
		if !ok {
			return out, false, nil
		}
		for i := range out {
			out[i] = composition(a.kinds[kinds[i]], mass[i])
		}
		a.why[c.raw] = "usual at this kind and mass"
		return out, true, nil
	}
	return out, false, nil
}

// kind picks the kind when none was given: the only one the law accepts, or
// the usual one among several.
func (a *asking) kind(raw string) (code uint8, why string, err error) {
	accepted := a.use.Card.Accepts.Kinds
	find := func(word string) uint8 {
		for i, k := range a.kinds {
			if k == word {
				return uint8(i)
			}
		}
		return law.NoWord
	}
	if len(accepted) == 1 {
		return find(accepted[0]), "the only one the law speaks for", nil
	}
	for _, usual := range []string{"black-hole", "white-dwarf", "star"} {
		for _, k := range accepted {
			if k == usual {
				return find(k), "assumed; the law speaks for " + strings.Join(accepted, ", "), nil
			}
		}
	}
	if len(accepted) > 0 {
		return find(accepted[0]), "assumed; the law speaks for " + strings.Join(accepted, ", "), nil
	}
	return 0, "", fmt.Errorf("law %s: %s is missing: give one of %s", a.use.ID(), raw, strings.Join(a.kinds, ", "))
}

// composition is what an object of a kind and mass is usually made of: light
// white dwarfs come of stars that never burned helium, heavy ones of stars
// that burned carbon.
func composition(kind string, mass float64) uint8 {
	switch kind {
	case "star", "brown-dwarf":
		return law.Hydrogen
	case "white-dwarf":
		switch {
		case mass < 0.53:
			return law.Helium
		case mass <= 1.05:
			return law.CarbonOxygen
		}
		return law.OxygenNeon
	case "neutron-star":
		return law.Neutrons
	case "black-hole", "central-hole":
		return law.Pure
	}
	return law.Iron
}

// speaks is the fault of asking the law about an object that is none of its
// business.
func (a *asking) speaks(in law.Batch) error {
	accepts := a.use.Card.Accepts
	if len(accepts.Kinds) > 0 {
		code, given := a.codes["kind"]
		if given && !a.use.Speaks(code, inside(a.use, "mass"), inside(a.use, "metals")) {
			return fmt.Errorf("law %s: it does not speak for kind %s (it does for %s)", a.use.ID(), a.kinds[code], strings.Join(accepts.Kinds, ", "))
		}
	}
	if accepts.Column == "" {
		return nil
	}
	v := in.Values(accepts.Column)
	low, high := a.use.Limits()
	if v != nil && !(v[0] >= low && v[0] < high) {
		info, _ := law.ColumnNamed("", accepts.Column)
		want := ""
		if !math.IsInf(low, -1) {
			want = "from " + quantity.Format(low, info.Unit)
		}
		if !math.IsInf(high, 1) {
			want += " to below " + quantity.Format(high, info.Unit)
		}
		return fmt.Errorf("law %s: %s %s is outside its range: want %s", a.use.ID(), accepts.Column,
			quantity.Format(v[0], info.Unit), strings.TrimPrefix(strings.TrimSpace(want), "to "))
	}
	return nil
}

// inside is some value of a column within the law's range.
func inside(u *law.Use, column string) float64 {
	if u.Card.Accepts.Column != column {
		return 1
	}
	low, high := u.Limits()
	switch {
	case !math.IsInf(low, 0):
		return low
	case !math.IsInf(high, 0):
		return high - math.Abs(high)/2 - 1e-9
	}
	return 1
}
