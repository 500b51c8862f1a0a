package stars

// taylorOrder is how many terms of a Taylor series are kept.
const taylorOrder = 26

// series holds the coefficients of a Taylor series about the start of a step.
type series [taylorOrder + 1]float64

// at returns the sum of the series at a distance.
func (s *series) at(h float64) float64 {
	sum := s[taylorOrder]
	for j := taylorOrder - 1; j >= 0; j-- {
		sum = s[j] + h*sum
	}
	return sum
}

// slopeAt returns the derivative at a distance.
func (s *series) slopeAt(h float64) float64 {
	sum := taylorOrder * s[taylorOrder]
	for j := taylorOrder - 1; j >= 1; j-- {
		sum = float64(j)*s[j] + h*sum
	}
	return sum
}

// nextPower sets p[j] of p = g^n, given g[0] .. g[j] and p[0] .. p[j-1]:
//
//	p_j = 1/(j g_0) sum over i = 1 .. j of (n i - j + i) g_i p_(j-i)
//
// which is what g p' = n p g' says of the terms of order j-1.
func nextPower(p, g *series, n float64, j int) {
	sum := 0.0
	for i := 1; i <= j; i++ {
		sum += (n*float64(i) - float64(j-i)) * g[i] * p[j-i]
	}
	p[j] = sum / (float64(j) * g[0])
}
