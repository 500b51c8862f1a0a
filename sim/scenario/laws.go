package scenario

import (
	"fmt"
	"math"

	"wane/sim/law"
	"wane/sim/scenario/quantity"
)

// none is how a process that a run may do without gets no law.
const none = "none"

func processNames() []string {
	names := make([]string, len(law.Processes))
	for i, p := range law.Processes {
		names[i] = p.Name
	}
	return names
}

// laws applies a table of process = law.
func (b *builder) laws(t *node) {
	if t == nil {
		return
	}
	for _, process := range t.names {
		n := t.fields[process]
		p, ok := law.ProcessNamed(process)
		if !ok {
			b.fault(n.key, "laws: unknown process %q %s", process, among(process, processNames()))
			continue
		}
		b.doubt[process] = true
		if n.form != aText && n.form != aLoose {
			b.fault(n.at, "laws.%s: got %s, want the name of a law %s", process, n.form, among("", b.known(p)))
			continue
		}
		if IsPath(n.text) {
			b.outsideLaw(p, n)
			continue
		}
		if _, ok := b.reg.Find(process, n.text); !ok && !(p.Optional && n.text == none) {
			b.unknownLaw(p, n)
			continue
		}
		delete(b.doubt, process)
		b.choose(process, n)
	}
}

// known lists what a process may be given.
func (b *builder) known(p law.Process) []string {
	names := b.reg.Names(p.Name)
	if p.Optional && !contains(names, none) {
		names = append(names, none)
	}
	return names
}

func (b *builder) unknownLaw(p law.Process, n *node) {
	for _, q := range law.Processes {
		if _, ok := b.reg.Find(q.Name, n.text); ok && n.text != none {
			b.fault(n.at, "laws.%s: %q is a law of process %s %s", p.Name, n.text, q.Name, among("", b.known(p)))
			return
		}
	}
	b.fault(n.at, "laws.%s: unknown law %s %s", p.Name, n.written(), among(n.text, b.known(p)))
}

// choose gives a process a law. A law other than before starts from its
// presets.
func (b *builder) choose(process string, n *node) {
	old := b.s.Laws[process]
	if old != n.text {
		for _, name := range sortedKeys(b.s.Parameters[process]) {
			key := process + "." + name
			b.warn(n.at, "%s, set in %s for %s/%s, falls away: the law is now %s", key, b.s.from[key], process, old, n.text)
			delete(b.s.from, key)
		}
		delete(b.s.Parameters, process)
	}
	b.s.Laws[process] = n.text
	delete(b.s.Outside, process)
	delete(b.closed, process)
	b.set(process, n.at)
}

// parameters applies tables of process.parameter = value.
func (b *builder) parameters(t *node) {
	if t == nil {
		return
	}
	for _, process := range t.names {
		n := t.fields[process]
		if _, ok := law.ProcessNamed(process); !ok {
			known := processNames()
			if n.at.line == 0 {
				known = append([]string{"galaxy"}, known...)
			}
			b.fault(n.key, "parameters: unknown process %q %s", process, among(process, known))
			continue
		}
		if n.form != aTable {
			b.fault(n.at, "parameters.%s: got %s, want a table, [parameters.%s]", process, n.form, process)
			continue
		}
		if b.doubt[process] {
			continue
		}
		l, ok := b.reg.Find(process, b.s.Laws[process])
		if !ok {
			b.fault(n.key, "parameters.%s: the process has no law in this run (known: %s)", process, listed(b.reg.Names(process)))
			continue
		}
		card := l.Describe()
		for _, name := range n.names {
			b.parameter(card, name, n.fields[name])
		}
	}
}

func listed(words []string) string {
	if len(words) == 0 {
		return none
	}
	s := words[0]
	for _, w := range words[1:] {
		s += ", " + w
	}
	return s
}

// parameter sets one parameter of a law.
func (b *builder) parameter(card law.Card, name string, n *node) {
	p, ok := parameterOf(card, name)
	if !ok {
		b.unknownParameter(card, name, n)
		return
	}
	key := card.Process + "." + name
	v, ok := b.parameterValue(key, p, n)
	if !ok {
		return
	}
	if b.s.Parameters[card.Process] == nil {
		b.s.Parameters[card.Process] = map[string]float64{}
	}
	b.s.Parameters[card.Process][name] = v
	b.set(key, n.at)
}

func parameterOf(card law.Card, name string) (law.Parameter, bool) {
	for _, p := range card.Parameters {
		if p.Name == name {
			return p, true
		}
	}
	return law.Parameter{}, false
}

// unknownParameter tells whose parameter it is, if anybody's.
func (b *builder) unknownParameter(card law.Card, name string, n *node) {
	var own []string
	for _, p := range card.Parameters {
		own = append(own, p.Name)
	}
	id := card.Process + "/" + card.Name
	whose := ""
	for _, l := range b.reg.All() {
		c := l.Describe()
		if _, ok := parameterOf(c, name); ok && (whose == "" || c.Process == card.Process) {
			whose = c.Process + "/" + c.Name
			if c.Process == card.Process {
				break
			}
		}
	}
	if whose != "" {
		b.fault(n.key, "law %s has no parameter %q: it is one of %s (known: %s)", id, name, whose, listed(own))
		return
	}
	b.fault(n.key, "law %s has no parameter %q %s", id, name, among(name, own))
}

func (b *builder) parameterValue(key string, p law.Parameter, n *node) (float64, bool) {
	if len(p.Words) > 0 {
		for i, w := range p.Words {
			if (n.form == aText || n.form == aLoose) && w == n.text {
				return float64(i), true
			}
		}
		b.fault(n.at, "%s: %s: want one of its words %s", key, n.written(), among(n.text, p.Words))
		return 0, false
	}
	if (n.form == aText || n.form == aLoose) && n.text == "never" && p.Log10 && math.IsInf(p.High, 1) {
		return p.High, true
	}
	return b.quantity(key, n, p.Unit, p.Log10, p.Low, p.High)
}

// Show prints a value of a parameter, as handed to the law, for people.
func Show(p law.Parameter, value float64) string {
	switch {
	case len(p.Words) > 0:
		if i := int(value); i >= 0 && i < len(p.Words) {
			return p.Words[i]
		}
		return fmt.Sprint(value)
	case p.Log10:
		return quantity.FormatLog10(value, p.Unit)
	}
	return quantity.Format(value, p.Unit)
}

// Range prints what a parameter may be, for people.
func Range(p law.Parameter) string {
	if len(p.Words) > 0 {
		return listed(p.Words)
	}
	return spanOf(p.Unit, p.Log10, p.Low, p.High)
}
