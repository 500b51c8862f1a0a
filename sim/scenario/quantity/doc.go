// Package quantity reads and prints numbers with units.
//
// A quantity is a number and a unit, with or without a space between them:
// "10Msun", "0.6 solMass", "1e21 kg", "200 km/s", "0.3 GeV/cm3". The number
// may be far beyond the range of float64: "1e400 yr", "10^1100 yr",
// "2.5e1100 yr", "10^(10^26) yr". Its log10 is read from the decimal text, so
// 10^1100 is 1100 exactly.
//
// Units are those of the IVOA standard VOUnits (solMass, solLum, solRad, pc,
// AU, yr, eV, ..., SI prefixes, products by ".", quotients by "/", powers as
// in "cm3", "s-1", "s**-1") and the short names Msun, Lsun, Rsun, Mjup, Mearth
// and ly. A year is the Julian year of 365.25 days.
//
// An energy stands for a temperature by E = k T where a temperature is wanted,
// and for a mass by E = m c^2 where a mass is wanted; nothing else is taken
// for something that it is not.
//
// The factors are those of package constant: CODATA 2022, IAU 2012 B2, 2015 B2
// and B3, and the Julian year.
package quantity
