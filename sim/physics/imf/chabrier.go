package imf

import "wane/sim/num"

// ChabrierForm is one of the mass functions that Chabrier fitted: per unit
// log10 m,
//
//	Amplitude e^(-(log10 m - log10 Centre)^2/(2 Width^2))   m <= 1
//	Tail m^-(Slope - 1)                                     m > 1
type ChabrierForm struct {
	Amplitude float64 // 1/pc^3
	Centre    float64 // solar masses
	Width     float64 // decades
	Tail      float64 // 1/pc^3
	Slope     float64 // of dN/dm above one solar mass
}

// ChabrierSingle returns the fit to single stars, those in pairs resolved:
// 0.158 (+0.051 -0.046), 0.079 (+0.021 -0.016), 0.69 (+0.05 -0.01); 0.0443,
// 1.3 +- 0.3 per unit logarithm. The two parts as printed meet at one solar
// mass to 0.5 % only and are left so.
// Source: [Chabrier2003], Table 1 and eq. 17 (from memory).
func ChabrierSingle() ChabrierForm { return ChabrierForm{0.158, 0.079, 0.69, 0.0443, 2.3} }

// ChabrierSystem returns the fit to systems: pairs that are not resolved count
// as one object.
// Source: [Chabrier2003], eq. 18 (from memory).
func ChabrierSystem() ChabrierForm { return ChabrierForm{0.086, 0.22, 0.57, 0.0443, 2.3} }

// With returns the mass function of the form with limits and with a centre,
// width and slope of the reader's. The amplitude follows centre and width so
// that the step at one solar mass stays as printed:
//
//	amplitude = Amplitude e^(-x(Centre, Width)) / e^(-x(centre, width)),  x = log10(centre)^2/(2 width^2)
//
// That is how the errors of Table 1 go together: its low and its high ends
// give 0.0440 and 0.0449 at one solar mass, against 0.0441 of the fit.
//
// Units: masses in solar masses, width in decades.
// Domain: 0 < low < 1 < high, centre and width > 0.
// Error: as the form's.
// Source: [Chabrier2003]; that the amplitude follows is an assumption. Checked
// by testdata/published/massfunctions.csv.
func (f ChabrierForm) With(low, high, centre, width, slope float64) (LogNormal, error) {
	amplitude := f.Amplitude
	if centre != f.Centre || width != f.Width {
		amplitude *= num.Exp(fall(centre, width) - fall(f.Centre, f.Width))
	}
	return NewLogNormal(low, high, centre, width, amplitude, f.Tail, slope)
}

// fall is -ln of the log-normal at one solar mass over its peak.
func fall(centre, width float64) float64 {
	x := num.Log10(centre) / width
	return x * x / 2
}
