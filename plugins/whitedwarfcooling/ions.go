package whitedwarfcooling

import (
	"wane/sim/law"
	"wane/sim/physics/cooling"
)

// ionsOf is what stands for a composition.
func ionsOf(composition uint8) cooling.Ions {
	switch composition {
	case law.Hydrogen, law.Helium:
		return cooling.HeliumIons()
	case law.CarbonOxygen:
		return cooling.CarbonOxygenIons()
	}
	return cooling.OxygenNeonIons()
}
