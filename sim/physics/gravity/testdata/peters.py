"""Shortening F(e) of Peters 1964, eq. 5.14, by mpmath in 40 digits.

Integrated in x itself, as printed, with the pole at x = 1 approached in
panels that halve the distance.
"""
import sys
from mpmath import mp, mpf, quad

mp.dps = 40


def shortening(e):
    g = e ** (mpf(12) / 19) * (1 + 121 * e**2 / 304) ** (mpf(870) / 2299) / (1 - e**2)
    edges, gap = [mpf(0)], mpf("0.5")
    while 1 - gap < e:
        edges.append(1 - gap)
        gap /= 2
    edges.append(e)
    f = lambda x: x ** (mpf(29) / 19) * (1 + 121 * x**2 / 304) ** (mpf(1181) / 2299) * (1 - x**2) ** mpf("-1.5")
    if e < mpf("0.01"):  # x = e y, in units of e^(48/19): quad's tolerance is absolute
        integral = quad(lambda y: f(e * y) / e ** (mpf(29) / 19), [0, 1]) * e ** (mpf(48) / 19)
    else:
        integral = quad(f, edges)
    return mpf(48) / 19 * integral / g**4


for text in sys.argv[1:]:
    print(mp.nstr(shortening(mpf(float(text))), 20))
