package scenario

import (
	"fmt"
	"strings"

	"wane/sim/galaxy"
	"wane/sim/scenario/quantity"
)

func comparison(quantity string) string {
	if quantity == "luminosity" {
		return "> 1e-6 Lsun"
	}
	return "> 798 K"
}

// ParseWarmth reads a comparison of a temperature ("> 798 K", "< 0.1 eV",
// "> 1.1 floor": times the object's own floor) or luminosity ("> 1e-6 Lsun").
// The value is positive and comes out in K or solLum.
func ParseWarmth(what, text string) (*galaxy.Warmth, error) {
	w := &galaxy.Warmth{Quantity: what, Unit: "K"}
	if what == "luminosity" {
		w.Unit = "solLum"
	}
	s := strings.TrimSpace(text)
	switch {
	case strings.HasPrefix(s, ">"):
		w.Above = true
	case !strings.HasPrefix(s, "<"):
		return nil, fmt.Errorf("%q: want > or < first, such as %q", cut(text), comparison(what))
	}
	s = strings.TrimSpace(s[1:])
	if strings.HasPrefix(s, "=") {
		return nil, fmt.Errorf("%q: want > or < alone, such as %q", cut(text), comparison(what))
	}
	if number, ok := strings.CutSuffix(s, "floor"); ok && what == "temperature" {
		number, _ = strings.CutSuffix(strings.TrimSpace(number), "times the")
		s, w.Unit = strings.TrimSpace(number), "floor"
	}
	unit := w.Unit
	if unit == "floor" {
		unit = ""
	}
	v, err := quantity.ParseFor(s, unit, false)
	if err != nil {
		return nil, err
	}
	if !(v > 0) {
		return nil, fmt.Errorf("%q: want > 0", cut(text))
	}
	w.Value = v
	return w, nil
}

func cut(text string) string {
	if r := []rune(text); len(r) > 40 {
		return string(r[:40]) + "..."
	}
	return text
}
