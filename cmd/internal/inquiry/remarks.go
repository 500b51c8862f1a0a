package inquiry

import (
	"wane/sim/law"
)

// radius of an object, km; 0 where it is not known.
func radius(kind uint8, mass float64, composition uint8) float64 { return 0 }

// remarks adds what the roles leave unsaid.
func (a *asking) remarks(out *Answer) {
	p, _ := law.ProcessNamed(a.use.Card.Process)
	for _, q := range out.Questions {
		switch {
		case q == "shine":
			out.Notes = append(out.Notes, "without any floor: the sky, dark matter or decaying nucleons may keep it warmer")
		case q == "foretell" && p.Role == law.Wearing:
			out.Notes = append(out.Notes, "counted from when it begins to wear, if nothing else gets there first")
		case q == "heat":
			out.Notes = append(out.Notes, "it wears only while the sky is colder than this temperature")
		}
	}
}
