package metals

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestSolar(t *testing.T) { lawtest.Run(t, Solar()) }
