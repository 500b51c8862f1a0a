package cooling

import (
	"fmt"
	"math"
	"testing"

	"wane/sim/physics/structure"
	"wane/testdata/reference"
)

// The heat of a crystal and its electrons, integrated by SciPy's adaptive
// quadrature with its own Debye integral.
func TestDwarfAgainstSciPy(t *testing.T) {
	temperatures := []float64{8000, 5120, 3000, 1000, 100, 10, 1, 0.01}
	var args []string
	for _, x := range temperatures {
		args = append(args, fmt.Sprint(x))
	}
	for _, c := range []struct {
		mass, q float64
		ions    Ions
	}{{0.6, 1.0 / 7, CarbonOxygenIons()}, {0.2, 0.5, HeliumIons()}, {1.2, 2, OxygenNeonIons()}} {
		env := Envelope{Ratio: 1010, Exponent: c.q, Freezing: 175}
		d := NewDwarf(c.mass, c.ions, env)
		script := []string{"white-dwarf", fmt.Sprint(c.mass), fmt.Sprint(structure.WhiteDwarfRadius(c.mass)),
			fmt.Sprint(c.ions.Z), fmt.Sprint(c.ions.A), fmt.Sprint(c.q)}
		for i, want := range reference.Python(t, "testdata/dwarf.py", append(script, args...)...) {
			if got := math.Log10(d.Between(3e4, temperatures[i])); math.Abs(got-want[0]) > 1e-5 {
				t.Errorf("%v solar masses, q = %v: 10^%.7f yr to %v K, SciPy says 10^%.7f", c.mass, c.q, got, temperatures[i], want[0])
			}
		}
	}
}

func TestNeutronStarAgainstSciPy(t *testing.T) {
	stars := NewNeutronStars()
	temperatures := []float64{3e6, 1e6, 1e5, 1e4, 1e3, 100, 1}
	args := []string{"neutron-star"}
	for _, x := range temperatures {
		args = append(args, fmt.Sprint(x))
	}
	for i, want := range reference.Python(t, "testdata/dwarf.py", args...) {
		// SciPy starts at 3e7 K, the curve at infinity: seconds apart.
		if got := ageAt(math.Log10(temperatures[i]), stars.Temperature); math.Abs(got-want[0]) > 1e-3 {
			t.Errorf("10^%.6f yr to %v K, SciPy says 10^%.6f", got, temperatures[i], want[0])
		}
	}
}

// The table against the curve it tabulates, at masses between its columns.
func TestTableError(t *testing.T) {
	worst := 0.0
	for _, c := range []struct {
		ions      Ions
		low, high float64
	}{{HeliumIons(), 0.05, 0.6}, {CarbonOxygenIons(), 0.4, 1.1}, {OxygenNeonIons(), 1.0, 1.4}} {
		for _, q := range []float64{1.0 / 7, 0.5, 2} {
			env := DefaultEnvelope()
			env.Exponent = q
			table := NewDwarfTable(c.ions, env)
			for k := 0; massOf(k+1) < c.high; k++ {
				if massOf(k) < c.low || k%5 > 0 {
					continue
				}
				m := (massOf(k) + massOf(k+1)) / 2
				d := NewDwarf(m, c.ions, env)
				for _, logT := range []float64{4.6, 4, 3.7, 3.55, 3.4, 3.2, 3, 2.9, 2.5, 2, 1, 0.7, 0, -3} {
					want := math.Log10(d.Age(math.Pow(10, logT)))
					got := ageAt(logT, func(a float64) float64 { return table.Temperature(m, a) })
					if e := math.Abs(got - want); e > worst {
						worst = e
						t.Logf("q = %.3f, Z = %v, %v solar masses, 10^%v K: off by %.5f", q, c.ions.Z, m, logT, e)
					}
				}
			}
		}
	}
	if worst > 0.004 {
		t.Errorf("the table is off by %v dex in age, want at most 0.004", worst)
	}
}

func TestColumnsOfTable(t *testing.T) {
	for k := range columns {
		m := massOf(k)
		got, share := bracket(m)
		if at := float64(got) + share; math.Abs(at-float64(k)) > 1e-9 {
			t.Errorf("column %d, %v solar masses, is found at %v", k, m, at)
		}
	}
}

// The straight line of Mestel's law and the law itself are one, and the curve
// through a date joins it.
func TestMestelCurve(t *testing.T) {
	for _, m := range []float64{0.1, 0.6, 1.2} {
		c, ions := NewMestelCurve(m, CarbonOxygenIons()), CarbonOxygenIons()
		for _, l := range []float64{1, 1e-2, 1e-4, 1e-9} {
			age := math.Log10(MestelAge(l, m, ions.A, ions.A/ions.Z))
			if got, want := c.Temperature(age), math.Log10(temperatureAt(l, m)); math.Abs(got-want) > 1e-12 {
				t.Errorf("%v solar masses at %v solar luminosities: 10^%v K, want 10^%v", m, l, got, want)
			}
			if got := c.TemperatureThrough(age, 15); l >= 1e-4 && math.Abs(got-c.Temperature(age)) > 1e-12 {
				t.Errorf("%v solar masses at %v solar luminosities: through a date 10^%v K, want 10^%v", m, l, got, c.Temperature(age))
			}
		}
	}
}

// Curves only fall, start where they say, and follow T ~ t^-1/2 at the end,
// to ages far beyond float64's range of years.
func TestCurvesFall(t *testing.T) {
	stars := NewNeutronStars()
	curves := map[string]struct {
		start float64
		at    func(float64) float64
	}{
		"neutron star": {NeutronStarStart, stars.Temperature},
		"brown dwarf":  {BrownDwarfStart, func(a float64) float64 { return BrownDwarfTemperature(0.05, a, 0.01) }},
	}
	for _, q := range []float64{1.0 / 7, 1, 2} {
		env := DefaultEnvelope()
		env.Exponent = q
		table := NewDwarfTable(HeliumIons(), env)
		for _, m := range []float64{0, 0.001, 0.0123, 0.1234, 0.6, 1.39, 2} {
			curves[fmt.Sprintf("white dwarf %v q %.2f", m, q)] = struct {
				start float64
				at    func(float64) float64
			}{DwarfStart, func(a float64) float64 { return table.Temperature(m, a) }}
		}
	}
	for name, c := range curves {
		if got := c.at(math.Inf(-1)); got != c.start {
			t.Errorf("%s: starts at 10^%v K, want 10^%v", name, got, c.start)
		}
		if got := c.at(math.Inf(1)); !math.IsInf(got, -1) {
			t.Errorf("%s: ends at 10^%v K, want 0", name, got)
		}
		before := math.Inf(1)
		for a := -12.0; a < 130; a += 0.0037 {
			logT := c.at(a)
			if !(logT <= before+1e-12) || math.IsNaN(logT) {
				t.Fatalf("%s: warms at 10^%v yr: 10^%v K after 10^%v", name, a, logT, before)
			}
			before = logT
		}
		want := -0.5
		if name == "brown dwarf" {
			want = -0.32
		}
		if slope := (c.at(1500) - c.at(1000)) / 500; math.Abs(slope-want) > 1e-9 {
			t.Errorf("%s: T ~ t^%v at last, want t^%v", name, slope, want)
		}
	}
}

// The limits of the heat capacity of a crystal.
func TestDebyeLimits(t *testing.T) {
	if Debye(0) != 1 {
		t.Errorf("warm crystal: %v, want 1", Debye(0))
	}
	for x := 0.01; x < 200; x *= 1.01 {
		if a, b := Debye(x), Debye(x*1.0001); !(a > b) {
			t.Fatalf("heat rises with x at %v: %v, %v", x, a, b)
		}
	}
	for _, x := range []float64{1, 45} {
		if a, b := Debye(math.Nextafter(x, 0)), Debye(math.Nextafter(x, 100)); math.Abs(a/b-1) > 1e-13 {
			t.Errorf("pieces differ at %v: %v, %v", x, a, b)
		}
	}
}

// Freezing gives off exactly its heat.
func TestLatentHeat(t *testing.T) {
	env := DefaultEnvelope()
	with := NewDwarf(0.6, CarbonOxygenIons(), env)
	env.Latent = 0
	without := NewDwarf(0.6, CarbonOxygenIons(), env)
	const n = 100000
	sum := 0.0
	for i := range n {
		core := with.melting * (0.5 + (float64(i)+0.5)/n)
		sum += (with.HeatCapacity(core) - without.HeatCapacity(core)) * with.melting / n
	}
	if want := 0.77 * with.ionHeat / 3 * with.melting; math.Abs(sum/want-1) > 1e-6 {
		t.Errorf("freezing gives off %v J, want %v", sum, want)
	}
}

func BenchmarkTable(b *testing.B) {
	table := NewDwarfTable(HeliumIons(), DefaultEnvelope())
	for m := 0.10; m < 0.53; m += 0.001 {
		table.Temperature(m, 9)
	}
	m, age := 0.3, 9.0
	for b.Loop() {
		if m += 0.0137; m > 0.53 {
			m -= 0.43
		}
		if age += 0.17; age > 14 {
			age -= 5
		}
		table.Temperature(m, age)
	}
}

func BenchmarkColumn(b *testing.B) {
	d := NewDwarf(0.6, CarbonOxygenIons(), DefaultEnvelope())
	for b.Loop() {
		d.column()
	}
}
