"""Reference values of skies other than lambda-cdm, by Astropy and SciPy.

Prints lines of law,parameter,quantity,log10_date,value: ln a, log10 of the
rate (1/yr), of the horizons (light years) and of the four-volume of the past
light cone (yr^4, c = 1), without radiation.

Skies of constant w, open and of matter alone are Astropy's. Dark energy that
fades by halves from today on, and dark energy that is gone from a date on, are
integrated in time by SciPy.
"""
import numpy as np
from astropy import units as u
from astropy.cosmology import FlatLambdaCDM, FlatwCDM, LambdaCDM
from scipy.integrate import cumulative_trapezoid, quad, simpson, solve_ivp

HUBBLE, MATTER = 67.66, 0.3111
FAR = 15.0
PERYEAR = (HUBBLE * u.km / u.s / u.Mpc).to_value(1 / u.yr)


def show(law, parameter, name, date, value):
    print(f"{law},{parameter:.12g},{name},{date:.13g},{value:.12g}")


def ball(chi, bent):
    """Volume of a ball of radius chi where space has curvature -bent^2."""
    if bent == 0:
        return 4 * np.pi / 3 * chi ** 3
    y = 2 * bent * chi
    # sinh y - y loses its digits where y is small: its series there
    series = y ** 3 / 6 * (1 + y * y / 20 * (1 + y * y / 42))
    return np.pi / bent ** 3 * np.where(y < 0.05, series, np.sinh(y) - y)


def ahead_of(values, points):
    """Integral of values from each point to the last, summed from there."""
    return -cumulative_trapezoid(values[::-1], points[::-1], initial=0)[::-1]


def by_scale(law, parameter, cosmo, scales, event):
    hubble = cosmo.H0.to_value(1 / u.yr)
    bent = np.sqrt(cosmo.Ok0) * hubble if cosmo.Ok0 > 1e-9 else 0.0
    rate = lambda y: hubble * cosmo.efunc(np.expm1(-y))
    conformal = lambda y: np.exp(-y) / rate(y)
    add = lambda points: sum(quad(conformal, a, b, epsabs=0, epsrel=1e-9)[0] for a, b in zip(points, points[1:]))
    for x in scales:
        date = np.log10(cosmo.age(np.expm1(-x)).to_value(u.yr))
        show(law, parameter, "ln_a", date, x)
        show(law, parameter, "hubble", date, np.log10(rate(x)))
        show(law, parameter, "particle", date, np.log10(add([x - 60, x - 20, x - 8, x - 3, x])))
        if event:
            # from FAR on dark energy is alone: eps = 3 (1 + w)/2
            beyond = conformal(FAR) / (1 - 1.5 * (1 + parameter))
            ahead = add([y for y in (x, x + 1, x + 3, x + 6, x + 10) if y < FAR] + [FAR]) + beyond
            show(law, parameter, "event", date, np.log10(ahead) + x / np.log(10))
        grid = np.linspace(x - 25, x, 40001)
        step = grid[1] - grid[0]
        way = ahead_of(conformal(grid), grid)
        show(law, parameter, "volume", date, np.log10(simpson(np.exp(3 * grid) / rate(grid) * ball(way, bent), dx=step)))


def by_date(law, parameter, ln_a, rate, joint, dates):
    """ln_a and rate are functions of t/yr; joint is where they have a kink."""
    for date in dates:
        t = 10.0 ** date
        show(law, parameter, "ln_a", date, float(ln_a(np.array([t]))[0]))
        show(law, parameter, "hubble", date, np.log10(float(rate(np.array([t]))[0])))
        bounds = [1e3, joint, t] if joint < t else [1e3, t]
        grid = np.unique(np.concatenate([np.geomspace(a, b, 150001) for a, b in zip(bounds, bounds[1:])]))
        x = ln_a(grid)
        way = ahead_of(grid * np.exp(-x), np.log(grid))
        behind = 3 * 1e3 * np.exp(-x[0])  # before the grid a ~ t^(2/3)
        show(law, parameter, "particle", date, np.log10(way[0] + behind))
        volume = simpson(grid * np.exp(3 * x) * ball(way, 0), x=np.log(grid))
        show(law, parameter, "volume", date, np.log10(volume))


LAMBDA = PERYEAR * np.sqrt(1 - MATTER)


def lambda_ln_a(t):
    return np.log(MATTER / (1 - MATTER)) / 3 + 2 / 3 * np.log(np.sinh(1.5 * LAMBDA * t))


def rate_of(x, dark):
    return PERYEAR * np.sqrt(MATTER * np.exp(-3 * x) + dark)


def gone(decay):
    """Dark energy is gone from t = decay on: a^(3/2) grows linearly."""
    at = lambda_ln_a(decay)
    later = lambda t: 2 / 3 * np.log(np.exp(1.5 * at) + 1.5 * PERYEAR * np.sqrt(MATTER) * (t - decay))
    ln_a = lambda t: np.where(t <= decay, lambda_ln_a(np.minimum(t, decay)), later(np.maximum(t, decay)))
    rate = lambda t: rate_of(ln_a(t), np.where(t <= decay, 1 - MATTER, 0))
    return ln_a, rate


def fading(half, until):
    """Dark energy halves every half years from today on."""
    today = FlatLambdaCDM(H0=HUBBLE, Om0=MATTER, Tcmb0=0).age(0).to_value(u.yr)
    dark = lambda t: (1 - MATTER) * 0.5 ** (np.maximum(t - today, 0) / half)
    found = solve_ivp(lambda l, x: np.exp(l) * rate_of(x, dark(np.exp(l))), [np.log(today), np.log(until)], [0.0],
                      method="DOP853", rtol=1e-11, atol=1e-12, dense_output=True)
    ln_a = lambda t: np.where(t <= today, lambda_ln_a(np.minimum(t, today)), found.sol(np.log(np.maximum(t, today)))[0])
    return ln_a, lambda t: rate_of(ln_a(t), dark(t)), today


SCALES = [-4.1, -1, 0, 1.1, 4.4, 8.1]
for w in (-0.7, -0.9, -0.99):
    by_scale("w-cdm", w, FlatwCDM(H0=HUBBLE, Om0=MATTER, w0=w, Tcmb0=0), SCALES, True)
for w in (-1.01, -1.1, -1.2222222222, -1.5):  # the third lets two exponentials of the light cone coincide
    by_scale("phantom", w, FlatwCDM(H0=HUBBLE, Om0=MATTER, w0=w, Tcmb0=0), SCALES, True)
for matter in (0.2, 0.3, 0.9):
    by_scale("open", matter, LambdaCDM(H0=HUBBLE, Om0=matter, Ode0=0, Tcmb0=0), SCALES, False)
by_scale("matter-only", 47.28, FlatLambdaCDM(H0=47.28, Om0=1, Tcmb0=0), SCALES, False)
for decay in (10.5, 11.0, 12.0):
    by_date("fixed", decay, *gone(10.0 ** decay), 10.0 ** decay, [10.3, decay + 0.05, decay + 0.5, decay + 2])
for half in (10.0, 10.7, 11.0):
    ln_a, rate, today = fading(10.0 ** half, 1e15)
    by_date("decaying-dark-energy", half, ln_a, rate, today, [10.0, 10.4, 11.2, 12.1, 13.3])
