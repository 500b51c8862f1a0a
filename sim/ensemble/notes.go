package ensemble

import (
	"fmt"
	"math"
	"strings"

	"wane/sim/engine"
	"wane/sim/law"
)

// exponentOnly is the log10 date beyond which only the exponent means
// anything: the last bit of log10 t is then a factor of 2 in t or more.
const exponentOnly = 1e15

// notes are what the reader has to know beside the numbers.
func notes(outcomes []engine.Outcome, info *Info, populations []Population) []string {
	var out []string
	say := func(format string, a ...any) { out = append(out, fmt.Sprintf(format, a...)) }
	var far, unsure, partly []string
	for i, p := range populations {
		if latest(p) > exponentOnly {
			far = append(far, p.Name)
		}
		if p.Last.Cut > 0 && p.Last.Cut < 1 {
			unsure = append(unsure, p.Name)
		}
		without := 0
		for j := range outcomes {
			if outcomes[j].Populations[i].Peak == 0 {
				without++
			}
		}
		if without > 0 && without < len(outcomes) {
			partly = append(partly, fmt.Sprintf("%s (%d of %d)", p.Name, without, len(outcomes)))
		}
	}
	if len(far) > 0 {
		say("Beyond 10^(10^15) yr only the exponent means anything: half, hundredth and last are one number there (%s).",
			strings.Join(far, ", "))
	}
	out = append(out, skyNotes(outcomes)...)
	out = append(out, stopNotes(outcomes, populations)...)
	if len(unsure) > 0 {
		say("Some realisations ended before the last member went; in medians and ranges they count as later than any date (%s).",
			strings.Join(unsure, ", "))
	}
	if len(partly) > 0 {
		say("Without a member in some realisations, which are left out of its marks: %s.", strings.Join(partly, ", "))
	}
	if missing := withoutLaw(info); len(missing) > 0 {
		say("Left out, with no law in this run: %s.", strings.Join(missing, ", "))
	}
	return out
}

// latest is the latest date of a population, -Inf if there is none.
func latest(p Population) float64 {
	d := math.Inf(-1)
	for _, v := range []float64{p.PeakDate, p.Half.Date, p.Hundredth.Date, p.Last.Date} {
		if v > d {
			d = v
		}
	}
	return d
}

// stopNotes name the populations whose last date, and whose hundredth with it,
// is that at which the ejection law declared the galaxy over.
func stopNotes(outcomes []engine.Outcome, populations []Population) []string {
	var both, last []string
	stopped := medianOf(outcomes, func(o *engine.Outcome) float64 { return o.StoppedAt })
	for i, p := range populations {
		n, m := 0, 0
		for j := range outcomes {
			o := &outcomes[j]
			if q := &o.Populations[i]; q.Peak > 0 && !q.CutLast && q.Last == o.StoppedAt {
				n++
				if q.Hundredth == q.Last {
					m++
				}
			}
		}
		switch {
		case 2*m > len(outcomes):
			both = append(both, p.Name)
		case n > 0:
			last = append(last, p.Name)
		}
	}
	var out []string
	if len(both) > 0 {
		out = append(out, fmt.Sprintf("Hundredth and last are one date by assumption, that at which the galaxy counts as over (10^%.2f yr): %s.",
			stopped, strings.Join(both, ", ")))
	}
	if len(last) > 0 {
		out = append(out, fmt.Sprintf("The last date is an assumption, that at which the galaxy counts as over (10^%.2f yr), wherever members lasted until then: %s.",
			stopped, strings.Join(last, ", ")))
	}
	return out
}

// withoutLaw lists the processes that this run has no law for, but those
// that follow pairs.
func withoutLaw(info *Info) []string {
	if len(info.Laws) == 0 {
		return nil
	}
	in := map[string]bool{}
	for _, l := range info.Laws {
		in[l.Process] = true
	}
	var out []string
	for _, p := range law.Processes {
		if !in[p.Name] && p.Role != law.TwoBody {
			out = append(out, p.Name)
		}
	}
	return out
}
