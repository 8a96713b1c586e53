"""True fringes of every scan of the lab: propagation averaged over velocity, beam height and cluster mass."""
import math
from functools import lru_cache

import numpy as np

from lab import BEAMS, DALTON, GAMMA_GREEN, GAMMA_ULTRAVIOLET, LIGHT, PLANCK, PULSED, VANE_ULTRAVIOLET
from propagation import depletion_grating, harmonics, light_mask, patterns, phase_grating, signal, slits

HEIGHTS = np.polynomial.legendre.leggauss(5)


def modulation(bench, volume, cross_section, velocity, power):
    """Largest phase (rad) and mean photon number of molecules crossing the antinode, by integrating their flight."""
    # a retro-reflected Gaussian beam has four times the single-pass intensity in its antinodes; the integral along
    # the flight is taken numerically, for a radius of 20 um along the beam (any radius gives the same)
    along, count = 20e-6, 801
    z = np.linspace(-4 * along, 4 * along, count)
    intensity = 4 * 2 * power / (math.pi * bench.waist * along) * np.exp(-2 * (z / along)**2)
    exposure = intensity.sum() * (z[1] - z[0]) / velocity                                     # J/m^2
    phase = 4 * math.pi * volume * math.pi * exposure / (PLANCK * LIGHT)      # alpha / (2 eps0 c hbar), in volumes
    return phase, cross_section * GAMMA_GREEN * exposure / (PLANCK * LIGHT)


@lru_cache(maxsize=None)
def bench_table(bench, beam_key, powers):
    """{power: (relative flux, harmonics)} for one bench and beam, true single-pass powers in W."""
    beam = BEAMS[beam_key]
    velocities, weights = beam.nodes()
    masks = slits(bench.open_fraction), slits(bench.open_fraction)
    rows = [(height, weight / 2) for height, weight in zip(*HEIGHTS) if height >= 0]
    rows = [(height, weight if height == 0 else 2 * weight) for height, weight in rows]
    total = np.zeros((len(powers), 2 * 64))
    shares = sum(member[1] for member in beam.compound.members)
    for kilograms, share, volume, cross_section in beam.compound.members:
        for velocity, weight in zip(velocities, weights):
            talbot = bench.separation * PLANCK / (kilograms * velocity * bench.period**2)
            gratings, portions = [], []
            for power in powers:
                phase, photons = modulation(bench, volume, cross_section, velocity, power)
                for height, portion in rows:
                    away = math.exp(-2 * (height * bench.height / 2 / bench.waist)**2)
                    gratings.append(phase_grating(phase * away, photons * away))
                    portions.append(portion)
            found = patterns(talbot, gratings).reshape(len(powers), len(rows), -1)
            total += share / shares * weight * (found * np.array(portions[:len(rows)])[None, :, None]).sum(axis=1)
    return {power: harmonics(signal(row, *masks)) for power, row in zip(powers, total)}


@lru_cache(maxsize=None)
def pulsed_table(energies):
    """{second pulse energy: (transmitted share with and without molecules in phase, harmonics)}, true energies in J."""
    kilograms, _, volume, cross_section = VANE_ULTRAVIOLET.members[0]
    talbot = PULSED.pulse_separation * PLANCK / (kilograms * PULSED.period**2)

    def light(energy):
        exposure = 4 * energy / PULSED.area
        return (4 * math.pi**2 * volume * exposure / (PLANCK * LIGHT),
                cross_section * GAMMA_ULTRAVIOLET * exposure / (PLANCK * LIGHT))

    outer = light_mask(light(PULSED.outer_energy)[1])
    found = patterns(talbot, [depletion_grating(*light(energy)) for energy in energies])
    return {energy: harmonics(signal(row, outer, outer)) for energy, row in zip(energies, found)}


def daltons(kilograms):
    return kilograms / DALTON
