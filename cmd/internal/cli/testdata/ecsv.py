"""Reads an ECSV table with Astropy. Prints its rows, its columns, how many of
them have a unit, how many cells are missing, and two special dates of its head."""
import sys

from astropy.io import ascii
from numpy.ma import count_masked

t = ascii.read(sys.argv[1], format="ecsv")
dates = t.meta["log10_special_dates"]
print(len(t), len(t.columns), sum(c.unit is not None for c in t.columns.values()),
      sum(count_masked(c) for c in t.columns.values()), dates["today"], dates["end"])
