package law

import (
	"math"
	"strings"
)

// thresholds checks what a wearing law says of masses at which objects turn
// into something else.
func (k *cardCheck) thresholds() {
	if k.process.Role != Wearing {
		if len(k.Thresholds) > 0 || k.Wears != "" {
			k.bad("only wearing laws have thresholds or wear")
		}
		return
	}
	if source, gain := strings.CutPrefix(k.Wears, "gain from "); k.Wears != "" && k.Wears != "loss" && (!gain || source == "") {
		k.bad(`wears %q: want "loss" or "gain from <source>"`, k.Wears)
	}
	last := map[string]float64{}
	for _, t := range k.Thresholds {
		k.kind("threshold", t.Kind)
		if t.Becomes != Gone {
			k.kind("threshold of "+t.Kind, t.Becomes)
		}
		if !wordForm.MatchString(t.Outcome) {
			k.bad("threshold of %s: outcome %q: want a word", t.Kind, t.Outcome)
		}
		mass, ok := k.thresholdMass(t)
		if !ok {
			continue
		}
		if !(mass >= 0 && mass < math.Inf(1)) {
			k.bad("threshold of %s: mass %v solMass: want >= 0", t.Kind, mass)
		}
		if before, again := last[t.Kind]; again && !(mass < before) {
			k.bad("thresholds of %s: %v solMass after %v: want the largest first", t.Kind, mass, before)
		}
		last[t.Kind] = mass
	}
}

// thresholdMass is a threshold's mass at the presets; it reports a threshold
// that has none.
func (k *cardCheck) thresholdMass(t Threshold) (float64, bool) {
	if t.Parameter == "" {
		if len(t.ByWord) > 0 {
			k.bad("threshold of %s: masses by word, but of no parameter", t.Kind)
			return 0, false
		}
		return t.Mass, true
	}
	p := k.parameterNamed(t.Parameter)
	if p == nil {
		k.bad("threshold of %s: no parameter %q", t.Kind, t.Parameter)
		return 0, false
	}
	if len(t.ByWord) != len(p.Words) {
		k.bad("threshold of %s: %d masses for the %d words of parameter %s", t.Kind, len(t.ByWord), len(p.Words), p.Name)
		return 0, false
	}
	if len(p.Words) == 0 {
		if p.Log10 {
			k.bad("threshold of %s: parameter %s is a logarithm, want a mass", t.Kind, p.Name)
		}
		return p.Preset, true
	}
	if i := int(p.Preset); p.Preset >= 0 && i < len(t.ByWord) {
		return t.ByWord[i], true
	}
	return 0, false
}

func (k *cardCheck) clocks() {
	role := k.process.Role
	if role != Dynamics && role != Encounter {
		if len(k.Clocks) > 0 || k.Frame || k.StopOutcome != "" || k.StopFate != "" {
			k.bad("only laws of dynamics and encounters have clocks, a frame or a stop")
		}
		return
	}
	var names []string
	for _, c := range k.Clocks {
		names = append(names, c.Name)
		if !wordForm.MatchString(c.Name) {
			k.bad("clock %q: want a word", c.Name)
		}
		switch {
		case c.Fate == FateMeet && role == Encounter:
		case role == Encounter:
			k.bad("clock %s: fate %q: clocks of an encounter law make objects meet", c.Name, c.Fate)
		case c.Fate == FateAdrift, c.Fate == FateCentral, c.Fate == FateGas:
			if !wordForm.MatchString(c.Outcome) {
				k.bad("clock %s: outcome %q: want a word", c.Name, c.Outcome)
			}
		default:
			k.bad("clock %s: fate %q: want adrift, central or gas", c.Name, c.Fate)
		}
	}
	k.unique("clock", names)
	if len(k.Clocks) > 0 && !(k.Answers("rate") && k.Answers("expose")) {
		k.bad("a law with clocks must answer rate and expose")
	}
	if role == Encounter && len(k.Clocks) > 0 && !k.Answers("meet") {
		k.bad("a law whose clocks make objects meet must answer meet")
	}
	if k.Frame != (k.Process == "ejection") {
		k.bad("the frame belongs to process ejection, and to no other")
	}
	if k.Frame && !k.Answers("rate") {
		k.bad("a law with the frame must answer rate")
	}
	switch k.StopFate {
	case "":
		if k.StopOutcome != "" {
			k.bad("outcome %q of the stop has no fate", k.StopOutcome)
		}
	case FateAdrift, FateCentral, FateGas:
		if !wordForm.MatchString(k.StopOutcome) || !k.Frame {
			k.bad("a stop needs the frame and a word")
		}
	default:
		k.bad("fate %q of the stop: want adrift, central or gas", k.StopFate)
	}
}

// endings are the effects an ending may have.
var endings = []string{"everything-ends", "all-adrift", "dark-energy-decays"}

func (k *cardCheck) words() {
	var outcomes []string
	for _, o := range k.Outcomes {
		outcomes = append(outcomes, o.Word)
		if !wordForm.MatchString(o.Word) {
			k.bad("outcome %q: want a word", o.Word)
		}
		if k.process.Role == Turning && o.Becomes != Gone {
			k.kind("outcome "+o.Word, o.Becomes)
		}
	}
	k.unique("outcome", outcomes)
	if len(k.Outcomes) == 0 && !k.Idle && (k.process.Role == Turning || k.Answers("meet")) {
		k.bad("no outcomes")
	}
	if k.Effect != "" && (k.process.Role != Ending || !contains(endings, k.Effect)) {
		k.bad("effect %q: want one of %s, of an ending", k.Effect, strings.Join(endings, ", "))
	}
	var kinds []string
	for _, own := range k.Kinds {
		kinds = append(kinds, own.Name)
		if !wordForm.MatchString(own.Name) || own.Name == Gone || contains(KindWords, own.Name) {
			k.bad("kind %q: want a word of its own", own.Name)
		}
		if int(own.Composition) >= len(CompositionWords) {
			k.bad("kind %s: composition %d: want below %d", own.Name, own.Composition, len(CompositionWords))
		}
	}
	k.unique("kind", kinds)
}
