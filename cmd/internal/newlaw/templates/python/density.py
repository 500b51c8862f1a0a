def density(ln_a, log10_since, p):
    """log10 of dark energy over today's critical density, and curvature."""
    dark = log10(1 - p.matter - p.radiation) - 3 * (1 + p.w) * ln_a / log(10)
    return np.where(log10_since > -np.inf, -np.inf, dark), 0.0
