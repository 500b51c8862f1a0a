package starformation

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestExponential(t *testing.T) { lawtest.Run(t, Exponential()) }
