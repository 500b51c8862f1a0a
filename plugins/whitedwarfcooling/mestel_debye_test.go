package whitedwarfcooling

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestMestelDebye(t *testing.T) { lawtest.Run(t, MestelDebye()) }
