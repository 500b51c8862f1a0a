package remnant

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestCummingsSecond(t *testing.T) { lawtest.Run(t, CummingsSecond(), lawtest.Among(boundary{})) }
func TestKalirai(t *testing.T)        { lawtest.Run(t, Kalirai(), lawtest.Among(boundary{})) }
func TestSalaris(t *testing.T)        { lawtest.Run(t, Salaris(), lawtest.Among(boundary{})) }
