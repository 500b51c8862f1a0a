"""Share of births before given times in a galaxy with infall, by SciPy's
eighth-order Runge-Kutta on the gas and the births themselves.

Arguments: k n J, then times in units of the infall time, rising. Solves
y' = -k e^((n-1) y) + J e^(-x-y) for y = ln g and b' = e^(n y), and prints b at
each time over b at the last.
"""
import sys

import numpy as np
from scipy.integrate import solve_ivp

k, n, j = (float(x) for x in sys.argv[1:4])
times = np.array([float(x) for x in sys.argv[4:]])


def slope(x, state):
    y = state[0]
    return [-k * np.exp((n - 1) * y) + j * np.exp(-x - y), np.exp(n * y)]


s = solve_ivp(slope, (0, times[-1]), [0.0, 0.0], method="DOP853", t_eval=times, rtol=1e-12, atol=1e-14)
assert s.success, s.message
print(" ".join("%.14g" % x for x in s.y[1] / s.y[1][-1]))
