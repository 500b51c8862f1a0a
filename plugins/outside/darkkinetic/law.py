"""Dark matter that falls onto dead stars and warms them by its fall alone.

Baryakhtar, M., Bramante, J., Li, S. W., Linden, T. & Raj, N. 2017, Phys. Rev.
Lett. 119, 131801.
"""

import numpy as np

import wanelaw

C = 299792458.0  # speed of light, m/s
G_SUN = 1.3271244e20  # G times the nominal solar mass, m3/s2
SUN = 1.98841e30  # solar mass, kg
NUCLEON = 1.67492750056e-27  # neutron, kg
GEV = 1.602176634e-10  # J

card = wanelaw.Card(
    process="warmth", name="dark-kinetic", version="1",
    summary="dark matter that falls onto a body warms it by the energy of its fall, whether or not it annihilates",
    formula="L = f pi b^2 rho v (gamma - 1) c^2, b = (R v_esc/v) gamma, gamma = (1 - v_esc^2/c^2)^-1/2, v_esc^2 = 2 G M/R, "
            "f = min(1, sigma M/(pi R^2 m_n)); with annihilation gamma instead of gamma - 1; W at the surface",
    domain="bound objects while the halo lasts; particles of 1 GeV to 1e6 GeV, which one collision captures. Far from the body its temperature "
           "appears lower by gamma: 1750 K for the neutron star of the source. The cross-section is unknown",
    sources=["Baryakhtar, M. et al. 2017, Phys. Rev. Lett. 119, 131801 (its numbers from memory, but for the threshold in its abstract)"],
    notes=[
        "the cross-section is per nucleon and the same in neutron stars and nuclei; coherence in nuclei is left out, so white dwarfs capture too little (assumption)",
        "v much below v_esc is taken for granted in b, as in the source; b^2 + R^2 stands for b^2 so that light bodies sweep at least themselves",
        "density and speed are today's at the Sun, and stay so as the galaxy contracts (assumption); adrift there is no halo",
    ],
    accepts=wanelaw.Accepts(kinds=["brown-dwarf", "white-dwarf", "neutron-star"]),
    questions=[wanelaw.Question("warm", [("mass", "solMass"), ("radius", "km"), "place"])],
    parameters=[
        wanelaw.Parameter("cross_section", unit="cm2", log10=True, low=-50, high=-40, preset=-44.699,
                          doc="of dark matter and a nucleon", citation="Baryakhtar et al. 2017: 2e-45 cm2, where a neutron star captures all"),
        wanelaw.Parameter("density", unit="GeV.cm-3", low=0.2, high=0.6, preset=0.42,
                          doc="density of dark matter", citation="Baryakhtar et al. 2017 (from memory); range: Read 2014, J. Phys. G 41, 063101"),
        wanelaw.Parameter("speed", unit="km/s", low=100, high=300, preset=230,
                          doc="speed of dark matter far from the body", citation="Baryakhtar et al. 2017 (from memory); range: assumption"),
        wanelaw.Parameter("annihilates", words=["no", "yes"], preset="no",
                          doc="whether what is captured also gives up its rest energy", citation="Baryakhtar et al. 2017"),
    ],
)


def warm(mass, radius, place, p, words):
    r, v = radius * 1e3, p.speed * 1e3
    there = (place == words.place("bound")) & (r > 0)
    escape2 = np.minimum(2 * G_SUN * mass / np.where(there, r, 1.0), 0.99 * C * C)  # m2/s2
    gamma = 1 / np.sqrt(1 - escape2 / (C * C))
    nucleons = mass * SUN / NUCLEON
    target = np.minimum(np.pi * r * r, nucleons * wanelaw.exact.exp10(p.cross_section) * 1e-4)  # m2: f pi R^2
    focus = 1 + escape2 / (v * v) * gamma * gamma  # b^2/R^2
    flux = p.density * GEV * 1e6 * v  # W/m2 of rest energy
    per_rest = gamma - 1 + (1 if p.annihilates == "yes" else 0)
    return np.where(there, target * focus * flux * per_rest, 0.0)


if __name__ == "__main__":
    wanelaw.serve(card, warm)
