package cooling

import (
	"math"
	"testing"

	"wane/sim/physics/structure"
	"wane/testdata/published"
)

func TestPublished(t *testing.T) {
	stars := NewNeutronStars()
	for _, row := range published.Rows(t, "cooling.csv") {
		in := func(column string) float64 { return row.Number(t, column) }
		ions := func() Ions { return Ions{in("Z"), in("A")} }
		dwarf := func(latent float64) Dwarf {
			env := DefaultEnvelope()
			env.Exponent, env.Latent = in("q"), latent
			return NewDwarf(in("mass_Msun"), ions(), env)
		}
		switch quantity := row.Inputs["quantity"]; quantity {
		case "mestel-age":
			row.Check(t, MestelAge(in("L_Lsun"), in("mass_Msun"), in("A"), in("A")/in("Z")))
		case "age-at-luminosity":
			d := NewDwarf(in("mass_Msun"), ions(), DefaultEnvelope())
			row.Check(t, d.Age(temperatureAt(in("L_Lsun"), in("mass_Msun"))))
		case "temperature-at-luminosity":
			row.Check(t, temperatureAt(in("L_Lsun"), in("mass_Msun")))
		case "log10-luminosity":
			row.Check(t, math.Log10(Luminosity(structure.WhiteDwarfRadius(in("mass_Msun")), in("T_K"))))
		case "melting-temperature":
			row.Check(t, ions().MeltingTemperature(in("rho_g_cm3"), 175))
		case "debye-temperature":
			row.Check(t, NewDwarf(in("mass_Msun"), ions(), DefaultEnvelope()).debye)
		case "interior-ratio":
			core, _ := NewDwarf(in("mass_Msun"), CarbonOxygenIons(), DefaultEnvelope()).Interior(in("T_K"))
			row.Check(t, core/in("T_K"))
		case "debye-function":
			row.Check(t, Debye(in("x")))
		case "log10-crystal-age":
			row.Check(t, math.Log10(dwarf(0).Between(3e4, in("T_K"))))
		case "log10-age":
			row.Check(t, math.Log10(dwarf(DefaultEnvelope().Latent).Age(in("T_K"))))
		case "latent-delay":
			with, without := dwarf(DefaultEnvelope().Latent), dwarf(0)
			row.Check(t, math.Log10(with.Age(in("T_K"))/without.Age(in("T_K"))))
		case "mestel-log10-age":
			row.Check(t, ageAt(math.Log10(in("T_K")), NewMestelCurve(in("mass_Msun"), ions()).Temperature))
		case "barrow-tipler-log10-age":
			curve := NewMestelCurve(in("mass_Msun"), ions())
			row.Check(t, ageAt(math.Log10(in("T_K")), func(age float64) float64 { return curve.TemperatureThrough(age, 15) }))
		case "neutron-star-log10-age":
			row.Check(t, ageAt(math.Log10(in("T_K")), stars.Temperature))
		case "brown-dwarf-temperature":
			row.Check(t, math.Pow(10, BrownDwarfTemperature(in("mass_Msun"), in("log10_age_yr"), 0.01)))
		case "brown-dwarf-luminosity":
			row.Check(t, math.Pow(10, BrownDwarfLuminosity(in("mass_Msun"), in("log10_age_yr"), 0.01)))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), quantity)
		}
	}
}

// temperatureAt inverts the luminosity of a white dwarf.
func temperatureAt(l, m float64) float64 {
	return math.Pow(l/Luminosity(structure.WhiteDwarfRadius(m), 1), 0.25)
}

// ageAt finds the log10 age at which a falling curve passes log10 T.
func ageAt(logT float64, curve func(logAge float64) float64) float64 {
	low, high := -10.0, 200.0
	for range 100 {
		if middle := (low + high) / 2; curve(middle) > logT {
			low = middle
		} else {
			high = middle
		}
	}
	return low
}
