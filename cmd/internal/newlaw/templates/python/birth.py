def birth(u, p):
    """log10 of the date, in years, before which a share u of all is born."""
    first, last = exp10(p.first), exp10(p.last)
    return log10(first + u * (last - first))
