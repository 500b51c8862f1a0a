package lawtest

import (
	"errors"
	"fmt"
	"math/rand/v2"
	"slices"

	"wane/sim/law"
)

// Finding is one rule the law breaks.
type Finding struct {
	Check    string // the rule, one of [Words]
	Question string // empty when it is about the law as a whole
	Detail   string // what was asked and what came back
	// Doubt says that the contract does not forbid it: somebody should look.
	Doubt bool
}

func (f Finding) String() string {
	if f.Question == "" {
		return f.Check + ": " + f.Detail
	}
	return f.Check + ": question " + f.Question + ": " + f.Detail
}

// Words are the checks, in the order of their first finding.
func Words() []string {
	return []string{"card", "describe", "answer", "chances", "shapes", "pure", "input", "unset", "rows", "order", "monotone", "size", "domain", "foretell", "parameter"}
}

// Option changes how a law is checked.
type Option func(*settings)

type settings struct {
	foretell float64
	among    []law.Law
	watch    func(check string) bool
}

// ForetellWithin sets how far, relatively, the foretold wait may be from the
// integral of the wear. The default is 1e-6. Say in the test why it is more.
func ForetellWithin(relative float64) Option { return func(s *settings) { s.foretell = relative } }

// Among names laws that run beside this one: where its range hangs on another
// process's parameter ("collapse.m_up"), the first law of that process among
// them sets it, and its parameters may matter to their ranges alone.
func Among(laws ...law.Law) Option { return func(s *settings) { s.among = laws } }

// Watch is told of each check before it begins. Where it says no, the check
// and all after it are left out.
func Watch(begins func(check string) bool) Option { return func(s *settings) { s.watch = begins } }

// Test is the part of testing.TB that Run needs. A program that only checks
// laws then does without package testing.
type Test interface {
	Helper()
	Errorf(format string, a ...any)
}

// Run checks a law and fails the test for each rule it breaks.
func Run(t Test, l law.Law, options ...Option) {
	t.Helper()
	c := l.Describe()
	for _, f := range Check(l, options...) {
		t.Errorf("law %s/%s: %s", c.Process, c.Name, f)
	}
}

// Check takes a law through the whole kit and returns what it found, at most
// one finding a rule and question where one tells enough.
func Check(l law.Law, options ...Option) []Finding {
	s := settings{foretell: 1e-6, watch: func(string) bool { return true }}
	for _, o := range options {
		o(&s)
	}
	k := &kit{settings: s, law: l, card: l.Describe(), findings: &[]Finding{}}
	if !k.watch("card") {
		return nil
	}
	k.checkCard()
	if _, known := law.ProcessNamed(k.card.Process); !known {
		return *k.findings
	}
	k.use, k.set = k.inUse(nil)
	var sound []law.Question // those with answers to compare
	each := func(check func(law.Question)) func() {
		return func() {
			for _, q := range sound {
				check(q)
			}
		}
	}
	for _, c := range []struct {
		word string
		do   func()
	}{
		{"describe", k.checkDescribe},
		{"answer", func() {
			for _, q := range k.card.Questions {
				if k.checkAnswer(q) {
					sound = append(sound, q)
				}
			}
		}},
		{"shapes", each(k.checkShapes)},
		{"pure", each(k.checkPure)},
		{"unset", each(k.checkUnset)},
		{"rows", each(k.checkRows)},
		{"monotone", each(k.checkMonotone)},
		{"size", each(k.checkSize)},
		{"domain", k.checkDomain},
		{"foretell", k.checkForetell},
		{"parameter", k.checkParameters},
	} {
		if !k.watch(c.word) {
			break
		}
		c.do()
	}
	return *k.findings
}

// kit is one law under test, at one setting of its parameters.
type kit struct {
	settings
	law      law.Law
	card     law.Card
	use      *law.Use
	set      *law.Set
	findings *[]Finding
}

func (k *kit) found(check, question, format string, a ...any) {
	k.add(Finding{Check: check, Question: question, Detail: fmt.Sprintf(format, a...)})
}

// doubt is a finding that is no breach.
func (k *kit) doubt(check, question, format string, a ...any) {
	k.add(Finding{Check: check, Question: question, Detail: fmt.Sprintf(format, a...), Doubt: true})
}

// wrong is an answer that failed: under the name of the check that asked, but
// for chances, which have a name of their own.
func (k *kit) wrong(check, question, when string, err error) {
	var fault *law.Fault
	if errors.As(err, &fault) && fault.Column == "chances" {
		check = "chances"
	}
	k.found(check, question, "%s%v", when, err)
}

func (k *kit) add(f Finding) {
	if !slices.Contains(*k.findings, f) {
		*k.findings = append(*k.findings, f)
	}
}

// random returns draws that depend on the name alone.
func random(name string) *rand.Rand {
	seed := uint64(14695981039346656037)
	for _, c := range []byte(name) {
		seed = (seed ^ uint64(c)) * 1099511628211
	}
	return rand.New(rand.NewPCG(seed, 1))
}

// inUse prepares the law with some parameters changed, beside the others.
func (k *kit) inUse(change map[string]float64) (*law.Use, *law.Set) {
	u := law.NewUse(k.law)
	for name, value := range change {
		if err := u.Set(name, value); err != nil {
			k.found("parameter", "", "%v", err)
		}
	}
	uses := []*law.Use{u}
	taken := map[string]bool{k.card.Process: true}
	for _, l := range k.among {
		other := law.NewUse(l)
		if !taken[other.Card.Process] {
			taken[other.Card.Process] = true
			uses = append(uses, other)
		}
	}
	set, faults := law.NewSet(uses...)
	if len(k.among) > 0 {
		for _, f := range faults {
			k.found("card", "", "%v", f)
		}
	}
	return u, set
}

// with is the kit for the same law with one parameter more changed.
func (k *kit) with(parameter string, value float64) *kit {
	change := map[string]float64{}
	for i, p := range k.card.Parameters {
		if now := k.use.Parameters[i]; now != p.Preset {
			change[p.Name] = now
		}
	}
	change[parameter] = value
	other := *k
	other.use, other.set = k.inUse(change)
	return &other
}

// ask asks through the one place where answers are checked. A panic of the law
// is an error like another.
func (k *kit) ask(question string, in law.Batch) (out law.Batch, err error) {
	defer func() {
		if r := recover(); r != nil {
			err = fmt.Errorf("panic: %v", r)
		}
	}()
	out, err = k.use.Ask(question, in)
	if d, ok := k.law.(law.Distant); ok && err == nil && question == "foretell" {
		for i, wait := range out.Values("wait") {
			if !(wait >= d.Soonest()) {
				return out, fmt.Errorf("row %d (%s): a wait of 10^%v yr, and no wait is shorter than 10^%v yr, the law says", i, in.Object(i), wait, d.Soonest())
			}
		}
	}
	return out, err
}

// direct asks the law itself, so that a batch of no rows arrives too.
func (k *kit) direct(question string, in law.Batch) (out law.Batch, err error) {
	defer func() {
		if r := recover(); r != nil {
			err = fmt.Errorf("panic: %v", r)
		}
	}()
	in.Parameters, in.Kinds = k.use.Parameters, k.set.Kinds
	return k.law.Answer(question, in)
}

// Rows is a batch of n plausible rows for a question of a law's card, with the
// parameters at their presets: what the checks ask about. It has no columns where
// the card has no such question.
func Rows(l law.Law, question string, n int, options ...Option) law.Batch {
	var s settings
	for _, o := range options {
		o(&s)
	}
	k := &kit{settings: s, law: l, card: l.Describe(), findings: &[]Finding{}}
	k.use, k.set = k.inUse(nil)
	b := k.plausible(k.question(question), n)
	b.Parameters, b.Kinds = k.use.Parameters, k.set.Kinds
	return b
}

// Differ tells where two answers differ in a bit; it is empty where they do not.
func Differ(a, b law.Batch) string { return differ(a, b) }
