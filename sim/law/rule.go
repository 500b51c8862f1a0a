package law

import (
	"math"
	"strings"
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
	finite   rule = iota
	wait          // a number or +Inf
	logZero       // a number or -Inf
	hazard        // a number, -Inf or +Inf (the end is certain)
	positive      // finite, > 0
	atLeast0      // finite, >= 0
	chance        // 0 .. 1, the chance columns of a row sum to 1
	share         // 0 .. 1
	yesNo         // 0 or 1
)

// bounds returns the least and the greatest number of a rule.
func (r rule) bounds() (low, high float64) {
	switch r {
	case wait:
		return -math.MaxFloat64, math.Inf(1)
	case logZero:
		return math.Inf(-1), math.MaxFloat64
	case hazard:
		return math.Inf(-1), math.Inf(1)
	case positive:
		return math.SmallestNonzeroFloat64, math.MaxFloat64
	case atLeast0:
		return 0, math.MaxFloat64
	case chance, share, yesNo:
		return 0, 1
	}
	return -math.MaxFloat64, math.MaxFloat64
}

func (r rule) holds(v float64) bool {
	low, high := r.bounds()
	return v >= low && v <= high && (r != yesNo || v == low || v == high)
}

func (r rule) String() string {
	return [...]string{
		"a finite number", "a number or +Inf (never)", "a number or -Inf (zero)", "a number or an infinity",
		"a finite number > 0", "a finite number >= 0", "0 .. 1", "0 .. 1", "0 or 1",
	}[r]
}

// input is one column the law reads.
type input struct {
	name  string
	words bool
}

func inputsOf(q Question) []input {
	in := make([]input, len(q.Inputs))
	for i, n := range q.Inputs {
		info, _ := ColumnNamed(q.Name, n)
		in[i] = input{name: n, words: info.Words != ""}
	}
	return in
}

func outputsOf(c Card, question string) []output {
	names := c.Outputs(question)
	out := make([]output, len(names))
	for i, n := range names {
		out[i] = output{name: n, rule: ruleOf(question, n), words: AnsweredInWords(n)}
	}
	return out
}

// AnsweredInWords tells whether a column of answers holds codes of words; all
// others hold numbers.
func AnsweredInWords(column string) bool {
	switch column {
	case "kind", "kind_1", "kind_2", "composition", "composition_1", "composition_2", "outcome":
		return true
	}
	return false
}

func ruleOf(question, column string) rule {
	switch {
	case column == "wait":
		return wait
	case column == "log10_dark", column == "log10_temperature", strings.HasPrefix(column, "log10_rate"):
		return logZero
	case column == "log10_hazard":
		return hazard
	case strings.HasPrefix(column, "chance_"):
		return chance
	case strings.HasPrefix(column, "share_"), column == "heat":
		return share
	case column == "stop":
		return yesNo
	case column == "mass" && question == "mass", column == "radius":
		return positive
	case column == "curvature", column == "log10_date":
		return finite
	}
	return atLeast0
}
