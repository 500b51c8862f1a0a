package inquiry

import (
	"fmt"
	"math"
	"sort"
	"strings"

	"wane/sim/law"
)

// Inquiry is what is asked, of which law.
type Inquiry struct {
	Registry *law.Registry
	Defaults map[string]string // process to law, for ranges that hang on other laws
	ID       string            // process/name
	Question string            // empty: every question the inputs suffice for
	Given    []string          // key=value
}

// Value is one named number or word of an answer.
type Value struct {
	Name   string
	Number float64 // log10 of the quantity when Log10 is set
	Unit   string
	Log10  bool
	Word   string // for words, instead of a number
	Why    string // how an input that was not given came about
}

// Answer is what the law said.
type Answer struct {
	Law       string
	Card      law.Card
	Questions []string
	Inputs    []Value
	Outputs   []Value
	Notes     []string
}

// asking is an inquiry on its way.
type asking struct {
	Inquiry
	use     *law.Use
	kinds   []string
	numbers map[string]given  // columns by raw name
	codes   map[string]uint8  // columns of words by raw name
	why     map[string]string // how a filled input came about
	target  *target           // the answer given instead of an input
	set     []Value           // parameters that were set
	used    map[string]bool
}

type given struct {
	value float64
	key   string
}

// target is an answer that was given, so that an input must be found.
type target struct {
	question string
	column   column
	value    float64
	key      string
}

// Ask asks. Errors are faults of the inquiry, except those of the law's own
// answers.
func Ask(q Inquiry) (*Answer, error) {
	a := &asking{Inquiry: q, numbers: map[string]given{}, codes: map[string]uint8{}, why: map[string]string{}, used: map[string]bool{}}
	l, err := Find(q.Registry, q.ID)
	if err != nil {
		return nil, err
	}
	a.use = law.NewUse(l)
	a.kinds = append(append([]string(nil), law.KindWords...), newKinds(a.use.Card)...)
	if err := a.readAll(); err != nil {
		return nil, err
	}
	if err := a.join(); err != nil {
		return nil, err
	}
	if a.target != nil {
		if err := a.turnRound(); err != nil {
			return nil, err
		}
	}
	return a.forward()
}

// Find looks a law up by process/name, with a suggestion when there is none.
func Find(r *law.Registry, id string) (law.Law, error) {
	process, name, ok := strings.Cut(id, "/")
	if !ok {
		return nil, fmt.Errorf("law %q: want process/name, such as evaporation/page", id)
	}
	if l, ok := r.Find(process, name); ok {
		return l, nil
	}
	var ids []string
	for _, l := range r.All() {
		c := l.Describe()
		ids = append(ids, c.Process+"/"+c.Name)
	}
	return nil, fmt.Errorf("law %q is not known%s", id, Meant(id, ids))
}

func newKinds(c law.Card) []string {
	var out []string
	for _, k := range c.Kinds {
		out = append(out, k.Name)
	}
	return out
}

// join resolves the law's range, which may hang on a parameter of the default
// law of another process.
func (a *asking) join() error {
	uses := []*law.Use{a.use}
	for _, limit := range []law.Limit{a.use.Card.Accepts.Low, a.use.Card.Accepts.High} {
		process, _, other := strings.Cut(limit.Parameter, ".")
		if !other || process == a.use.Card.Process {
			continue
		}
		if l, ok := a.Registry.Find(process, a.Defaults[process]); ok && len(uses) == 1 {
			uses = append(uses, law.NewUse(l))
		}
	}
	set, faults := law.NewSet(uses...)
	if len(faults) > 0 {
		return faults[0]
	}
	a.kinds = set.Kinds
	return nil
}

// questions are those that may be asked, the most telling first.
func (a *asking) questions() ([]law.Question, error) {
	if a.Question != "" {
		var names []string
		for _, q := range a.use.Card.Questions {
			if q.Name == a.Question {
				return []law.Question{q}, nil
			}
			names = append(names, q.Name)
		}
		return nil, fmt.Errorf("law %s: no question %q (it answers: %s)%s", a.use.ID(), a.Question,
			strings.Join(names, ", "), Meant(a.Question, names))
	}
	order := map[string]int{"foretell": 1, "live": 1, "die": 1, "heat": 2, "remain": 2, "wear": 3, "expose": 1, "rate": 2, "divert": 3, "meet": 3}
	out := append([]law.Question(nil), a.use.Card.Questions...)
	sort.SliceStable(out, func(i, j int) bool { return order[out[i].Name] < order[out[j].Name] })
	return out, nil
}

// forward asks every question whose inputs are all known or can be filled in.
func (a *asking) forward() (*Answer, error) {
	questions, err := a.questions()
	if err != nil {
		return nil, err
	}
	out := &Answer{Law: a.use.ID(), Card: a.use.Card}
	shown := map[string]bool{}
	var lacking []string
	for _, q := range questions {
		in, missing, err := a.batch(q, 1, nil)
		if err != nil {
			return nil, err
		}
		if len(missing) > 0 {
			lacking = append(lacking, fmt.Sprintf("question %s wants %s", q.Name, strings.Join(missing, ", ")))
			continue
		}
		if err := a.speaks(in); err != nil {
			return nil, err
		}
		answer, err := a.use.Ask(q.Name, in)
		if err != nil {
			return nil, err
		}
		out.Questions = append(out.Questions, q.Name)
		a.collect(out, q, in, answer, shown)
	}
	if len(out.Questions) == 0 {
		return nil, fmt.Errorf("law %s: %s", a.use.ID(), strings.Join(lacking, "; "))
	}
	if key := a.unused(); key != "" {
		extra := ""
		if len(lacking) > 0 {
			extra = "; " + strings.Join(lacking, "; ")
		}
		return nil, fmt.Errorf("law %s: %s has no effect on what it answers%s", a.use.ID(), key, extra)
	}
	out.Inputs = append(out.Inputs, a.set...)
	a.remarks(out)
	return out, nil
}

// unused is the first given key that no asked question read.
func (a *asking) unused() string {
	var keys []string
	for raw, g := range a.numbers {
		if !a.used[raw] && g.key != "" {
			keys = append(keys, g.key)
		}
	}
	for raw := range a.codes {
		if !a.used[raw] && raw != "kind" {
			keys = append(keys, raw)
		}
	}
	sort.Strings(keys)
	if len(keys) == 0 {
		return ""
	}
	return keys[0]
}

// collect adds the inputs and answers of one question.
func (a *asking) collect(out *Answer, q law.Question, in, answer law.Batch, shown map[string]bool) {
	for i, c := range inputs(q) {
		a.used[c.raw] = true
		if shown["in "+c.name] {
			continue
		}
		shown["in "+c.name] = true
		v := a.value(c, in.Columns[i])
		v.Why = a.why[c.raw]
		out.Inputs = append(out.Inputs, v)
	}
	for i, c := range a.outputs(q.Name) {
		if shown["out "+c.name] {
			continue
		}
		shown["out "+c.name] = true
		out.Outputs = append(out.Outputs, a.value(c, answer.Columns[i]))
	}
	a.shining(out, q, answer)
}

// value reads the first row of a column for people: times stay logarithms,
// everything else is printed as itself where it can be.
func (a *asking) value(c column, from law.Column) Value {
	v := Value{Name: c.name, Unit: c.unit}
	if c.list != "" {
		v.Word = "none"
		if list := a.words(c.list); int(from.Words[0]) < len(list) {
			v.Word = list[from.Words[0]]
		}
		return v
	}
	v.Number, v.Log10 = from.Values[0], c.log10
	if c.log10 && !timeLike(c.unit) {
		if n := power(v.Number); n > 0 && !math.IsInf(n, 1) || math.IsInf(v.Number, -1) {
			v.Number, v.Log10 = n, false
		}
	}
	return v
}

func timeLike(unit string) bool { return unit == "yr" || unit == "yr4" }
