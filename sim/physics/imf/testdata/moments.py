"""Moments of a broken power law by SciPy quadrature and root finding.

Arguments: low high, then for each segment but the last "slope break", then the
last slope. Prints mean, median, and fractions below 0.08, 0.5, 1, 8 and 20
solar masses, first by number, then by mass.
"""
import sys

import numpy as np
from scipy.integrate import quad
from scipy.optimize import brentq

a = [float(x) for x in sys.argv[1:]]
low, high, rest = a[0], a[1], a[2:]
slopes, breaks = rest[0::2], rest[1::2]


def xi(m):
    """Continuous at the breaks, 1 at the first."""
    c = 1.0
    for i, b in enumerate(breaks):
        if m < b:
            return c * (m / b) ** -slopes[i] if i == 0 else c * (m / breaks[i - 1]) ** -slopes[i]
        if i > 0:
            c *= (b / breaks[i - 1]) ** -slopes[i]
    return c * (m / breaks[-1]) ** -slopes[-1]


def integral(power, to):
    edges = [low] + [b for b in breaks if low < b < to] + [to]
    f = lambda x: np.exp(x) ** (power + 1) * xi(np.exp(x))
    return sum(quad(f, np.log(p), np.log(q) - 1e-15, epsrel=1e-12)[0] for p, q in zip(edges, edges[1:]))


n, w = integral(0, high), integral(1, high)
median = brentq(lambda m: integral(0, m) / n - 0.5, low * 1.0001, high * 0.9999, xtol=1e-13)
print("%.12g %.12g" % (w / n, median))
marks = [0.08, 0.5, 1, 8, 20]
print(" ".join("%.12g" % (integral(0, m) / n if m > low else 0) for m in marks))
print(" ".join("%.12g" % (integral(1, m) / w if m > low else 0) for m in marks))
