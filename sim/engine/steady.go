package engine

// steadyNumbers is what one clock of a quiet leg does to the exponentials of a
// chunk: the first piece of its history (reading r0 at date t0, growing at
// rate) and the reading at which the leg ends.
type steadyNumbers struct{ t0, r0, rate, limit float64 }

// enterSteady lists the objects first .. of a chunk that clock k can reach
// before the leg ends, in either stage, and turns the exponentials of all into
// readings, under the first piece of the history and to the end of the leg:
// readingOf for a chunk. What is born and stays in its second stage has its
// death at its birth.
func (w *Workspace) enterSteady(list []uint32, k, first int, s0, s1 []float64) []uint32 {
	c := &w.c
	var of steadyNumbers
	of.t0, of.r0, of.rate = w.past.piece(0, k)
	of.limit = w.caps[k]
	n := len(s0)
	x, birth, death := c.reading[k][first:first+n], c.birth[first:first+n], c.death[first:first+n]
	s1 = s1[:n]
	for i := 0; i < n; {
		done, next := steadyLanes(x[i:], birth[i:], death[i:], s0[i:], s1[i:], &of)
		i += done
		for to := min(i+next, n); i < to; i++ {
			e := x[i]
			if e <= s0[i]*of.limit || e <= s1[i]*of.limit {
				list = append(list, uint32(first+i))
			}
			b := of.r0 + of.rate*(birth[i]-of.t0)
			d := of.r0 + of.rate*(death[i]-of.t0)
			x[i] = d + (e-s0[i]*(d-b))/s1[i]
		}
	}
	return list
}
