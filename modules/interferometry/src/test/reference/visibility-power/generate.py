"""Visibility against power of a slow broad beam, by Simpson's rule on 96001 speeds and scipy.special.jv.

The values of public-checks d.VP_curve are Simpson sums on 1501 speeds with 256-node trapezoids for the grating; both
are too coarse for the slowest molecules (quantum 4e-4, classical up to 3e-3 relative). Run: python3 generate.py > curve.csv
"""
import numpy as np
import scipy
from scipy.special import jv

h = 6.62607015e-34
hbar, c, u = h / 2 / np.pi, 299792458.0, 1.66053906660e-27
f, L, d, m, alpha, w, vw = 0.42, 0.105, 2.66e-7, 3500 * u, 210e-30, 9.45e-4, 130.0
y, wy = np.polynomial.legendre.leggauss(24)
y, wy = y * 3.5e-4, wy / 2
v = np.linspace(8.0, 6 * vw, 96001)
weight = v**3 * np.exp(-(v / vw) ** 2)
simpson = np.ones(v.size)
simpson[1:-1:2], simpson[2:-1:2] = 4, 2
weight *= simpson / np.sum(simpson * weight)
xi = L * h / (m * v * d * d)
slits = (np.sin(np.pi * f) / (np.pi * f)) ** 2
print("# numpy %s, scipy %s" % (np.__version__, scipy.__version__))
print("power_W,quantum,classical")
for P in (0.5, 1, 2, 4, 8, 12):
    sums = [0.0, 0.0]
    for yy, q in zip(y, wy):
        phi = 8 * np.sqrt(2 * np.pi) * alpha * P / (hbar * c * w * v) * np.exp(-2 * (yy / w) ** 2)
        sums[0] += q * np.sum(weight * jv(2, phi * np.sin(np.pi * xi)))
        sums[1] += q * np.sum(weight * jv(2, phi * np.pi * xi))
    print("%r,%.15g,%.15g" % (P, abs(2 * slits * sums[0]), abs(2 * slits * sums[1])))
