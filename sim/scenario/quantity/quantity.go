package quantity

import (
	"errors"
	"fmt"
	"math"
	"strings"
	"unicode/utf8"
)

// Quantity is a number with a unit, as somebody wrote it.
type Quantity struct {
	Text string // as written
	Unit Unit
	number
}

// maxText is the longest text taken for a quantity.
const maxText = 200

// Parse reads a quantity. The unit may be missing: [Quantity.Pure] tells.
func Parse(text string) (Quantity, error) {
	q := Quantity{Text: text}
	s := strings.TrimSpace(text)
	bad := func(format string, a ...any) (Quantity, error) {
		return Quantity{}, fmt.Errorf("%q: %w", short(text), fmt.Errorf(format, a...))
	}
	switch strings.ToLower(strings.TrimLeft(s, "+-")) {
	case "":
		return Quantity{}, fmt.Errorf("%q: no number", short(text))
	case "nan", "inf", "infinity":
		return bad("want a finite number")
	}
	if len(text) > maxText {
		return bad("longer than %d characters", maxText)
	}
	n, rest, err := scanNumber(s)
	if err != nil {
		return bad("%w", err)
	}
	q.number = n
	if q.Unit, err = ParseUnit(rest); err != nil {
		return bad("%w", err)
	}
	return q, nil
}

// Pure tells whether the quantity has no unit.
func (q Quantity) Pure() bool { return q.Unit.Symbol == "" }

// Is names what the quantity measures: "a mass", "a pure number".
func (q Quantity) Is() string { return q.Unit.dim.String() }

// In converts to a unit.
//
// Errors: the quantity has no unit and needs one, has one and needs none, is
// of another dimension, or is beyond the range of float64.
func (q Quantity) In(unit string) (float64, error) {
	factor, exponent, err := q.to(unit)
	if err != nil {
		return 0, err
	}
	v := shift(float64(q.value*factor), exponent)
	if math.IsInf(v, 0) || (v == 0 && q.sign != 0) {
		return 0, fmt.Errorf("%q: beyond the range of numbers, 1e-308 .. 1e308 %s", q.Text, Shown(unit))
	}
	return v, nil
}

// Log10In returns the log10 of the quantity in a unit, -Inf for zero. It
// never overflows. A negative quantity is an error.
func (q Quantity) Log10In(unit string) (float64, error) {
	factor, exponent, err := q.to(unit)
	switch {
	case err != nil:
		return 0, err
	case q.sign < 0:
		return 0, fmt.Errorf("%q: want >= 0", q.Text)
	case q.sign == 0:
		return math.Inf(-1), nil
	}
	return q.log10 + log10Ratio(factor, exponent), nil
}

func (q Quantity) to(unit string) (factor float64, exponent int, err error) {
	u, err := ParseUnit(unit)
	if err != nil {
		return 0, 0, err
	}
	factor, exponent, ok := q.Unit.ratio(u)
	switch {
	case q.Pure() && u.dim != pure:
		return 0, 0, fmt.Errorf("%q: no unit: want %s, such as %q", q.Text, u.dim, example(q.Text, unit))
	case !ok && u.dim == pure:
		return 0, 0, fmt.Errorf("%q is %s: want a pure number, without unit", q.Text, q.Unit.dim)
	case !ok:
		return 0, 0, fmt.Errorf("%q is %s: want %s, such as %q", q.Text, q.Unit.dim, u.dim, "1 "+Shown(unit))
	}
	return factor, exponent, nil
}

// wanted says what is allowed in place of an unknown unit.
func wanted(unit string) string {
	u, err := ParseUnit(unit)
	if err != nil || u.dim == pure {
		return "a pure number, without unit"
	}
	return fmt.Sprintf("%s, such as %q", u.dim, "1 "+Shown(unit))
}

// example is the text with the unit it lacks.
func example(text, unit string) string { return strings.TrimSpace(text) + " " + Shown(unit) }

// shift returns v * 10^n, correctly rounded where 10^n is exact.
func shift(v float64, n int) float64 {
	for n > 22 {
		v, n = v*1e22, n-22
	}
	for n < -22 {
		v, n = v/1e22, n+22
	}
	p := 1.0
	for range max(n, -n) {
		p *= 10
	}
	if n < 0 {
		return v / p
	}
	return v * p
}

// ParseFor reads a quantity and converts it to a unit, as its log10 if asked:
// the value of a parameter or a column. A missing unit is an error unless
// unit is empty, which means a pure number.
func ParseFor(text, unit string, log10 bool) (float64, error) {
	q, err := Parse(text)
	if stray := (unknownUnit{}); errors.As(err, &stray) && stray.meant == "" {
		return 0, fmt.Errorf("%w: want %s", err, wanted(unit))
	}
	if err != nil {
		return 0, err
	}
	if log10 {
		return q.Log10In(unit)
	}
	return q.In(unit)
}

// short keeps a text from filling a message.
func short(text string) string {
	const most = 40
	if len(text) <= most {
		return text
	}
	n := most
	for n > 0 && !utf8.RuneStart(text[n]) {
		n--
	}
	return text[:n] + "..."
}
