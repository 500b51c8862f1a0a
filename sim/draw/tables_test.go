package draw

import (
	"encoding/json"
	"os"
	"os/exec"
	"testing"
)

// The tables against mpmath: for the published base edge of 256 layers, every
// layer has the area of the base with its tail, the last ends at height 1, and
// each stored number is the nearest float64.
// Source of the method: Marsaglia and Tsang (2000), section 2.
const tableScript = `
import json
from mpmath import mp, mpf, exp, log, findroot
mp.dps = 50
def build(r):
    v = (r + 1)*exp(-r)
    x, y = [v*exp(r), r], exp(-r)
    for i in range(1, 255):
        y += v/x[i]
        x.append(-log(y))
    return x + [mpf(0)], y + v/x[255] - 1
r = findroot(lambda r: build(r)[1], (mpf('7.6971174701310'), mpf('7.6971174701311')))
x = build(r)[0]
print(json.dumps({'x': [float(t) for t in x], 'y': [float(exp(-t)) for t in x],
  'width': [float(t/2**53) for t in x[:-1]], 'inside': [int(b/a*2**53) for a, b in zip(x, x[1:])]}))
`

func TestTablesAgainstMpmath(t *testing.T) {
	out, err := exec.Command("/usr/bin/python3", "-c", tableScript).Output()
	if err != nil {
		if os.Getenv("WANE_REQUIRE") == "1" {
			t.Fatalf("needs python3 with mpmath: %v", err)
		}
		t.Skipf("needs python3 with mpmath: %v", err)
	}
	var want struct {
		X, Y, Width []float64
		Inside      []uint64
	}
	if err := json.Unmarshal(out, &want); err != nil {
		t.Fatal(err)
	}
	if len(want.X) != len(edgeTable) || len(want.Width) != len(layerTable) {
		t.Fatalf("mpmath gave %d edges and %d layers", len(want.X), len(want.Width))
	}
	for i, e := range edgeTable {
		if e.x != want.X[i] || e.y != want.Y[i] {
			t.Errorf("edge %d: %x, %x, want %x, %x", i, e.x, e.y, want.X[i], want.Y[i])
		}
	}
	for i, l := range layerTable {
		if l.inside != want.Inside[i] || l.width != want.Width[i] {
			t.Errorf("layer %d: %#x, %x, want %#x, %x", i, l.inside, l.width, want.Inside[i], want.Width[i])
		}
	}
}
