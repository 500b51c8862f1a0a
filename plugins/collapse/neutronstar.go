package collapse

import (
	"wane/sim/law"
	"wane/sim/physics/remnants"
)

// Where the parameters of neutron-star masses are among themselves.
const (
	neutronMasses = iota
	neutronMean
	neutronScatter
	neutronMax
)

// neutronFormula says how the laws here draw a neutron star's mass.
const neutronFormula = "Neutron star: Gaussian ns_mean +- ns_scatter, or 1.393 +- 0.064 (57 %) and 1.807 +- 0.177 (43 %), clipped to 1.1 .. ns_max"

// neutronParameters are those of neutron-star masses.
func neutronParameters() []law.Parameter {
	return []law.Parameter{
		neutronMasses: {Name: "ns_masses", Doc: "distribution of neutron-star masses", Words: []string{"single", "double"}, Citation: "assumption; double: Antoniadis et al. 2016"},
		neutronMean:   {Name: "ns_mean", Unit: "solMass", Doc: "mean of the single Gaussian", Low: 1.25, High: 1.5, Preset: remnants.NeutronStarMean, Citation: "assumption, after measured double neutron stars"},
		neutronScatter: {Name: "ns_scatter", Unit: "solMass", Doc: "scatter of the single Gaussian", Low: 0, High: 0.2, Preset: remnants.NeutronStarScatter,
			Citation: "assumption, after measured double neutron stars"},
		neutronMax: {Name: "ns_max", Unit: "solMass", Doc: "heaviest neutron star; felt by the double Gaussian, and by a wide single one", Low: 2.0, High: 2.4, Preset: remnants.HeaviestNeutronStar,
			Citation: "assumption: heaviest pulsars are near 2.1, models allow 2.0 .. 2.4"},
	}
}

// upParameter is the boundary towards white dwarfs, which laws of process
// remnant look up by its name.
func upParameter() law.Parameter {
	return law.Parameter{Name: "m_up", Unit: "solMass", Doc: "least mass at birth of a star that collapses", Low: 7, High: 9.5, Preset: remnants.Collapse, Citation: "assumption: models give 7 .. 9.5, electron-capture window 8 .. 10"}
}

// neutronMass is the quantile u of neutron-star masses; p are the parameters
// of that.
func neutronMass(u float64, p []float64) float64 {
	if p[neutronMasses] == 1 {
		return remnants.DoubleGaussian(u, p[neutronMax])
	}
	return remnants.SingleGaussian(u, p[neutronMean], p[neutronScatter], p[neutronMax])
}

// dieAt answers that stars explode below a mass at birth and fail from there
// on.
func dieAt(in law.Batch, limit float64) law.Batch {
	star, neutron, hole := in.Values("mass"), in.NewValues(), in.NewValues()
	for i := range neutron {
		neutron[i], hole[i] = 1, 0
		if star[i] >= limit {
			neutron[i], hole[i] = 0, 1
		}
	}
	return in.Answer(law.Numbers(law.ChanceColumn("neutron-star"), neutron), law.Numbers(law.ChanceColumn("black-hole"), hole))
}

// remain answers what is left: neutron stars by p, holes by the mass of the
// star.
func remain(in law.Batch, p []float64, holeOf func(star float64) float64) law.Batch {
	star, u, kind := in.Values("mass"), in.Values("u"), in.Words("kind")
	hole := in.Kind("black-hole")
	mass, composition := in.NewValues(), in.NewWords()
	for i := range mass {
		if kind[i] == hole {
			mass[i], composition[i] = holeOf(star[i]), law.Pure
		} else {
			mass[i], composition[i] = neutronMass(u[i], p), law.Neutrons
		}
	}
	return in.Answer(law.Numbers("mass", mass), law.Codes("composition", composition))
}

// questions are those that laws of this process answer.
func questions() []law.Question {
	return []law.Question{
		{Name: "die", Inputs: []string{"mass"}, Words: []string{"neutron-star", "black-hole"}},
		{Name: "remain", Inputs: []string{"kind", "mass", "u"}},
	}
}

// heavy is what they speak for.
func heavy() law.Accepts {
	return law.Accepts{Kinds: []string{"star"}, Column: "mass", Low: law.AtParameter("m_up")}
}
