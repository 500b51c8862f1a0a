"""Reference values of an expanding background, by Astropy and SciPy.

Prints lines of quantity,radiation,ln_a,log10_date,value for the flat universe
with H0 = 67.66 km/s/Mpc, Om = 0.3111, T0 = 2.7255 K: without radiation, and
with photons. Lengths are in light years, volumes in yr^4 (c = 1).
"""
import numpy as np
from astropy import units as u
from astropy.cosmology import FlatLambdaCDM
from scipy.integrate import cumulative_trapezoid, quad, simpson

LN_A = np.array([-6, -4.1, -2.3, -1, -0.31, 0, 0.53, 1.1, 2.7, 4.4, 6.2, 8.1])


def four_volume(cosmo, hubble, x):
    """4 pi/3 int dt' a'^3 (eta - eta')^3, on a fine grid of ln a."""
    grid = np.linspace(x - 25, x, 40001)
    step = grid[1] - grid[0]
    rate = hubble * cosmo.efunc(np.expm1(-grid))
    eta = cumulative_trapezoid(np.exp(-grid) / rate, dx=step, initial=0)
    return 4 * np.pi / 3 * simpson(np.exp(3 * grid) / rate * (eta[-1] - eta) ** 3, dx=step)


for cosmo in (FlatLambdaCDM(H0=67.66, Om0=0.3111, Tcmb0=0),
              FlatLambdaCDM(H0=67.66, Om0=0.3111, Tcmb0=2.7255, Neff=0)):
    radiation = cosmo.Ogamma0
    hubble = cosmo.H0.to_value(1 / u.yr)
    for x in LN_A:
        z = np.expm1(-x)
        date = np.log10(cosmo.age(z).to_value(u.yr))

        def show(name, value):
            print(f"{name},{radiation:.12g},{x:.12g},{date:.12g},{value:.12g}")

        show("hubble", np.log10(cosmo.H(z).to_value(1 / u.yr)))
        conformal = lambda y: np.exp(-y) / cosmo.efunc(np.expm1(-y)) / hubble
        ahead = sum(quad(conformal, a, b, epsabs=0, epsrel=1e-11)[0]
                    for a, b in ((x, x + 1), (x + 1, x + 4), (x + 4, x + 12), (x + 12, x + 40)))
        behind = sum(quad(conformal, a, b, epsabs=0, epsrel=1e-11)[0]
                     for a, b in ((x - 60, x - 20), (x - 20, x - 8), (x - 8, x - 3), (x - 3, x)))
        show("event", np.log10(ahead) + x / np.log(10))
        show("particle", np.log10(behind))
        show("volume", np.log10(four_volume(cosmo, hubble, x)))
