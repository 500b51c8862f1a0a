package supernova_test

import (
	"testing"

	"wane/plugins/supernova"
	"wane/sim/law/lawtest"
)

func TestKitAnchored(t *testing.T) { lawtest.Run(t, supernova.Anchored()) }

func TestKitZeroTemperatureLattice(t *testing.T) {
	lawtest.Run(t, supernova.ZeroTemperatureLattice())
}

func TestKitNone(t *testing.T) { lawtest.Run(t, supernova.None()) }
