"""Serving a law: the process that the host starts, and what a person sees who
starts it by hand."""

import os
import signal
import sys
import tempfile
import threading
import traceback

from .direct import FEATURE, Direct
from .law import Law, LawError
from .words import is_words

COOKIE = ("WANE_LAW", "a law answers, the engine decides")
PROTOCOL = 1
_BIG = (1 << 31) - 1  # bytes of a message; grpc's own limit is 4 MiB
_held = {}  # the pipe of the handshake, and the process that started us


def hold_stdout():
    """Keeps standard output, by which the law is introduced to its host, from
    everything else that is printed: that goes to standard error, the law's
    log."""
    if os.environ.get(COOKIE[0]) != COOKIE[1] or _held:
        return
    _held["parent"] = os.getppid()
    sys.stdout.flush()
    _held["pipe"] = os.dup(1)
    os.dup2(2, 1)
    sys.stdout = sys.stderr


def serve(card, *answers):
    """Serves a law until its host ends it. Does not return.

    card: a Card. answers: functions named as their questions, or a dict of
    functions by question; one function of any name for a card of one question.
    """
    if os.environ.get(COOKIE[0]) != COOKIE[1]:
        sys.exit(_by_hand(card, answers, sys.argv))
    hold_stdout()
    _keep_memory()
    try:
        law = Law(card, *answers)
        import grpc
        from . import wire
        message = wire.card_message(card)
    except LawError as e:
        sys.exit("wanelaw: %s" % e)
    except ImportError as e:
        sys.exit("wanelaw: %s; a law in Python needs Debian's python3-grpcio, python3-protobuf and python3-numpy, and law.toml must name "
                 "the interpreter that sees them (/usr/bin/python3)" % e)
    _run(law, message, grpc, wire)


def _keep_memory():
    """Has freed memory kept for the next batch: numpy's columns would else go
    back to the system each time, and cost more than what is computed."""
    trim_threshold, mmap_threshold = -1, -3  # of malloc.h
    try:
        import ctypes
        libc = ctypes.CDLL(None)
        libc.mallopt(trim_threshold, 1 << 29)
        libc.mallopt(mmap_threshold, 1 << 25)
    except (ImportError, OSError, AttributeError):
        pass  # another libc does as it likes


def _run(law, message, grpc, wire):
    from concurrent import futures

    stop = threading.Event()

    def describe(request, _):
        names = {"kind": "kinds", "place": "places", "origin": "origins", "composition": "compositions"}
        law.lists = {names[w.name]: list(w.words) for w in request.words if w.name in names and w.words}
        card = wire.pb.Card()
        card.CopyFrom(message)
        if FEATURE in request.features:
            card.direct = direct.open()
        return card

    def answer_call(batch, context):
        try:
            columns = wire.read_columns(law, batch)
        except ValueError as e:
            context.abort(grpc.StatusCode.INVALID_ARGUMENT, str(e))
        return answer(batch, columns)

    def answer_direct(data):
        batch = wire.pb.Batch.FromString(data)
        try:
            result = answer(batch, wire.read_columns(law, batch))
        except ValueError as e:
            result = wire.refusal(batch, str(e))
        return result.SerializeToString()

    def answer(batch, columns):
        try:
            return wire.result(batch, law.answer(batch.question, batch.rows, columns, batch.parameters, list(batch.kinds)))
        except LawError as e:
            return wire.refusal(batch, str(e))
        except BaseException as e:  # whatever the author's function raises, the host is to hear of it
            return wire.refusal(batch, said(e).encode("utf-8", "replace").decode())

    def shutdown(_, __):
        stop.set()
        return b""

    unary, handlers = grpc.unary_unary_rpc_method_handler, grpc.method_handlers_generic_handler
    direct = Direct(answer_direct)
    server = grpc.server(futures.ThreadPoolExecutor(max_workers=4), options=[
        ("grpc.max_receive_message_length", _BIG), ("grpc.max_send_message_length", _BIG), ("grpc.so_reuseport", 0)])
    server.add_generic_rpc_handlers((
        handlers("wane.law.v1.Law", {
            "Describe": unary(describe, wire.pb.DescribeRequest.FromString, wire.pb.Card.SerializeToString),
            "Answer": unary(answer_call, wire.pb.Batch.FromString, wire.pb.Result.SerializeToString)}),
        handlers("grpc.health.v1.Health", {"Check": unary(lambda _, __: b"\x08\x01")}),  # status: SERVING
        handlers("plugin.GRPCController", {"Shutdown": unary(shutdown)})))
    path, own = _socket()
    server.add_insecure_port("unix:" + path)
    server.start()
    signal.signal(signal.SIGINT, signal.SIG_IGN)  # Ctrl-C is the host's business
    signal.signal(signal.SIGTERM, lambda *_: stop.set())
    try:
        os.write(_held["pipe"], ("1|%d|unix|%s|grpc\n" % (PROTOCOL, path)).encode())
        while not stop.wait(0.5) and os.getppid() == _held["parent"]:
            pass  # a host that was killed does not say so
        server.stop(0.2).wait()
    except OSError:
        pass  # the host is gone
    for remove, name in [(os.unlink, path)] + ([(os.unlink, direct.path)] if direct.path else []) + ([(os.rmdir, own)] if own else []):
        try:
            remove(name)
        except OSError:
            pass
    sys.stderr.flush()
    os._exit(0)  # a function that never returns must not keep us alive


def _socket():
    """Where to listen, and the directory made for it if the host gave none."""
    given = os.environ.get("PLUGIN_UNIX_SOCKET_DIR")
    own = None if given else tempfile.mkdtemp(prefix="wane-law-")
    path = os.path.join(given or own, "law-%d.sock" % os.getpid())
    if len(os.fsencode(path)) > 107:
        sys.exit("wanelaw: the socket %s: want a path of at most 107 bytes" % path)
    return path, own


def said(error, frames=4):
    """An exception in words, with the last lines of the author's own code that
    led to it."""
    kit = os.path.dirname(os.path.abspath(__file__))
    trace = traceback.extract_tb(error.__traceback__)
    own = [f for f in trace if os.path.dirname(os.path.abspath(f.filename)) != kit] or trace[-1:]
    text = "".join(traceback.format_exception_only(type(error), error)).strip()
    return "\n".join([text] + ["  %s:%s, in %s: %s" % (os.path.basename(f.filename), f.lineno, f.name, f.line) for f in own[-frames:]])


def _by_hand(card, answers, argv):
    """What a person gets who starts a law: an answer to --ask, else words and
    exit code 1."""
    try:
        law = Law(card, *answers)
        if argv[1:2] == ["--ask"]:
            print("\n".join(ask_by_hand(law, argv[2:])))
            return 0
    except LawError as e:
        print("wanelaw: %s" % e, file=sys.stderr)
        return 1
    except Exception as e:
        print(said(e), file=sys.stderr)
        return 1
    here, file = os.path.dirname(os.path.abspath(argv[0])), os.path.basename(argv[0])
    lines = ["This is a law for Wane, %s/%s: %s." % (card.process, card.name, card.summary), "It does nothing by itself; wane starts it:",
             "  wane law check %s" % here, "  wane run SCENARIO --law %s=%s" % (card.process, here), "To try it on one row:"]
    for q in card.questions:
        inputs = ["%s=%s" % (n, "WORD" if is_words(q.name, n) else "NUMBER") for n in q.columns()]
        lines.append("  python3 %s --ask %s" % (file, " ".join([q.name] + inputs)))
    print("\n".join(lines), file=sys.stderr)
    return 1


def ask_by_hand(law, words):
    """Answers one row given as question name=value ...; lines of text."""
    if not words or law.card.question(words[0]) is None:
        raise LawError("want --ask QUESTION name=value ..., one of: %s" % ", ".join(q.name for q in law.card.questions))
    inputs, parameters = {}, {}
    for w in words[1:]:
        name, equals, value = w.partition("=")
        if not equals:
            raise LawError("%s: want name=value" % w)
        try:
            value = float(value)
        except ValueError:
            pass  # a word
        (inputs if name in law.card.question(words[0]).columns() else parameters)[name] = value
    out = law.ask(words[0], p=parameters, **inputs)
    return ["%s = %s" % (n, law_word(law, n, a[0]) if a.dtype.kind == "u" else repr(float(a[0]))) for n, a in out.items()]


def law_word(law, column, code):
    """The word of a code in an answer."""
    from .words import NO_WORD, Words
    known = Words(outcomes=[o.word for o in law.card.outcomes], **law.lists).all(column)
    return "none" if code == NO_WORD else known[code]
