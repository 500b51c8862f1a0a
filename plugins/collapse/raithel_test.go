package collapse

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestRaithel(t *testing.T) { lawtest.Run(t, Raithel()) }
