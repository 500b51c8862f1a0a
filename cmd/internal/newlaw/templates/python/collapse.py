def die(mass, p):
    """The chance of each kind that the card names, in its order."""
    hole = np.where(mass < p.hole, 0.0, 1.0)
    return 1 - hole, hole


def remain(kind, mass, p, words):
    """What the star leaves: its mass and what it is made of."""
    hole = kind == words.kind("black-hole")
    left = np.where(hole, p.share * mass, np.minimum(mass, p.ns_mass))
    return left, np.where(hole, words.composition("pure"), words.composition("neutrons"))
