package reference

import (
	"math"

	"wane/sim/law"
)

// hole is the central hole. Its mass is real, not of the sample.
type hole struct {
	mass   float64
	grown  float64 // log10 date at which it last grew
	looked float64 // mass when it was last asked
	end    prospect
	story  []Change
}

const holeState = "central-hole/central/founded"

func (h *hole) begin(g *run) {
	h.mass, h.grown = g.setup.CentralMass, g.first
	if math.IsInf(g.first, 1) {
		h.grown = 0 // no object dates the galaxy
	}
	h.end.date = never
	if h.mass > 0 {
		h.story = append(h.story, Change{Date: h.grown, To: holeState})
	}
}

func (h *hole) swallow(g *run, mass float64) {
	if h.mass == 0 {
		h.story = append(h.story, Change{Date: g.log(g.t), To: holeState})
	}
	h.mass += mass
	h.grown = g.log(g.t)
}

// look ends the hole at a refresh, if its time has come by then. What was
// foretold of a lighter hole is a lower bound for what it has become.
func (h *hole) look(g *run) error {
	if h.mass == 0 || h.looked > 0 && h.end.date > g.log(g.t) {
		return nil
	}
	if err := h.foretell(g); err != nil {
		return err
	}
	if h.end.date <= g.log(g.t) {
		g.add("central_mass", -h.mass)
		h.finish(g)
	}
	return nil
}

func (h *hole) foretell(g *run) (err error) {
	if h.mass == h.looked {
		return nil
	}
	h.looked = h.mass
	h.end, err = g.foretell(row{id: uint64(g.setup.Objects), kind: law.CentralHole, comp: law.Pure, place: law.Central,
		mass: h.mass, birthMass: h.mass}, h.grown)
	return err
}

func (h *hole) finish(g *run) {
	h.story = append(h.story, Change{h.end.date, holeState, "", h.end.cause.String()})
	g.fired[h.end.cause.Process]++
	g.light += h.mass / g.weight
	h.mass, h.looked = 0, 0
}
