"""Moments of a log-normal with a power law above one solar mass, by SciPy
quadrature of the form itself.

Arguments: low high centre width amplitude tail slope, then any number of
masses. Prints the mean, then the fractions below 0.08, 0.5, 1, 8 and 20 solar
masses by number, the same by mass, and the fractions by number below the
masses.
"""
import sys

import numpy as np
from scipy.integrate import quad

low, high, centre, width, amplitude, tail, slope = (float(x) for x in sys.argv[1:8])
masses = [float(x) for x in sys.argv[8:]]


def per_decade(x):
    if x <= 0:
        return amplitude * np.exp(-((x - np.log10(centre)) ** 2) / (2 * width**2))
    return tail * 10 ** (-(slope - 1) * x)


def integral(power, to):
    edges = [np.log10(low)] + [x for x in (-1.5, -1.0, -0.5, 0.0, 1.0) if np.log10(low) < x < np.log10(to)] + [np.log10(to)]
    f = lambda x: per_decade(x) * 10 ** (power * x)
    return sum(quad(f, p, q, epsabs=0, epsrel=1e-12)[0] for p, q in zip(edges, edges[1:]))


n, w = integral(0, high), integral(1, high)
print("%.13g" % (w / n))
marks = [0.08, 0.5, 1, 8, 20]
print(" ".join("%.13g" % (integral(0, m) / n if m > low else 0) for m in marks))
print(" ".join("%.13g" % (integral(1, m) / w if m > low else 0) for m in marks))
print(" ".join("%.13g" % (integral(0, m) / n) for m in masses))
