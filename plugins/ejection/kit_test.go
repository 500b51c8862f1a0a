package ejection_test

import (
	"testing"

	"wane/plugins/ejection"
	"wane/sim/law/lawtest"
)

func TestKitContracting(t *testing.T) { lawtest.Run(t, ejection.Contracting()) }

func TestKitBalanced(t *testing.T) { lawtest.Run(t, ejection.Balanced()) }

func TestKitFixedRadius(t *testing.T) { lawtest.Run(t, ejection.FixedRadius()) }

func TestKitFixedHalo(t *testing.T) { lawtest.Run(t, ejection.FixedHalo()) }

func TestKitNone(t *testing.T) { lawtest.Run(t, ejection.None()) }
