"""From true fringes to counts: Poisson statistics, dead time, dark counts, and what went wrong."""
import hashlib

import numpy as np

from fringes import bench_table, pulsed_table
from lab import BEAMS, ENERGY_FACTOR, LONG, POWER_FACTOR, PULSED, SHORT
from plan import ENERGIES

BENCHES = {"short": SHORT, "long": LONG}
FLUX = {"fan": 150.0, "vane": 25.0, "cluster": 600.0}      # mean detected particles per second at level 1
PULSED_FLUX = 50.0                                         # particles per shot before the gratings at level 1
POINTS = {"short": 28, "long": 32, "pulsed": 24}
STEP = {"short": 38.0e-9, "long": 33.25e-9, "pulsed": 9.85e-9}
DWELL = {"short": 5.0, "long": 2.0}
SHOTS = 400
FULL_SCALE = 4095                                          # of the short bench's counter
HOP, HOP_ROW = 2.1, 14
JUMP_ROW, JUMP_STEPS = 20, 6


def random_for(seed, name):
    """A stream of its own for every file; numpy keeps RandomState's streams unchanged for good."""
    return np.random.RandomState(int.from_bytes(hashlib.sha256(f"{seed} {name}".encode()).digest()[:4], "big"))


def true_power(day, reading):
    return round(POWER_FACTOR[day] * reading, 9)


def true_energy(reading):
    return round(ENERGY_FACTOR * reading * 1e-3, 12)


def tables(days):
    """{(bench, beam): {true power or energy: (relative flux, harmonics)}} for everything the days ask for."""
    asked = {}
    for file in (file for day in days for file in day.files):
        for section in file.sections:
            if section.reading and file.bench != "pulsed":
                asked.setdefault((file.bench, file.beam), set()).add(true_power(file.day, section.reading))
    found = {key: bench_table(BENCHES[key[0]], key[1], tuple(sorted(powers))) for key, powers in asked.items()}
    found["pulsed"] = pulsed_table(tuple(true_energy(energy) for energy in (0.0,) + ENERGIES))
    return found


def fringe(file, section, known):
    """True relative flux and harmonics of one scan, contrast of the bench included."""
    if file.bench == "pulsed":
        energy = true_energy(section.reading)
        flux, h = known["pulsed"][energy]
        return flux, h * PULSED.contrast
    if section.reading == 0:
        return 1.0, np.zeros(5, complex)
    _, h = known[file.bench, file.beam][true_power(file.day, section.reading)]
    return 1.0, h * BENCHES[file.bench].contrast


def expected(file, section, known, phase):
    """Positions (m) as the scanner really took them, and expected particles and dark counts per row."""
    rows = np.arange(POINTS[file.bench])
    positions = rows * STEP[file.bench]
    relative, h = fringe(file, section, known)
    period = PULSED.period if file.bench == "pulsed" else BENCHES[file.bench].period
    angle = 2 * np.pi * positions / period + phase + (HOP * (rows >= HOP_ROW) if section.mishap == "mode hop" else 0)
    shape = 1 + sum((h[order - 1] * np.exp(1j * order * angle)).real for order in range(1, 6))
    if section.mishap == "drift":
        shape = shape * (1 - 0.45 * (rows / (len(rows) - 1) - 0.5))
    if file.bench == "pulsed":
        mean = PULSED_FLUX * relative * section.level * SHOTS
        dark = PULSED.dark_per_shot * SHOTS
    else:
        mean = FLUX[BEAMS[file.beam].compound.key] * section.level * DWELL[file.bench]
        dark = BENCHES[file.bench].dark * DWELL[file.bench] * (60 if section.mishap == "light leak" else 1)
    if section.purpose in ("empty-beam", "background"):
        mean = 0.0
    return positions, steady(mean * shape), steady(mean), steady(dark), relative, h


def steady(value):
    """Rounded to ten digits, so that the last bits of a machine's cosine cannot tip a count."""
    return np.array([float(f"{number:.9e}") for number in np.atleast_1d(value)]) if np.ndim(value) else \
        float(f"{value:.9e}")


def counted(generator, means, dwell, dead_time):
    """Counts of a detector that is blind for dead_time after every count (not prolonged by what it misses)."""
    if dead_time == 0:
        return generator.poisson(means)
    counts = []
    for mean in means:
        waits = generator.standard_exponential(int(mean + 12 * mean**0.5 + 20)) * (dwell / mean)
        moments = np.cumsum(waits) + dead_time * np.arange(len(waits))
        counts.append(int((moments < dwell).sum()))
    return np.array(counts)
