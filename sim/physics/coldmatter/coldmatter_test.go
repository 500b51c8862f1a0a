package coldmatter

import (
	"math"
	"testing"

	"wane/sim/physics/constant"
	"wane/sim/physics/structure"
	"wane/testdata/published"
	"wane/testdata/reference"
)

func TestPublished(t *testing.T) {
	for _, row := range published.Rows(t, "coldmatter.csv") {
		in := func(column string) float64 { return row.Number(t, column) }
		switch q := row.Inputs["quantity"]; q {
		case "supernova-log10-delay":
			row.Check(t, Log10SupernovaDelay(in("mass_Msun"), 1100, 32000))
		case "lattice-log10-time":
			rho := 0.0
			if row.Inputs["rho_g_cm3"] != "" {
				rho = in("rho_g_cm3")
			} else {
				rho = structure.CentralDensity(in("mass_Msun"))
			}
			row.Check(t, Nuclei{in("Z"), in("A"), in("log10_S")}.Log10LatticeTime(rho))
		case "fusion-log10-time":
			row.Check(t, Log10FusionTime(in("Z"), in("A")))
		case "tunnelling-log10-log10-time":
			row.Check(t, math.Log10(Log10TunnellingTime(in("mass_Msun"))))
		case "tunnelling-log10-time":
			row.Check(t, Log10TunnellingTime(in("mass_Msun")))
		case "speck-log10-log10-time":
			row.Check(t, math.Log10(Log10TunnellingTime(PlanckMass())))
		case "speck-nucleons":
			row.Check(t, PlanckMass()*constant.Sun/constant.AtomicMass)
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), q)
		}
	}
}

// Exponents and exponents of exponents, worked out by mpmath with 40 digits
// from the times themselves.
func TestAgainstMpmath(t *testing.T) {
	rows := reference.Python(t, "testdata/coldmatter.py")
	if len(rows) < 20 {
		t.Fatalf("mpmath printed %d rows", len(rows))
	}
	for _, r := range rows {
		got := 0.0
		switch r[0] {
		case 0:
			got = Log10SupernovaDelay(r[1], r[2], r[3])
		case 1:
			got = Nuclei{r[1], r[2], r[3]}.Log10LatticeTime(r[4])
		case 2:
			got = Log10FusionTime(r[1], r[2])
		case 3:
			got = Log10TunnellingTime(r[1])
		}
		if want := r[len(r)-1]; !(math.Abs(got/want-1) <= 1e-13) {
			t.Errorf("formula %v of %v: %.17g, mpmath says %.17g", r[0], r[1:len(r)-1], got, want)
		}
	}
}

// TestLimits: the delay only falls with mass up to the heaviest dwarf, and no
// hole is lighter than the Planck mass.
func TestLimits(t *testing.T) {
	before := math.Inf(1)
	for m := 1.16; m < 1.40; m += 0.001 {
		d := Log10SupernovaDelay(m, 1100, 32000)
		if !(d < before) {
			t.Fatalf("delay at %v solar masses: %v after %v", m, d, before)
		}
		before = d
	}
	if a, b := Log10SupernovaDelay(1.40, 1100, 32000), Log10SupernovaDelay(2, 1100, 32000); a != b {
		t.Errorf("delay at 2 solar masses %v, want that at 1.40 held, %v", b, a)
	}
	for _, m := range []float64{0, math.SmallestNonzeroFloat64, PlanckMass() / 2} {
		if got := Log10TunnellingTime(m); !math.IsInf(got, 1) {
			t.Errorf("%v solar masses tunnel after 10^%v yr, want never", m, got)
		}
	}
	if got := Log10TunnellingTime(1e20); math.IsInf(got, 0) || !(got > 1e102) {
		t.Errorf("a body of 1e20 solar masses tunnels after 10^%v yr", got)
	}
}
