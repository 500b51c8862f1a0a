"""The sky by date, by Astropy and SciPy: lambda-cdm with the Planck 2018
numbers H0 = 67.66 km/s/Mpc, Om = 0.3111, T0 = 2.7255 K (Planck Collaboration VI
2020, table 2), without radiation and with photons.

Prints lines of numbers: radiation, then log10 of date (yr), scale factor,
expansion rate (km/s/Mpc), temperatures of the relic sky, of the horizon and of
both (K), event horizon, Hubble radius, particle horizon, visible limit (lyr);
0 for -inf. The last line of each has the special dates instead: today, relic
sky as cold as the horizon, holes of 1, 10, 4.3e6 and 1e9 Msun.
"""
import numpy as np
from astropy import constants as c
from astropy import units as u
from astropy.cosmology import FlatLambdaCDM
from scipy.integrate import quad

LN_A = np.array([-4.2, -2.4, -1, -0.31, 0, 0.53, 1.1, 2.7, 4.4, 8.1, 20, 45, 66, 70])


def ahead(cosmo, x):
    """Comoving distance of light sent at ln a = x and received at the end."""
    way = lambda y: np.exp(-y) / cosmo.efunc(np.expm1(-y))
    return sum(quad(way, x + i, x + j, epsabs=0, epsrel=1e-11)[0] for i, j in ((0, 1), (1, 4), (4, 12), (12, 40)))


def behind(cosmo, x):
    way = lambda y: np.exp(-y) / cosmo.efunc(np.expm1(-y))
    parts = (x - 60, x - 20, x - 8, x - 3, x) if x < 9 else (-60, -20, -8, -3, 0, 3, 8, 20, min(x, 60))
    return sum(quad(way, i, j, epsabs=0, epsrel=1e-11)[0] for i, j in zip(parts, parts[1:]))


def log_date(cosmo, x):
    """Astropy's age; beyond ln a = 8, where H is constant, by a = exp(H t)."""
    late = max(x - 8, 0)
    z = np.expm1(-(x - late))
    return np.log10((cosmo.age(z) + late / cosmo.H(z)).to_value(u.yr))


for cosmo in (FlatLambdaCDM(H0=67.66, Om0=0.3111, Tcmb0=0),
              FlatLambdaCDM(H0=67.66, Om0=0.3111, Tcmb0=2.7255, Neff=0)):
    radiation = cosmo.Ogamma0
    length = np.log10((c.c / cosmo.H0).to_value(u.lyr))
    for x in LN_A:
        late = np.expm1(-min(x, 40))
        rate = cosmo.H(late)
        relic = np.log10(2.7255) - x / np.log(10)
        horizon = np.log10((c.hbar * rate / (2 * np.pi * c.k_B)).to_value(u.K))
        # space accelerates where matter and radiation pull less than dark energy pushes
        warm = cosmo.Om(late) + 2 * cosmo.Ogamma(late) < 2 * cosmo.Ode(late)
        felt = np.log10(10 ** (4 * (relic - horizon)) + 1) / 4 + horizon if warm else relic
        event = np.log10(ahead(cosmo, min(x, 20))) + min(x, 20) / np.log(10)
        limit = behind(cosmo, 0) + ahead(cosmo, 0)
        print(radiation, log_date(cosmo, x), x / np.log(10), np.log10(rate.to_value("km/(s Mpc)")), relic,
              horizon if warm else 0, felt, event + length, np.log10((c.c / rate).to_value(u.lyr)),
              np.log10(behind(cosmo, x)) + length, np.log10(limit) + length)
    end = (c.hbar * cosmo.H(np.expm1(-40.0)) / (2 * np.pi * c.k_B)).to_value(u.K)
    holes = [(c.hbar * c.c ** 3 / (8 * np.pi * c.GM_sun * m * c.k_B)).to_value(u.K) for m in (1, 10, 4.3e6, 1e9)]
    print(radiation, *(log_date(cosmo, np.log(2.7255 / t)) for t in [2.7255, end] + holes))
