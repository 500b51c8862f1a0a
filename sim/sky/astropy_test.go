package sky_test

import (
	"encoding/csv"
	"fmt"
	"math"
	"os"
	"os/exec"
	"strconv"
	"strings"
	"testing"

	"wane/sim/sky"
)

// reference runs a script of testdata under the system's Python, where Debian
// puts Astropy.
func reference(t *testing.T, script string) [][]string {
	t.Helper()
	python := "/usr/bin/python3"
	if _, err := os.Stat(python); err != nil {
		python = "python3"
	}
	var fault strings.Builder
	cmd := exec.Command(python, "testdata/"+script)
	cmd.Stderr = &fault
	out, err := cmd.Output()
	if err != nil {
		said := fmt.Sprintf("%s testdata/%s: %v\n%s", python, script, err, fault.String())
		missing := strings.Contains(said, "ModuleNotFoundError") || strings.Contains(said, "executable file not found")
		if missing && os.Getenv("WANE_REQUIRE") == "" {
			t.Skip("needs python3-astropy and python3-scipy: " + said)
		}
		t.Fatal(said)
	}
	rows, err := csv.NewReader(strings.NewReader(string(out))).ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	return rows
}

// TestAstropy compares ages, scale factors, rates, horizons and four-volumes
// with Astropy and SciPy, from a = 1/400 to a = 3000. The dates fall anywhere
// between the nodes of the tables, so this also bounds the interpolation.
func TestAstropy(t *testing.T) {
	rows := reference(t, "background.py")
	if len(rows) != 96 {
		t.Fatalf("%d rows, want 96", len(rows))
	}
	const allowed = 1e-5 // log10; what the package states
	skies, worst := map[string]*sky.Sky{}, map[string]float64{}
	for _, row := range rows {
		var v [4]float64
		for i := range v {
			var err error
			if v[i], err = strconv.ParseFloat(row[i+1], 64); err != nil {
				t.Fatal(err)
			}
		}
		radiation, x, date, want := v[0], v[1], v[2], v[3]
		s := skies[row[1]]
		if s == nil {
			s = drawn(t, lambda(t, map[string]float64{"radiation": radiation}))
			skies[row[1]] = s
		}
		got, ok := map[string]func(float64) float64{
			"hubble": s.LogHubble, "event": s.LogEventHorizon, "particle": s.LogParticleHorizon, "volume": s.LogFourVolume,
		}[row[0]]
		if !ok {
			t.Fatalf("unknown quantity %q", row[0])
		}
		compare := func(name string, difference float64) {
			worst[name] = math.Max(worst[name], math.Abs(difference))
			if !(math.Abs(difference) <= allowed) {
				t.Errorf("%s, radiation %v, ln a %v, date 10^%v yr: off by %.3g dex", name, radiation, x, date, difference)
			}
		}
		compare(row[0], got(date)-want)
		compare("scale factor", (s.LnA(date)-x)/math.Ln10)
	}
	t.Logf("largest differences, dex: %v", worst)
}
