package num

import "math"

// Linear interpolates a table by straight lines between its knots and is
// constant outside them. It is safe for concurrent use.
type Linear struct {
	knots
	y, slope []float64
}

// NewLinear returns the interpolation of y over x, both of which it copies.
//
// Shapes: x, y: length n ≥ 2, finite; x strictly increasing.
func NewLinear(x, y []float64) (*Linear, error) {
	k, err := newKnots(x, y)
	if err != nil {
		return nil, err
	}
	return &Linear{knots: k, y: append([]float64(nil), y...), slope: slopes(x, y)}, nil
}

// At returns the value at x; NaN of NaN.
func (l *Linear) At(x float64) float64 {
	if v, yes := l.outside(x, l.y); yes {
		return v
	}
	i := l.interval(x)
	return l.y[i] + float64(l.slope[i]*(x-l.x[i]))
}

// Monotone interpolates a table by cubics with a continuous slope that rise or
// fall only where the table does, and is constant outside its knots. It is
// safe for concurrent use.
//
// Sources: Fritsch and Carlson (1980), SIAM J. Numer. Anal. 17, 238, for the
// conditions; Fritsch and Butland (1984), SIAM J. Sci. Stat. Comput. 5, 300, for
// the slopes, a weighted harmonic mean; three-point slopes at the ends.
// Checked against SciPy's PchipInterpolator.
type Monotone struct {
	knots
	y, slope, square, cube []float64
}

// NewMonotone returns the interpolation of y over x, both of which it copies.
//
// Shapes: x, y: length n ≥ 2, finite; x strictly increasing.
func NewMonotone(x, y []float64) (*Monotone, error) {
	k, err := newKnots(x, y)
	if err != nil {
		return nil, err
	}
	n, secant := len(x), slopes(x, y)
	d := make([]float64, n)
	d[0], d[n-1] = secant[0], secant[n-2]
	for i := 1; i < n-1; i++ {
		before, after := x[i]-x[i-1], x[i+1]-x[i]
		if secant[i-1] > 0 && secant[i] > 0 || secant[i-1] < 0 && secant[i] < 0 {
			w1, w2 := float64(2*after)+before, after+float64(2*before)
			d[i] = (w1 + w2) / (w1/secant[i-1] + w2/secant[i])
		}
	}
	if n > 2 {
		d[0] = endSlope(x[1]-x[0], x[2]-x[1], secant[0], secant[1])
		d[n-1] = endSlope(x[n-1]-x[n-2], x[n-2]-x[n-3], secant[n-2], secant[n-3])
	}
	m := &Monotone{knots: k, y: append([]float64(nil), y...), slope: d, square: make([]float64, n-1), cube: make([]float64, n-1)}
	for i := range n - 1 {
		h := x[i+1] - x[i]
		m.square[i] = (float64(3*secant[i]) - float64(2*d[i]) - d[i+1]) / h
		m.cube[i] = (d[i] - float64(2*secant[i]) + d[i+1]) / float64(h*h)
	}
	return m, nil
}

// At returns the value at x; NaN of NaN.
func (m *Monotone) At(x float64) float64 {
	if v, yes := m.outside(x, m.y); yes {
		return v
	}
	i := m.interval(x)
	h := x - m.x[i]
	return m.y[i] + float64(h*(m.slope[i]+float64(h*(m.square[i]+float64(h*m.cube[i])))))
}

// endSlope is the slope of the parabola through the last three knots, kept
// between 0 and three times the last secant.
func endSlope(h, next, secant, nextSecant float64) float64 {
	d := (float64((2*h+next)*secant) - float64(h*nextSecant)) / (h + next)
	switch {
	case d == 0 || secant == 0 || (d > 0) != (secant > 0):
		return 0
	case (secant > 0) != (nextSecant > 0) && math.Abs(d) > 3*math.Abs(secant):
		return 3 * secant
	}
	return d
}

// slopes returns the slopes of the straight lines between knots.
func slopes(x, y []float64) []float64 {
	s := make([]float64, len(x)-1)
	for i := range s {
		s[i] = (y[i+1] - y[i]) / (x[i+1] - x[i])
	}
	return s
}
