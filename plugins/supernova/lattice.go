package supernova

import (
	"math"

	"wane/sim/law"
	"wane/sim/physics/coldmatter"
	"wane/sim/physics/structure"
)

type lattice struct{}

// ZeroTemperatureLattice is the time that the slowest pair of nuclei takes to
// fuse on a lattice without heat.
func ZeroTemperatureLattice() law.Law { return lattice{} }

// Places of the parameters on the card.
const (
	pair = iota
	density
	strength
	latticeOutcome
)

func pairs() []coldmatter.Nuclei {
	return []coldmatter.Nuclei{coldmatter.Silicon(), coldmatter.Oxygen(), coldmatter.Carbon()}
}

func (lattice) Describe() law.Card {
	return law.Card{
		Process: "supernova", Name: "zero-temperature-lattice", Version: "1",
		Summary: "cold dwarfs above 1.16 solMass collapse once a pair of nuclei has fused on the lattice",
		Formula: "t = n/(2 R), R = 1e46 x 3.90 rho A Z^4 S lambda^1.75 exp(-2.638/sqrt lambda) /cm3/s, " +
			"lambda = [rho/(1.3574e11 A)]^(1/3)/(A Z^2); rho = share x density at the centre of a cold dwarf of mass M, g/cm3; S in MeV barn",
		Domain: "white dwarfs from 1.16 solMass on; static lattice, no heat; decades of error from S, hundreds from the shell that counts",
		Sources: []string{
			"Salpeter, E. E. & Van Horn, H. M. 1969, Astrophys. J. 155, 183",
			"Gasques, L. R. et al. 2005, Phys. Rev. C 72, 025806 (rates of a static lattice; from memory)",
			"Chandrasekhar, S. 1935, Mon. Not. R. Astron. Soc. 95, 207 (density at the centre)",
		},
		Notes: []string{
			"the centre is where fusion is fastest: preset dates are a lower bound. At 1.35 solMass 10^285 yr, where the literature has 10^1100 (Caplan 2020): unresolved",
			"log10 S of silicon, oxygen, carbon: 40, 24, 16 (orders of magnitude, from memory)",
			"one pair stands for the whole chain to iron (assumption)",
			"no cold dwarf is heavier than 1.44 solMass here: denser than that the density is held",
			remains,
		},
		Accepts:   accepts(),
		Questions: []law.Question{{Name: "foretell", Inputs: []string{"mass"}}},
		Parameters: []law.Parameter{
			pair: {Name: "pair", Doc: "the pair of nuclei that holds up the chain to iron", Words: []string{"silicon", "oxygen", "carbon"},
				Citation: "assumption: the slowest of them"},
			density: {Name: "density_share", Doc: "density of the shell that must fuse, over that of the centre", Low: 1e-3, High: 1, Preset: 1,
				Citation: "assumption: 1 is a lower bound of the wait"},
			strength: {Name: "s_shift", Doc: "decades added to the astrophysical factor S", Low: -10, High: 10, Preset: 0,
				Citation: "assumption: extrapolation to zero energy"},
			latticeOutcome: outcomeParameter(),
		},
		Outcomes: outcomes(),
	}
}

func (lattice) Answer(_ string, in law.Batch) (law.Batch, error) {
	m, wait := in.Values("mass"), in.NewValues()
	nuclei := pairs()[int(in.Parameters[pair])]
	nuclei.Log10S += in.Parameters[strength]
	const heaviest = 1.44
	for i := range m {
		rho := in.Parameters[density] * structure.CentralDensity(math.Min(m[i], heaviest))
		wait[i] = nuclei.Log10LatticeTime(rho)
	}
	return answer(in, wait, in.Parameters[latticeOutcome]), nil
}
