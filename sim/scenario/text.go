package scenario

import (
	"crypto/sha256"
	"encoding/hex"
	"fmt"
	"math"
	"strconv"
	"strings"

	"wane/sim/galaxy"
	"wane/sim/law"
	"wane/sim/scenario/quantity"
)

// Text is the resolved scenario as a scenario file of its own: no base, every
// law and every parameter written out, numbers to the last bit. Loading it
// gives the same scenario with the same digest. Title, question and names of
// bases are not in it: they change nothing.
func (s *Scenario) Text() string { return s.canon }

// writer builds the resolved text; it needs the cards for units and words.
type writer struct{ strings.Builder }

func (w *writer) line(format string, a ...any) { fmt.Fprintf(&w.Builder, format+"\n", a...) }

// write renders the resolved text.
func (s *Scenario) write(reg *law.Registry) string {
	w := &writer{}
	w.line("until = %s", text(quantity.ExactLog10(s.Until, "yr")))
	w.line("realisations = %d", s.Realisations)
	w.line("seed = %d", s.Seed)
	w.line("\n[galaxy]")
	w.line("objects = %s", quantity.Exact(s.Objects, ""))
	if s.Sample > 0 {
		w.line("sample = %d", s.Sample)
	}
	w.line("radius = %s", text(quantity.Exact(s.Radius, "pc")))
	w.line("central-mass = %s", text(quantity.Exact(s.CentralMass, "solMass")))
	w.line("\n[laws]")
	for _, p := range law.Processes {
		if name, ok := s.Laws[p.Name]; ok {
			line := p.Name + " = " + text(name)
			if v, ok := s.versions[p.Name]; ok {
				line += " # version " + strings.Join(strings.Fields(v), " ")
				if o, ok := s.Outside[p.Name]; ok {
					line += ", outside, " + o.Digest
				}
			}
			w.line("%s", line)
		}
	}
	for _, p := range law.Processes {
		l, ok := reg.Find(p.Name, s.Laws[p.Name])
		if !ok || len(s.Parameters[p.Name]) == 0 {
			continue
		}
		w.line("\n[parameters.%s]", p.Name)
		for _, x := range l.Describe().Parameters {
			v := s.Parameters[p.Name][x.Name]
			if !x.Log10 && math.IsInf(v, 0) {
				continue // a preset that cannot be written, nor set
			}
			w.line("%s = %s", key(x.Name), text(exact(x, v)))
		}
	}
	for _, p := range s.Populations[len(s.Populations)-s.own:] {
		w.line("\n[populations.%s]", p.Name)
		w.condition(p.Condition)
	}
	return w.String()
}

func exact(p law.Parameter, value float64) string {
	switch {
	case len(p.Words) > 0:
		return Show(p, value)
	case p.Log10:
		return quantity.ExactLog10(value, p.Unit)
	}
	return quantity.Exact(value, p.Unit)
}

func (w *writer) condition(c galaxy.Condition) {
	for _, list := range []struct {
		key   string
		words []string
	}{{"kinds", c.Kinds}, {"places", c.Places}, {"origins", c.Origins}} {
		if len(list.words) == 0 {
			continue
		}
		quoted := make([]string, len(list.words))
		for i, x := range list.words {
			quoted[i] = text(x)
		}
		w.line("%s = [%s]", list.key, strings.Join(quoted, ", "))
	}
	if c.Warmth != nil {
		w.line("%s = %s", c.Warmth.Quantity, text(warmthText(c.Warmth)))
	}
}

func warmthText(w *galaxy.Warmth) string {
	sign := "< "
	if w.Above {
		sign = "> "
	}
	return sign + quantity.Exact(w.Value, w.Unit)
}

// text is a TOML string. Only plain characters reach it.
func text(s string) string { return strconv.Quote(s) }

// key is a TOML key, quoted unless it is bare.
func key(s string) string {
	for _, c := range s {
		if !(c >= 'a' && c <= 'z' || c >= 'A' && c <= 'Z' || c >= '0' && c <= '9' || c == '-' || c == '_') {
			return strconv.Quote(s)
		}
	}
	return s
}

// seal renders the resolved text and its digest.
func (s *Scenario) seal(reg *law.Registry) {
	s.canon = s.write(reg)
	sum := sha256.Sum256([]byte(s.canon))
	s.Digest = hex.EncodeToString(sum[:])
}
