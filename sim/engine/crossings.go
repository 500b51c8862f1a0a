package engine

import (
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
	for _, j := range which {
		s := &f.stays[j]
		f.low[j] = youngest
		if s.enter > s.entered {
			f.low[j] = max(num.Sub10(s.enter, s.entered), youngest)
		}
	}
	if err := f.guesses(which); err != nil {
		return err
	}
	found, which, err := f.near(which, end)
	if err != nil {
		return err
	}
	f.settle(found)
	open, rest, err := f.before(which, end)
	if err != nil {
		return err
	}
	f.ages = grown(f.ages, len(rest))
	for k, j := range rest {
		f.ages[k] = f.low[j]
	}
	g, err := f.excess(f.ages, rest)
	if err != nil {
		return err
	}
	for k, j := range rest {
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
	f.settle(open)
	return nil
}

// settle makes dates of the ages at which stays cross.
func (f *feeler) settle(found []int32) {
	for _, j := range found {
		s := &f.stays[j]
		f.cross[j] = min(max(later(s.entered, f.high[j]), s.enter), s.leave)
	}
}

// before looks just before the guesses that lie within their stays. A stay that
// is warm there was so from the start, since nothing gets warmer in a stay: that
// is its bracket's lower end. One that is not has an upper end; it is among the
// rest, whose start is still to be looked at.
func (f *feeler) before(which []int32, end float64) (open, rest []int32, err error) {
	var tried []int32
	f.ages = f.ages[:0]
	for _, j := range which {
		f.high[j] = never
		if a := f.guess[j] - nodeMargin; a > f.low[j] && a < f.lastAge(j, end) {
			tried, f.ages = append(tried, j), append(f.ages, a)
		} else {
			rest = append(rest, j)
		}
	}
	if len(tried) == 0 {
		return nil, rest, nil
	}
	ages := f.ages
	g, err := f.excess(ages, tried)
	if err != nil {
		return nil, nil, err
	}
	for k, j := range tried {
		if g[k] > 0 {
			f.low[j], f.glow[j], f.warm[j] = ages[k], g[k], true
			open = append(open, j)
		} else {
			f.high[j], f.ghigh[j] = ages[k], g[k]
			rest = append(rest, j)
		}
	}
	return open, rest, nil
}

// lastAge is the log10 age at which a stay, or the run, ends.
func (f *feeler) lastAge(j int32, end float64) float64 {
	s := &f.stays[j]
	l := min(s.leave, end, forever)
	if s.entered > l-unseen {
		l = num.Sub10(l, s.entered)
	}
	return l
}

// bracket brings a crossing between low and high: by the guess of the nodes
// first, by the end of the stay where that fails. It returns the stays that
// have one.
func (f *feeler) bracket(open []int32, end float64) ([]int32, error) {
	var have, asked []int32
	f.tops = f.tops[:0]
	for _, j := range open {
		if f.high[j] < never {
			have = append(have, j)
			continue
		}
		top := max(f.lastAge(j, end), f.low[j])
		if guess := f.guess[j] + nodeMargin; guess < top {
			top = max(guess, f.low[j])
		}
		asked, f.tops = append(asked, j), append(f.tops, top)
	}
	for again := false; len(asked) > 0; again = true {
		g, err := f.excess(f.tops, asked)
		if err != nil {
			return nil, err
		}
		var missed []int32
		for k, j := range asked {
			top := f.tops[k]
			if g[k] <= 0 {
				f.high[j], f.ghigh[j] = top, g[k]
				have = append(have, j)
				continue
			}
			if f.low[j] < top {
				f.low[j], f.glow[j] = top, g[k]
			}
			if !again && top < f.lastAge(j, end) {
				missed = append(missed, j)
			}
		}
		asked, f.tops = missed, f.tops[:0]
		for _, j := range missed {
			f.tops = append(f.tops, max(f.lastAge(j, end), f.low[j]))
		}
	}
	return have, nil
}
