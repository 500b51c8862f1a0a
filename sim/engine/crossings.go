package engine

import (
	"math"

	"wane/sim/galaxy"
	"wane/sim/num"
)

// crossings finds, for each stay, the log10 date at which the object falls
// below the threshold (+Inf: not within the stay), and whether it is above at
// the start.
func (w *Workspace) crossings(x *galaxy.Warmth, stays []stay, end float64) ([]float64, []bool, error) {
	f, err := w.newFeeler(x, stays)
	if err != nil {
		return nil, nil, err
	}
	// What has fallen below in one stay is still below in the next, unless
	// something keeps it warmer there, or the threshold is a floor, which may
	// have fallen too.
	var first, next []int32
	for j, s := range stays {
		if s.follows {
			next = append(next, int32(j))
		} else {
			first = append(first, int32(j))
		}
	}
	if err := f.solve(first, end); err != nil {
		return nil, nil, err
	}
	open := next[:0]
	for _, j := range next {
		if x.Unit == "floor" || f.steady[j] > f.steady[j-1] || f.warm[j-1] && f.cross[j-1] >= stays[j-1].leave {
			open = append(open, j)
		}
	}
	return f.cross, f.warm, f.solve(open, end)
}

// solve finds the crossings of the chosen stays.
func (f *feeler) solve(which []int32, end float64) error {
	if len(which) == 0 {
		return nil
	}
	f.ages = grown(f.ages, len(which))
	ages := f.ages
	for k, j := range which {
		s := &f.stays[j]
		f.low[j] = youngest
		if s.enter > s.entered {
			f.low[j] = max(num.Sub10(s.enter, s.entered), youngest)
		}
		ages[k] = f.low[j]
	}
	g, err := f.excess(ages, which)
	if err != nil {
		return err
	}
	var open []int32
	for k, j := range which {
		f.glow[j] = g[k]
		if f.warm[j] = g[k] > 0; f.warm[j] {
			open = append(open, j)
		}
	}
	if open, err = f.bracket(open, end); err != nil {
		return err
	}
	if err := f.roots(open); err != nil {
		return err
	}
	for _, j := range open {
		s := &f.stays[j]
		f.cross[j] = min(max(later(s.entered, f.high[j]), s.enter), s.leave)
	}
	return nil
}

// bracket brings a crossing between low and high: by the guess of the nodes
// first, by the end of the stay where that fails. It returns the stays that
// have one.
func (f *feeler) bracket(open []int32, end float64) ([]int32, error) {
	if len(open) == 0 {
		return nil, nil
	}
	last := func(s *stay) float64 {
		l := min(s.leave, end, forever)
		if s.entered > l-unseen {
			l = num.Sub10(l, s.entered)
		}
		return l
	}
	guess, err := f.guesses(open)
	if err != nil {
		return nil, err
	}
	f.tops = grown(f.tops, len(open))
	tops := f.tops
	for k, j := range open {
		tops[k] = max(last(&f.stays[j]), f.low[j])
		if guess != nil && guess[k]+nodeMargin < tops[k] {
			tops[k] = max(guess[k]+nodeMargin, f.low[j])
		}
	}
	g, err := f.excess(tops, open)
	if err != nil {
		return nil, err
	}
	var have, missed []int32
	for k, j := range open {
		switch {
		case g[k] <= 0:
			f.high[j], f.ghigh[j] = tops[k], g[k]
			have = append(have, j)
		default:
			if f.low[j] < tops[k] {
				f.low[j], f.glow[j] = tops[k], g[k]
			}
			missed = append(missed, j)
		}
	}
	if err := f.raise(have, guess, open); err != nil {
		return nil, err
	}
	if guess == nil || len(missed) == 0 {
		return have, nil
	}
	tops = tops[:0]
	for _, j := range missed {
		tops = append(tops, max(last(&f.stays[j]), f.low[j]))
	}
	if g, err = f.excess(tops, missed); err != nil {
		return nil, err
	}
	for k, j := range missed {
		if g[k] <= 0 {
			f.high[j], f.ghigh[j] = tops[k], g[k]
			have = append(have, j)
		}
	}
	return have, nil
}

// raise moves the lower ends of brackets up to just below the guess.
func (f *feeler) raise(have []int32, guess []float64, open []int32) error {
	if guess == nil {
		return nil
	}
	var which []int32
	var ages []float64
	k := 0
	for _, j := range have {
		for open[k] != j {
			k++
		}
		if g := guess[k] - nodeMargin; g > f.low[j] && g < f.high[j] {
			which, ages = append(which, j), append(ages, g)
		}
	}
	if len(which) == 0 {
		return nil
	}
	g, err := f.excess(ages, which)
	if err != nil {
		return err
	}
	for k, j := range which {
		if g[k] > 0 {
			f.low[j], f.glow[j] = ages[k], g[k]
		} else {
			f.high[j], f.ghigh[j] = ages[k], g[k]
		}
	}
	return nil
}

const (
	youngest = 0.0   // log10 yr: nothing cools within a year of its birth
	forever  = 1e4   // log10 yr: as far as cooling is followed
	coolTol  = 2e-13 // of log10 age
)

// roots narrows the brackets [low, high] (log10 ages) to the crossing by the
// Illinois variant of regula falsi, all stays side by side, with a bisection
// where that is slow. The answer is in high.
func (f *feeler) roots(open []int32) error {
	open = append([]int32(nil), open...)
	low, high, glow, ghigh := f.low, f.high, f.glow, f.ghigh
	side := f.side[:len(low)]
	clear(side)
	f.ages = grown(f.ages, len(open))
	ages := f.ages
	for try := 0; len(open) > 0 && try < 200; try++ {
		for k, j := range open {
			x := (low[j]*ghigh[j] - high[j]*glow[j]) / (ghigh[j] - glow[j])
			if try%4 == 3 || !(x > low[j] && x < high[j]) {
				x = 0.5 * (low[j] + high[j])
			}
			ages[k] = x
		}
		g, err := f.excess(ages[:len(open)], open)
		if err != nil {
			return err
		}
		still := open[:0]
		for k, j := range open {
			// How far the zero can be from here, by the slope of the bracket.
			off := math.Abs(g[k]) * (high[j] - low[j]) / (glow[j] - ghigh[j])
			if g[k] > 0 {
				low[j], glow[j] = ages[k], g[k]
				if side[j] == 1 {
					ghigh[j] *= 0.5
				}
				side[j] = 1
			} else {
				high[j], ghigh[j] = ages[k], g[k]
				if side[j] == -1 {
					glow[j] *= 0.5
				}
				side[j] = -1
			}
			if off < coolTol || high[j]-low[j] < coolTol {
				high[j] = ages[k]
				continue
			}
			still = append(still, j)
		}
		open = still
	}
	return nil
}
