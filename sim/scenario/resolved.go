package scenario

import (
	"fmt"
	"io"
	"strconv"
	"strings"

	"wane/sim/galaxy"
	"wane/sim/law"
	"wane/sim/scenario/quantity"
)

// Resolved is a scenario laid open: every setting, with what it may be, where
// it comes from, and the source of its preset. It is plain data, ready for JSON.
type Resolved struct {
	Name        string            `json:"name"`
	Title       string            `json:"title,omitempty"`
	Question    string            `json:"question,omitempty"`
	Base        []string          `json:"base,omitempty"`
	Digest      string            `json:"digest"`
	Settings    []Setting         `json:"settings"`
	Laws        []ResolvedLaw     `json:"laws"`
	Populations []ResolvedCounted `json:"populations"`
}

// Setting is one value. From is "preset", a file, or a command line setting.
type Setting struct {
	Name     string `json:"name"`
	Value    string `json:"value"` // with its unit
	Unit     string `json:"unit,omitempty"`
	Doc      string `json:"doc,omitempty"`
	Range    string `json:"range,omitempty"`
	Citation string `json:"citation,omitempty"`
	From     string `json:"from"`
}

// ResolvedLaw is the law of a process with its parameters. Name is "none"
// where the process has none.
type ResolvedLaw struct {
	Process    string    `json:"process"`
	Name       string    `json:"name"`
	Version    string    `json:"version,omitempty"`
	Summary    string    `json:"summary,omitempty"`
	From       string    `json:"from"`
	Path       string    `json:"path,omitempty"`   // of a law outside the program
	Digest     string    `json:"digest,omitempty"` // of its files
	Sources    []string  `json:"sources,omitempty"`
	Parameters []Setting `json:"parameters,omitempty"`
}

// ResolvedCounted is a population that the run counts.
type ResolvedCounted struct {
	Name      string `json:"name"`
	Condition string `json:"condition"`
	From      string `json:"from"`
}

const preset = "preset"

func (s *Scenario) origin(key string) string {
	if f := s.from[key]; f != "" {
		return f
	}
	return preset
}

// Resolve lays the scenario open.
func (s *Scenario) Resolve(reg *law.Registry) Resolved {
	r := Resolved{Name: s.Name, Title: s.Title, Question: s.Question, Base: s.Base, Digest: s.Digest}
	held := "all"
	if s.Sample > 0 {
		held = strconv.FormatInt(s.Sample, 10)
	}
	add := func(name, value, unit, doc, span string) {
		r.Settings = append(r.Settings, Setting{Name: name, Value: value, Unit: unit, Doc: doc, Range: span, From: s.origin(name)})
	}
	add("galaxy.objects", quantity.Format(s.Objects, ""), "", "objects of the real galaxy", spanOf("", false, 1, maxObjects))
	add("galaxy.sample", held, "", "objects held one by one", fmt.Sprintf("1 .. %d, at most galaxy.objects", MaxHeld))
	add("galaxy.radius", quantity.Format(s.Radius, "pc"), "pc", "holds half the mass at the start", spanOf("pc", false, minRadius, maxRadius))
	add("galaxy.central-mass", quantity.Format(s.CentralMass, "solMass"), "solMass", "of the central hole at the start; 0: none", spanOf("solMass", false, 0, maxCentralMass))
	add("until", quantity.FormatLog10(s.Until, "yr"), "yr", "the run ends, since the Big Bang", `>= 1 yr, or "never"`)
	add("realisations", strconv.Itoa(s.Realisations), "", "random histories", fmt.Sprintf("1 .. %d", MaxRealisations))
	add("seed", strconv.FormatUint(s.Seed, 10), "", "of the random numbers", "0 .. 2^64 - 1")
	for _, p := range law.Processes {
		if name, ok := s.Laws[p.Name]; ok {
			r.Laws = append(r.Laws, s.resolveLaw(reg, p.Name, name))
		}
	}
	for i, p := range s.Populations {
		from := "every run"
		if i >= len(s.Populations)-s.own {
			from = s.origin("populations." + p.Name)
		}
		r.Populations = append(r.Populations, ResolvedCounted{p.Name, ConditionText(p.Condition), from})
	}
	return r
}

func (s *Scenario) resolveLaw(reg *law.Registry, process, name string) ResolvedLaw {
	from := "default"
	if f := s.from[process]; f != "" {
		from = f
	}
	r := ResolvedLaw{Process: process, Name: name, From: from}
	l, ok := reg.Find(process, name)
	if !ok {
		return r
	}
	card := l.Describe()
	r.Version, r.Summary, r.Sources = card.Version, card.Summary, card.Sources
	r.Path, r.Digest = s.Outside[process].Written, s.Outside[process].Digest
	for _, p := range card.Parameters {
		r.Parameters = append(r.Parameters, Setting{
			Name: p.Name, Value: Show(p, s.Parameters[process][p.Name]), Unit: p.Unit, Doc: p.Doc,
			Range: Range(p), Citation: p.Citation, From: s.origin(process + "." + p.Name),
		})
	}
	return r
}

// ConditionText says a condition in words: "white-dwarf, bound, temperature >
// 798 K".
func ConditionText(c galaxy.Condition) string {
	var parts []string
	for _, words := range [][]string{c.Kinds, c.Places, c.Origins} {
		if len(words) > 0 {
			parts = append(parts, strings.Join(words, " or "))
		}
	}
	if w := c.Warmth; w != nil {
		sign := "<"
		if w.Above {
			sign = ">"
		}
		value := quantity.Format(w.Value, w.Unit)
		if w.Unit == "floor" {
			value = quantity.Format(w.Value, "") + " times the floor"
		}
		parts = append(parts, fmt.Sprintf("%s %s %s", w.Quantity, sign, value))
	}
	if len(parts) == 0 {
		return "any object"
	}
	return strings.Join(parts, ", ")
}

// Print writes the resolved scenario for people, in at most 100 columns where
// words allow.
func (r Resolved) Print(out io.Writer) error {
	w := &writer{}
	w.line("scenario %s", r.Name)
	if r.Title != "" {
		w.wrapped("  ", r.Title)
	}
	if r.Question != "" {
		w.wrapped("  ", r.Question)
	}
	if len(r.Base) > 0 {
		w.line("  from %s", strings.Join(r.Base, ", from "))
	}
	w.line("  digest %s", r.Digest)
	w.line("")
	w.settings("", r.Settings)
	w.line("\nlaws")
	for _, l := range r.Laws {
		w.line("\n%s/%s (%s)", l.Process, l.Name, l.From)
		if l.Path != "" {
			w.line("  outside: %s", l.Path)
			w.line("  digest %s", l.Digest)
		}
		if l.Summary != "" {
			w.wrapped("  ", l.Summary)
		}
		for _, s := range l.Sources {
			w.wrapped("  source: ", s)
		}
		w.settings("  ", l.Parameters)
	}
	w.line("\npopulations")
	for _, p := range r.Populations {
		w.line("  %-24s %s (%s)", p.Name, p.Condition, p.From)
	}
	_, err := io.WriteString(out, w.String())
	return err
}

func (w *writer) settings(indent string, list []Setting) {
	for _, s := range list {
		w.line("%s%-22s %-16s %s; allowed: %s", indent, s.Name, s.Value, s.From, s.Range)
		about := s.Doc
		if s.Citation != "" {
			if about != "" {
				about += " "
			}
			about += "[" + s.Citation + "]"
		}
		if about != "" {
			w.wrapped(indent+"    ", about)
		}
	}
}

// wrapped writes words in lines of at most 100 columns, the first after head
// and the others indented as deep.
func (w *writer) wrapped(head, words string) {
	const columns = 100
	line, indent := head, strings.Repeat(" ", len(head))
	start := true
	for _, word := range strings.Fields(words) {
		if !start && len([]rune(line))+1+len([]rune(word)) > columns {
			w.line("%s", line)
			line, start = indent, true
		}
		if !start {
			line += " "
		}
		line += word
		start = false
	}
	w.line("%s", line)
}
