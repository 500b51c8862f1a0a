package substellarlimit

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestByMetals(t *testing.T) { lawtest.Run(t, ByMetals()) }
