"""Tests of the kit: python3 -m unittest test_kit, with wanelaw on the path."""

import os
import signal
import socket
import struct
import subprocess
import sys
import tempfile
import textwrap
import time
import unittest

import grpc
import numpy as np

import wanelaw
from wanelaw import law_pb2 as pb
from wanelaw import wire

KIT = os.path.dirname(os.path.dirname(os.path.abspath(wanelaw.__file__)))


def card(**changes):
    values = dict(
        process="evaporation", name="toy", version="1", summary="a toy", sources=["assumption"],
        accepts=wanelaw.Accepts(kinds=["black-hole"]), questions=[wanelaw.Question("wear", ["mass", "kind"])],
        parameters=[
            wanelaw.Parameter("k", doc="strength", low=0, high=3, preset=1, citation="assumption"),
            wanelaw.Parameter("mode", doc="choice", words=["slow", "quick"], preset="quick", citation="assumption"),
        ])
    values.update(changes)
    return wanelaw.Card(**values)


def wear(mass, kind, p, words):
    rate = np.where(kind == words.kind("black-hole"), p.k * mass, 0.0)
    return rate if p.mode == "slow" else 2 * rate, 0.5


class Asking(unittest.TestCase):
    def test_one_function(self):
        law = wanelaw.Law(card(), wear)
        out = law.ask("wear", mass=[1.0, 2.0], kind=["black-hole", "star"])
        np.testing.assert_array_equal(out["log10_rate"], [2, 0])
        np.testing.assert_array_equal(out["heat"], [0.5, 0.5])

    def test_parameters(self):
        law = wanelaw.Law(card(), {"wear": wear})
        out = law.ask("wear", p={"k": 3, "mode": "slow"}, mass=[1.0, 2.0], kind="black-hole")
        np.testing.assert_array_equal(out["log10_rate"], [3, 6])
        with self.assertRaisesRegex(wanelaw.LawError, r"parameter k: 4  is outside 0 \.\. 3"):
            law.ask("wear", p={"k": 4}, mass=1, kind="black-hole")
        with self.assertRaisesRegex(wanelaw.LawError, "no parameter 'q' on the card .known: k, mode"):
            law.ask("wear", p={"q": 4}, mass=1, kind="black-hole")

    def test_any_name_for_one_question(self):
        law = wanelaw.Law(card(questions=[wanelaw.Question("heat", ["mass"])]), lambda mass: -mass)
        np.testing.assert_array_equal(law.ask("heat", mass=[1, 2])["log10_temperature"], [-1, -2])

    def test_dict_by_column(self):
        law = wanelaw.Law(card(), lambda mass, kind: {"heat": 0, "log10_rate": mass})
        np.testing.assert_array_equal(law.ask("wear", mass=[3], kind="star")["log10_rate"], [3])

    def test_words_in_answers(self):
        c = card(process="remnant", questions=[wanelaw.Question("remain", ["mass"])])
        law = wanelaw.Law(c, lambda mass: (mass / 2, np.where(mass > 1, "iron", "helium")))
        np.testing.assert_array_equal(law.ask("remain", mass=[1, 2])["composition"], [1, 4])
        whole = wanelaw.Law(c, lambda mass: (mass / 2, "carbon-oxygen"))
        np.testing.assert_array_equal(whole.ask("remain", mass=[1, 2])["composition"], [2, 2])

    def test_columns_are_lent(self):
        def scribble(mass, kind):
            mass[0] = 0
            return mass, 0
        with self.assertRaisesRegex(ValueError, "read-only"):
            wanelaw.Law(card(), scribble).ask("wear", mass=[1, 2], kind="star")


class Faults(unittest.TestCase):
    def faulty(self, text, answer, **changes):
        with self.assertRaisesRegex(wanelaw.LawError, text):
            wanelaw.Law(card(**changes), answer).ask("wear", mass=[1.0, 2.0, 3.0], kind="star")

    def test_messages(self):
        self.faulty("column log10_rate has shape .2,.; want .3,.: one element a row", lambda mass, kind: (mass[1:], 0))
        self.faulty("returned one ndarray; want 2 columns: log10_rate, heat", lambda mass, kind: np.float64(1) * mass[:1])
        self.faulty("returned 3 columns; want 2", lambda mass, kind: (mass, mass, mass))
        self.faulty("returned nothing", lambda mass, kind: None)
        self.faulty("returned log10_rate, heta; want log10_rate, heat", lambda mass, kind: {"log10_rate": mass, "heta": 0})
        self.faulty("column heat holds complex128", lambda mass, kind: (mass, mass * 1j))
        self.faulty("column heat holds objects such as None", lambda mass, kind: (mass, None))
        self.faulty(r"row 0 \(mass 1.0, kind 0\): heat is not a number", lambda mass, kind: (mass, np.nan))
        self.faulty("wants masss, which the card's question does not read .it reads mass, kind.", lambda masss, kind: 0)
        self.faulty("takes no kind, which the card's question reads", lambda mass: 0)
        self.faulty("function tear: the card has no such question .it has wear", {"tear": wear})
        self.faulty("no function answers foretell", wear, questions=[wanelaw.Question("wear", ["mass", "kind"]), wanelaw.Question("foretell")])

    def test_parameter_that_is_not_there(self):
        with self.assertRaisesRegex(AttributeError, "no parameter 'kk' on the card .known: k, mode"):
            wanelaw.Law(card(), lambda mass, kind, p: (p.kk, 0)).ask("wear", mass=1, kind="star")

    def test_code_of_no_word(self):
        c = card(process="substellar-limit", questions=[wanelaw.Question("sort", ["mass"])])
        with self.assertRaisesRegex(wanelaw.LawError, "column kind, row 1: 300 is no code"):
            wanelaw.Law(c, lambda mass: np.array([0, 300])).ask("sort", mass=[1, 2])
        with self.assertRaisesRegex(ValueError, "column kind: no word 'planet'"):
            wanelaw.Law(c, lambda mass: np.array(["star", "planet"])).ask("sort", mass=[1, 2])

    def test_card_of_wrong_types(self):
        with self.assertRaisesRegex(wanelaw.LawError, "card: sources: want a list, got 'Page 1976' alone"):
            wire.card_message(card(sources="Page 1976"))
        with self.assertRaises(wanelaw.LawError):
            wire.card_message(card(summary=3))


LAW = textwrap.dedent("""
    import sys, time, os
    import wanelaw
    import numpy as np
    print("loading ...")
    card = wanelaw.Card(process="evaporation", name="toy", version="1", summary="a toy", sources=["assumption"],
        questions=[wanelaw.Question("wear", ["mass"]), wanelaw.Question("heat", ["mass", "kind"])],
        parameters=[wanelaw.Parameter("k", low=0, high=3, preset=1, citation="assumption")])
    def wear(mass, p):
        print("asked")
        os.write(1, b"and again")
        if (mass < 0).any():
            raise ValueError("bad physics")
        if (mass == 99).any():
            sys.exit(0)
        while (mass == 77).any():
            pass
        return p.k * mass, 0.25
    def heat(mass, kind, words):
        return np.where(kind == words.kind("toy-hole"), mass, -np.inf)
    if __name__ == "__main__":
        wanelaw.serve(card, wear, heat)
""")


class Child:
    """A law in its own process, as a host sees it."""

    def __init__(self, text=LAW, environment=None):
        self.folder = tempfile.TemporaryDirectory()
        self.file = os.path.join(self.folder.name, "law.py")
        with open(self.file, "w") as f:
            f.write(text)
        self.environment = {"PATH": os.environ["PATH"], "PYTHONPATH": KIT, "PYTHONDONTWRITEBYTECODE": "1",
                            "WANE_LAW": "a law answers, the engine decides", "PLUGIN_UNIX_SOCKET_DIR": self.folder.name}
        self.environment.update(environment or {})

    def __enter__(self):
        self.process = subprocess.Popen([sys.executable, self.file], env=self.environment, stdout=subprocess.PIPE, stderr=subprocess.PIPE)
        self.line = self.process.stdout.readline().decode()
        self.path = self.line.split("|")[3] if self.line.count("|") == 4 else ""
        if self.path:
            self.channel = grpc.insecure_channel("unix:" + self.path, options=[
                ("grpc.max_receive_message_length", -1), ("grpc.max_send_message_length", -1)])
        return self

    def __exit__(self, *_):
        if self.path:
            self.channel.close()
        if self.process.poll() is None:
            self.process.kill()
        self.process.communicate()
        self.folder.cleanup()

    def call(self, service, method, request=b"", reply=bytes):
        f = self.channel.unary_unary("/%s/%s" % (service, method), lambda m: m if isinstance(m, bytes) else m.SerializeToString(), reply)
        return f(request, timeout=60)

    def describe(self):
        words = [pb.WordList(name="kind", words=list(wanelaw.KINDS))]
        return self.call("wane.law.v1.Law", "Describe", pb.DescribeRequest(contract=1, words=words), pb.Card.FromString)

    def answer(self, **fields):
        return self.call("wane.law.v1.Law", "Answer", pb.Batch(**fields), pb.Result.FromString)

    def wear(self, mass):
        mass = np.asarray(mass, dtype="<f8")
        return self.answer(seq=7, question="wear", rows=len(mass), columns=[mass.tobytes()], parameters=[2.0])

    def shut_down(self):
        self.call("plugin.GRPCController", "Shutdown")


class Serving(unittest.TestCase):
    def test_handshake(self):
        with Child() as c:
            self.assertEqual(c.line, "1|1|unix|%s|grpc\n" % c.path)
            self.assertEqual(c.call("grpc.health.v1.Health", "Check"), b"\x08\x01")
            self.assertEqual(c.describe().questions[1].inputs[1].name, "kind")
            self.assertEqual(c.describe().SerializeToString(), c.describe().SerializeToString())
            self.assertRegex(c.describe().runtime, r"^Python 3\.\d+\.\d+, numpy \d")
            c.shut_down()
            self.assertEqual(c.process.wait(10), 0)
            self.assertFalse(os.path.exists(c.path))
            out, log = c.process.communicate()
            self.assertEqual(out, b"")
            self.assertIn(b"loading ...", log)

    def test_answers(self):
        with Child() as c:
            c.describe()
            r = c.wear([1, 2.5])
            self.assertEqual((r.seq, r.rows, list(r.names), r.error), (7, 2, ["log10_rate", "heat"], ""))
            np.testing.assert_array_equal(np.frombuffer(r.columns[0], "<f8"), [2, 5])
            np.testing.assert_array_equal(np.frombuffer(r.columns[1], "<f8"), [0.25, 0.25])
            n = 1_000_000  # 8 MB, twice what grpc takes if it is not told otherwise
            self.assertEqual(len(c.wear(np.ones(n)).columns[0]), 8 * n)
            self.assertEqual(c.wear([]).rows, 0)
            c.shut_down()
            self.assertEqual(c.process.communicate()[0], b"")

    def test_kinds_of_the_run(self):
        with Child() as c:
            c.describe()
            for kinds, want in ([], -np.inf), (list(wanelaw.KINDS) + ["toy-hole"], 3.0):
                r = c.answer(question="heat", rows=1, columns=[np.array([3.0]).tobytes(), b"\x06"], parameters=[1.0], kinds=kinds)
                self.assertEqual(np.frombuffer(r.columns[0], "<f8")[0], want)

    def test_direct(self):
        with Child() as c:
            self.assertEqual(c.describe().direct, "")
            card = c.call("wane.law.v1.Law", "Describe", pb.DescribeRequest(contract=1, features=["direct"]), pb.Card.FromString)
            self.assertEqual(os.path.dirname(card.direct), c.folder.name)
            with socket.socket(socket.AF_UNIX, socket.SOCK_STREAM) as s, socket.socket(socket.AF_UNIX, socket.SOCK_STREAM) as other:
                s.connect(card.direct)
                other.connect(card.direct)
                for n in 0, 1, 3, 200_000, 3:
                    mass = np.arange(n, dtype="<f8") + 0.5
                    r = exchange(s, pb.Batch(seq=n, question="wear", rows=n, columns=[mass.tobytes()], parameters=[2.0]))
                    self.assertEqual((r.seq, r.rows, r.error), (n, n, ""))
                    np.testing.assert_array_equal(np.frombuffer(r.columns[0], "<f8"), 2 * mass)
                r = exchange(other, pb.Batch(seq=5, question="wear", rows=1, columns=[b"short"], parameters=[2.0]))
                self.assertEqual((r.seq, r.error), (5, "question wear: column mass: 5 bytes for 1 rows"))
                r = exchange(other, pb.Batch(question="wear", rows=1, columns=[np.array([-1.0]).tobytes()], parameters=[2.0]))
                self.assertIn("ValueError: bad physics", r.error)
            c.shut_down()
            self.assertEqual(c.process.wait(10), 0)
            self.assertFalse(os.path.exists(card.direct))

    def test_exception_is_told(self):
        with Child() as c:
            self.assertEqual(c.wear([1, -1]).error, 'ValueError: bad physics\n  law.py:13, in wear: raise ValueError("bad physics")')
            self.assertIn("SystemExit: 0", c.wear([99]).error)
            self.assertEqual(c.wear([1]).error, "")  # and it lives on

    def test_host_in_error(self):
        with Child() as c:
            for fields in (dict(question="shine"), dict(question="wear", rows=1), dict(question="wear", rows=2, columns=[b"12345678"], parameters=[1]),
                           dict(question="wear", rows=1, columns=[b"12345678"])):
                with self.assertRaises(grpc.RpcError) as e:
                    c.answer(**fields)
                self.assertEqual(e.exception.code(), grpc.StatusCode.INVALID_ARGUMENT)

    def test_ends(self):
        with Child() as c:
            c.process.send_signal(signal.SIGINT)
            time.sleep(0.2)
            self.assertIsNone(c.process.poll(), "Ctrl-C is the host's business")
            c.process.send_signal(signal.SIGTERM)
            self.assertEqual(c.process.wait(10), 0)

    def test_ends_while_it_computes(self):
        with Child() as c:
            f = c.channel.unary_unary("/wane.law.v1.Law/Answer").future(
                pb.Batch(question="wear", rows=1, columns=[np.array([77.0]).tobytes()], parameters=[1]).SerializeToString())
            time.sleep(0.2)
            c.shut_down()
            self.assertEqual(c.process.wait(10), 0)
            f.cancel()

    def test_orphan(self):
        host = Child()
        script = "import subprocess, sys, time; c = subprocess.Popen([sys.executable, %r], stdout=sys.stdout); print(c.pid, flush=True); time.sleep(60)"
        with subprocess.Popen([sys.executable, "-c", script % host.file], env=host.environment, stdout=subprocess.PIPE, stderr=subprocess.DEVNULL) as p:
            lines = sorted([p.stdout.readline(), p.stdout.readline()], key=lambda line: b"|" in line)
            child = int(lines[0])
            p.kill()
        deadline = time.monotonic() + 10
        while alive(child) and time.monotonic() < deadline:
            time.sleep(0.05)
        self.assertFalse(alive(child), "the host was killed, the law lives on")
        self.assertEqual([n for n in os.listdir(host.folder.name) if n.endswith(".sock")], [])
        host.folder.cleanup()

    def test_by_hand(self):
        with Child(environment={"WANE_LAW": ""}) as c:
            out, log = c.process.communicate()
            self.assertEqual((c.process.returncode, c.line, out), (1, "loading ...\n", b""))
            self.assertIn(b"This is a law for Wane, evaporation/toy", log)
            self.assertIn(b"--ask heat mass=NUMBER kind=WORD", log)
        child = Child()
        said = subprocess.run([sys.executable, child.file, "--ask", "wear", "mass=4", "k=3"], env={"PYTHONPATH": KIT}, capture_output=True, text=True)
        self.assertEqual(said.stdout.splitlines()[-2:], ["log10_rate = 12.0", "heat = 0.25"], said.stderr)
        said = subprocess.run([sys.executable, child.file, "--ask", "wear", "mass=-4"], env={"PYTHONPATH": KIT}, capture_output=True, text=True)
        self.assertEqual(said.returncode, 1)
        self.assertIn("ValueError: bad physics\n  law.py:13", said.stderr)
        child.folder.cleanup()


def exchange(connection, batch):
    """Sends a batch over a law's own socket and returns the result."""
    data = batch.SerializeToString()
    connection.sendall(struct.pack("<I", len(data)) + data)
    with connection.makefile("rb") as f:
        return pb.Result.FromString(f.read(struct.unpack("<I", f.read(4))[0]))


def alive(pid):
    try:
        with open("/proc/%d/stat" % pid) as f:
            return f.read().rsplit(")", 1)[1].split()[0] != "Z"
    except OSError:
        return False


if __name__ == "__main__":
    unittest.main()
