package stars

import "wane/sim/num"

// lifetimes is the time on the main sequence at solar composition: mass in
// solar masses, time in years. 0.8 and above: [SchallerEtAl1992], Z = 0.02.
// 0.08 and 0.10: [LaughlinEtAl1997]. 0.12 to 0.6 bridge the two and 0.075 is
// the m^-2.8 continuation: assumptions, good to 25 %.
var lifetimes = [...]struct{ mass, years float64 }{
	{0.075, 1.4e13}, {0.08, 1.2e13}, {0.10, 5.7e12}, {0.12, 3.9e12}, {0.16, 2.1e12}, {0.20, 1.4e12},
	{0.25, 9.5e11}, {0.40, 2.6e11}, {0.50, 1.3e11}, {0.60, 7.0e10}, {0.80, 2.50e10}, {0.90, 1.55e10}, {1.0, 9.96e9},
	{1.25, 4.91e9}, {1.5, 2.69e9}, {2, 1.116e9}, {3, 3.525e8}, {4, 1.647e8}, {5, 9.45e7}, {7, 4.32e7}, {9, 2.64e7},
	{12, 1.60e7}, {15, 1.158e7}, {20, 8.14e6}, {25, 6.41e6}, {40, 4.30e6}, {60, 3.45e6}, {85, 2.82e6}, {120, 2.56e6},
}

// lowMassExponent continues the table below its first mass. Assumption: it is
// the slope between the anchors 1.2e13 yr at 0.08 and 1e10 yr at 1 solar mass.
const lowMassExponent = -2.8

// Lifetimes is the table of main-sequence lifetimes with its logarithms
// taken. It never changes once made.
type Lifetimes struct {
	lnMass, lnYears [len(lifetimes)]float64
}

// NewLifetimes returns the table.
func NewLifetimes() *Lifetimes {
	l := &Lifetimes{}
	for i, row := range lifetimes {
		l.lnMass[i], l.lnYears[i] = num.Log(row.mass), num.Log(row.years)
	}
	return l
}

// MainSequence returns log10 of the years a star of mass m spends on the main
// sequence: log-log interpolation in the table; m^-2.8 below 0.075, the
// table's last slope above 120.
//
// Units: m in solar masses, result log10 years.
// Domain: m > 0; meant for 0.04 .. 150.
// Error: 25 % between 0.12 and 0.6, some per cent of the models above 0.8,
// tens of per cent below 0.08; interpolation within 2 % of the models.
// Special cases: +Inf at m = 0, NaN for m < 0.
// Sources: [SchallerEtAl1992], table of lifetimes; [LaughlinEtAl1997].
// Checked by testdata/published/stars.csv.
func (l *Lifetimes) MainSequence(m float64) float64 {
	x := num.Log(m)
	last := len(l.lnMass) - 1
	if x < l.lnMass[0] || m == 0 {
		return (l.lnYears[0] + lowMassExponent*(x-l.lnMass[0])) / num.Ln10
	}
	i := 0
	for i < last-1 && x > l.lnMass[i+1] {
		i++
	}
	slope := (l.lnYears[i+1] - l.lnYears[i]) / (l.lnMass[i+1] - l.lnMass[i])
	return (l.lnYears[i] + slope*(x-l.lnMass[i])) / num.Ln10
}

// TurnOff returns the mass of a star that leaves the main sequence at an age:
// the inverse of [Lifetimes.MainSequence].
//
// Units: log10Age in log10 years, result in solar masses.
// Domain: any age; error as the table's, divided by its slope (2 to 4).
func (l *Lifetimes) TurnOff(log10Age float64) float64 {
	y := log10Age * num.Ln10
	last := len(l.lnMass) - 1
	if y > l.lnYears[0] {
		return num.Exp(l.lnMass[0] + (y-l.lnYears[0])/lowMassExponent)
	}
	i := 0
	for i < last-1 && y < l.lnYears[i+1] {
		i++
	}
	slope := (l.lnMass[i+1] - l.lnMass[i]) / (l.lnYears[i+1] - l.lnYears[i])
	return num.Exp(l.lnMass[i] + slope*(y-l.lnYears[i]))
}

// Life returns log10 of the years from birth to remnant: the main sequence
// and, for stars that become giants, a share of it more.
//
//	t = t_MS (1 + share w),   w = 0 below 0.25, 1 above 0.5, linear in m between
//
// Stars under about 0.2 solar masses never become giants [LaughlinEtAl1997].
//
// Units: m in solar masses, share a fraction of the main-sequence lifetime
// (0.05 .. 0.15), result log10 years.
// Domain and special cases as for [Lifetimes.MainSequence].
// Error: the share is an assumption, good to half of itself.
func (l *Lifetimes) Life(m, share float64) float64 {
	return WithGiant(l.MainSequence(m), m, share)
}
