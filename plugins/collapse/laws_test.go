package collapse

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestStep(t *testing.T)         { lawtest.Run(t, Step()) }
func TestAllFailAbove(t *testing.T) { lawtest.Run(t, AllFailAbove()) }
func TestDirect(t *testing.T)       { lawtest.Run(t, Direct()) }
