"""The card of a law: what it says of itself, as plain data."""

from dataclasses import dataclass, field
from typing import List, Optional, Sequence, Union


@dataclass
class Limit:
    """A number, or a parameter: of this law ("m_up") or another's ("collapse.m_up")."""

    value: float = 0.0
    parameter: str = ""


def at(value: float) -> Limit:
    """The limit at a number."""
    return Limit(value=float(value))


def at_parameter(name: str) -> Limit:
    """The limit at a parameter's value."""
    return Limit(parameter=name)


@dataclass
class Accepts:
    """Which objects a law speaks for."""

    kinds: Sequence[str] = ()  # none: every kind
    # If given, low <= column < high; mass or metals. None: open.
    column: str = ""
    low: Optional[Union[Limit, float]] = None
    high: Optional[Union[Limit, float]] = None


@dataclass
class Question:
    """One question a law answers."""

    name: str
    # The columns it reads. A pair (name, unit) states the unit it counts in,
    # which the host then checks.
    inputs: Sequence[Union[str, tuple]] = ()
    # die: kinds; divert: clocks of other laws. Other questions have none.
    words: Sequence[str] = ()

    def columns(self) -> List[str]:
        """The names of the columns it reads."""
        return [i if isinstance(i, str) else i[0] for i in self.inputs]


@dataclass
class Parameter:
    """One adjustable number or word of a law."""

    name: str
    unit: str = ""  # VOUnit: yr, solMass, K; empty for a pure number
    doc: str = ""
    # low <= value <= high. With log10, these, the preset and the value the
    # law is given are log10 of the quantity in its unit.
    low: float = 0.0
    high: float = 0.0
    preset: Union[float, str] = 0.0  # of a choice: the word, or its index
    log10: bool = False
    citation: str = ""
    words: Sequence[str] = ()  # makes it a choice; low and high unused


@dataclass
class Threshold:
    """The mass at which a wearing law turns an object into something else."""

    kind: str
    # In solar masses; or the value of a parameter; or, with by_word as well,
    # by_word[index of the parameter's word].
    mass: float = 0.0
    parameter: str = ""
    by_word: Sequence[float] = ()
    becomes: str = "gone"  # a kind, or gone
    outcome: str = ""  # the word printed for it, such as dissolved


@dataclass
class Clock:
    """A galaxy-wide running total of a rate (dynamics, encounters)."""

    name: str
    doc: str = ""
    outcome: str = ""  # the word printed for a hit
    fate: str = ""  # adrift, central, gas; meet for encounters


@dataclass
class Outcome:
    """A word that a turning or encounter law may pick."""

    word: str
    doc: str = ""
    becomes: str = ""  # turning: a kind, or gone


@dataclass
class Kind:
    """A kind of object that a law adds."""

    name: str
    doc: str = ""
    composition: str = "hydrogen"


@dataclass
class Card:
    """What a law says of itself."""

    process: str  # evaporation
    name: str  # my-burden
    version: str  # changes whenever an answer changes
    summary: str  # one line
    formula: str = ""  # in words and symbols, units included
    domain: str = ""  # where it holds, and its error
    sources: Sequence[str] = ()  # at least one
    notes: Sequence[str] = ()  # assumptions, doubts, what it leaves out
    accepts: Accepts = field(default_factory=Accepts)
    questions: Sequence[Question] = ()
    parameters: Sequence[Parameter] = ()
    thresholds: Sequence[Threshold] = ()  # per kind from the largest mass down
    wears: str = ""  # loss (if empty), or "gain from ..."
    clocks: Sequence[Clock] = ()
    frame: bool = False  # process ejection: its rate answers radius, dispersion, stop
    stop_outcome: str = ""
    stop_fate: str = ""
    outcomes: Sequence[Outcome] = ()
    effect: str = ""  # of an ending
    kinds: Sequence[Kind] = ()
    idle: bool = False  # it never does anything
    # 0: the same bits on every machine of one architecture (only + - * / and
    # square roots, wanelaw.exact, and the host's draws); else the relative
    # size of what may differ. numpy's own exp, log and powers differ between
    # processors by 1e-15 or so.
    tolerance: float = 0.0

    def question(self, name: str) -> Optional[Question]:
        """The question of that name, or None."""
        for q in self.questions:
            if q.name == name:
                return q
        return None

    def outputs(self, question: str) -> List[str]:
        """The columns of the answer to a question, in order."""
        return _outputs(self, question)


_FIXED = {
    "density": ["log10_dark", "curvature"],
    "end": ["log10_hazard"],
    "mass": ["mass"],
    "birth": ["log10_date"],
    "metals": ["metals"],
    "sort": ["kind"],
    "live": ["wait"],
    "merge": ["wait"],
    "remain": ["mass", "composition"],
    "meet": ["outcome", "kind_1", "mass_1", "composition_1", "kind_2", "mass_2", "composition_2", "gas"],
    "wear": ["log10_rate", "heat"],
    "heat": ["log10_temperature"],
    "shine": ["log10_temperature"],
    "warm": ["power"],
}


def _outputs(card, question):
    def each(prefix, words):
        return [prefix + w.replace("-", "_") for w in words]

    clocks = [c.name for c in card.clocks]
    asked = card.question(question)
    words = asked.words if asked else ()
    if question == "die":
        return each("chance_", words)
    if question == "divert":
        return each("share_", words)
    if question == "rate":
        return each("log10_rate_", clocks) + (["radius", "dispersion", "stop"] if card.frame else [])
    if question == "expose":
        if card.process == "encounter":
            return each("seeks_", clocks) + each("sought_", clocks)
        return each("to_", clocks)
    if question == "foretell":
        if card.process in ("supernova", "iron", "tunnelling"):
            return ["wait"] + each("chance_", [o.word for o in card.outcomes]) + ["mass", "gas"]
        return ["wait"]
    return list(_FIXED.get(question, ()))
