"""exp, log, exp10, log10 and power with the same bits everywhere.

numpy's own differ in the last bit between processors and versions. These use
only operations that IEEE 754 rounds one way, in the order in which the host's
own (package num) use them, and agree with those to the bit. A law that uses
them, + - * / and square roots, and the host's draws, may leave its card's
tolerance at 0.

Each takes an array or a number and returns doubles of the same shape. Errors:
under 0.53 ulp where the result is normal, under 1 ulp where it is not.

Sources: Tang (1989, 1990), ACM Trans. Math. Softw. 15, 144 and 16, 378.
"""

import numpy as np

from . import exact_tables

_hex = float.fromhex


def _table(text):
    return [line.split() for line in text.split("\n") if line]


def _column(rows, i):
    return np.array([_hex(r[i]) for r in rows])


_E = _table(exact_tables.EXP)
_EXP_BITS, _EXP_REST = np.array([int(r[0], 16) for r in _E], dtype=np.uint64), _column(_E, 1)


class _Base:
    """The table of one base of logarithms."""

    def __init__(self, text, two):
        rows = _table(text)
        self.inverse, self.high, self.low = _column(rows, 0), _column(rows, 1), _column(rows, 2)
        self.two_high, self.two_low = _hex(two[0]), _hex(two[1])


_LN, _TEN = _Base(exact_tables.LOG, exact_tables.LOG_TWO), _Base(exact_tables.LOG10, exact_tables.LOG10_TWO)

_BLOCK = 4096  # rows at once: their intermediate results then stay in the cache

_SHIFT = _hex("0x1.8p52")  # added and taken away, it rounds to an integer that meanwhile stands in the low bits

# Steps of 1/128 of a doubling per unit, and one step in two parts.
_E_STEPS = (_hex("0x1.71547652b82fep+7"), _hex("0x1.62e42fef80000p-8"), _hex("0x1.1cf79abc9e3b4p-43"))
_TEN_STEPS = (_hex("0x1.a934f0979a371p+8"), _hex("0x1.3441350980000p-9"), _hex("0x1.de7fbcc47c4adp-43"))

# (ln 10)^n / n!
_C1, _C2, _C3, _C4, _C5 = [_hex(h) for h in (
    "0x1.26bb1bbb55516p+1", "0x1.53524c73cea69p+1", "0x1.0470591de2ca4p+1", "0x1.2bd7609fd98c4p+0", "0x1.1429ffd1d4d76p-1")]

# log10 e, and in two parts.
_LOG10E, _LOG10E_HIGH, _LOG10E_LOW = _hex("0x1.bcb7b1526e50ep-2"), _hex("0x1.bcb7b10000000p-2"), _hex("0x1.49b9438ca9aaep-28")


def exp(x):
    """e^x."""
    return _in_blocks(lambda b: _powers(b, _E_STEPS, _e_series, 700, 710, -746), x)


def exp10(x):
    """10^x; of an integer exact, where a double holds it."""
    return _in_blocks(lambda b: _powers(b, _TEN_STEPS, _ten_series, 304, 309, -324), x)


def log(x):
    """ln x; -inf at 0, NaN below."""
    return _in_blocks(lambda b: _logarithm(b, _LN, False), x)


def log10(x):
    """log10 x; -inf at 0, NaN below. Of 10^n exactly n."""
    return _in_blocks(lambda b: _logarithm(b, _TEN, True), x)


def power(x, y):
    """x^y for x >= 0; NaN for x < 0. Exact where it is a double."""
    return _in_blocks(_any_power, x, y)


def _in_blocks(f, *arguments):
    """f of flat doubles, block by block, in the shape of the arguments."""
    arrays = [np.asarray(a, dtype=np.float64) for a in arguments]
    if len(arrays) > 1:
        arrays = np.broadcast_arrays(*arrays)
    shape, flat = arrays[0].shape, [np.ascontiguousarray(a).reshape(-1) for a in arrays]
    with np.errstate(all="ignore"):
        if flat[0].size <= _BLOCK:
            return f(*flat).reshape(shape)[()]
        out = np.empty(flat[0].size)
        for i in range(0, out.size, _BLOCK):
            out[i:i + _BLOCK] = f(*[a[i:i + _BLOCK] for a in flat])
    return out.reshape(shape)


def _any_power(x, y):
    plain = (x > 0) & (x < np.inf) & (np.abs(y) < np.inf)
    if plain.all():
        out = _power(x, y)
    else:
        out = _power(np.where(plain, x, 1.0), np.where(plain, y, 0.0))
        ends = np.where((x > 1) == (y > 0), np.inf, 0.0)  # x or y is 0 or infinite
        out = np.where(plain, out, np.where(x >= 0, ends, np.nan))
        out[np.isnan(y)] = np.nan
    out[(y == 0) | (x == 1)] = 1
    return out


def _powers(x, steps, series, greatest, over, under):
    size = np.abs(x)
    near = (size >= 2.0**-60) & (size < greatest)
    if near.all():
        k, r = _reduce(x, steps)
        return _scaled(k, series(r))
    k, r = _reduce(np.where(near, x, 0.0), steps)
    out = _scaled(k, series(r))
    f = x[~near]
    k, r = _reduce(np.where((f <= over) & (f >= under), f, 0.0), steps)
    y = _scaled_far(k, series(r))
    y = np.where(f > over, np.inf, np.where(f < under, 0.0, y))
    y = np.where(np.abs(f) < 2.0**-60, 1 + f, y)
    out[~near] = np.where(np.isnan(f), f, y)
    return out


def _reduce(x, steps):
    """x = k steps + r; k counts in two's complement."""
    per, high, low = steps
    shifted = x * per + _SHIFT
    n = shifted - _SHIFT
    return shifted.view(np.uint64), x - n * high - n * low


def _e_series(r):
    """e^r - 1."""
    r2 = r * r
    return r + (r2 * (0.5 + r * (1.0 / 6)) + (r2 * r2) * (1.0 / 24 + r * (1.0 / 120)))


def _ten_series(r):
    """10^r - 1."""
    r2 = r * r
    return r * _C1 + (r2 * (_C2 + r * _C3) + (r2 * r2) * (_C4 + r * _C5))


def _scaled(k, p):
    """2^(k/128) (1 + p) for a normal result."""
    i = (k & np.uint64(127)).view(np.int64)
    s = (_EXP_BITS[i] + (k << np.uint64(45))).view(np.float64)
    return s + s * (_EXP_REST[i] + p)


def _scaled_far(k, p):
    """_scaled where the result may overflow or be subnormal."""
    shift = np.uint64(512 << 7)
    small = (k << np.uint64(13)).view(np.int64) < 0
    return np.where(small, _scaled(k + shift, p) * 2.0**-512, _scaled(k - shift, p) * 2.0**512)


def _logarithm(x, base, ten):
    normal = (x >= 2.0**-1022) & (x < np.inf)
    if normal.all():
        return _log_normal(x, 0.0, base, ten)
    out = _log_normal(np.where(normal, x, 1.0), 0.0, base, ten)
    f = x[~normal]
    y = _log_normal(np.where((f > 0) & (f < np.inf), f * 2.0**54, 1.0), -54.0, base, ten)
    out[~normal] = np.where(f == 0, -np.inf, np.where(f < 0, np.nan, np.where(f < np.inf, y, f)))
    return out


_OFFSET = np.uint64(0x3FE6000000000000 - (1 << 44))
_EXPONENT = np.uint64(0xFFF << 52)
_HIGH = np.uint64((1 << 64) - 1 - ((1 << 29) - 1))


def _split(x):
    """A normal number as 2^k z, and z in two parts; the interval of z."""
    bits = x.view(np.uint64)
    since = bits - _OFFSET
    z = bits - (since & _EXPONENT)
    high = (z & _HIGH).view(np.float64)
    k = (since.view(np.int64) >> np.int64(52)).astype(np.float64)
    return k, ((since >> np.uint64(45)) & np.uint64(127)).view(np.int64), high, z.view(np.float64) - high


def _log_normal(x, exponent, base, ten):
    k, i, z_high, z_low = _split(x)
    if exponent:
        k = k + exponent
    inverse = base.inverse[i]
    a, b = z_high * inverse - 1, z_low * inverse
    w = k * base.two_high + base.high[i]
    rest = k * base.two_low + base.low[i]
    if ten:
        small = (b + _log_series(a + b)) * _LOG10E + (a * _LOG10E_LOW + rest)
        a = a * _LOG10E_HIGH
    else:
        small = _log_series(a + b) + (b + rest)
    total = w + a
    return total + (((w - total) + a) + small)


def _log_series(r):
    """ln(1 + r) - r."""
    r2 = r * r
    return r2 * ((-1.0 / 2 + r * (1.0 / 3)) + r2 * ((-1.0 / 4 + r * (1.0 / 5)) + r2 * (-1.0 / 6 + r * (1.0 / 7))))


def _two_sum(a, b):
    """a + b rounded, and what the rounding lost."""
    total = a + b
    back = total - a
    return total, (a - (total - back)) + (b - back)


def _log_wide(x):
    """ln of positive numbers in two parts."""
    tiny = x < 2.0**-1022
    k, i, z_high, z_low = _split(np.where(tiny, x * 2.0**54, x))
    k = k + np.where(tiny, -54.0, 0.0)
    inverse = _LN.inverse[i]
    a, b = z_high * inverse - 1, z_low * inverse
    s0 = k * _LN.two_high + _LN.high[i]
    s1 = s0 + a
    lost1 = (s0 - s1) + a
    s2, lost2 = _two_sum(s1, (a * a) * -0.5)
    s3, lost3 = _two_sum(s2, b)
    r = a + b
    p = 1.0 / 9
    for c in (-1.0 / 8, 1.0 / 7, -1.0 / 6, 1.0 / 5, -1.0 / 4, 1.0 / 3):
        p = c + r * p
    cubic = ((r * r) * r) * p
    small = (lost1 + lost2 + lost3) + (k * _LN.two_low + _LN.low[i]) + (cubic - b * (a + b / 2))
    high = s3 + small
    return high, (s3 - high) + small


def _upper_half(x):
    return (np.ascontiguousarray(x).view(np.uint64) & np.uint64((1 << 64) - (1 << 27))).view(np.float64)


def _power(x, y):
    """x^y for finite x > 0 and finite y."""
    high, low = _log_wide(x)
    p = y * high
    y_high, h_high = _upper_half(y), _upper_half(high)
    main = y_high * h_high
    rest = y_high * ((high - h_high) + low) + (y - y_high) * (high + low)
    e = main + rest
    inside = (p <= 710) & (p >= -746)
    e = np.where(inside, e, 0.0)
    k, r = _reduce(e, _E_STEPS)
    series = _e_series(r + ((main - e) + rest))
    out = np.where(np.abs(e) < 700, _scaled(k, series), _scaled_far(k, series))
    out = np.where(np.abs(p) < 2.0**-60, 1 + p, out)
    return np.where(p > 710, np.inf, np.where(p < -746, 0.0, out))
