"""Life of a black hole of each mass given (solar masses), log10 of years.

t = G^2/(hbar c^4) int_0^m x^2 dx / alpha(x), by mpmath in 30 digits, with the
constants and grey-body values written here again.
"""
import sys
from mpmath import mp, mpf, pi, quad, exp, log10, sqrt

mp.dps = 30
c, k, e = mpf(299792458), mpf("1.380649e-23"), mpf("1.602176634e-19")
hbar = mpf("6.62607015e-34") / (2 * pi)
G, GM, yr = mpf("6.67430e-11"), mpf("1.3271244e20"), mpf(31557600)
kT = hbar * c**3 / (8 * pi * GM * e)  # eV at one solar mass

half, scalar = mpf("4.0917e-5"), mpf("7.438e-5")
always = 2 * mpf("1.6819e-5") + 2 * mpf("1.9185e-6")
nu = mpf("1e-3")
massive = [  # alpha, b, rest energy in eV
    (2 * half, mpf("0.221"), nu),
    (2 * half, mpf("0.221"), sqrt(nu**2 + mpf("7.5e-5"))),
    (2 * half, mpf("0.221"), sqrt(nu**2 + mpf("2.5e-3"))),
    (4 * half, mpf("0.221"), mpf("510998.95")),
    (4 * half, mpf("0.221"), mpf("105.6583755e6")),
    (2 * scalar, mpf("0.376"), mpf("139.57039e6")),
    (1 * scalar, mpf("0.376"), mpf("134.9768e6")),
]


def alpha(m):
    return always + sum(a * exp(-m * b * ev / kT) for a, b, ev in massive)


for text in sys.argv[1:]:
    m = mpf(text)
    # With x = m e^-y, so that the integral is of order 1/alpha: quad's
    # tolerance is absolute.
    integral = quad(lambda y: exp(-3 * y) / alpha(m * exp(-y)), range(31))
    print(mp.nstr(log10(integral * m**3 * (GM / G) ** 3 * G**2 / (hbar * c**4) / yr), 20))
