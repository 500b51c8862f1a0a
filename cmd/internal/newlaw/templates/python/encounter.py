def rate(galaxy_radius, galaxy_dispersion, p):
    """log10 of how often in a year one object meets one other that it seeks."""
    speed = 0.21094502 * galaxy_dispersion  # AU/yr
    radius = 206264.806 * galaxy_radius  # AU
    return log10(0.375) + 2 * log10(p.reach) + log10(speed) - 3 * log10(radius)


def expose():
    """How eagerly an object seeks others, and how readily it is found."""
    return 1.0, 1.0


def meet(kind_1, mass_1, composition_1, kind_2, mass_2, composition_2, words):
    """What comes of two objects: the outcome's word, up to two survivors with
    kind, mass and composition, and the mass that becomes gas."""
    hole_1 = (kind_1 == words.kind("black-hole")) | (kind_1 == words.kind("central-hole"))
    hole_2 = (kind_2 == words.kind("black-hole")) | (kind_2 == words.kind("central-hole"))
    swallowed = hole_1 | hole_2
    first = np.where(hole_1 != hole_2, hole_1, mass_1 >= mass_2)  # the first is the one that stays
    stays, goes = np.where(first, mass_1, mass_2), np.where(first, mass_2, mass_1)
    outcome = np.where(swallowed, words.outcome("swallowed"), words.outcome("torn"))
    kind, composition = np.where(first, kind_1, kind_2), np.where(first, composition_1, composition_2)
    nobody = wanelaw.NO_WORD
    return (outcome, kind, np.where(swallowed, stays + goes, stays), composition, nobody, 0.0, nobody, np.where(swallowed, 0.0, goes))
