package inquiry

import (
	"fmt"
	"math"
	"strings"

	"wane/sim/law"
)

// turnRound finds the one open input that leads to the target, and gives it.
func (a *asking) turnRound() error {
	q, err := a.targetQuestion()
	if err != nil {
		return err
	}
	unknown, err := a.unknown(q)
	if err != nil {
		return err
	}
	grid := a.grid(q, unknown)
	if len(grid) == 0 {
		return fmt.Errorf("law %s: no %s lies in its range", a.use.ID(), unknown.name)
	}
	answers, err := a.evaluate(q, unknown, grid)
	if err != nil {
		return err
	}
	x, err := a.root(q, unknown, grid, answers)
	if err != nil {
		return err
	}
	a.numbers[unknown.raw] = given{value: x}
	a.why[unknown.raw] = "found from " + a.target.key
	return nil
}

func (a *asking) targetQuestion() (law.Question, error) {
	for _, q := range a.use.Card.Questions {
		if q.Name == a.target.question {
			return q, nil
		}
	}
	return law.Question{}, fmt.Errorf("law %s: no question %q", a.use.ID(), a.target.question)
}

// unknown is the input to solve for: the one that was not given and has no
// default, or else the draw.
func (a *asking) unknown(q law.Question) (column, error) {
	_, missing, err := a.batch(q, 1, nil)
	if err != nil {
		return column{}, err
	}
	var open []column
	for _, c := range inputs(q) {
		for _, m := range missing {
			// What hangs on the unknown alone, such as the composition on
			// the mass, is filled in once it is known.
			if c.name == m && c.list == "" && c.raw != "radius" && c.raw != "birth_mass" {
				open = append(open, c)
			}
		}
	}
	if len(open) == 1 {
		return open[0], nil
	}
	var names []string
	for _, c := range open {
		names = append(names, c.name)
	}
	if len(open) > 1 {
		return column{}, fmt.Errorf("law %s: %s can be turned round for one unknown, but %s are all open; give all but one",
			a.use.ID(), a.target.key, strings.Join(names, ", "))
	}
	for _, c := range inputs(q) {
		if _, given := a.numbers[c.raw]; !given && (c.raw == "u" || c.raw == "e") {
			return c, nil
		}
	}
	return column{}, fmt.Errorf("law %s: %s is an answer, and every input of question %s is known: nothing is left to find",
		a.use.ID(), a.target.key, q.Name)
}

// grid is where an input is searched, in rising order, within the law's range.
func (a *asking) grid(q law.Question, c column) []float64 {
	var out []float64
	add := func(v float64) {
		if a.use.Card.Accepts.Column == c.raw {
			if low, high := a.use.Limits(); !(v >= low && v < high) {
				return
			}
		}
		out = append(out, v)
	}
	switch {
	case c.log10:
		for i := -50; i <= 500; i++ {
			add(float64(i) / 5)
		}
		for v := 101.0; v < 1e77; v *= 1.5 {
			add(v)
		}
	case c.raw == "u" || c.raw == "metals" || c.raw == "eccentricity":
		for i := 1; i < 1000; i++ {
			add(float64(i) / 1000)
		}
	case c.raw == "e":
		for i := 1; i <= 800; i++ {
			add(float64(i) / 20)
		}
	default: // masses, radii, counts: positive, over many decades
		for i := -400; i <= 200; i++ {
			add(power(float64(i) / 10))
		}
	}
	return out
}

// evaluate asks the question over the grid. A row that the law cannot answer
// is NaN; where it can answer none, the last error is returned.
func (a *asking) evaluate(q law.Question, c column, grid []float64) ([]float64, error) {
	in, missing, err := a.batch(q, len(grid), &sweep{c.raw, grid})
	if err != nil {
		return nil, err
	}
	if len(missing) > 0 {
		return nil, fmt.Errorf("law %s: question %s wants %s", a.use.ID(), q.Name, strings.Join(missing, ", "))
	}
	if answer, err := a.use.Ask(q.Name, in); err == nil {
		return answer.Values(a.target.column.raw), nil
	}
	out := make([]float64, len(grid))
	answered := false
	for i := range grid {
		row, _, err1 := a.batch(q, 1, &sweep{c.raw, grid[i : i+1]})
		if err1 != nil {
			return nil, err1
		}
		answer, err1 := a.use.Ask(q.Name, row)
		if err1 != nil {
			out[i], err = math.NaN(), err1
			continue
		}
		out[i], answered = answer.Values(a.target.column.raw)[0], true
	}
	if !answered {
		return nil, err
	}
	return out, nil
}

// root finds the only place where the answers pass the target.
func (a *asking) root(q law.Question, c column, grid, answers []float64) (float64, error) {
	target := a.target.value
	var brackets [][2]int
	last := -1
	flat := false
	for i, v := range answers {
		if math.IsNaN(v) {
			continue
		}
		flat = flat || v == target && last >= 0 && answers[last] == target
		if last >= 0 && (answers[last] < target) != (v < target) {
			brackets = append(brackets, [2]int{last, i})
		}
		last = i
	}
	switch {
	case flat:
		return 0, fmt.Errorf("law %s: more than one %s leads to this %s", a.use.ID(), c.name, a.target.column.name)
	case len(brackets) == 0:
		return 0, a.beyond(c, answers)
	case len(brackets) > 1:
		var at []string
		for _, b := range brackets {
			at = append(at, Format(Value{Number: grid[b[0]], Unit: c.unit, Log10: c.log10}))
		}
		return 0, fmt.Errorf("law %s: %s does not rise or fall throughout: this value is passed near %s %s",
			a.use.ID(), a.target.column.name, c.name, strings.Join(at, " and near "))
	}
	return a.bisect(q, c, grid[brackets[0][0]], grid[brackets[0][1]], answers[brackets[0][0]] < target)
}

// beyond is the fault of a target that is never reached.
func (a *asking) beyond(c column, answers []float64) error {
	low, high := math.Inf(1), math.Inf(-1)
	for _, v := range answers {
		if !math.IsNaN(v) {
			low, high = math.Min(low, v), math.Max(high, v)
		}
	}
	at := func(v float64) string {
		return Format(a.value(a.target.column, law.Column{Values: []float64{v}}))
	}
	return fmt.Errorf("law %s: no %s leads to it: %s goes from %s to %s", a.use.ID(), c.name, a.target.column.name, at(low), at(high))
}

func (a *asking) bisect(q law.Question, c column, low, high float64, rising bool) (float64, error) {
	one := func(x float64) (float64, error) {
		v, err := a.evaluate(q, c, []float64{x})
		if err != nil {
			return 0, err
		}
		return v[0], nil
	}
	for range 200 {
		middle := low + (high-low)/2
		if low > 0 && high/low > 1.01 {
			middle = math.Sqrt(low) * math.Sqrt(high)
		}
		if middle <= low || middle >= high {
			break
		}
		v, err := one(middle)
		if err != nil {
			return 0, err
		}
		if (v < a.target.value) == rising {
			low = middle
		} else {
			high = middle
		}
	}
	v, err := one(high)
	if err != nil {
		return 0, err
	}
	if miss := math.Abs(v - a.target.value); !(miss <= 1e-6*math.Max(math.Abs(v), math.Abs(a.target.value))) {
		return 0, fmt.Errorf("law %s: %s leaps over this value at %s %s", a.use.ID(), a.target.column.name, c.name,
			Format(Value{Number: high, Unit: c.unit, Log10: c.log10}))
	}
	return high, nil
}
