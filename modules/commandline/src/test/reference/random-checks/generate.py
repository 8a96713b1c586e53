"""Values of every kind of the public checks at random inputs, by independent numerics.

Quadratures, direct sums, linear algebra and general optimisers of NumPy and SciPy stand in the place of closed forms wherever
there is a choice. Constants: CODATA 2018. Seeded; writes checks.json beside itself and notes the versions in it.
Usage: python3 generate.py
"""
import json, os
import numpy as np
import scipy
from scipy import integrate, optimize, special, stats

h, c0, kB, NA = 6.62607015e-34, 299792458.0, 1.380649e-23, 6.02214076e23
hbar, eps0, u = h / (2 * np.pi), 8.8541878128e-12, 1.66053906660e-27
me, muB, bohr, hartree, eV = 9.1093837015e-31, 9.2740100783e-24, 5.29177210903e-11, 4.3597447222071e-18, 1.602176634e-19
rng = np.random.default_rng(20310514)
cases = []


def U(lo, hi):
    return float("%.6g" % rng.uniform(lo, hi))


def q(value, unit="1"):
    if isinstance(value, np.ndarray):
        value = value.tolist()
    return {"value": value, "unit": unit}


def add(ident, inputs, expected, relative, absolute, how):
    number = sum(case["id"].startswith(ident) for case in cases) + 1
    cases.append({"id": "%sr%d" % (ident, number), "inputs": inputs, "expected": expected,
                  "tolerance": {"relative": relative, "absolute": absolute}, "how": how})


def beams():
    for _ in range(30):
        m, v, d = U(100, 1e5), U(5, 2000), U(5e-8, 1e-6)
        lam = h / (m * u * v)
        add("a.debroglie.", {"mass": q(m, "u"), "velocity": q(v, "m/s"), "grating_period": q(d, "m")},
            {"lambda_dB": q(lam, "m"), "talbot_length": q(d * d / lam, "m"), "talbot_time": q(d * d / lam / v, "s")},
            1e-8, 0, "definition")
    for _ in range(20):
        m, T = U(20, 5000), U(50, 3000)
        a = np.sqrt(2 * kB * T / (m * u))
        f = lambda p, k: integrate.quad(lambda x: x ** (p + k) * np.exp(-x * x), 0, 12)[0]
        top = lambda p: optimize.brentq(lambda x: p / x - 2 * x, 0.1, 5, xtol=1e-14)
        add("a.effusive.", {"mass": q(m, "u"), "temperature": q(T, "K")},
            {"v_mp_gas": q(a * top(2), "m/s"), "v_mean_gas": q(a * f(2, 1) / f(2, 0), "m/s"),
             "v_mp_flux": q(a * top(3), "m/s"), "v_mean_flux": q(a * f(3, 1) / f(3, 0), "m/s"),
             "v_rms_flux": q(a * np.sqrt(f(3, 2) / f(3, 0)), "m/s")}, 1e-8, 0, "quadrature")
    for _ in range(10):
        g, T, m = U(1.05, 1.67), U(50, 1500), U(4, 1000)
        add("a.supersonic.", {"gamma": q(g), "T0": q(T, "K"), "mass": q(m, "u")},
            {"v_inf": q(np.sqrt(2 * g / (g - 1) * kB * T / (m * u)), "m/s")}, 1e-8, 0, "energy balance")
    for _ in range(20):
        v, slope, g = U(30, 400), U(-2e-3, 2e-3), U(9.7, 9.9)
        z = [0.0, U(0.3, 1.2), U(1.5, 3.0)]
        y = [slope * s - 0.5 * g * (s / v) ** 2 for s in z]
        add("a.three_slit.", {"z": q(z, "m"), "y": q(y, "m"), "g": q(g, "m/s^2")}, {"v": q(v, "m/s")}, 1e-6, 0,
            "points of a computed parabola")
    for _ in range(15):
        v0, w, L = U(0, 400), U(20, 150), U(0.3, 3)
        hi = v0 + 12 * w
        f = lambda k: integrate.quad(lambda v: v ** (3 + k) * np.exp(-((v - v0) / w) ** 2), 0, hi,
                                     points=[max(v0 - 3 * w, 0), v0 + 0.5 * w, v0 + 3 * w], epsabs=0, epsrel=1e-13, limit=400)[0]
        n0, n1, n2, nm = f(0), f(1), f(2), f(-1)
        mode = optimize.brentq(lambda v: 3 / v - 2 * (v - v0) / w ** 2, 1e-3 * w, hi)
        peak = optimize.brentq(lambda v: 5 / v - 2 * (v - v0) / w ** 2, 1e-3 * w, hi)
        add("a.shifted_flux.", {"v0": q(v0, "m/s"), "vw": q(w, "m/s"), "flight_length": q(L, "m")},
            {"v_mode": q(mode, "m/s"), "v_mean": q(n1 / n0, "m/s"), "v_std": q(np.sqrt(n2 / n0 - (n1 / n0) ** 2), "m/s"),
             "v_harmonic": q(n0 / nm, "m/s"), "t_peak_of_arrival_density": q(L / peak, "s"),
             "L_over_t_peak": q(peak, "m/s")}, 2e-6, 0, "quadrature and roots")
    taps = {3: (3, 2), 4: (4, 3), 5: (5, 3), 6: (6, 5), 7: (7, 6)}
    for n in list(taps) * 2:
        state, bits = [1] * n, []
        for _ in range(2 ** n - 1):
            bits.append(state[-1])
            new = state[taps[n][0] - 1] ^ state[taps[n][1] - 1]
            state = [new] + state[:-1]
        s, N = np.array(bits, float), len(bits)
        y = rng.integers(0, 400, N).astype(float)
        circulant = np.array([[s[(j - i) % N] for i in range(N)] for j in range(N)])
        pm = 2 * s - 1
        add("a.prbs.", {"sequence": q(bits, "1 = open"), "counts_per_bin": q(y, "counts")},
            {"tof": q(np.linalg.solve(circulant, y), "counts"), "autocorrelation_zero_lag_pm1": q(float(pm @ pm)),
             "autocorrelation_other_lags_pm1": q(float(pm @ np.roll(pm, 2))),
             "uniform_offset_from_flat_background_7_per_bin": q(float(np.linalg.solve(circulant, 7 * np.ones(N))[0]), "counts")},
            1e-9, 1e-9, "solution of the circulant system")


def fisher(theta, J, mu):
    return np.linalg.inv((J / mu[:, None]).T @ J)


def sigma(theta, C):
    N, a, b = theta
    V = np.hypot(a, b) / N
    gV = np.array([-V / N, a / (N * N * V), b / (N * N * V)])
    r = a * a + b * b
    gp = np.array([0, b / r, -a / r])
    return np.sqrt(gV @ C @ gV), np.sqrt(gp @ C @ gp)


def fringes():
    for _ in range(20):
        M, N, V, B, phi = int(rng.integers(5, 60)), U(2, 2000), U(0.05, 0.92), U(0, 50), U(-3, 3)
        x = 2 * np.pi * np.arange(M) / M
        J = np.column_stack([np.ones(M), np.cos(x), np.sin(x)])
        theta = np.array([N, N * V * np.cos(phi), -N * V * np.sin(phi)])
        mu = J @ theta + B
        ml = sigma(theta, fisher(theta, J, mu))
        P = np.linalg.pinv(J)
        ls = sigma(theta, P @ np.diag(mu) @ P.T)
        add("b.sigma_V.", {"points_per_one_period": q(M), "mean_signal_per_point": q(N), "V": q(V),
                           "background_per_point_known": q(B), "phase": q(phi, "rad")},
            {"sigma_V_ML": q(ml[0]), "sigma_phi_ML": q(ml[1], "rad"), "sigma_V_LSQ": q(ls[0]),
             "sigma_phi_LSQ": q(ls[1], "rad")}, 1e-6, 0, "inverse Fisher matrix; covariance of the pseudo-inverse")
    for _ in range(15):
        s = U(0.01, 0.2)
        V = s * U(0, 8)
        f = lambda k: integrate.quad(lambda r: r ** (k + 1) / s ** 2 * np.exp(-(r - V) ** 2 / (2 * s * s))
                                     * special.ive(0, r * V / s ** 2), 0, V + 12 * s, points=[max(V - s, 0), V + s],
                                     epsabs=0, epsrel=1e-12, limit=300)[0]
        m2 = f(2)
        add("b.rice.", {"true_V": q(V), "sigma_quadrature": q(s)},
            {"mean_Vhat": q(f(1)), "mean_Vhat_squared": q(m2), "second_moment_corrected": q(V)}, 1e-8, 1e-8, "quadrature")
    for _ in range(15):
        s, cl = U(0.01, 0.1), float(rng.choice([0.9, 0.95, 0.99]))
        V = s * U(0.1, 6)
        cdf = lambda v: stats.ncx2.cdf((V / s) ** 2, 2, (v / s) ** 2) if v > 0 else 1 - np.exp(-V * V / (2 * s * s))
        up = optimize.brentq(lambda v: cdf(v) - (1 - cl), 0, V + 12 * s, xtol=1e-13) if cdf(0) > 1 - cl else 0.0
        like = lambda v: np.exp(-(v - V) ** 2 / (2 * s * s)) * special.ive(0, V * v / s ** 2)
        I = lambda e: integrate.quad(like, 0, e, points=[min(V, e)], epsabs=0, epsrel=1e-12, limit=300)[0]
        total = I(V + 14 * s)
        bayes = optimize.brentq(lambda v: I(v) - cl * total, 0.01 * s, V + 12 * s, xtol=1e-12)
        add("b.upper_limit.", {"V_hat": q(V), "sigma_quadrature": q(s), "confidence": q(cl)},
            {"classical_upper_limit": q(up), "bayes_flat_prior_upper_limit": q(bayes),
             "no_fringe_threshold": q(s * np.sqrt(stats.chi2.ppf(cl, 2)))}, 1e-5, 1e-6, "non-central chi-square, quadrature")
    for _ in range(10):
        sp, d, t = U(0, 1.5), U(1e-7, 1e-6), U(1e-9, 3e-7)
        jit = integrate.quad(lambda p: np.cos(p) * np.exp(-p * p / (2 * sp * sp)), 0, 12 * sp)[0] \
            / integrate.quad(lambda p: np.exp(-p * p / (2 * sp * sp)), 0, 12 * sp)[0]
        tr = integrate.quad(lambda x: np.cos(2 * np.pi * x * t / d), -0.5, 0.5)[0]
        add("b.jitter.", {"sigma_phi": q(sp, "rad"), "period": q(d, "m"), "travel_per_dwell": q(t, "m")},
            {"jitter_factor": q(jit), "travel_factor": q(tr)}, 1e-8, 1e-12, "quadrature")
    made = 0
    while made < 40:
        M, N, V, B, phi = int(rng.integers(8, 50)), U(15, 800), U(0.1, 0.7), U(0, 20), U(-3, 3)
        d = 266e-9
        x = np.round(np.sort(rng.uniform(0, U(0.9, 3.3) * d, M)), 12)
        J = np.column_stack([np.ones(M), np.cos(2 * np.pi * x / d), np.sin(2 * np.pi * x / d)])
        truth = J @ np.array([N, N * V * np.cos(phi), -N * V * np.sin(phi)])
        n = rng.poisson(truth + B).astype(float)
        if n.min() < 1 or np.linalg.cond(J) > 20:
            continue
        P = np.linalg.pinv(J)
        ls = P @ (n - B)
        lsV = sigma(ls, P @ np.diag(n) @ P.T)[0]
        w = 1 / np.sqrt(np.maximum(n, 1))
        Pw = np.linalg.pinv(J * w[:, None])
        wl = Pw @ ((n - B) * w)
        theta = ls.copy()
        for _ in range(200):
            mu = J @ theta + B
            if mu.min() <= 0:
                break
            step = np.linalg.solve(J.T @ (J * (n / mu ** 2)[:, None]), J.T @ (n / mu - 1))
            theta = theta + step
        mu = J @ theta + B
        if mu.min() <= 0.5 or not np.all(np.isfinite(mu)):
            continue
        s = sigma(theta, fisher(theta, J, mu))
        dev = 2 * float(np.sum(mu - n + n * np.log(n / mu)))
        amp = lambda t: float(np.hypot(t[1], t[2]) / t[0])
        ph = lambda t: float(np.arctan2(-t[2], t[1]))
        if min(abs(abs(ph(t)) - np.pi) for t in (ls, wl, theta)) < 1e-3 or abs(ph(theta)) < 0.05:
            continue
        add("b.fringe_fit.", {"position": q(x, "m"), "counts": q(n, "counts"), "period": q(d, "m"), "background_known": q(B)},
            {"N_LSQ": q(float(ls[0])), "V_LSQ": q(amp(ls)), "phi_LSQ": q(ph(ls), "rad"), "sigma_V_LSQ_from_counts": q(lsV),
             "V_WLSQ": q(amp(wl)), "phi_WLSQ": q(ph(wl), "rad"), "sigma_V_WLSQ": q(sigma(wl, Pw @ Pw.T)[0]),
             "chi2_WLSQ": q(float(np.sum(((n - B - J @ wl) * w) ** 2))), "N_ML": q(float(theta[0])), "V_ML": q(amp(theta)),
             "phi_ML": q(ph(theta), "rad"), "sigma_V_ML": q(s[0]), "sigma_phi_ML": q(s[1], "rad"), "deviance_ML": q(dev),
             "V_minmax_raw": q(float((n.max() - n.min()) / (n.max() + n.min() - 2 * B)))},
            1e-6, 1e-7, "singular value decomposition; Newton on the Poisson likelihood")
        made += 1
    for _ in range(10):
        a, b, p = U(0.1, 0.6), U(0, 0.25), U(-3, 3)
        f = lambda t: 1 + a * np.cos(t) + b * np.cos(2 * t + p)
        t = np.linspace(0, 2 * np.pi, 400001)
        hi, lo = f(t).max(), f(t).min()
        add("b.harmonics.", {"c1": q(a), "c2": q(b), "p": q(p, "rad")}, {"V_minmax": q(float((hi - lo) / (hi + lo)))},
            1e-7, 0, "dense grid")


TH = 2 * np.pi * np.arange(2048) / 2048


def kernel(n, a, c, K):
    return float(np.real(K * np.mean(np.exp(a * np.cos(TH) + 1j * c * np.sin(TH)) * np.exp(-1j * n * TH))))


def grating(n, xi, transmission):
    """Fourier component of t(x - xi d/2) t*(x + xi d/2), light gratings with the antinode at 0."""
    x = (np.arange(4096) + 0.5) / 4096
    return float(np.real(np.mean(transmission(x - xi / 2) * np.conj(transmission(x + xi / 2)) * np.exp(-2j * np.pi * n * x))))


def phase(phi0, n0=0.0):
    return lambda x: np.exp((1j * phi0 - n0 / 2) * np.cos(np.pi * x) ** 2)


def slits(n, xi, f):
    """Exact overlap of shifted slits, slit by slit."""
    total = 0j
    for k in range(-4, 5):
        lo, hi = max(-f / 2 + xi / 2, -f / 2 - xi / 2 + k), min(f / 2 + xi / 2, f / 2 - xi / 2 + k)
        if hi > lo:
            total += (hi - lo) if n == 0 else (np.exp(-2j * np.pi * n * lo) - np.exp(-2j * np.pi * n * hi)) / (2j * np.pi * n)
    return float(np.real(total))


def coefficients():
    for _ in range(60):
        phi0, n, xi = U(0.05, 12), int(rng.integers(-3, 7)), U(0, 3)
        add("c.B_phase.", {"phi0": q(phi0, "rad"), "n": q(n), "xi": q(xi)},
            {"B": q(grating(n, xi, phase(phi0))), "B_classical": q(kernel(n, 0, phi0 * np.pi * xi, 1))}, 1e-9, 1e-11,
            "midpoint rule on the definition")
    for _ in range(60):
        phi0, n0, n, xi = U(0.05, 10), U(0.05, 6), int(rng.integers(-3, 6)), U(0, 2)
        z, cc = n0 * np.sin(np.pi * xi / 2) ** 2, phi0 * np.sin(np.pi * xi)
        add("c.B_absorb.", {"phi0": q(phi0, "rad"), "n0_antinode": q(n0), "n": q(n), "xi": q(xi)},
            {"B_standing_mode_coherent": q(kernel(n, z, cc, np.exp(-z))),
             "B_poisson_random_walk": q(kernel(n, -z, cc, np.exp(-z)))}, 1e-9, 1e-11, "trapezoid rule over one period")
    for _ in range(40):
        phi0, n0, n, xi = U(0, 8), U(0.05, 20), int(rng.integers(-3, 5)), U(0, 2)
        add("c.B_deplete.", {"phi0": q(phi0, "rad"), "n0_antinode": q(n0), "n": q(n), "xi": q(xi)},
            {"B": q(grating(n, xi, phase(phi0, n0))),
             "B_classical": q(kernel(n, -n0 / 2, phi0 * np.pi * xi, np.exp(-n0 / 2)))}, 1e-9, 1e-11, "midpoint rule")
    sinc = lambda f: np.sinc(f)
    for _ in range(20):
        f1, f2, f3, r = U(0.2, 0.6), U(0.2, 0.6), U(0.2, 0.6), U(0, 2.5)
        add("c.TLI_slits.", {"f1": q(f1), "f2": q(f2), "f3": q(f3), "L_over_LT": q(r)},
            {"V_quantum": q(float(2 * abs(sinc(f1) * sinc(f3) * slits(2, r, f2)) / f2)),
             "V_classical": q(float(2 * abs(sinc(f1) * sinc(f3) * sinc(2 * f2))))}, 1e-9, 1e-11, "overlaps slit by slit")
    for _ in range(20):
        f, phi0, r = U(0.25, 0.6), U(0.1, 9), U(0.05, 2.5)
        V = lambda b: q(float(2 * sinc(f) ** 2 * abs(b)))
        add("c.KDTL.", {"f": q(f), "phi0": q(phi0, "rad"), "L_over_LT": q(r)},
            {"V_quantum": V(grating(2, r, phase(phi0))), "V_classical": V(kernel(2, 0, phi0 * np.pi * r, 1))},
            1e-9, 1e-11, "midpoint rule on the definition")
        n0 = U(0.1, 4)
        z, cc = n0 * np.sin(np.pi * r / 2) ** 2, phi0 * np.sin(np.pi * r)
        add("c.KDTL_absorbing.", {"f": q(f), "phi0": q(phi0, "rad"), "n0_antinode": q(n0), "L_over_LT": q(r)},
            {"V_standing_mode_coherent": V(kernel(2, z, cc, np.exp(-z))),
             "V_poisson_random_walk": V(kernel(2, -z, cc, np.exp(-z)))}, 1e-9, 1e-11, "trapezoid rule")
    for _ in range(20):
        n1, n2, n3, p2, r = U(1, 15), U(1, 15), U(1, 15), U(0, 6), U(0.1, 2.2)
        A = lambda n, k: kernel(k, -n / 2, 0, np.exp(-n / 2))
        outer = abs(A(n1, 1) * A(n3, 1) / (A(n1, 0) * A(n3, 0))) / A(n2, 0)
        add("c.three_pulse.", {"n1": q(n1), "n2": q(n2), "n3": q(n3), "phi2": q(p2, "rad"), "T_over_TT": q(r)},
            {"V_quantum": q(2 * outer * abs(grating(2, r, phase(p2, n2)))),
             "V_classical": q(2 * outer * abs(kernel(2, -n2 / 2, p2 * np.pi * r, np.exp(-n2 / 2)))),
             "mean_transmission_product": q(A(n1, 0) * A(n2, 0) * A(n3, 0))}, 1e-8, 1e-11, "midpoint and trapezoid rules")
    for _ in range(10):
        sv, tau, d = U(0.05, 2), U(1e-9, 3e-8), U(7e-8, 1e-7)
        f = integrate.quad(lambda v: np.exp(-v * v / 2) * np.cos(2 * np.pi * sv * v * tau / d), -12, 12, epsrel=1e-13,
                           limit=400)[0] / np.sqrt(2 * np.pi)
        add("c.detuned.", {"sigma_v": q(sv, "m/s"), "tau": q(tau, "s"), "d": q(d, "m")}, {"factor": q(f)}, 1e-8, 1e-12,
            "quadrature")
    for _ in range(3):
        b, w, d, C3, v, xc, r = U(5e-8, 2e-7), U(9e-8, 1.3e-7), 2.66e-7, U(0.3, 2), U(150, 400), U(6e-9, 1e-8), U(0.3, 1.4)
        f0, without, trans = walls(b, w, d, C3, 3, v, xc, r, True)
        add("c.TLI_vdW.", {"thickness_b": q(b, "m"), "slit_w": q(w, "m"), "period": q(d, "m"), "C3": q(C3, "meV nm^3"),
                           "velocity": q(v, "m/s"), "cutoff_xc": q(xc, "m"), "L_over_LT": q(r)},
            {"V_quantum": q(f0), "V_quantum_C3_zero_same_cutoff": q(without), "transmission_g2": q(trans)}, 2e-5, 0,
            "midpoint rule, 2e6 nodes")


def walls(b, w, d, C, n, v, xc, r, talbot):
    """Visibility behind bare outer slits with and without the potential, or order intensities."""
    nodes = 2000000
    x = ((np.arange(nodes) + 0.5) / nodes - 0.5) * d
    strength = C * 1e-3 * eV * 1e-9 ** n * b / (hbar * v)

    def t(x, on):
        s = x - d * np.rint(x / d)
        open_ = np.abs(s) < w / 2 - xc
        s = np.where(open_, s, 0.0)
        return np.where(open_, np.exp(1j * on * strength * ((w / 2 - s) ** -n + (w / 2 + s) ** -n)), 0)

    if not talbot:
        comp = lambda k, on: abs(np.mean(t(x, on) * np.exp(-2j * np.pi * k * x / d))) ** 2
        return [float(comp(k, 1)) for k in range(4)], [float(comp(k, 0)) for k in range(4)]
    A = np.sinc(w / d)
    B = lambda k, on: np.mean(t(x - r * d / 2, on) * np.conj(t(x + r * d / 2, on)) * np.exp(-2j * np.pi * k * x / d))
    T = float(np.mean(np.abs(t(x, 0)) ** 2))
    return float(2 * A * A * abs(B(2, 1)) / T), float(2 * A * A * abs(B(2, 0)) / T), T


def averages():
    def vis(v, wv, H, P, f, L, d, m, al, wy, cl=False):
        y, wyy = np.polynomial.legendre.leggauss(48) if H > 0 else (np.zeros(1), np.ones(1))
        r = L * h / (m * v * d * d)
        s = np.pi * r if cl else np.sin(np.pi * r)
        phi = 8 * np.sqrt(2 * np.pi) * al * P / (hbar * c0 * wy * v)
        amp = sum(k * special.jv(2, phi * np.exp(-2 * (yy * H / 2) ** 2 / wy ** 2) * s) for yy, k in zip(y, wyy)) / wyy.sum()
        if v.size == 1:
            return float(2 * np.sinc(f) ** 2 * abs(amp[0]))
        return float(2 * np.sinc(f) ** 2 * abs(integrate.simpson(wv * amp, x=v) / integrate.simpson(wv, x=v)))

    for _ in range(8):
        f, L, d, m, al, P, wy, v, s, H = (U(0.35, 0.5), U(0.08, 0.3), 2.66e-7, U(700, 3000), U(60, 200), U(1, 10),
                                          U(6e-4, 1.2e-3), U(120, 220), U(6, 12), U(1e-4, 5e-4))
        vv = np.linspace(v - 7 * s, v + 7 * s, 20001)
        g = np.exp(-(vv - v) ** 2 / (2 * s * s))
        args = (P, f, L, d, m * u, al * 1e-30, wy)
        add("d.average.", {"f": q(f), "L": q(L, "m"), "d": q(d, "m"), "mass": q(m, "u"), "alpha_vol": q(al, "angstrom^3"),
                           "P": q(P, "W"), "w_y": q(wy, "m"), "v_mean": q(v, "m/s"), "v_sigma": q(s, "m/s"),
                           "beam_height": q(H, "m")},
            {"V_monochromatic": q(vis(np.array([v]), None, 0, *args)), "V_gaussian_velocity": q(vis(vv, g, 0, *args)),
             "V_height_averaged_monochromatic": q(vis(np.array([v]), None, H, *args))}, 1e-5, 1e-7,
            "Simpson rule, 20001 velocities, 48 heights")
    given = [(3500.0, 210.0, 0.945e-3, 0.0, 130.0, 0.7e-3, 0.105)]
    given += [(U(500, 2500), U(50, 250), U(7e-4, 1.2e-3), U(80, 200), U(25, 60), U(1e-4, 6e-4), 0.105) for _ in range(2)]
    for m, al, wy, v0, vw, H, L in given:
        P = [0.5, 1.0, 2.0, 4.0, 8.0]
        v = np.linspace(8.0, v0 + 6 * vw, 100001)
        g = v ** 3 * np.exp(-((v - v0) / vw) ** 2)
        V = lambda cl: np.array([vis(v, g, H, p, 0.42, L, 2.66e-7, m * u, al * 1e-30, wy, cl) for p in P])
        add("d.VP_curve.", {"f": q(0.42), "L": q(L, "m"), "d": q(2.66e-7, "m"), "mass": q(m, "u"),
                            "alpha_vol": q(al, "angstrom^3"), "w_y": q(wy, "m"), "v0": q(v0, "m/s"), "vw": q(vw, "m/s"),
                            "beam_height": q(H, "m"), "P": q(P, "W")},
            {"V_quantum": q(V(False)), "V_classical": q(V(True))}, 2e-4, 1e-5, "Simpson rule, 100001 velocities, 48 heights")


def properties():
    y = np.linspace(-8, 8, 4001)
    for _ in range(20):
        al, P, wy, v, lam, sig = U(20, 500), U(0.5, 15), U(3e-4, 2e-3), U(30, 800), U(2e-7, 1.1e-6), U(1e-23, 1e-20)
        # antinode intensity 4 I0, I0 on the axis 2P/(pi w_y w_z); crossing time from the Gaussian along the beam
        wz = 2e-5
        line = integrate.simpson(np.exp(-2 * y ** 2), x=y) * wz
        I = 4 * 2 * P / (np.pi * wy * wz) * line / v
        aSI = 4 * np.pi * eps0 * al * 1e-30
        add("e.phi0.", {"alpha_vol": q(al, "angstrom^3"), "P": q(P, "W"), "w_y": q(wy, "m"), "v": q(v, "m/s"),
                        "laser_wavelength": q(lam, "m"), "sigma_abs": q(sig, "m^2")},
            {"alpha_SI": q(aSI, "C^2 m^2/J"), "alpha_au": q(aSI / (4 * np.pi * eps0 * bohr ** 3)),
             "phi0": q(aSI / (2 * eps0 * c0 * hbar) * I, "rad"), "n0_antinode": q(sig * lam / (h * c0) * I)}, 1e-7, 1e-12,
            "quadrature of the intensity along the flight")
    for _ in range(15):
        sig, lam, P, wy, v, m, D, d = (U(1e-22, 2e-20), U(3e-7, 8e-7), U(0.2, 6), U(4e-4, 1.5e-3), U(60, 300), U(300, 3000),
                                       U(5e-3, 8e-2), 2.66e-7)
        line = integrate.simpson(np.exp(-2 * y ** 2), x=y)
        nbar = sig * lam / (h * c0) * 2 * P / (np.pi * wy) * line / v
        theta = 2 * np.pi * D * (h / (m * u * v)) / (d * lam)
        if nbar > 20:
            continue
        k = np.arange(0, 200)
        z = np.sum(stats.poisson.pmf(k, nbar) * np.exp(1j * k * theta))
        if abs(np.angle(z)) > 3 or nbar > 3:
            continue
        add("e.recoil.", {"sigma_abs": q(sig, "m^2"), "laser_wavelength": q(lam, "m"), "P": q(P, "W"), "w_y": q(wy, "m"),
                          "v": q(v, "m/s"), "mass": q(m, "u"), "D": q(D, "m"), "d": q(d, "m")},
            {"nbar": q(nbar), "phase_per_photon": q(theta, "rad"), "V_over_V0": q(float(abs(z))),
             "fringe_shift_phase": q(float(np.angle(z)), "rad")}, 1e-7, 1e-10, "sum over photon numbers")
    debye = 3.33564095e-30
    for _ in range(15):
        al, dip, T, m, v, EE, za, l, L, d = (U(20, 400), U(0, 4), U(200, 900), U(300, 3000), U(80, 300), U(1e13, 3e14),
                                             U(0.01, 0.1), U(0.02, 0.06), U(0.2, 0.5), 2.66e-7)
        chi = 4 * np.pi * eps0 * al * 1e-30 + (dip * debye) ** 2 / (3 * kB * T)
        # trajectory through the field, fringe displacement x1 - 2 x2 + x3
        a = chi * EE / (m * u)
        x_at = lambda z: 0.0 if z < za else 0.5 * a * (min(z, za + l) - za) ** 2 / v ** 2 \
            + max(z - za - l, 0) * a * l / v ** 2
        shift = x_at(0) - 2 * x_at(L) + x_at(2 * L)
        if za + l > L:
            continue
        add("e.stark.", {"alpha_vol": q(al, "angstrom^3"), "dipole_rms": q(dip, "debye"), "T": q(T, "K"), "mass": q(m, "u"),
                         "v": q(v, "m/s"), "E_gradE": q(EE, "V^2/m^3"), "z_a": q(za, "m"), "length": q(l, "m"),
                         "L": q(L, "m"), "d": q(d, "m")},
            {"chi": q(chi, "C^2 m^2/J"), "fringe_shift": q(abs(shift), "m"), "fringe_phase": q(2 * np.pi / d * abs(shift), "rad")},
            1e-7, 0, "classical trajectory")
    for _ in range(12):
        g, Jm, T, BB, za, l, L, d, m, v = (U(1, 2.1), float(rng.choice([0.5, 1, 1.5, 2, 3])), U(300, 900), U(1, 60), U(0.01, 0.08),
                                           U(0.02, 0.05), U(0.2, 0.4), 2.66e-7, U(500, 1500), U(150, 300))
        chi = g * g * muB * muB * Jm * (Jm + 1) / (3 * kB * T)
        K = l * (za + l / 2)
        shift = chi * BB / (m * u * v * v) * K
        b = 2 * np.pi / d * g * muB * 1.0 / (m * u * v * v) * K
        mj = np.arange(-Jm, Jm + 0.5)
        add("e.magnetic.", {"g_J": q(g), "J": q(Jm), "T": q(T, "K"), "B_gradB": q(BB, "T^2/m"), "z_a": q(za, "m"),
                            "length": q(l, "m"), "L": q(L, "m"), "d": q(d, "m"), "mass": q(m, "u"), "v": q(v, "m/s")},
            {"chi_m": q(chi, "J/T^2"), "fringe_shift_paramagnetic": q(shift, "m"),
             "V_factor_mJ": q(float(abs(np.mean(np.exp(1j * b * mj)))))}, 1e-6, 1e-9, "sum over the moments")
    for _ in range(10):
        T, p0, C6, mg, v = U(280, 310), U(1e-5, 3e-4), U(100, 1500), U(4, 40), U(60, 140)
        L = 0.22
        vt = np.sqrt(2 * kB * T / (mg * u))
        total = lambda g: 8.08278 * (C6 * hartree * bohr ** 6 / (hbar * g)) ** 0.4
        # number of collisions per length over the Maxwellian gas: <|v - w| sigma(|v - w|)>/v
        speed = np.linspace(1e-6, 8 * vt, 4001)
        mu_ = np.polynomial.legendre.leggauss(64)
        g = np.sqrt(v * v + speed[:, None] ** 2 - 2 * v * speed[:, None] * mu_[0])
        inner = (g * total(g)) @ mu_[1] / 2
        f = 4 / np.sqrt(np.pi) / vt ** 3 * speed ** 2 * np.exp(-(speed / vt) ** 2)
        eff = integrate.simpson(f * inner, x=speed) / v
        add("e.collision.", {"L": q(L, "m"), "T_gas": q(T, "K"), "p0": q(p0, "Pa"), "C6": q(C6, "a.u. (hartree bohr^6)"),
                             "gas_mass": q(mg, "u"), "v": q(v, "m/s")},
            {"sigma_eff_from_p0": q(kB * T / (2 * L * p0), "m^2"), "sigma_eff_C6": q(float(eff), "m^2"),
             "p0_C6": q(float(kB * T / (2 * L * eff)), "Pa")}, 2e-3, 0,
            "average of the Landau-Lifshitz cross section over the gas; its series is good to 1e-3 here")
    for _ in range(10):
        m, t, f = U(500, 1e6), U(1e-4, 1), U(0.05, 0.98)
        add("e.macroscopicity.", {"mass": q(m, "u"), "time": q(t, "s"), "f": q(f)},
            {"mu": q(float(np.log10(abs(1 / np.log(f)) * (m * u / me) ** 2 * t)))}, 1e-8, 0, "definition")
    for _ in range(20):
        p, v0, phi, s = int(rng.choice([-2, -1, 1])), U(80, 300), U(0.2, 6), 0
        s = v0 * U(0.03, 0.13)
        v = np.linspace(max(v0 - 7 * s, 5.0), v0 + 7 * s, 400001)
        g = np.exp(-(v - v0) ** 2 / (2 * s * s))
        z = integrate.simpson(g * np.exp(1j * phi * (v / v0) ** p), x=v) / integrate.simpson(g, x=v)
        if abs(np.angle(z)) > 3.1 or abs(z) < 0.02 or abs(phi) > 3.1:
            continue
        add("e.dephasing.", {"phi_ref": q(phi, "rad"), "v0": q(v0, "m/s"), "sigma_v": q(s, "m/s"), "p": q(p)},
            {"V_factor": q(float(abs(z))), "mean_phase": q(float(np.angle(z)), "rad")}, 1e-7, 1e-9, "Simpson rule, 400001 nodes")
    for _ in range(10):
        L, v, d, Om, g = U(0.1, 1), U(50, 400), U(1e-7, 1e-6), U(1e-6, 1e-4), U(0.1, 9.9)
        # a straight path seen from the rotating frame: x(t) = v t sin(Om t), positions along the turned axis
        T = L / v
        drift = lambda n: v * n * T * np.sin(Om * n * T)
        add("e.inertial.", {"L": q(L, "m"), "v": q(v, "m/s"), "d": q(d, "m"), "Omega_perp": q(Om, "rad/s"), "g": q(g, "m/s^2")},
            {"phase_gravity": q(2 * np.pi / d * 0.5 * g * (4 * T * T - 2 * T * T), "rad"),
             "phase_coriolis_magnitude": q(2 * np.pi / d * abs(drift(2) - 2 * drift(1)), "rad")}, 1e-6, 0, "paths")
    t = 2 * np.pi * (np.arange(4096) + 0.5) / 4096
    for _ in range(12):
        A, f, L, v, d = U(1e-9, 1.2e-7), U(5, 2000), U(0.05, 0.3), U(60, 300), 2.66e-7
        T = L / v
        s = lambda n: A * np.sin(t + 2 * np.pi * f * n * T)
        common = float(abs(np.mean(np.exp(2j * np.pi / d * (s(0) - 2 * s(1) + s(2))))))
        one = lambda k: float(np.real(np.mean(np.exp(2j * np.pi / d * k * A * np.sin(t)))))
        sign = float(np.real(np.mean(np.exp(2j * np.pi / d * (s(0) - 2 * s(1) + s(2))))))
        if sign < 0 or one(1) ** 2 * one(2) < 0:
            continue
        add("e.vibration.", {"A": q(A, "m"), "frequency": q(f, "Hz"), "L": q(L, "m"), "v": q(v, "m/s"), "d": q(d, "m")},
            {"common_mode": q(common), "independent_product": q(one(1) ** 2 * one(2)), "second_grating_only": q(one(2))},
            1e-6, 1e-9, "average over the phase of the vibration")


def far_field():
    for n, ident in ((3, "f.vdw_orders.P01"), (4, "f.vdw_orders.P02")):
        for _ in range(3):
            C, b, w, d, v, xc = U(0.3, 2) * (1 if n == 3 else 20), U(5e-8, 2e-7), U(5e-8, 7e-8), 1e-7, U(150, 500), U(4e-9, 8e-9)
            on, off = walls(b, w, d, C, n, v, xc, 0, False)
            add(ident, {"n": q(n), "C_n": q(C, "meV nm^n"), "thickness_b": q(b, "m"), "slit_w": q(w, "m"), "period": q(d, "m"),
                        "v": q(v, "m/s"), "cutoff_xc": q(xc, "m")},
                {"P0_to_P3": q(on), "P0_to_P3_without_potential_same_cutoff": q(off)}, 1e-5, 1e-7, "midpoint rule, 2e6 nodes")
    for _ in range(15):
        m, v, d, N, D = U(100, 2000), U(80, 1000), U(8e-8, 3e-7), int(rng.integers(2, 60)), U(0.3, 2.5)
        a = float("%.6g" % (d * U(0.3, 0.7)))
        lam = h / (m * u * v)
        x1 = D * np.tan(np.arcsin(lam / d))
        gx, gw = np.polynomial.legendre.leggauss(40)

        def intensity(x):
            s = x / np.hypot(x, D)
            one = np.sum(gw / 2 * np.exp(2j * np.pi * s / lam * gx * a / 2))
            return float(abs(one * np.mean(np.exp(2j * np.pi * s / lam * d * np.arange(N)))) ** 2)

        add("f.farfield.", {"mass": q(m, "u"), "v": q(v, "m/s"), "d": q(d, "m"), "slit": q(a, "m"), "N": q(N),
                            "distance": q(D, "m")},
            {"lambda": q(lam, "m"), "first_order_position": q(float(x1), "m"),
             "I_at_0_quarter_half_first_second": q([intensity(k * x1) for k in (0, 0.25, 0.5, 1)]
                                                   + [intensity(D * np.tan(np.arcsin(2 * lam / d)))])}, 1e-6, 1e-9,
            "sum over slits, quadrature over each")
    for _ in range(10):
        m, v, d, th = U(100, 2000), U(50, 500), U(1e-7, 5e-7), U(1e-6, 1e-2)
        lam = h / (m * u * v)
        tb = float(np.arcsin(lam / (2 * d)))
        add("f.bragg.", {"mass": q(m, "u"), "v": q(v, "m/s"), "d": q(d, "m"), "thickness": q(th, "m")},
            {"theta_B": q(tb, "rad"), "order_separation": q(2 * tb, "rad"), "Q": q(2 * np.pi * lam * th / d ** 2)}, 1e-8, 0,
            "definition")
    for _ in range(12):
        phi0 = U(0.05, 12)
        x = (np.arange(4096) + 0.5) / 4096
        t = np.exp(1j * phi0 * np.cos(np.pi * x) ** 2)
        add("f.raman_nath.", {"phi0": q(phi0, "rad")},
            {"P_n_from_0": q([float(abs(np.mean(t * np.exp(-2j * np.pi * n * x))) ** 2) for n in range(4)])}, 1e-9, 1e-12,
            "Fourier components of the transmission")


def ovens():
    D = 1.4e-9
    for _ in range(15):
        A, B, T, area, m, Tg, pg = U(9, 12), U(5000, 10000), U(600, 1000), U(1e-7, 5e-6), U(200, 2000), U(280, 310), U(1e-7, 1e-3)
        p = 10 ** (A - B / T)
        # flux through an aperture: n <v cos> over the half space, by quadrature of the Maxwellian
        a = np.sqrt(2 * kB * T / (m * u))
        mean = integrate.quad(lambda x: x ** 3 * np.exp(-x * x), 0, 12)[0] * 4 / np.sqrt(np.pi) * a
        rate = p / (kB * T) * area * mean * integrate.quad(lambda t: np.cos(t) * np.sin(t), 0, np.pi / 2)[0] / 2
        sigma_ = np.pi * D * D
        add("g.oven.", {"A": q(A), "B": q(B, "K"), "T": q(T, "K"), "area": q(area, "m^2"), "mass": q(m, "u"),
                        "diameter": q(D, "m"), "T_gas": q(Tg, "K"), "p_gas": q(pg, "Pa")},
            {"p_vap": q(p, "Pa"), "enthalpy": q(B * kB * NA * np.log(10), "J/mol"), "effusion_rate": q(rate, "1/s"),
             "mean_free_path_self_in_vapour": q(kB * T / (np.sqrt(2) * sigma_ * p), "m"),
             "mean_free_path_fast_beam_sigma_piD2": q(kB * Tg / (sigma_ * pg), "m")}, 1e-7, 0, "quadrature")


for part in (beams, fringes, coefficients, averages, properties, far_field, ovens):
    part()
out = os.path.join(os.path.dirname(os.path.abspath(__file__)), "checks.json")
with open(out, "w") as f:
    f.write('{"generator": "generate.py, seed 20310514, NumPy %s, SciPy %s", "cases": [\n' % (np.__version__, scipy.__version__))
    f.write(",\n".join(json.dumps(case) for case in cases))
    f.write("\n]}\n")
print(len(cases), "cases")
