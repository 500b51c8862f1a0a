def end(log10_date, p):
    """log10 of the hazard that has come up until a date."""
    return log10_date - p.lifetime
