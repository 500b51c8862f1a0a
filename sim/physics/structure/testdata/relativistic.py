"""Greatest mass of a cold dwarf of ideal electrons in general relativity.

Solves the equation of Oppenheimer & Volkoff 1939 with SciPy in ln x, x the
momentum of the electrons, which the program does not use, and prints the peak in solar masses for each mu_e on the
command line.
"""
import sys

import numpy as np
from scipy.integrate import solve_ivp
from scipy.optimize import minimize_scalar

C, H, G = 299792458.0, 6.62607015e-34, 6.67430e-11
ME, MU, GM = 9.1093837139e-31, 1.66053906892e-27, 1.3271244e20
A = np.pi * ME**4 * C**5 / (3 * H**3)


def f(x):
    return x * (2 * x * x - 3) * np.sqrt(1 + x * x) + 3 * np.arcsinh(x) if x > 0.02 else 8 / 5 * x**5 - 4 / 7 * x**7


def mass(lnx, mu):
    def eps(x):
        return 8 * np.pi / 3 * (ME * C / H) ** 3 * x**3 * mu * MU * C**2 + A * (8 * x**3 * (np.sqrt(1 + x * x) - 1) - f(x))

    def right(r, s):
        x, m = np.exp(s[0]), s[1]
        p, e = A * f(x), eps(x)
        dp = -G * (e + p) * (m + 4 * np.pi * r**3 * p / C**2) / (C**2 * r * (r - 2 * G * m / C**2))
        return [dp * np.sqrt(1 + x * x) / (8 * A * x**5), 4 * np.pi * r * r * e / C**2]

    r0 = 1e3
    done = lambda r, s: s[0] - np.log(3e-3)  # the rest of the envelope weighs nothing
    done.terminal = True
    start = [lnx, 4 / 3 * np.pi * r0**3 * eps(np.exp(lnx)) / C**2]
    s = solve_ivp(right, (r0, 1e8), start, method="DOP853", rtol=1e-10, atol=1e-10, events=done)
    return s.y[1, -1] * G / GM


for mu in map(float, sys.argv[1:]):
    best = minimize_scalar(lambda l: -mass(l, mu), bounds=(np.log(10), np.log(60)), method="bounded", options={"xatol": 1e-3})
    print("%.9g" % -best.fun)
