package whitedwarfcooling

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestMestelForever(t *testing.T) { lawtest.Run(t, MestelForever()) }

func TestBarrowTipler(t *testing.T) { lawtest.Run(t, BarrowTipler()) }
