// Package reference runs scripts that compute check values with reference
// libraries (NumPy, SciPy, mpmath, Astropy, as Debian packages them) and reads
// their answers. For tests only.
package reference

import (
	"os"
	"os/exec"
	"strconv"
	"strings"
	"testing"
)

// Python runs a script with arguments and returns the numbers it prints, line
// by line. Where the libraries are missing it skips the test, or fails it when
// the environment says WANE_REQUIRE=1.
func Python(t testing.TB, script string, args ...string) [][]float64 {
	t.Helper()
	python := "/usr/bin/python3" // Debian's, which sees Debian's libraries
	if _, err := os.Stat(python); err != nil {
		python = "python3"
	}
	if err := exec.Command(python, "-c", "import numpy, scipy").Run(); err != nil {
		if os.Getenv("WANE_REQUIRE") == "1" {
			t.Fatalf("needs python3 with numpy and scipy: %v", err)
		}
		t.Skipf("needs python3 with numpy and scipy: %v", err)
	}
	var problems strings.Builder
	c := exec.Command(python, append([]string{script}, args...)...)
	c.Stderr = &problems
	out, err := c.Output()
	if err != nil && strings.Contains(problems.String(), "ModuleNotFoundError") && os.Getenv("WANE_REQUIRE") != "1" {
		t.Skipf("%s: %v\n%s", script, err, problems.String())
	}
	if err != nil {
		t.Fatalf("%s: %v\n%s", script, err, problems.String())
	}
	var rows [][]float64
	for _, line := range strings.Split(strings.TrimSpace(string(out)), "\n") {
		var row []float64
		for _, word := range strings.Fields(line) {
			v, err := strconv.ParseFloat(word, 64)
			if err != nil {
				t.Fatalf("%s: %v", script, err)
			}
			row = append(row, v)
		}
		rows = append(rows, row)
	}
	return rows
}
