package starformation

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestGasLimited(t *testing.T) { lawtest.Run(t, GasLimited()) }
func TestEndsAt(t *testing.T)     { lawtest.Run(t, EndsAt()) }
func TestBurst(t *testing.T)      { lawtest.Run(t, Burst()) }
