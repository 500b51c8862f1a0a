"""A law that does wrong what a parameter tells it to."""

import os
import sys

import numpy as np

import wanelaw

print("a stray print while it loads")

DEEDS = ["none", "raises", "exits", "dies-once", "dies", "wrong-length", "nan", "prints", "recurses"]

card = wanelaw.Card(
    process="evaporation", name="faulty", version="1", summary="does wrong", sources=["made up for a test"],
    accepts=wanelaw.Accepts(kinds=["black-hole"]),
    questions=[wanelaw.Question("wear", ["mass"])],
    parameters=[wanelaw.Parameter("deed", doc="what it does wrong", words=DEEDS, citation="made up for a test")],
)


def wear(mass, p):
    if p.deed == "raises":
        raise ValueError("bad physics \udcff at %g solMass" % mass[0])
    if p.deed == "exits":
        sys.exit(0)
    if p.deed == "dies" or p.deed == "dies-once" and not os.path.exists("died"):
        open("died", "w").close()
        print("about to die")
        os._exit(0)
    if p.deed == "wrong-length":
        return mass[1:], 0
    if p.deed == "nan":
        return np.log(-mass), 0
    if p.deed == "prints":
        print("x" * 100_000)
        os.write(1, b"to the handshake's pipe?\n")
    if p.deed == "recurses":
        return wear(mass, p)
    return -2 * mass, 0


if __name__ == "__main__":
    wanelaw.serve(card, wear)
