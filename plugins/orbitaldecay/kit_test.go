package orbitaldecay_test

import (
	"testing"

	"wane/plugins/orbitaldecay"
	"wane/sim/law/lawtest"
)

func TestKitPeters(t *testing.T) { lawtest.Run(t, orbitaldecay.Peters()) }

func TestKitDysonEstimate(t *testing.T) { lawtest.Run(t, orbitaldecay.DysonEstimate()) }
