// Package imf holds initial mass functions: how many objects are born with
// which mass.
//
// A mass function is xi(m) = dN/dm, here either a broken power law (on each
// segment xi is proportional to m^-slope, and it is continuous at the breaks)
// or a log-normal with a power law above one solar mass. All results come from
// two integrals of each piece in closed form, of xi dm (number) and of m xi dm
// (mass), so nothing is sampled by rejection and the quantile function is
// exact.
//
//	m     mass at birth, solar masses
//	u     fraction by number of objects lighter than m, 0 .. 1
//
// It leaves out binaries (each star is counted by itself), any change of the
// mass function with metals or date, and the gap between stars and planets:
// the lower limit is a choice.
//
// Sources: [Kroupa2001], [Salpeter1955], [Chabrier2003].
package imf
