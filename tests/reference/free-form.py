#!/usr/bin/python3
"""Makes the reference values of fixtures/reference/free-form: regularised and constrained least squares by general-purpose libraries.

Run with Debian's python3 (python3-scipy) and gcc with libgsl-dev, from the root of the project:
    /usr/bin/python3 tests/reference/free-form.py
Nothing here shares code with the product. Unconstrained solutions, L-curve corner and cross-validation come from GSL (free-form.c beside
this file); constrained ones from scipy.optimize.nnls and lsq_linear on the stacked system. The folds of piecewise-linear functions are
integrated segment by segment between bin edges and knots with Simpson's rule, which is exact there.

The test problems are those of P. C. Hansen, Regularization Tools, Numer. Algorithms 6, 1 (1994). Here their matrices come from the integrals
themselves (double integrals of the kernels over boxes, midpoints where Hansen takes them); the tests build them from the closed formulas.
"""
import json
import os
import platform
import subprocess
import tempfile

import numpy as np
import scipy
from scipy.optimize import lsq_linear, nnls

HERE = os.path.dirname(os.path.abspath(__file__))
OUT = os.path.join(HERE, "..", "..", "fixtures", "reference", "free-form")
VERSIONS = {"python": platform.python_version(), "numpy": np.__version__, "scipy": scipy.__version__}


# --- Hansen's problems ------------------------------------------------------------------------------
def shaw(n):
    h = np.pi / n
    t = (np.arange(n) + 0.5) * h - np.pi / 2
    u = np.pi * (np.sin(t)[:, None] + np.sin(t)[None, :])
    a = h * ((np.cos(t)[:, None] + np.cos(t)[None, :]) * np.sinc(u / np.pi)) ** 2
    return a, 2 * np.exp(-6 * (t - 0.8) ** 2) + np.exp(-2 * (t + 0.5) ** 2)


def phillips(n):
    """Galerkin with boxes of norm one: A_ij = (1/h) double integral of phi(s - t), phi(t) = 1 + cos(pi t/3) inside |t| < 3."""
    h = 12 / n
    c = np.pi / 3

    def twice(t):
        # The second antiderivative of phi that is 0 for t < -3: continued by its tangent for t > 3.
        inside = (t + 3) ** 2 / 2 - (np.cos(c * t) - np.cos(3 * c)) / c**2
        return np.where(t <= -3, 0, np.where(t >= 3, 18 + 6 * (t - 3), inside))

    i = np.arange(n)
    lag = (i[:, None] - i[None, :]) * h
    a = (twice(lag + h) - 2 * twice(lag) + twice(lag - h)) / h
    edges = -6 + h * np.arange(n + 1)
    once = lambda t: np.where(t <= -3, 0, np.where(t >= 3, 6, (t + 3) + np.sin(c * t) / c))
    return a, np.diff(once(edges)) / np.sqrt(h)


def deriv2(n):
    """Galerkin with boxes of norm one of K(s, t) = s(t - 1) for s < t, t(s - 1) for s >= t; f(t) = t."""
    h = 1 / n
    mid = (np.arange(n) + 0.5) * h
    s, t = np.meshgrid(mid, mid, indexing="ij")
    a = h * np.minimum(s, t) * (np.maximum(s, t) - 1)
    # K = st - min(s, t) has a kink on the diagonal: the mean of st over a box there is the square of its middle, of min(s, t) the middle - h/6.
    a[np.arange(n), np.arange(n)] = h * (mid**2 - (mid - h / 6))
    return a, np.sqrt(h) * mid


def heat(n):
    h = 1 / n
    t = (np.arange(n) + 0.5) * h
    k = h / (2 * np.sqrt(np.pi)) * t**-1.5 * np.exp(-1 / (4 * t))
    a = np.zeros((n, n))
    for j in range(n):
        a[j:, j] = k[: n - j]
    x = np.zeros(n)
    for i in range(n // 2):
        ti = (i + 1) * 20 / n
        x[i] = 0.75 * ti**2 / 4 if ti < 2 else 0.75 + (ti - 2) * (3 - ti) if ti < 3 else 0.75 * np.exp(-2 * (ti - 3))
    return a, x


HANSEN = {"shaw": shaw, "phillips": phillips, "deriv2": deriv2, "heat": heat}


# --- designs of the product ---------------------------------------------------------------------------
def stops(energies, bins, width):
    """Invented stopping profiles: Gaussians of mean 8 E^0.85 nm and sigma 0.4 mean + 2 nm at the middles of the bins."""
    edges = width * np.arange(bins + 1)
    middle = (edges[1:] + edges[:-1]) / 2
    mass = []
    for e in energies:
        mean = 8 * e**0.85
        w = np.exp(-0.5 * ((middle - mean) / (0.4 * mean + 2)) ** 2) * width
        mass.append(w / w.sum())
    return edges, np.array(mass)


def quantile(edges, mass, u):
    cumulative = np.concatenate([[0], np.cumsum(mass)])
    return np.interp(u, cumulative, edges)


def fold_hats(edges, mass, knots, cap, scale):
    """Integral of the uniform densities of the bins times each hat, and the share in the cap."""
    edges = edges * scale - cap
    cuts = np.unique(np.concatenate([edges, knots[(knots > edges[0]) & (knots < edges[-1])], [0.0] if edges[0] < 0 else []]))
    left, right = cuts[:-1], cuts[1:]
    middle = (left + right) / 2
    at = np.clip(np.searchsorted(edges, middle) - 1, 0, len(edges) - 2)
    density = (mass / np.diff(edges))[:, at]
    inside = middle > 0
    hats = np.zeros((mass.shape[0], len(knots)))
    for j in range(len(knots)):
        unit = np.zeros(len(knots))
        unit[j] = 1
        hat = lambda x: np.interp(x, knots, unit)
        mean = (hat(left) + 4 * hat(middle) + hat(right)) / 6
        hats[:, j] = density[:, inside] @ ((right - left) * mean)[inside]
    return hats, density[:, ~inside] @ (right - left)[~inside]


def differences(knots, order):
    h = np.diff(knots)
    first = (np.eye(len(knots))[1:] - np.eye(len(knots))[:-1]) / h[:, None]
    if order == 1:
        return first * np.sqrt(h)[:, None]
    span = (h[1:] + h[:-1]) / 2
    return (first[1:] - first[:-1]) / span[:, None] * np.sqrt(span)[:, None]


# --- GSL --------------------------------------------------------------------------------------------
def gsl(program, a, l, y, lambdas):
    n, p = a.shape
    m = 0 if l is None else l.shape[0]
    numbers = [n, p, m, *a.ravel(), *([] if l is None else l.ravel()), *y, len(lambdas), *lambdas]
    text = " ".join(repr(float(v)) if isinstance(v, float) else str(v) for v in numbers)
    lines = subprocess.run([program], input=text, capture_output=True, text=True, check=True).stdout.split("\n")
    rows = [[float(v) for v in line.split()] for line in lines[1:] if line.strip()]
    count = len(lambdas)
    best, lowest = rows[count + 1]
    return lines[0], {
        "rho": [r[1] for r in rows[:count]],
        "eta": [r[2] for r in rows[:count]],
        "gcv": [r[3] for r in rows[:count]],
        "corner": int(rows[count][0]),
        "gcvLambda": best,
        "gcvLowest": lowest,
        "solutions": rows[count + 2 : 2 * count + 2],
        "gcvSolution": rows[2 * count + 2],
    }


def grid(a, l, points=40, decades=5):
    """Descending values of lambda from the largest singular value of the problem in standard form."""
    top = np.linalg.svd(a if l is None else a @ np.linalg.pinv(l), compute_uv=False)[0]
    return [float(v) for v in top * 10 ** (-decades * np.arange(points) / (points - 1))]


def unconstrained(program, name, a, l, y, more):
    lambdas = grid(a, l)
    version, got = gsl(program, a, l, y, lambdas)
    VERSIONS["gsl"] = version
    keep = range(3, len(lambdas), 9)
    solutions = [{"at": k, "c": got["solutions"][k]} for k in keep]
    got["solutions"] = solutions
    return {"name": name, **more, "y": list(map(float, y)), "lambdas": lambdas, **got}


def make_gsl():
    rng = np.random.default_rng(20261201)
    cases = []
    with tempfile.TemporaryDirectory() as folder:
        program = os.path.join(folder, "free-form")
        subprocess.run(
            ["gcc", "-O1", "-o", program, os.path.join(HERE, "free-form.c"), "-lgsl", "-lgslcblas", "-lm"], check=True
        )
        for name, build in HANSEN.items():
            n = 32
            a, x = build(n)
            for order in (0, 1, 2):
                l = None if order == 0 else differences(np.arange(n, dtype=float), order)
                y = a @ x + 1e-3 * np.linalg.norm(a @ x) / np.sqrt(n) * rng.standard_normal(n)
                cases.append(unconstrained(program, name, a, l, y, {"n": n, "order": order}))
        energies = np.array([2, 3, 4, 5, 6, 8, 10, 12, 14, 16, 18, 20, 22], dtype=float)
        edges, mass = stops(energies, 320, 1.0)
        for count in (12, 40):
            for order in (1, 2):
                knots = quantile(edges, mass[-1], 0.99) * (np.arange(count) / (count - 1)) ** 2
                hats, _ = fold_hats(edges, mass, knots, 0.0, 1.0)
                true = np.interp(knots, [0, 40, 90, 400], [0.1, 0.1, 1.2, 1.2])
                sigma = 0.02
                rows = max(count, len(energies))
                # GSL wants as many rows as columns: rows of zeros add nothing to the sums of squares.
                a = np.zeros((rows, count))
                y = np.zeros(rows)
                a[: len(energies)] = hats / sigma
                y[: len(energies)] = (hats @ true) / sigma + rng.standard_normal(len(energies))
                case = unconstrained(program, "scan", a, differences(knots, order), y, {"n": count, "order": order})
                cases.append(case)
    write("gsl.json", {"cases": cases})


# --- SciPy ------------------------------------------------------------------------------------------
def steps(count, way):
    if way == "no":
        return np.eye(count)
    return np.tril(np.ones((count, count))) if way == "rising" else np.triu(np.ones((count, count)))


def constrained(a, l, target, y, strength):
    stacked = np.vstack([a, np.sqrt(strength) * l])
    b = np.concatenate([y, np.sqrt(strength) * target])
    # Columns of norm one: the stopping rules of both solvers are then the same for every column.
    norm = np.linalg.norm(stacked, axis=0)
    x, residual = nnls(stacked / norm, b, maxiter=20000)
    bvls = lsq_linear(stacked / norm, b, bounds=(0, np.inf), method="bvls", tol=1e-15, max_iter=5000)
    return x / norm, bvls.x / norm, float(residual)


def make_scipy():
    rng = np.random.default_rng(20261202)
    energies = np.array([2, 3, 4, 5, 6, 8, 10, 12, 14, 16, 18, 20, 22], dtype=float)
    edges, mass = stops(energies, 320, 1.0)
    shapes = {
        "edge": lambda x: np.where(x < 60, 0.0, np.minimum(1, (x - 60) / 30)),
        "channel": lambda x: np.exp(-0.5 * ((x - 55) / 15) ** 2),
        "surface": lambda x: np.exp(-x / 25),
    }
    cases = []
    worst = 0.0
    for k in range(24):
        shape = list(shapes)[k % 3]
        order = 1 + k % 2
        way = ["no", "rising", "falling", "no"][(k // 2) % 4]
        cap = [0.0, 0.0, 6.5][(k // 3) % 3]
        scale = [1.0, 1.04][(k // 4) % 2]
        covariance = k % 5 == 4
        pull = k % 6 == 5
        knots = (quantile(edges, mass[-1], 0.99) * scale - cap) * (np.arange(40) / 39) ** 2
        hats, in_cap = fold_hats(edges, mass, knots, cap, scale)
        a = np.hstack([hats, in_cap[:, None]]) if cap else hats
        level = 0.7
        sigma = 0.03 * (1 + 0.5 * rng.uniform(size=len(energies)))
        v = np.diag(sigma**2)
        if covariance:
            v = np.outer(sigma, sigma) * (0.6 * np.eye(len(energies)) + 0.4)
        true = hats @ shapes[shape](knots) + level * in_cap
        y = true + np.linalg.cholesky(v) @ rng.standard_normal(len(energies))
        # What is given out is the rate: u + baseline below the cap.
        baseline = 0.05
        values = y + baseline * (1 - in_cap)
        white = np.linalg.inv(np.linalg.cholesky(v))
        l = differences(knots, order)
        reference = np.full(40, 0.3) + 0.002 * knots if pull else np.zeros(40)
        target = l @ reference
        c = steps(40, way)
        if cap:
            c = np.block([[c, np.zeros((40, 1))], [np.zeros((1, 40)), np.ones((1, 1))]])
            l = np.hstack([l, np.zeros((l.shape[0], 1))])
        ka = white @ a @ c
        lc = l @ c
        lc[np.abs(lc) < 1e-13 * np.abs(lc).max(axis=1, keepdims=True)] = 0
        results = []
        for strength in [10.0 ** (3.5 - d + 2.5 * (order - 1)) for d in (0, 1.5, 3, 5)]:
            x, other, _ = constrained(ka, lc, target, white @ y, strength)
            worst = max(worst, float(np.max(np.abs(c @ x - c @ other)) / np.max(np.abs(c @ x))))
            results.append({"strength": strength, "u": list(c @ x), "bvls": list(c @ other)})
        cases.append(
            {
                "shape": shape,
                "order": order,
                "monotonic": way,
                "capNm": cap,
                "depthScale": scale,
                "baselinePerUs": baseline,
                "values": list(values),
                "sigmas": list(sigma),
                "covariance": v.tolist() if covariance else None,
                "reference": list(reference) if pull else None,
                "results": results,
            }
        )
    print("nnls against bvls, largest difference over the largest value:", worst)
    write("scipy.json", {"energiesKeV": list(energies), "cases": cases})


def write(name, body):
    os.makedirs(OUT, exist_ok=True)
    with open(os.path.join(OUT, name), "w") as f:
        json.dump({"madeBy": "tests/reference/free-form.py", "versions": VERSIONS, **body}, f)
        f.write("\n")


if __name__ == "__main__":
    make_gsl()
    make_scipy()
