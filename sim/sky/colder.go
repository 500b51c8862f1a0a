package sky

import (
	"math"
	"sort"

	"wane/sim/num"
)

// LogColderSince returns log10 of the date after which the sky is colder than
// 10^logT kelvin for good: +Inf if never (its horizon is as warm), -Inf if
// always (logT = +Inf).
func (s *Sky) LogColderSince(logT float64) float64 {
	limit := inf
	for i := len(s.pieces) - 1; i >= 0; i-- {
		p := s.pieces[i]
		if since := p.colderSince(logT, s.logT0, limit); since > zero {
			return math.Min(p.date(since), limit)
		}
		limit = p.origin
	}
	if len(s.pieces) > 1 && s.pieces[0].temperature(limit, s.logT0) >= logT {
		return limit
	}
	return zero
}

// colderSince does it for one piece that ends at s = until; -Inf if all of
// the piece is colder.
func (p *piece) colderSince(logT, logT0, until float64) float64 {
	above := func(s float64) float64 { return p.temperature(s, logT0) - logT }
	hot := func(s float64) bool { return p.temperature(s, logT0) >= logT }
	if p.origin == zero && until < inf && hot(until) {
		return until
	}
	if until > p.tail.s && hot(p.tail.s) {
		return p.colderInTail(hot, until)
	}
	n := sort.Search(len(p.coldAt), func(i int) bool { return p.coldAt[i] < logT })
	switch {
	case n == len(p.s): // the last node is warmer, the piece ends before it
		return crossing(above, p.s[n-1], until)
	case n > 0:
		return crossing(above, p.s[n-1], math.Min(p.s[n], until))
	case p.origin != zero || logT == inf:
		return zero
	}
	// Before the table the relic radiation follows a power of time.
	return p.s[0] + (p.relic(p.s[0], logT0)-logT)*num.Ln10/p.x.slope[0]
}

func (p *piece) colderInTail(hot func(float64) bool, until float64) float64 {
	low, high := p.tail.s, p.tail.s+1.0/64
	for d := 1.0 / 32; hot(math.Min(high, until)); d *= 2 {
		if high >= math.Min(until, 1e300) {
			return inf
		}
		low, high = high, p.tail.s+d
	}
	return bisect(hot, low, math.Min(high, until))
}

// bisect returns the first number found at which hot no longer holds; it
// holds at low and not at high.
func bisect(hot func(float64) bool, low, high float64) float64 {
	for {
		mid := low + (high-low)/2
		if !(mid > low && mid < high) {
			return high
		}
		if hot(mid) {
			low = mid
		} else {
			high = mid
		}
	}
}

// crossing returns where a falling function passes zero between low and high,
// by false position with the Illinois step; by halving where it is infinite.
func crossing(f func(float64) float64, low, high float64) float64 {
	up, down := f(low), f(high)
	for range 50 {
		if up-down-(up-down) != 0 || up < 0 || down >= 0 {
			break
		}
		mid := low + (high-low)*(up/(up-down))
		if mid <= low || mid >= high {
			return high
		}
		v := f(mid)
		switch {
		case math.Abs(v) < 1e-14:
			return mid
		case v > 0:
			low, up, down = mid, v, down/2
		default:
			high, down, up = mid, v, up/2
		}
	}
	return bisect(func(s float64) bool { return f(s) >= 0 }, low, high)
}
