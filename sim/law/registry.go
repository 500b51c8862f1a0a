package law

import (
	"errors"
	"fmt"
	"sort"
)

// Registry holds the laws a program knows, by process and name.
type Registry struct {
	laws map[string]map[string]Law
}

// NewRegistry returns a registry of the given laws. It fails on a law that
// claims a process Wane does not know, whose card is faulty, or whose name is
// taken.
func NewRegistry(laws ...Law) (*Registry, error) {
	r := &Registry{laws: map[string]map[string]Law{}}
	for _, l := range laws {
		if err := r.Add(l); err != nil {
			return nil, err
		}
	}
	return r, nil
}

// Add adds a law.
func (r *Registry) Add(l Law) error {
	c := l.Describe()
	if faults := CheckCard(c); len(faults) > 0 {
		return fmt.Errorf("law %s/%s: %w", c.Process, c.Name, errors.Join(faults...))
	}
	if r.laws[c.Process] == nil {
		r.laws[c.Process] = map[string]Law{}
	}
	if _, taken := r.laws[c.Process][c.Name]; taken {
		return fmt.Errorf("law %s/%s: registered twice", c.Process, c.Name)
	}
	r.laws[c.Process][c.Name] = l
	return nil
}

// Put adds a law in the place of the one of its process and name, if there is
// one, as a law outside the program may be called like one that is built in.
func (r *Registry) Put(l Law) error {
	c := l.Describe()
	old, taken := r.laws[c.Process][c.Name]
	delete(r.laws[c.Process], c.Name)
	err := r.Add(l)
	if err != nil && taken {
		r.laws[c.Process][c.Name] = old
	}
	return err
}

// Find returns the law process/name.
func (r *Registry) Find(process, name string) (Law, bool) {
	l, ok := r.laws[process][name]
	return l, ok
}

// Names lists the laws of a process in alphabetical order.
func (r *Registry) Names(process string) []string {
	names := make([]string, 0, len(r.laws[process]))
	for n := range r.laws[process] {
		names = append(names, n)
	}
	sort.Strings(names)
	return names
}

// All lists every law, in the order of [Processes], then of names.
func (r *Registry) All() []Law {
	var out []Law
	for _, p := range Processes {
		for _, n := range r.Names(p.Name) {
			out = append(out, r.laws[p.Name][n])
		}
	}
	return out
}
