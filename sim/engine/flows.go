package engine

import (
	"math/bits"

	"wane/sim/num"
)

// flow is one kind of change in a plain run: from one state, for one cause.
// What it means for the populations is worked out once, and the changes only
// counted; what must be kept one by one are the dates of exits.
type flow struct {
	count         int64
	first, last   float64
	exits, enters uint64    // populations
	logs          uint64    // of the exits: those counted in log10 years while the date is in years
	known, lent   bool      // lent: its dates are the population's
	kept          int       // dates kept: dates[:kept]
	dates, own    []float64 // own: memory of a small list, kept for the next run
}

// flows is the table of flows of one realisation. A birth is the flow of its
// own state for cause 0.
type flows struct {
	table  []flow
	causes int
}

func (f *flows) reset(m *Model) {
	f.causes = len(m.Causes)
	f.table = grown(f.table, len(m.Set.Kinds)*statesAKind*f.causes)
	for i := range f.table {
		if x := &f.table[i]; x.known {
			*x = flow{dates: x.own, own: x.own}
		}
	}
}

func (f *flows) of(from state, cause uint8) *flow { return &f.table[int(from)*f.causes+int(cause)] }

// recent is the flow that was looked up last in one place: it is nearly always
// the next one too.
type recent struct {
	flow *flow
	key  int
}

func (r *recent) is(from state, cause uint8) bool {
	return r.flow != nil && r.key == int(from)<<8|int(cause)
}

func (r *recent) look(f *flows, from state, cause uint8) *flow {
	r.flow, r.key = f.of(from, cause), int(from)<<8|int(cause)
	return r.flow
}

// learn works out what a flow means. to is where it leads; years, that its
// dates are in years.
func (n *counts) learn(x *flow, from, to state, years bool) {
	before, after := n.mask[from], n.mask[to]
	x.exits, x.enters, x.known = before&^after, after&^before, true
	x.first, x.last = never, -never
	if years {
		x.logs = x.exits & n.inLog
	}
}

// move enters one change of a flow.
func (n *counts) move(x *flow, date float64) {
	x.count++
	if date > x.last {
		x.last = date
	}
	if date < x.first {
		x.first = date
	}
	if x.exits == 0 {
		return
	}
	if x.kept == len(x.dates) {
		n.moreRoom(x)
	}
	x.dates[x.kept] = date
	x.kept++
}

// moveAll enters changes of a flow.
func (n *counts) moveAll(x *flow, dates []float64) {
	x.count += int64(len(dates))
	first, last := x.first, x.last
	for _, date := range dates {
		if date > last {
			last = date
		}
		if date < first {
			first = date
		}
	}
	x.first, x.last = first, last
	if x.exits == 0 {
		return
	}
	for len(dates) > 0 {
		if x.kept == len(x.dates) {
			n.moreRoom(x)
		}
		k := copy(x.dates[x.kept:], dates)
		x.kept, dates = x.kept+k, dates[k:]
	}
}

// born is the flow of births into a state.
func (n *counts) born(now state) *flow {
	x := n.flows.of(now, 0)
	if !x.known {
		n.learn(x, stateGone, now, true)
	}
	return x
}

// moreRoom moves a flow's dates to where there is room for more: memory that is
// lent if it is twice as large, else its own.
func (n *counts) moreRoom(x *flow) {
	k := x.kept
	if last := len(n.spare) - 1; last >= 0 && k >= 4096 && cap(n.spare[last]) >= 2*k {
		to := n.spare[last][:cap(n.spare[last])]
		copy(to, x.dates)
		x.dates, n.spare = to, n.spare[:last]
		return
	}
	x.own = append(make([]float64, 0, max(64, k+k/2)), x.dates...)
	x.own = x.own[:cap(x.own)]
	x.dates = x.own
}

// settleFlows enters the flows into the populations' counts. Of the flows that
// leave a population, the largest that leaves no other lends its memory; the
// dates of the rest are copied to it.
func (n *counts) settleFlows(b *books) {
	for p := range n.exits {
		n.lendLargest(p)
	}
	for i := range n.flows.table {
		x := &n.flows.table[i]
		if x.count == 0 {
			continue
		}
		cause := uint8(i % n.flows.causes)
		if cause != 0 {
			b.fired[cause] += x.count
		}
		for e := x.exits; e != 0; e &= e - 1 {
			p := bits.TrailingZeros64(e)
			n.left[p][cause] += x.count
			n.takeExits(p, x, cause)
		}
		for e := x.enters; e != 0; e &= e - 1 {
			p := bits.TrailingZeros64(e)
			n.entered[p] += int(x.count)
			n.lastIn[p] = max(n.lastIn[p], x.last)
		}
	}
}

// lendLargest hands population p the dates of its largest flow.
func (n *counts) lendLargest(p int) {
	var largest *flow
	for i := range n.flows.table {
		x := &n.flows.table[i]
		if x.exits == 1<<p && x.logs == 0 && x.kept > 0 && (largest == nil || x.count > largest.count) {
			largest = x
		}
	}
	if largest != nil {
		n.exits[p], n.aliased = largest.dates[:largest.kept], n.aliased|1<<p
		largest.lent = true
	}
}

// takeExits enters a flow's dates into a population it leaves.
func (n *counts) takeExits(p int, x *flow, cause uint8) {
	first, last, logs := x.first, x.last, x.logs>>p&1 != 0
	if logs {
		first, last = num.Log10(first), num.Log10(last)
	}
	n.firstOut[p] = min(n.firstOut[p], first)
	if last >= n.lastOut[p] {
		n.lastOut[p], n.lastWhy[p] = last, cause
	}
	if x.lent {
		return
	}
	at := len(n.exits[p])
	n.exits[p] = append(n.exits[p], x.dates[:x.kept]...)
	if logs {
		num.Log10Into(n.exits[p][at:], x.dates[:x.kept])
	}
}
