package law

import (
	"math"
	"strings"
)

// ColumnInfo describes a column of the catalogue: everything a law may read.
type ColumnInfo struct {
	Name  string
	Unit  string // VOUnit spelling; empty for a pure number
	Words string // for a column of codes: which word list, "kind", "place", ...
	Doc   string
	// Low <= value <= High is what the host may send. Infinite is allowed
	// where it says so; see each Doc.
	Low, High float64
}

var inf = math.Inf(1)

// columns of objects, of chance and of one-off questions.
var columns = []ColumnInfo{
	{Name: "kind", Words: "kind", Doc: "what the object is"},
	{Name: "place", Words: "place", Doc: "bound, adrift or central"},
	{Name: "origin", Words: "origin", Doc: "founded, or merged out of others"},
	{Name: "composition", Words: "composition", Doc: "what it is mainly made of"},
	{Name: "mass", Unit: "solMass", Doc: "present mass", Low: 0, High: 1e20},
	{Name: "birth_mass", Unit: "solMass", Doc: "mass at the last change of kind or merger", Low: 0, High: 1e20},
	{Name: "metals", Doc: "heavy elements by mass (Sun: 0.02)", Low: 0, High: 1},
	{Name: "radius", Unit: "km", Doc: "radius of the object", Low: 0, High: 1e20},
	{Name: "u", Doc: "a uniform draw, 0 < u < 1", Low: 0, High: 1},
	{Name: "e", Doc: "a unit exponential draw", Low: 0, High: 800},
	{Name: "log10_date", Unit: "yr", Doc: "log10 of years since the Big Bang", Low: -inf, High: inf},
	{Name: "log10_age", Unit: "yr", Doc: "log10 of years since it became what it is", Low: -inf, High: inf},
	{Name: "log10_since", Unit: "yr", Doc: "log10 of years since dark energy began to decay; -Inf: it has not", Low: -inf, High: inf},
	{Name: "log10_four_volume", Unit: "yr4", Doc: "log10 of the four-volume of the past light cone, c = 1", Low: -inf, High: inf},
	{Name: "ln_a", Doc: "natural log of the scale factor, 0 today", Low: -inf, High: inf},
	{Name: "separation", Unit: "AU", Doc: "semi-major axis", Low: 0, High: 1e20},
	{Name: "eccentricity", Doc: "orbital eccentricity", Low: 0, High: 1},
}

// GalaxyValues are the columns a rate may read. Counts and masses are of the
// real galaxy, not of the sample. Numbers, masses and sums also exist per
// kind, as number_white_dwarf and so on.
//
//	number, mass_bound          objects bound, their mass (unborn ones count)
//	sum_C                       sum over bound objects of susceptibility to clock C
//	sum_sought_C                sum of how much they are sought, encounter clocks
//	reading_C                   the clock's reading
//	carried_off                 mass carried off by ejection and infall
//	central_mass                mass of the central hole
//	log10_date                  date
//	founded_number, founded_mass, founded_radius, founded_dispersion
//	                            the galaxy at the start: N0, M0 (solMass), R0 (pc), v0 (km/s)
//	galaxy_radius, galaxy_dispersion
//	                            what the frame law answers now; not for the frame law itself
func galaxyValue(name string) (ColumnInfo, bool) {
	c := ColumnInfo{Name: name, Low: 0, High: inf}
	switch name {
	case "log10_date":
		return ColumnInfo{Name: name, Unit: "yr", Doc: "log10 of years since the Big Bang", Low: -inf, High: inf}, true
	case "carried_off", "central_mass", "founded_mass":
		c.Unit = "solMass"
		return c, true
	case "founded_number":
		return c, true
	case "founded_radius", "galaxy_radius":
		c.Unit = "pc"
		return c, true
	case "founded_dispersion", "galaxy_dispersion":
		c.Unit = "km/s"
		return c, true
	}
	for _, p := range []string{"number", "mass_bound"} {
		if name == p || strings.HasPrefix(name, p+"_") {
			if p == "mass_bound" {
				c.Unit = "solMass"
			}
			return c, true
		}
	}
	for _, p := range []string{"sum_", "reading_"} {
		if strings.HasPrefix(name, p) && len(name) > len(p) {
			return c, true
		}
	}
	return ColumnInfo{}, false
}

// ColumnNamed finds an input column for a question of a role. Columns of a
// pair end in _1 and _2.
func ColumnNamed(question, name string) (ColumnInfo, bool) {
	if question == "rate" {
		return galaxyValue(name)
	}
	base := name
	if question == "meet" || question == "merge" {
		if s, ok := strings.CutSuffix(name, "_1"); ok {
			base = s
		} else if s, ok := strings.CutSuffix(name, "_2"); ok {
			base = s
		}
	}
	for _, c := range columns {
		if c.Name == base {
			c.Name = name
			return c, true
		}
	}
	return ColumnInfo{}, false
}

// object is every column of an object.
var object = []string{"kind", "mass", "composition", "metals", "radius", "place", "origin"}

// mayRead tells whether the host can fill a column for a question.
func mayRead(r Role, question, column string) bool {
	if _, known := ColumnNamed(question, column); !known {
		return false
	}
	switch question {
	case "density":
		return contains([]string{"ln_a", "log10_date", "log10_since"}, column)
	case "end":
		return contains([]string{"log10_date", "log10_four_volume"}, column)
	case "mass", "birth":
		return column == "u"
	case "metals":
		return column == "log10_date" || column == "u"
	case "sort", "die":
		return column == "mass" || column == "metals"
	case "live":
		return contains([]string{"kind", "mass", "metals", "composition"}, column)
	case "remain":
		return contains([]string{"kind", "mass", "metals", "u"}, column)
	case "rate":
		return true
	case "meet", "merge":
		return readsPair(question, column)
	case "shine":
		return contains([]string{"kind", "mass", "composition", "log10_age"}, column)
	case "wear":
		return contains(object, column) || column == "birth_mass"
	case "foretell":
		if r == Turning {
			return contains(object, column) || column == "u" || column == "e"
		}
		return contains(object, column) || column == "birth_mass"
	}
	return contains(object, column)
}

func readsPair(question, column string) bool {
	base, first := strings.CutSuffix(column, "_1")
	if !first {
		base, _ = strings.CutSuffix(column, "_2")
	}
	if base == column {
		if question == "meet" {
			return column == "u"
		}
		return column == "separation" || column == "eccentricity"
	}
	return contains(object, base)
}
