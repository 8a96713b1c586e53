"""Flight traces of the beams: a chopper with one slot, and one with a pseudo-random sequence."""
import numpy as np

from counting import random_for, steady
from dialects import HOUSE, flight_trace
from lab import BEAMS
from plan import local

DISTANCE = 1.480                     # m, chopper to detector, as it is
BIN, BINS = 0.20e-3, 300             # single slot
SLOT, TIME_ZERO = 0.40e-3, 0.350e-3
ELEMENT, ORDER, TAPS = 0.25e-3, 8, (8, 6, 5, 4)      # 255 elements a turn
FINE = 20                            # parts of a bin
SINGLE_COUNTS, SINGLE_DARK = 12000, 3.0
RANDOM_COUNTS, RANDOM_DARK = 24_000_000, 3000.0


def sequence():
    """Maximum-length sequence of a shift register, 2^(n-1) ones among 2^n - 1."""
    register, out = [1] * ORDER, []
    for _ in range(2**ORDER - 1):
        out.append(register[-1])
        register = [sum(register[tap - 1] for tap in TAPS) % 2] + register[:-1]
    assert sum(out) == 2**(ORDER - 1)
    return np.array(out)


def arrival_density(beam, times):
    """Share of the flux that needs each flight time (1/s)."""
    late = np.maximum(times, 1e-9)
    v, weight = beam.nodes(4001)
    density = beam.flux(DISTANCE / late) * DISTANCE / late**2 / (beam.flux(v).sum() * (v[1] - v[0]))
    return np.where((DISTANCE / late < v[0]) | (DISTANCE / late > v[-1]), 0.0, density)


def single_slot(beam):
    """Expected counts a bin: arrivals from every moment at which the slot was open."""
    step = BIN / FINE
    times = (np.arange(BINS * FINE) + 0.5) * step
    opened = np.arange(-SLOT / 2 + step / 2, SLOT / 2, step)
    arrivals = sum(arrival_density(beam, times - TIME_ZERO - moment) for moment in opened) / len(opened)
    return arrivals.reshape(BINS, FINE).sum(axis=1) * step * SINGLE_COUNTS + SINGLE_DARK


def pseudo_random(beam):
    """Expected counts a bin over one turn, gate and bins starting together; a turn is longer than any flight."""
    gates = sequence()
    step = ELEMENT / FINE
    opened = np.repeat(gates, FINE)
    flight = arrival_density(beam, np.arange(len(opened)) * step) * step
    arrivals = np.fft.irfft(np.fft.rfft(opened) * np.fft.rfft(flight), len(opened))
    return arrivals.reshape(len(gates), FINE).mean(axis=1) * RANDOM_COUNTS / gates.sum() + RANDOM_DARK


def traces(seed, day, beam_key, start):
    """(name, bytes) of the two traces of one beam on one day."""
    beam = BEAMS[beam_key]
    names = [f"day-{day}/tf-{day}-{beam.compound.key}-{sort}.txt" for sort in ("single", "random")]
    single = random_for(seed, names[0]).poisson([steady(mean) for mean in single_slot(beam)])
    random = random_for(seed, names[1]).poisson([steady(mean) for mean in pseudo_random(beam)])
    common = [("flight trace", HOUSE), ("start", local(start).isoformat())]
    yield names[0], flight_trace(common + [("slot opening", "0.40 ms"), ("time", "middle of the bin")],
                                 (np.arange(BINS) + 0.5) * BIN * 1e3, single)
    yield names[1], flight_trace(common + [("sequence", "".join(map(str, sequence()))),
                                           ("element", "0.25 ms"), ("time", "beginning of the bin")],
                                 np.arange(len(random)) * ELEMENT * 1e3, random)
