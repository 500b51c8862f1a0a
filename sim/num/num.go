// Package num is arithmetic that gives the same bits on every machine of one
// architecture, and arithmetic on dates that are logarithms.
package num

import "math"

// Ln10 is ln 10.
const Ln10 = 2.302585092994045684017991454684364208

func Log1p(x float64) float64  { return math.Log1p(x) }
func Expm1(x float64) float64  { return math.Expm1(x) }
func Pow(x, y float64) float64 { return math.Pow(x, y) }
func Sinh(x float64) float64   { return math.Sinh(x) }
func Asinh(x float64) float64  { return math.Asinh(x) }
func Tanh(x float64) float64   { return math.Tanh(x) }
func Erf(x float64) float64    { return math.Erf(x) }
func Erfinv(x float64) float64 { return math.Erfinv(x) }

// Add10 returns log10(10^a + 10^b).
func Add10(a, b float64) float64 {
	if a < b {
		a, b = b, a
	}
	if math.IsInf(b, -1) || math.IsInf(a, 1) {
		return a
	}
	return a + Log1p(Exp((b-a)*Ln10))/Ln10
}

// Sub10 returns log10(10^a - 10^b), -Inf when a <= b.
func Sub10(a, b float64) float64 {
	if a <= b {
		return math.Inf(-1)
	}
	return a + Log(-Expm1((b-a)*Ln10))/Ln10
}
