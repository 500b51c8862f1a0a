package engine

import (
	"math"

	"gonum.org/v1/gonum/integrate/quad"

	"wane/sim/law"
	"wane/sim/num"
)

// Quadrature of the wait between two masses: panels of at most a factor two in
// mass, each with a Gauss-Legendre rule in ln M.
const (
	nodesAPanel = 12
	panelWidth  = math.Ln2
	// dust: a threshold of zero is reached at this part of the starting mass.
	// What is left would take a time smaller by its cube or more.
	dust = 1e-25
)

// wornTogether takes the integral of dM over the summed rates for rows that
// more than one wearing law speaks for.
func (a *asker) wornTogether(r *rows, since func(int) float64) error {
	if len(a.m.wearing) < 2 {
		// A single law without foretell is integrated too.
		if a.m.wearing[0].Card.Answers("foretell") {
			return nil
		}
	}
	for i := range r.n {
		var acting []int
		for w, u := range a.m.wearing {
			if u.Speaks(r.kind[i], r.mass[i], r.metals[i]) {
				acting = append(acting, w)
			}
		}
		if len(acting) == 0 || len(acting) == 1 && a.m.wearing[acting[0]].Card.Answers("foretell") {
			continue
		}
		p, err := a.integrate(r, i, acting, since(i))
		if err != nil {
			return err
		}
		a.offer(i, p)
	}
	return nil
}

// integrate follows one object under several wearing laws. Laws with heat join
// when the sky has become colder than they are.
func (a *asker) integrate(r *rows, row int, acting []int, since float64) (prospect, error) {
	one := newRows(1)
	one.resize(1)
	one.copyRow(0, r, row)
	start := make([]float64, len(acting))
	for i, w := range acting {
		start[i] = since
		s, err := a.starts(a.m.wearing[w], one, nil, func(int) float64 { return since })
		if err != nil {
			return prospect{}, err
		}
		if s != nil {
			start[i] = s[0]
		}
	}
	mass, date := r.mass[row], since
	for {
		target, w, found := a.nextThreshold(r.kind[row], mass, acting)
		if !found {
			return prospect{date: never, kind: law.NoWord}, nil
		}
		t := a.m.thresholds[w][r.kind[row]]
		crossed := prospect{date: date, mass: min(target, mass), cause: t.cause, kind: t.kind}
		if target >= mass {
			return crossed, nil
		}
		var now []int
		next := never
		for i, w := range acting {
			if start[i] <= date {
				now = append(now, w)
			} else {
				next = min(next, start[i])
			}
		}
		wait, err := a.wearTime(r, row, now, mass, target)
		if err != nil {
			return prospect{}, err
		}
		crossed.date = later(date, wait)
		if crossed.date <= next {
			return crossed, nil
		}
		if mass, err = a.massAfter(r, row, now, mass, target, num.Sub10(next, date)); err != nil {
			return prospect{}, err
		}
		date = next
	}
}

// nextThreshold is the first threshold below mass among the acting laws; one
// at or above it is crossed at once.
func (a *asker) nextThreshold(kind uint8, mass float64, acting []int) (target float64, w int, found bool) {
	for _, v := range acting {
		if t := a.m.thresholds[v][kind]; t.applies && (!found || t.mass > target) {
			target, w, found = t.mass, v, true
		}
	}
	return target, w, found
}

// wearTime is log10 of the years in which the laws take a mass from m0 to m1.
func (a *asker) wearTime(r *rows, row int, acting []int, m0, m1 float64) (float64, error) {
	if len(acting) == 0 {
		return never, nil
	}
	floor := max(m1, m0*dust)
	span := num.Log(m0 / floor)
	panels := max(1, int(math.Ceil(span/panelWidth)))
	n := panels * nodesAPanel
	t := &a.nodes
	t.resize(n)
	weights := make([]float64, n)
	var x, w [nodesAPanel]float64
	quad.Legendre{}.FixedLocations(x[:], w[:], 0, 1)
	width := span / float64(panels)
	for p := range panels {
		for k := range nodesAPanel {
			i := p*nodesAPanel + k
			t.copyRow(i, r, row)
			t.mass[i] = m0 * num.Exp(-width*(float64(p)+x[k]))
			weights[i] = width * w[k]
		}
	}
	rate := make([]float64, n)
	for _, v := range acting {
		out, err := a.ask(a.m.wearing[v], "wear", t, drawU)
		if err != nil {
			return 0, err
		}
		for i, l := range out.Columns[0].Values {
			rate[i] += num.Exp10(l)
		}
	}
	sum := math.Inf(-1)
	for i := range n {
		if rate[i] == 0 {
			return never, nil
		}
		sum = num.Add10(sum, num.Log10(weights[i]*t.mass[i])-num.Log10(rate[i]))
	}
	return sum, nil
}

// massAfter inverts wearTime: the mass left after 10^wait yr, between m1 and m0.
func (a *asker) massAfter(r *rows, row int, acting []int, m0, m1, wait float64) (float64, error) {
	if len(acting) == 0 || wait == math.Inf(-1) {
		return m0, nil
	}
	low, high := num.Log(max(m1, m0*dust)), num.Log(m0)
	for range 60 {
		mid := 0.5 * (low + high)
		t, err := a.wearTime(r, row, acting, m0, num.Exp(mid))
		if err != nil {
			return 0, err
		}
		if t > wait {
			low = mid
		} else {
			high = mid
		}
	}
	return num.Exp(high), nil
}
