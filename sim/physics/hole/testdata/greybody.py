"""Power that a hole radiates in one helicity state of massless particles.

Solves the radial equation d2 psi/dr*2 = (V - w2) psi outside a hole of mass 1
(G = c = hbar = 1) from the horizon outwards with SciPy, for many frequencies
and l at once. V is Regge and Wheeler's for spin 0, 1, 2 and, for spin 1/2,
W2 + dW/dr* with W = (j + 1/2) sqrt(1 - 2/r)/r. With the transmission Gamma,

    alpha = 1/(2 pi) sum (2 j + 1) int w Gamma/(exp(8 pi w) -+ 1) dw

Prints alpha for spin 0, 1/2, 1, 2 on a line.
"""
import numpy as np
from scipy.integrate import solve_ivp

NODES, SPINS, MODES = 80, (0, 0.5, 1, 2), 5
x, wx = np.polynomial.legendre.leggauss(NODES)
omega = 0.5 * (x + 1) * 1.2  # at 1.2 the Planck factor is 1e-13
weight = wx * 0.5 * 1.2

spin = np.repeat(SPINS, MODES * NODES)
j = np.concatenate([np.repeat(s + np.arange(MODES), NODES) for s in SPINS])
w = np.tile(omega, len(SPINS) * MODES)
half = spin == 0.5
k = j + 0.5
left, right = -40.0, np.log(400.0)  # of y = ln(r/2 - 1)


def potential(y):
    r, f = 2 * (1 + np.exp(y)), 1 / (1 + np.exp(-y))
    whole = f * (j * (j + 1) / r**2 + (1 - spin**2) * 2 / r**3)
    # dW/dr* = f dW/dr = k sqrt(f) (3/r - 1)/r2
    dirac = k**2 * f / r**2 + k * np.sqrt(f) * (3 / r - 1) / r**2
    return r, np.where(half, dirac, whole)


def slope(y, v):
    psi, phi = v.reshape(2, -1)  # phi = dpsi/dr*, and dr* = r dy
    r, pot = potential(y)
    return np.concatenate([r * phi, r * (pot - w**2) * psi])


start = np.concatenate([np.ones_like(w), -1j * w])
s = solve_ivp(slope, (left, right), start.astype(complex), method="DOP853", rtol=1e-8, atol=1e-10)
psi, phi = s.y[:, -1].reshape(2, -1)
_, pot = potential(right)
# Far out the wave goes as (w2 - V)^(-1/4) exp(-+ i phase).
q = np.sqrt(np.maximum(w**2 - pot, 1e-12))
incoming = (psi + 1j * phi / q) / 2 * np.sqrt(q / w)
gamma = np.where(w**2 > pot, 1 / np.abs(incoming) ** 2, 0)
power = (2 * j + 1) * w * gamma / (np.exp(8 * np.pi * w) + np.where(half, 1, -1)) / (2 * np.pi)
per = (power * np.tile(weight, len(SPINS) * MODES)).reshape(len(SPINS), -1).sum(axis=1)
print(" ".join("%.6e" % a for a in per))
