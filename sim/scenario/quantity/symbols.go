package quantity

import (
	"fmt"
	"strings"

	"wane/sim/physics/constant"
)

// symbol is a named unit. Those with prefixes take the SI ones.
type symbol struct {
	name     string
	dim      dimension
	scale    float64
	exponent int
	prefixes bool
}

// symbols is a function so that nobody can change it.
func symbols() []symbol {
	return []symbol{
		{"Msun", mass, constant.Sun, 0, false},
		{"solMass", mass, constant.Sun, 0, false},
		{"Mjup", mass, constant.GMJup / constant.G, 0, false},
		{"jupiterMass", mass, constant.GMJup / constant.G, 0, false},
		{"Mearth", mass, constant.GMEarth / constant.G, 0, false},
		{"earthMass", mass, constant.GMEarth / constant.G, 0, false},
		{"Rsun", length, constant.SunR, 0, false},
		{"solRad", length, constant.SunR, 0, false},
		{"Lsun", power, constant.SunL, 0, false},
		{"solLum", power, constant.SunL, 0, false},
		{"pc", length, constant.Parsec, 0, true},
		{"AU", length, constant.AU, 0, false},
		{"au", length, constant.AU, 0, false},
		{"ly", length, constant.C * constant.Year, 0, false},
		{"lyr", length, constant.C * constant.Year, 0, false},
		{"yr", time, constant.Year, 0, true},
		{"d", time, 86400, 0, false},
		{"h", time, 3600, 0, false},
		{"min", time, 60, 0, false},
		{"s", time, 1, 0, true},
		{"m", length, 1, 0, true},
		{"g", mass, 1, -3, true},
		{"t", mass, 1, 3, false},
		{"u", mass, constant.AtomicMass, 0, false},
		{"K", temperature, 1, 0, true},
		{"J", energy, 1, 0, true},
		{"eV", energy, constant.EV, 0, true},
		{"erg", energy, 1, -7, false},
		{"W", power, 1, 0, true},
		{"Hz", rate, 1, 0, true},
		{"%", pure, 1, -2, false},
	}
}

var prefixes = []struct {
	name     string
	exponent int
}{
	{"", 0}, {"k", 3}, {"M", 6}, {"G", 9}, {"T", 12}, {"P", 15}, {"E", 18}, {"Z", 21}, {"Y", 24},
	{"c", -2}, {"m", -3}, {"u", -6}, {"n", -9}, {"p", -12}, {"f", -15}, {"a", -18},
}

func find(name string) (Unit, bool) {
	all := symbols()
	for _, s := range all {
		if s.name == name {
			return Unit{dim: s.dim, scale: s.scale, exponent: s.exponent}, true
		}
	}
	for _, p := range prefixes[1:] {
		base, ok := strings.CutPrefix(name, p.name)
		if !ok {
			continue
		}
		for _, s := range all {
			if s.prefixes && s.name == base {
				return Unit{dim: s.dim, scale: s.scale, exponent: s.exponent + p.exponent}, true
			}
		}
	}
	return Unit{}, false
}

// unknownUnit is a unit that is not known, and the one that may be meant.
type unknownUnit struct{ name, meant string }

func (u unknownUnit) Error() string {
	if u.meant == "" {
		return fmt.Sprintf("unknown unit %q", u.name)
	}
	return fmt.Sprintf("unknown unit %q (did you mean %q?)", u.name, u.meant)
}

// unknown names the unit it doesn't know and the one that may be meant.
func unknown(name, rest string) error {
	if name == "" {
		return fmt.Errorf("%q is no part of a unit", rest)
	}
	plain := map[string]string{
		"year": "yr", "years": "yr", "yrs": "yr", "a": "yr", "sec": "s", "second": "s", "seconds": "s", "day": "d", "days": "d",
		"hour": "h", "hours": "h", "kelvin": "K", "parsec": "pc", "parsecs": "pc", "metre": "m", "meter": "m", "m_sun": "Msun",
		"gram": "g", "kilogram": "kg", "sun": "Msun", "suns": "Msun", "lightyear": "ly", "watt": "W", "tonne": "t", "percent": "%",
	}
	if s, ok := plain[strings.ToLower(name)]; ok {
		return unknownUnit{name, s}
	}
	for _, s := range symbols() {
		for _, p := range prefixes {
			if (p.name == "" || s.prefixes) && strings.EqualFold(p.name+s.name, name) {
				return unknownUnit{name, p.name + s.name}
			}
		}
	}
	return unknownUnit{name: name}
}
