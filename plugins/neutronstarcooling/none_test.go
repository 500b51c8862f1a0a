package neutronstarcooling

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestNone(t *testing.T) { lawtest.Run(t, None()) }
