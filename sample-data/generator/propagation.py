"""Fringes of a three-grating near-field interferometer by propagating amplitudes, one source point at a time.

No Talbot coefficients and no closed forms: the molecule's amplitude leaves a point behind grating 1, spreads to
grating 2 (Fresnel), is multiplied there by the grating's transmission function, spreads to grating 3, and its
intensity is summed over the openings. All lengths are in periods d of the gratings; `talbot` is L / (d^2 / lambda),
or T / (m d^2 / h) when the gratings are pulses.

The standing light wave has its antinode at x = 0 and its period is d:
    phase        exp(i phi cos^2(pi x))                      (attractive, phi > 0)
    absorption   n cos^2(pi x) photons on average, taken coherently from the standing mode cos(pi x): one amplitude
                 operator for each number k of photons,  sqrt(n)^k cos(pi x)^k exp(-n cos^2(pi x) / 2) / sqrt(k!);
                 the molecule is still detected and the different k add as intensities
    depletion    one photon removes the molecule: amplitude exp(-n cos^2(pi x) / 2), nothing else is detected
"""
import math

import numpy as np

SAMPLES = 128        # a period, on grating 2
PATTERN = 64         # a period, on grating 3, before refinement
FINE = 500           # a period, on gratings 1 and 3 (42 percent open is then exactly 210 cells)
PHOTONS = 14         # numbers of absorbed photons followed


def phase_grating(phi, n):
    """Operators of a phase grating with absorption, shape (operators, 2 SAMPLES), over two periods."""
    cosine = np.cos(np.pi * _two_periods())
    common = np.exp((1j * phi - n / 2) * cosine**2)
    last = 0 if n == 0 else PHOTONS
    return np.array([common * (math.sqrt(n) * cosine)**k / math.sqrt(math.factorial(k)) for k in range(last + 1)])


def depletion_grating(phi, n):
    """The one operator of a depletion grating, shape (1, 2 SAMPLES)."""
    return np.exp((1j * phi - n / 2) * np.cos(np.pi * _two_periods())**2)[None, :]


def slits(open_fraction):
    """Shadow mask of a slit grating on the fine grid over two periods, a slit centred on 0."""
    half = open_fraction * FINE / 2
    from_centre = np.minimum(np.arange(FINE), FINE - np.arange(FINE))
    return np.tile(np.clip(half - from_centre + 0.5, 0, 1), 2)    # cells on the edge count by their open part


def light_mask(n):
    """Intensity transmission of a depletion grating on the fine grid over two periods."""
    return np.exp(-n * np.cos(np.pi * np.arange(2 * FINE) / FINE)**2)


def patterns(talbot, gratings):
    """Intensity at grating 3, over two periods of x0 + x2, for each grating 2 in a list of operator arrays.

    In units of the intensity without grating 2.

    A source point x0 gives at x2 the amplitude
        integral dx1 t(x1) exp(i pi (x1 - x0)^2 / talbot) exp(i pi (x2 - x1)^2 / talbot),
    whose modulus depends on x0 + x2 alone; so one row of the matrix below serves every pair with that sum.
    """
    flat, taper = 4 + 14 * talbot, 4 + 2 * talbot
    half = math.ceil((flat + taper) / 2) * 2
    x1 = (np.arange(2 * half * SAMPLES) - half * SAMPLES) / SAMPLES
    edge = np.clip((half - np.abs(x1)) / taper, 0, 1)
    window = (edge - np.sin(2 * np.pi * edge) / (2 * np.pi)) * np.exp(2j * np.pi * x1**2 / talbot)
    sums = np.arange(2 * PATTERN) / PATTERN
    travel = np.exp(-2j * np.pi * np.outer(sums, x1) / talbot) * window
    # the grating repeats after two periods: fold the travel matrix instead of repeating the grating
    folded = travel.reshape(2 * PATTERN, half, 2 * SAMPLES).sum(axis=1)
    absent = (np.abs(folded.sum(axis=1))**2).mean()
    return np.array([(np.abs(folded @ operators.T)**2).sum(axis=1) for operators in gratings]) / absent


def signal(pattern, first, third):
    """Transmitted flux for every shift of grating 3 over one period (FINE values), from one pattern."""
    coarse = np.fft.rfft(pattern)
    padded = np.zeros(FINE + 1, complex)
    padded[:PATTERN] = coarse[:PATTERN]
    fine = np.fft.irfft(padded, 2 * FINE) * (FINE / PATTERN)
    # sum over source points x0 in the first mask, over x2 in the third mask shifted by s
    beyond = np.fft.irfft(np.conj(np.fft.rfft(first)) * np.fft.rfft(fine), 2 * FINE)
    moved = np.fft.irfft(np.fft.rfft(third) * np.conj(np.fft.rfft(beyond)), 2 * FINE)
    s = np.roll(moved[::-1], 1)
    return s[:FINE] / (2 * FINE)**2


def harmonics(shifted_flux, count=5):
    """Mean flux and the complex relative harmonics h of flux(s) = mean (1 + Re sum_l h_l exp(2 pi i l s / d))."""
    spectrum = np.fft.rfft(shifted_flux) / len(shifted_flux)
    return spectrum[0].real, 2 * spectrum[1:count + 1] / spectrum[0].real


def _two_periods():
    return np.arange(2 * SAMPLES) / SAMPLES
