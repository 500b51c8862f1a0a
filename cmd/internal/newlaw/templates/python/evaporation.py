def wear(mass, p):
    """log10 of the mass lost in a year, solMass/yr, and the share of its
    energy that stays as heat."""
    return -2 * log10(mass) - log10(3) - p.lifetime, 0.0


def foretell(mass, p):
    """log10 of the wait, in years, until nothing is left: the integral of
    dM/rate. Take it off the card if there is no such formula."""
    return p.lifetime + 3 * log10(mass)


def heat(mass):
    """log10 of the hole's own temperature, K: it loses mass only while the sky
    is colder."""
    return log10(6.17026e-8) - log10(mass)
