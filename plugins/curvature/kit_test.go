package curvature_test

import (
	"testing"

	"wane/plugins/curvature"
	"wane/sim/law/lawtest"
)

func TestKitNone(t *testing.T) { lawtest.Run(t, curvature.None()) }

func TestKitFalcke(t *testing.T) { lawtest.Run(t, curvature.Falcke()) }

func TestKitFalckeFixedDensity(t *testing.T) { lawtest.Run(t, curvature.FalckeFixedDensity()) }
