package conform

import (
	"context"
	"errors"
	"fmt"
	"strings"
	"time"

	"wane/sim/law"
	"wane/sim/law/lawtest"
	"wane/sim/rpc"
)

// Level tells how a check went.
type Level string

// The levels. A law is fit for a run if nothing fails.
const (
	Pass Level = "pass"
	Warn Level = "warn"
	Fail Level = "fail"
)

// Finding is how one check went, or one of several things that it found.
type Finding struct {
	Check    string `json:"check"`
	Question string `json:"question,omitempty"`
	Level    Level  `json:"level"`
	Text     string `json:"text"`
	Advice   string `json:"advice,omitempty"` // what to do about it
}

// Process is a law in a process of its own. It may also have a method
// Restarts() int, the number of crashes that were healed by starting it again.
type Process interface {
	law.Law
	// Close ends the process and returns when it is gone.
	Close() error
}

// Subject is the law to be judged.
type Subject struct {
	// Ready makes what is to be started, such as a program out of its source.
	// Nil: there is nothing to be made. Its error is like that of Open.
	Ready func(context.Context) error
	// Open starts the law, each time in a process of its own. Its error may
	// hold several faults, as errors.Join makes.
	Open func(context.Context) (Process, error)
	// ByHand starts it as a person might who does not know what it is, and
	// returns what it said and its exit code. Nil: not judged.
	ByHand func(context.Context) (said string, code int, err error)
	// Left names what is still there of a closed process: itself, its socket, a
	// file. Nil: not judged.
	Left func(Process) []string
	// Among are laws that run beside it: they resolve ranges that hang on
	// another process's parameter.
	Among []law.Law
	// Begins, if not nil, is told of each check before it begins.
	Begins func(check string)

	now func() time.Time // the clock, which tests turn
}

// Fit tells whether a law with these findings may be used in a run.
func Fit(findings []Finding) bool {
	for _, f := range findings {
		if f.Level == Fail {
			return false
		}
	}
	return len(findings) > 0
}

// judge is a judgement under way.
type judge struct {
	Subject
	ctx      context.Context
	findings []Finding
	begun    []string // checks that were carried out
}

// Judge takes the law through every check, as far as it gets: a law that does
// not start has no answers. It ends early, with an error, when the context
// does.
func Judge(ctx context.Context, s Subject) ([]Finding, error) {
	if s.now == nil {
		s.now = time.Now
	}
	j := &judge{Subject: s, ctx: ctx}
	j.all()
	if err := ctx.Err(); err != nil {
		return nil, err
	}
	return j.inOrder(), nil
}

// begin announces a check; it says no once the context has ended.
func (j *judge) begin(check string) bool {
	if j.ctx.Err() != nil {
		return false
	}
	j.begun = append(j.begun, check)
	if j.Begins != nil {
		j.Begins(check)
	}
	return true
}

func (j *judge) found(check, question string, level Level, format string, a ...any) {
	f := Finding{Check: check, Question: question, Level: level, Text: fmt.Sprintf(format, a...)}
	if level != Pass {
		f.Advice = known(check).advice
	}
	j.findings = append(j.findings, f)
}

func (j *judge) all() {
	if !j.ready() {
		return
	}
	p, ok := j.start()
	if !ok {
		return
	}
	closed := false
	defer func() {
		if !closed { // the judgement was broken off: what it would say of the end does not matter
			_ = p.Close()
		}
	}()
	j.byHand()
	if j.begin("speed") && j.speed(p) {
		lives := j.rules(p)
		j.units(p)
		if lives {
			j.fresh(p)
		}
	}
	j.crashes(p)
	if j.begin("end") {
		closed = true
		j.end(p)
	}
}

// rules are those that any law must hold. It says no if the law has ended for
// good over one of them.
func (j *judge) rules(p Process) bool {
	if end := stopped(p); end != nil { // while it was timed
		if j.begin("answer") {
			j.found("answer", "", Fail, "%v", end)
		}
		return false
	}
	watch := lawtest.Watch(func(check string) bool {
		if stopped(p) != nil {
			return false
		}
		switch check {
		case "answer": // whose finding may be about chances
			return j.begin("answer") && j.begin("chances")
		case "rows":
			return j.begin("rows") && j.begin("order")
		}
		return j.begin(check)
	})
	findings := lawtest.Check(p, watch, lawtest.Among(j.Among...))
	end, told := stopped(p), false
	for _, f := range findings {
		if end != nil && strings.Contains(f.Detail, end.Error()) {
			if told {
				continue // it answered no more
			}
			told = true
		} else if told {
			continue
		}
		level := Fail
		if f.Doubt {
			level = Warn
		}
		j.found(f.Check, f.Question, level, "%s", f.Detail)
	}
	return end == nil
}

// stopped is why the law answers no more, nil while it does.
func stopped(p Process) error {
	questions := p.Describe().Questions
	if len(questions) == 0 {
		return nil
	}
	q := questions[0].Name
	_, err := p.Answer(q, lawtest.Rows(p, q, 1))
	var end *rpc.StoppedError
	if errors.As(err, &end) {
		return end
	}
	return nil
}

// inOrder lists the findings by check, with a pass for each check that found
// nothing.
func (j *judge) inOrder() []Finding {
	var out []Finding
	for _, c := range checks {
		some := false
		for _, f := range j.findings {
			if f.Check == c.word {
				out, some = append(out, f), true
			}
		}
		if some {
			continue
		}
		for _, word := range j.begun {
			if word == c.word {
				out = append(out, Finding{Check: c.word, Level: Pass, Text: c.passed})
				break
			}
		}
	}
	return out
}
