package scenario

import (
	"io/fs"
	"path"
	"regexp"
	"strings"

	"wane/sim/law"
)

// Given is a law that is named by its path instead of its name.
type Given struct {
	Process string
	Written string // the path as it stands there
	Path    string // as seen from where the program runs: a file's paths count from that file
	Typed   bool   // on the command line: whoever typed it wants it started
	Trust   string // what [trust] says that its digest is; empty: nothing

	at place
}

// File is the file in which the path stands; empty on the command line.
func (g Given) File() string {
	if g.Typed {
		return ""
	}
	return g.at.file
}

// Outside is a law given by its path: opened, or with the reason why it is
// not.
type Outside struct {
	Given
	Law    law.Law // nil: see Fault
	Digest string  // of its files
	Fault  error
}

// IsPath tells whether a law is given by a path: it has a slash in it, or
// begins with a full stop. No name of a law does.
func IsPath(text string) bool {
	return strings.Contains(text, "/") || strings.HasPrefix(text, ".")
}

var digestForm = regexp.MustCompile(`^sha256:[0-9a-f]{64}$`)

// Paths lists the laws that a scenario takes from outside the program: those
// given by a path, and replaced by nothing that comes later. Opened, they are
// handed to [Load] in its Overrides. The list is empty if a file cannot be
// read or has faults of syntax, which Load will report.
func Paths(fsys fs.FS, file string, o Overrides) []Given {
	b := &builder{}
	layers, err := b.files(fsys, file)
	if err != nil || len(b.faults) > 0 {
		return nil
	}
	inForce := map[string]*Given{}
	for _, layer := range layers {
		putInForce(inForce, layer.field("laws"), false)
		if t := layer.field("trust"); t != nil && t.form == aTable {
			for _, process := range t.names {
				if g := inForce[process]; g != nil {
					g.Trust = t.fields[process].text
				}
			}
		}
	}
	putInForce(inForce, b.typedLaws(o), true)
	var out []Given
	for _, p := range law.Processes {
		if g := inForce[p.Name]; g != nil {
			out = append(out, *g)
		}
	}
	return out
}

// putInForce notes for each process of a table the path of its law, or that it
// has none any more.
func putInForce(inForce map[string]*Given, t *node, typed bool) {
	if t == nil || t.form != aTable {
		return
	}
	for _, process := range t.names {
		n := t.fields[process]
		delete(inForce, process)
		if (n.form == aText || n.form == aLoose) && IsPath(n.text) {
			inForce[process] = &Given{Process: process, Written: n.text, Path: pathFrom(n), Typed: typed, at: n.at}
		}
	}
}

// pathFrom is the path that a text means, relative ones counted from the file
// it stands in.
func pathFrom(n *node) string {
	dir := path.Dir(n.at.file)
	if n.form == aLoose || path.IsAbs(n.text) || dir == "." {
		return n.text
	}
	return path.Join(dir, n.text)
}

// outsideLaw gives a process the law at a path.
func (b *builder) outsideLaw(p law.Process, n *node) {
	var found *Outside
	for i := range b.opened {
		if b.opened[i].at == n.at && b.opened[i].Process == p.Name {
			found = &b.opened[i]
		}
	}
	if found == nil { // something that comes later is in its place, or nobody opened it
		b.closed[p.Name] = n
		return
	}
	if found.Fault != nil {
		b.fault(n.at, "laws.%s: %v", p.Name, found.Fault)
		return
	}
	card := found.Law.Describe()
	if card.Process != p.Name {
		b.fault(n.at, "laws.%s: %s is %s/%s, a law of process %s: want one of %s", p.Name, n.text, card.Process, card.Name, card.Process, p.Name)
		return
	}
	delete(b.doubt, p.Name)
	named := *n
	named.text = card.Name
	b.choose(p.Name, &named)
	if b.s.Outside == nil {
		b.s.Outside = map[string]Outside{}
	}
	b.s.Outside[p.Name] = *found
}

// kindOfClosed returns a kind of a population that nobody knows, when it may be
// one of a law given by a path in whose place another one is used, and the
// path.
func (b *builder) kindOfClosed(population *node) (kind, path string) {
	if len(b.closed) == 0 {
		return "", ""
	}
	path = b.closed[sortedKeys(b.closed)[0]].text
	n := population.field("kinds")
	if n == nil {
		return "", ""
	}
	known := b.kinds()
	for _, item := range append(n.items, n) {
		if item.form == aText && !contains(known, item.text) {
			return item.text, path
		}
	}
	return "", ""
}

// trust checks a table of process = digest. [Paths] has read it.
func (b *builder) trust(t *node) {
	if t == nil {
		return
	}
	for _, process := range t.names {
		n := t.fields[process]
		switch _, ok := law.ProcessNamed(process); {
		case !ok:
			b.fault(n.key, "trust: unknown process %q %s", process, among(process, processNames()))
		case n.form != aText || !digestForm.MatchString(n.text):
			b.fault(n.at, `trust.%s: %s: want the digest of the law, "sha256:" and 64 hexadecimal digits`, process, n.written())
		default:
			b.at["trust."+process] = n.at
		}
	}
}

// outsideWhole checks what is in force in the end.
func (b *builder) outsideWhole() {
	for _, p := range law.Processes {
		if n := b.closed[p.Name]; n != nil && len(b.faults) == 0 {
			b.fault(n.at, "laws.%s: %s is a law outside the program, and nothing opened it here", p.Name, n.text)
		}
		at, given := b.at["trust."+p.Name]
		if _, outside := b.s.Outside[p.Name]; given && !outside && len(b.faults) == 0 {
			b.warn(at, "trust.%s has no effect: the law of the process is %s, which is built in", p.Name, b.s.Laws[p.Name])
		}
	}
}
