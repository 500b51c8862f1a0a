package lawtest

import (
	"fmt"
	"strings"

	"wane/sim/law"
)

// setting is a parameter's value in words.
func setting(p law.Parameter, v float64) string {
	if len(p.Words) > 0 {
		return p.Name + " = " + p.Words[int(v)]
	}
	if p.Log10 {
		return fmt.Sprintf("%s = 10^%v %s", p.Name, v, p.Unit)
	}
	return strings.TrimSpace(fmt.Sprintf("%s = %v %s", p.Name, v, p.Unit))
}

// checkParameters finds parameters that change nothing: no answer, no
// threshold, no range of this law or of one that runs beside it, neither at the
// presets of the others nor with one of them at an end of its range.
func (k *kit) checkParameters() {
	before := k.probe(nil)
	for i, p := range k.card.Parameters {
		values := extremes(p)
		switch {
		case k.readByHost(p.Name) || k.bounds(p.Name):
		case len(values) == 0:
			k.doubt("parameter", "", "%s can only be %v", p.Name, p.Preset)
		case !k.changes(p, values, before) && !k.changesBesideAnother(p, values):
			k.doubt("parameter", "", "parameter %d, %s, changes nothing between %s and %s",
				i, p.Name, setting(p, values[0]), setting(p, values[len(values)-1]))
		}
	}
}

// changesBesideAnother tells whether a parameter changes something once another
// is not at its preset, as the time of an infall does once there is one.
func (k *kit) changesBesideAnother(p law.Parameter, values []float64) bool {
	for _, another := range k.card.Parameters {
		if another.Name == p.Name {
			continue
		}
		for _, v := range extremes(another) {
			beside := k.with(another.Name, v)
			if beside.changes(p, values, beside.probe(nil)) {
				return true
			}
		}
	}
	return false
}

func (k *kit) changes(p law.Parameter, values []float64, before []probe) bool {
	for _, v := range values {
		other := k.with(p.Name, v)
		for i, x := range other.probe(before) {
			if differ(x.out, before[i].out) != "" {
				return true
			}
		}
		for _, t := range k.card.Thresholds {
			if k.use.ThresholdMass(t) != other.use.ThresholdMass(t) {
				return true
			}
		}
	}
	return false
}

// probe is a batch and its answer.
type probe struct {
	question string
	in, out  law.Batch
}

// probe asks every question about the same rows as before: plausible ones and
// corners. An answer that breaks the rules is as good as none here.
func (k *kit) probe(before []probe) []probe {
	out := before
	if before == nil {
		for _, q := range k.card.Questions {
			rows := 500
			if q.Name == "meet" { // the two are seldom of the kinds that a parameter is about
				rows = 8000
			}
			out = append(out, probe{question: q.Name, in: lay(q, append(k.entries(q, rows), k.corners(q)...))})
		}
	}
	out = append([]probe(nil), out...)
	for i := range out {
		answer, err := k.direct(out[i].question, out[i].in)
		if err != nil {
			answer = law.Batch{}
		}
		out[i].out = pick(answer, upTo(0, whole(answer)))
	}
	return out
}

// whole is how many rows every column of an answer really has.
func whole(b law.Batch) int {
	n := b.Rows
	for _, c := range b.Columns {
		n = min(n, max(len(c.Values), len(c.Words)))
	}
	return n
}

// readByHost tells whether the host itself reads the parameter: today's
// universe, which every sky law states.
func (k *kit) readByHost(name string) bool {
	if role(k.card) != law.Sky {
		return false
	}
	for _, n := range law.SkyParameters {
		if n == name {
			return true
		}
	}
	return false
}

// bounds tells whether a range hangs on the parameter.
func (k *kit) bounds(name string) bool {
	hangs := func(c law.Card, name string) bool {
		return c.Accepts.Low.Parameter == name || c.Accepts.High.Parameter == name
	}
	if hangs(k.card, name) {
		return true
	}
	for _, l := range k.among {
		if hangs(l.Describe(), k.card.Process+"."+name) {
			return true
		}
	}
	return false
}
