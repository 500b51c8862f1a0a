package gravity

import (
	"math"
	"os"
	"os/exec"
	"strconv"
	"strings"
	"testing"

	"wane/testdata/published"
)

func TestPublished(t *testing.T) {
	for _, row := range published.Rows(t, "gravity.csv") {
		number := func(name string) float64 { return row.Number(t, name) }
		switch q := row.Inputs["quantity"]; q {
		case "shortening":
			row.Check(t, Shortening(number("eccentricity")))
		case "merger":
			row.Check(t, math.Pow(10, Log10MergerTime(number("mass_1_Msun"), number("mass_2_Msun"), number("separation_AU"), number("eccentricity"))))
		case "fifth-power":
			row.Check(t, math.Pow(10, Log10FifthPowerTime(number("mass_1_Msun"), number("mass_2_Msun"), number("separation_AU"))))
		case "fifth-power-log10":
			row.Check(t, Log10FifthPowerTime(number("mass_1_Msun"), number("mass_2_Msun"), number("separation_AU")))
		case "log10-underestimate":
			m1, m2, a := number("mass_1_Msun"), number("mass_2_Msun"), number("separation_AU")
			row.Check(t, Log10CircularTime(m1, m2, a)-Log10FifthPowerTime(m1, m2, a))
		case "power":
			row.Check(t, Power(number("mass_1_Msun"), number("mass_2_Msun"), number("separation_AU")))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), q)
		}
	}
}

// TestShortening compares the quadrature with mpmath's (30 digits), close to
// both ends.
func TestShortening(t *testing.T) {
	eccentricities := []string{"1e-9", "1e-3", "0.1", "0.3", "0.5", "0.7", "0.9", "0.99", "0.999999", "0.999999999", "0.999999999999"}
	out, err := exec.Command("/usr/bin/python3", append([]string{"testdata/peters.py"}, eccentricities...)...).Output()
	if err != nil {
		if os.Getenv("WANE_REQUIRE") == "1" {
			t.Fatalf("mpmath is required: %v", err)
		}
		t.Skipf("no mpmath: %v", err)
	}
	lines := strings.Fields(string(out))
	if len(lines) != len(eccentricities) {
		t.Fatalf("peters.py printed %d values for %d eccentricities", len(lines), len(eccentricities))
	}
	for i, s := range eccentricities {
		e, _ := strconv.ParseFloat(s, 64)
		want, err := strconv.ParseFloat(lines[i], 64)
		if err != nil {
			t.Fatal(err)
		}
		if got := Shortening(e); math.Abs(got/want-1) > 1e-13 {
			t.Errorf("F(%s): got %.16g, mpmath %.16g, relative %.1e", s, got, want, got/want-1)
		}
	}
}

func TestCorners(t *testing.T) {
	inf := math.Inf(1)
	for _, c := range []struct {
		what      string
		got, want float64
	}{
		{"circular", Shortening(0), 1},
		{"head-on", Shortening(1), 0},
		{"head-on merger", Log10MergerTime(1, 1, 1, 1), -inf},
		{"touching", Log10MergerTime(1, 1, 0, 0), -inf},
		{"one mass is nothing", Log10MergerTime(1, 0, 1, 0.5), inf},
		{"one mass is nothing, head-on", Log10MergerTime(1, 0, 1, 1), inf},
	} {
		if c.got != c.want {
			t.Errorf("%s: got %v, want %v", c.what, c.got, c.want)
		}
	}
	if !math.IsNaN(Shortening(1.1)) || !math.IsNaN(Shortening(-0.1)) {
		t.Error("an eccentricity outside 0 .. 1 has a shortening")
	}
}
