"""Fit of vp_02 with the normal distribution of speeds averaged by 4,000 equally spaced nodes over six spreads either way.

The 60 Gauss-Hermite nodes of expected.json are not converged for this file: the signed visibility oscillates for slow
molecules, which moves the polarizability by 0.3 of its standard uncertainty. SciPy's curve_fit; model as in generate-odr.py.
vp_03 is fitted for polarizability and the ratio of absorbed photons to phase with the coherent absorption kernel
B_2 = exp(-a) (c + a)^2 J_2(sqrt(c^2 - a^2)) / (c^2 - a^2), c = phi0 sin(pi x), a = n0 sin^2(pi x / 2), x = L/L_T.
Usage: python3 generate-normal.py vp_02.csv > normal.json; python3 generate-normal.py vp_03.csv > absorbing.json
"""
import json, sys
import numpy as np
import scipy
from scipy.optimize import curve_fit
from scipy.special import iv, jv

h = 6.62607015e-34; c = 299792458.0; u = 1.66053906660e-27; hbar = h / (2 * np.pi)
head, rows = {}, []
for line in open(sys.argv[1]):
    if line.startswith("#"):
        k, _, v = line[1:].partition(":"); head[k.strip()] = v.strip()
    elif line[0].isdigit():
        rows.append([float(x) for x in line.split(",")])
P, V, sV = np.array(rows).T
m = float(head["mass_u"]) * u; mean = float(head["v_mean_m_s"]); sd = float(head["v_sigma_m_s"])
d = float(head["d_m"]); L = float(head["L_m"]); f = float(head["open_fraction"]); w = float(head["w_y_m"])
n, reach = 4000, 6
v = mean + sd * reach * (2 * (np.arange(n) + 0.5) / n - 1)
p = np.exp(-0.5 * ((v - mean) / sd) ** 2); p /= p.sum()
def signed(x, a, ratio):
    phi0 = 8 * np.sqrt(2 * np.pi) * a * 1e-30 * np.asarray(x)[:, None] / (hbar * c * w * v)
    xi = L * h / (m * v * d * d)
    cc = phi0 * np.sin(np.pi * xi)
    aa = ratio * phi0 * np.sin(np.pi * xi / 2) ** 2
    ww = cc ** 2 - aa ** 2
    root = np.sqrt(np.abs(ww)); root = np.where(root < 1e-12, 1e-12, root)
    g = np.where(ww >= 0, jv(2, root), iv(2, root)) / root ** 2
    return 2 * np.sinc(f) ** 2 * (np.exp(-aa) * (cc + aa) ** 2 * g * p).sum(1)
absorbing = "vp_03" in sys.argv[1]
def model(x, a, other):
    return np.abs(signed(x, a, other)) if absorbing else other * np.abs(signed(x, a, 0.0))
start = (102, 0.35) if absorbing else (268, 0.84)
beta, cov = curve_fit(model, P, V, p0=start, sigma=sV, absolute_sigma=True)
sd2 = np.sqrt(np.diag(cov))
out = {"software": {"scipy": scipy.__version__, "numpy": np.__version__}, "alpha_A3": beta[0], "sigma_alpha_A3": sd2[0],
       "correlation": cov[0, 1] / sd2[0] / sd2[1], "chi2": float((((model(P, *beta) - V) / sV) ** 2).sum()), "dof": len(P) - 2}
if absorbing:
    out |= {"nr": beta[1], "sigma_nr": sd2[1],
            "sigma_abs_m2": beta[1] * 4 * np.pi ** 2 * beta[0] * 1e-30 / (float(head["laser_nm"]) * 1e-9)}
else:
    out |= {"scale": beta[1], "sigma_scale": sd2[1]}
print(json.dumps(out, indent=1))
