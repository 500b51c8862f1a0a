def die():
    """The chance of each kind that the card names: here there is one."""
    return 1.0


def remain(mass, p, words):
    """What the star leaves: its mass and what it is made of."""
    left = np.minimum(mass, p.base + p.slope * mass)
    composition = np.where(left < 0.45, words.composition("helium"),
                           np.where(left < 1.05, words.composition("carbon-oxygen"), words.composition("oxygen-neon")))
    return left, composition
