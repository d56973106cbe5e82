#!/usr/bin/python3
"""Makes fixtures/reference/inversion/profile-inversions.json: whole inversions over all trial profiles and responses, points with
covariance included, by general-purpose libraries.

Run with Debian's python3 (packages python3-scipy, python3-lmfit, python3-iminuit):
    /usr/bin/python3 tests/reference/profile_inversions.py            all cases, some minutes
    /usr/bin/python3 tests/reference/profile_inversions.py layer      only names that hold the word; nothing is written

Nothing here shares code with the product. A profile is folded by Gauss-Legendre quadrature of f(s(x)) over every bin, bins cut
where s has a step or a kink. Band bending comes from Poisson's equation, its first integral by quadrature and, as a check before
anything is written, the second-order equation by solve_ivp. Minima: scipy.optimize.least_squares over the shape from the best
nodes of a coarse grid, levels by lstsq or bounded lsq_linear. Intervals: the profile of chi-square walked out and closed with
brentq. Beside them, over all parameters at once: lmfit's leastsq with its linear errors, and iminuit's migrad and minos.
"""
import itertools
import json
import os
import platform
import sys
from concurrent.futures import ProcessPoolExecutor

import iminuit
import lmfit
import numpy as np
import scipy
from scipy.integrate import solve_ivp
from scipy.interpolate import CubicHermiteSpline
from scipy.optimize import brentq, least_squares, lsq_linear, minimize_scalar
from scipy.special import erfc

OUT = os.path.join(os.path.dirname(__file__), "..", "..", "fixtures", "reference", "inversion", "profile-inversions.json")
BOLTZMANN_EV = 8.617333262e-5  # eV/K, CODATA 2018
EPSILON_0 = 8.8541878188e-14  # F/cm, CODATA 2022
CHARGE = 1.602176634e-19  # C, exact

ENERGIES = [2, 3, 4, 5, 6, 8, 10, 12, 14, 16, 18, 20, 22]
BIN = 1.5
EDGES = np.arange(0, 241, BIN)


def counts():
    out = []
    for e in ENERGIES:
        mean = 8 * e**0.85
        out.append(np.round(1e5 * np.exp(-0.5 * (((EDGES[1:] + EDGES[:-1]) / 2 - mean) / (0.4 * mean + 2)) ** 2)))
    return np.array(out)


COUNTS = counts()
DENSITY = COUNTS / COUNTS.sum(axis=1, keepdims=True) / BIN
NODES, WEIGHTS = np.polynomial.legendre.leggauss(8)
NODES, WEIGHTS = (NODES + 1) / 2, WEIGHTS / 2


# --- Poisson's equation, depth in Debye lengths of the majority carriers, v = phi/kT -----------------------------------
def first_integral(v, r):
    """v'^2/2 = (exp(-v) + v - 1) + r (exp(v) - v - 1), by series where v is small."""
    series = lambda x: x**2 / 2 * (1 + x / 3 * (1 + x / 4 * (1 + x / 5 * (1 + x / 6 * (1 + x / 7)))))
    small = np.abs(v) < 0.02
    exact = lambda x: np.where(small, series(x), np.exp(np.where(small, 0, x)) - x - 1)
    return exact(-v) + r * exact(v)


class Curve:
    """v against depth on one side (sign of v), common to every surface potential of one bulk."""

    def __init__(self, r, sign, largest):
        # Even steps of v beyond 1: at an inverted surface v rises ever more steeply.
        ln = np.concatenate([np.arange(np.log(1e-9), 0, 0.02), np.log(np.arange(1, largest + 0.04, 0.02))])
        width = np.diff(ln)
        t = ln[:-1, None] + width[:, None] * NODES
        v = sign * np.exp(t)
        steps = ((np.exp(t) / np.sqrt(2 * first_integral(v, r))) * WEIGHTS).sum(axis=1) * width
        rise = np.concatenate([[0], np.cumsum(steps)])
        values = sign * np.exp(ln)
        self.values, self.rise, self.k = values, rise, np.sqrt(1 + r)
        slope = sign * np.sqrt(2 * first_integral(values, r))
        self.v_of = CubicHermiteSpline(rise, values, slope)
        self.rise_of = CubicHermiteSpline(sign * values, rise, sign / slope)
        self.sign = sign

    def at(self, surface, depth):
        """v at depths below a surface that has v = surface."""
        if surface == 0:
            return np.zeros_like(depth)
        rise = (self.rise_of(abs(surface)) if abs(surface) > 1e-9 else np.log(abs(surface) / 1e-9) / self.k) - depth
        return np.where(rise > 0, self.v_of(np.maximum(rise, 0)), self.sign * 1e-9 * np.exp(self.k * np.minimum(rise, 0)))


def check_curve():
    for r, sign, surface in ((0.0, 1, 30.0), (2.5e-7, 1, 18.0), (0.0025, 1, 8.0), (1e-6, -1, -6.0)):
        curve = Curve(r, sign, abs(surface) + 2)
        reached = lambda _, y: y[0] - surface
        reached.terminal = True
        run = solve_ivp(lambda _, y: [y[1], -np.expm1(-y[0]) + r * np.expm1(y[0])], [0, 60], [sign * 1e-9, sign * 1e-9 * np.sqrt(1 + r)],
                        method="DOP853", rtol=1e-13, atol=1e-22, dense_output=True, events=reached)
        top = run.t_events[0][0]
        for depth in np.linspace(0, min(12, top - 1), 25):
            shot = run.sol(top - depth)[0]
            found = float(curve.at(surface, np.array([depth]))[0])
            assert abs(np.exp(-found) - np.exp(-shot)) < 1e-9 * max(1, np.exp(-shot)), (r, surface, depth, found, shot)


# --- cases ---------------------------------------------------------------------------------------------------------------
SHAPES = {
    "sharp": ["edgeDepthNm"],
    "graded": ["edgeDepthNm", "edgeWidthNm"],
    "layer": ["edgeDepthNm", "edgeWidthNm", "layerThicknessNm", "farEdgeWidthNm"],
    "band-bending": ["surfacePotentialEv", "bulkPerCm3"],
}
NATURAL = {"edgeWidthNm": (True, False), "layerThicknessNm": (True, False), "farEdgeWidthNm": (True, False),
           "levelTop": (True, True), "levelBulk": (True, True), "levelCap": (True, True)}
STEP = {"edgeDepthNm": 0.6, "edgeWidthNm": 0.6, "layerThicknessNm": 0.6, "farEdgeWidthNm": 0.6, "surfacePotentialEv": 0.004,
        "depthScale": 0.008}


def rise_of(x, width):
    """normal distribution function, a step where width is 0."""
    return (x >= 0).astype(float) if width == 0 else 0.5 * erfc(-x / (np.sqrt(2) * width))


class Case:
    def __init__(self, name, profile, observable, truth, sigma, seed, held=None, priors=None, cap=0.0, baseline=0.01, polarity="depletion",
                 half=None, bulk=None, top=None, semiconductor=None, correlated=None):
        self.name, self.profile, self.observable, self.polarity = name, profile, observable, polarity
        self.cap, self.baseline, self.half, self.bulk, self.top = cap, baseline, half, bulk, top
        self.semiconductor, self.priors, self.held = semiconductor, dict(priors or {}), dict(held or {})
        if "depthScale" not in self.priors:
            self.held.setdefault("depthScale", 1.0)
        self.shape = SHAPES[profile] + ["depthScale"]
        self.levels = ["levelTop", "levelBulk"] + (["levelCap"] if cap > 0 else [])
        self.free = [n for n in self.shape + self.levels if n not in self.held]
        self.curves = {}
        n = len(ENERGIES)
        self.sigma = np.round(sigma * (1 + 0.4 * np.cos(np.arange(n))), 6)
        self.covariance = None
        if correlated:
            near, common = correlated
            lag = np.abs(np.subtract.outer(np.arange(n), np.arange(n)))
            self.covariance = np.outer(self.sigma, self.sigma) * ((1 - common) * near**lag + common)
        V = np.diag(self.sigma**2) if self.covariance is None else self.covariance
        self.factor = np.linalg.cholesky(V)
        self.whiten = lambda column: np.linalg.solve(self.factor, column)
        deepest = EDGES[-1] * self.held.get("depthScale", 1.0) - cap
        ceiling = 1.0 if observable == "fraction" else np.inf
        floor = baseline if observable == "rate" else 0.0
        self.bounds = {"edgeDepthNm": (0, deepest), "edgeWidthNm": (0, deepest), "layerThicknessNm": (0, deepest), "farEdgeWidthNm": (0, deepest),
                       "levelTop": (floor, ceiling), "levelBulk": (floor, ceiling), "levelCap": (0, ceiling), "depthScale": (0.5, 2)}
        if profile == "band-bending":
            N = self.priors["bulkPerCm3"][0] if "bulkPerCm3" in self.priors else self.held["bulkPerCm3"]
            self.kT = BOLTZMANN_EV * semiconductor["temperatureK"]
            depleted = min(max(5, (deepest / self.debye(N)) ** 2 / 2 + 1), 3.5 / self.kT)
            self.bounds["surfacePotentialEv"] = (0, depleted * self.kT) if polarity == "depletion" else (-10 * self.kT, 0)
            self.bounds["bulkPerCm3"] = (N / 1000, N * 1000)
            self.largest = max(depleted, 10) * 1.01
        truth = {"depthScale": 1.0, **self.held, **truth}
        noise = self.factor @ np.random.default_rng(seed).normal(size=n)
        columns = self.columns(truth)
        self.y = np.round(sum(truth[l] * columns[l] for l in self.levels) + noise, 6)

    def debye(self, N):
        """nm"""
        return 1e7 * np.sqrt(self.semiconductor["relativePermittivity"] * EPSILON_0 * self.kT / (CHARGE * N))

    def share(self, p, x):
        """s at depths x below the cap, and the depths where it has a step or a kink."""
        if self.profile == "sharp":
            return lambda x: rise_of(x - p["edgeDepthNm"], 0), [p["edgeDepthNm"]]
        if self.profile == "graded":
            return lambda x: rise_of(x - p["edgeDepthNm"], p["edgeWidthNm"]), [p["edgeDepthNm"]] if p["edgeWidthNm"] == 0 else []
        if self.profile == "layer":
            near, w, far, v = p["edgeDepthNm"], p["edgeWidthNm"], p["edgeDepthNm"] + p["layerThicknessNm"], p["farEdgeWidthNm"]
            cuts = ([near] if w == 0 else []) + ([far] if v == 0 else []) + ([(near * v - far * w) / (v - w)] if v != w else [])
            return lambda x: np.maximum(0.0, rise_of(x - near, w) - rise_of(x - far, v)), cuts
        N, n_i = p["bulkPerCm3"], self.semiconductor["intrinsicPerCm3"]
        r = 0.0 if n_i is None else (n_i / N) ** 2
        if r not in self.curves:
            if len(self.curves) > 8:
                self.curves.clear()
            self.curves[r] = Curve(r, 1 if self.polarity == "depletion" else -1, self.largest)
        return lambda x: np.exp(-self.curves[r].at(p["surfacePotentialEv"] / self.kT, x / self.debye(N))), []

    def seen(self, p):
        """what of the bulk level the probe sees at share s."""
        if self.half is None:
            return lambda s: s
        bulk, top = (p["bulkPerCm3"], 0.0) if self.profile == "band-bending" else (self.bulk, self.top or 0.0)
        K = (bulk - top) / (self.half + top)
        return lambda s: s * (1 + K) / (1 + K * s)

    def columns(self, p):
        """how much each level counts at each energy."""
        left, right = EDGES[:-1] * p["depthScale"] - self.cap, EDGES[1:] * p["depthScale"] - self.cap
        density = DENSITY / p["depthScale"]
        cap = (density * (np.minimum(right, 0) - np.minimum(left, 0))).sum(axis=1)
        left, right = np.maximum(left, 0), np.maximum(right, 0)
        share, cuts = self.share(p, None)
        seen = self.seen(p)
        stretch = lambda l, r: (seen(share(l[:, None] + (r - l)[:, None] * NODES)) * WEIGHTS).sum(axis=1) * (r - l)
        area = stretch(left, right)
        hit = {int(np.searchsorted(right, c, side="right")) for c in cuts}
        for b in (b for b in hit if b < len(left)):
            points = np.array(sorted({left[b], right[b], *(c for c in cuts if left[b] < c < right[b])}))
            # Nodes lie inside the pieces, never on a step.
            area[b] = stretch(points[:-1], points[1:]).sum()
        S = density @ area
        return {"levelTop": 1 - cap - S, "levelBulk": S, "levelCap": cap}

    def residuals(self, p):
        columns = self.columns(p)
        r = self.whiten(self.y - sum(p[l] * columns[l] for l in self.levels))
        return np.concatenate([r, [(p[n] - m) / s for n, (m, s) in self.priors.items()]])

    def best_levels(self, p, free):
        """p with its free levels at their best, within bounds."""
        names = [l for l in self.levels if l in free]
        if not names:
            return p
        columns = self.columns(p)
        rest = self.y - sum((p[l] * columns[l] for l in self.levels if l not in names), np.zeros(len(self.y)))
        A = np.array([self.whiten(columns[l]) for l in names]).T
        b = self.whiten(rest)
        for l in (l for l in names if l in self.priors):
            m, s = self.priors[l]
            A = np.vstack([A, [(l == k) / s for k in names]])
            b = np.append(b, m / s)
        c = np.linalg.lstsq(A, b, rcond=None)[0]
        lo, hi = np.array([self.bounds[l] for l in names], float).T
        if np.any(c < lo) or np.any(c > hi):
            c = lsq_linear(A, b, (lo, hi), method="bvls", tol=1e-14).x
        return {**p, **dict(zip(names, map(float, c)))}

    def chi_square(self, p):
        return float((self.residuals(p) ** 2).sum())

    def scale(self, n):
        return self.held.get(n, self.priors.get(n, [1])[0]) if n == "bulkPerCm3" else {"surfacePotentialEv": 0.1, "depthScale": 0.03}.get(n, 10.0)

    def grid(self, fixed):
        deepest = self.bounds["edgeDepthNm"][1]
        axes = {"edgeDepthNm": np.linspace(0.06, 0.8, 9) * deepest, "edgeWidthNm": [4.0, 14.0, 32.0], "layerThicknessNm": [15.0, 45.0, 90.0],
                "farEdgeWidthNm": [4.0, 14.0, 32.0], "depthScale": [1.0]}
        if self.profile == "band-bending":
            axes["surfacePotentialEv"] = np.linspace(0.02, 0.95, 14) ** 1.5 * np.sum(self.bounds["surfacePotentialEv"])
            axes["bulkPerCm3"] = [self.priors["bulkPerCm3"][0]] if "bulkPerCm3" in self.priors else []
        names = [n for n in self.shape if n in self.free and n not in fixed]
        return [dict(zip(names, map(float, node))) for node in itertools.product(*(axes[n] for n in names))]

    def stepped(self, given):
        return self.profile == "sharp" or (self.profile == "layer" and given.get("edgeWidthNm") == 0)

    def minimise(self, fixed=None, near=(), starts=6):
        fixed = fixed or {}
        given = {**self.held, **fixed}
        free = [n for n in self.free if n not in fixed]
        names = [n for n in self.shape if n in free]
        if self.stepped(given) and "edgeDepthNm" in names:
            return self.minimise_step(fixed, near)
        at = lambda shape: self.best_levels({**dict.fromkeys(self.levels, 0.0), **given, **shape}, free)
        if not names:
            p = at({})
            return self.chi_square(p), p
        nodes = self.grid(fixed) if starts > 0 else []
        ranked = sorted(((self.chi_square(at(node)), k, node) for k, node in enumerate(nodes)), key=lambda row: row[:2])
        candidates = [{n: q[n] for n in names} for q in near] + [node for _, _, node in ranked[:starts]]
        scales = np.array([self.scale(n) for n in names])
        lo, hi = np.array([self.bounds[n] for n in names], float).T / scales
        f = lambda v: self.residuals(at(dict(zip(names, v * scales))))
        found = []
        for start in candidates:
            x0 = np.clip(np.array([start[n] for n in names]) / scales, lo + 1e-9, hi - 1e-9)
            r = least_squares(f, x0, bounds=(lo, hi), xtol=1e-12, ftol=1e-14, gtol=1e-14, max_nfev=60)
            p = at(dict(zip(names, map(float, r.x * scales))))
            found.append((self.chi_square(p), p))
        return min(found, key=lambda row: row[0])

    def minimise_step(self, fixed, near):
        """chi-square of a step has kinks at bin borders: bin by bin over its depth, the rest by the general way."""
        others = [n for n in self.shape if n in self.free and n not in fixed and n != "edgeDepthNm"]
        last = list(near)

        def at(W):
            chi, p = self.minimise({**fixed, "edgeDepthNm": float(W)}, last if others else (), 0 if last else 4)
            last[:] = [p]
            return chi, p

        if near:
            here = near[0]["edgeDepthNm"]
            bins = np.floor((here + self.cap) / BIN) + np.arange(-1, 2)
        else:
            coarse = np.arange(2.0, self.bounds["edgeDepthNm"][1], 3.0)
            here = coarse[int(np.argmin([at(W)[0] for W in coarse]))]
            bins = np.floor((here + self.cap) / BIN) + np.arange(-4, 5)
        best = at(here)
        for b in bins:
            lo, hi = max(0.0, b * BIN - self.cap), (b + 1) * BIN - self.cap
            if hi <= lo:
                continue
            r = minimize_scalar(lambda W: at(W)[0], bounds=(lo, hi), method="bounded", options={"xatol": 1e-7})
            best = min([best, at(lo), at(r.x)], key=lambda row: row[0])
        return best

    def profile_end(self, n, target, direction, chi, best):
        lo, hi = self.bounds[n]
        bound = lo if direction < 0 else hi
        closed = (self.polarity == "depletion") == (direction < 0) if n == "surfacePotentialEv" else NATURAL.get(n, (False, False))[int(direction > 0)]
        last = [best]

        def rise(x):
            c, p = self.minimise({n: float(x)}, [last[0], best], 1)
            last[0] = p
            if c < chi - 1e-6:
                raise RuntimeError(f"{self.name}: a lower minimum at {n} = {x}")
            return c - chi - target

        step = STEP.get(n, 0.1 * self.priors[n][1] if n in self.priors else 0.002 if self.observable == "fraction" else 0.02)
        inside = best[n]
        while True:
            if inside == bound:
                return float(bound) if closed else None
            x = best[n] + direction * step
            step *= 1.6
            if direction * (x - bound) > 0:
                x = bound
            if rise(x) > 0:
                return float(brentq(rise, inside, x, xtol=1e-8 * abs(x - inside), rtol=1e-13))
            inside = x

    def hesse(self, best):
        """linear standard deviations from a numerical Jacobian; null with a parameter at a bound."""
        if any(not self.bounds[n][0] < best[n] < self.bounds[n][1] for n in self.free):
            return None
        columns = []
        for n in self.free:
            h = 1e-5 * (self.scale(n) if n in self.shape else 1.0)
            up, down = ({**best, n: best[n] + d} for d in (h, -h))
            columns.append((self.residuals(up) - self.residuals(down)) / (2 * h) * self.scale(n))
        C = np.linalg.inv(np.array(columns) @ np.array(columns).T)
        return {n: float(np.sqrt(C[k, k]) * self.scale(n)) for k, n in enumerate(self.free)}

    def by_lmfit(self, best):
        """lmfit's leastsq over all free parameters, levels included, from beside the minimum; null for a step."""
        if self.stepped(self.held):
            return None
        parameters = lmfit.Parameters()
        for n in self.free:
            lo, hi = self.bounds[n]
            unit = self.scale(n) if n in self.shape else 1.0
            parameters.add(n, value=float(np.clip(best[n] * 1.02, lo + 1e-6 * unit, hi - 1e-6 * unit)) / unit, min=lo / unit, max=hi / unit)
        unit = {n: self.scale(n) if n in self.shape else 1.0 for n in self.free}
        f = lambda q: self.residuals({**self.held, **{n: q[n].value * unit[n] for n in self.free}})
        run = lmfit.minimize(f, parameters, method="leastsq", scale_covar=False, ftol=1e-14, xtol=1e-14, gtol=1e-14)
        errors = {n: None if run.params[n].stderr is None else float(run.params[n].stderr * unit[n]) for n in self.free}
        return {"chiSquare": float(run.chisqr), "parameters": {n: float(run.params[n].value * unit[n]) for n in self.free}, "sigmas": errors}

    def by_iminuit(self, best):
        """iminuit's migrad and minos in all free parameters, without limits but the natural ones; null for a step."""
        if self.stepped(self.held):
            return None
        unit = {n: self.scale(n) if n in self.shape else 1.0 for n in self.free}
        f = lambda *v: self.chi_square({**self.held, **{n: x * unit[n] for n, x in zip(self.free, v)}})
        m = iminuit.Minuit(f, *[best[n] * 1.01 / unit[n] for n in self.free], name=self.free)
        m.errordef, m.tol, m.strategy = 1.0, 1e-4, 2
        for n in self.free:
            lo, hi = self.bounds[n]
            m.limits[n] = (lo / unit[n], None if np.isinf(hi) else hi / unit[n])
        m.migrad()
        m.hesse()
        out = {"chiSquare": float(m.fval), "valid": bool(m.valid), "minos68": {}}
        for n in (n for n in self.free if n in self.shape and n != "depthScale"):
            try:
                m.minos(n)
                e = m.merrors[n]
                # Minos calls an end valid where it ran into a limit.
                open_end = (not e.lower_valid or e.at_lower_limit, not e.upper_valid or e.at_upper_limit)
                ends = [None if shut else float((m.values[n] + d) * unit[n]) for shut, d in zip(open_end, (e.lower, e.upper))]
            except RuntimeError:
                ends = [None, None]
            out["minos68"][n] = ends
        return out

    def solve(self):
        chi, best = self.minimise(starts=12)
        chi, best = self.minimise(near=[best], starts=2)
        ends = lambda target: {n: [self.profile_end(n, target, d, chi, best) for d in (-1, 1)] for n in self.free}
        response = (
            {"kind": "capture-rate", "gammaCm3PerS": 1e-6, "gammaSigmaCm3PerS": None, "baselinePerUs": self.baseline} if self.observable == "rate"
            else {"kind": "two-level"} if self.half is None
            else {"kind": "saturating-fraction", "halfPerCm3": self.half, "halfSigmaPerCm3": None}
        )
        out = {
            "name": self.name, "profile": self.profile, "observable": self.observable, "polarity": self.polarity, "response": response,
            "carriers": {"bulkPerCm3": self.bulk, "bulkSigmaPerCm3": None, "topPerCm3": self.top},
            "capThicknessNm": self.cap, "semiconductor": self.semiconductor, "held": self.held, "priors": self.priors,
            "values": self.y.tolist(), "sigmas": self.sigma.tolist(), "covariance": None if self.covariance is None else self.covariance.tolist(),
            "bounds": {n: [b if np.isfinite(b) else None for b in self.bounds[n]] for n in self.free},
            "reference": {"chiSquare": chi, "parameters": {n: best[n] for n in self.free}, "sigmas": self.hesse(best),
                          "intervals68": ends(1.0), "intervals95": ends(3.841458820694124),
                          "iminuit": self.by_iminuit(best), "lmfit": self.by_lmfit(best)},
        }
        print(self.name, chi, out["reference"]["parameters"], out["reference"]["intervals95"], out["reference"]["lmfit"], out["reference"]["iminuit"], file=sys.stderr, flush=True)
        return out


GERMANIUM = {"relativePermittivity": 16.0, "temperatureK": 290.0, "intrinsicPerCm3": 2.0e13}
WITHOUT_MINORITY = {**GERMANIUM, "intrinsicPerCm3": None}
NARROW_GAP = {"relativePermittivity": 17.0, "temperatureK": 260.0, "intrinsicPerCm3": 3.0e15}
LEVELS = dict(levelTop=0.72, levelBulk=0.3)
RATES = dict(levelTop=0.05, levelBulk=3.0)
GRADED = dict(edgeDepthNm=80, edgeWidthNm=22)
SCALE = {"depthScale": [1.0, 0.03]}

CASES = [
    lambda: Case("layer, both edges graded, rate", "layer", "rate", dict(edgeDepthNm=45, edgeWidthNm=12, layerThicknessNm=65, farEdgeWidthNm=22, **RATES), 0.005, 21),
    lambda: Case("layer, a step in front and a graded edge behind, widths held, fraction", "layer", "fraction", dict(edgeDepthNm=48, layerThicknessNm=60, **LEVELS), 0.005, 22, held={"edgeWidthNm": 0.0, "farEdgeWidthNm": 9.0}),
    lambda: Case("layer under a cap, fraction", "layer", "fraction", dict(edgeDepthNm=35, edgeWidthNm=12, layerThicknessNm=60, levelCap=0.5, **LEVELS), 0.003, 23, cap=12.0, held={"farEdgeWidthNm": 10.0}),
    lambda: Case("layer, rate, correlated points, depth scale with a prior", "layer", "rate", dict(edgeDepthNm=40, edgeWidthNm=10, layerThicknessNm=70, **RATES), 0.04, 24, held={"farEdgeWidthNm": 10.0}, priors=SCALE, correlated=(0.2, 0.3)),
    lambda: Case("layer whose far edge lies beyond the reach, fraction", "layer", "fraction", dict(edgeDepthNm=60, edgeWidthNm=12, layerThicknessNm=150, **LEVELS), 0.01, 26, held={"farEdgeWidthNm": 10.0, "levelTop": 0.72}, priors={"levelBulk": [0.3, 0.03]}),
    lambda: Case("layer, saturating fraction", "layer", "fraction", dict(edgeDepthNm=45, edgeWidthNm=12, layerThicknessNm=60, **LEVELS), 0.004, 25, held={"farEdgeWidthNm": 12.0}, half=2e15, bulk=2e16),
    lambda: Case("band bending, rate, bulk held", "band-bending", "rate", dict(surfacePotentialEv=0.25, **RATES), 0.05, 31, held={"bulkPerCm3": 4e16, "levelTop": 0.01}, semiconductor=GERMANIUM, bulk=4e16),
    lambda: Case("band bending, rate, bulk with a prior", "band-bending", "rate", dict(surfacePotentialEv=0.25, bulkPerCm3=4.5e16, **RATES), 0.04, 32, held={"levelTop": 0.01}, priors={"bulkPerCm3": [4e16, 8e15]}, semiconductor=WITHOUT_MINORITY, bulk=4e16),
    lambda: Case("band bending, rate, correlated points, depth scale with a prior", "band-bending", "rate", dict(surfacePotentialEv=0.2, **RATES), 0.05, 33, held={"bulkPerCm3": 4e16}, priors=SCALE, semiconductor=GERMANIUM, bulk=4e16, correlated=(0.3, 0.2)),
    lambda: Case("band bending, two-level fraction, minority carriers at the surface", "band-bending", "fraction", dict(surfacePotentialEv=0.1, **LEVELS), 0.004, 34, held={"bulkPerCm3": 2e16}, semiconductor=NARROW_GAP, bulk=2e16),
    lambda: Case("band bending, two-level fraction, inverted surface that no bending deepens", "band-bending", "fraction", dict(surfacePotentialEv=0.19, **LEVELS), 0.015, 38, held={"bulkPerCm3": 2e16}, semiconductor=NARROW_GAP, bulk=2e16),
    lambda: Case("band bending, saturating fraction", "band-bending", "fraction", dict(surfacePotentialEv=0.3, **LEVELS), 0.006, 35, held={"bulkPerCm3": 4e16}, semiconductor=GERMANIUM, bulk=4e16, half=2e15),
    lambda: Case("band bending, saturating fraction, bulk with a prior, under a cap", "band-bending", "fraction", dict(surfacePotentialEv=0.3, bulkPerCm3=3.6e16, levelCap=0.5, **LEVELS), 0.005, 36, priors={"bulkPerCm3": [4e16, 8e15]}, semiconductor=WITHOUT_MINORITY, bulk=4e16, half=2e15, cap=8.0),
    lambda: Case("band bending, accumulation, saturating fraction", "band-bending", "fraction", dict(surfacePotentialEv=-0.07, **LEVELS), 0.003, 37, polarity="accumulation", held={"bulkPerCm3": 3e15, "levelTop": 0.72}, semiconductor=GERMANIUM, bulk=3e15, half=6e15),
    lambda: Case("graded, saturating fraction far below the bulk", "graded", "fraction", dict(**GRADED, **LEVELS), 0.004, 41, half=1e15, bulk=1e17),
    lambda: Case("graded, saturating fraction near the bulk", "graded", "fraction", dict(**GRADED, **LEVELS), 0.004, 42, half=5e15, bulk=1e16, top=1e15),
    lambda: Case("graded, correlated points", "graded", "fraction", dict(**GRADED, **LEVELS), 0.006, 43, correlated=(0.4, 0.2)),
    lambda: Case("sharp, correlated points", "sharp", "fraction", dict(edgeDepthNm=77, **LEVELS), 0.008, 44, correlated=(0.3, 0.3)),
    lambda: Case("graded, correlated points, depth scale with a prior", "graded", "rate", dict(**GRADED, **RATES), 0.05, 45, priors=SCALE, correlated=(0.2, 0.4)),
    lambda: Case("graded, saturating fraction, correlated points, cap and depth scale with a prior", "graded", "fraction", dict(**GRADED, levelCap=0.5, **LEVELS), 0.004, 46, priors=SCALE, correlated=(0.2, 0.2), half=2e15, bulk=2e16, cap=10.0),
]


def solve(k):
    return CASES[k]().solve()


def main():
    check_curve()
    word = sys.argv[1] if len(sys.argv) > 1 else ""
    with ProcessPoolExecutor(2) as pool:
        cases = list(pool.map(solve, [k for k, make in enumerate(CASES) if word in make().name]))
    body = {
        "madeBy": "tests/reference/profile_inversions.py",
        "versions": {"python": platform.python_version(), "numpy": np.__version__, "scipy": scipy.__version__,
                     "lmfit": lmfit.__version__, "iminuit": iminuit.__version__},
        "what": "whole inversions: minimum, linear errors and profile-likelihood intervals",
        "energiesKeV": ENERGIES, "edgesNm": EDGES.tolist(), "counts": COUNTS.astype(int).tolist(), "cases": cases,
    }
    if not word:
        with open(OUT, "w") as f:
            json.dump(body, f, indent=1)
            f.write("\n")


if __name__ == "__main__":
    main()
