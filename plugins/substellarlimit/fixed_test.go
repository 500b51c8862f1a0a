package substellarlimit

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestFixed(t *testing.T) { lawtest.Run(t, Fixed()) }
