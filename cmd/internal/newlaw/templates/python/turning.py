def foretell(mass, e, p):
    """log10 of the wait in years, the chance of each outcome of the card, the
    mass afterwards, and the mass that becomes gas (what is missing of it is
    radiated)."""
    return p.lifetime + log10(e), 1.0, mass, 0.0
