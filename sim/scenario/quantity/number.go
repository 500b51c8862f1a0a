package quantity

import (
	"fmt"
	"math"
	"strconv"
	"strings"

	"wane/sim/num"
)

// number is a decimal number of any size.
type number struct {
	sign  int     // -1, 0, 1
	value float64 // nearest float64: 0 or an infinity outside its range
	log10 float64 // of the absolute value; -Inf for 0
}

// maxExponent bounds the decimal exponent: beyond it, log10 itself overflows.
const maxExponent = 1e300

// scanNumber reads the number at the start of text and returns the rest.
//
//	number = [sign] decimal [times power] | [sign] power
//	power  = "10^" exponent | "10**" exponent
//	times  = "x" | "*" | "×"
func scanNumber(text string) (number, string, error) {
	sign, rest := 1, text
	if s := strings.TrimPrefix(rest, "-"); s != rest {
		sign, rest = -1, s
	} else {
		rest = strings.TrimPrefix(rest, "+")
	}
	if exponent, after, ok := cutPower(rest); ok {
		return scanPower(sign, 1, 0, exponent, after)
	}
	n := decimalLength(rest)
	if n == 0 {
		return number{}, text, fmt.Errorf("no number at its start")
	}
	digits := rest[:n]
	rest = rest[n:]
	for _, times := range []string{"x10", "*10", "×10", " x 10", " * 10", " × 10"} {
		if after, ok := strings.CutPrefix(rest, times); ok {
			if exponent, after, ok := cutPower("10" + after); ok {
				mantissa, log10 := decimal(digits)
				return scanPower(sign, mantissa, log10, exponent, after)
			}
		}
	}
	value, log10 := decimal(digits)
	return finish(sign, value, log10, rest)
}

func finish(sign int, value, log10 float64, rest string) (number, string, error) {
	switch {
	case math.IsInf(log10, -1):
		sign = 0
	case math.Abs(log10) > maxExponent || log10 != log10:
		return number{}, rest, fmt.Errorf("its exponent is beyond 1e300")
	}
	return number{sign: sign, value: float64(sign) * value, log10: log10}, rest, nil
}

// scanPower finishes mantissa * 10^exponent, log10 being that of the mantissa.
func scanPower(sign int, mantissa, log10 float64, exponent, rest string) (number, string, error) {
	e, err := readExponent(exponent)
	if err != nil {
		return number{}, rest, err
	}
	var value float64
	switch {
	case e == math.Trunc(e) && math.Abs(e) < 400:
		// Correctly rounded, as if written with an e.
		value, _ = strconv.ParseFloat(strconv.FormatFloat(mantissa, 'f', -1, 64)+"e"+strconv.Itoa(int(e)), 64)
	default:
		value = num.Exp10(log10 + e)
	}
	return finish(sign, value, log10+e, rest)
}

// cutPower splits "10^1100 yr" into "1100" and " yr".
func cutPower(text string) (exponent, rest string, ok bool) {
	after, ok := strings.CutPrefix(text, "10^")
	if !ok {
		if after, ok = strings.CutPrefix(text, "10**"); !ok {
			return "", text, false
		}
	}
	if strings.HasPrefix(after, "(") {
		end := strings.IndexByte(after, ')')
		if end < 0 {
			return after, "", true // readExponent complains
		}
		return after[1:end], after[end+1:], true
	}
	n := 0
	if after != "" && (after[0] == '-' || after[0] == '+') {
		n = 1
	}
	if s, _, ok := cutPower(after[n:]); ok { // 10^10^26
		n += len("10^")
		n += signedLength(after[n:])
		_ = s
		return after[:n], after[n:], true
	}
	n += decimalLength(after[n:])
	return after[:n], after[n:], true
}

func signedLength(text string) int {
	if text != "" && (text[0] == '-' || text[0] == '+') {
		return 1 + decimalLength(text[1:])
	}
	return decimalLength(text)
}

// readExponent reads the exponent of a power of ten: a decimal number, or one
// more power of ten.
func readExponent(text string) (float64, error) {
	sign, digits := 1.0, text
	if s, ok := strings.CutPrefix(digits, "-"); ok {
		sign, digits = -1, s
	} else {
		digits = strings.TrimPrefix(digits, "+")
	}
	if inner, rest, ok := cutPower(digits); ok && rest == "" {
		n := signedLength(inner)
		if n == 0 || n != len(inner) {
			return 0, fmt.Errorf("its exponent %q is no number", text)
		}
		e, err := strconv.ParseFloat(inner, 64)
		if err != nil {
			return 0, fmt.Errorf("its exponent %q is no number", text)
		}
		return sign * num.Exp10(e), nil
	}
	if n := decimalLength(digits); n == 0 || n != len(digits) {
		return 0, fmt.Errorf("its exponent %q is no number", text)
	}
	e, err := strconv.ParseFloat(digits, 64)
	if err != nil {
		return 0, fmt.Errorf("its exponent is beyond 1e300")
	}
	return sign * e, nil
}

// decimalLength is the length of the unsigned decimal number at the start of
// text, 0 if there is none. An e without digits after it belongs to the unit
// ("10eV").
func decimalLength(text string) int {
	i, digits := 0, 0
	for i < len(text) && (isDigit(text[i]) || text[i] == '.') {
		if text[i] == '.' {
			if strings.Contains(text[:i], ".") || i+1 >= len(text) || !isDigit(text[i+1]) {
				break // "10.Msun" is no decimal point
			}
		} else {
			digits++
		}
		i++
	}
	if digits == 0 {
		return 0
	}
	if i < len(text) && (text[i] == 'e' || text[i] == 'E') {
		j := i + 1
		if j < len(text) && (text[j] == '-' || text[j] == '+') {
			j++
		}
		k := j
		for k < len(text) && isDigit(text[k]) {
			k++
		}
		if k > j {
			return k
		}
	}
	return i
}

func isDigit(c byte) bool { return c >= '0' && c <= '9' }

// decimal returns the value of a decimal text and its log10: exact for powers
// of ten, and from a mantissa in 1 .. 10 otherwise, so that 2.5e1100 loses
// nothing to its exponent.
func decimal(text string) (value, log10 float64) {
	value, _ = strconv.ParseFloat(text, 64) // out of range: 0 or Inf, as wanted
	mantissa, exponent := text, 0.0
	if i := strings.IndexAny(text, "eE"); i >= 0 {
		mantissa = text[:i]
		exponent, _ = strconv.ParseFloat(text[i+1:], 64)
	}
	whole, part, _ := strings.Cut(mantissa, ".")
	exponent += float64(len(whole) - 1)
	digits := whole + part
	stripped := strings.TrimLeft(digits, "0")
	exponent -= float64(len(digits) - len(stripped))
	stripped = strings.TrimRight(stripped, "0")
	switch stripped {
	case "":
		return 0, math.Inf(-1)
	case "1":
		return value, exponent
	}
	m, _ := strconv.ParseFloat(stripped[:1]+"."+stripped[1:], 64)
	return value, exponent + num.Log10(m)
}
