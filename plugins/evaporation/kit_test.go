package evaporation_test

import (
	"testing"

	"wane/plugins/evaporation"
	"wane/sim/law/lawtest"
)

func TestKitPage(t *testing.T) { lawtest.Run(t, evaporation.Page()) }

func TestKitBlackBody(t *testing.T) { lawtest.Run(t, evaporation.BlackBody()) }

func TestKitThreeNeutrinos(t *testing.T) { lawtest.Run(t, evaporation.ThreeNeutrinos()) }

func TestKitLightestNeutrinoMassless(t *testing.T) {
	lawtest.Run(t, evaporation.LightestNeutrinoMassless())
}

func TestKitPageKerr(t *testing.T) { lawtest.Run(t, evaporation.PageKerr()) }

func TestKitRemnant(t *testing.T) { lawtest.Run(t, evaporation.Remnant()) }

func TestKitMemoryBurden(t *testing.T) { lawtest.Run(t, evaporation.MemoryBurden()) }

func TestKitExtraLightSpecies(t *testing.T) { lawtest.Run(t, evaporation.ExtraLightSpecies()) }

func TestKitNone(t *testing.T) { lawtest.Run(t, evaporation.None()) }
