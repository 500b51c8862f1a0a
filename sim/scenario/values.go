package scenario

import (
	"errors"
	"math"
	"strconv"
	"strings"

	"wane/sim/scenario/quantity"
)

// MaxRealisations is how many realisations a run may have at most.
const MaxRealisations = 1_000_000

// quantity reads a value with a unit, as its log10 if asked, and checks that
// low <= value <= high (both log10 if asked).
func (b *builder) quantity(key string, n *node, unit string, log10 bool, low, high float64) (float64, bool) {
	text := n.text
	switch n.form {
	case aText, aLoose:
	case aNumber:
		if text = decimalText(n.text); unit != "" && text != "0" && !isInfinite(text) {
			b.fault(n.at, "%s: %s has no unit: want %s", key, n.text, b.span(unit, log10, low, high, n.text))
			return 0, false
		} else if text == "0" && unit != "" {
			text = "0 " + unit // nothing is nothing in every unit
		}
	default:
		b.fault(n.at, "%s: got %s, want %s", key, n.form, quantityWanted(unit))
		return 0, false
	}
	v, err := quantity.ParseFor(text, unit, log10)
	if err != nil {
		b.fault(n.at, "%s: %v", key, err)
		return 0, false
	}
	if v = snap(v, low, high, log10); !(v >= low && v <= high) {
		b.fault(n.at, "%s: %s: want %s", key, n.written(), b.span(unit, log10, low, high, ""))
		return 0, false
	}
	return v, true
}

// snap takes a limit that was rounded in print for the limit itself: messages
// show six digits of a number, and four of a power of ten.
func snap(v, low, high float64, log10 bool) float64 {
	for _, limit := range []float64{low, high} {
		slack := 1e-6 * math.Abs(limit)
		if log10 {
			slack = 3e-4
		}
		if math.Abs(v-limit) <= slack && !(v >= low && v <= high) {
			return limit
		}
	}
	return v
}

func isInfinite(text string) bool {
	switch strings.TrimLeft(text, "+-") {
	case "nan", "inf":
		return true
	}
	return false
}

func quantityWanted(unit string) string {
	if unit == "" {
		return "a number"
	}
	return `a number with its unit, such as "1 ` + quantity.Shown(unit) + `"`
}

// span is the allowed range in words, or an example if the unit is missing.
func (b *builder) span(unit string, log10 bool, low, high float64, bare string) string {
	if bare != "" {
		return `"` + bare + " " + quantity.Shown(unit) + `", in quotes`
	}
	return spanOf(unit, log10, low, high)
}

func spanOf(unit string, log10 bool, low, high float64) string {
	show := quantity.Format
	if log10 {
		show = quantity.FormatLog10
	}
	switch {
	case high >= 1e300 && (math.IsInf(low, -1) || low <= -1e300):
		return "any " + quantity.Shown(unit)
	case high >= 1e300:
		return ">= " + show(low, unit)
	case math.IsInf(low, -1):
		return "<= " + show(high, unit)
	}
	return show(low, "") + " .. " + show(high, unit)
}

// decimalText turns a TOML number into one that quantities read.
func decimalText(text string) string {
	text = strings.ReplaceAll(text, "_", "")
	if len(text) > 2 && text[0] == '0' && strings.ContainsRune("xob", rune(text[1])) {
		if v, err := strconv.ParseUint(text, 0, 64); err == nil {
			return strconv.FormatUint(v, 10)
		}
	}
	switch strings.TrimLeft(text, "+-") {
	case "0", "0.0":
		return "0"
	}
	return text
}

// whole reads a whole number, low <= number <= high.
func (b *builder) whole(key string, n *node, low, high uint64) (uint64, bool) {
	bad := func() (uint64, bool) {
		limit := strconv.FormatUint(low, 10) + " .. " + strconv.FormatUint(high, 10)
		b.fault(n.at, "%s: %s: want a whole number, %s", key, n.written(), limit)
		return 0, false
	}
	switch n.form {
	case aNumber, aLoose:
	default:
		b.fault(n.at, "%s: got %s, want a whole number", key, n.form)
		return 0, false
	}
	text := decimalText(n.text)
	v, err := strconv.ParseUint(strings.TrimPrefix(text, "+"), 10, 64)
	if errors.Is(err, strconv.ErrSyntax) {
		f, ferr := quantity.ParseFor(text, "", false) // 1e5
		if ferr != nil || f != math.Trunc(f) || f < 0 || f > 1<<53 {
			return bad()
		}
		v, err = uint64(f), nil
	}
	if err != nil || v < low || v > high {
		return bad()
	}
	return v, true
}
