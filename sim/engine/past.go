package engine

import (
	"math"
	"math/bits"
)

// past is the history of the readings through a quiet leg, piece by piece:
// from the date of a piece on they grow by its rates.
type past struct {
	t      []float64 // date of each piece
	v      []float64 // of each piece: reading and rate of each clock in turn
	clocks int
	from   []int32 // per interval of date, a piece that begins no later
	low    uint64  // bits of the first date
	shift  uint
}

func (x *past) begin(clocks int) {
	x.clocks, x.t, x.v, x.from = clocks, x.t[:0], x.v[:0], x.from[:0]
}

// note adds a piece, in the place of one that began at the same date.
func (x *past) note(t float64, reading, rate []float64) {
	if n := len(x.t); n > 0 && x.t[n-1] == t {
		x.t, x.v = x.t[:n-1], x.v[:len(x.v)-2*x.clocks]
	}
	x.t = append(x.t, t)
	for k := range x.clocks {
		x.v = append(x.v, reading[k], rate[k])
	}
}

// piece returns the date of a piece, and reading and rate of clock k then.
func (x *past) piece(i, k int) (t, reading, rate float64) {
	v := x.v[2*(i*x.clocks+k):]
	return x.t[i], v[0], v[1]
}

// at is what clock k showed at date t.
func (x *past) at(k int, t float64) float64 { return x.in(x.find(t), k, t) }

// in is what clock k showed at date t, which lies in piece i.
func (x *past) in(i, k int, t float64) float64 {
	t0, reading, rate := x.piece(i, k)
	return reading + rate*(t-t0)
}

// index prepares find for many look-ups: where the pieces begin that start in
// each of some intervals of date, more than there are pieces.
func (x *past) index() {
	x.from = x.from[:0]
	if len(x.t) < 64 {
		return
	}
	x.low = math.Float64bits(x.t[0])
	span := math.Float64bits(x.t[len(x.t)-1]) - x.low
	x.shift = uint(max(0, bits.Len64(span)-min(16, bits.Len(uint(len(x.t)))+1)))
	at := 0
	for i := range span>>x.shift + 1 {
		for at+1 < len(x.t) && (math.Float64bits(x.t[at+1])-x.low)>>x.shift < i {
			at++
		}
		x.from = append(x.from, int32(at))
	}
}

// find returns the piece that holds date t.
func (x *past) find(t float64) int {
	low, high := 0, len(x.t)
	if len(x.from) > 0 && t > 0 {
		if b := math.Float64bits(t); b > x.low {
			i := int((b - x.low) >> x.shift)
			last := len(x.from) - 1
			low = int(x.from[min(i, last)])
			if i+1 <= last {
				high = min(high, int(x.from[i+1])+2)
			}
		}
	}
	for high-low > 1 {
		if mid := (low + high) / 2; x.t[mid] <= t {
			low = mid
		} else {
			high = mid
		}
	}
	return low
}
