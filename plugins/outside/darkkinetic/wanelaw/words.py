"""The words behind the codes of a column."""

import numpy as np

KINDS = ("star", "brown-dwarf", "white-dwarf", "neutron-star", "black-hole", "central-hole")
PLACES = ("bound", "adrift", "central")
ORIGINS = ("founded", "merged")
COMPOSITIONS = ("hydrogen", "helium", "carbon-oxygen", "oxygen-neon", "iron", "neutrons", "pure")

# In an answer: no such thing, as the kind of a survivor that does not exist.
NO_WORD = 255


class Words:
    """The word lists of a batch.

    kind("white-dwarf"), place("bound"), origin("merged"), composition("iron")
    and outcome("explodes") return the code that stands for a word in a column
    of that name, NO_WORD if this run has no such word.
    """

    def __init__(self, kinds=KINDS, places=PLACES, origins=ORIGINS, compositions=COMPOSITIONS, outcomes=()):
        self._lists = {
            "kind": list(kinds), "place": list(places), "origin": list(origins),
            "composition": list(compositions), "outcome": list(outcomes),
        }

    def kind(self, word):
        return self._code("kind", word)

    def place(self, word):
        return self._code("place", word)

    def origin(self, word):
        return self._code("origin", word)

    def composition(self, word):
        return self._code("composition", word)

    def outcome(self, word):
        return self._code("outcome", word)

    def all(self, column):
        """The words that the codes of a column index."""
        return list(self._lists[base(column)])

    def codes(self, column, words):
        """Codes for an array of words; '' is none."""
        known = self._lists[base(column)]
        found, where = np.unique(np.asarray(words, dtype=str), return_inverse=True)
        table = []
        for w in found:
            if w and w not in known:
                raise ValueError("column %s: no word %r (known: %s)" % (column, str(w), ", ".join(known)))
            table.append(known.index(w) if w else NO_WORD)
        return np.array(table, dtype=np.uint8)[where].reshape(np.shape(words))

    def _code(self, column, word):
        known = self._lists[column]
        return known.index(word) if word in known else NO_WORD


def base(column):
    """kind of kind_1."""
    return column[:-2] if column.endswith(("_1", "_2")) else column


def is_words(question, column):
    """Whether a column holds codes of words rather than numbers."""
    return question != "rate" and base(column) in ("kind", "place", "origin", "composition", "outcome")
