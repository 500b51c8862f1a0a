def sort(mass, p, words):
    """What an object of this mass is at birth."""
    return np.where(mass < p.limit, words.kind("brown-dwarf"), words.kind("star"))
