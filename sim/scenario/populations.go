package scenario

import (
	"fmt"
	"math"
	"strings"

	"wane/sim/galaxy"
	"wane/sim/law"
	"wane/sim/scenario/quantity"
)

// populations adds a scenario's own populations, or replaces those of its base.
func (b *builder) populations(t *node) {
	if t == nil {
		return
	}
	for _, name := range t.names {
		n := t.fields[name]
		key := "populations." + name
		switch {
		case n.form != aTable:
			b.fault(n.at, "%s: got %s, want a table, [%s]", key, n.form, key)
			continue
		case !isName(name):
			b.fault(n.key, "populations: %q is no name: want up to 40 letters, digits, - and _, a letter first", name)
			continue
		case isDefault(name):
			b.fault(n.key, "%s: every run counts a population of this name: want another name", key)
			continue
		}
		p := galaxy.Population{Name: name, Condition: b.condition(key, n)}
		b.set(key, n.key)
		b.keep(p)
	}
}

// keep adds a population, or replaces the one of its name.
func (b *builder) keep(p galaxy.Population) {
	for i := range b.s.Populations {
		if b.s.Populations[i].Name == p.Name {
			b.s.Populations[i] = p
			return
		}
	}
	b.s.Populations = append(b.s.Populations, p)
	b.s.own++
}

func isDefault(name string) bool {
	for _, p := range galaxy.Default() {
		if p.Name == name {
			return true
		}
	}
	return false
}

func (b *builder) condition(key string, t *node) galaxy.Condition {
	b.unknownKeys(t, key, "kinds", "places", "origins", "temperature", "luminosity")
	c := galaxy.Condition{
		Kinds:   b.words(key, t, "kinds", b.kinds()),
		Places:  b.words(key, t, "places", law.PlaceWords),
		Origins: b.words(key, t, "origins", law.OriginWords),
	}
	warm, bright := t.field("temperature"), t.field("luminosity")
	if warm != nil && bright != nil {
		b.fault(bright.key, "%s: want either temperature or luminosity, not both", key)
	}
	for _, n := range []*node{warm, bright} {
		if n == nil {
			continue
		}
		quantity := "temperature"
		if n == bright {
			quantity = "luminosity"
		}
		if n.form != aText {
			b.fault(n.at, "%s.%s: got %s, want a comparison, such as %q", key, quantity, n.form, comparison(quantity))
			continue
		}
		w, err := ParseWarmth(quantity, n.text)
		if err != nil {
			b.fault(n.at, "%s.%s: %v", key, quantity, err)
			continue
		}
		c.Warmth = w
	}
	return c
}

// kinds is every kind of object that some law knows of.
func (b *builder) kinds() []string {
	kinds := append([]string(nil), law.KindWords...)
	for _, l := range b.reg.All() {
		for _, k := range l.Describe().Kinds {
			if !contains(kinds, k.Name) {
				kinds = append(kinds, k.Name)
			}
		}
	}
	return kinds
}

// words reads a list of words out of known ones; one word may stand alone.
func (b *builder) words(key string, t *node, name string, known []string) []string {
	n := t.field(name)
	if n == nil {
		return nil
	}
	items := n.items
	switch {
	case n.form == aText:
		items = []*node{n}
	case n.form != aList:
		b.fault(n.at, "%s.%s: got %s, want a list of words %s", key, name, n.form, among("", known))
		return nil
	case len(items) == 0:
		b.fault(n.at, "%s.%s: an empty list: want at least one word, or no %s at all for any %s", key, name, name, among("", known))
		return nil
	}
	var out []string
	for _, item := range items {
		switch {
		case item.form != aText:
			b.fault(item.at, "%s.%s: got %s, want a word %s", key, name, item.form, among("", known))
		case !contains(known, item.text):
			b.fault(item.at, "%s.%s: unknown word %s %s", key, name, item.written(), among(item.text, known))
		case contains(out, item.text):
			b.fault(item.at, "%s.%s: %q stands twice", key, name, item.text)
		default:
			out = append(out, item.text)
		}
	}
	return out
}

func comparison(quantity string) string {
	if quantity == "luminosity" {
		return "> 1e-6 Lsun"
	}
	return "> 798 K"
}

// ParseWarmth reads a comparison of a temperature ("> 798 K", "< 0.1 eV",
// "> 1.1 floor": times the object's own floor) or luminosity ("> 1e-6 Lsun").
// The value is positive and comes out in K or solLum.
func ParseWarmth(what, text string) (*galaxy.Warmth, error) {
	w := &galaxy.Warmth{Quantity: what, Unit: "K"}
	if what == "luminosity" {
		w.Unit = "solLum"
	}
	s := strings.TrimSpace(text)
	switch {
	case strings.HasPrefix(s, ">"):
		w.Above = true
	case !strings.HasPrefix(s, "<"):
		return nil, fmt.Errorf("%q: want > or < first, such as %q", cut(text), comparison(what))
	}
	s = strings.TrimSpace(s[1:])
	if strings.HasPrefix(s, "=") {
		return nil, fmt.Errorf("%q: want > or < alone, such as %q", cut(text), comparison(what))
	}
	if number, ok := strings.CutSuffix(s, "floor"); ok && what == "temperature" {
		number, _ = strings.CutSuffix(strings.TrimSpace(number), "times the")
		s, w.Unit = strings.TrimSpace(number), "floor"
	}
	unit := w.Unit
	if unit == "floor" {
		unit = ""
	}
	v, err := quantity.ParseFor(s, unit, false)
	if err != nil {
		return nil, err
	}
	if !(v > 0) {
		return nil, fmt.Errorf("%q: want > 0", cut(text))
	}
	w.Value = v
	return w, nil
}

func cut(text string) string {
	if r := []rune(text); len(r) > 40 {
		return string(r[:40]) + "..."
	}
	return text
}

// impossible warns of own populations that can never have a member.
func (b *builder) impossible(set *law.Set) {
	made := makes(set)
	if b.s.CentralMass > 0 {
		made["central-hole"] = true
	}
	merges := false
	for _, u := range set.OfRole(law.Encounter) {
		merges = merges || u.Card.Answers("meet")
	}
	for _, p := range b.s.Populations[len(b.s.Populations)-b.s.own:] {
		if why := never(p.Condition, made, merges); why != "" {
			b.warn(b.at["populations."+p.Name], "population %s can never have a member: %s", p.Name, why)
		}
	}
}

// makes lists the kinds that can come to be in a run.
func makes(set *law.Set) map[string]bool {
	made := map[string]bool{"star": true, "brown-dwarf": true}
	for _, u := range set.All() {
		for _, q := range u.Card.Questions {
			if q.Name == "die" {
				for _, w := range q.Words {
					made[w] = true
				}
			}
		}
		for _, t := range u.Card.Thresholds {
			made[t.Becomes] = true
		}
		for _, o := range u.Card.Outcomes {
			made[o.Becomes] = true
		}
		if u.Card.Answers("meet") {
			for _, k := range []string{"white-dwarf", "neutron-star", "black-hole"} {
				made[k] = true
			}
			for _, k := range u.Card.Kinds {
				made[k.Name] = true
			}
		}
	}
	return made
}

// never tells why no object can satisfy a condition, "" if one can.
func never(c galaxy.Condition, made map[string]bool, merges bool) string {
	kinds := c.Kinds
	if len(kinds) == 0 {
		kinds = sortedKeys(made)
	}
	why := ""
	for _, k := range kinds {
		if why = neverKind(k, c, made); why == "" {
			break
		}
	}
	if len(kinds) > 1 && why != "" {
		why = "none of its kinds is ever in one of its places"
	}
	switch {
	case why != "":
		return why
	case len(c.Origins) == 1 && c.Origins[0] == "merged" && !merges:
		return "no law of this run merges objects"
	case c.Warmth != nil && c.Warmth.Unit == "floor" && !c.Warmth.Above && c.Warmth.Value <= 1:
		return "no object is ever colder than its own floor"
	case c.Warmth != nil && c.Warmth.Above && math.IsInf(c.Warmth.Value, 1):
		return "nothing is that warm"
	}
	return ""
}

func neverKind(kind string, c galaxy.Condition, made map[string]bool) string {
	switch {
	case kind == "central-hole" && !made[kind]:
		return "the galaxy has no central hole (galaxy.central-mass is 0)"
	case !made[kind]:
		return "no law of this run makes a " + kind
	case len(c.Places) == 0:
		return ""
	case kind == "central-hole" && !contains(c.Places, "central"):
		return "the central hole is always in place central"
	case kind == "central-hole":
		if len(c.Origins) == 1 && c.Origins[0] == "merged" {
			return "the central hole is founded"
		}
	case len(c.Places) == 1 && c.Places[0] == "central":
		return "only the central hole is ever in place central"
	}
	return ""
}
