package quantity

import (
	"fmt"
	"strconv"
	"strings"

	"wane/sim/num"
	"wane/sim/physics/constant"
)

// dimension counts powers of length, mass, time and temperature.
type dimension [4]int

// The dimensions that have a name.
var (
	pure        = dimension{}
	length      = dimension{1, 0, 0, 0}
	mass        = dimension{0, 1, 0, 0}
	time        = dimension{0, 0, 1, 0}
	temperature = dimension{0, 0, 0, 1}
	speed       = dimension{1, 0, -1, 0}
	energy      = dimension{2, 1, -2, 0}
	power       = dimension{2, 1, -3, 0}
	rate        = dimension{0, 0, -1, 0}
	density     = dimension{-3, 1, 0, 0}
	four        = dimension{0, 0, 4, 0}
)

// String names what the dimension measures, with its article.
func (d dimension) String() string {
	switch d {
	case pure:
		return "a pure number"
	case length:
		return "a length"
	case mass:
		return "a mass"
	case time:
		return "a time"
	case temperature:
		return "a temperature"
	case speed:
		return "a speed"
	case energy:
		return "an energy"
	case power:
		return "a power"
	case rate:
		return "a rate"
	case density:
		return "a density"
	case four:
		return "a four-volume"
	}
	s := ""
	for i, base := range []string{"m", "kg", "s", "K"} {
		if d[i] == 0 {
			continue
		}
		if s != "" {
			s += "."
		}
		s += base
		if d[i] != 1 {
			s += strconv.Itoa(d[i])
		}
	}
	return "a quantity in " + s
}

func (d dimension) plus(e dimension, times int) dimension {
	for i := range d {
		d[i] += e[i] * times
	}
	return d
}

// Unit is a unit of measurement: scale * 10^exponent in SI.
type Unit struct {
	Symbol   string // as it was written
	dim      dimension
	scale    float64
	exponent int
}

// ParseUnit reads a unit. The empty text is the unit of a pure number.
func ParseUnit(text string) (Unit, error) {
	p := unitParser{rest: strings.TrimSpace(text)}
	u, err := p.product(0)
	if err == nil && p.rest != "" {
		err = fmt.Errorf("unit %q: %q is no part of a unit", text, p.rest)
	}
	if err != nil {
		return Unit{}, err
	}
	u.Symbol = strings.TrimSpace(text)
	return u, nil
}

type unitParser struct{ rest string }

// maxNesting and maxPower keep odd input from running away.
const (
	maxNesting = 4
	maxPower   = 12
)

// product reads factors up to the end or a closing bracket.
func (p *unitParser) product(depth int) (Unit, error) {
	u := Unit{scale: 1}
	if depth > maxNesting {
		return u, fmt.Errorf("brackets nest too deep")
	}
	times := 1
	for p.rest != "" && p.rest[0] != ')' {
		switch p.rest[0] {
		case '/':
			times = -1
			p.rest = p.rest[1:]
			continue
		case '.', '*', ' ':
			if times != -1 || p.rest[0] != ' ' {
				times = 1
			}
			p.rest = p.rest[1:]
			continue
		}
		f, err := p.factor(depth)
		if err != nil {
			return u, err
		}
		if u, err = u.multiply(f, times); err != nil {
			return u, err
		}
		times = 1
	}
	return u, nil
}

func (u Unit) multiply(f Unit, times int) (Unit, error) {
	u.dim = u.dim.plus(f.dim, times)
	u.exponent += f.exponent * times
	for range max(times, -times) {
		if times > 0 {
			u.scale *= f.scale
		} else {
			u.scale /= f.scale
		}
	}
	for _, d := range u.dim {
		if d > maxPower || d < -maxPower {
			return u, fmt.Errorf("power %d is beyond %d", d, maxPower)
		}
	}
	if !(u.scale > 1e-200 && u.scale < 1e200) {
		return u, fmt.Errorf("the unit is beyond the range of numbers")
	}
	return u, nil
}

func (p *unitParser) factor(depth int) (Unit, error) {
	var f Unit
	if p.rest[0] == '(' {
		p.rest = p.rest[1:]
		inner, err := p.product(depth + 1)
		if err != nil {
			return f, err
		}
		if !strings.HasPrefix(p.rest, ")") {
			return f, fmt.Errorf("a bracket is not closed")
		}
		p.rest = p.rest[1:]
		f = inner
	} else {
		n := 0
		for n < len(p.rest) && !strings.ContainsRune("./*() ^-+0123456789", rune(p.rest[n])) {
			n++
		}
		name := p.rest[:n]
		s, ok := find(name)
		if !ok {
			return f, unknown(name, p.rest)
		}
		p.rest = p.rest[n:]
		f = s
	}
	power, err := p.power()
	if err != nil {
		return f, err
	}
	return Unit{scale: 1}.multiply(f, power)
}

// power reads "3", "-2", "**-1", "^2"; 1 if there is none.
func (p *unitParser) power() (int, error) {
	s := p.rest
	marked := false
	for _, mark := range []string{"**", "^"} {
		if after, ok := strings.CutPrefix(s, mark); ok {
			s, marked = after, true
			break
		}
	}
	n := 0
	if n < len(s) && (s[n] == '-' || s[n] == '+') {
		n++
	}
	for n < len(s) && isDigit(s[n]) {
		n++
	}
	if n == 0 && !marked {
		return 1, nil
	}
	power, err := strconv.Atoi(s[:n])
	if err != nil || power > maxPower || power < -maxPower {
		return 0, fmt.Errorf("%q is no power of a unit", s[:n])
	}
	p.rest = s[n:]
	return power, nil
}

// ratio is how many of unit to one of unit u is: factor * 10^exponent.
func (u Unit) ratio(to Unit) (factor float64, exponent int, ok bool) {
	factor, exponent = u.scale/to.scale, u.exponent-to.exponent
	massEnergy := energy.plus(mass, -1)
	switch u.dim.plus(to.dim, -1) {
	case pure:
		return factor, exponent, true
	case massEnergy: // an energy where a mass is wanted
		return factor / (constant.C * constant.C), exponent, true
	case energy.plus(temperature, -1): // an energy where a temperature is wanted
		return factor / constant.Boltzmann, exponent, true
	}
	return 0, 0, false
}

// log10Ratio is the log10 of ratio.
func log10Ratio(factor float64, exponent int) float64 {
	if factor == 1 {
		return float64(exponent)
	}
	return num.Log10(factor) + float64(exponent)
}
