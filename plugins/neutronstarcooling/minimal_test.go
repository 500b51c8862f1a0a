package neutronstarcooling

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestMinimal(t *testing.T) { lawtest.Run(t, Minimal()) }
