def warm(mass, place, p, words):
    """Power from outside, W."""
    return np.where(place == words.place("bound"), p.heating * mass, 0.0)
