package lawtest

// gauss returns the nodes and weights of ten-point Gauss-Legendre quadrature
// on 0 .. 1.
//
// Source: Abramowitz & Stegun 1964, table 25.4, n = 10.
func gauss() (nodes, weights [10]float64) {
	x := [5]float64{0.148874338981631, 0.433395394129247, 0.679409568299024, 0.865063366688985, 0.973906528517172}
	w := [5]float64{0.295524224714753, 0.269266719309996, 0.219086362515982, 0.149451349150581, 0.066671344308688}
	for i := range x {
		nodes[i], nodes[9-i] = (1-x[i])/2, (1+x[i])/2
		weights[i], weights[9-i] = w[i]/2, w[i]/2
	}
	return nodes, weights
}
