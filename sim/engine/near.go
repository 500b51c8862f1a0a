package engine

import "math"

// near finds the crossings of stays near their guesses, in three looks: at the
// guess, where the slope at the nodes leads from there, and where the secant
// through both leads, if that is the crossing. What it does not find is left to
// a search that takes nothing for granted.
func (f *feeler) near(which []int32, end float64) (found, rest []int32, err error) {
	within := func(j int32, age float64) bool { return age > f.low[j] && age < f.lastAge(j, end) }
	var seen []int32
	f.ages = f.ages[:0]
	for _, j := range which {
		if within(j, f.guess[j]) && f.slope[j] < 0 {
			seen, f.ages = append(seen, j), append(f.ages, f.guess[j])
		} else {
			rest = append(rest, j)
		}
	}
	for look := 0; len(seen) > 0; look++ {
		g, err := f.excess(f.ages, seen)
		if err != nil {
			return nil, nil, err
		}
		kept := seen[:0]
		for k, j := range seen {
			p, age, slope := &f.probes[j], f.ages[k], f.slope[j]
			if look > 0 {
				slope = (g[k] - p.g) / (age - p.at)
			}
			off := -g[k] / slope
			switch {
			case look > 0 && math.Abs(off) < coolTol:
				f.high[j], f.warm[j] = age, true // nothing gets warmer in a stay: it was above from the start
				found = append(found, j)
			case look < 2 && within(j, age+off):
				*p = probe{at: age, g: g[k]}
				f.ages[len(kept)] = age + off
				kept = append(kept, j)
			default:
				rest = append(rest, j)
			}
		}
		seen, f.ages = kept, f.ages[:len(kept)]
	}
	return found, rest, nil
}
