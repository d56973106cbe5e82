"""Muonium lines, exchange-matrix eigenvalues and joint fits of temperature scans by general-purpose libraries.

  lines.json        four lines from the 4 x 4 Hamiltonian (spin matrices by Kronecker product, mpmath, 30 digits)
  eigenvalues.json  slowest eigenvalue of the five-state exchange matrix (mpmath, 40 digits)
  joint-fits.json   invented temperature scans (numpy seeds) and their joint fits: SciPy least_squares with bounds from many
                    starts for the minimum and (J^T J)^-1, iminuit for the minimum again and MINOS intervals, SciPy brentq on
                    the profile for the upper limit of a rate at zero

Run from the project root:  /usr/bin/python3 tests/reference/charge-cycle.py fixtures/reference/charge-cycle
"""

import json
import platform
import sys

import iminuit
import mpmath
import numpy as np
import scipy
from scipy.optimize import brentq, least_squares

GAMMA_E = 28024.9514  # MHz/T
GAMMA_MU = 135.5388  # MHz/T
K_MEV = 1.380649e-23 / 1.602176634e-19 * 1000

VERSIONS = {
    "python": platform.python_version(),
    "numpy": np.__version__,
    "scipy": scipy.__version__,
    "mpmath": mpmath.__version__,
    "iminuit": iminuit.__version__,
}


# --- lines ------------------------------------------------------------------------------------------------------------


def hamiltonian_lines(a_mhz, b_mt):
    half = mpmath.mpf(1) / 2
    sx = mpmath.matrix([[0, half], [half, 0]])
    sy = mpmath.matrix([[0, -half * 1j], [half * 1j, 0]])
    sz = mpmath.matrix([[half, 0], [0, -half]])
    one = mpmath.eye(2)

    def kron(p, q):
        out = mpmath.matrix(4, 4)
        for i in range(2):
            for j in range(2):
                for k in range(2):
                    for l in range(2):
                        out[2 * i + k, 2 * j + l] = p[i, j] * q[k, l]
        return out

    b = mpmath.mpf(b_mt) / 1000
    h = mpmath.matrix(4, 4)
    for s in (sx, sy, sz):
        h += mpmath.mpf(a_mhz) * kron(s, one) * kron(one, s)
    h += mpmath.mpf(GAMMA_E) * b * kron(sz, one) - mpmath.mpf(GAMMA_MU) * b * kron(one, sz)
    levels, vectors = mpmath.eighe(h)
    raise_mu = kron(one, sx + 1j * sy)
    amplitude = vectors.H * raise_mu * vectors
    lines = []
    for i in range(4):
        for j in range(4):
            weight = abs(amplitude[i, j]) ** 2 / 2
            if weight > 1e-20:
                lines.append([float(levels[i] - levels[j]), float(weight)])
    return sorted(lines)


def write_lines():
    mpmath.mp.dps = 30
    cases = [
        {"hyperfineMHz": a, "fieldMt": b, "lines": hamiltonian_lines(a, b)}
        for a, b in [(2359.5, 100), (2359.5, 10), (4463.302, 300), (2006.3, 1), (3711, 2000)]
    ]
    return {"about": "[signed MHz, weight], ascending", "versions": VERSIONS, "cases": cases}


# --- exchange matrix --------------------------------------------------------------------------------------------------


def offsets_and_weights(a_mhz, b_mt):
    lines = np.array(hamiltonian_lines(a_mhz, b_mt))
    return 2 * np.pi * (lines[:, 0] + GAMMA_MU * b_mt / 1000), lines[:, 1]


def exchange(offsets, weights, capture, ionisation, matrix):
    matrix[0, 0] = -capture
    for j in range(4):
        matrix[j + 1, 0] = weights[j] * capture
        matrix[0, j + 1] = ionisation
        matrix[j + 1, j + 1] = 1j * offsets[j] - ionisation
    return matrix


def write_eigenvalues():
    mpmath.mp.dps = 40
    cases = []
    for b in (10, 100):
        offsets, weights = offsets_and_weights(2359.5, b)
        for capture in (0.01, 5, 100):
            for ionisation in (200, 1585, 12000, 50000):
                matrix = mpmath.matrix(5, 5)
                exchange(offsets, weights, capture, ionisation, matrix)
                values = mpmath.eig(matrix, left=False, right=False)
                slowest = max(values, key=lambda value: value.real)
                cases.append(
                    {
                        "fieldMt": b,
                        "capturePerUs": capture,
                        "ionisationPerUs": ionisation,
                        "ratePerUs": float(-slowest.real),
                        "shiftPerUs": float(slowest.imag),
                    }
                )
    return {"about": "A = 2359.5 MHz", "versions": VERSIONS, "cases": cases}


# --- joint fits -------------------------------------------------------------------------------------------------------


class Series:
    def __init__(self, name, b_mt, activation, exact, truth, temperatures, sigma, seed, prior=None):
        self.name, self.b_mt, self.activation, self.exact = name, b_mt, activation, exact
        self.prior = prior
        self.offsets, self.weights = offsets_and_weights(2359.5, b_mt)
        self.energies = truth["energies"]
        self.n = len(self.energies)
        self.t = np.array(temperatures)
        rng = np.random.default_rng(seed)
        p = np.concatenate([[np.log(truth["attempt"])], truth["activation"], truth["capture"], [truth["baseline"]]])
        saved, self.exact = self.exact, True
        clean = self.rates(p)
        self.exact = saved
        # Six decimals, as a file would hold them.
        self.y = np.round(clean + sigma * rng.standard_normal(clean.shape), 6)
        self.sigma = sigma

    @property
    def n_activation(self):
        return 1 if self.activation == "shared" else self.n

    def rates(self, p):
        activation = np.broadcast_to(p[1 : 1 + self.n_activation], (self.n,))
        capture = p[1 + self.n_activation : -1]
        ionisation = np.exp(p[0] - activation[:, None] / (K_MEV * self.t[None, :]))
        if not self.exact:
            square = self.offsets**2
            share = (self.weights * square / (square + ionisation[..., None] ** 2)).sum(-1)
            return p[-1] + capture[:, None] * share
        out = np.empty_like(ionisation)
        for i in range(self.n):
            for k in range(len(self.t)):
                m = exchange(self.offsets, self.weights, capture[i], ionisation[i, k], np.zeros((5, 5), complex))
                values, vectors = np.linalg.eig(m)
                # The mode that holds most of the diamagnetic signal: the line that is measured.
                amplitude = vectors[0] * np.linalg.inv(vectors)[:, 0]
                out[i, k] = -values[np.argmax(abs(amplitude))].real
        return p[-1] + out

    def residuals(self, p):
        r = ((self.rates(p) - self.y) / self.sigma).ravel()
        if self.prior:
            r = np.concatenate([r, (p[1 : 1 + self.n_activation] - self.prior[0]) / self.prior[1]])
        return r

    def bounds(self):
        n = self.n_activation
        low = np.concatenate([[np.log(1e3)], np.full(n, 1.0), np.zeros(self.n + 1)])
        high = np.concatenate([[np.log(1e10)], np.full(n, 3000.0), np.full(self.n + 1, np.inf)])
        return low, high

    def fit(self, starts):
        low, high = self.bounds()
        best = None
        for log_attempt, step in starts:
            activation = K_MEV * step * (log_attempt - np.log(1e4))
            plateau = np.maximum(self.y.max(axis=1), 0.01)
            p0 = np.concatenate([[log_attempt], np.full(self.n_activation, activation), plateau, [0.02]])
            run = least_squares(
                self.residuals, np.clip(p0, low + 1e-9, high - 1e-9), bounds=(low, high),
                x_scale="jac", ftol=1e-15, xtol=1e-15, gtol=1e-13, max_nfev=2000,
                jac="3-point",
            )
            if best is None or run.cost < best.cost:
                best = run
        return best

    def minuit(self, start, named):
        names = ["logAttempt"]
        names += ["activation" if self.n_activation == 1 else f"activation{i}" for i in range(self.n_activation)]
        names += [f"capture{i}" for i in range(self.n)] + ["baseline"]
        m = iminuit.Minuit(lambda p: float((self.residuals(np.asarray(p)) ** 2).sum()), start, name=names)
        m.errordef = 1
        m.strategy = 2
        m.tol = 1e-6
        for name in names[1 + self.n_activation :]:
            m.limits[name] = (0, None)
        m.migrad(ncall=200000)
        m.minos(*named)
        intervals = {}
        for name in named:
            e = m.merrors[name]
            intervals[name] = [m.values[name] + e.lower, m.values[name] + e.upper] if e.is_valid else None
        return {"values": list(m.values), "chiSquare": float(m.fval), "minos68": intervals}

    def upper_limit(self, best, index, rise):
        low, high = self.bounds()
        keep = np.arange(len(best.x)) != index

        def chi(value):
            def residuals(q):
                p = best.x.copy()
                p[keep] = q
                p[index] = value
                return self.residuals(p)

            run = least_squares(
                residuals, np.clip(best.x[keep], low[keep] + 1e-12, high[keep]), bounds=(low[keep], high[keep]),
                x_scale="jac", ftol=1e-15, xtol=1e-15, gtol=1e-13, jac="3-point",
            )
            return 2 * run.cost

        floor = 2 * best.cost
        return brentq(lambda value: chi(value) - floor - rise, best.x[index], best.x[index] + 1.0, xtol=1e-9)


def describe(series, named, limit_of=None):
    starts = [(a, t) for a in (12.0, 14.0, 16.0, 19.0) for t in (150.0, 220.0, 300.0)]
    if series.exact:
        starts = starts[4:6]
    best = series.fit(starts)
    j = best.jac
    # Rates at zero are kept as if they could go below.
    covariance = np.linalg.inv(j.T @ j)
    out = {
        "name": series.name,
        "fieldMt": series.b_mt,
        "activation": series.activation,
        "method": "exchange matrix" if series.exact else "closed form",
        "prior": series.prior and {"mean": series.prior[0], "sigma": series.prior[1]},
        "energiesKeV": series.energies,
        "temperaturesK": list(map(float, series.t)),
        "sigma": series.sigma,
        "rates": series.y.tolist(),
        "theta": best.x.tolist(),
        "chiSquare": float(2 * best.cost),
        "covariance": covariance.tolist(),
        "minuit": series.minuit(best.x, named) if named else None,
    }
    if limit_of is not None:
        out["upper95"] = {"index": limit_of, "value": series.upper_limit(best, limit_of, 3.841458820694124)}
    return out


def write_joint_fits():
    mpmath.mp.dps = 30
    warm = np.arange(170, 301, 10)
    cases = [
        describe(
            Series(
                "shared activation energy", 100, "shared", False,
                {"energies": [2, 5, 9, 14, 20], "attempt": 3e6, "activation": [150.0],
                 "capture": [0.15, 0.5, 1.2, 1.9, 2.3], "baseline": 0.08},
                warm, 0.02, 11,
            ),
            ["logAttempt", "activation", "capture0", "capture4", "baseline"],
        ),
        describe(
            Series(
                "an activation energy per energy, with a prior", 60, "per energy", False,
                {"energies": [4, 9, 16], "attempt": 8e6, "activation": [165.0, 172.0, 180.0],
                 "capture": [0.6, 1.4, 2.5], "baseline": 0.1},
                warm, 0.025, 12, prior=(175.0, 12.0),
            ),
            ["logAttempt", "activation0", "capture1", "baseline"],
        ),
        describe(
            Series(
                "fast capture in a low field", 15, "shared", True,
                {"energies": [6, 12, 18], "attempt": 3e6, "activation": [150.0],
                 "capture": [12.0, 45.0, 110.0], "baseline": 0.1},
                warm, 0.3, 13,
            ),
            ["logAttempt", "activation", "capture2"],
        ),
        describe(
            Series(
                "a rate at zero", 100, "shared", False,
                {"energies": [2, 9, 16], "attempt": 3e6, "activation": [150.0],
                 "capture": [0.0, 1.1, 2.0], "baseline": 0.12},
                warm, 0.02, 17,
            ),
            None,
            limit_of=2,
        ),
    ]
    return {"about": "theta = ln(nu us), E_A (meV), Lambda_c (1/us), lambda_0 (1/us); A = 2359.5 MHz", "versions": VERSIONS, "cases": cases}


def main():
    folder = sys.argv[1]
    for name, content in [("lines", write_lines), ("eigenvalues", write_eigenvalues), ("joint-fits", write_joint_fits)]:
        with open(f"{folder}/{name}.json", "w", encoding="utf8") as out:
            json.dump(content(), out, indent=1)
            out.write("\n")


main()
