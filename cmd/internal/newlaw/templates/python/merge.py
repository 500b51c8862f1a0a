def merge(mass_1, mass_2, separation, eccentricity, p):
    """log10 of the wait, in years, until the two are one."""
    circle = 17.506696333 + 4 * log10(separation) - log10(mass_1) - log10(mass_2) - log10(mass_1 + mass_2)
    return circle + p.power * log10(1 - eccentricity * eccentricity)
