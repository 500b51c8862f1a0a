package engine

import "math"

const (
	youngest = 0.0   // log10 yr: nothing cools within a year of its birth
	forever  = 1e4   // log10 yr: as far as cooling is followed
	coolTol  = 2e-13 // of log10 age
)

// probe is what a search for a crossing remembers of the ages it looked at.
type probe struct {
	at, g         float64 // the last one
	before, gThen float64 // the one before it
	width         float64 // of the bracket, when it was last halved
	slow          uint8   // tries since then
}

// roots narrows the brackets [low, high] (log10 ages) to the crossing, all
// stays side by side, by secants through the last two ages looked at: what cools
// does so smoothly but for kinks, and two ages on the crossing's side of a kink
// are enough. Where a secant leaves the bracket, or three have not halved it,
// the bracket is halved. The answer is in high.
func (f *feeler) roots(open []int32) error {
	open = append([]int32(nil), open...)
	f.ages = grown(f.ages, len(open))
	for _, j := range open {
		f.probes[j] = probe{at: f.low[j], g: f.glow[j], before: f.high[j], gThen: f.ghigh[j], width: f.high[j] - f.low[j]}
	}
	for try := 0; len(open) > 0 && try < 200; try++ {
		for k, j := range open {
			f.ages[k] = f.nextAge(j)
		}
		g, err := f.excess(f.ages[:len(open)], open)
		if err != nil {
			return err
		}
		still := open[:0]
		for k, j := range open {
			if !f.narrow(j, f.ages[k], g[k]) {
				still = append(still, j)
			}
		}
		open = still
	}
	return nil
}

// nextAge is the next age to look at.
func (f *feeler) nextAge(j int32) float64 {
	p, low, high := &f.probes[j], f.low[j], f.high[j]
	if p.slow < 3 {
		if x := (p.at*p.gThen - p.before*p.g) / (p.gThen - p.g); x > low && x < high {
			return x
		}
	}
	return 0.5 * (low + high)
}

// narrow takes an age that was looked at into the bracket, and tells whether
// the crossing is found: then it is in high.
func (f *feeler) narrow(j int32, age, g float64) bool {
	p, low, high, glow, ghigh := &f.probes[j], f.low[j], f.high[j], f.glow[j], f.ghigh[j]
	// How far the crossing can be from here, by the slope of the bracket.
	if off := math.Abs(g) * (high - low) / (glow - ghigh); off < coolTol || high-low < coolTol {
		f.high[j] = age
		return true
	}
	p.before, p.gThen, p.at, p.g = p.at, p.g, age, g
	if g > 0 {
		f.low[j], f.glow[j] = age, g
	} else {
		f.high[j], f.ghigh[j] = age, g
	}
	if p.slow++; f.high[j]-f.low[j] <= 0.5*p.width {
		p.width, p.slow = f.high[j]-f.low[j], 0
	}
	return false
}
