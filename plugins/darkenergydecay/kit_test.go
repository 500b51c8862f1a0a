package darkenergydecay_test

import (
	"testing"

	"wane/plugins/darkenergydecay"
	"wane/sim/law/lawtest"
)

func TestKitNone(t *testing.T) { lawtest.Run(t, darkenergydecay.None()) }
