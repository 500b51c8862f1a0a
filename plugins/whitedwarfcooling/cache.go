package whitedwarfcooling

import (
	"sync"

	"wane/sim/law"
	"wane/sim/physics/cooling"
)

// tables are the cooling tables of one set of parameters, by composition.
type tables struct{ helium, carbonOxygen, oxygenNeon *cooling.DwarfTable }

func newTables(env cooling.Envelope) *tables {
	return &tables{
		helium:       cooling.NewDwarfTable(cooling.HeliumIons(), env),
		carbonOxygen: cooling.NewDwarfTable(cooling.CarbonOxygenIons(), env),
		oxygenNeon:   cooling.NewDwarfTable(cooling.OxygenNeonIons(), env),
	}
}

func (t *tables) of(composition uint8) *cooling.DwarfTable {
	switch composition {
	case law.Hydrogen, law.Helium:
		return t.helium
	case law.CarbonOxygen:
		return t.carbonOxygen
	}
	return t.oxygenNeon
}

// mostTables is how many sets of tables are kept; a sweep over parameters
// drops the old ones. A full set takes 12 MB.
const mostTables = 16

// cache keeps tables by parameters. The zero value is ready; it is safe for
// concurrent use.
type cache struct {
	mutex sync.Mutex
	sets  map[cooling.Envelope]*tables
}

// find returns the tables of an envelope, new ones if there are none yet.
func (c *cache) find(env cooling.Envelope) *tables {
	c.mutex.Lock()
	defer c.mutex.Unlock()
	if t := c.sets[env]; t != nil {
		return t
	}
	if c.sets == nil || len(c.sets) >= mostTables {
		c.sets = map[cooling.Envelope]*tables{}
	}
	t := newTables(env)
	c.sets[env] = t
	return t
}
