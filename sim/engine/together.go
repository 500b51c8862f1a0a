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
	// faint: log10 of a rate below which sums are taken in logarithms.
	faint = -290
)

// nodes are those of one way from mass to mass, with room that is used again.
type nodes struct {
	rows          rows
	weights, rate []float64
}

// lowEnd is the mass to which a way to mass to is followed.
func lowEnd(from, to float64) float64 {
	if to > 0 {
		return to
	}
	return from * dust
}

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
			if w, err = a.foremost(r, row, w, now, mass, target); err != nil {
				return prospect{}, err
			}
			crossed.cause = a.m.thresholds[w][r.kind[row]].cause
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
	t := &a.nodes
	t.lay(r, row, m0, lowEnd(m0, m1))
	clear(t.rate)
	least := math.Inf(1)
	for _, v := range acting {
		out, err := a.ask(a.m.wearing[v], "wear", &t.rows, drawU)
		if err != nil {
			return 0, err
		}
		for i, l := range out.Columns[0].Values {
			t.rate[i] += num.Exp10(l)
			if l > -never {
				least = min(least, l)
			}
		}
	}
	if least < faint {
		return a.faintTime(acting)
	}
	sum := 0.0
	for i, x := range t.rate {
		if x == 0 {
			return never, nil
		}
		sum += t.weights[i] * t.rows.mass[i] / x
	}
	return num.Log10(sum), nil
}

// lay puts the nodes between two masses of an object.
func (t *nodes) lay(r *rows, row int, m0, m1 float64) {
	span := num.Log(m0 / m1)
	panels := max(1, int(math.Ceil(span/panelWidth)))
	n := panels * nodesAPanel
	t.rows.resize(n)
	t.weights, t.rate = grown(t.weights, n), grown(t.rate, n)
	var x, w [nodesAPanel]float64
	quad.Legendre{}.FixedLocations(x[:], w[:], 0, 1)
	width := span / float64(panels)
	for p := range panels {
		for k := range nodesAPanel {
			i := p*nodesAPanel + k
			t.rows.copyRow(i, r, row)
			t.rows.mass[i] = m0 * num.Exp(-width*(float64(p)+x[k]))
			t.weights[i] = width * w[k]
		}
	}
}

// faintTime is wearTime over the nodes as laid, for rates that may be too small
// for a float64.
func (a *asker) faintTime(acting []int) (float64, error) {
	t := &a.nodes
	fill(t.rate, -never)
	for _, v := range acting {
		out, err := a.ask(a.m.wearing[v], "wear", &t.rows, drawU)
		if err != nil {
			return 0, err
		}
		for i, l := range out.Columns[0].Values {
			t.rate[i] = num.Add10(t.rate[i], l)
		}
	}
	sum := -never
	for i, l := range t.rate {
		if l == -never {
			return never, nil
		}
		sum = num.Add10(sum, num.Log10(t.weights[i]*t.rows.mass[i])-l)
	}
	return sum, nil
}

// foremost is which of the acting laws is said to have taken an object over the
// threshold of law w: of those with a threshold of that kind which makes the
// same of it, the one that wears it fastest there.
func (a *asker) foremost(r *rows, row, w int, acting []int, from, target float64) (int, error) {
	kind := r.kind[row]
	one := &a.nodes.rows
	fastest := -never
	for _, v := range acting {
		if t := a.m.thresholds[v][kind]; !t.applies || t.kind != a.m.thresholds[w][kind].kind {
			continue
		}
		one.resize(1)
		one.copyRow(0, r, row)
		one.mass[0] = lowEnd(from, target)
		out, err := a.ask(a.m.wearing[v], "wear", one, drawU)
		if err != nil {
			return 0, err
		}
		if l := out.Columns[0].Values[0]; l > fastest {
			fastest, w = l, v
		}
	}
	return w, nil
}

// massAfter inverts wearTime: the mass left after 10^wait yr, between m1 and m0.
func (a *asker) massAfter(r *rows, row int, acting []int, m0, m1, wait float64) (float64, error) {
	if len(acting) == 0 || wait == math.Inf(-1) {
		return m0, nil
	}
	low, high := num.Log(lowEnd(m0, m1)), num.Log(m0)
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
