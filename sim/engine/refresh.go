package engine

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
)

// Refresh asks every rate anew at the present values. date is in units of
// 10^unit yr; readings are the clocks'. It returns how long, in the same unit,
// the new rates may stand before values that move with time alone call for
// another refresh (+Inf if there are none).
func (e *Environment) refresh(date float64, readings []float64) (float64, error) {
	e.Refreshes++
	m := e.m
	for k, x := range readings {
		e.value[m.slotReading(k)] = x
	}
	if len(m.timedSlots) == 0 {
		return math.Inf(1), e.askRates()
	}
	// First at the values as they stand, to see how far the window may reach;
	// then once more at its middle.
	e.value[slotDate] = num.Log10(date) + e.unit
	if err := e.askRates(); err != nil {
		return 0, err
	}
	window := max(e.window(date), leastWindow*date)
	if math.IsInf(window, 1) || e.value[slotDate] > followed {
		window = math.Inf(1)
		return window, nil
	}
	for k, x := range readings {
		e.value[m.slotReading(k)] = x + 0.5*window*e.Rates[k]
	}
	e.value[slotDate] = num.Log10(date+0.5*window) + e.unit
	return window, e.askRates()
}

// leastWindow keeps a wild rate from windows that no date can tell apart.
const leastWindow = 1e-12

// followed is the log10 date up to which values that move with time alone are
// followed. Rates stand still from there on: a clock that slows down for ever
// would call for windows without end.
const followed = 300

// window is how long the rates may stand.
func (e *Environment) window(date float64) float64 {
	w := math.Inf(1)
	for j, slot := range e.m.declared {
		if !e.m.timed[j] {
			continue
		}
		steep := 1e-9
		for k := range e.slope {
			steep = max(steep, math.Abs(e.slope[k][j]))
		}
		move := min(timeStepInRate/steep, maxTimeMove)
		if slot == slotDate {
			w = min(w, move*date)
			continue
		}
		r := e.Rates[slot-e.m.slotReading(0)]
		if y := e.base[j]; r > 0 && y > 0 {
			w = min(w, move*y/r)
		}
	}
	return w
}

// askRates asks all rate questions in one batch a law: a row at the present
// values and one more for each declared value moved by half a per cent, from
// which the logarithmic slopes follow.
func (e *Environment) askRates() error {
	m := e.m
	rows := 1 + len(m.declared)
	step := e.step[:rows]
	step[0] = 0
	for j, slot := range m.declared {
		e.offset[j], e.seen[j], e.lny[j] = 0, math.NaN(), 0
		v := e.get(slot)
		h := -probeStep
		switch {
		case slot == slotCarried:
			e.offset[j] = e.get(slotMass)
			h = probeStep
		case slot == slotCentral:
			h = probeStep
		case slot == slotDate:
			// The value is already a logarithm: y is the date itself and its
			// move is h in ln date.
			e.base[j], step[j+1] = 1, probeStep/num.Ln10
			continue
		}
		if m.timed[j] && v == 0 {
			// A reading of zero has no relative move; probe a small one.
			e.base[j], step[j+1] = timeProbe, timeProbe*probeStep
			continue
		}
		e.base[j] = v + e.offset[j]
		step[j+1] = h * e.base[j]
	}
	frame := [2][]float64{}
	for i := range e.ask {
		a := &e.ask[i]
		e.fillColumns(a, rows, step, frame)
		e.arena.Reset()
		out, err := a.use.Ask("rate", law.Batch{Rows: rows, Columns: a.columns}.With(&e.arena))
		if err != nil {
			return err
		}
		n := len(a.use.Card.Clocks)
		if a.use.Card.Frame {
			e.Radius, e.Dispersion = out.Columns[n].Values[0], out.Columns[n+1].Values[0]
			e.Stop = out.Columns[n+2].Values[0] >= 1
			frame[0] = append(e.frameRadius[:0], out.Columns[n].Values...)
			frame[1] = append(e.frameDispersion[:0], out.Columns[n+1].Values...)
			e.frameRadius, e.frameDispersion = frame[0], frame[1]
		}
		for c := range n {
			e.slopes(a.first+c, out.Columns[c].Values, step)
		}
	}
	copy(e.Rates, e.rate0)
	return nil
}

// timeProbe stands in for a clock reading of zero when its slope is probed.
const timeProbe = 1e-3

func (e *Environment) fillColumns(a *rateAsk, rows int, step []float64, frame [2][]float64) {
	for i, ref := range a.inputs {
		col := a.columns[i].Values[:rows]
		switch {
		case ref.frame != 0:
			copy(col, frame[ref.frame-1])
		case ref.slot >= 0:
			v := e.get(ref.slot)
			fill(col, v)
			for j, slot := range e.m.declared {
				if slot == ref.slot {
					col[j+1] = v + step[j+1]
				}
			}
		case ref.constant == ref.constant:
			fill(col, ref.constant)
		}
	}
}

// slopes sets rate and slopes of clock k from the answers to the probes.
func (e *Environment) slopes(k int, log10Rate, step []float64) {
	r := log10Rate[0]
	e.rate0[k] = 0
	if r > math.Inf(-1) {
		e.rate0[k] = num.Exp10(r + e.unit)
	}
	for j := range e.m.declared {
		e.slope[k][j] = 0
		p := log10Rate[j+1]
		if r == math.Inf(-1) || p == math.Inf(-1) || e.base[j] == 0 {
			continue
		}
		moved := step[j+1] / e.base[j]
		if e.m.declared[j] == slotDate {
			e.slope[k][j] = (p - r) / step[j+1]
			continue
		}
		e.slope[k][j] = (p - r) * num.Ln10 / num.Log1p(moved)
	}
}
