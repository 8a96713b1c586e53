"""Polarizability from vp_01 when the powers have standard uncertainties too, by orthogonal distance regression.

Model (monochromatic, no absorption): V(P) = s 2 sinc^2(pi f) |J2(phi0 sin(pi L/L_T))|, phi0 = 8 sqrt(2 pi) a P/(hbar c w_y v),
L_T = m v d^2/h. Written independently of the program; SciPy's ODRPACK does the fit.
Usage: python3 generate-odr.py vp_01.csv > odr.json
"""
import json, sys
import numpy as np
import scipy
from scipy import odr
from scipy.special import jv

h = 6.62607015e-34; c = 299792458.0; u = 1.66053906660e-27; hbar = h / (2 * np.pi)
head, rows = {}, []
for line in open(sys.argv[1]):
    if line.startswith("#"):
        k, _, v = line[1:].partition(":"); head[k.strip()] = v.strip()
    elif line[0].isdigit():
        rows.append([float(x) for x in line.split(",")])
P, V, sV = np.array(rows).T
m = float(head["mass_u"]) * u; v = float(head["v_mean_m_s"]); d = float(head["d_m"]); L = float(head["L_m"])
f = float(head["open_fraction"]); w = float(head["w_y_m"])
talbot = m * v * d * d / h
front = 2 * np.sinc(f) ** 2
def model(beta, x):
    phi0 = 8 * np.sqrt(2 * np.pi) * beta[0] * 1e-30 * x / (hbar * c * w * v)
    return beta[1] * front * np.abs(jv(2, phi0 * np.sin(np.pi * L / talbot)))
out = {"software": {"scipy": scipy.__version__, "numpy": np.__version__}, "cases": []}
for uP in (0.0, 0.05, 0.1):
    if uP == 0:
        from scipy.optimize import curve_fit
        beta, cov = curve_fit(lambda x, a, s: model((a, s), x), P, V, p0=(150, 1), sigma=sV, absolute_sigma=True)
        sd = np.sqrt(np.diag(cov))
    else:
        run = odr.ODR(odr.RealData(P, V, sx=np.full_like(P, uP), sy=sV), odr.Model(model), beta0=[150.0, 1.0], maxit=500).run()
        beta, sd = run.beta, np.sqrt(np.diag(run.cov_beta))
    out["cases"].append({"u_power_W": uP, "alpha_A3": beta[0], "sigma_alpha_A3": sd[0], "scale": beta[1], "sigma_scale": sd[1]})
print(json.dumps(out, indent=1))
