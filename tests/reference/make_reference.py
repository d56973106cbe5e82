#!/usr/bin/python3
"""Makes the reference values of fixtures/reference/inversion with general-purpose libraries.

Run with Debian's python3 (packages python3-scipy, python3-iminuit, python3-mpmath):
    /usr/bin/python3 tests/reference/make_reference.py
The versions used are written into every file. Nothing here shares code with the product: folds come
from scipy.special.erfc bin by bin, or from quadrature with mpmath; fits from scipy.optimize.least_squares
with many starts; intervals from iminuit's minos and from a profile walked out with scipy.optimize.brentq.
"""
import json
import os
import platform

import iminuit
import mpmath
import numpy as np
import scipy
from scipy.optimize import brentq, least_squares
from scipy.special import erfc

OUT = os.path.join(os.path.dirname(__file__), "..", "..", "fixtures", "reference", "inversion")
VERSIONS = {
    "python": platform.python_version(),
    "numpy": np.__version__,
    "scipy": scipy.__version__,
    "iminuit": iminuit.__version__,
    "mpmath": mpmath.__version__,
}
mpmath.mp.dps = 30


def write(name, body):
    os.makedirs(OUT, exist_ok=True)
    with open(os.path.join(OUT, name), "w") as f:
        json.dump({"madeBy": "tests/reference/make_reference.py", "versions": VERSIONS, **body}, f, indent=1)
        f.write("\n")


# --- normal distribution -------------------------------------------------------------------------
def make_normal():
    ts = [float(t) for t in np.linspace(-7.9, 7.9, 159)] + [0.015624, 0.015626, -3.1093749, 1e-9, -1e-12]
    rows = [[t, float(mpmath.ncdf(mpmath.mpf(t))), float(mpmath.npdf(mpmath.mpf(t)))] for t in ts]
    write("normal.json", {"what": "t, cumulative normal, normal density; mpmath at 30 digits", "rows": rows})


# --- folds by quadrature ---------------------------------------------------------------------------
def fold_quadrature(edges, mass, W, w, d, a):
    """share folded with s, share in the cap: integrals of the scaled histogram over depth, 30 digits."""
    share, cap = mpmath.mpf(0), mpmath.mpf(0)
    W, w, d, a = (mpmath.mpf(v) for v in (W, w, d, a))
    for l, r, m in zip(edges[:-1], edges[1:], mass):
        left, right = mpmath.mpf(l) * a, mpmath.mpf(r) * a
        rho = mpmath.mpf(m) / (right - left)
        if left < d:
            cap += rho * (min(d, right) - left)
            left = min(d, right)
        if right <= left:
            continue
        if w == 0:
            share += rho * max(mpmath.mpf(0), right - max(left, W + d))
            continue
        cuts = [left] + [W + d + k * w for k in range(-8, 9) if left < W + d + k * w < right] + [right]
        share += rho * mpmath.quad(lambda x: mpmath.erfc((W + d - x) / (mpmath.sqrt(2) * w)) / 2, cuts)
    return float(share), float(cap)


def make_folds():
    rng = np.random.default_rng(20260114)
    cases = []
    for k in range(24):
        bins = int(rng.integers(6, 30))
        edges = np.concatenate([[0.0 if k % 3 else float(rng.uniform(0.5, 4))], np.zeros(bins)])
        edges[1:] = edges[0] + np.cumsum(rng.uniform(0.3, 14, bins))
        mass = rng.gamma(0.7, 1.0, bins)
        mass[rng.uniform(size=bins) < 0.15] = 0.0
        mass /= mass.sum()
        d = 0.0 if k % 2 == 0 else float(rng.uniform(1, edges[-1] / 4))
        a = 1.0 if k % 4 < 2 else float(rng.uniform(0.9, 1.1))
        W = float(rng.uniform(0, 0.9 * (edges[-1] * a - d)))
        w = [0.0, float(rng.uniform(0.02, 0.5)), float(rng.uniform(1, 8)), float(rng.uniform(20, 80))][k % 4 if k < 20 else 2]
        share, cap = fold_quadrature(edges.tolist(), mass.tolist(), W, w, d, a)
        cases.append(
            {"edgesNm": edges.tolist(), "mass": mass.tolist(), "edgeDepthNm": W, "edgeWidthNm": w,
             "capThicknessNm": d, "depthScale": a, "populatedShare": share, "capShare": cap}
        )
    write("folds.json", {"what": "folds of histograms by quadrature, mpmath at 30 digits", "cases": cases})


# --- whole inversions -------------------------------------------------------------------------------
ENERGIES = [2, 3, 4, 5, 6, 8, 10, 12, 14, 16, 18, 20, 22]
EDGES = np.arange(0, 241, 1.5)


def masses():
    out = []
    for e in ENERGIES:
        mean = 8 * e**0.85
        sigma = 0.4 * mean + 2
        m = np.exp(-0.5 * (((EDGES[1:] + EDGES[:-1]) / 2 - mean) / sigma) ** 2)
        out.append(np.round(m * 1e5))
    return np.array(out)


COUNTS = masses()
MASS = COUNTS / COUNTS.sum(axis=1, keepdims=True)


def fold(W, w, d, a):
    """populated share and cap share per energy, bin by bin."""
    left, right = EDGES[:-1] * a - d, EDGES[1:] * a - d
    rho = MASS / (right - left)
    start = np.maximum(left, 0.0)
    inside = np.maximum(right, 0.0) - start
    cap = (rho * (right - left - inside)).sum(axis=1)
    if w <= 0:
        s = np.maximum(0.0, np.minimum(right, np.maximum(right, 0)) - np.maximum(start, W))
        s[right <= 0] = 0
    else:
        g = lambda x: w / np.sqrt(2) * ((x - W) / (np.sqrt(2) * w) * erfc(-(x - W) / (np.sqrt(2) * w)) + np.exp(-(((x - W) / (np.sqrt(2) * w)) ** 2)) / np.sqrt(np.pi))
        s = np.where(right > 0, g(np.maximum(right, 0.0)) - g(start), 0.0)
    return (rho * s).sum(axis=1), cap


def predict(p, d):
    s, q = fold(p["edgeDepthNm"], p.get("edgeWidthNm", 0.0), d, p["depthScale"])
    return p["levelTop"] + (p["levelBulk"] - p["levelTop"]) * s + (p.get("levelCap", 0.0) - p["levelTop"]) * q


class Case:
    def __init__(self, name, profile, observable, truth, sigma, seed, polarity="depletion", cap=0.0, held=None, priors=None, free_scale=False, baseline=0.0):
        self.name, self.profile, self.observable, self.truth, self.cap = name, profile, observable, truth, cap
        self.polarity, self.held, self.priors, self.baseline = polarity, dict(held or {}), dict(priors or {}), baseline
        if free_scale:
            self.priors.setdefault("depthScale", [1.0, 0.03])
        else:
            self.held.setdefault("depthScale", 1.0)
        names = ["edgeDepthNm"] + (["edgeWidthNm"] if profile == "graded" else []) + ["levelTop", "levelBulk"]
        if cap > 0:
            names.append("levelCap")
        names.append("depthScale")
        self.names = names
        self.free = [n for n in names if n not in self.held]
        self.sigma = np.full(len(ENERGIES), sigma)
        self.y = np.round(predict({"depthScale": 1.0, **truth}, cap) + self.sigma * np.random.default_rng(seed).normal(size=len(ENERGIES)), 6)
        top = 1.0 if observable == "fraction" else np.inf
        deepest = EDGES[-1] * self.held.get("depthScale", 1.0) - cap
        self.bounds = {"edgeDepthNm": (0, deepest), "edgeWidthNm": (0, deepest), "levelTop": (baseline, top), "levelBulk": (baseline, top), "levelCap": (0, top), "depthScale": (0.5, 2)}

    def residuals(self, free, values):
        p = dict(self.held)
        p.update(zip(free, values))
        r = (self.y - predict(p, self.cap)) / self.sigma
        extra = [(p[n] - m) / s for n, (m, s) in self.priors.items() if n in self.free]
        return np.concatenate([r, extra])

    def minimise(self, fixed=None, starts=None):
        """best of many bounded least-squares runs, the parameters in `fixed` held."""
        fixed = fixed or {}
        free = [n for n in self.free if n not in fixed]
        if not free:
            p = {**self.held, **fixed}
            return float((self.residuals(list(fixed), list(fixed.values())) ** 2).sum()), p
        # The width is replaced by zero exactly where the search ends there: its derivative vanishes at the bound.
        zero_options = [False, True] if "edgeWidthNm" in free else [False]
        found = {}
        for zero in zero_options:
            names = [n for n in free if not (zero and n == "edgeWidthNm")]
            constant = dict(fixed, **({"edgeWidthNm": 0.0} if zero else {}))
            f = lambda v: self.residuals(names + list(constant), list(v) + list(constant.values()))
            lo = np.array([self.bounds[n][0] for n in names], float)
            hi = np.array([self.bounds[n][1] for n in names], float)
            for start in starts or self.starts():
                x0 = np.clip([start[n] for n in names], lo + 1e-9, np.where(np.isfinite(hi), hi - 1e-9, np.inf))
                r = least_squares(f, x0, bounds=(lo, hi), xtol=1e-15, ftol=1e-15, gtol=1e-15, x_scale=[self.scale(n) for n in names], max_nfev=400)
                chi = float((r.fun**2).sum())
                if zero not in found or chi < found[zero][0]:
                    found[zero] = (chi, {**self.held, **constant, **dict(zip(names, map(float, r.x)))})
        best = found[False]
        if True in found and found[True][0] <= best[0] + 1e-7:
            best = found[True]
        if self.profile == "sharp" and "edgeDepthNm" in free:
            best = self.sharpen(best, fixed)
        return best

    def sharpen(self, best, fixed):
        """a sharp edge has kinks in chi-square at bin borders: minimise over the edge bin by bin."""
        from scipy.optimize import minimize_scalar
        chi, p = best
        others = [dict(p)]
        f = lambda W: self.minimise({**fixed, "edgeDepthNm": float(W)}, others)[0] if [n for n in self.free if n not in fixed and n != "edgeDepthNm"] else float((self.residuals(["edgeDepthNm", *fixed], [W, *fixed.values()]) ** 2).sum())
        centre = p["edgeDepthNm"]
        for k in range(-2, 3):
            l = (np.floor((centre + self.cap) / 1.5) + k) * 1.5 - self.cap
            r = minimize_scalar(f, bounds=(max(0, l), l + 1.5), method="bounded", options={"xatol": 1e-10})
            if r.fun < chi:
                chi = float(r.fun)
                p = self.minimise({**fixed, "edgeDepthNm": float(r.x)}, others)[1]
        return chi, p

    def scale(self, n):
        return {"edgeDepthNm": 10, "edgeWidthNm": 5, "depthScale": 0.03}.get(n, 0.05)

    def starts(self):
        lo, hi = float(self.y.min()), float(self.y.max())
        out = []
        for W in np.linspace(10, 170, 9):
            for w in ([3.0, 25.0] if self.profile == "graded" else [0.0]):
                for t, b in ((self.y[0], self.y[-1]), (lo, hi), (hi, lo)):
                    out.append({"edgeDepthNm": W, "edgeWidthNm": w, "levelTop": float(t), "levelBulk": float(b), "levelCap": float(self.y[0]), "depthScale": 1.0})
        return out

    def minos(self, chi, best):
        """iminuit's own intervals; None where it does not call them valid. For the record beside the walked profile."""
        names = self.free
        f = lambda *v: float((self.residuals(names, v) ** 2).sum())
        m = iminuit.Minuit(f, *[best[n] for n in names], name=names)
        m.errordef = 1.0
        m.tol = 1e-4
        m.strategy = 2
        for n in names:
            lo, hi = self.bounds[n]
            m.limits[n] = (lo, None if np.isinf(hi) else hi)
        m.migrad()
        m.hesse()
        out = {"chiSquare": float(m.fval), "valid": bool(m.valid), "hesse": {n: float(m.errors[n]) for n in names}, "minos68": {}}
        for n in [x for x in ("edgeDepthNm", "edgeWidthNm") if x in names]:
            try:
                m.minos(n)
                e = m.merrors[n]
                out["minos68"][n] = [float(m.values[n] + e.lower) if e.lower_valid else None, float(m.values[n] + e.upper) if e.upper_valid else None]
            except RuntimeError:
                out["minos68"][n] = [None, None]
        return out

    def profile_end(self, n, target, direction, chi, best):
        """where the profiled chi-square has risen by target; None where it never does; the bound where that is natural."""
        lo, hi = self.bounds[n]
        bound = lo if direction < 0 else hi
        x0 = best[n]
        last = [dict(best)]

        def rise(x):
            # A width that rests at zero has no derivative: begin beside it too.
            starts = [last[0], {**best, n: x}] + [{**last[0], "edgeWidthNm": w} for w in (4.0, 15.0) if self.profile == "graded" and n != "edgeWidthNm"]
            c, p = self.minimise({n: float(x)}, starts)
            last[0] = p
            return c - chi - target

        step = {"edgeDepthNm": 0.7, "edgeWidthNm": 0.7, "depthScale": 0.01}.get(n, 0.002 if self.observable == "fraction" else 0.02)
        inside, x = x0, x0
        while True:
            if x == bound:
                natural = (n == "edgeWidthNm" and direction < 0) or n.startswith("level")
                return float(bound) if natural else None
            x = x0 + direction * step
            step *= 1.7
            if direction * (x - bound) > 0:
                x = bound
            if rise(x) > 0:
                return float(brentq(rise, inside, x, xtol=1e-7, rtol=1e-12))
            inside = x

    def hesse(self, best):
        """linear standard deviations from a numerical Jacobian, parameters at a bound left out."""
        names = [n for n in self.free if self.bounds[n][0] < best[n] < self.bounds[n][1]]
        x = np.array([best[n] for n in names])
        rest = [n for n in self.free if n not in names]
        f = lambda v: self.residuals(names + rest, list(v) + [best[n] for n in rest])
        cols = []
        for k, n in enumerate(names):
            h = self.scale(n) * 1e-5
            e = np.zeros(len(names))
            e[k] = h
            cols.append((f(x + e) - f(x - e)) / (2 * h))
        J = np.array(cols).T
        try:
            C = np.linalg.inv(J.T @ J)
        except np.linalg.LinAlgError:
            return None
        return {n: float(np.sqrt(C[k, k])) for k, n in enumerate(names)}

    def solve(self):
        print(self.name, flush=True)
        chi, best = self.minimise()
        if self.profile == "graded":
            chi, best = self.minimise(starts=[best])
        wanted = [n for n in ("edgeDepthNm", "edgeWidthNm", "levelTop", "levelBulk", "depthScale") if n in self.free]
        ends = lambda t: {n: [self.profile_end(n, t, -1, chi, best), self.profile_end(n, t, 1, chi, best)] for n in wanted}
        return {
            "name": self.name, "profile": self.profile, "observable": self.observable, "polarity": self.polarity,
            "capThicknessNm": self.cap, "baselinePerUs": self.baseline, "held": self.held, "priors": self.priors,
            "values": self.y.tolist(), "sigmas": self.sigma.tolist(),
            "reference": {
                "chiSquare": chi, "parameters": {n: best[n] for n in self.names}, "sigmas": self.hesse(best),
                "intervals68": ends(1.0), "intervals95": ends(3.841458820694124), "iminuit": self.minos(chi, best) if self.profile == "graded" else None,
            },
        }


CASES = [
    Case("graded, depletion, fraction", "graded", "fraction", dict(edgeDepthNm=78, edgeWidthNm=14, levelTop=0.74, levelBulk=0.32), 0.006, 1),
    Case("graded, wide, low noise", "graded", "fraction", dict(edgeDepthNm=60, edgeWidthNm=28, levelTop=0.65, levelBulk=0.2), 0.003, 2),
    Case("graded, depth scale free", "graded", "fraction", dict(edgeDepthNm=90, edgeWidthNm=18, levelTop=0.3, levelBulk=0.7), 0.006, 3, polarity="accumulation", free_scale=True),
    Case("graded, prior on the populated level", "graded", "fraction", dict(edgeDepthNm=105, edgeWidthNm=20, levelTop=0.74, levelBulk=0.32), 0.008, 4, priors={"levelBulk": [0.32, 0.02]}),
    Case("graded, level held", "graded", "fraction", dict(edgeDepthNm=40, edgeWidthNm=12, levelTop=0.7, levelBulk=0.25), 0.007, 5, held={"levelTop": 0.7}),
    Case("graded, rate", "graded", "rate", dict(edgeDepthNm=70, edgeWidthNm=16, levelTop=0.05, levelBulk=3.0), 0.06, 6, baseline=0.01),
    Case("graded, rate, top level at its bound", "graded", "rate", dict(edgeDepthNm=55, edgeWidthNm=10, levelTop=0.01, levelBulk=1.5), 0.05, 7, baseline=0.01),
    Case("graded, cap and depth scale", "graded", "fraction", dict(edgeDepthNm=65, edgeWidthNm=15, levelTop=0.7, levelBulk=0.3, levelCap=0.5), 0.005, 8, cap=12.0, free_scale=True),
    Case("graded, width at zero", "graded", "fraction", dict(edgeDepthNm=75, edgeWidthNm=1, levelTop=0.74, levelBulk=0.32), 0.008, 9),
    Case("graded, near the limit of reach", "graded", "fraction", dict(edgeDepthNm=165, edgeWidthNm=8, levelTop=0.7, levelBulk=0.3), 0.008, 12, held={"levelBulk": 0.3}),
    Case("sharp, depletion, fraction", "sharp", "fraction", dict(edgeDepthNm=78, levelTop=0.74, levelBulk=0.32), 0.008, 13),
    Case("sharp, rate, depth scale free", "sharp", "rate", dict(edgeDepthNm=95, levelTop=0.1, levelBulk=2.0), 0.05, 14, free_scale=True),
    Case("sharp, deeper than the scan can close", "sharp", "fraction", dict(edgeDepthNm=190, levelTop=0.7, levelBulk=0.3), 0.01, 15, priors={"levelBulk": [0.3, 0.05]}),
]


def make_inversions():
    write(
        "inversions.json",
        {
            "what": "whole inversions: minimum, linear errors and profile-likelihood intervals",
            "energiesKeV": ENERGIES, "edgesNm": EDGES.tolist(), "counts": COUNTS.astype(int).tolist(),
            "cases": [case.solve() for case in CASES],
        },
    )


if __name__ == "__main__":
    make_normal()
    make_folds()
    make_inversions()
