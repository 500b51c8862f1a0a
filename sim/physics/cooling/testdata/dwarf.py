"""Cooling of white dwarfs and neutron stars, integrated by SciPy.

dwarf.py white-dwarf MASS RADIUS_KM Z A Q T...: log10 years from 3e4 K to each
T for a dwarf of ideal electrons and a Debye crystal of ions (density 2.2 times
the mean), behind T_c/T = r (T/5000)^1/7 above 5000 K and 1 + (r-1)(T/5000)^q
below, r = 1010 [(R/8841)^2 0.6/M]^2/7; no latent heat, no background.

dwarf.py neutron-star T...: log10 years from 3e7 K to each T by minimal cooling.
"""
import sys

import numpy as np
from scipy.integrate import quad

K, HBAR, C, SIGMA = 1.380649e-23, 6.62607015e-34 / 2 / np.pi, 299792458.0, 5.670374419e-8
ME, MU, G, SUN = 9.1093837139e-31, 1.66053906892e-27, 6.67430e-11, 1.3271244e20 / 6.67430e-11
E2 = (1.602176634e-19) ** 2 / (4 * np.pi * 8.8541878188e-12)
YEAR = 365.25 * 86400


def years(rate, high, low):
    """rate(T) = -dt/d ln T in s."""
    edges = np.linspace(np.log(low), np.log(high), 60)
    edges = np.unique(np.append(edges, np.clip(np.log(5000), edges[0], edges[-1])))  # a kink
    f = lambda x: rate(np.exp(x))
    return sum(quad(f, a, b, epsrel=1e-9)[0] for a, b in zip(edges, edges[1:])) / YEAR


def debye(x):
    if x > 60:
        return 4 * np.pi**4 / 5 / x**3
    return 3 / x**3 * quad(lambda y: y**4 * np.exp(-y) / np.expm1(-y) ** 2, 0, x, epsrel=1e-10)[0]


def white_dwarf(mass, radius, z, a, q):
    r = radius * 1e3
    rho = 2.2 * mass * SUN / (4 / 3 * np.pi * r**3)
    n = rho / (a * MU)
    theta = 0.45 * HBAR / K * np.sqrt(4 * np.pi * n * z**2 * E2 / (a * MU))
    x = HBAR * (3 * np.pi**2 * n * z) ** (1 / 3) / (ME * C)
    r0 = 1010 * ((radius / 8841) ** 2 * 0.6 / mass) ** (2 / 7)
    ions = mass * SUN / (a * MU)

    def core(t):
        return t * r0 * (t / 5000) ** (1 / 7) if t > 5000 else t * (1 + (r0 - 1) * (t / 5000) ** q)

    def rate(t):
        tc, h = core(t), 1e-5 if t < 5000 else -1e-5
        slope = (core(t * np.exp(-2 * h)) - 4 * core(t * np.exp(-h)) + 3 * tc) / (2 * h)
        heat = 3 * K * debye(theta / tc) + z * np.pi**2 * K**2 * tc * np.sqrt(1 + x**2) / (ME * C**2 * x**2)
        return ions * heat * slope / (4 * np.pi * r**2 * SIGMA * t**4)

    return rate


def neutron_star():
    r = 11.5e3

    def inner(t):
        return max(t, 1.288e8 * ((t / 1e6) ** 4 / 1.755) ** 0.455)

    def rate(t):
        tb, h = inner(t), 1e-5
        slope = (inner(t * np.exp(h)) - inner(t * np.exp(-h))) / (2 * h)
        return 1e32 * (tb / 1e9) * slope / (1e33 * (tb / 1e9) ** 8 + 4 * np.pi * r**2 * SIGMA * t**4)

    return rate


if sys.argv[1] == "white-dwarf":
    rate, start, temperatures = white_dwarf(*map(float, sys.argv[2:7])), 3e4, sys.argv[7:]
else:
    rate, start, temperatures = neutron_star(), 3e7, sys.argv[2:]
total, high = 0.0, start
for t in temperatures:
    total += years(rate, high, float(t))
    high = float(t)
    print("%.9g" % np.log10(total))
