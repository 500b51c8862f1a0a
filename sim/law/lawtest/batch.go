package lawtest

import (
	"math/rand/v2"

	"wane/sim/law"
	"wane/sim/num"
)

// entry is one row before it is laid out in columns: an object or a pair, a
// galaxy, draws and dates.
type entry struct {
	objects [2]object
	galaxy  map[string]float64
	loose   map[string]float64 // columns of neither, by name
}

// isWords tells whether a column holds codes.
func isWords(question, column string) bool {
	info, _ := law.ColumnNamed(question, column)
	return info.Words != ""
}

// split is a column's name without the _1 or _2 of a pair, and which of the
// two it is about.
func split(question, column string) (base string, which int) {
	if question == "meet" || question == "merge" {
		if n := len(column) - 2; n > 0 {
			switch column[n:] {
			case "_1":
				return column[:n], 0
			case "_2":
				return column[:n], 1
			}
		}
	}
	return column, 0
}

// entries draws n plausible rows for a question.
func (k *kit) entries(q law.Question, n int) []entry {
	r := random(q.Name)
	kinds := k.kinds(q.Name)
	out := make([]entry, n)
	for i := range out {
		e := entry{loose: map[string]float64{}}
		for j := range e.objects {
			e.objects[j] = k.object(r, q.Name, kinds[(i+j*r.IntN(len(kinds)))%len(kinds)])
		}
		if q.Name == "rate" {
			e.galaxy = k.galaxy(r, q.Inputs)
		} else {
			e.loose = loose(r, q)
		}
		out[i] = e
	}
	return k.possible(q, out)
}

// possible gives each remnant a kind that its star may leave: the host asks
// what remains only of those that chance has picked.
func (k *kit) possible(q law.Question, entries []entry) []entry {
	if q.Name != "remain" || !k.card.Answers("die") {
		return entries
	}
	die := k.question("die")
	out, err := k.ask("die", lay(die, entries))
	if err != nil {
		return entries // reported where die is checked
	}
	for i := range entries {
		chances := map[uint8]float64{}
		for _, word := range die.Words {
			chances[k.set.Kind(word)] = out.Values(law.ChanceColumn(word))[i]
		}
		if o := &entries[i].objects[0]; chances[o.kind] == 0 {
			for _, word := range die.Words {
				if kind := k.set.Kind(word); chances[kind] > 0 {
					o.kind = kind
				}
			}
		}
	}
	return entries
}

// loose draws the columns that belong to no object.
func loose(r *rand.Rand, q law.Question) map[string]float64 {
	date := 10.14 + 100*r.Float64()*r.Float64()
	if q.Name == "metals" {
		date = 8 + 2.5*r.Float64()
	}
	return map[string]float64{
		"u":                 uniform(r),
		"e":                 r.ExpFloat64(),
		"log10_date":        date,
		"log10_age":         12 * r.Float64(),
		"log10_since":       date - 4*r.Float64(),
		"log10_four_volume": 4*date + r.NormFloat64(),
		"ln_a":              -10 + 80*r.Float64(),
		"separation":        num.Exp10(-2 + 5*r.Float64()),
		"eccentricity":      0.99 * r.Float64(),
	}
}

// uniform is a draw like the host's: never 0, never 1.
func uniform(r *rand.Rand) float64 { return (float64(r.Uint64()>>11) + 0.5) / (1 << 53) }

func (e *entry) value(question, column string) float64 {
	if question == "rate" {
		return e.galaxy[column]
	}
	base, which := split(question, column)
	o := &e.objects[which]
	switch base {
	case "mass":
		return o.mass
	case "birth_mass":
		return o.birth
	case "metals":
		return o.metals
	case "radius":
		return o.radius
	}
	return e.loose[base]
}

func (e *entry) word(question, column string) uint8 {
	base, which := split(question, column)
	o := &e.objects[which]
	switch base {
	case "kind":
		return o.kind
	case "place":
		return o.place
	case "origin":
		return o.origin
	}
	return o.composition
}

// lay puts entries into the columns of a question.
func lay(q law.Question, entries []entry) law.Batch {
	b := law.Batch{Rows: len(entries)}
	for _, name := range q.Inputs {
		if isWords(q.Name, name) {
			words := make([]uint8, len(entries))
			for i := range entries {
				words[i] = entries[i].word(q.Name, name)
			}
			b.Columns = append(b.Columns, law.Codes(name, words))
			continue
		}
		values := make([]float64, len(entries))
		for i := range entries {
			values[i] = entries[i].value(q.Name, name)
		}
		b.Columns = append(b.Columns, law.Numbers(name, values))
	}
	return b
}

// plausible is a batch of n rows for a question.
func (k *kit) plausible(q law.Question, n int) law.Batch { return lay(q, k.entries(q, n)) }
