package nucleondecay_test

import (
	"testing"

	"wane/plugins/nucleondecay"
	"wane/sim/law/lawtest"
)

func TestKitGrandUnified(t *testing.T) { lawtest.Run(t, nucleondecay.GrandUnified()) }

func TestKitStable(t *testing.T) { lawtest.Run(t, nucleondecay.Stable()) }

func TestKitHigherDimension(t *testing.T) { lawtest.Run(t, nucleondecay.HigherDimension()) }

func TestKitVirtualHoles(t *testing.T) { lawtest.Run(t, nucleondecay.VirtualHoles()) }

func TestKitSphaleron(t *testing.T) { lawtest.Run(t, nucleondecay.Sphaleron()) }
