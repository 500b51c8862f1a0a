package encounter

import "wane/sim/law"

// The outcomes, by code.
const (
	merged = iota
	tornApart
	halfSwallowed
	dwarfsMerged
	exploded
	collapsed
	neutronMerged
	tooHeavy
	swallowedWhole
	holesMerged
)

var outcomes = []law.Outcome{
	{Word: "merged", Doc: "two stars or brown dwarfs are one"},
	{Word: "torn-apart", Doc: "a star or brown dwarf turns to gas at a white dwarf or neutron star"},
	{Word: "half-swallowed", Doc: "half of a star or brown dwarf falls into a black hole, half turns to gas"},
	{Word: "dwarfs-merged", Doc: "two white dwarfs are one"},
	{Word: "exploded", Doc: "two white dwarfs too heavy together turn to gas"},
	{Word: "collapsed", Doc: "two white dwarfs too heavy together become a neutron star, or a black hole"},
	{Word: "neutron-stars-merged", Doc: "a neutron star takes up another, or a white dwarf"},
	{Word: "too-heavy", Doc: "a neutron star with another, or with a white dwarf, becomes a black hole"},
	{Word: "swallowed-whole", Doc: "a white dwarf or neutron star falls into a black hole"},
	{Word: "holes-merged", Doc: "two black holes are one"},
}

// What merging loses (assumptions).
const (
	dwarfsKeep  = 0.99 // two white dwarfs; the rest is gas
	neutronKeep = 0.98 // a neutron star with a compact object; the rest is radiated
	holeTakes   = 0.5  // of a star or brown dwarf; the rest is gas
)

// class is how an object behaves in a collision, softer ones first.
type class uint8

const (
	soft class = iota
	dwarf
	neutron
	hole
)

func classOf(kind uint8) class {
	switch kind {
	case law.Star, law.BrownDwarf:
		return soft
	case law.NeutronStar:
		return neutron
	case law.BlackHole, law.CentralHole:
		return hole
	}
	return dwarf
}

// body is one of two that meet, or what is left of it. Its kind is
// law.NoWord when nothing is.
type body struct {
	kind, composition uint8
	mass              float64
}

var nothing = body{kind: law.NoWord, composition: law.NoWord}

func meet(in law.Batch) law.Batch {
	var kind, composition [2][]uint8
	var mass [2][]float64
	for s, end := range [2]string{"_1", "_2"} {
		kind[s], mass[s], composition[s] = in.Words("kind"+end), in.Values("mass"+end), in.Words("composition"+end)
	}
	outcome, gas := in.NewWords(), in.NewValues()
	var kinds, compositions [2][]uint8
	var masses [2][]float64
	for s := range 2 {
		kinds[s], masses[s], compositions[s] = in.NewWords(), in.NewValues(), in.NewWords()
	}
	for i := range in.Rows {
		var pair [2]body
		for s := range 2 {
			pair[s] = body{kind[s][i], composition[s][i], mass[s][i]}
		}
		outcome[i], pair, gas[i] = collide(pair, in.Parameters)
		for s, left := range pair {
			kinds[s][i], masses[s][i], compositions[s][i] = left.kind, left.mass, left.composition
		}
	}
	return in.Answer(law.Codes("outcome", outcome),
		law.Codes("kind_1", kinds[0]), law.Numbers("mass_1", masses[0]), law.Codes("composition_1", compositions[0]),
		law.Codes("kind_2", kinds[1]), law.Numbers("mass_2", masses[1]), law.Codes("composition_2", compositions[1]),
		law.Numbers("gas", gas))
}

// collide tells what two bodies leave. The denser one is what grows; of two
// alike it is the first, whose clock fired.
func collide(pair [2]body, p []float64) (outcome uint8, left [2]body, gas float64) {
	low, high := 1, 0
	if classOf(pair[1].kind) > classOf(pair[0].kind) {
		low, high = 0, 1
	}
	a, b := pair[high], pair[low] // a is at least as dense as b
	sum := a.mass + b.mass
	left[low] = nothing
	switch classOf(a.kind) {
	case soft:
		outcome = merged
		a.mass = (1 - p[fLoss]) * sum
		if b.kind == law.Star {
			a.kind = law.Star // a star keeps its kind until it is sorted anew
		}
		a.composition = law.Hydrogen
		gas = p[fLoss] * sum
	case dwarf:
		outcome, a, gas = onDwarf(a, b, sum, p)
	case neutron:
		if classOf(b.kind) == soft {
			outcome, gas = tornApart, b.mass
			break
		}
		outcome, a = neutronStar(neutronMerged, sum, p)
	default:
		switch classOf(b.kind) {
		case soft:
			outcome = halfSwallowed
			a.mass += holeTakes * b.mass
			gas = b.mass - holeTakes*b.mass
		case hole:
			outcome, a.mass = holesMerged, (1-p[radiated])*sum
		default:
			outcome, a.mass = swallowedWhole, sum
		}
	}
	left[high] = a
	return outcome, left, gas
}

// onDwarf is what becomes of a white dwarf a that meets something no denser.
func onDwarf(a, b body, sum float64, p []float64) (outcome uint8, left body, gas float64) {
	switch {
	case classOf(b.kind) == soft:
		return tornApart, a, b.mass
	case sum > p[mCh] && p[supernova] == 0:
		return exploded, nothing, sum
	case sum > p[mCh]:
		outcome, left = neutronStar(collapsed, sum, p)
		return outcome, left, 0
	}
	if b.mass > a.mass {
		a.kind, a.composition = b.kind, b.composition
	}
	a.mass = dwarfsKeep * sum
	return dwarfsMerged, a, sum - a.mass
}

// neutronStar is what a mass too dense for a white dwarf becomes.
func neutronStar(outcome uint8, sum float64, p []float64) (uint8, body) {
	mass := neutronKeep * sum
	if mass <= p[nsMax] {
		return outcome, body{law.NeutronStar, law.Neutrons, mass}
	}
	if outcome == neutronMerged {
		outcome = tooHeavy
	}
	return outcome, body{law.BlackHole, law.Pure, mass}
}
