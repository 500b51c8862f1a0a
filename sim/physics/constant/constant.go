// Package constant holds the constants of nature and the units that formulas
// convert with, in SI unless the name says otherwise.
//
// Whenever only G times a solar mass enters, use GMSun: the error of G then
// drops out. A result that contains a mass alone inherits G's 2.2e-5.
//
// Sources: CODATA 2022 (exact values, G, masses of particles); IAU 2012 B2
// and 2015 B2, B3 (astronomical unit, parsec, nominal Sun); the year is Julian.
package constant

// Exact by definition of the SI.
const (
	C               = 299792458.0                  // speed of light, m/s
	Planck          = 6.62607015e-34               // h, J s
	HBar            = 1.0545718176461563912624e-34 // h / 2 pi, J s
	Boltzmann       = 1.380649e-23                 // k, J/K
	ElementCharge   = 1.602176634e-19              // e, C; also one eV in J
	Avogadro        = 6.02214076e23                // 1/mol
	StefanBoltzmann = 5.670374419e-8               // sigma, W/(m2 K4), to 10 digits
	Radiation       = 4 * StefanBoltzmann / C      // a, J/(m3 K4)
)

// Measured, CODATA 2022.
const (
	G            = 6.67430e-11       // m3/(kg s2), relative error 2.2e-5
	AtomicMass   = 1.66053906892e-27 // m_u, kg
	ProtonMass   = 1.67262192595e-27 // kg
	NeutronMass  = 1.67492750056e-27 // kg
	ElectronMass = 9.1093837139e-31  // kg
)

// Units of astronomy.
const (
	Year    = 365.25 * 86400        // Julian year, s
	AU      = 149597870700.0        // m
	Parsec  = 3.0856775814913673e16 // 648000/pi AU, m
	GMSun   = 1.3271244e20          // nominal solar mass parameter, m3/s2
	Sun     = GMSun / G             // solar mass, kg: 1.98841e30
	SunL    = 3.828e26              // nominal solar luminosity, W
	SunR    = 6.957e8               // nominal solar radius, m
	GMEarth = 3.986004e14           // nominal, m3/s2
	GMJup   = 1.2668653e17          // nominal, m3/s2
	EV      = ElementCharge         // J
)

// Logarithms to base 10 of what formulas on logarithms need often.
const (
	Log10Year = 7.499103967085227667 // log10 of the seconds in a year
	Euler     = 0.57721566490153286060651209008240243
)
