package conform

import (
	"math"
	"time"

	"wane/sim/law"
	"wane/sim/law/lawtest"
)

// pace is how long a question takes.
type pace struct {
	question string
	row      float64 // seconds a row, in large batches
	call     float64 // seconds a call about one row
}

// speed times every question. It says no if the law is so slow that asking it
// all the rest would take for ever.
func (j *judge) speed(p Process) bool {
	card := p.Describe()
	if _, known := law.ProcessNamed(card.Process); !known {
		return true // nothing can be asked; the card is judged
	}
	slowest := pace{}
	for _, q := range card.Questions {
		x, ok := j.pace(p, q.Name)
		if !ok {
			continue // what is wrong is found later, with its reason
		}
		if x.row > slowest.row {
			slowest = x
		}
		if x.row > tooSlow {
			j.found("speed", q.Name, Fail, "%s a row: too slow to be used, and to be judged further; want below %s", short(x.row), short(slow))
			return false
		}
		if x.row > slow {
			j.found("speed", q.Name, Warn, "%s a row, want below %s: a run asks about every object", short(x.row), short(slow))
		}
	}
	if len(j.of("speed")) == 0 && slowest.question != "" {
		j.found("speed", "", Pass, "%s a row in batches of %d, %s for a call about one row (question %s)",
			short(slowest.row), speedRows, short(slowest.call), slowest.question)
	}
	return true
}

func (j *judge) of(check string) []Finding {
	var out []Finding
	for _, f := range j.findings {
		if f.Check == check {
			out = append(out, f)
		}
	}
	return out
}

// pace is measured on few rows first, so that a law of a second a row is not
// asked about many.
func (j *judge) pace(p Process, question string) (pace, bool) {
	x := pace{question: question}
	call, ok := j.time(p, question, 1)
	if !ok {
		return x, false
	}
	few, ok := j.time(p, question, firstRows)
	if !ok {
		return x, false
	}
	x.call, x.row = call, (few-call)/firstRows
	if x.row > tooSlow {
		return x, true
	}
	many, ok := j.time(p, question, speedRows)
	x.row = many / speedRows
	return x, ok
}

// time is the shortest of several answers, in seconds.
func (j *judge) time(p Process, question string, rows int) (float64, bool) {
	in := lawtest.Rows(p, question, rows, lawtest.Among(j.Among...))
	best := math.Inf(1)
	for range speedTimes {
		from := j.now()
		if j.ctx.Err() != nil {
			return 0, false
		}
		if _, err := p.Answer(question, in); err != nil {
			return 0, false
		}
		took := j.now().Sub(from)
		best = math.Min(best, took.Seconds())
		if took > time.Second {
			break
		}
	}
	return best, true
}

// short writes seconds with two figures and a fitting unit.
func short(seconds float64) string {
	return time.Duration(roundTo2(seconds * 1e9)).String()
}

func roundTo2(ns float64) float64 {
	step := 1.0
	for ns/step >= 100 {
		step *= 10
	}
	return math.Round(ns/step) * step
}
