AT_ONCE = -1000.0  # log10 of a wait that is none


def wear(mass, p):
    """log10 of the mass lost in a year, solMass/yr, and the share of its
    energy that stays as heat."""
    return log10(mass) - p.lifetime, p.heat_share


def foretell(mass, p):
    """log10 of the wait, in years, until the body counts as gone: the integral
    of dM/rate. Take it off the card if there is no such formula."""
    lives = log(np.maximum(mass / p.gone, 1))
    return np.where(lives > 0, p.lifetime + log10(np.where(lives > 0, lives, 1)), AT_ONCE)
