"""python3 -m unittest test_law"""

import unittest

import numpy as np

import law
import wanelaw

SIGMA = 5.670374419e-8  # W/(m2 K4)
STAR = dict(mass=1.5, radius=10.0, place="bound")  # that of the source
GAMMA = (1 - 2 * law.G_SUN * 1.5 / (1e4 * law.C**2)) ** -0.5


def power(p=None, **changes):
    asked = dict(STAR, **changes)
    return wanelaw.Law(law.card, law.warm).ask("warm", p=dict({"cross_section": -43}, **(p or {})), **asked)["power"]


def from_afar(watts, radius=10.0, gamma=GAMMA):
    return (watts / (4 * np.pi * (radius * 1e3) ** 2 * SIGMA)) ** 0.25 / gamma


class Published(unittest.TestCase):
    """Baryakhtar et al. 2017: a star of 1.5 solMass and 10 km, 0.42 GeV/cm3, 230 km/s."""

    def close(self, got, want, relative):
        self.assertLessEqual(abs(got / want - 1), relative, "got %g, want %g" % (got, want))

    def test_kinetic_temperature(self):
        self.close(from_afar(power()[0]), 1750, 0.01)  # three digits (from memory)

    def test_with_annihilation(self):
        self.close(from_afar(power({"annihilates": "yes"})[0]), 2480, 0.01)  # three digits (from memory)

    def test_mass_that_crosses(self):
        # 4e25 GeV a second, to one digit (from memory): the rest energy alone.
        self.close((power({"annihilates": "yes"}) - power())[0] / law.GEV, 4e25, 0.125)

    def test_threshold(self):
        # The cross-section from which on a star captures all: 2e-45 cm2, one digit (abstract).
        full = power()[0]
        part = power({"cross_section": -46})[0]
        self.close(1e-46 * full / part, 2e-45, 0.25)


class Limits(unittest.TestCase):
    def test_only_in_the_halo(self):
        np.testing.assert_array_equal(power(place=["adrift", "central"]), [0, 0])

    def test_small_cross_section_is_linear(self):
        a, b = power({"cross_section": -48})[0], power({"cross_section": -47})[0]
        self.assertAlmostEqual(b / a, 10, places=9)

    def test_fall_is_newtonian_for_light_bodies(self):
        # L -> f pi R^2 (v_esc/v)^2 rho v v_esc^2/2 for a white dwarf, to v_esc^2/c^2.
        m, r = 0.6, 8841.0
        escape2 = 2 * law.G_SUN * m / (r * 1e3)
        caught = 1e-47 * m * law.SUN / (law.NUCLEON * np.pi * (r * 1e3) ** 2)
        want = caught * np.pi * (r * 1e3) ** 2 * (1 + escape2 / 2.3e5**2) * 0.42 * law.GEV * 1e6 * 2.3e5 * escape2 / law.C**2 / 2
        self.assertLess(abs(power({"cross_section": -43}, mass=m, radius=r)[0] / want - 1), 2e-3)

    def test_nothing(self):
        np.testing.assert_array_equal(power(mass=[0, 0], radius=[10, 0]), [0, 0])


if __name__ == "__main__":
    unittest.main()
