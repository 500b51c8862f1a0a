package iron_test

import (
	"testing"

	"wane/plugins/iron"
	"wane/sim/law/lawtest"
)

func TestKitDyson(t *testing.T) { lawtest.Run(t, iron.Dyson()) }

func TestKitNone(t *testing.T) { lawtest.Run(t, iron.None()) }
