package scenario

import (
	"math"

	"wane/sim/scenario/quantity"
)

// MaxHeld is how many objects can be held one by one, about 11 GB of them.
const MaxHeld = 100_000_000

// Ranges of the galaxy's values. They are wide: from a handful of objects in
// a fraction of a parsec to more than any galaxy known.
const (
	maxObjects     = 1e15
	manyHeld       = 10_000_000
	minRadius      = 1e-3 // pc
	maxRadius      = 1e7  // pc
	maxCentralMass = 1e15 // solMass
)

func galaxyKeys() []string { return []string{"objects", "sample", "radius", "central-mass"} }

// galaxyValue sets one value of the galaxy. An unknown key has been reported.
func (b *builder) galaxyValue(name string, n *node) {
	key, ok := "galaxy."+name, false
	switch name {
	case "objects":
		var v float64
		if v, ok = b.quantity(key, n, "", false, 1, maxObjects); ok {
			b.s.Objects = v
		}
	case "sample":
		var v uint64
		if v, ok = b.whole(key, n, 1, MaxHeld); ok {
			b.s.Sample = int64(v)
		}
	case "radius":
		var v float64
		if v, ok = b.quantity(key, n, "pc", false, minRadius, maxRadius); ok {
			b.s.Radius = v
		}
	case "central-mass":
		var v float64
		if v, ok = b.quantity(key, n, "solMass", false, 0, maxCentralMass); ok {
			b.s.CentralMass = v
		}
	default:
		return
	}
	b.given(key, n.at) // also a faulty one: it is not missing
	if ok {
		b.s.from[key] = n.at.file
	}
}

// galaxyWhole checks the galaxy's values together.
func (b *builder) galaxyWhole(top place) {
	for _, name := range []string{"objects", "radius"} {
		if _, given := b.at["galaxy."+name]; !given && !b.broken {
			example := map[string]string{"objects": "objects = 2e11", "radius": `radius = "10 kpc"`}[name]
			b.fault(top, "galaxy.%s is not given: want %s in [galaxy], or a base that has it", name, example)
		}
	}
	s := b.s
	if s.Objects == 0 {
		return
	}
	at, given := b.at["galaxy.sample"]
	switch {
	case given && float64(s.Sample) > s.Objects:
		if b.when["galaxy.objects"] > b.when["galaxy.sample"] {
			at = b.at["galaxy.objects"]
		}
		b.fault(at, "galaxy.sample: %d objects: want at most the %s that the galaxy has (galaxy.objects)", s.Sample, quantity.Format(s.Objects, ""))
	case float64(s.Sample) == s.Objects:
		s.Sample = 0
		delete(s.from, "galaxy.sample")
	}
	if s.Sample == 0 {
		at = b.at["galaxy.objects"]
		switch {
		case s.Objects > MaxHeld:
			b.fault(at, "galaxy.objects: %s objects cannot be held one by one (at most 1e8): want a sample, such as sample = 100_000", quantity.Format(s.Objects, ""))
			return
		case s.Objects != math.Trunc(s.Objects):
			b.fault(at, "galaxy.objects: %v: want a whole number of objects, or a sample", s.Objects)
			return
		}
	}
	if s.Held() > manyHeld {
		b.warn(at, "%d objects held one by one take about %.2g GB", s.Held(), float64(s.Held())*110e-9)
	}
}
