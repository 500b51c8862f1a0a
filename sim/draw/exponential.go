package draw

import "math/bits"

// layer is one layer of the ziggurat: bits j < inside are under the curve
// without a look at it, and x = (j + 1/2) width.
type layer struct {
	inside uint64
	width  float64 // right edge / 2^53
}

// edge is the right edge x of a layer and y = e^-x.
type edge struct{ x, y float64 }

// baseEdge is where the tail begins, the edge of the second layer.
const baseEdge = 1

// Exp returns an exponential of mean 1, never 0, with 53 random bits even
// near 0, where the earliest of many waiting times are found.
//
// Law: exact but for rounding (ziggurat of 256 layers; the tail is the edge
// plus another exponential). One step of 64 bits serves 98.9 % of draws.
//
// Source: Marsaglia and Tsang (2000), J. Stat. Software 5(8).
func (s Stream) Exp(object uint64, generation, number uint32) float64 {
	z := state(s.column(generation, number), object)
	b := mix(z)
	l := &layerTable[b&255]
	if j := b >> 11; j < l.inside {
		return float64((float64(int64(j)) + nearlyHalf) * l.width)
	}
	return outside(z, b)
}

// Exps fills dst with the Exp of objects first, first+1, ...
func (s Stream) Exps(dst []float64, first uint64, generation, number uint32) {
	c := s.column(generation, number)
	name, turned := c+first*phi, bits.RotateLeft64(c, halfRotation)
	done := exponentialBlocks(dst, name, turned)
	name += uint64(done) * phi
	for i := done; i < len(dst); i++ {
		z := mix(name) ^ turned
		name += phi
		b := mix(z)
		l := &layerTable[b&255]
		j := b >> 11
		if j >= l.inside {
			dst[i] = outside(z, b)
			continue
		}
		dst[i] = float64((float64(int64(j)) + nearlyHalf) * l.width)
	}
}

// outside finishes a draw whose first bits b fell outside the inner part of
// their layer, with further bits of the same draw's state z.
func outside(z, b uint64) float64 {
	tail := 0.0
	for {
		i, j := b&255, b>>11
		x := float64((float64(int64(j)) + nearlyHalf) * layerTable[i].width)
		if j < layerTable[i].inside {
			return tail + x
		}
		z += rejectStep
		b = mix(z)
		if i == 0 {
			// Beyond the base edge the law is the edge plus the same law.
			tail += edgeTable[baseEdge].x
			continue
		}
		if underCurve(edgeTable[i], edgeTable[i+1], x, uniform(b)) {
			return tail + x
		}
		z += rejectStep
		b = mix(z)
	}
}

// underCurve reports whether a point of a layer, at x and at share u of the
// layer's height, lies under e^-x. The chord from above and two terms of the
// series from below settle nearly all points before the exponential is needed.
func underCurve(right, left edge, x, u float64) bool {
	t := right.x - x
	if float64(u*(right.x-left.x)) >= t {
		return false
	}
	y := right.y + float64(u*(left.y-right.y))
	if below := t + float64(float64(t*t)/2); y < right.y+float64(right.y*below) {
		return true
	}
	return y < float64(right.y*expSmall(t))
}

// expSmall returns e^t for 0 ≤ t ≤ 0.8, the widest layer, to a few ulp: the
// Taylor series up to t^18/18!, in operations that round alike everywhere.
func expSmall(t float64) float64 {
	p := 1.0
	for n := 18.0; n >= 1; n-- {
		p = 1 + float64(float64(t*p)/n)
	}
	return p
}
