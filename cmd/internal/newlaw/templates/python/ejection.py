def rate(founded_radius, founded_dispersion, p):
    """log10 of the clock's rate per year; the galaxy's radius in pc, its
    dispersion in km/s, and whether it stops to be a galaxy."""
    return -p.lifetime, founded_radius, founded_dispersion, 0.0


def expose():
    """How readily an object is hit: all alike."""
    return 1.0
