"""Cards, batches and answers as the messages of law.proto."""

import platform

import numpy as np

from . import law_pb2 as pb
from .card import Limit
from .law import LawError, _number
from .words import COMPOSITIONS, is_words

CONTRACT = 1


def card_message(card):
    """The card as a message. Whether it makes sense is for the host to say."""
    try:
        return _card(card)
    except (TypeError, ValueError, AttributeError) as e:
        raise LawError("card: %s" % e) from None


def _card(c):
    out = pb.Card(
        contract=CONTRACT, process=c.process, name=c.name, version=c.version, summary=c.summary, formula=c.formula,
        domain=c.domain, sources=_several("sources", c.sources), notes=_several("notes", c.notes), wears=c.wears,
        frame=c.frame, stop_outcome=c.stop_outcome, stop_fate=c.stop_fate, effect=c.effect, idle=c.idle, tolerance=c.tolerance,
        runtime="Python %s, numpy %s" % (platform.python_version(), np.__version__),
    )
    a = c.accepts
    out.accepts.kinds.extend(_several("accepts.kinds", a.kinds))
    out.accepts.column = a.column
    for side in ("low", "high"):
        limit = getattr(a, side)
        if limit is not None:
            limit = limit if isinstance(limit, Limit) else Limit(value=float(limit))
            getattr(out.accepts, side).CopyFrom(pb.Limit(value=limit.value, parameter=limit.parameter))
    for q in c.questions:
        pairs = [(i, "") if isinstance(i, str) else i for i in _several("inputs", q.inputs)]
        out.questions.add(name=q.name, words=_several("words", q.words), inputs=[pb.Column(name=n, unit=u) for n, u in pairs])
    for x in c.parameters:
        out.parameters.add(name=x.name, unit=x.unit, doc=x.doc, low=x.low, high=x.high, preset=_number(x, x.preset),
                           log10=x.log10, citation=x.citation, words=_several("words", x.words))
    for t in c.thresholds:
        out.thresholds.add(kind=t.kind, mass=t.mass, parameter=t.parameter, by_word=t.by_word, becomes=t.becomes, outcome=t.outcome)
    for k in c.clocks:
        out.clocks.add(name=k.name, doc=k.doc, outcome=k.outcome, fate=k.fate)
    for o in c.outcomes:
        out.outcomes.add(word=o.word, doc=o.doc, becomes=o.becomes)
    for k in c.kinds:
        if k.composition not in COMPOSITIONS:
            raise ValueError("kind %s: no composition %r (known: %s)" % (k.name, k.composition, ", ".join(COMPOSITIONS)))
        out.kinds.add(name=k.name, doc=k.doc, composition=k.composition)
    return out


def _several(what, words):
    if isinstance(words, str):
        raise TypeError("%s: want a list, got %r alone" % (what, words))
    return list(words)


def read_columns(law, batch):
    """The columns of a batch as arrays that share its memory and cannot be
    written to. Raises ValueError for a batch that does not fit the card."""
    q = law.card.question(batch.question)
    if q is None:
        raise ValueError("question %r is not on the card" % batch.question)
    names = q.columns()
    if len(batch.columns) != len(names):
        raise ValueError("question %s: %d columns, the card reads %d" % (batch.question, len(batch.columns), len(names)))
    if len(batch.parameters) != len(law.card.parameters):
        raise ValueError("%d parameters, the card has %d" % (len(batch.parameters), len(law.card.parameters)))
    for x, v in zip(law.card.parameters, batch.parameters):
        if x.words and not (v == int(v) and 0 <= v < len(x.words)):
            raise ValueError("parameter %s: %s is no index of its words" % (x.name, v))
    out = []
    for name, raw in zip(names, batch.columns):
        words = is_words(batch.question, name)
        if len(raw) != batch.rows * (1 if words else 8):
            raise ValueError("question %s: column %s: %d bytes for %d rows" % (batch.question, name, len(raw), batch.rows))
        out.append(np.frombuffer(raw, dtype="u1" if words else "<f8"))
    return out


def result(batch, columns):
    """The answer to a batch as a message."""
    return pb.Result(seq=batch.seq, rows=batch.rows, names=[n for n, _ in columns], columns=[a.tobytes() for _, a in columns])


def refusal(batch, text):
    """The message that says why a batch has no answer."""
    return pb.Result(seq=batch.seq, rows=batch.rows, error=text)
