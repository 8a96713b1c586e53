"""Talbot coefficients and order amplitudes of slits with attracting walls by adaptive quadrature of the definition.

Eikonal phase (C b/hbar v)[(w/2-x)^-n + (w/2+x)^-n], slit open for |x| < w/2 - x_c. mpmath at 25 digits, tanh-sinh on
graded pieces. Run: python3 generate_walls.py > walls.csv
"""
import random
import mpmath as mp

mp.mp.dps = 25
random.seed(20310503)
HBAR = mp.mpf("6.62607015e-34") / (2 * mp.pi)
PERIOD, THICKNESS = mp.mpf("2.66e-7"), mp.mpf("1.6e-7")


def phase(x, strength, n, half):
    return strength * ((half - x) ** -n + (half + x) ** -n)


def pieces(low, high, count=24):
    return [low + (high - low) * (1 - mp.cospi(mp.mpf(k) / count)) / 2 for k in range(count + 1)]


def coefficient(order, xi, strength, n, half, cut):
    total = mp.mpf(0)
    reach = half - cut
    for whole in (mp.floor(xi), mp.floor(xi) + 1):
        shift = (xi - whole) * PERIOD
        low, high = max(-reach, -reach - shift), min(reach, reach - shift)
        if high > low:
            f = lambda y: mp.cos(phase(y, strength, n, half) - phase(y + shift, strength, n, half)
                                 - 2 * mp.pi * order * (y / PERIOD + xi / 2))
            total += mp.quad(f, pieces(low, high), maxdegree=7)
    return total / PERIOD


print("# mpmath %s, 25 digits, seed 20310503; period 2.66e-7 m, thickness 1.6e-7 m" % mp.__version__)
print("order,xi,coefficient_J_mn,exponent,slit_m,cutoff_m,velocity_m_s,value")
for k in range(16):
    order = random.randint(-3, 3)
    xi = float(random.uniform(-1.5, 2.5))
    n = random.choice([3, 4])
    c = float(random.uniform(0.2, 5) * 1.602e-22 * 1e-27) if n == 3 else float(random.uniform(1, 20) * 1.602e-22 * 1e-36)
    slit = float(random.uniform(0.9e-7, 1.5e-7))
    cut = float(random.uniform(4e-9, 1.2e-8))
    v = float(random.uniform(80, 250))
    strength = mp.mpf(c) * THICKNESS / (HBAR * mp.mpf(v))
    value = coefficient(order, mp.mpf(xi), strength, n, mp.mpf(slit) / 2, mp.mpf(cut))
    print("%d,%r,%r,%d,%r,%r,%r,%s" % (order, xi, c, n, slit, cut, v, mp.nstr(value, 18)))
