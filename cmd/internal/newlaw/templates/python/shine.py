def shine(log10_age, p):
    """log10 of the temperature, K, of an object of this age in years."""
    return np.minimum(log10(p.at_birth), log10(p.at_1_gyr) - p.slope * (log10_age - 9))
