// Package plugins lists the laws Wane is built with.
package plugins

import (
	"wane/plugins/browndwarfcooling"
	"wane/plugins/collapse"
	"wane/plugins/curvature"
	"wane/plugins/darkenergydecay"
	"wane/plugins/ejection"
	"wane/plugins/encounter"
	"wane/plugins/evaporation"
	"wane/plugins/expansion"
	"wane/plugins/infall"
	"wane/plugins/iron"
	"wane/plugins/lifetime"
	"wane/plugins/massfunction"
	"wane/plugins/metals"
	"wane/plugins/neutronstarcooling"
	"wane/plugins/nucleondecay"
	"wane/plugins/orbitaldecay"
	"wane/plugins/remnant"
	"wane/plugins/starformation"
	"wane/plugins/substellarlimit"
	"wane/plugins/supernova"
	"wane/plugins/tunnelling"
	"wane/plugins/vacuumdecay"
	"wane/plugins/warmth"
	"wane/plugins/whitedwarfcooling"
	"wane/sim/law"
)

// Builtin returns a registry of every built-in law, in the order of
// [law.Processes], the default of each process first.
func Builtin() (*law.Registry, error) {
	return law.NewRegistry(
		expansion.LambdaCDM(), expansion.WCDM(), expansion.Phantom(), expansion.DecayingDarkEnergy(), expansion.MatterOnly(), expansion.Open(),
		vacuumdecay.None(), vacuumdecay.FourVolume(), vacuumdecay.Literal(), vacuumdecay.Other(),
		darkenergydecay.None(), darkenergydecay.Drawn(), darkenergydecay.Fixed(), darkenergydecay.Recollapse(),
		massfunction.Kroupa(), massfunction.Salpeter(), massfunction.Chabrier(), massfunction.ChabrierSystem(),
		starformation.Exponential(), starformation.GasLimited(), starformation.EndsAt(), starformation.Burst(),
		metals.Solar(), metals.Growing(),
		substellarlimit.Fixed(), substellarlimit.ByMetals(),
		lifetime.Table(), lifetime.TableWithMetals(), lifetime.PowerLaw(), lifetime.Fuel(),
		remnant.Cummings(), remnant.CummingsSecond(), remnant.Kalirai(), remnant.Salaris(),
		collapse.Raithel(), collapse.Step(), collapse.AllFailAbove(), collapse.Direct(),
		whitedwarfcooling.MestelDebye(), whitedwarfcooling.MestelForever(), whitedwarfcooling.BarrowTipler(),
		neutronstarcooling.Minimal(), neutronstarcooling.None(),
		browndwarfcooling.BurrowsLiebert(), browndwarfcooling.None(),
		warmth.DarkMatter(), warmth.None(),
		ejection.Contracting(), ejection.FixedRadius(), ejection.FixedHalo(), ejection.Balanced(), ejection.None(),
		infall.Branching(), infall.LossCone(), infall.None(),
		encounter.Collisions(), encounter.None(),
		orbitaldecay.Peters(), orbitaldecay.DysonEstimate(),
		nucleondecay.GrandUnified(), nucleondecay.HigherDimension(), nucleondecay.VirtualHoles(),
		nucleondecay.Sphaleron(), nucleondecay.Stable(),
		evaporation.Page(), evaporation.BlackBody(), evaporation.ThreeNeutrinos(), evaporation.LightestNeutrinoMassless(),
		evaporation.PageKerr(), evaporation.Remnant(), evaporation.MemoryBurden(), evaporation.ExtraLightSpecies(), evaporation.None(),
		curvature.None(), curvature.Falcke(), curvature.FalckeFixedDensity(),
		supernova.Anchored(), supernova.ZeroTemperatureLattice(), supernova.None(),
		iron.Dyson(), iron.None(),
		tunnelling.WholeStar(), tunnelling.PlanckSpeck(), tunnelling.None(),
	)
}

// Defaults returns the default law of each process, by process. A process that
// is not in it has no built-in law yet, and a run does without.
func Defaults() map[string]string {
	return map[string]string{
		"expansion":            "lambda-cdm",
		"vacuum-decay":         "none",
		"dark-energy-decay":    "none",
		"mass-function":        "kroupa",
		"star-formation":       "exponential",
		"metals":               "solar",
		"substellar-limit":     "fixed",
		"lifetime":             "table",
		"remnant":              "cummings",
		"collapse":             "raithel",
		"white-dwarf-cooling":  "mestel-debye",
		"neutron-star-cooling": "minimal",
		"brown-dwarf-cooling":  "burrows-liebert",
		"warmth":               "dark-matter",
		"ejection":             "contracting",
		"infall":               "branching",
		"encounter":            "collisions",
		"orbital-decay":        "peters",
		"nucleon-decay":        "grand-unified",
		"evaporation":          "page",
		"curvature":            "none",
		"supernova":            "anchored",
		"iron":                 "dyson",
		"tunnelling":           "whole-star",
	}
}
