package neutronstarcooling

import (
	"sync"

	"wane/sim/law"
	"wane/sim/physics/cooling"
)

// Minimal returns the law neutron-star-cooling/minimal: neutrinos, then
// photons, and no other heat.
func Minimal() law.Law { return &minimal{} }

// minimal keeps its curve, which no parameter changes.
type minimal struct {
	once  sync.Once
	curve *cooling.NeutronStars
}

func (*minimal) Describe() law.Card {
	return law.Card{
		Process: "neutron-star-cooling", Name: "minimal", Version: "1",
		Summary: "neutron stars cool by neutrinos for 1e5 yr, then by photons",
		Formula: "C dT_b = -(L_nu + L) dt, C = 1e32 J/K (T_b/1e9 K), L_nu = 1e33 W (T_b/1e9 K)^8, L = 4 pi R^2 sigma T^4, " +
			"T_b = 1.288e8 K (T/1e6 K)^1.82 g14^-0.455 but at least T; R = 11.5 km, g14 = 1.755; all ages times 10^shift",
		Domain: "any age; no floor of any kind. +-0.5 dex in age: superfluidity, envelope, mass. 1e6 K at 10^5.1 yr, 1e5 K at 10^6.4, 1000 K at 10^7.4",
		Sources: []string{
			"Gudmundsson, Pethick & Epstein 1983, ApJ 272, 286 (envelope)",
			"Shapiro & Teukolsky 1983, Black Holes, White Dwarfs, and Neutron Stars, ch. 11 (heat and neutrinos; constants from memory)",
		},
		Notes: []string{
			"The same for all masses: 1.4 solMass (assumption).",
			"Rotational, chemical or magnetic heat is left out: it may hold old pulsars near 1e5 K for 1e9 - 1e10 yr.",
			"Younger stars are held at 1e7 K.",
		},
		Accepts:   law.Accepts{Kinds: []string{"neutron-star"}},
		Questions: []law.Question{{Name: "shine", Inputs: []string{"log10_age"}}},
		Parameters: []law.Parameter{{Name: "shift", Doc: "log10 of a factor on every age", Low: -0.5, High: 0.5, Preset: 0,
			Citation: "assumption: the spread between cooling models"}},
	}
}

func (l *minimal) Answer(question string, in law.Batch) (law.Batch, error) {
	l.once.Do(func() { l.curve = cooling.NewNeutronStars() })
	shift := in.Parameters[0]
	age, temperature := in.Values("log10_age"), in.NewValues()
	for i := range temperature {
		temperature[i] = l.curve.Temperature(age[i] - shift)
	}
	return in.Answer(law.Numbers("log10_temperature", temperature)), nil
}
