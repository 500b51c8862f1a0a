package scenario

import (
	"fmt"
	"math"
	"sort"
	"strings"
	"unicode"

	"wane/sim/galaxy"
	"wane/sim/law"
)

// Defaults of the keys that a scenario may leave out.
const (
	defaultRealisations = 20
	defaultSeed         = 1
)

// builder applies layers of settings, one on top of the other.
type builder struct {
	report
	reg *law.Registry
	s   *Scenario

	broken bool             // a file could not be read: what is missing is no fault
	at     map[string]place // where each setting was last given
	when   map[string]int   // in which order
	said   int              // how many settings so far
	doubt  map[string]bool  // processes whose law was faulty: their parameters are not judged
	opened []Outside        // laws given by a path
	closed map[string]*node // processes whose law is given by a path that was not opened
}

func newBuilder(reg *law.Registry, defaults map[string]string) (*builder, error) {
	b := &builder{reg: reg, at: map[string]place{}, when: map[string]int{}, doubt: map[string]bool{}, closed: map[string]*node{}, s: &Scenario{
		Realisations: defaultRealisations,
		Seed:         defaultSeed,
		Until:        math.Inf(1),
		Laws:         map[string]string{},
		Parameters:   map[string]map[string]float64{},
		from:         map[string]string{},
	}}
	b.s.Populations = galaxy.Default()
	for process, name := range defaults {
		if _, ok := reg.Find(process, name); !ok {
			return nil, fmt.Errorf("scenario: the default law %s/%s is not registered", process, name)
		}
		b.s.Laws[process] = name
	}
	return b, nil
}

// apply applies one file.
func (b *builder) apply(root *node) {
	b.unknownKeys(root, "", "base", "title", "question", "until", "realisations", "seed", "galaxy", "laws", "trust", "parameters", "populations")
	for _, key := range []string{"title", "question"} {
		if n := root.field(key); n != nil && n.form != aText {
			b.fault(n.at, "%s: got %s, want a text", key, n.form)
		}
	}
	b.run(root)
	if t := b.table(root, "galaxy"); t != nil {
		b.unknownKeys(t, "galaxy", galaxyKeys()...)
		for _, name := range t.names {
			b.galaxyValue(name, t.fields[name])
		}
	}
	b.laws(b.table(root, "laws"))
	b.trust(b.table(root, "trust"))
	b.parameters(b.table(root, "parameters"))
	b.populations(b.table(root, "populations"))
}

// describe takes title and question, each as one line, from the scenario's own
// file.
func (b *builder) describe(leaf *node) {
	for key, into := range map[string]*string{"title": &b.s.Title, "question": &b.s.Question} {
		if n := leaf.field(key); n != nil && n.form == aText {
			*into = strings.Join(strings.FieldsFunc(n.text, func(c rune) bool { return unicode.IsSpace(c) || unicode.IsControl(c) }), " ")
		}
	}
}

// table returns the table at a key, nil if there is none.
func (b *builder) table(t *node, key string) *node {
	n := t.field(key)
	if n != nil && n.form != aTable {
		b.fault(n.at, "%s: got %s, want a table, [%s]", key, n.form, key)
		return nil
	}
	return n
}

// unknownKeys reports keys of a table that mean nothing.
func (b *builder) unknownKeys(t *node, in string, known ...string) {
	for _, name := range t.names {
		if contains(known, name) {
			continue
		}
		n := t.fields[name]
		what := fmt.Sprintf("unknown key %q", name)
		if n.form == aTable {
			what = fmt.Sprintf("unknown table %q", name)
		}
		if in != "" {
			what = in + ": " + what
		}
		hint := among(name, known)
		if in == "" && contains(galaxyKeys(), name) {
			hint = "(it belongs in [galaxy])"
		} else if _, ok := law.ProcessNamed(name); ok && in == "" {
			hint = fmt.Sprintf("(a law is chosen in [laws], its parameters are set in [parameters.%s])", name)
		}
		b.fault(n.key, "%s %s", what, hint)
	}
}

// given remembers where something was said, right or wrong.
func (b *builder) given(key string, at place) {
	b.said++
	b.at[key], b.when[key] = at, b.said
}

// set remembers where a setting comes from.
func (b *builder) set(key string, at place) {
	b.given(key, at)
	b.s.from[key] = at.file
}

func (b *builder) run(root *node) {
	if n := root.field("until"); n != nil {
		b.until(n)
	}
	if n := root.field("realisations"); n != nil {
		if v, ok := b.whole("realisations", n, 1, MaxRealisations); ok {
			b.s.Realisations = int(v)
			b.set("realisations", n.at)
		}
	}
	if n := root.field("seed"); n != nil {
		if v, ok := b.whole("seed", n, 0, math.MaxUint64); ok {
			b.s.Seed = v
			b.set("seed", n.at)
		}
	}
}

// until reads the date at which the run ends.
func (b *builder) until(n *node) {
	v := math.Inf(1)
	if n.text != "never" || n.form == aNumber {
		var ok bool
		if v, ok = b.quantity("until", n, "yr", true, 0, 1e300); !ok {
			return
		}
	}
	b.s.Until = v
	b.set("until", n.at)
}

// finish makes the checks that need everything, and fills in the rest.
func (b *builder) finish(leaf *node) {
	top := place{leaf.at.file, 1, 1}
	b.galaxyWhole(top)
	b.outsideWhole()
	if len(b.faults) > 0 {
		return
	}
	b.presets()
	set, err := b.s.Set(b.reg)
	if err != nil {
		for _, line := range strings.Split(err.Error(), "\n") {
			b.fault(b.blame(line, top), "%s", line)
		}
		return
	}
	b.impossible(set)
	b.s.seal(b.reg)
}

// blame finds the setting that gave the run a law which a fault is about.
func (b *builder) blame(fault string, top place) place {
	for _, p := range law.Processes {
		if at, ok := b.at[p.Name]; ok && strings.Contains(fault, p.Name+"/"+b.s.Laws[p.Name]) {
			return at
		}
	}
	return place{file: top.file}
}

// presets completes the parameters of the laws in use with their presets.
func (b *builder) presets() {
	b.s.versions = map[string]string{}
	for process, name := range b.s.Laws {
		l, ok := b.reg.Find(process, name)
		if !ok {
			continue // none
		}
		card := l.Describe()
		b.s.versions[process] = card.Version
		values := b.s.Parameters[process]
		if values == nil && len(card.Parameters) > 0 {
			values = map[string]float64{}
			b.s.Parameters[process] = values
		}
		for _, p := range card.Parameters {
			if _, ok := values[p.Name]; !ok {
				values[p.Name] = p.Preset
			}
		}
	}
}

func sortedKeys[V any](m map[string]V) []string {
	keys := make([]string, 0, len(m))
	for k := range m {
		keys = append(keys, k)
	}
	sort.Strings(keys)
	return keys
}
