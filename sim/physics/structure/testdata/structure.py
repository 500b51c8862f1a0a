"""Zero-temperature white dwarfs of ideal electrons (Chandrasekhar 1935).

Solves (1/eta^2) d/d eta (eta^2 d phi/d eta) = -(phi^2 - 1/z0^2)^(3/2) with
SciPy and prints, for each mass in solar masses given on the command line, a
line "mass radius_km central_density_g_cm3" for mu_e = 2. Without arguments it
prints the limiting mass.
"""
import sys

import numpy as np
from scipy.integrate import solve_ivp
from scipy.optimize import brentq

C, H, G = 299792458.0, 6.62607015e-34, 6.67430e-11
ME, MU = 9.1093837139e-31, 1.66053906892e-27
SUN = 1.3271244e20 / G
A = np.pi * ME**4 * C**5 / (3 * H**3)
B = 8 * np.pi * MU * ME**3 * C**3 / (3 * H**3) * 2.0  # mu_e = 2


def dwarf(z0):
    """Mass (solar masses), radius (km), central density (g/cm3)."""
    q = 1 / z0**2

    def right(eta, y):
        phi, w = y  # w = eta^2 phi'
        return [w / eta**2, -(eta**2) * max(phi**2 - q, 0.0) ** 1.5]

    def surface(eta, y):
        return y[0] - 1 / z0

    surface.terminal, surface.direction = True, -1
    e = 1e-4
    c = (1 - q) ** 1.5
    start = [1 - c * e**2 / 6, -c * e**3 / 3]
    s = solve_ivp(right, (e, 100), start, method="DOP853", rtol=1e-12, atol=1e-14, events=surface)
    eta, (phi, w) = s.t_events[0][0], s.y_events[0][0]
    length = np.sqrt(2 * A / (np.pi * G)) / (B * z0)
    mass = -4 * np.pi * (2 * A / (np.pi * G)) ** 1.5 / B**2 * w
    density = B * (z0**2 - 1) ** 1.5
    return mass / SUN, length * eta / 1e3, density / 1e3


def of_mass(m):
    f = lambda lnx: dwarf(np.sqrt(1 + np.exp(2 * lnx)))[0] - m
    lnx = brentq(f, np.log(1e-2), np.log(100), xtol=1e-11)
    return dwarf(np.sqrt(1 + np.exp(2 * lnx)))


def limit():
    """n = 3 polytrope: w1 = 2.01823595..., here by the same equation with q = 0."""
    surface = lambda eta, y: y[0]
    surface.terminal, surface.direction = True, -1
    right = lambda eta, y: [y[1] / eta**2, -(eta**2) * max(y[0], 0.0) ** 3]
    s = solve_ivp(right, (1e-4, 100), [1 - 1e-8 / 6, -1e-12 / 3], method="DOP853", rtol=1e-12, atol=1e-14, events=surface)
    return -4 * np.pi * (2 * A / (np.pi * G)) ** 1.5 / B**2 * s.y_events[0][0][1] / SUN


if len(sys.argv) == 1:
    print("%.9g" % limit())
for a in sys.argv[1:]:
    m = float(a)
    _, r, rho = of_mass(m)
    print("%.9g %.9g %.9g" % (m, r, rho))
