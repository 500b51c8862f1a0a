package vacuumdecay_test

import (
	"testing"

	"wane/plugins/vacuumdecay"
	"wane/sim/law/lawtest"
)

func TestKitNone(t *testing.T) { lawtest.Run(t, vacuumdecay.None()) }
