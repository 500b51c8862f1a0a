package inquiry

import (
	"fmt"
	"math"

	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/constant"
	"wane/sim/physics/structure"
	"wane/sim/scenario/quantity"
)

// radius of an object, km; 0 where the kind has none.
func radius(kind string, mass float64) float64 {
	switch kind {
	case "star":
		return structure.MainSequenceRadius(mass)
	case "brown-dwarf":
		return structure.BrownDwarfRadius(mass)
	case "white-dwarf":
		return structure.WhiteDwarfRadius(mass)
	case "neutron-star":
		return structure.NeutronStarRadius(mass)
	case "black-hole", "central-hole":
		return structure.HoleRadius(mass)
	case "relic":
		return structure.WhiteDwarfRadiusOf(mass, ironPerElectron)
	}
	return 0
}

// ironPerElectron is the nucleons per electron of iron, 56/26.
const ironPerElectron = 56. / 26

// luminosity of a sphere of r km at a temperature of log10 K, log10 of solar
// luminosities: 4 pi R^2 sigma T^4 (Stefan and Boltzmann).
func luminosity(r, log10T float64) float64 {
	metres := r * 1000
	return num.Log10(4*math.Pi*metres*metres*constant.StefanBoltzmann/constant.SunL) + 4*log10T
}

// shining adds the luminosity to an answer of question shine.
func (a *asking) shining(out *Answer, q law.Question, answer law.Batch) {
	if q.Name != "shine" {
		return
	}
	kind, _, err := a.kind("kind")
	if code, given := a.codes["kind"]; given {
		kind, err = code, nil
	}
	if err != nil {
		return
	}
	mass := math.NaN()
	if g, given := a.numbers["mass"]; given {
		mass = g.value
		if !a.used["mass"] {
			a.used["mass"] = true
			out.Inputs = append(out.Inputs, Value{Name: "mass", Number: mass, Unit: "solMass", Why: "not read by this law"})
		}
	}
	r := radius(a.kinds[kind], mass)
	if !(r > 0) {
		return
	}
	l := luminosity(r, answer.Columns[0].Values[0])
	out.Outputs = append(out.Outputs, a.value(column{name: "luminosity", unit: "solLum", log10: true}, law.Column{Values: []float64{l}}))
	out.Notes = append(out.Notes, "luminosity: of a sphere of "+quantity.Format(r, "km")+" at this temperature")
}

// remarks adds what the roles leave unsaid.
func (a *asking) remarks(out *Answer) {
	p, _ := law.ProcessNamed(a.use.Card.Process)
	a.tooHeavy(out)
	for _, q := range out.Questions {
		switch {
		case q == "shine":
			out.Notes = append(out.Notes, "without any floor: the sky, dark matter or decaying nucleons may keep it warmer")
		case q == "foretell" && p.Role == law.Wearing:
			out.Notes = append(out.Notes, "counted from when it begins to wear, if nothing else gets there first")
		case q == "heat":
			out.Notes = append(out.Notes, "it wears only while the sky is colder than this temperature")
		}
	}
}

// tooHeavy says so when the question is about a white dwarf that cannot be: a
// law answers by its formula all the same.
func (a *asking) tooHeavy(out *Answer) {
	kind, mass, muE := "", 0.0, 2.0
	for _, v := range out.Inputs {
		switch {
		case v.Name == "kind":
			kind = v.Word
		case v.Name == "mass":
			mass = v.Number
		case v.Name == "composition" && v.Word == law.CompositionWords[law.Iron]:
			muE = ironPerElectron
		}
	}
	if code, given := a.codes["kind"]; given {
		kind = a.kinds[code]
	} else if kind == "" {
		if code, _, err := a.kind("kind"); err == nil {
			kind = a.kinds[code]
		}
	}
	if limit := structure.LimitingMass(muE); kind == "white-dwarf" && mass > limit {
		out.Notes = append(out.Notes, fmt.Sprintf("no such white dwarf: above %.2f Msun electrons cannot hold it up (Chandrasekhar 1935)", limit))
	}
}
