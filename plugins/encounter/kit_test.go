package encounter_test

import (
	"testing"

	"wane/plugins/encounter"
	"wane/sim/law/lawtest"
)

func TestKitCollisions(t *testing.T) { lawtest.Run(t, encounter.Collisions()) }
func TestKitNone(t *testing.T)       { lawtest.Run(t, encounter.None()) }
