package lawtest

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

// checkForetell compares what a wearing law foretells with what it wears: the
// wait of an object that it wears alone is the integral dM/rate from its mass
// to the next threshold of its card.
func (k *kit) checkForetell() {
	if role(k.card) != law.Wearing || !k.card.Answers("foretell") {
		return
	}
	wear, foretell := k.question("wear"), k.question("foretell")
	for _, kind := range k.kinds("foretell") {
		entries := k.worn(foretell, kind, 12)
		out, err := k.ask("foretell", lay(foretell, entries))
		if err != nil {
			return // reported before
		}
		waits := out.Values("wait")
		for i, e := range entries {
			end, ends := k.next(kind, e.objects[0].mass)
			want := math.Inf(1)
			if ends {
				if want, err = k.integral(wear, kind, e, end); err != nil {
					k.found("foretell", "wear", "on the way of %s: %v", kind, err)
					return
				}
			}
			if apart := math.Abs(waits[i]-want) * num.Ln10; waits[i] != want && !(apart < math.Inf(1) && apart <= k.foretell+4e-16*math.Abs(waits[i])) {
				k.found("foretell", "", "%s of %v solMass to %v solMass: foretold 10^%.12g yr, worn down in 10^%.12g yr (%.3g apart, want %.3g)",
					kind, e.objects[0].mass, end, waits[i], want, apart, k.foretell)
				return
			}
		}
	}
}

func (k *kit) question(name string) law.Question {
	for _, q := range k.card.Questions {
		if q.Name == name {
			return q
		}
	}
	return law.Question{}
}

// worn draws objects of one kind over the range of its masses, above its last
// threshold.
func (k *kit) worn(q law.Question, kind string, n int) []entry {
	r := random("worn " + kind)
	s := k.massSpan("foretell", kind)
	out := make([]entry, n)
	for i := range out {
		o := k.object(r, "foretell", kind)
		o.mass = s.low * num.Exp(num.Log(s.high/s.low)*(float64(i)+0.5)/float64(n))
		o.birth = o.mass * []float64{1, 1, 1.3}[i%3]
		o.radius = radius(kind, o.mass)
		out[i] = entry{objects: [2]object{o, o}, loose: map[string]float64{}}
	}
	return out
}

// next is the threshold an object of this mass comes to next.
func (k *kit) next(kind string, mass float64) (float64, bool) {
	found, at := false, 0.0
	gains := k.card.Wears != "" && k.card.Wears != "loss"
	for _, t := range k.thresholds(kind) {
		if gains && t > mass && (!found || t < at) || !gains && t < mass && (!found || t > at) {
			found, at = true, t
		}
	}
	return at, found
}

// panel is a piece of the way, in natural log of mass.
type panel struct {
	low, high float64
	depth     int
}

// depths is how often a panel is halved at most: a jump of the rate then costs
// less than 1e-9 of a panel.
const depths = 40

// floorOf is the part of the mass at which a way to mass 0 is cut. Less than
// 1e-9 of the wait lies beyond if the rate falls slower than mass^(3/4).
const floorOf = 1e-40

// integral is log10 of the wait, by Gauss-Legendre panels that are halved
// until two halves agree with the whole. The object wears from its mass to the
// end; birth mass and composition stay as they are.
func (k *kit) integral(q law.Question, kind string, e entry, end float64) (float64, error) {
	start := e.objects[0].mass
	if end == 0 {
		end = start * floorOf
	}
	a, b := num.Log(min(start, end)), num.Log(max(start, end))
	panels := make([]panel, 0, 64)
	count := max(4, math.Ceil((b-a)/2))
	for i := range int(count) {
		panels = append(panels, panel{a + (b-a)*float64(i)/count, a + (b-a)*float64(i+1)/count, 0})
	}
	scale, sum := math.Inf(-1), 0.0
	for len(panels) > 0 {
		values, err := k.times(q, kind, e, panels)
		if err != nil {
			return 0, err
		}
		if scale < 0 && math.IsInf(scale, -1) {
			for _, v := range values {
				scale = max(scale, v)
			}
			if math.IsInf(scale, 0) {
				return scale, nil // a rate of zero on the way: never
			}
		}
		var halves []panel
		total := sum
		for i := range panels {
			total += num.Exp10(values[3*i] - scale)
		}
		for i, p := range panels {
			one := num.Exp10(values[3*i] - scale)
			two := num.Exp10(values[3*i+1]-scale) + num.Exp10(values[3*i+2]-scale)
			if p.depth >= depths || math.Abs(one-two) <= 1e-3*k.foretell*max(two, 1e-3*total) {
				sum += two
				continue
			}
			middle := (p.low + p.high) / 2
			halves = append(halves, panel{p.low, middle, p.depth + 1}, panel{middle, p.high, p.depth + 1})
		}
		panels = halves
	}
	return scale + num.Log10(sum), nil
}

// times returns, for each panel, log10 of the time across the whole and across
// its two halves.
func (k *kit) times(q law.Question, kind string, e entry, panels []panel) ([]float64, error) {
	nodes, weights := gauss()
	n := len(nodes)
	var rows []entry
	for _, p := range panels {
		for _, piece := range p.pieces() {
			for _, x := range nodes {
				o := e
				o.objects[0].mass = num.Exp(piece.low + (piece.high-piece.low)*x)
				o.objects[0].radius = radius(kind, o.objects[0].mass)
				rows = append(rows, o)
			}
		}
	}
	out, err := k.ask("wear", lay(q, rows))
	if err != nil {
		return nil, err
	}
	rate := out.Values("log10_rate")
	times, each := make([]float64, 3*len(panels)), make([]float64, n)
	for i := range times {
		piece := panels[i/3].pieces()[i%3]
		top := math.Inf(-1)
		for j := range n { // log10 of M / rate
			each[j] = num.Log10(rows[i*n+j].objects[0].mass) - rate[i*n+j]
			top = max(top, each[j])
		}
		sum := 0.0
		for j := range n {
			sum += weights[j] * num.Exp10(each[j]-top)
		}
		times[i] = top + num.Log10(sum*(piece.high-piece.low))
		if math.IsInf(top, 0) {
			times[i] = top
		}
	}
	return times, nil
}

// pieces are the panel, its lower and its upper half.
func (p panel) pieces() [3]panel {
	middle := (p.low + p.high) / 2
	return [3]panel{p, {low: p.low, high: middle}, {low: middle, high: p.high}}
}
