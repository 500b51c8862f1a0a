package inquiry

import (
	"fmt"
	"math"
	"sort"
	"strconv"
	"strings"

	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/scenario"
	"wane/sim/scenario/quantity"
)

func power(log10 float64) float64 { return num.Exp10(log10) }

// readAll reads every key=value, and reports all faults together.
func (a *asking) readAll() error {
	questions, err := a.questions()
	if err != nil {
		return err
	}
	var faults []string
	seen := map[string]bool{}
	for _, assignment := range a.Given {
		key, text, ok := strings.Cut(assignment, "=")
		key, text = strings.TrimSpace(key), strings.TrimSpace(text)
		switch {
		case !ok || key == "" || text == "":
			faults = append(faults, fmt.Sprintf("%q: want key=value, such as mass=10Msun", assignment))
			continue
		case seen[canonical(key)]:
			faults = append(faults, fmt.Sprintf("%s: given twice", key))
			continue
		}
		seen[canonical(key)] = true
		if err := a.read(questions, key, text); err != nil {
			faults = append(faults, err.Error())
		}
	}
	if len(faults) > 0 {
		return fmt.Errorf("law %s: %s", a.use.ID(), strings.Join(faults, "\n"))
	}
	return nil
}

func canonical(key string) string { return strings.ReplaceAll(strings.ToLower(key), "-", "_") }

// read takes one key: a parameter first, then an input, then an answer.
func (a *asking) read(questions []law.Question, key, text string) error {
	want := canonical(key)
	for _, p := range a.use.Card.Parameters {
		if canonical(p.Name) == want {
			return a.readParameter(p, key, text)
		}
	}
	for _, q := range questions {
		for _, c := range inputs(q) {
			if canonical(c.name) == want || canonical(c.raw) == want {
				return a.readInput(q.Name, c, key, text)
			}
		}
	}
	if want == "kind" {
		return a.readWord(column{raw: "kind", name: "kind", list: "kind"}, text)
	}
	if want == "mass" && a.use.Card.Answers("shine") {
		return a.readInput("shine", inputColumn("shine", "mass"), key, text)
	}
	for _, q := range questions {
		for _, c := range a.outputs(q.Name) {
			if c.list == "" && (canonical(c.name) == want || canonical(c.raw) == want || c.raw == "wait" && want == "lifetime") {
				return a.readTarget(q.Name, c, key, text)
			}
		}
	}
	known := a.keys(questions)
	return fmt.Errorf("%s: unknown (known: %s)%s", key, strings.Join(known, ", "), Meant(key, known))
}

// keys is everything that may be given.
func (a *asking) keys(questions []law.Question) []string {
	set := map[string]bool{}
	for _, p := range a.use.Card.Parameters {
		set[p.Name] = true
	}
	for _, q := range questions {
		for _, c := range inputs(q) {
			set[c.name] = true
		}
		for _, c := range a.outputs(q.Name) {
			if c.list == "" {
				set[c.name] = true
			}
		}
	}
	out := make([]string, 0, len(set))
	for k := range set {
		out = append(out, k)
	}
	sort.Strings(out)
	return out
}

func (a *asking) readParameter(p law.Parameter, key, text string) error {
	v := Value{Name: p.Name, Unit: p.Unit, Log10: p.Log10, Why: "parameter of the law"}
	number := 0.0
	if len(p.Words) > 0 {
		found := false
		for i, w := range p.Words {
			if w == text {
				number, found, v.Word = float64(i), true, w
			}
		}
		if !found {
			return fmt.Errorf("%s: %q is none of %s%s", key, text, strings.Join(p.Words, ", "), Meant(text, p.Words))
		}
	} else {
		var err error
		if number, err = quantity.ParseFor(text, p.Unit, p.Log10); err != nil {
			return fmt.Errorf("%s: %w", key, err)
		}
	}
	if err := a.use.Set(p.Name, number); err != nil {
		return fmt.Errorf("%s: %s is outside %s", key, text, scenario.Range(p))
	}
	v.Number = number
	a.set = append(a.set, v)
	return nil
}

func (a *asking) readInput(question string, c column, key, text string) error {
	if c.list != "" {
		return a.readWord(c, text)
	}
	v, err := a.number(c, key, text)
	if err != nil {
		return err
	}
	info, _ := law.ColumnNamed(question, c.raw)
	if !(v >= info.Low && v <= info.High) {
		return fmt.Errorf("%s: %s is outside %v .. %v %s", key, text, info.Low, info.High, info.Unit)
	}
	a.numbers[c.raw] = given{v, key}
	return nil
}

// number reads the value of a column. The name of the catalogue itself,
// log10_age, takes the bare logarithm.
func (a *asking) number(c column, key, text string) (float64, error) {
	if c.log10 && strings.HasPrefix(c.raw, "log10_") && canonical(key) == c.raw {
		v, err := strconv.ParseFloat(text, 64)
		if err != nil || math.IsNaN(v) {
			return 0, fmt.Errorf("%s: %q: want a number, the log10 of %s", key, text, c.unit)
		}
		return v, nil
	}
	v, err := quantity.ParseFor(text, c.unit, c.log10)
	if err != nil {
		return 0, fmt.Errorf("%s: %w", key, err)
	}
	return v, nil
}

func (a *asking) readWord(c column, text string) error {
	list := a.words(c.list)
	for i, w := range list {
		if w == text {
			a.codes[c.raw] = uint8(i)
			return nil
		}
	}
	return fmt.Errorf("%s: %q is none of %s%s", c.name, text, strings.Join(list, ", "), Meant(text, list))
}

func (a *asking) readTarget(question string, c column, key, text string) error {
	if a.target != nil {
		return fmt.Errorf("%s: an answer, as %s is; one of them can be given, to find the input that leads to it", key, a.target.key)
	}
	v, err := a.number(c, key, text)
	if err != nil {
		return err
	}
	a.target = &target{question: question, column: c, value: v, key: key}
	return nil
}

// Meant is a question to append to a message about an unknown word, or
// nothing when no known word is near.
func Meant(word string, known []string) string {
	if n := scenario.Nearest(canonical(word), known); n != "" {
		return fmt.Sprintf(" (did you mean %q?)", n)
	}
	if n := scenario.Nearest(word, known); n != "" {
		return fmt.Sprintf(" (did you mean %q?)", n)
	}
	for _, k := range known {
		if len(word) >= 3 && strings.HasPrefix(canonical(k), canonical(word)) {
			return fmt.Sprintf(" (did you mean %q?)", k)
		}
	}
	return ""
}
