package engine

import (
	"wane/sim/law"
)

// tallyPlain is tallyChunk for all objects in a plain run. It must say what
// books.life and each say; it has no need to ask what kinds of things can
// happen.
func (w *Workspace) tallyPlain() {
	c, n, b := &w.c, &w.counts, &w.books
	n.flows.reset(w.m)
	n.states = grown(n.states, min(chunk, c.n))
	for first := 0; first < c.n; first += chunk {
		size := min(chunk, c.n-first)
		if !w.tallyStars(first, size) {
			w.tallyFirst(first, size)
		}
		w.tallySecond(first, size)
		b.post()
	}
	n.settleFlows(b)
}

// tallyStars is tallyFirst for a chunk of one kind that all died as such where
// they were born.
func (w *Workspace) tallyStars(first, size int) bool {
	c, n := &w.c, &w.counts
	kind0, died := c.kind0[first:first+size], c.died[first:first+size]
	births, deaths, leaves := c.birth[first:first+size], c.death[first:first+size], c.leave[first:first+size]
	kind, one := oneKind(kind0)
	if !one {
		return false
	}
	latest := births[0]
	for i, death := range deaths {
		birth := births[i]
		if !(death <= leaves[i] && birth <= death) || death == never || died[i] == 0 {
			return false
		}
		if birth > latest {
			latest = birth
		}
	}
	now := stateOf(kind, law.Bound, law.Founded)
	x := n.born(now)
	x.count += int64(size)
	x.last = max(x.last, latest)
	kind1 := c.kind1[first : first+size]
	for i, k := range kind1 {
		n.states[i] = stateOf(k, law.Bound, law.Founded)
	}
	for from := 0; from < size; {
		why, to := died[from], from+1
		for to < size && died[to] == why {
			to++
		}
		x := n.flows.of(now, why)
		if !x.known {
			n.learn(x, now, n.states[from], true)
		}
		n.moveAll(x, deaths[from:to])
		w.books.sheds(why, c.mass0[first+from:first+to], c.mass1[first+from:first+to])
		from = to
	}
	return true
}

// tallyFirst tallies births, deaths and what leaves before its death, and
// notes the state in which each object enters its second stage, or stateGone.
func (w *Workspace) tallyFirst(first, size int) {
	c, n, b := &w.c, &w.counts, &w.books
	for i := range size {
		j := first + i
		n.states[i] = stateGone
		birth, leave := c.birth[j], c.leave[j]
		if leave < birth {
			b.fired[c.left[j]]++
			b.takes(w, uint32(j), c.mass0[j])
			continue
		}
		now := stateOf(c.kind0[j], law.Bound, law.Founded)
		x := n.born(now)
		x.count++
		x.last = max(x.last, birth)
		why := c.died[j]
		if why == 0 {
			n.states[i] = now
			continue
		}
		death := c.death[j]
		if leave < death {
			if now = w.plainLeave(j, now, leave, c.mass0[j]); now == stateGone {
				continue
			}
		}
		if death == never {
			w.rests(now, c.mass0[j])
			continue
		}
		to := stateOf(c.kind1[j], 0, law.Founded) + now%statesAKind
		if x = n.flows.of(now, why); !x.known {
			n.learn(x, now, to, true)
		}
		n.move(x, death)
		n.states[i] = to
		b.sheds(why, c.mass0[j:j+1], c.mass1[j:j+1])
	}
}

// tallySecond tallies what leaves in its second stage and its end.
func (w *Workspace) tallySecond(first, size int) {
	c, n := &w.c, &w.counts
	leaves, left, place := c.leave[first:first+size], c.left[first:first+size], c.place[first:first+size]
	mass1, end, ended := c.mass1[first:first+size], c.end[first:first+size], c.ended[first:first+size]
	var atLeave, atEnd recent
	radiated := 0.0
	for i, now := range n.states[:size] {
		if now == stateGone {
			continue
		}
		if leave := leaves[i]; leave < never && now%statesAKind/2 == law.Bound {
			if place[i] != law.Adrift {
				w.plainLeave(first+i, now, leave, mass1[i])
				continue
			}
			to := now + 2*law.Adrift
			x := atLeave.flow
			if !atLeave.is(now, left[i]) {
				if x = atLeave.look(&n.flows, now, left[i]); !x.known {
					n.learn(x, now, to, true)
				}
			}
			n.move(x, leave)
			now = to
		}
		date := end[i]
		if date == never {
			w.rests(now, mass1[i])
			continue
		}
		x := atEnd.flow
		if !atEnd.is(now, ended[i]) {
			if x = atEnd.look(&n.flows, now, ended[i]); !x.known {
				n.learn(x, now, stateGone, false)
			}
		}
		n.move(x, date)
		radiated += mass1[i]
	}
	w.books.part.radiated += radiated
}

// sheds enters what objects lose that enter their second stage, in a plain run.
func (b *books) sheds(why uint8, before, after []float64) {
	sum := 0.0
	for i, m := range before {
		sum += m - after[i]
	}
	if b.radiates[why] {
		b.part.radiated += sum
	} else {
		b.part.gas += sum
	}
}

// plainLeave enters the leaving of object i, which weighs mass, and returns
// the state it is in then.
func (w *Workspace) plainLeave(i int, now state, leave, mass float64) state {
	n, c := &w.counts, &w.c
	to := stateGone
	if c.place[i] == law.Adrift {
		to = now + 2*law.Adrift
	}
	x := n.flows.of(now, c.left[i])
	if !x.known {
		n.learn(x, now, to, true)
	}
	n.move(x, leave)
	if to == stateGone {
		w.books.takes(w, uint32(i), mass)
	}
	return to
}
