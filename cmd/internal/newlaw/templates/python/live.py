def live(mass, p):
    """log10 of a star's life, in years."""
    return p.sun - p.slope * log10(mass)
