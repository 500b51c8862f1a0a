"""A law: its card and the functions that answer its questions."""

import inspect

import numpy as np

from .words import NO_WORD, Words, is_words

EXTRAS = ("p", "parameters", "words", "rows")


class LawError(Exception):
    """What is wrong with a law or with what it answered."""


class Parameters:
    """The values of a law's parameters: p.k, or p["k"].

    A choice is given as its word; a parameter with log10 as the log10 of the
    quantity in its unit.
    """

    def __init__(self, card, values):
        for x, v in zip(card.parameters, values):
            self.__dict__[x.name] = str(x.words[int(v)]) if x.words else float(v)

    def __getattr__(self, name):
        raise AttributeError("no parameter %r on the card (known: %s)" % (name, ", ".join(self.__dict__) or "none"))

    def __setattr__(self, name, value):
        raise AttributeError("parameter %r: a law does not change its parameters" % name)

    def __getitem__(self, name):
        return getattr(self, name)


class Law:
    """A card with its answers: functions named as their questions, or a dict
    by question. With one question on the card the one function may have any
    name.
    """

    def __init__(self, card, *answers):
        self.card = card
        self.lists = {}  # word lists of the host, by the names Words takes
        self._functions = {}
        for name, function in _by_question(card, answers).items():
            self._functions[name] = _Answer(card, card.question(name), function)

    def presets(self):
        """The parameters' presets, in the order of the card."""
        return [_number(x, x.preset) for x in self.card.parameters]

    def answer(self, question, rows, columns, parameters, kinds=()):
        """Answers a batch: arrays in the order of the card's inputs in, pairs
        of name and array in the order of the answer out."""
        f = self._functions.get(question)
        if f is None:
            raise LawError("question %s is not on the card" % question)
        words = Words(outcomes=[o.word for o in self.card.outcomes], **dict(self.lists, **({"kinds": kinds} if kinds else {})))
        with np.errstate(divide="ignore", over="ignore", under="ignore"):
            out = f(rows, columns, Parameters(self.card, parameters), words)
        return _columns(question, self.card.outputs(question), rows, out, words)

    def ask(self, question, p=None, **columns):
        """Asks one question as the host does, and checks the answer.

        Columns are numbers, or words where the column holds words ("bound");
        single ones stand for every row. p sets parameters by name, others
        keep their presets. Returns a dict of arrays.
        """
        asked = self.card.question(question)
        if asked is None:
            raise LawError("question %s is not on the card" % question)
        words = Words(**self.lists)
        given = {}
        for name, value in columns.items():
            if name not in asked.columns():
                raise LawError("question %s does not read %s (it reads %s)" % (question, name, ", ".join(asked.columns())))
            if is_words(question, name) and np.asarray(value).dtype.kind == "U":
                value = words.codes(name, value)
            given[name] = np.asarray(value, dtype=np.uint8 if is_words(question, name) else np.float64)
        missing = [n for n in asked.columns() if n not in given]
        if missing:
            raise LawError("question %s also reads %s" % (question, ", ".join(missing)))
        shape = np.broadcast_shapes((1,), *[v.shape for v in given.values()])
        if len(shape) != 1:
            raise LawError("question %s: columns have one dimension" % question)
        arrays = []
        for n in asked.columns():
            a = np.ascontiguousarray(np.broadcast_to(given[n], shape))
            a.flags.writeable = False
            arrays.append(a)
        out = dict(self.answer(question, shape[0], arrays, self._values(p or {})))
        for name, a in out.items():
            if a.dtype.kind == "f" and np.isnan(a).any():
                row = int(np.isnan(a).argmax())
                what = ", ".join("%s %s" % (n, v[row]) for n, v in zip(asked.columns(), arrays))
                raise LawError("question %s, row %d (%s): %s is not a number" % (question, row, what, name))
        return out

    def _values(self, chosen):
        values = self.presets()
        names = [x.name for x in self.card.parameters]
        for name, v in chosen.items():
            if name not in names:
                raise LawError("no parameter %r on the card (known: %s)" % (name, ", ".join(names) or "none"))
            i = names.index(name)
            x = self.card.parameters[i]
            values[i] = _number(x, v)
            if not x.words and not x.low <= values[i] <= x.high:
                raise LawError("parameter %s: %s %s is outside %s .. %s" % (name, v, x.unit, x.low, x.high))
        return values


def _number(parameter, value):
    """A parameter's value as it travels: of a word its index."""
    if isinstance(value, str):
        if value not in list(parameter.words):
            raise LawError("parameter %s: no word %r (known: %s)" % (parameter.name, value, ", ".join(parameter.words) or "none"))
        return float(list(parameter.words).index(value))
    return float(value)


def _by_question(card, answers):
    asked = [q.name for q in card.questions]
    found = {}
    for a in answers:
        if isinstance(a, dict):
            found.update(a)
        elif not callable(a):
            raise LawError("want functions named as their questions, or a dict of them; got %r" % (a,))
        elif len(answers) == len(asked) == 1:
            found[asked[0]] = a
        else:
            found[getattr(a, "__name__", "?")] = a
    for name in found:
        if name not in asked:
            raise LawError("function %s: the card has no such question (it has %s)" % (name, ", ".join(asked) or "none"))
    missing = [q for q in asked if q not in found]
    if missing:
        raise LawError("no function answers %s" % ", ".join(missing))
    return found


class _Answer:
    """One function, called with what it asks for."""

    def __init__(self, card, question, function):
        self.function, self.names, self.extras = function, question.columns(), []
        wanted, anything = [], False
        for a in inspect.signature(function).parameters.values():
            if a.kind is a.VAR_KEYWORD:
                anything = True
            elif a.kind in (a.POSITIONAL_ONLY, a.VAR_POSITIONAL):
                raise LawError("function for %s: argument %s: columns come by name" % (question.name, a.name))
            elif a.name in EXTRAS and a.name not in self.names:
                self.extras.append(a.name)
            elif a.name in self.names or a.default is a.empty:
                wanted.append(a.name)
        for n in wanted:
            if n not in self.names:
                raise LawError("function for %s wants %s, which the card's question does not read (it reads %s)"
                               % (question.name, n, ", ".join(self.names) or "nothing"))
        unused = [n for n in self.names if n not in wanted and not anything]
        if unused:
            raise LawError("function for %s takes no %s, which the card's question reads" % (question.name, ", ".join(unused)))

    def __call__(self, rows, columns, parameters, words):
        given = dict(zip(self.names, columns))
        extra = {"p": parameters, "parameters": parameters, "words": words, "rows": rows}
        given.update((n, extra[n]) for n in self.extras)
        return self.function(**given)


def _columns(question, names, rows, out, words):
    """The answer in order, each column of the right length and type."""
    if out is None:
        raise LawError("question %s: the function returned nothing; want %s" % (question, ", ".join(names)))
    if isinstance(out, dict):
        wrong = [str(n) for n in out if n not in names] + [n for n in names if n not in out]
        if wrong:
            raise LawError("question %s: the function returned %s; want %s" % (question, ", ".join(map(str, out)) or "nothing", ", ".join(names)))
        values = [out[n] for n in names]
    elif isinstance(out, tuple) or len(names) != 1 and (isinstance(out, list) or np.ndim(out) == 2):
        values = list(out)
        if len(values) != len(names):
            raise LawError("question %s: the function returned %d columns; want %d: %s" % (question, len(values), len(names), ", ".join(names)))
    elif len(names) == 1:
        values = [out]
    else:
        raise LawError("question %s: the function returned one %s; want %d columns: %s" % (question, type(out).__name__, len(names), ", ".join(names)))
    return [(n, _column(question, n, rows, v, words)) for n, v in zip(names, values)]


def _column(question, name, rows, value, words):
    where = "question %s: column %s" % (question, name)
    try:
        a = np.asarray(value)
    except ValueError as e:
        raise LawError("%s: %s" % (where, e)) from None
    codes = is_words(question, name)
    if codes and a.dtype.kind == "U":
        a = words.codes(name, a)
    if a.dtype.kind not in "biuf":
        raise LawError("%s holds %s; want numbers" % (where, a.dtype if a.dtype.kind != "O" else "objects such as %.40r" % (a.flat[0] if a.size else None,)))
    if a.ndim == 0:
        a = np.full(rows, a)
    if a.shape != (rows,):
        raise LawError("%s has shape %s; want (%d,): one element a row" % (where, a.shape, rows))
    if not codes:
        return np.ascontiguousarray(a, dtype="<f8")
    if a.dtype != np.uint8:
        bad = ~((a >= 0) & (a <= NO_WORD) & (a == np.floor(a)))
        if bad.any():
            raise LawError("%s, row %d: %s is no code of a word" % (where, int(bad.argmax()), a[bad.argmax()]))
    return np.ascontiguousarray(a, dtype="u1")
