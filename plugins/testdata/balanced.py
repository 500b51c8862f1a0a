"""Evaporation of the default galaxy, kept in balance by heat from within.

The objects of contracting.py, 2e11 of them within 10 kpc, with the Coulomb
logarithm ln(0.11 N) and R = R0 (M/M0)^2 exp(0.1 C), C = int dt/t_rh. Prints
log10 of the years to half and the share of objects left after 1e37 yr.
"""
import contextlib
import io

import numpy as np

with contextlib.redirect_stdout(io.StringIO()):
    from contracting import left, mass, n, s, total

N0, R0, XI, ZETA, GAMMA = 2e11, 1e4, 1 / 140, 0.1, 0.11
PC, YEAR = 3.0856775814913673e16, 31557600.0
G = 1.3271244e20 / PC * 1e-6

c = np.linspace(0, 8, 80001)
middle, step = 0.5 * (c[1:] + c[:-1]), c[1] - c[0]
now = n * np.exp(-np.outer(middle, s))
count, weight, lost = now.sum(1), (now * mass).sum(1), (now * s).sum(1)
clock = step * lost / count / XI  # dC
C = np.cumsum(clock) - clock / 2
R = R0 * (weight / total) ** 2 * np.exp(ZETA * C)
N, M = N0 * count, N0 * weight
trh = 0.138 * np.sqrt(N) * R**1.5 / np.sqrt(M / N * G) / np.log(GAMMA * N) * (PC / 1e3 / YEAR)
t = np.log10(np.cumsum(clock * trh))
share = np.array([left(x) for x in c[1::100]])
print("%.6f %.6f" % (np.interp(-0.5, -share, t[::100]), np.interp(37, t[::100], share)))
