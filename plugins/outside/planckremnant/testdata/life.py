"""Time to come down from x least masses to one, in G2 M_r3/(alpha hbar c4).

Prints x and int_1^x y2 [(1 + sqrt(1 - 1/y2))/2]^4 dy, by mpmath's quadrature.
"""
from mpmath import linspace, mp, mpf, nstr, quad, sqrt

mp.dps = 30
loss = lambda y: y**2 * ((1 + sqrt(1 - 1 / y**2)) / 2) ** 4
for text in ["1.0000001", "1.0001", "1.01", "1.5", "2", "10", "1000", "999999", "1000001"]:
    x = mpf(text)
    # sqrt(y - 1) at the lower end: with y = 1 + v2 the integrand is smooth.
    top = sqrt(x - 1)
    knots = [0] + [top / 2**k for k in range(20, -1, -1)]
    print(text, nstr(quad(lambda v: 2 * v * loss(1 + v**2), knots), 16))
