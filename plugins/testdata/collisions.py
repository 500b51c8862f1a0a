"""How often bodies of a galaxy collide, by SciPy.

sigma = pi d^2 [1 + 2 G (m1 + m2)/(d v^2)], rate = n sigma v, n the mean
density within the half-mass radius, 3 N/(8 pi R^3).

First line: years between collisions of brown dwarfs that are heavy enough
together to burn, in a galaxy of 2e11 objects of Kroupa's masses in 10 kpc, at
200 and at 86 km/s, and the share of pairs that are.

Further lines: collisions per object founded, and those that an object meets
that stays to the end, in a galaxy of dead stars that keeps its energy as it
loses objects, for susceptibilities m^-beta: beta = 1/2 until the central hole
outweighs what is bound, beta = 0 until 1 % of the objects are left.
"""
import os

import numpy as np
from scipy.integrate import quad, solve_ivp

here = os.path.dirname(os.path.abspath(__file__))
masses = open(os.path.join(here, "contracting.py")).read().split("def left")[0]
nodes = 8  # in each piece of the mass function
exec(masses.replace("leggauss(24)", "leggauss(%d)" % nodes))  # masses of the dead: mass, n, edges

G_SUN = 1.3271244e11  # km3/s2
PARSEC = 3.0856775814913673e13  # km
YEAR = 365.25 * 86400
JUPITER, NOMINAL_SUN = 71492.0, 695700.0


def sigma(d, m, v):
    return np.pi * d * d * (1 + 2 * G_SUN * m / (d * v * v))


# Brown dwarfs: both masses on a grid of Gauss nodes, the line m1 + m2 = 0.075
# by the inner integral's limit.
def below(f, a, b):
    return quad(f, a, b, epsrel=1e-10)[0]


def kroupa(m):
    return float(number(np.array(m)))


low, limit = 0.01, 0.075
dwarfs = below(kroupa, low, limit)
everything = sum(below(kroupa, a, b) for a, b in [(low, limit), (limit, 0.08), (0.08, 0.5), (0.5, 120)])
d = 2 * 0.9 * JUPITER


def pairs(v):
    def inner(m1):
        return kroupa(m1) * below(lambda m2: kroupa(m2) * sigma(d, m1 + m2, v), max(low, limit - m1), limit)

    return quad(inner, low, limit, points=[limit - low], epsrel=1e-9)[0] / dwarfs**2


heavy = quad(lambda m1: kroupa(m1) * below(kroupa, max(low, limit - m1), limit), low, limit, points=[limit - low])[0] / dwarfs**2
objects, radius = 2e11, 1e4
density = 3 * objects / (8 * np.pi * radius**3)
share = dwarfs / everything


def between(v):
    rate = density / PARSEC**3 * v * YEAR * pairs(v)
    return 2 / (objects * share * share * rate)


print("%.6g %.6g %.6g" % (between(200), between(86), heavy))

# The dead galaxy. White dwarfs by Nauenberg's radius.
first = np.concatenate([[b <= 0.075] * nodes if b <= 8 else [False] * 2 * nodes for b in edges[1:]])
exploded = np.concatenate([[0] * nodes if b <= 8 else [1] * nodes + [2] * nodes for b in edges[1:]])
y = (1.459 / np.minimum(mass, 1.44)) ** (2 / 3)
radii = np.select([first, exploded == 1, exploded == 2], [0.9 * JUPITER, 11.5, 2.9532500765 * mass],
                  0.01125 * NOMINAL_SUN * np.sqrt(y - 1 / y))
touching = radii[:, None] + radii[None, :]
together = mass[:, None] + mass[None, :]
gravity = G_SUN / PARSEC  # pc (km/s)2
M0 = (n * mass).sum()


def collisions(beta, until):
    s = mass**-beta

    def now(c):
        w = n * np.exp(-s * c)
        return w, w.sum(), (w * mass).sum(), (w * s).sum()

    def rhs(c, _):
        w, N, M, S = now(c)
        R = radius * (M / M0) ** 2
        v = np.sqrt(0.4 * gravity * M * objects / R)
        coulomb = max(1, np.log(0.11 * N * objects))
        relaxation = 0.138 * np.sqrt(N * objects) * R**1.5 / np.sqrt(M / N * gravity) / coulomb * PARSEC / YEAR
        dt = 140 * relaxation * S / N
        one = 3 * objects / (8 * np.pi * R**3) / PARSEC**3 * v * YEAR * sigma(touching, together, v)
        total = 0.5 * (w[:, None] * w[None, :] * one).sum()
        return [total * dt, 2 * total / N * dt]

    def ends(c, _):
        w, N, M, _ = now(c)
        return until(N, M)

    ends.terminal = True
    out = solve_ivp(rhs, [0, 50], [0, 0], method="DOP853", events=ends, rtol=1e-5, atol=1e-8)
    return out.y[:, -1]


hole, falls = 4.3e6 / objects, 0.05
print("%.6g %.6g" % tuple(collisions(0.5, lambda N, M: M - hole - falls * (M0 - M))))
print("%.6g %.6g" % tuple(collisions(0.0, lambda N, M: N - 0.01)))
