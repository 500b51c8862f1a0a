package curvature_test

import (
	"testing"

	"wane/plugins/curvature"
	"wane/sim/law/lawtest"
)

func TestKitNone(t *testing.T) { lawtest.Run(t, curvature.None()) }
