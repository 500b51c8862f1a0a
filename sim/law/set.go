package law

import (
	"fmt"
	"strings"
)

// Set is the laws of one run: one Use per process, with all parameters set
// and all limits and kinds resolved between them.
type Set struct {
	uses  map[string]*Use
	Kinds []string // the word list of kinds of this run
}

// NewSet resolves laws into a run's set: word lists are merged, and limits that name
// another law's parameter are looked up. It returns every fault it finds. A
// Use belongs to one Set; change its parameters before, not after.
func NewSet(uses ...*Use) (*Set, []error) {
	s := &Set{uses: map[string]*Use{}, Kinds: append([]string(nil), KindWords...)}
	var faults []error
	type madeBy struct {
		composition uint8
		law         string
	}
	made := map[string]madeBy{}
	for _, u := range uses {
		if _, twice := s.uses[u.Card.Process]; twice {
			faults = append(faults, fmt.Errorf("process %s: two laws", u.Card.Process))
			continue
		}
		s.uses[u.Card.Process] = u
		for _, k := range u.Card.Kinds {
			if !contains(s.Kinds, k.Name) {
				s.Kinds = append(s.Kinds, k.Name)
				made[k.Name] = madeBy{k.Composition, u.ID()}
			} else if m, ok := made[k.Name]; ok && m.composition != k.Composition {
				faults = append(faults, fmt.Errorf("kind %q: laws %s and %s disagree on what it is made of", k.Name, m.law, u.ID()))
			}
		}
	}
	if len(s.Kinds) > NoWord {
		faults = append(faults, fmt.Errorf("%d kinds of object: at most %d", len(s.Kinds), NoWord))
	}
	for _, u := range uses {
		u.kinds = s.Kinds
		u.bind()
		for side, limit := range []Limit{u.Card.Accepts.Low, u.Card.Accepts.High} {
			if !limit.Set || limit.Parameter == "" {
				continue
			}
			v, err := s.lookUp(u, limit.Parameter)
			if err != nil {
				faults = append(faults, err)
				continue
			}
			u.limits[side] = v
		}
		for _, k := range u.Card.Accepts.Kinds {
			if !contains(s.Kinds, k) && !knownAnywhere(k) {
				faults = append(faults, fmt.Errorf("law %s accepts kind %q, which no law of this run makes", u.ID(), k))
			}
		}
	}
	return s, faults
}

// knownAnywhere lists kinds that built-in laws add, so that a law may accept a
// kind that happens not to be made in this run.
func knownAnywhere(kind string) bool { return kind == "relic" || kind == "iron-star" }

func (s *Set) lookUp(u *Use, name string) (float64, error) {
	from := u
	if process, parameter, ok := strings.Cut(name, "."); ok {
		if from = s.uses[process]; from == nil {
			return 0, fmt.Errorf("law %s: its range hangs on %s, but no law of process %s is in the run", u.ID(), name, process)
		}
		name = parameter
	}
	v, ok := from.Parameter(name)
	if !ok {
		return 0, fmt.Errorf("law %s: its range hangs on parameter %s, which law %s does not have", u.ID(), name, from.ID())
	}
	return v, nil
}

// Of returns the law in use for a process, or nil.
func (s *Set) Of(process string) *Use { return s.uses[process] }

// OfRole returns the laws in use of a role, in the order of [Processes].
func (s *Set) OfRole(r Role) []*Use {
	var out []*Use
	for _, p := range Processes {
		if u := s.uses[p.Name]; u != nil && p.Role == r {
			out = append(out, u)
		}
	}
	return out
}

// All returns every law in use, in the order of [Processes].
func (s *Set) All() []*Use {
	var out []*Use
	for _, p := range Processes {
		if u := s.uses[p.Name]; u != nil {
			out = append(out, u)
		}
	}
	return out
}

// Kind returns the code of a kind in this run, NoWord if it has none.
func (s *Set) Kind(word string) uint8 {
	for i, k := range s.Kinds {
		if k == word {
			return uint8(i)
		}
	}
	return NoWord
}
