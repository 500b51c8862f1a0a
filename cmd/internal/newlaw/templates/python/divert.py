def divert(p):
    """The share of what ejection throws out that falls to the centre."""
    return p.share
