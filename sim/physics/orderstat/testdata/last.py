"""First and last of n exponential lives, by mpmath (40 digits) and SciPy.

Lines: what, n, chance, value.
"""
from mpmath import mp, mpf, harmonic, log, expm1
from scipy.stats import gumbel_r

mp.dps = 40
for n in ["1", "2", "3", "10", "31", "32", "33", "34", "100", "1e5", "1e11", "2e11", "1e57"]:
    print("mean", n, 1, mp.nstr(harmonic(mpf(n)), 20))
for n in ["1", "2", "10", "1e5", "1e11", "1e57"]:
    for q in ["0.05", "0.5", "0.95"]:
        # float(q): the same double that the formula is given.
        print("quantile", n, q, mp.nstr(-log(-expm1(log(mpf(float(q))) / mpf(n))), 20))
for n in ["1e5", "1e11", "1e57"]:
    for q in ["0.05", "0.5", "0.95"]:
        print("gumbel", n, q, repr(float(gumbel_r.ppf(float(q), loc=float(log(mpf(n)))))))
