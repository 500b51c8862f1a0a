package scenario

import (
	"wane/sim/galaxy"
	"wane/sim/law"
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
		if kind, path := b.kindOfClosed(n); kind != "" {
			b.warn(n.key, "%s is left out: no law of this run knows the kind %q (%s, which may, has another law in its place)", key, kind, path)
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
