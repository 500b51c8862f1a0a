"""Evaporation of a galaxy of dead stars that keeps its energy.

Objects: Kroupa's mass function from 0.01 to 120 solar masses; below 0.075 a
body keeps its mass, a star below 0.5315 too; to 8 it leaves a white dwarf by
Cummings et al. 2018, above a neutron star of 1.36 or a hole by Raithel et al.
2018 (f = 0.9). Susceptibility m^-1/2, constant Coulomb logarithm, a share of
1/140 lost per relaxation time, R ~ M^2:

    dN_i/dc = -s_i N_i,  dt/t_rh0 = dc 140 <s> sqrt(N/<m>) R^1.5 / (the same at the start)

Prints the mean mass, and the times in t_rh0 at which half are gone and at
which all are, by SciPy's quadrature.
"""
import numpy as np
from scipy.integrate import quad
from scipy.optimize import brentq

edges = [0.01, 0.075, 0.08, 0.5, 0.5315, 2.85, 3.6, 8, 15, 17.8, 18.5, 21.7, 25.2, 27.5, 40, 45, 60, 120]
x, wx = np.polynomial.legendre.leggauss(24)


def number(m):
    return np.where(m < 0.08, (m / 0.08) ** -0.3, np.where(m < 0.5, (m / 0.08) ** -1.3, (0.5 / 0.08) ** -1.3 * (m / 0.5) ** -2.3))


def dwarf(m):
    return np.where(m < 0.5315, m, np.where(m < 2.85, 0.080 * m + 0.489, np.where(m < 3.6, 0.187 * m + 0.184, 0.107 * m + 0.471)))


def hole(m):
    def low(m):
        y = m - 25.97
        return 0.9 * (-2.049 + 0.4140 * m) + 0.1 * (15.52 - 0.3294 * y - 0.02121 * y**2 + 0.003120 * y**3)

    def high(m):
        return 5.697 + 7.8598e8 * m**-4.858

    return np.where(m < 40, low(m), np.where(m < 45, (45 - m) / 5 * low(40) + (m - 40) / 5 * high(45), high(m)))


def survives(m):
    """Share of neutron stars."""
    return np.select([m < 15, m < 17.8, m < 18.5, m < 21.7, m < 25.2, m < 27.5, m < 60], [1, 0.679, 0.833, 0.5, 0, 0.652, 0], 0.4)


mass, n = [], []
for a, b in zip(edges, edges[1:]):
    lnm = 0.5 * (np.log(a) + np.log(b) + x * np.log(b / a))
    m = np.exp(lnm)
    count = number(m) * m * wx * 0.5 * np.log(b / a)
    if b <= 8:
        mass.append(dwarf(m)), n.append(count)
    else:
        s = survives(m)
        mass.append(np.full_like(m, 1.36)), n.append(count * s)
        mass.append(hole(m)), n.append(count * (1 - s))
mass, n = np.concatenate(mass), np.concatenate(n)
n /= n.sum()
s = mass**-0.5
total = (n * mass).sum()


def left(c):
    return (n * np.exp(-s * c)).sum()


def speed(c):
    """dt/dc in initial relaxation times."""
    now = n * np.exp(-s * c)
    count, m = now.sum(), (now * mass).sum()
    clock = count / np.sqrt(m) * (m / total) ** 3 * np.sqrt(total)
    return 140 * clock * (now * s).sum() / count


half = brentq(lambda c: left(c) - 0.5, 0, 10)
points = [0.1, 0.3, 1, 3, 10, 30]
first = quad(speed, 0, half, limit=200, epsrel=1e-10)[0]
print("%.6f %.6f %.6f" % (total, first, quad(speed, 0, 200, limit=500, points=points, epsrel=1e-10)[0]))
