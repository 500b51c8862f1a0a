package tunnelling_test

import (
	"testing"

	"wane/plugins/tunnelling"
	"wane/sim/law/lawtest"
)

func TestKitWholeStar(t *testing.T) { lawtest.Run(t, tunnelling.WholeStar()) }

func TestKitPlanckSpeck(t *testing.T) { lawtest.Run(t, tunnelling.PlanckSpeck()) }

func TestKitNone(t *testing.T) { lawtest.Run(t, tunnelling.None()) }
