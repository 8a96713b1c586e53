"""What is true in the invented lab: compounds, setups, beams, calibrations. Every number here is made up.

SI units. Only truth.json and the raw files carry these numbers on; the lab's own documents in ../lab state what its
people believed, with their uncertainties.
"""
import math
from dataclasses import dataclass, field

import numpy as np

PLANCK = 6.62607015e-34
LIGHT = 299792458.0
DALTON = 1.66053906660e-27
GAMMA_GREEN, GAMMA_ULTRAVIOLET = 532.0e-9, 157.63e-9

# conventional standard atomic weights (abridged IUPAC values); only the beam masses of this lab are made from them
WEIGHT = {"C": 12.011, "H": 1.008, "F": 18.998403, "N": 14.007, "O": 15.999, "S": 32.06, "Y": 88.905838}


def mass(**atoms):
    return sum(WEIGHT[element] * count for element, count in atoms.items()) * DALTON


@dataclass(frozen=True)
class Compound:
    key: str
    label: str
    formula: str
    members: tuple            # (mass in kg, weight, volume in m^3, cross section in m^2) of what passes the mass filter
    at: dict = field(default_factory=dict)

    def mean(self, place):
        total = sum(member[1] for member in self.members)
        return sum(member[1] * member[place] for member in self.members) / total


FAN_MASS = mass(C=132, H=54, F=136, N=4, O=8)
VANE_MASS = mass(C=96, H=42, F=64, N=4, O=12, S=2)
CLUSTER_MEAN, CLUSTER_DEVIATION = 300, 5.0          # atoms; Gaussian window of the mass filter
ATOM_VOLUME, ATOM_CROSS_SECTION = 6.0e-30, 8.0e-23


def _cluster_members():
    numbers = range(CLUSTER_MEAN - 14, CLUSTER_MEAN + 15, 4)
    return tuple((n * WEIGHT["Y"] * DALTON, math.exp(-0.5 * ((n - CLUSTER_MEAN) / CLUSTER_DEVIATION)**2),
                  n * ATOM_VOLUME, n * ATOM_CROSS_SECTION) for n in numbers)


FAN = Compound("fan", "demo fan", "C132H54F136N4O8", ((FAN_MASS, 1.0, 420e-30, 2.5e-21),))
VANE = Compound("vane", "demo vane", "C96H42F64N4O12S2", ((VANE_MASS, 1.0, 170e-30, 0.0),))
# the same molecules under vacuum-ultraviolet light: another volume, and a photon removes them from the beam
VANE_ULTRAVIOLET = Compound("vane", "demo vane", VANE.formula, ((VANE_MASS, 1.0, 210e-30, 2.6e-20),))
CLUSTER = Compound("cluster", "demo yttrium clusters", "Y", _cluster_members())


@dataclass(frozen=True)
class Bench:
    """Material grating, standing light wave, material grating; equal separations."""
    key: str
    separation: float
    contrast: float           # what vibration leaves of the fringes, the same for all scans
    waist: float              # 1/e^2 radius of the intensity along the grating lines
    height: float             # of the beam, evenly filled
    dark: float               # 1/s
    dead_time: float          # s, non-paralysable
    period: float = 266.0e-9
    open_fraction: float = 0.42


SHORT = Bench("short", 0.105, 0.96, 0.90e-3, 0.20e-3, 2.0, 0.0)
LONG = Bench("long", 0.980, 0.93, 1.00e-3, 0.30e-3, 0.5, 60e-6)
SHORT_TYPED_SEPARATION = 0.150      # what stood in the first setup record until day 4


@dataclass(frozen=True)
class PulsedBench:
    """Three standing waves of pulsed light, each of which removes molecules; equal times between pulses."""
    key: str = "pulsed"
    period: float = GAMMA_ULTRAVIOLET / 2
    pulse_separation: float = 30.0e-6
    contrast: float = 0.97
    area: float = 8.0e-6      # of the flat beam profile, m^2
    dark_per_shot: float = 0.002
    outer_energy: float = 0.45e-3


PULSED = PulsedBench()


@dataclass(frozen=True)
class Beam:
    """Flux distribution v^3 exp(-((v - centre) / width)^2), cut where it has died out."""
    key: str
    compound: Compound
    centre: float
    width: float

    def nodes(self, count=49):
        v = np.linspace(max(self.centre - 2.9 * self.width, 15.0), self.centre + 3.3 * self.width, count)
        weight = self.flux(v)
        return v, weight / weight.sum()

    def flux(self, v):
        return v**3 * np.exp(-((v - self.centre) / self.width)**2) * (v > 0)

    def moments(self):
        v, weight = self.nodes(2001)
        mean = float((v * weight).sum())
        return mean, math.sqrt(float(((v - mean)**2 * weight).sum()))


BEAMS = {
    "fan, day 1": Beam("fan, day 1", FAN, 95.0, 15.0),
    "vane, day 2": Beam("vane, day 2", VANE, 142.0, 20.0),
    "fan, day 3": Beam("fan, day 3", FAN, 74.0, 11.0),
    "cluster, day 3": Beam("cluster, day 3", CLUSTER, 120.0, 14.0),
    "cluster, day 4": Beam("cluster, day 4", CLUSTER, 112.0, 13.0),
    "fan, day 4": Beam("fan, day 4", FAN, 95.0, 15.0),
}

# true power = factor x reading of the power meter; its head was changed before day 3
POWER_FACTOR = {1: 0.984, 2: 0.984, 3: 1.031, 4: 1.031}
ENERGY_FACTOR = 1.012
