package whitedwarfcooling

import (
	"wane/sim/law"
	"wane/sim/physics/cooling"
)

// MestelDebye returns the law white-dwarf-cooling/mestel-debye: Mestel's law
// while bright, then the heat of an ion crystal and its electrons.
func MestelDebye() law.Law { return &mestelDebye{} }

// mestelDebye keeps the tables it has worked out, by parameters. They only
// save time: an answer never depends on them.
type mestelDebye struct{ tables cache }

// Indices of the parameters.
const (
	mestelDebyeRatio = iota
	mestelDebyeExponent
	mestelDebyeFreezing
)

func (*mestelDebye) Describe() law.Card {
	env := cooling.DefaultEnvelope()
	return law.Card{
		Process: "white-dwarf-cooling", Name: "mestel-debye", Version: "1",
		Summary: "Mestel's law while bright, then a crystal of ions and a sea of electrons behind an opaque envelope",
		Formula: "down to 1e-4 solLum: t = 8.8e6 yr (12/A) (M/solMass)^5/7 (mu_e/2)^-2/7 (L/solLum)^-5/7; below, dt = -C dT_c/(4 pi R^2 sigma T^4) with " +
			"C = 3k Debye(theta/T_c) an ion + electrons Z pi^2 k^2 T_c sqrt(1+x^2)/(m_e c^2 x^2) + 0.77 k T_melt an ion of freezing; " +
			"T_c/T = r (T/5000 K)^1/7 above 5000 K, 1 + (r - 1)(T/5000 K)^q below, r = r0 [(R/8841 km)^2 (0.6 solMass/M)]^2/7",
		Domain: "any age; no floor of any kind. 0.1 - 0.3 dex in age down to 800 K, then the late atmosphere decides: the date of 5 K at 0.6 solMass is 10^13.7 yr at q = 1/7, " +
			"10^10.7 at q = 2. Tabulated by mass (0.001 .. 1.44 solMass, held outside) and age; interpolation within 0.004 dex in age from 0.05 to 1.40",
		Sources: []string{
			"Mestel 1952, MNRAS 112, 583",
			"Iben & Tutukov 1984, ApJ 282, 615 (coefficient of Mestel's law)",
			"Shapiro & Teukolsky 1983, Black Holes, White Dwarfs, and Neutron Stars, chs. 3 and 4 (heat, envelope)",
			"Chandrasekhar 1935, MNRAS 95, 207 (radii)",
		},
		Notes: []string{
			"One density, 2.2 times the mean, and one kind of ion for the whole dwarf: He (2, 4), C/O (7, 14), O/Ne (9, 18). Assumptions.",
			"theta = 0.45 of the ion plasma temperature; freezing spread over a factor 1.1 either side of the melting temperature: assumptions.",
			"q = 1/7 carries the early envelope on without change and adds no free parameter: an assumption, for the late atmosphere is unsolved.",
			"In massive dwarfs freezing falls into the bright phase and its heat is left out, as are separation of elements (1 - 8 Gyr for some) and hydrogen burning.",
			"Dwarfs younger than Mestel's law at 1e5 K are held there. Hydrogen counts as helium; iron and others as oxygen-neon.",
		},
		Accepts:   law.Accepts{Kinds: []string{"white-dwarf"}},
		Questions: []law.Question{{Name: "shine", Inputs: []string{"mass", "composition", "log10_age"}}},
		Parameters: []law.Parameter{
			mestelDebyeRatio: {Name: "r0", Doc: "interior over effective temperature at 5000 K, 0.6 solMass", Low: 600, High: 1010, Preset: env.Ratio,
				Citation: "Shapiro & Teukolsky 1983, eq. 4.1.11; evolutionary sequences 600 - 700 (from memory)"},
			mestelDebyeExponent: {Name: "q", Doc: "how that ratio falls below 5000 K: as T^q", Low: 1.0 / 7, High: 2, Preset: env.Exponent,
				Citation: "assumption: 1/7 continues the envelope law; convection and a condensed surface push it up"},
			mestelDebyeFreezing: {Name: "gamma", Doc: "Coulomb over thermal energy at which ions freeze", Low: 175, High: 230, Preset: env.Freezing,
				Citation: "175: one-component plasma; up to 230 in carbon-oxygen mixtures (from memory)"},
		},
	}
}

func (l *mestelDebye) Answer(question string, in law.Batch) (law.Batch, error) {
	env := cooling.DefaultEnvelope()
	env.Ratio, env.Exponent, env.Freezing = in.Parameters[mestelDebyeRatio], in.Parameters[mestelDebyeExponent], in.Parameters[mestelDebyeFreezing]
	set := l.tables.find(env)
	mass, composition, age := in.Values("mass"), in.Words("composition"), in.Values("log10_age")
	temperature := in.NewValues()
	for i := range temperature {
		temperature[i] = set.of(composition[i]).Temperature(mass[i], age[i])
	}
	return in.Answer(law.Numbers("log10_temperature", temperature)), nil
}
