package quantity

import (
	"math"
	"strings"
	"testing"
)

// Factors from Astropy 5.2.1 (astropy.units, .si.scale; eV to K and kg by
// astropy.constants k_B and c, CODATA 2018) or exact by definition.
func TestConversions(t *testing.T) {
	for _, c := range []struct {
		text, unit string
		want, tol  float64
	}{
		{"10Msun", "solMass", 10, 0},
		{"0.6 solMass", "kg", 0.6 * 1.988409870698051e30, 2e-15},
		{"1 Mjup", "kg", 1.8981245973360505e27, 2e-15},
		{"1 earthMass", "kg", 5.972167867791379e24, 2e-15},
		{"1e21 kg", "solMass", 1e21 / 1.988409870698051e30, 2e-15},
		{"10 kpc", "pc", 10000, 0},
		{"8kpc", "pc", 8000, 0},
		{"1 pc", "m", 3.085677581491367e16, 1e-15},
		{"1 AU", "m", 149597870700, 0},
		{"1 ly", "m", 9460730472580800, 0},
		{"1 lyr", "ly", 1, 0},
		{"1 Rsun", "km", 695700, 1e-15},
		{"1 Lsun", "W", 3.828e26, 1e-15},
		{"1 solLum", "erg/s", 3.828e33, 2e-15},
		{"1Gyr", "yr", 1e9, 0},
		{"1 yr", "s", 31557600, 0},
		{"1 d", "h", 24, 0},
		{"200 km/s", "km/s", 200, 0},
		{"200 km s-1", "m/s", 200000, 0},
		{"67.66 km/s/Mpc", "km.s**-1.Mpc**-1", 67.66, 0},
		{"67.66 km/(s.Mpc)", "Gyr-1", 0.06919670508699175, 2e-15},
		{"0.3 GeV/cm3", "GeV/cm3", 0.3, 0},
		{"0.3 GeV/cm3", "kg/m3", 0.3 * 1.78266192e-27 * 1e6, 1e-8},
		{"798K", "K", 798, 0},
		{"1 eV", "K", 11604.518121550082, 2e-15},
		{"0.511 MeV", "kg", 0.511e6 * 1.78266192162790e-36, 1e-14},
		{"2e11", "", 2e11, 0},
		{"40 %", "", 0.4, 1e-15},
		{"-3.5 km/s", "km/s", -3.5, 0},
		{"10^3 K", "K", 1000, 0},
		{"10**-2 K", "K", 0.01, 0},
		{"2.5x10^3 K", "K", 2500, 0},
		{"0 yr", "yr", 0, 0},
		{"10eV", "eV", 10, 0},
		{"1 t", "kg", 1000, 0},
		{"1 u", "kg", 1.6605390666e-27, 2e-9}, // CODATA 2018, ours is of 2022
	} {
		got, err := ParseFor(c.text, c.unit, false)
		if err != nil || math.Abs(got-c.want) > c.tol*math.Abs(c.want) {
			t.Errorf("%q in %q: got %v, %v, want %v", c.text, c.unit, got, err, c.want)
		}
	}
}

// By hand: log10 2.5 = 0.397940008672037609..., 1 Gyr = 1e9 yr, and so on.
func TestLog10(t *testing.T) {
	for _, c := range []struct {
		text, unit string
		want, tol  float64
	}{
		{"10^1100 yr", "yr", 1100, 0},
		{"1e37 yr", "yr", 37, 0},
		{"1e400 yr", "yr", 400, 0},
		{"100e398 yr", "yr", 400, 0},
		{"0.001e403 yr", "yr", 400, 0},
		{"10^1100 Gyr", "yr", 1109, 0},
		{"2.5e1100 yr", "yr", 1100.3979400086720376, 3e-13},
		{"2.5x10^1100 yr", "yr", 1100.3979400086720376, 3e-13},
		{"10^18.6 yr", "yr", 18.6, 0},
		{"10^(10^26) yr", "yr", 1e26, 1e12},
		{"10^10^26 yr", "yr", 1e26, 1e12},
		{"10^1e26 yr", "yr", 1e26, 0},
		{"10^(1e26) yr", "yr", 1e26, 0},
		{"10^-500 yr", "yr", -500, 0},
		{"1e-400 yr", "yr", -400, 0},
		{"31557600 s", "yr", 0, 1e-14},
		{"0 yr", "yr", math.Inf(-1), 0},
		{"1e99999999999 yr", "yr", 99999999999, 0},
	} {
		got, err := ParseFor(c.text, c.unit, true)
		if err != nil || !(got == c.want || math.Abs(got-c.want) <= c.tol) {
			t.Errorf("log10 of %q in %q: got %v, %v, want %v", c.text, c.unit, got, err, c.want)
		}
	}
}

func TestMessages(t *testing.T) {
	for _, c := range []struct{ text, unit, want string }{
		{"10", "solMass", `"10": no unit: want a mass, such as "10 Msun"`},
		{"10 kpc", "solMass", `"10 kpc" is a length: want a mass, such as "1 Msun"`},
		{"10 K", "", `"10 K" is a temperature: want a pure number, without unit`},
		{"10 K", "eV", `"10 K" is a temperature: want an energy, such as "1 eV"`},
		{"10 msun", "solMass", `"10 msun": unknown unit "msun" (did you mean "Msun"?)`},
		{"10 years", "yr", `"10 years": unknown unit "years" (did you mean "yr"?)`},
		{"10 GYR", "yr", `"10 GYR": unknown unit "GYR" (did you mean "Gyr"?)`},
		{"10 furlong", "pc", `"10 furlong": unknown unit "furlong": want a length, such as "1 pc"`},
		{"10 furlong", "", `"10 furlong": unknown unit "furlong": want a pure number, without unit`},
		{"ten yr", "yr", `"ten yr": no number at its start`},
		{"", "yr", `"": no number`},
		{"NaN", "yr", `"NaN": want a finite number`},
		{"-inf", "yr", `"-inf": want a finite number`},
		{"nan yr", "yr", `"nan yr": no number at its start`},
		{"1e400 yr", "yr", `"1e400 yr": beyond the range of numbers, 1e-308 .. 1e308 yr`},
		{"1,000 yr", "yr", `"1,000 yr": unknown unit ",": want a time, such as "1 yr"`},
		{"10^ yr", "yr", `"10^ yr": its exponent "" is no number`},
		{"10^(5 yr", "yr", `"10^(5 yr": its exponent "(5 yr" is no number`},
		{"10^10^400 yr", "yr", `"10^10^400 yr": its exponent is beyond 1e300`},
		{"1 m99", "m", `"1 m99": "99" is no power of a unit`},
		{"1 (m", "m", `"1 (m": a bracket is not closed`},
		{"1 m)", "m", `"1 m)": unit " m)": ")" is no part of a unit`},
	} {
		_, err := ParseFor(c.text, c.unit, false)
		if err == nil || err.Error() != c.want {
			t.Errorf("%q in %q: got %v\nwant %s", c.text, c.unit, err, c.want)
		}
	}
	if _, err := ParseFor("-1 yr", "yr", true); err == nil || err.Error() != `"-1 yr": want >= 0` {
		t.Errorf("log10 of a negative time: %v", err)
	}
}

func TestFormat(t *testing.T) {
	for _, c := range [][2]string{
		{Format(0.6, "solMass"), "0.6 Msun"},
		{Format(1e21, "kg"), "1e21 kg"},
		{Format(4.3e6, "solMass"), "4.3e6 Msun"},
		{Format(100000, ""), "100000"},
		{Format(1e-7, ""), "1e-7"},
		{FormatLog10(37, "yr"), "1e37 yr"},
		{FormatLog10(18.6, "yr"), "3.981e18 yr"},
		{FormatLog10(1100, "yr"), "10^1100 yr"},
		{FormatLog10(1100.5, "yr"), "10^1100.5 yr"},
		{FormatLog10(1e26, "yr"), "10^(1e26) yr"},
		{FormatLog10(3, "K"), "1000 K"},
		{FormatLog10(math.Inf(-1), "yr"), "0 yr"},
		{FormatLog10(math.Inf(1), "yr"), "never"},
		{FormatLog10(37, ""), "1e37"},
	} {
		if c[0] != c[1] {
			t.Errorf("got %q, want %q", c[0], c[1])
		}
	}
}

// What Exact prints is read back to the same bits.
func FuzzExact(f *testing.F) {
	for _, v := range []float64{0, 1, 0.1, 4.3e6, 1e300, -2.5e-300, 1100.5, 1e26} {
		f.Add(v)
	}
	f.Fuzz(func(t *testing.T, v float64) {
		if math.IsNaN(v) || math.IsInf(v, 0) {
			return
		}
		if got, err := ParseFor(Exact(v, "K"), "K", false); err != nil || got != v {
			t.Errorf("%v printed as %q is read as %v, %v", v, Exact(v, "K"), got, err)
		}
		if math.Abs(v) > maxExponent {
			return
		}
		if got, err := ParseFor(ExactLog10(v, "yr"), "yr", true); err != nil || got != v {
			t.Errorf("10^%v printed as %q is read as %v, %v", v, ExactLog10(v, "yr"), got, err)
		}
	})
}

// No text makes the reader panic, and what it accepts is a number.
func FuzzParse(f *testing.F) {
	for _, s := range []string{"10Msun", "10^1100 yr", "1e37 yr", "2.5x10^3 km/(s.Mpc)", "10^(10^26) yr", "nan", "1 m**-2", "-0 K", "1e", "10^-", "×10^", "1 /s/s/(("} {
		f.Add(s, "yr")
	}
	f.Fuzz(func(t *testing.T, text, unit string) {
		if v, err := ParseFor(text, unit, false); err == nil && (math.IsNaN(v) || math.IsInf(v, 0)) {
			t.Errorf("%q in %q: %v", text, unit, v)
		}
		v, err := ParseFor(text, unit, true)
		if err == nil && (math.IsNaN(v) || math.IsInf(v, 1)) {
			t.Errorf("log10 of %q in %q: %v", text, unit, v)
		}
		if err != nil && strings.TrimSpace(err.Error()) == "" {
			t.Errorf("%q: an empty message", text)
		}
	})
}
