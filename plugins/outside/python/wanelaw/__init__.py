"""wanelaw: write a law for Wane in Python.

A law is a card, which says what it is, and one function for each question it
answers, from numpy arrays to numpy arrays:

    import numpy as np
    import wanelaw

    card = wanelaw.Card(
        process="evaporation", name="my-burden", version="1",
        summary="...", formula="...", domain="...", sources=["..."],
        accepts=wanelaw.Accepts(kinds=["black-hole", "central-hole"]),
        questions=[wanelaw.Question("heat", ["mass"])],
    )

    def heat(mass):
        return np.log10(6.1703e-8) - np.log10(mass)

    if __name__ == "__main__":
        wanelaw.serve(card, heat)

The function is called with the columns its card declares, by name, each an
array with one element a row that must not be written to. If it has an
argument `p`, that holds the parameters by name; if it has `words`, that knows
the words behind the codes of columns such as kind and place; if it has
`rows`, that is the number of rows.

It returns its columns in the order the question wants them, or a dict by
their names; a plain number stands for a column of it. It must be pure: no
memory, clock, files or random numbers of its own. Randomness comes in through
the columns u and e.

Needs numpy; to be served also grpc and google.protobuf (Debian: python3-numpy,
python3-grpcio, python3-protobuf).
"""

import sys

from . import exact
from .card import (Accepts, Card, Clock, Kind, Limit, Outcome, Parameter, Question, Threshold, at, at_parameter)
from .law import Law, LawError
from .serve import ask_by_hand, hold_stdout, serve
from .words import COMPOSITIONS, KINDS, NO_WORD, ORIGINS, PLACES

__all__ = [
    "Accepts", "Card", "Clock", "Kind", "Limit", "Outcome", "Parameter", "Question", "Threshold", "at", "at_parameter",
    "Law", "LawError", "exact", "serve", "COMPOSITIONS", "KINDS", "NO_WORD", "ORIGINS", "PLACES",
]

# From here on a print() of the law goes to the law's log: standard output
# belongs to the host.
hold_stdout()
