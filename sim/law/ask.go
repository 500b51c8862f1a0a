package law

import (
	"fmt"

	"wane/sim/num"
)

// Fault is one thing wrong with an answer. Row is -1 when it concerns the
// whole answer.
type Fault struct {
	Law, Question, Column string
	Row                   int
	Object                string // the row in words, when there is one
	Got, Want             string
	Log                   string // the last an outside law wrote about itself
}

func (f *Fault) Error() string {
	where := fmt.Sprintf("law %s: question %s", f.Law, f.Question)
	if f.Row >= 0 {
		where += fmt.Sprintf(", row %d", f.Row)
		if f.Object != "" {
			where += " (" + f.Object + ")"
		}
	}
	if f.Column != "" {
		where += ": " + f.Column
	}
	text := fmt.Sprintf("%s: got %s, want %s", where, f.Got, f.Want)
	if f.Log != "" {
		text += "; its log: " + f.Log
	}
	return text
}

// Ask asks the law a question and checks the answer. This is the one place
// where answers are checked: for length, order of columns, finiteness, range,
// words, chances that sum to 1, and mass that does not come from nowhere. The
// batch's Parameters and Kinds are filled in here; its columns must be those
// of the card, in that order.
func (u *Use) Ask(question string, in Batch) (Batch, error) {
	q := u.question(question)
	if q == nil {
		return Batch{}, &Fault{Law: u.ID(), Question: question, Row: -1, Got: "a question that is not on its card", Want: "one of its own"}
	}
	in.Parameters, in.Kinds = u.Parameters, u.kinds
	want := q.outputs
	if f := u.checkInput(question, q.inputs, in); f != nil {
		return Batch{}, f
	}
	if in.Rows == 0 {
		return emptyAnswer(want), nil
	}
	out, err := u.Law.Answer(question, in)
	if err != nil {
		return Batch{}, fmt.Errorf("law %s: question %s: %w", u.label(), question, err)
	}
	if f := u.check(question, want, in, out); f != nil {
		return Batch{}, u.Signed(f)
	}
	return out, nil
}

// Signed puts the law's name, and the log of an outside one, into a fault.
func (u *Use) Signed(f *Fault) *Fault {
	f.Law = u.label()
	if o, ok := u.Law.(Outside); ok {
		f.Log = o.Log()
	}
	return f
}

// label names the law in faults: an outside one by what the person called it,
// too.
func (u *Use) label() string {
	if o, ok := u.Law.(Outside); ok && o.Label() != "" {
		return o.Label() + " (" + u.ID() + ")"
	}
	return u.ID()
}

// exchange is what is read and answered for one question.
type exchange struct {
	name    string
	inputs  []input
	outputs []output
}

// question returns nil for one that is not on the card. There are a few at
// most: a search is quicker than a map, and galaxies are asked often.
func (u *Use) question(name string) *exchange {
	for i := range u.asked {
		if u.asked[i].name == name {
			return &u.asked[i]
		}
	}
	return nil
}

func emptyAnswer(want []output) Batch {
	var b Batch
	for _, o := range want {
		b.Columns = append(b.Columns, Column{Name: o.name})
	}
	return b
}

func (u *Use) check(question string, want []output, in, out Batch) *Fault {
	whole := func(column, got, wanted string) *Fault {
		return &Fault{Law: u.ID(), Question: question, Column: column, Row: -1, Got: got, Want: wanted}
	}
	if out.Rows != in.Rows {
		return whole("", fmt.Sprintf("%d rows", out.Rows), fmt.Sprintf("%d", in.Rows))
	}
	if len(out.Columns) != len(want) {
		return whole("", fmt.Sprintf("%d columns", len(out.Columns)), fmt.Sprintf("%d", len(want)))
	}
	firstChance := -1
	for i, o := range want {
		c := out.Columns[i]
		if c.Name != o.name {
			return whole(o.name, fmt.Sprintf("column %q in its place", c.Name), "the order of the card")
		}
		n := len(c.Values)
		if o.words {
			n = len(c.Words)
		}
		if n != in.Rows {
			return whole(o.name, fmt.Sprintf("%d rows", n), fmt.Sprintf("%d", in.Rows))
		}
		if o.words {
			if f := u.checkWords(question, o.name, in, c.Words); f != nil {
				return f
			}
			continue
		}
		if row := firstBad(o.rule, c.Values); row >= 0 {
			return u.rowFault(question, o.name, row, in, fmt.Sprint(c.Values[row]), o.rule.String())
		}
		if o.rule == chance && firstChance < 0 {
			firstChance = i
		}
	}
	if firstChance >= 0 {
		if f := u.checkChances(question, firstChance, want, in, out); f != nil {
			return f
		}
	}
	return u.checkMass(question, in, out)
}

// checkInput finds a column that the host left out, misplaced or cut short.
func (u *Use) checkInput(question string, want []input, in Batch) *Fault {
	bad := func(column, got, wanted string) *Fault {
		return &Fault{Law: u.ID(), Question: question, Column: column, Row: -1, Got: got, Want: wanted}
	}
	if len(in.Columns) != len(want) {
		return bad("", fmt.Sprintf("a batch of %d columns", len(in.Columns)), fmt.Sprintf("the %d that the card reads", len(want)))
	}
	for i, w := range want {
		c := &in.Columns[i]
		if c.Name != w.name {
			return bad(w.name, fmt.Sprintf("a batch with column %q in its place", c.Name), "the order of the card")
		}
		n := len(c.Values)
		if w.words {
			n = len(c.Words)
		}
		if n != in.Rows {
			return bad(w.name, fmt.Sprintf("a batch with %d values in it", n), fmt.Sprintf("one in each of %d rows", in.Rows))
		}
	}
	return nil
}

// firstBad returns the first row that breaks the rule, or -1. Answers are
// checked on every run, nearly always to find nothing.
func firstBad(r rule, values []float64) int {
	if low, high := r.bounds(); r != yesNo && num.AllWithin(values, low, high) {
		return -1
	}
	for i, v := range values {
		if !r.holds(v) {
			return i
		}
	}
	return -1
}

func (u *Use) checkWords(question, column string, in Batch, words []uint8) *Fault {
	limit, none := len(CompositionWords), false
	switch column {
	case "kind":
		limit = len(u.kinds)
	case "kind_1", "kind_2":
		limit, none = len(u.kinds), true
	case "composition_1", "composition_2":
		none = true
	case "outcome":
		limit = len(u.Card.Outcomes)
	}
	for i, w := range words {
		if int(w) >= limit && !(none && w == NoWord) {
			return u.rowFault(question, column, i, in, fmt.Sprintf("code %d", w), fmt.Sprintf("a code below %d", limit))
		}
	}
	return nil
}

// chanceSlack is how far a row of chances may be from summing to 1.
const chanceSlack = 1e-9

func (u *Use) checkChances(question string, first int, want []output, in, out Batch) *Fault {
	last := first
	for last < len(want) && want[last].rule == chance {
		last++
	}
	var columns [][]float64
	for _, c := range out.Columns[first:last] {
		columns = append(columns, c.Values)
	}
	var s sums
	for from := 0; from < in.Rows; from += len(s) {
		part := s.of(columns, from, min(from+len(s), in.Rows))
		if num.AllWithin(part, 1-chanceSlack, 1+chanceSlack) {
			continue
		}
		for i, sum := range part {
			if !(sum >= 1-chanceSlack && sum <= 1+chanceSlack) {
				return u.rowFault(question, "chances", from+i, in, fmt.Sprintf("a sum of %v", sum), "1")
			}
		}
	}
	return nil
}

func (u *Use) rowFault(question, column string, row int, in Batch, got, want string) *Fault {
	return &Fault{Law: u.ID(), Question: question, Column: column, Row: row, Object: in.Object(row), Got: got, Want: want}
}
