// Command planckremnant is a law in its own process: black holes that cannot
// evaporate below a least mass, because nothing can be smaller than a least
// length.
//
// If position and momentum obey dx dp ≥ hbar + (L dp)²/hbar, with L near the
// Planck length, the photons that a hole of mass M can emit have
//
//	T = M c²/(4 pi k mu²) [1 - sqrt(1 - mu²)],  mu = M_r/M
//
// which is Hawking's hbar c³/(8 pi G M k) for heavy holes and twice that at
// M = M_r, where it stops: T is no number below. M_r is L/(Planck length)
// Planck masses. The loss is Stefan and Boltzmann's from the horizon,
//
//	-dM/dt = alpha hbar c⁴/(G² M²) s⁻⁴,  s = [1 + sqrt(1 - mu²)]/2,  T = T_Hawking/s
//
// Source: Adler, R. J., Chen, P. & Santiago, D. I. 2001, Gen. Relativ. Gravit.
// 33, 2101, who have alpha = 1/(15360 pi) and L the Planck length.
package main

import (
	"math"

	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/rpc"
)

func main() { rpc.Serve(planckRemnant{}) }

// For masses in solar masses, times in years, from CODATA 2018 and the nominal
// GM of the Sun; G gives them errors of 2.2e-5.
const (
	planckMass     = 1.0945602e-38 // solMass, sqrt(hbar c/G)
	evaporation    = 1.3027655e63  // yr, G² M³/(hbar c⁴) of one solar mass
	sunTemperature = 6.1702604e-8  // K, hbar c³/(8 pi G M k) of one solar mass
	blackBody      = 1 / (15360 * math.Pi)
)

// remnantWord is the kind that holes become.
const remnantWord = "planck-remnant"

type planckRemnant struct{}

func (planckRemnant) Describe() law.Card {
	ends := func(kind string) law.Threshold {
		return law.Threshold{Kind: kind, Parameter: "remnant", Becomes: remnantWord, Outcome: "burned-out"}
	}
	return law.Card{
		Process: "evaporation", Name: remnantWord, Version: "1",
		Summary: "a hole radiates until it has the least mass that a least length allows, and stays",
		Formula: "T = T_Hawking/s, dM/dt = -alpha hbar c^4/(G^2 M^2 s^4), s = [1 + sqrt(1 - (M_r/M)^2)]/2; nothing at M <= M_r = remnant. " +
			"Heavy holes: t = G^2 M^3/(3 alpha hbar c^4); M in solMass, t in yr, T in K",
		Domain: "uncharged holes without spin. Near the least mass a heuristic argument (error unknown); above 1e6 of it within 3e-12 of Hawking's black body, " +
			"whose life is 1.8 times too long for photons and gravitons",
		Sources: []string{
			"Adler, R. J., Chen, P. & Santiago, D. I. 2001, Gen. Relativ. Gravit. 33, 2101",
			"Hawking, S. W. 1975, Commun. Math. Phys. 43, 199 (heavy holes)",
		},
		Notes: []string{
			"a remnant is inert: no law wears it, and it is bound or adrift as the hole was",
			"many hold that remnants cannot be, for there would be infinitely many kinds of them (Susskind 1995, hep-th/9501106; from memory)",
		},
		Accepts: law.Accepts{Kinds: []string{"black-hole", "central-hole"}},
		Questions: []law.Question{
			{Name: "wear", Inputs: []string{"mass"}},
			{Name: "foretell", Inputs: []string{"mass"}},
			{Name: "heat", Inputs: []string{"mass"}},
		},
		Parameters: []law.Parameter{
			{Name: "remnant", Unit: "solMass", Doc: "least mass of a hole: the least length in Planck lengths times the Planck mass",
				Low: planckMass, High: 1e17 * planckMass, Preset: planckMass,
				Citation: "Adler, Chen & Santiago 2001 (the Planck mass); upper end, a least length of the electroweak scale: Das & Vagenas 2008, Phys. Rev. Lett. 101, 221301 (from memory)"},
			{Name: "alpha", Doc: "power that is radiated, in hbar c^6/(G M)^2, by heavy holes",
				Low: 1e-5, High: 1e-2, Preset: blackBody,
				Citation: "Adler, Chen & Santiago 2001 (a black body, 1/(15360 pi)); 3.7474e-5 is photons and gravitons with grey-body factors, Page 1976, Phys. Rev. D 13, 198"},
		},
		Thresholds: []law.Threshold{ends("black-hole"), ends("central-hole")},
		Wears:      "loss",
		Kinds:      []law.Kind{{Name: remnantWord, Doc: "what is left of a hole of the least mass", Composition: law.Pure}},
	}
}

// Answer answers from the mass alone.
func (planckRemnant) Answer(question string, in law.Batch) (law.Batch, error) {
	m, out := in.Values("mass"), in.NewValues()
	remnant, alpha := in.Parameters[0], in.Parameters[1]
	switch question {
	case "wear":
		heat := in.NewValues()
		for i := range m {
			out[i], heat[i] = math.Inf(-1), 0
			if s := slowing(m[i] / remnant); s > 0 {
				out[i] = num.Log10(alpha/evaporation) - float64(2*num.Log10(m[i])) - float64(4*num.Log10(s))
			}
		}
		return in.Answer(law.Numbers("log10_rate", out), law.Numbers("heat", heat)), nil
	case "foretell":
		unit := num.Log10(evaporation/alpha) + float64(3*num.Log10(remnant))
		for i := range m {
			out[i] = atOnce
			if l := life(m[i] / remnant); l > 0 {
				out[i] = math.Max(atOnce, unit+num.Log10(l))
			}
		}
		return in.Answer(law.Numbers("wait", out)), nil
	}
	for i := range m {
		out[i] = math.Inf(-1)
		if s := slowing(m[i] / remnant); s > 0 {
			out[i] = num.Log10(sunTemperature/s) - num.Log10(m[i])
		}
	}
	return in.Answer(law.Numbers("log10_temperature", out)), nil
}

// atOnce is the wait of what has nothing left to radiate, log10 yr.
const atOnce = -1000

// slowing is s of the package's formula for a hole of x least masses; 0 for
// what does not radiate.
func slowing(x float64) float64 {
	if !(x >= 1) {
		return 0
	}
	mu := 1 / x
	return (1 + math.Sqrt(float64((1-mu)*(1+mu)))) / 2
}

// Nodes and weights of the 5-point Gauss-Legendre rule on -1 .. 1 (Abramowitz
// & Stegun 1964, table 25.4).
var legendre = [5][2]float64{
	{0, 0.568888888888889},
	{-0.538469310105683, 0.478628670499366}, {0.538469310105683, 0.478628670499366},
	{-0.906179845938664, 0.236926885056189}, {0.906179845938664, 0.236926885056189},
}

// life is how long a hole of x least masses takes to come down to one, in
// G² M_r³/(alpha hbar c⁴).
//
//	int_1^x y² s(y)⁴ dy = int e^4u sinh(u)/(16 cosh²(u)) du,  y = cosh(u)
//
// Error: 1e-9 relative. Above a million, x³/3 - x: the rest is below 1e-18.
func life(x float64) float64 {
	switch {
	case !(x > 1):
		return 0
	case x > 1e6:
		return float64(x*float64(x*x))/3 - x
	}
	above := x - 1
	end := num.Log1p(above + math.Sqrt(float64(above*(x+1)))) // arcosh x
	panels := math.Ceil(end * 4)
	width, sum := end/panels, 0.0
	for p := range int(panels) {
		for _, node := range legendre {
			u := float64((float64(p) + 0.5 + node[0]/2) * width)
			e2 := num.Exp(2 * u)
			cosh2 := (e2 + 2 + 1/e2) / 4
			sum += float64(node[1] / 2 * width * float64(e2*e2) * num.Sinh(u) / (16 * cosh2))
		}
	}
	return sum
}
