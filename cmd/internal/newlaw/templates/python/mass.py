def mass(u, p):
    """The mass below which a share u of all objects is born, solMass."""
    least, heaviest = power(p.least, 1 - p.slope), power(p.heaviest, 1 - p.slope)
    return power(least + u * (heaviest - least), 1 / (1 - p.slope))
