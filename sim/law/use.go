package law

import "fmt"

// Use is one law as a run uses it: the law, its card, and the values of its
// parameters. Set its parameters, then make it part of one Set; from then on
// it must not be changed and is safe for concurrent use.
type Use struct {
	Law        Law
	Card       Card
	Parameters []float64 // in the order of the card

	role    Role
	asked   []exchange // the questions of the card
	limits  [2]float64 // of Accepts, resolved
	kinds   []string   // word list of the run
	accepts []bool     // by kind code
}

// NewUse prepares a law with its preset parameters.
func NewUse(l Law) *Use {
	c := l.Describe()
	u := &Use{Law: l, Card: c, Parameters: make([]float64, len(c.Parameters)), kinds: KindWords}
	for i, p := range c.Parameters {
		u.Parameters[i] = p.Preset
	}
	p, _ := ProcessNamed(c.Process)
	u.role = p.Role
	for _, q := range c.Questions {
		u.asked = append(u.asked, exchange{q.Name, inputsOf(q), outputsOf(c, q.Name)})
	}
	u.limits = [2]float64{-inf, inf}
	u.resolve()
	u.bind()
	return u
}

// resolve sets the limits that hang on this law alone. Those that hang on
// another process's parameter stay open until the law is part of a Set.
func (u *Use) resolve() {
	for side, l := range []Limit{u.Card.Accepts.Low, u.Card.Accepts.High} {
		if !l.Set {
			continue
		}
		if l.Parameter == "" {
			u.limits[side] = l.Value
		} else if v, ok := u.Parameter(l.Parameter); ok {
			u.limits[side] = v
		}
	}
}

// ID is process/name.
func (u *Use) ID() string { return u.Card.Process + "/" + u.Card.Name }

// Parameter returns the value of the named parameter.
func (u *Use) Parameter(name string) (float64, bool) {
	for i, p := range u.Card.Parameters {
		if p.Name == name {
			return u.Parameters[i], true
		}
	}
	return 0, false
}

// Set sets a parameter. The value is checked against the card's range; a word
// parameter takes an index.
func (u *Use) Set(name string, value float64) error {
	for i, p := range u.Card.Parameters {
		if p.Name != name {
			continue
		}
		low, high := p.Low, p.High
		if len(p.Words) > 0 {
			low, high = 0, float64(len(p.Words)-1)
			if value != float64(int(value)) {
				return fmt.Errorf("law %s: parameter %s: %v is no index of its words", u.ID(), name, value)
			}
		}
		if !(value >= low && value <= high) {
			return fmt.Errorf("law %s: parameter %s: %v %s is outside %v .. %v", u.ID(), name, value, p.Unit, low, high)
		}
		u.Parameters[i] = value
		u.resolve()
		return nil
	}
	return fmt.Errorf("law %s: no parameter %q", u.ID(), name)
}

// Speaks tells whether the law speaks for an object of this kind, mass and
// metals.
func (u *Use) Speaks(kind uint8, mass, metals float64) bool {
	if int(kind) >= len(u.accepts) || !u.accepts[kind] {
		return false
	}
	switch u.Card.Accepts.Column {
	case "mass":
		return mass >= u.limits[0] && mass < u.limits[1]
	case "metals":
		return metals >= u.limits[0] && metals < u.limits[1]
	}
	return true
}

// SpeaksForKind tells whether the law speaks for any object of this kind, and
// whether for all of them.
func (u *Use) SpeaksForKind(kind uint8) (any, all bool) {
	any = int(kind) < len(u.accepts) && u.accepts[kind]
	return any, any && u.Card.Accepts.Column == ""
}

// Limits returns the resolved range of Accepts.Column.
func (u *Use) Limits() (low, high float64) { return u.limits[0], u.limits[1] }

// ThresholdMass resolves the mass of a threshold of this law.
func (u *Use) ThresholdMass(t Threshold) float64 {
	if t.Parameter == "" {
		return t.Mass
	}
	v, _ := u.Parameter(t.Parameter)
	if len(t.ByWord) > 0 {
		return t.ByWord[int(v)]
	}
	return v
}

func (u *Use) bind() {
	u.accepts = make([]bool, len(u.kinds))
	for i, k := range u.kinds {
		u.accepts[i] = len(u.Card.Accepts.Kinds) == 0 || contains(u.Card.Accepts.Kinds, k)
	}
}

func contains(words []string, word string) bool {
	for _, w := range words {
		if w == word {
			return true
		}
	}
	return false
}
