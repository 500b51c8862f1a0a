def metals(log10_date, p):
    """Heavy elements by mass of what is born at a date."""
    since_today = np.minimum(0, log10_date - log10(1.38e10))
    return p.today * exp10(p.growth * since_today)
