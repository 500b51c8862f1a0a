package scenario

import (
	"fmt"
	"strings"
)

// override applies the settings of the command line.
func (b *builder) override(o Overrides) {
	laws := b.typedLaws(o)
	galaxies, parameters := newTable(place{file: "--set"}), newTable(place{file: "--set"})
	for _, text := range o.Sets {
		key, value, ok := strings.Cut(text, "=")
		process, name, dotted := strings.Cut(strings.TrimSpace(key), ".")
		at := place{file: "--set " + key}
		if !ok || !dotted || process == "" || name == "" {
			b.fault(place{file: "--set " + text}, `want process.parameter=value or galaxy.key=value, such as "galaxy.radius=8kpc"`)
			continue
		}
		n := &node{form: aLoose, at: at, key: at, text: strings.TrimSpace(value)}
		if process == "galaxy" {
			galaxies.put(b, name, n)
			continue
		}
		if parameters.field(process) == nil {
			parameters.add(process, newTable(at))
		}
		parameters.field(process).put(b, name, n)
	}
	b.unknownKeys(galaxies, "galaxy", galaxyKeys()...)
	for _, name := range galaxies.names {
		b.galaxyValue(name, galaxies.fields[name])
	}
	b.laws(laws)
	b.parameters(parameters)
	b.overrideRun(o)
}

// typedLaws is the table of laws that the command line gives.
func (b *builder) typedLaws(o Overrides) *node {
	laws := newTable(place{file: "--law"})
	for _, text := range o.Laws {
		process, name, ok := strings.Cut(text, "=")
		at := place{file: "--law " + process}
		if !ok || process == "" || name == "" {
			b.fault(place{file: "--law " + text}, `want process=name, such as "nucleon-decay=stable", or process=./path`)
			continue
		}
		if laws.field(strings.TrimSpace(process)) != nil {
			b.fault(at, "given twice: a run has one law of each process")
			continue
		}
		laws.add(strings.TrimSpace(process), &node{form: aLoose, at: at, key: at, text: strings.TrimSpace(name)})
	}
	return laws
}

// put adds a setting of the command line, which may come once.
func (n *node) put(b *builder, name string, child *node) {
	if n.field(name) != nil {
		b.fault(child.at, "given twice")
		return
	}
	n.add(name, child)
}

func (b *builder) overrideRun(o Overrides) {
	loose := func(flag, text string) *node {
		at := place{file: flag}
		return &node{form: aLoose, at: at, key: at, text: text}
	}
	if o.Realisations != 0 {
		if v, ok := b.whole("realisations", loose("--realisations", fmt.Sprint(o.Realisations)), 1, MaxRealisations); ok {
			b.s.Realisations = int(v)
			b.set("realisations", place{file: "--realisations"})
		}
	}
	if o.Objects != 0 {
		b.galaxyValue("sample", loose("--objects", fmt.Sprint(o.Objects)))
	}
	if o.Seed != nil {
		b.s.Seed = *o.Seed
		b.set("seed", place{file: "--seed"})
	}
	if o.Until != "" {
		b.until(loose("--until", o.Until))
	}
}
