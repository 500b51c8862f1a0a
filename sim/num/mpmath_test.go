package num_test

import (
	"bufio"
	"fmt"
	"math"
	"os"
	"os/exec"
	"strings"
	"testing"
)

// wide is a value to about 32 digits: a near float64 and the rest in units of
// its last place.
type wide struct{ value, rest, ulp float64 }

// mpmath evaluates a Python expression in x (and y) with 40 digits of the
// reference library mpmath, for each line of arguments. Without the library
// it skips, or fails where the environment says WANE_REQUIRE=1.
func mpmath(t *testing.T, expression string, columns ...[]float64) []wide {
	t.Helper()
	script := `
import sys
from mpmath import *
from math import ulp, isfinite
mp.dps = 40
f = lambda x, y=None: ` + expression + `
for line in sys.stdin:
    v = f(*[mpf(float.fromhex(a)) for a in line.split()])
    h = float(v)
    u = ulp(h) if isfinite(h) else 1.0
    print(h.hex(), float((v - h)/mpf(u)).hex() if isfinite(h) else '0x0p0', u.hex())
`
	var in strings.Builder
	for i := range columns[0] {
		for _, c := range columns {
			fmt.Fprintf(&in, "%x ", c[i])
		}
		in.WriteByte('\n')
	}
	cmd := exec.Command("/usr/bin/python3", "-c", script)
	cmd.Stdin = strings.NewReader(in.String())
	out, err := cmd.Output()
	if err != nil {
		if os.Getenv("WANE_REQUIRE") == "1" {
			t.Fatalf("needs python3 with mpmath: %v", err)
		}
		t.Skipf("needs python3 with mpmath: %v", err)
	}
	var ws []wide
	for s := bufio.NewScanner(strings.NewReader(string(out))); s.Scan(); {
		var w wide
		if _, err := fmt.Sscanf(s.Text(), "%g %g %g", &w.value, &w.rest, &w.ulp); err != nil {
			t.Fatalf("mpmath said %q: %v", s.Text(), err)
		}
		ws = append(ws, w)
	}
	if len(ws) != len(columns[0]) {
		t.Fatalf("mpmath gave %d values of %d", len(ws), len(columns[0]))
	}
	return ws
}

// ulps returns how far got is from w in units of the last place of w.
func ulps(got float64, w wide) float64 {
	if got == w.value && math.IsInf(got, 0) {
		return 0
	}
	return math.Abs((got-w.value)/w.ulp - w.rest)
}
