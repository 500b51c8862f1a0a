// Package evaporation holds the laws of how black holes lose mass by radiating
// it away. The laws do not see the sky: each answers its own temperature, and
// the host holds the loss back until the sky is colder.
package evaporation

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/hole"
)

// atOnce is the wait of a hole that has no mass left, log10 yr.
const atOnce = -1000

// thresholds ends a hole of either kind when its mass is gone.
func thresholds() []law.Threshold {
	return []law.Threshold{
		{Kind: "black-hole", Mass: 0, Becomes: law.Gone, Outcome: "evaporated"},
		{Kind: "central-hole", Mass: 0, Becomes: law.Gone, Outcome: "evaporated"},
	}
}

// accepts is what every law of this process speaks for.
func accepts() law.Accepts { return law.Accepts{Kinds: []string{"black-hole", "central-hole"}} }

// questions are those every law of this process answers, from the mass alone.
func questions() []law.Question {
	return []law.Question{
		{Name: "wear", Inputs: []string{"mass"}},
		{Name: "foretell", Inputs: []string{"mass"}},
		{Name: "heat", Inputs: []string{"mass"}},
	}
}

// radiator is how holes lose mass under one law of this process.
type radiator interface {
	// log10Rate is log10 of the loss, solMass per yr, of a hole of mass m that
	// began with birth.
	log10Rate(m, birth float64) float64
	// log10Wait is log10 of the years until it comes to its threshold.
	log10Wait(m, birth float64) float64
}

// evaporating is a law of this process.
type evaporating struct {
	card law.Card
	// radiator prepares how holes radiate with parameters in the order of the card.
	radiator func(parameters []float64) radiator
}

// newEvaporating completes a card with what all laws of holes that radiate
// share, where it does not say otherwise itself.
func newEvaporating(card law.Card, radiator func(parameters []float64) radiator) law.Law {
	card.Process, card.Wears, card.Accepts = "evaporation", "loss", accepts()
	if card.Questions == nil {
		card.Questions = questions()
	}
	if card.Thresholds == nil {
		card.Thresholds = thresholds()
	}
	card.Notes = append([]string{"a hole loses nothing while the sky is hotter than it, and radiates as if alone afterwards (assumption)"}, card.Notes...)
	return evaporating{card, radiator}
}

func (e evaporating) Describe() law.Card { return e.card }

func (e evaporating) Answer(question string, in law.Batch) (law.Batch, error) {
	m, out := in.Values("mass"), in.NewValues()
	birth := in.Values("birth_mass") // nil where the law does not read it
	if birth == nil {
		birth = m
	}
	switch question {
	case "wear":
		r, heat := e.radiator(in.Parameters), in.NewValues()
		for i := range m {
			out[i], heat[i] = r.log10Rate(m[i], birth[i]), 0
		}
		return in.Answer(law.Numbers("log10_rate", out), law.Numbers("heat", heat)), nil
	case "foretell":
		r := e.radiator(in.Parameters)
		for i := range m {
			out[i] = math.Max(atOnce, r.log10Wait(m[i], birth[i]))
		}
		return in.Answer(law.Numbers("wait", out)), nil
	}
	for i := range m {
		out[i] = hole.Log10Temperature(m[i])
	}
	return in.Answer(law.Numbers("log10_temperature", out)), nil
}

// greyBody radiates an emission, hastened by a factor, down to a mass.
type greyBody struct {
	emission *hole.Emission
	hastened float64 // log10
	end      float64 // solMass
}

// emits is a hole that radiates these species until it is gone.
func emits(lists ...[]hole.Species) greyBody { return greyBody{emission: hole.NewEmission(lists...)} }

func (g greyBody) log10Rate(m, _ float64) float64 {
	if m <= g.end {
		return math.Inf(-1)
	}
	return hole.Log10LossRate(m, g.emission.Alpha(m)) + g.hastened
}

func (g greyBody) log10Wait(m, _ float64) float64 {
	return g.emission.Log10Wait(m, g.end) - g.hastened
}

// Sources and words that several cards share.
const (
	page1976      = "Page, D. N. 1976, Phys. Rev. D 13, 198"
	macGibbon1991 = "MacGibbon, J. H. 1991, Phys. Rev. D 44, 376 (switching on of massive particles; from memory)"
	sumOfSpecies  = "dM/dt = -alpha hbar c^4/(G^2 M^2), alpha = sum over species of alpha_s exp(-8 pi G M m_s b_s/(hbar c)); M in solMass, t in yr. "
	isolated      = "uncharged holes without spin, from 1e-19 solMass (below it heavier particles join, for the last hour) to 1e22 solMass (the horizon of the sky); "
)

// lightestNeutrino is the parameter of laws in which every neutrino has mass.
func lightestNeutrino() law.Parameter {
	return law.Parameter{
		Name: "lightest_neutrino", Unit: "eV", Log10: true,
		Doc: "mass of the lightest neutrino; the other two follow from the measured splittings",
		Low: -6, High: -0.3468, Preset: -3,
		Citation: "preset: assumption; upper end, 0.45 eV: KATRIN Collaboration 2025, Science 388, 180 (from memory)",
	}
}

// massiveNeutrinos are the species of holes of a law with that parameter.
func massiveNeutrinos(log10Lightest float64) [][]hole.Species {
	return [][]hole.Species{hole.Light(), hole.Neutrinos(num.Exp10(log10Lightest)), hole.Massive()}
}
