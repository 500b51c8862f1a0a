package infall_test

import (
	"testing"

	"wane/plugins/infall"
	"wane/sim/law/lawtest"
)

func TestKitBranching(t *testing.T) { lawtest.Run(t, infall.Branching()) }

func TestKitLossCone(t *testing.T) { lawtest.Run(t, infall.LossCone()) }

func TestKitNone(t *testing.T) { lawtest.Run(t, infall.None()) }
