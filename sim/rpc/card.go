package rpc

import (
	"fmt"
	"slices"

	"wane/sim/law"
	"wane/sim/rpc/wire"
)

// cardToWire writes a card for the wire, with the unit of every column.
func cardToWire(c law.Card, runtime string) *wire.Card {
	w := &wire.Card{
		Contract: Contract,
		Process:  c.Process, Name: c.Name, Version: c.Version,
		Summary: c.Summary, Formula: c.Formula, Domain: c.Domain, Sources: c.Sources, Notes: c.Notes,
		Accepts:    &wire.Accepts{Kinds: c.Accepts.Kinds, Column: c.Accepts.Column, Low: limitToWire(c.Accepts.Low), High: limitToWire(c.Accepts.High)},
		Wears:      c.Wears,
		Frame:      c.Frame,
		StopFate:   string(c.StopFate),
		Effect:     c.Effect,
		Idle:       c.Idle,
		Tolerance:  c.Tolerance,
		Runtime:    runtime,
		Thresholds: each(c.Thresholds, thresholdToWire), StopOutcome: c.StopOutcome,
		Questions: each(c.Questions, questionToWire), Parameters: each(c.Parameters, parameterToWire),
		Clocks: each(c.Clocks, func(k law.Clock) *wire.Clock {
			return &wire.Clock{Name: k.Name, Doc: k.Doc, Outcome: k.Outcome, Fate: string(k.Fate)}
		}),
		Outcomes: each(c.Outcomes, func(o law.Outcome) *wire.Outcome {
			return &wire.Outcome{Word: o.Word, Doc: o.Doc, Becomes: o.Becomes}
		}),
	}
	for _, k := range c.Kinds {
		composition := fmt.Sprint(k.Composition) // no word: the host will say so
		if int(k.Composition) < len(law.CompositionWords) {
			composition = law.CompositionWords[k.Composition]
		}
		w.Kinds = append(w.Kinds, &wire.Kind{Name: k.Name, Doc: k.Doc, Composition: composition})
	}
	return w
}

// each converts a list; an empty one becomes nil.
func each[A, B any](list []A, convert func(A) B) []B {
	var out []B
	for _, a := range list {
		out = append(out, convert(a))
	}
	return out
}

func limitToWire(l law.Limit) *wire.Limit {
	if !l.Set {
		return nil
	}
	return &wire.Limit{Value: l.Value, Parameter: l.Parameter}
}

func questionToWire(q law.Question) *wire.Question {
	return &wire.Question{Name: q.Name, Words: q.Words, Inputs: each(q.Inputs, func(name string) *wire.Column {
		info, _ := law.ColumnNamed(q.Name, name)
		return &wire.Column{Name: name, Unit: info.Unit}
	})}
}

func parameterToWire(p law.Parameter) *wire.Parameter {
	return &wire.Parameter{
		Name: p.Name, Unit: p.Unit, Doc: p.Doc, Low: p.Low, High: p.High, Preset: p.Preset,
		Log10: p.Log10, Citation: p.Citation, Words: p.Words,
	}
}

func thresholdToWire(t law.Threshold) *wire.Threshold {
	return &wire.Threshold{Kind: t.Kind, Mass: t.Mass, Parameter: t.Parameter, ByWord: t.ByWord, Becomes: t.Becomes, Outcome: t.Outcome}
}

// cardFromWire reads a card and lists everything wrong with it that the card
// itself can no longer tell: a contract or a feature that this program lacks,
// units that are not the catalogue's, words of composition that mean nothing.
func cardFromWire(w *wire.Card) (law.Card, []error) {
	faults := versionFaults(w)
	c := law.Card{
		Process: w.Process, Name: w.Name, Version: w.Version,
		Summary: w.Summary, Formula: w.Formula, Domain: w.Domain, Sources: listed(w.Sources), Notes: listed(w.Notes),
		Wears: w.Wears, Frame: w.Frame, StopOutcome: w.StopOutcome, StopFate: law.Fate(w.StopFate),
		Effect: w.Effect, Idle: w.Idle, Tolerance: w.Tolerance,
	}
	if a := w.Accepts; a != nil {
		c.Accepts = law.Accepts{Kinds: listed(a.Kinds), Column: a.Column, Low: limitFromWire(a.Low), High: limitFromWire(a.High)}
	}
	for _, q := range w.Questions {
		var names []string
		for _, in := range q.Inputs {
			names = append(names, in.Name)
			info, known := law.ColumnNamed(q.Name, in.Name)
			if known && in.Unit != "" && in.Unit != info.Unit {
				faults = append(faults, fmt.Errorf("card: question %s: column %s: unit %q, want %q", q.Name, in.Name, in.Unit, info.Unit))
			}
		}
		c.Questions = append(c.Questions, law.Question{Name: q.Name, Inputs: names, Words: listed(q.Words)})
	}
	c.Parameters = each(w.Parameters, func(p *wire.Parameter) law.Parameter {
		return law.Parameter{
			Name: p.Name, Unit: p.Unit, Doc: p.Doc, Low: p.Low, High: p.High, Preset: p.Preset,
			Log10: p.Log10, Citation: p.Citation, Words: listed(p.Words),
		}
	})
	c.Thresholds = each(w.Thresholds, func(t *wire.Threshold) law.Threshold {
		return law.Threshold{Kind: t.Kind, Mass: t.Mass, Parameter: t.Parameter, ByWord: listed(t.ByWord), Becomes: t.Becomes, Outcome: t.Outcome}
	})
	c.Clocks = each(w.Clocks, func(k *wire.Clock) law.Clock {
		return law.Clock{Name: k.Name, Doc: k.Doc, Outcome: k.Outcome, Fate: law.Fate(k.Fate)}
	})
	c.Outcomes = each(w.Outcomes, func(o *wire.Outcome) law.Outcome {
		return law.Outcome{Word: o.Word, Doc: o.Doc, Becomes: o.Becomes}
	})
	for _, k := range w.Kinds {
		code := slices.Index(law.CompositionWords, k.Composition)
		if code < 0 {
			faults = append(faults, fmt.Errorf("card: kind %s: composition %q, want one of %v", k.Name, k.Composition, law.CompositionWords))
			code = 0
		}
		c.Kinds = append(c.Kinds, law.Kind{Name: k.Name, Doc: k.Doc, Composition: uint8(code)})
	}
	return c, faults
}

func versionFaults(w *wire.Card) []error {
	var faults []error
	switch {
	case w.Contract == 0:
		faults = append(faults, fmt.Errorf("card: no contract number, want %d", Contract))
	case w.Contract > Contract:
		faults = append(faults, fmt.Errorf("card: written for contract %d, this program speaks contracts up to %d: a newer wane is needed", w.Contract, Contract))
	}
	for _, f := range w.Features {
		if !slices.Contains(Features(), f) {
			faults = append(faults, fmt.Errorf("card: needs the feature %q, which this program has not", f))
		}
	}
	return faults
}

func limitFromWire(l *wire.Limit) law.Limit {
	if l == nil {
		return law.Limit{}
	}
	return law.Limit{Set: true, Value: l.Value, Parameter: l.Parameter}
}

// listed is a list, nil if it is empty.
func listed[A any](list []A) []A {
	if len(list) == 0 {
		return nil
	}
	return list
}
