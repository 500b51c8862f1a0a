package engine

import "wane/sim/law"

// Change is one change of an object's state, in words.
type Change struct {
	Date     float64
	From, To string
	Cause    string
}

// Histories are the changes of every object in the last realisation, up to its
// end.
func (w *Workspace) Histories(end float64) [][]Change {
	out := make([][]Change, w.c.n)
	word := func(s state) string {
		if s == stateGone {
			return ""
		}
		return w.m.Set.Kinds[s.kind()] + "/" + law.PlaceWords[s%statesAKind/2] + "/" + law.OriginWords[s%2]
	}
	cause := func(code uint8) string {
		if code == 0 {
			return ""
		}
		return w.m.causeWord(code)
	}
	for _, t := range w.meets.journal {
		out[t.id] = append(out[t.id], Change{w.logDate(t.date), word(t.from), word(t.to), cause(t.cause)})
	}
	for i := range uint32(w.c.n) {
		w.each(i, w.logDates(i), end, func(date float64, from, to state, code uint8) {
			out[i] = append(out[i], Change{date, word(from), word(to), cause(code)})
		})
	}
	return out
}
