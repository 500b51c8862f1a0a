package massfunction

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestKroupa(t *testing.T) { lawtest.Run(t, Kroupa()) }
