"""The built-in law evaporation/black-body once more, to the last bit."""

import numpy as np

import wanelaw
from wanelaw import exact

ALPHA = float.fromhex("0x1.5bade52f95e69p-16")  # 1/(15360 pi)
LOSS_UNIT = float.fromhex("0x1.43599734c215dp-210")  # hbar c^4/G^2 in solMass^3/yr
SUN_TEMPERATURE = float.fromhex("0x1.0902bb0e0420ep-24")  # hbar c^3/(8 pi G solMass k), K

LOG10_RATE = exact.log10(ALPHA) + exact.log10(LOSS_UNIT)  # of one solar mass
LOG10_LIFE = exact.log10(3 * ALPHA * LOSS_UNIT)
LOG10_TEMPERATURE = exact.log10(SUN_TEMPERATURE)

HOLES = ["black-hole", "central-hole"]

card = wanelaw.Card(
    process="evaporation", name="black-body", version="1",
    summary="a hole radiates like a black body of the size and temperature of its horizon",
    formula="dM/dt = -hbar c^4/(15360 pi G^2 M^2), lifetime 5120 pi G^2 M^3/(hbar c^4) = 2.0955e67 yr (M/solMass)^3; M in solMass, t in yr",
    domain="uncharged holes without spin; 1.8 times too long for photons and gravitons, 18 times too long for three massless neutrinos too, "
           "because grey-body factors and the number of particles are ignored",
    sources=["Hawking, S. W. 1975, Commun. Math. Phys. 43, 199"],
    notes=["a hole loses nothing while the sky is hotter than it, and radiates as if alone afterwards (assumption)"],
    accepts=wanelaw.Accepts(kinds=HOLES),
    questions=[wanelaw.Question(q, [("mass", "solMass")]) for q in ("wear", "foretell", "heat")],
    thresholds=[wanelaw.Threshold(k, mass=0, becomes="gone", outcome="evaporated") for k in HOLES],
    wears="loss",
)


def wear(mass):
    rate = LOG10_RATE - 2 * exact.log10(mass)
    return np.where(mass > 0, rate, -np.inf), 0


def foretell(mass):
    return np.maximum(-1000, 3 * exact.log10(mass) - LOG10_LIFE)


def heat(mass):
    return np.where(mass > 0, LOG10_TEMPERATURE - exact.log10(mass), -np.inf)


if __name__ == "__main__":
    wanelaw.serve(card, wear, foretell, heat)
