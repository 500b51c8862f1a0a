package conform

import (
	"context"
	"errors"
	"reflect"
	"strings"
	"time"

	"wane/sim/law"
	"wane/sim/law/lawtest"
	"wane/sim/rpc"
	"wane/sim/rpc/folder"
	"wane/sim/scenario/quantity"
)

// Bounds on time. A run starts a law once, and waits for it to end once.
const (
	startSlow  = 6 * time.Second
	handLimit  = 5 * time.Second
	endLimit   = time.Second
	slow       = 10e-6  // seconds a row from which on a run is felt to wait
	tooSlow    = 100e-6 // seconds a row from which on no galaxy can be asked about
	speedRows  = 16384  // rows that a run asks about at a time
	firstRows  = 256    // rows by which the far too slow are known
	freshRows  = 1000
	speedTimes = 3
)

// faults lists what an error is made of.
func faults(err error) []string {
	var out []string
	if f, ok := err.(folder.Faults); ok {
		for _, each := range f {
			out = append(out, each.Error())
		}
		return out
	}
	joined, ok := err.(interface{ Unwrap() []error })
	if !ok {
		return []string{err.Error()}
	}
	for _, e := range joined.Unwrap() {
		out = append(out, faults(e)...)
	}
	return out
}

func (j *judge) ready() bool {
	if j.Ready == nil {
		return true
	}
	if !j.begin("folder") {
		return false
	}
	err := j.Ready(j.ctx)
	if err != nil {
		for _, f := range faults(err) {
			j.found("folder", "", Fail, "%s", f)
		}
	}
	return err == nil
}

func (j *judge) start() (Process, bool) {
	if !j.begin("start") {
		return nil, false
	}
	from := j.now()
	p, err := j.Open(j.ctx)
	if err != nil {
		j.unstarted(err)
		return nil, false
	}
	if took := j.now().Sub(from); took > startSlow {
		j.found("start", "", Warn, "it took %.1f s to start; every run waits for it", took.Seconds())
	}
	return p, true
}

// unstarted tells why a law did not start, each fault of its card by itself.
func (j *judge) unstarted(err error) {
	var card *rpc.CardError
	if !errors.As(err, &card) {
		for _, f := range faults(err) {
			j.found("start", "", Fail, "%s", f)
		}
		return
	}
	for _, f := range card.Faults {
		check, text := "card", f.Error()
		switch {
		case strings.Contains(text, "when asked for twice"):
			check = "describe"
		case strings.Contains(text, " unit "):
			check = "units"
		}
		j.begun = append(j.begun, check)
		j.found(check, "", Fail, "%s", text)
	}
}

func (j *judge) byHand() {
	if j.ByHand == nil || !j.begin("by-hand") {
		return
	}
	ctx, cancel := context.WithTimeout(j.ctx, handLimit)
	defer cancel()
	said, code, err := j.ByHand(ctx)
	switch {
	case ctx.Err() != nil:
		j.found("by-hand", "", Warn, "started by hand it went on for %v", handLimit)
	case err != nil:
		j.found("by-hand", "", Warn, "%v", err)
	case code == 0:
		j.found("by-hand", "", Warn, "started by hand it ended with exit code 0, as if all were well")
	case strings.TrimSpace(said) == "":
		j.found("by-hand", "", Warn, "started by hand it ended with exit code %d and said nothing", code)
	}
}

// units judges the units of parameters, by which values in scenarios are read.
func (j *judge) units(p Process) {
	if !j.begin("units") {
		return
	}
	for _, x := range p.Describe().Parameters {
		if x.Unit == "" || len(x.Words) > 0 {
			continue
		}
		if _, err := quantity.ParseUnit(x.Unit); err != nil {
			j.found("units", "", Fail, "parameter %s: %v", x.Name, err)
		}
	}
}

// fresh compares the process, which has been asked much by now, with a new one.
func (j *judge) fresh(p Process) {
	if !j.begin("fresh") {
		return
	}
	other, err := j.Open(j.ctx)
	if err != nil {
		for _, f := range faults(err) {
			j.found("fresh", "", Fail, "started again: %s", f)
		}
		return
	}
	defer func() { _ = other.Close() }() // how it ends is judged on the first
	card := p.Describe()
	if again := other.Describe(); !reflect.DeepEqual(card, again) {
		j.found("describe", "", Fail, "a new process shows another card: %s", unlike(card, again))
		return
	}
	for _, q := range card.Questions {
		in := lawtest.Rows(p, q.Name, freshRows, lawtest.Among(j.Among...))
		old, err := p.Answer(q.Name, in)
		if err != nil {
			continue // reported before
		}
		anew, err := other.Answer(q.Name, in)
		if err != nil {
			j.found("fresh", q.Name, Fail, "in a new process: %v", err)
		} else if d := lawtest.Differ(old, anew); d != "" {
			j.found("fresh", q.Name, Fail, "in one process, then in a new one: %s", d)
		}
	}
}

// unlike names the first field in which two cards differ.
func unlike(a, b law.Card) string {
	x, y := reflect.ValueOf(a), reflect.ValueOf(b)
	for i := range x.NumField() {
		if !reflect.DeepEqual(x.Field(i).Interface(), y.Field(i).Interface()) {
			return strings.ToLower(x.Type().Field(i).Name) + " differs"
		}
	}
	return "nothing differs"
}

func (j *judge) crashes(p Process) {
	r, ok := p.(interface{ Restarts() int })
	if !ok || !j.begin("crash") {
		return
	}
	if n := r.Restarts(); n > 0 {
		log := ""
		if l, ok := p.(law.Outside); ok && l.Log() != "" {
			log = "; its log: " + strings.TrimSpace(l.Log())
		}
		j.found("crash", "", Fail, "it crashed or hung and was started again, %d times%s", n, log)
	}
}

func (j *judge) end(p Process) {
	took, err := j.closing(p)
	if err == nil && took > endLimit { // the machine may have been busy: once more
		if again, opening := j.Open(j.ctx); opening == nil {
			second, failure := j.closing(again)
			took, err = min(took, second), failure
		}
	}
	switch {
	case err != nil:
		j.found("end", "", Fail, "%v", err)
	case took > endLimit:
		j.found("end", "", Fail, "it took %.1f s to end, want at most %v", took.Seconds(), endLimit)
	}
	if j.Left == nil {
		return
	}
	for _, left := range j.Left(p) {
		j.found("end", "", Fail, "left behind: %s", left)
	}
}

func (j *judge) closing(p Process) (time.Duration, error) {
	from := j.now()
	err := p.Close()
	return j.now().Sub(from), err
}
