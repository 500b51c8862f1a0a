package encounter

import (
	"wane/sim/law"
	"wane/sim/physics/collision"
)

type collisions struct{}

// Collisions lets objects that touch, their paths bent by gravity, become one,
// or tear one another apart.
func Collisions() law.Law { return collisions{} }

// The clocks, one for each term of a pair's cross-section.
const (
	clockArea   = "area"
	clockTouch  = "touch"
	clockWeight = "weight"
	clockPull   = "pull"
)

// Parameters, in the order of the card.
const (
	fLoss = iota
	mCh
	radiated
	nsMax
	supernova
)

func (collisions) Describe() law.Card {
	clock := func(name, doc string) law.Clock { return law.Clock{Name: name, Doc: doc, Fate: law.FateMeet} }
	return law.Card{
		Process: "encounter", Name: "collisions", Version: "1",
		Summary: "bound objects collide at n sigma v and become one, or tear one another apart",
		Formula: "rate of a pair = n sigma v/number, sigma = pi d^2 [1 + 2 G (m1 + m2)/(d v^2)], d = r1 + r2, n = 3 number/(8 pi R^3), v the dispersion; " +
			"a sum of products of one-object terms: pi v (r1^2 + r2^2), 2 pi v r1 r2, 2 pi G/v (m1 r1 + m2 r2), 2 pi G/v (r1 m2 + r2 m1), one clock each; " +
			"pc, km/s, km, solMass, yr",
		Domain: "one density (the mean within the half-mass radius) and one speed for all pairs: a factor of 2 to 3; radii are those of single objects as they are, young brown dwarfs and giants larger",
		Sources: []string{
			"Binney, J. & Tremaine, S. 2008, Galactic Dynamics, section 7.5.8 (rate)",
			"Dyson, F. J. 1979, Rev. Mod. Phys. 51, 447 (rate)",
			"Adams, F. C. & Laughlin, G. 1997, Rev. Mod. Phys. 69, 337 (brown dwarfs that become a star)",
		},
		Notes: notes,
		Questions: []law.Question{
			{Name: "rate", Inputs: []string{"number", "mass_bound", "sum_sought_touch", "galaxy_radius", "galaxy_dispersion"}},
			{Name: "expose", Inputs: []string{"kind", "mass", "radius"}},
			{Name: "meet", Inputs: []string{"kind_1", "mass_1", "composition_1", "kind_2", "mass_2", "composition_2"}},
		},
		Parameters: []law.Parameter{
			{Name: "f_loss", Doc: "share of their mass that two stars or brown dwarfs lose as gas when they merge",
				Low: 0, High: 0.1, Preset: 0, Citation: "Adams & Laughlin 1997 take none; upper end: assumption"},
			{Name: "m_ch", Unit: "solMass", Doc: "mass above which two white dwarfs explode together",
				Low: 1.38, High: 1.44, Preset: 1.40, Citation: "Chandrasekhar 1935 (1.44); 1.38 with electron capture (from memory)"},
			{Name: "radiated", Doc: "share of their mass that two black holes radiate when they merge",
				Low: 0.03, High: 0.10, Preset: 0.05, Citation: "Abbott, B. P. et al. 2016, Phys. Rev. Lett. 116, 061102 (3 of 65 solMass); range: assumption"},
			{Name: "ns_max", Unit: "solMass", Doc: "mass above which a merged neutron star is a black hole",
				Low: 2.0, High: 2.4, Preset: 2.2, Citation: "as in the laws of collapse; assumption"},
			{Name: "supernova", Doc: "what two white dwarfs above m_ch leave", Words: []string{"gas", "neutron-star"}, Citation: "assumption"},
		},
		Clocks: []law.Clock{
			clock(clockArea, "one's own area: seeks by r^2 whatever there is (radii in solar radii)"),
			clock(clockTouch, "both radii: seeks by r what has radius"),
			clock(clockWeight, "what one draws in: seeks by m r whatever there is"),
			clock(clockPull, "what draws one in: seeks by r what has mass"),
		},
		Outcomes: outcomes,
	}
}

var notes = []string{
	"two stars or brown dwarfs become one object of the sum; the law of substellar-limit tells which of the two it is (Adams & Laughlin 1997 for brown dwarfs, assumption for the rest)",
	"a star or brown dwarf that meets a white dwarf or neutron star is torn apart, all of it to gas; a black hole swallows half of it (assumptions)",
	"two white dwarfs above m_ch explode, all to gas or, by the parameter supernova, to a neutron star; below, 0.99 of the sum is one white dwarf (assumptions); " +
		"helium dwarfs that merge shine again for 1e8-1e9 yr (from memory): left out",
	"a neutron star with a neutron star or white dwarf is a neutron star of 0.98 of the sum, above ns_max a black hole; the rest is radiated (assumption)",
	"a black hole swallows a white dwarf or neutron star whole; two holes are one, less what is radiated (assumptions)",
	"kinds that other laws add, such as relics, meet as white dwarfs do (assumption)",
	"a speed well below that at which white dwarfs let go of matter, 1e3 km/s and more, is taken for granted",
	"what comes out of a collision counts as new from then on: a white dwarf that tore a star apart, heated by it, cools from its start again (assumption)",
	"binaries are left out: nearly all are soft and dissolve within 1e17 yr",
	"the central hole takes no part: what falls in is the business of infall",
	"an object counts among those it may meet: with N bound the rate is too high by a share 1/N",
}

func (collisions) Answer(question string, in law.Batch) (law.Batch, error) {
	switch question {
	case "rate":
		return rate(in), nil
	case "expose":
		return expose(in), nil
	}
	return meet(in), nil
}

func rate(in law.Batch) law.Batch {
	number, mass, radii := in.Values("number"), in.Values("mass_bound"), in.Values("sum_sought_touch")
	radius, dispersion := in.Values("galaxy_radius"), in.Values("galaxy_dispersion")
	area, touch, weight, pull := in.NewValues(), in.NewValues(), in.NewValues(), in.NewValues()
	for i := range number {
		r := collision.RatesOf(collision.Galaxy{Number: number[i], Mass: mass[i], Radii: radii[i], Radius: radius[i], Dispersion: dispersion[i]})
		area[i], touch[i], weight[i], pull[i] = r.Area, r.Touch, r.Weight, r.Pull
	}
	return in.Answer(law.Numbers(law.RateColumn(clockArea), area), law.Numbers(law.RateColumn(clockTouch), touch),
		law.Numbers(law.RateColumn(clockWeight), weight), law.Numbers(law.RateColumn(clockPull), pull))
}

// expose answers the terms of each object, radii in solar radii.
func expose(in law.Batch) law.Batch {
	kind, mass, radius := in.Words("kind"), in.Values("mass"), in.Values("radius")
	area, r, weight := in.NewValues(), in.NewValues(), in.NewValues()
	one, m := in.NewValues(), in.NewValues()
	for i := range mass {
		area[i], r[i], weight[i], one[i], m[i] = 0, 0, 0, 0, 0
		if kind[i] == law.CentralHole || !(mass[i] > 0) {
			continue
		}
		x := collision.InSolarRadii(radius[i])
		area[i], r[i], weight[i], one[i], m[i] = x*x, x, mass[i]*x, 1, mass[i]
	}
	return in.Answer(
		law.Numbers(law.SeeksColumn(clockArea), area), law.Numbers(law.SeeksColumn(clockTouch), r),
		law.Numbers(law.SeeksColumn(clockWeight), weight), law.Numbers(law.SeeksColumn(clockPull), r),
		law.Numbers(law.SoughtColumn(clockArea), one), law.Numbers(law.SoughtColumn(clockTouch), r),
		law.Numbers(law.SoughtColumn(clockWeight), one), law.Numbers(law.SoughtColumn(clockPull), m))
}
