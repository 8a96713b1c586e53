"""Talbot coefficients of light gratings at pseudo-random strengths by the trapezoid rule on the definition, mpmath.

The kernel K(x, s) over one period is formed from the transmission itself (phase and depletion gratings) or from the
recoil map (standing-mode-coherent: exp[-(n0/2)(cos kx - cos kx')^2]; random-walk: exp[-n0 cos^2(kX)(1 - cos pi xi)]),
never from a closed form. 30 digits, 512 nodes. Run: python3 generate.py > values.csv
"""
import random
import mpmath as mp

mp.mp.dps = 30
NODES = 512
random.seed(20310502)


def coefficient(sort, n, xi, phi0, n0):
    total = mp.mpf(0)
    for i in range(NODES):
        x = mp.mpf(i) / NODES
        a, b = mp.cospi(x - xi / 2), mp.cospi(x + xi / 2)
        exponent = mp.mpc(0, phi0 * (a * a - b * b))
        if sort == "coherent":
            exponent -= n0 / 2 * (a - b) ** 2
        elif sort == "walk":
            exponent -= n0 * mp.cospi(x) ** 2 * (1 - mp.cospi(xi))
        elif sort == "depletion":
            exponent -= n0 / 2 * (a * a + b * b)
        total += mp.re(mp.exp(exponent - mp.mpc(0, 2 * mp.pi * n * x)))
    return total / NODES


print("# mpmath %s, 30 digits, %d nodes, seed 20310502" % (mp.__version__, NODES))
print("sort,n,xi,phi0,n0,value")
for sort in ("phase", "coherent", "walk", "depletion"):
    for k in range(75):
        n = random.randint(-3, 4)
        xi = float(random.choice([random.uniform(-3, 3), random.uniform(-0.01, 0.01), random.randint(-2, 3) / 2]))
        phi0 = float(random.choice([random.uniform(0, 4), random.uniform(0, 40)]))
        n0 = 0.0 if sort == "phase" else float(random.choice([random.uniform(0, 2), random.uniform(0, 60)]))
        value = coefficient(sort, n, mp.mpf(xi), mp.mpf(phi0), mp.mpf(n0))
        print("%s,%d,%r,%r,%r,%s" % (sort, n, xi, phi0, n0, mp.nstr(value, 20)))
