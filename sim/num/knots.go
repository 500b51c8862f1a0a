package num

import (
	"fmt"
	"math"
)

// knots is a sorted table of x with a guide: for each of as many equal parts
// of the range as there are intervals, the interval that its left end is in.
type knots struct {
	x     []float64
	guide []int32
	scale float64 // parts per unit of x
}

func newKnots(x, y []float64) (knots, error) {
	n := len(x)
	if n < 2 || len(y) != n {
		return knots{}, fmt.Errorf("num: interpolation: %d knots and %d values: want as many, at least 2", n, len(y))
	}
	for i := range x {
		if math.IsNaN(x[i]-x[i]) || math.IsNaN(y[i]-y[i]) {
			return knots{}, fmt.Errorf("num: interpolation: knot %d is %g with value %g: want finite numbers", i, x[i], y[i])
		}
		if i > 0 && x[i] <= x[i-1] {
			return knots{}, fmt.Errorf("num: interpolation: knot %d is %g after %g: want rising knots", i, x[i], x[i-1])
		}
	}
	k := knots{x: append([]float64(nil), x...), guide: make([]int32, n-1), scale: float64(n-1) / (x[n-1] - x[0])}
	for part, i := 0, 0; part < n-1; part++ {
		for i < n-2 && k.part(k.x[i+1]) <= part {
			i++
		}
		k.guide[part] = int32(i)
	}
	return k, nil
}

// part returns the guide's entry for x within the range.
func (k *knots) part(x float64) int {
	return min(int(float64((x-k.x[0])*k.scale)), len(k.x)-2)
}

// interval returns i with x[i] ≤ at < x[i+1], for at within the range; the
// last interval includes its right end.
func (k *knots) interval(at float64) int {
	i := int(k.guide[k.part(at)])
	for i > 0 && at < k.x[i] {
		i--
	}
	for i < len(k.x)-2 && at >= k.x[i+1] {
		i++
	}
	return i
}

// outside reports whether at lies outside the range, and the end it is at:
// interpolation is constant there, and NaN of NaN.
func (k *knots) outside(at float64, y []float64) (value float64, yes bool) {
	switch last := len(k.x) - 1; {
	case at <= k.x[0]:
		return y[0], true
	case at >= k.x[last]:
		return y[last], true
	case math.IsNaN(at):
		return at, true
	}
	return 0, false
}
