package num_test

import (
	"encoding/binary"
	"hash/fnv"
	"math"
	"testing"

	"wane/sim/num"
)

// Bits of many results at once. They change if a compiler fuses a product
// with a sum, or if a formula is rewritten; either changes the last bits of
// every run, which is a decision to take, not an accident to pass over.
func TestFrozenBits(t *testing.T) {
	// Arguments by exact arithmetic only, the same everywhere.
	unit := func(i int) float64 { return float64(uint64(i)*0x9e3779b97f4a7c15>>11) * 0x1p-53 }
	for _, c := range []struct {
		name string
		f    func(u float64) float64
		want uint64
	}{
		{"Exp", func(u float64) float64 { return num.Exp(float64(1500*u) - 750) }, 0x6c4c21d53023c617},
		{"Exp10", func(u float64) float64 { return num.Exp10(float64(640*u) - 325) }, 0x7390b7a1f25b04b7},
		{"Log", func(u float64) float64 { return num.Log(u) }, 0xfd6baba29e9479be},
		{"Log10", func(u float64) float64 { return num.Log10(1e20 * u) }, 0x50e5f0bb3a03b1a9},
		{"Log1p", func(u float64) float64 { return num.Log1p(float64(4*u) - 1) }, 0xcd3bfae96dd7a7f7},
		{"Expm1", func(u float64) float64 { return num.Expm1(float64(8*u) - 4) }, 0xc76572e47d751345},
		{"Pow", func(u float64) float64 { return num.Pow(u, float64(10*u)-5) }, 0xbe6b2ff43f457f1a},
		{"Sinh", func(u float64) float64 { return num.Sinh(float64(4*u) - 2) }, 0xfb49c960d140c40c},
		{"Asinh", func(u float64) float64 { return num.Asinh(float64(4*u) - 2) }, 0x35bd2737f41c2a59},
		{"Tanh", func(u float64) float64 { return num.Tanh(float64(4*u) - 2) }, 0xb4c0e2fe794d0eeb},
		{"Erf", func(u float64) float64 { return num.Erf(float64(8*u) - 2) }, 0x6b29364cf93d6071},
		{"Erfinv", func(u float64) float64 { return num.Erfinv(u) }, 0x79cf4b77cc4607d6},
		{"Add10", func(u float64) float64 { return num.Add10(10, float64(20*u)) }, 0x4b0ec2434b59a917},
		{"Sub10", func(u float64) float64 { return num.Sub10(10, float64(10*u)) }, 0x3c03861789716609},
	} {
		h := fnv.New64a()
		for i := range 100_000 {
			h.Write(binary.LittleEndian.AppendUint64(nil, math.Float64bits(c.f(unit(i)))))
		}
		if got := h.Sum64(); got != c.want {
			t.Errorf("%s: %#x, want %#x", c.name, got, c.want)
		}
	}
}
