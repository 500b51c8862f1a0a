package engine

import (
	"math"

	"wane/sim/law"
)

// Wearing of bound objects. Their masses feed back on the galaxy, so they are
// brought up to date in steps: when the first bound object has lost 1 % since
// its mass was last set, every bound object that has lost half a per cent or
// more is set to what it then weighs (midpoint rule), its susceptibilities are
// asked again, and its unspent thresholds rescaled. That ends where a step would
// take an object to its threshold, or below a thousandth of what it began with.
const (
	wearToStep = 0.01
	wearToJoin = 0.005
)

type wearing struct {
	at    float64 // date of the next step, or a bound before it
	since []float64
	rate  []float64 // solMass per unit of time; 0: it does not wear, or nears its end
	born  []float64 // mass at the beginning of that stage
	known []uint8   // stage for which these hold
	ids   []uint32
	lost  float64 // solMass of the sample
	worn  map[uint32][]wornOff
}

// wornOff is how much an object has lost in a stage of its present life.
type wornOff struct {
	stage int
	mass  float64
}

func (x *wearing) begin() { x.at, x.lost = never, 0; x.known = x.known[:0]; clear(x.worn) }

func (x *wearing) scale(f float64) {
	x.at *= f
	for i := range x.since {
		x.since[i] *= f
		x.rate[i] /= f
	}
}

// enter takes in that object i has entered a stage.
func (x *wearing) enter(w *Workspace, i uint32) {
	if len(x.known) > 0 {
		x.known[i] = 0
		if w.stageOf(i) >= 2 {
			x.at = min(x.at, w.entered(i)+w.linear(w.c.wearStep))
		}
	}
}

// wearDown brings worn masses up to date.
func (w *Workspace) wearDown() error {
	x, c, t := &w.wear, &w.c, w.t
	if err := w.holdSusceptibilities(); err != nil {
		return err
	}
	if len(x.known) == 0 {
		x.since, x.rate, x.born = grown(x.since, c.n), grown(x.rate, c.n), grown(x.born, c.n)
		x.known = grown(x.known, c.n)
		clear(x.known)
	}
	if err := w.learnRates(); err != nil {
		return err
	}
	// The date that led here may have been a bound; a step waits for its own.
	if x.at = w.nextWearStep(); x.at > t*(1+1e-14) {
		return nil
	}
	x.ids = x.ids[:0]
	for i := range uint32(c.n) {
		if w.wears(i) && x.rate[i]*(t-x.since[i]) >= wearToJoin*(1-1e-12)*w.massOf(i) {
			x.ids = append(x.ids, i)
		}
	}
	if err := w.wearStep(); err != nil {
		return err
	}
	if err := w.learnRates(); err != nil { // of what a refresh in that step brought in
		return err
	}
	x.at = max(w.nextWearStep(), math.Nextafter(t, never))
	return nil
}

// nextWearStep is the date at which the first bound object has lost 1 % since
// its mass was last set.
func (w *Workspace) nextWearStep() float64 {
	x, at := &w.wear, never
	for i := range uint32(w.c.n) {
		if w.wears(i) && x.known[i] == w.stage[i] && x.rate[i] > 0 {
			at = min(at, x.since[i]+wearToStep*w.massOf(i)/x.rate[i])
		}
	}
	return at
}

// wears tells whether object i is bound, in a stage that wears.
func (w *Workspace) wears(i uint32) bool {
	return w.c.place[i] == law.Bound && w.stage[i] >= 2 && w.stage[i]&waiting == 0
}

// holdSusceptibilities ends a compact run: they are needed from now on.
func (w *Workspace) holdSusceptibilities() error {
	if !w.compact {
		return nil
	}
	w.compact = false
	return w.exposeAll()
}

// wearStep sets the masses of wear.ids to what they weigh now.
func (w *Workspace) wearStep() error {
	x, t := &w.wear, w.t
	ids := x.ids[:0]
	for _, i := range x.ids {
		if mass := w.massOf(i); mass-x.rate[i]*(t-x.since[i]) > w.leastWorn(i) {
			ids = append(ids, i)
		} else {
			x.rate[i], x.since[i] = 0, t // its prospect is about to end it
		}
	}
	if x.ids = ids; len(ids) == 0 {
		return nil
	}
	r := w.rowsOf(x.ids)
	before := append([]float64(nil), r.mass...)
	for j, i := range x.ids {
		r.mass[j] -= 0.5 * x.rate[i] * (t - x.since[i])
	}
	mid, _, err := w.wearRates(r, false)
	if err != nil {
		return err
	}
	for j, i := range x.ids {
		// Where the rate drops within the step, as that of a hole whose memory begins
		// to hold it back, the object has got as far as the drop, which is no further
		// off than the middle. Else it would never pass it.
		r.mass[j] = before[j] - max(mid[j], 0.5*x.rate[i])*(t-x.since[i])
		if !(r.mass[j] > w.leastWorn(i)) {
			r.mass[j], x.rate[i] = before[j], 0 // its prospect is about to end it
		}
	}
	s, err := w.ask.exposures(r)
	if err != nil {
		return err
	}
	for j, i := range x.ids {
		x.since[i] = t
		if r.mass[j] == before[j] {
			continue
		}
		w.keepUnspent(i, t)
		w.countStuff(i, -1)
		w.lighten(i, before[j]-r.mass[j])
		w.setSusceptibilities(i, s, w.ask.soughts, j)
		w.countStuff(i, +1)
		w.meets.renew(w, i)
		for k := range w.m.Clocks {
			w.respend(k, i, t)
		}
	}
	rate, _, err := w.wearRates(r, false)
	if err != nil {
		return err
	}
	for j, i := range x.ids {
		if x.rate[i] != 0 {
			x.rate[i] = rate[j]
		}
	}
	return w.changed(t)
}

// wornAway is the part of its mass at entry below which an object is not
// brought up to date any more: it hardly counts, and its last steps would have
// no end.
const wornAway = 1e-3

// leastWorn is the mass down to which steps of wearing take object i.
func (w *Workspace) leastWorn(i uint32) float64 {
	return max(w.thresholdOf(w.kindOf(i))*(1+1e-9), wornAway*w.wear.born[i])
}

// thresholdOf is the largest threshold of a kind.
func (w *Workspace) thresholdOf(kind uint8) float64 {
	most := 0.0
	for _, row := range w.m.thresholds {
		if row[kind].applies {
			most = max(most, row[kind].mass)
		}
	}
	return most
}

// lighten takes worn mass off object i. Earlier stages lose as much, so that
// what a stage's change gave off stays what it was.
func (w *Workspace) lighten(i uint32, loss float64) {
	c := &w.c
	w.wear.lost += loss
	if w.wear.worn == nil {
		w.wear.worn = map[uint32][]wornOff{}
	}
	worn := w.wear.worn[i]
	if n := len(worn); n > 0 && worn[n-1].stage == w.stageOf(i) {
		worn[n-1].mass += loss
	} else {
		w.wear.worn[i] = append(worn, wornOff{w.stageOf(i), loss})
	}
	c.mass0[i] -= loss
	c.mass1[i] -= loss
	for k := 0; k <= w.stageOf(i)-3; k++ {
		c.chain[i][k].mass -= loss
	}
}

func (w *Workspace) setSusceptibilities(i uint32, s, sought [][]float64, row int) {
	stage := w.stageOf(i)
	for k := range w.m.Clocks {
		x := 0.0
		if sought[k] != nil {
			x = sought[k][row]
		}
		if stage > 2 {
			l := &w.c.chain[i][stage-3]
			l.s[k], l.sought[k] = s[k][row], x
			continue
		}
		w.s[stage-1][k][i] = s[k][row]
		w.meets.set(stage-1, k, i, x)
	}
}
