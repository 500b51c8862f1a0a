package browndwarfcooling

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestBurrowsLiebert(t *testing.T) { lawtest.Run(t, BurrowsLiebert()) }
