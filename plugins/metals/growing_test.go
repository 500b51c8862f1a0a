package metals

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestGrowing(t *testing.T) { lawtest.Run(t, Growing()) }
