package lifetime

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestTableWithMetals(t *testing.T) { lawtest.Run(t, TableWithMetals()) }
func TestPowerLaw(t *testing.T)        { lawtest.Run(t, PowerLaw()) }
func TestFuel(t *testing.T)            { lawtest.Run(t, Fuel()) }
