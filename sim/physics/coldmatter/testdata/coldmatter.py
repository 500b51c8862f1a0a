"""Times of stable matter by mpmath, 40 digits, from published formulas.

Prints lines "formula arguments log10-of-years": 0 delay of a black-dwarf
supernova on the line between its ends (mass, first, last); 1 fusion of a
lattice (Z, A, log10 S, density); 2 Dyson's time to iron (Z, A); 3 tunnelling of
a whole body (mass). Times are formed as such and their logarithm taken, where
mpmath can hold them.
"""
from mpmath import exp, log, log10, mp, mpf, pi, sqrt

mp.dps = 40
YEAR = mpf(365.25) * 86400
MU = mpf("1.66053906892e-27")
SUN = mpf("1.3271244e20") / mpf("6.67430e-11")


def show(formula, args, value):
    print(formula, *["%.17g" % float(a) for a in args], mp.nstr(value, 20))


for m in (1.16, 1.2, 1.27, 1.33, 1.35, 1.39):
    for first, last in ((1100, 32000), (250, 10000)):
        d = mpf(first) * exp((mpf("1.35") - mpf(m)) / mpf("0.19") * log(mpf(last) / first))
        show(0, (m, first, last), d)

for z, a, s in ((6, 12, 16), (8, 16, 24), (14, 28, 40)):
    for rho in (1e6, 1e8, 7.18e8, 1e10):
        lam = (mpf(rho) / (mpf("1.3574e11") * a)) ** (mpf(1) / 3) / (a * mpf(z) ** 2)
        rate = mpf(10) ** (46 + s) * mpf("3.90") * mpf(rho) * a * mpf(z) ** 4 * lam ** mpf("1.75") * exp(-mpf("2.638") / sqrt(lam))
        n = mpf(rho) / (a * MU * 1000)
        show(1, (z, a, s, rho), log10(n / (2 * rate) / YEAR))

for z, a in ((26, 56), (14, 28), (6, 12), (1, 1)):
    t = mpf("1e-21") * exp(30 * sqrt(mpf(a)) * mpf(z) ** (mpf(5) / 6))
    show(2, (z, a), log10(t / YEAR))

for m in (1e-37, 1e-9, 0.08, 0.6, 1, 1.35, 2.2):
    n = mpf(m) * SUN / MU
    s = (120 * pi**2) ** (mpf(1) / 3) * n ** (mpf(4) / 3)
    show(3, (m,), s / log(10))
