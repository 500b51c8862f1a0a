package cooling

import "wane/sim/num"

// bernoulli is B_2, B_4, ... divided by 2!, 4!, ...
var bernoulli = [...]float64{
	1.0 / 12, -1.0 / 720, 1.0 / 30240, -1.0 / 1209600, 1.0 / 47900160, -691.0 / 1307674368000,
	1.0 / 74724249600, -3617.0 / 10670622842880000, 43867.0 / 5109094217170944000,
}

// Debye returns the heat capacity of a harmonic crystal, as a share of 3k an
// ion.
//
//	C = 3/x^3 int_0^x y^4 e^y/(e^y - 1)^2 dy,   x = theta/T
//	  = 4 D3(x) - 3x/(e^x - 1)
//
// Shapes: scalar to scalar.
// Units: both pure numbers.
// Domain: x >= 0.
// Error: 1e-14 relative.
// Special cases: 1 at x = 0; 4 pi^4/(5 x^3) for large x.
// Source: Debye's theory; power series in Bernoulli numbers below x = 1, sum of
// exponentials above ([AbramowitzStegun1964], 27.1). Checked by
// testdata/published/cooling.csv.
func Debye(x float64) float64 {
	if x < 1 {
		sum, power := 1.0, 1.0
		for i, b := range bernoulli {
			power *= x * x
			sum += b * power * (12/float64(2*i+5) - 3)
		}
		return sum
	}
	const pi4 = 97.409091034002437 // pi^4
	if x > 45 {
		return 4 * pi4 / (5 * x * x * x)
	}
	// int_0^x y^3/(e^y - 1) dy = pi^4/15 - sum_k e^-kx (x^3/k + 3x^2/k^2 + 6x/k^3 + 6/k^4)
	step := num.Exp(-x)
	e, rest := 1.0, 0.0
	for k := 1.0; ; k++ {
		e *= step
		term := e * (x*x*x/k + 3*x*x/(k*k) + 6*x/(k*k*k) + 6/(k*k*k*k))
		rest += term
		if term < 1e-17 {
			break
		}
	}
	return 12/(x*x*x)*(pi4/15-rest) - 3*x/num.Expm1(x)
}
