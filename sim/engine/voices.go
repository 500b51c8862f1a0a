package engine

import (
	"bytes"
	"slices"

	"wane/sim/law"
)

// spoken returns the rows of r that use speaks for: r itself when it speaks
// for all, else a gathered copy, with the row numbers in pick. Both are good
// until the next call.
func (a *asker) spoken(use *law.Use, r *rows) (s *rows, pick []int32) {
	v := a.m.voices[use]
	whole, none := true, true
	if kind, one := oneKind(r.kind[:r.n]); one {
		whole, none = v.all[kind], !v.some[kind]
	} else {
		said := uint8(wholeBit | noneBit)
		for _, k := range r.kind[:r.n] {
			said &= v.says[k]
		}
		whole, none = said&wholeBit != 0, said&noneBit != 0
	}
	if whole {
		return r, nil
	}
	a.pick = a.pick[:0]
	if !none {
		for i, k := range r.kind[:r.n] {
			if v.all[k] || v.some[k] && use.Speaks(k, r.mass[i], r.metals[i]) {
				a.pick = append(a.pick, int32(i))
			}
		}
	}
	if len(a.pick) == r.n && r.n > 0 {
		return r, nil
	}
	a.sub.gather(r, a.pick, v.reads)
	return a.sub, a.pick
}

// oneKind tells whether all are of one kind, and which.
func oneKind(kinds []uint8) (kind uint8, one bool) {
	if len(kinds) == 0 {
		return 0, true
	}
	return kinds[0], bytes.Count(kinds, kinds[:1]) == len(kinds)
}

// voice is for which kinds a law speaks, for some or all objects of a kind,
// and which columns it reads.
type voice struct {
	some, all [256]bool
	says      [256]uint8 // wholeBit, noneBit: all of that kind, none
	reads     columnSet
	draws     bool // it reads a draw of the object
}

const (
	wholeBit = 1 << iota
	noneBit
)

func (m *Model) compileVoices() {
	m.voices = map[*law.Use]*voice{}
	for _, u := range m.Set.All() {
		v := &voice{reads: reads(u)}
		for _, q := range u.Card.Questions {
			if slices.Contains(q.Inputs, "u") || slices.Contains(q.Inputs, "e") {
				v.draws = true
			}
		}
		switch p, _ := law.ProcessNamed(u.Card.Process); p.Role {
		case law.Turning:
			m.stagesDraw = true
		case law.Wearing, law.Dynamics, law.Encounter:
			m.stagesDraw = m.stagesDraw || v.draws
		}
		for k := range m.Set.Kinds {
			v.some[k], v.all[k] = u.SpeaksForKind(uint8(k))
			if v.all[k] {
				v.says[k] |= wholeBit
			}
		}
		for k, some := range v.some {
			if !some {
				v.says[k] |= noneBit
			}
		}
		m.voices[u] = v
	}
}

// at returns the row of r that row i of the spoken rows stands for.
func at(pick []int32, i int) int {
	if pick == nil {
		return i
	}
	return int(pick[i])
}
