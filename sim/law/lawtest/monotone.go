package lawtest

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

// slack is how much a curve may turn back, relatively: rounding, no more.
const slack = 1e-12

// checkMonotone follows one column while all others stand still.
func (k *kit) checkMonotone(q law.Question) {
	switch q.Name {
	case "mass", "birth", "metals":
		k.follow(q, 1, draws(), "u", k.card.Outputs(q.Name)[0], rising)
	case "remain":
		k.follow(q, 60, draws(), "u", "mass", rising)
	case "shine":
		k.follow(q, 60, ages(), "log10_age", "log10_temperature", falling)
	case "end":
		k.follow(q, 1, dates(), "log10_date", "log10_hazard", rising)
	case "foretell":
		k.follow(q, 60, draws(), "u", "wait", either)
		k.follow(q, 60, exponentials(), "e", "wait", rising)
	}
}

type way int

const (
	rising way = iota
	falling
	either
)

func (w way) String() string { return [...]string{"never fall", "never rise", "go one way"}[w] }

// follow asks about n rows along a grid of one column.
func (k *kit) follow(q law.Question, n int, grid []float64, column, answer string, want way) {
	reads := false
	for _, in := range q.Inputs {
		reads = reads || in == column
	}
	if !reads && q.Name != "end" {
		return
	}
	entries := k.entries(q, n)
	for i, e := range entries {
		path := make([]entry, len(grid))
		for j, x := range grid {
			path[j] = e
			path[j].loose = map[string]float64{}
			for name, v := range e.loose {
				path[j].loose[name] = v
			}
			path[j].put(q.Name, column, x)
			if q.Name == "end" { // the cone behind us grows with the date
				path[j].loose["log10_four_volume"] = 4*x - 1
			}
		}
		in := lay(q, path)
		out, err := k.ask(q.Name, in)
		if err != nil {
			k.wrong("monotone", q.Name, "", err)
			return
		}
		values := out.Values(answer)
		if j := turns(values, want); j > 0 {
			k.found("monotone", q.Name, "row %d (%s): %s must %s as %s rises: %v at %v, then %v at %v",
				i, in.Object(j), answer, want, column, values[j-1], grid[j-1], values[j], grid[j])
			return
		}
	}
}

// turns returns the first index at which values go the wrong way, or 0.
func turns(values []float64, want way) int {
	up := want == rising
	if want == either {
		up = values[len(values)-1] >= values[0]
	}
	for i := 1; i < len(values); i++ {
		a, b := values[i-1], values[i]
		if !up {
			a, b = b, a
		}
		if a > b && !(a-b <= slack*max(1, math.Abs(a))) {
			return i
		}
	}
	return 0
}

// draws are uniforms from the least to the greatest, close at both ends.
func draws() []float64 {
	var out []float64
	for e := 53; e > 8; e-- {
		out = append(out, math.Ldexp(1, -e))
	}
	const n = 1000
	for i := 5; i <= n-5; i++ {
		out = append(out, float64(i)/n)
	}
	for e := 9; e <= 53; e++ {
		out = append(out, 1-math.Ldexp(1, -e))
	}
	return out
}

func exponentials() []float64 { return grid(1e-3, 800, 300, false) }

// ages run from birth to far beyond every clock.
func ages() []float64 {
	out := append([]float64{math.Inf(-1), -300, -30}, grid(-10, 40, 1500, true)...)
	return append(out, 100, 1e3, 1e6, 1e15, 1e300)
}

func dates() []float64 {
	out := append([]float64{math.Inf(-1), -300}, grid(-60, 200, 1500, true)...)
	return append(out, 1e3, 1e6, 1e15, 1e299)
}

// grid is n+1 values from low to high, evenly or by even factors.
func grid(low, high float64, n int, evenly bool) []float64 {
	out := make([]float64, n+1)
	for i := range out {
		x := float64(i) / float64(n)
		if evenly {
			out[i] = low + (high-low)*x
		} else {
			out[i] = low * num.Pow(high/low, x)
		}
	}
	return out
}
