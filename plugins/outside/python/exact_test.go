package python_test

import (
	"bytes"
	"encoding/binary"
	"math"
	"math/rand/v2"
	"testing"

	"wane/sim/num"
)

// exactScript answers columns of doubles: first how many, then x and y.
const exactScript = `
import sys
import numpy as np
from wanelaw import exact
data = np.frombuffer(sys.stdin.buffer.read(), "<f8")
x, y = data.reshape(2, -1)
for out in exact.exp(x), exact.exp10(x), exact.log(x), exact.log10(x), exact.power(x, y):
    sys.stdout.buffer.write(out.astype("<f8").tobytes())
one = [exact.exp(x[0]), exact.log(abs(x[0])), exact.power(2, [[1, 2], [3, 4]])]
assert one[0].shape == () and one[2].shape == (2, 2) and one[2][1, 1] == 16, one
assert exact.exp([]).shape == (0,)
`

// TestExactIsPackageNum compares exact.py with package num bit by bit.
func TestExactIsPackageNum(t *testing.T) {
	needsNumpy(t)
	x, y := exactArguments()
	var in bytes.Buffer
	for _, column := range [][]float64{x, y} {
		if err := binary.Write(&in, binary.LittleEndian, column); err != nil {
			t.Fatal(err)
		}
	}
	out := python(t, in.Bytes(), "-c", exactScript)
	if len(out) != 5*8*len(x) {
		t.Fatalf("%d bytes for 5 columns of %d doubles", len(out), len(x))
	}
	for i, f := range []struct {
		name string
		of   func(x, y float64) float64
	}{
		{"exp", func(x, _ float64) float64 { return num.Exp(x) }},
		{"exp10", func(x, _ float64) float64 { return num.Exp10(x) }},
		{"log", func(x, _ float64) float64 { return num.Log(x) }},
		{"log10", func(x, _ float64) float64 { return num.Log10(x) }},
		{"power", num.Pow},
	} {
		faults := 0
		for j := range x {
			got := math.Float64frombits(binary.LittleEndian.Uint64(out[8*(i*len(x)+j):]))
			want := f.of(x[j], y[j])
			if f.name == "power" && (x[j] < 0 || math.Signbit(x[j])) {
				continue // not offered
			}
			if math.Float64bits(got) != math.Float64bits(want) && !(math.IsNaN(got) && math.IsNaN(want)) {
				if faults++; faults <= 5 {
					t.Errorf("%s(%x, %x): exact.py %x, num %x", f.name, x[j], y[j], got, want)
				}
			}
		}
		if faults > 0 {
			t.Errorf("%s: %d of %d differ", f.name, faults, len(x))
		}
	}
}

// exactArguments are what functions are compared on: everyday numbers, any
// bits at all, the neighbourhood of every switch, and what is special.
func exactArguments() (x, y []float64) {
	r := rand.New(rand.NewPCG(7, 11))
	add := func(a, b float64) { x, y = append(x, a), append(y, b) }
	for range 60_000 {
		add(1500*r.Float64()-750, 20*r.Float64()-10)
		add(num.Exp10(600*r.Float64()-300), 4*r.Float64()-2)
		add(math.Float64frombits(r.Uint64()), math.Float64frombits(r.Uint64()))
		add(1+(r.Float64()-0.5)*num.Exp10(-16*r.Float64()), num.Exp10(20*r.Float64()))
	}
	special := []float64{0, math.Copysign(0, -1), 1, -1, 2, 0.5, 10, math.Inf(1), math.Inf(-1), math.NaN(), math.SmallestNonzeroFloat64,
		math.MaxFloat64, 0x1p-1022, 0x1p-1023, 0x1p-60, 700, 709.78, 710, 745.2, 746, -746, 304, 308.25, 309, -323.3, -324, 1000, 1e22, 3, -3}
	for _, a := range special {
		for _, b := range special {
			add(a, b)
			add(math.Nextafter(a, math.Inf(1)), b)
			add(math.Nextafter(a, math.Inf(-1)), b)
		}
	}
	for n := -330.0; n <= 330; n++ {
		add(n, 2)
		add(num.Exp10(n), 0.5)
	}
	return x, y
}
