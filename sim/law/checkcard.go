package law

import (
	"fmt"
	"math"
	"regexp"
	"strings"
)

// The spelling of words (processes, laws, kinds, outcomes, clocks) and of
// parameters. Words become parts of column names, so no two may differ only
// by a hyphen.
var (
	wordForm      = regexp.MustCompile(`^[a-z][a-z0-9]*(-[a-z0-9]+)*$`)
	parameterForm = regexp.MustCompile(`^[a-z][a-z0-9]*(_[a-z0-9]+)*$`)
)

// CheckCard lists everything wrong with a card: an unknown process, questions
// its role is not asked or lacks, columns the host has not for a question,
// presets outside their range, missing citations, words that mean nothing.
func CheckCard(c Card) []error {
	p, ok := ProcessNamed(c.Process)
	k := cardCheck{Card: c, process: p}
	if !ok {
		k.bad("unknown process %q", c.Process)
	}
	k.identity()
	k.parameters()
	k.accepts()
	if ok { // what else may be on a card hangs on the process
		k.questions()
		k.thresholds()
		k.clocks()
		k.words()
	}
	return k.faults
}

// cardCheck gathers the faults of one card.
type cardCheck struct {
	Card
	process Process
	faults  []error
}

func (k *cardCheck) bad(format string, a ...any) {
	k.faults = append(k.faults, fmt.Errorf("card: "+format, a...))
}

// unique reports words that stand twice in a list.
func (k *cardCheck) unique(what string, names []string) {
	seen := map[string]bool{}
	for _, n := range names {
		if seen[n] {
			k.bad("%s %q is there twice", what, n)
		}
		seen[n] = true
	}
}

func (k *cardCheck) identity() {
	if k.Name == "" || k.Version == "" || k.Summary == "" {
		k.bad("name, version and summary must be given")
	}
	if k.Name != "" && !wordForm.MatchString(k.Name) {
		k.bad("name %q: want lower-case letters, digits and single hyphens", k.Name)
	}
	if strings.Contains(k.Summary, "\n") {
		k.bad("the summary must be one line")
	}
	if len(k.Sources) == 0 {
		k.bad("no source: name the publication, or say that it is an assumption")
	}
	if !(k.Tolerance >= 0 && k.Tolerance < 1) {
		k.bad("tolerance %v: want a relative size, 0 .. 1", k.Tolerance)
	}
}

func (k *cardCheck) questions() {
	allowed := questionsOf(k.process)
	for _, q := range allowed.required {
		if !k.Answers(q) {
			k.bad("process %s is asked %q, which the card does not answer", k.Process, q)
		}
	}
	var names []string
	for _, q := range k.Questions {
		names = append(names, q.Name)
		if !contains(allowed.required, q.Name) && !contains(allowed.optional, q.Name) {
			k.bad("question %q is not one that process %s is asked", q.Name, k.Process)
			continue
		}
		for _, in := range q.Inputs {
			if !mayRead(k.process.Role, q.Name, in) {
				k.bad("question %s: unknown column %q", q.Name, in)
			}
		}
		k.unique("question "+q.Name+": column", q.Inputs)
		k.unique("question "+q.Name+": word", q.Words)
		wordy := q.Name == "die" || q.Name == "divert"
		if wordy && len(q.Words) == 0 {
			k.bad("question %s needs the words it gives chances for", q.Name)
		}
		if !wordy && len(q.Words) > 0 {
			k.bad("question %s takes no words", q.Name)
		}
		if q.Name == "die" {
			for _, w := range q.Words {
				k.kind("question die", w)
			}
		}
	}
	k.unique("question", names)
}

// kind reports a word that is no kind this card can know.
func (k *cardCheck) kind(where, word string) {
	if contains(KindWords, word) || knownAnywhere(word) {
		return
	}
	for _, own := range k.Kinds {
		if own.Name == word {
			return
		}
	}
	k.bad("%s: no kind %q", where, word)
}

func (k *cardCheck) parameters() {
	var names []string
	for _, x := range k.Parameters {
		names = append(names, x.Name)
		k.parameter(x)
	}
	k.unique("parameter", names)
	if k.process.Role == Sky {
		for _, name := range SkyParameters {
			if k.parameterNamed(name) == nil {
				k.bad("a law of process %s needs the parameter %q", k.Process, name)
			}
		}
	}
}

// SkyParameters are the parameters every sky law has, by these names: today's
// expansion rate (km/s/Mpc), matter and radiation as fractions of the critical
// density, and the temperature of the relic sky (K).
var SkyParameters = []string{"hubble", "matter", "radiation", "temperature"}

func (k *cardCheck) parameterNamed(name string) *Parameter {
	for i := range k.Parameters {
		if k.Parameters[i].Name == name {
			return &k.Parameters[i]
		}
	}
	return nil
}

func (k *cardCheck) parameter(x Parameter) {
	if !parameterForm.MatchString(x.Name) {
		k.bad("parameter %q: want lower-case letters, digits and single underscores", x.Name)
	}
	if x.Citation == "" {
		k.bad("parameter %s: no citation", x.Name)
	}
	if len(x.Words) > 0 {
		k.unique("parameter "+x.Name+": word", x.Words)
		if !(x.Preset >= 0 && x.Preset < float64(len(x.Words)) && x.Preset == math.Floor(x.Preset)) {
			k.bad("parameter %s: preset %v is no index of its words", x.Name, x.Preset)
		}
		return
	}
	if !(x.Low <= x.Preset && x.Preset <= x.High) {
		k.bad("parameter %s: preset %v outside %v .. %v", x.Name, x.Preset, x.Low, x.High)
	}
}

func (k *cardCheck) accepts() {
	a := k.Accepts
	for _, w := range a.Kinds {
		k.kind("accepts", w)
	}
	k.unique("accepts: kind", a.Kinds)
	switch a.Column {
	case "":
		if a.Low.Set || a.High.Set {
			k.bad("accepts: a limit needs a column")
		}
	case "mass", "metals":
	default:
		k.bad("accepts: column %q: want mass or metals", a.Column)
	}
	if a.Low.Set && a.High.Set && a.Low.Parameter == "" && a.High.Parameter == "" && !(a.Low.Value < a.High.Value) {
		k.bad("accepts: nothing lies between %v and %v", a.Low.Value, a.High.Value)
	}
	for _, l := range []Limit{a.Low, a.High} {
		if l.Parameter == "" {
			if math.IsNaN(l.Value) {
				k.bad("accepts: a limit is not a number")
			}
			continue
		}
		if process, _, other := strings.Cut(l.Parameter, "."); other {
			if _, known := ProcessNamed(process); !known {
				k.bad("accepts: limit %s: unknown process %q", l.Parameter, process)
			}
		} else if k.parameterNamed(l.Parameter) == nil {
			k.bad("accepts: no parameter %q", l.Parameter)
		}
	}
}
