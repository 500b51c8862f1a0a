package law

import (
	"fmt"
	"math"
)

// output is one answer column and what it may hold.
type output struct {
	name  string
	words bool
	rule  rule
}

// rule is the set of numbers an answer column may hold.
type rule uint8

const (
	finite     rule = iota
	wait            // a number or +Inf
	logZero         // a number or -Inf
	hazard          // a number, -Inf or +Inf (the end is certain)
	positive        // finite, > 0
	atLeast0        // finite, >= 0
	chance          // 0 .. 1, the chance columns of a row sum to 1
	share           // 0 .. 1
	growOrLose      // survivors' mass: finite, >= 0
)

func (r rule) holds(v float64) bool {
	switch r {
	case wait:
		return v == v && v > math.Inf(-1)
	case logZero:
		return v < math.Inf(1)
	case hazard:
		return v == v
	case positive:
		return v > 0 && v < math.Inf(1)
	case atLeast0, growOrLose:
		return v >= 0 && v < math.Inf(1)
	case chance, share:
		return v >= 0 && v <= 1
	}
	return v-v == 0
}

func (r rule) String() string {
	return [...]string{
		"a finite number", "a number or +Inf (never)", "a number or -Inf (zero)", "a number or an infinity",
		"a finite number > 0", "a finite number >= 0", "0 .. 1", "0 .. 1", "a finite number >= 0",
	}[r]
}

func outputsOf(c Card, question string) []output {
	names := c.Outputs(question)
	out := make([]output, len(names))
	for i, n := range names {
		out[i] = output{name: n, rule: ruleOf(question, n)}
		switch n {
		case "kind", "kind_1", "kind_2", "composition", "composition_1", "composition_2", "outcome":
			out[i].words = true
		}
	}
	return out
}

func ruleOf(question, column string) rule {
	switch {
	case column == "wait":
		return wait
	case column == "log10_dark", column == "log10_temperature",
		len(column) > 10 && column[:10] == "log10_rate", column == "log10_rate":
		return logZero
	case column == "log10_hazard":
		return hazard
	case len(column) > 7 && column[:7] == "chance_":
		return chance
	case len(column) > 6 && column[:6] == "share_", column == "heat", column == "stop":
		return share
	case column == "mass" && question == "mass", column == "radius":
		return positive
	case column == "curvature", column == "log10_date":
		return finite
	}
	return atLeast0
}

// Fault is one thing wrong with an answer. Row is -1 when it concerns the
// whole answer.
type Fault struct {
	Law, Question, Column string
	Row                   int
	Object                string // the row in words, when there is one
	Got, Want             string
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
	return fmt.Sprintf("%s: got %s, want %s", where, f.Got, f.Want)
}

// Ask asks the law a question and checks the answer. This is the one place
// where answers are checked: for length, order of columns, finiteness, range,
// words, and chances that sum to 1. The batch's Parameters and Kinds are
// filled in here.
func (u *Use) Ask(question string, in Batch) (Batch, error) {
	want, ok := u.outputs[question]
	if !ok {
		return Batch{}, &Fault{Law: u.ID(), Question: question, Row: -1, Got: "a question that is not on its card", Want: "one of its own"}
	}
	in.Parameters, in.Kinds = u.Parameters, u.kinds
	if in.Rows == 0 {
		return emptyAnswer(want), nil
	}
	out, err := u.Law.Answer(question, in)
	if err != nil {
		return Batch{}, fmt.Errorf("law %s: question %s: %w", u.ID(), question, err)
	}
	if f := u.check(question, want, in, out); f != nil {
		return Batch{}, f
	}
	return out, nil
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
		return u.checkChances(question, firstChance, want, in, out)
	}
	return nil
}

// firstBad returns the first row that breaks the rule, or -1.
func firstBad(r rule, values []float64) int {
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
	for row := range in.Rows {
		sum := 0.0
		for i := first; i < len(want) && want[i].rule == chance; i++ {
			sum += out.Columns[i].Values[row]
		}
		if !(sum > 1-chanceSlack && sum < 1+chanceSlack) {
			return u.rowFault(question, "chances", row, in, fmt.Sprintf("a sum of %v", sum), "1")
		}
	}
	return nil
}

func (u *Use) rowFault(question, column string, row int, in Batch, got, want string) *Fault {
	return &Fault{Law: u.ID(), Question: question, Column: column, Row: row, Object: in.Object(row), Got: got, Want: want}
}

// Object puts a row into words, for messages: its columns and values.
func (b Batch) Object(row int) string {
	s := ""
	for _, c := range b.Columns {
		if s != "" {
			s += ", "
		}
		switch {
		case c.Words == nil:
			s += fmt.Sprintf("%s %.6g", c.Name, c.Values[row])
			if info, ok := ColumnNamed("", c.Name); ok && info.Unit != "" {
				s += " " + info.Unit
			}
		default:
			s += wordOf(b, c.Name, c.Words[row])
		}
	}
	return s
}

func wordOf(b Batch, column string, code uint8) string {
	list := b.Kinds
	switch {
	case len(column) >= 5 && column[:5] == "place":
		list = PlaceWords
	case len(column) >= 6 && column[:6] == "origin":
		list = OriginWords
	case len(column) >= 11 && column[:11] == "composition":
		list = CompositionWords
	}
	if int(code) < len(list) {
		return list[code]
	}
	return fmt.Sprintf("%s %d", column, code)
}
