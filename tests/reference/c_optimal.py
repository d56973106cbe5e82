"""c-optimal splits by SciPy, for tests/inversion/planning/c-optimal.test.ts.

Minimises c'(M0 + sum t a a')^-1 c over t >= 0, sum t = H with scipy.optimize.minimize (SLSQP, analytic gradient), from eight random
splits each, for smooth sensitivity curves over candidate energies. Run from the root of the project:

    /usr/bin/python3 tests/reference/c_optimal.py
"""

import json
import pathlib
import sys

import numpy
import scipy
from scipy.optimize import minimize
from scipy.special import erf


def curves(size, count):
    """Sensitivities that look like those of a scan: rows of candidates, smooth in the energy."""
    x = numpy.linspace(0.0, 1.0, count)
    step = 0.5 * (1 + erf((x - 0.5) / 0.25))
    bell = numpy.exp(-0.5 * ((x - 0.5) / 0.2) ** 2)
    columns = [30 * bell, 60 * (x - 0.5) * bell, 1 - step, step, 40 * (x - 0.5) ** 2 * bell]
    return numpy.stack(columns[:size], axis=1)


def solve(covariance, index, vectors, hours, generator):
    information = numpy.linalg.inv(covariance)
    c = numpy.eye(len(covariance))[index]

    def variance(t):
        u = numpy.linalg.solve(information + (vectors.T * t) @ vectors, c)
        return c @ u, -((vectors @ u) ** 2)

    scale = variance(numpy.zeros(len(vectors)))[0]
    best = None
    for _ in range(8):
        start = generator.dirichlet(numpy.full(len(vectors), 0.3)) * hours
        answer = minimize(
            lambda t: tuple(part / scale for part in variance(t)),
            start,
            jac=True,
            method="SLSQP",
            bounds=[(0, hours)] * len(vectors),
            constraints={"type": "eq", "fun": lambda t: t.sum() - hours, "jac": lambda t: numpy.ones(len(t))},
            options={"ftol": 1e-15, "maxiter": 2000},
        )
        t = numpy.clip(answer.x, 0, None)
        t *= hours / t.sum()
        if best is None or variance(t)[0] < best[0]:
            best = (variance(t)[0], t)
    return best


def main():
    generator = numpy.random.default_rng(20260114)
    problems = []
    for size, count, hours, index in [(2, 21, 6.0, 0), (3, 41, 3.0, 0), (4, 61, 8.0, 0), (4, 61, 8.0, 1), (5, 41, 20.0, 1), (5, 61, 2.0, 4)]:
        vectors = curves(size, count)
        # What 13 points of one hour each leave, and a weak prior on everything.
        points = vectors[numpy.linspace(0, count - 1, 13).astype(int)]
        covariance = numpy.linalg.inv(points.T @ points + 1e-3 * numpy.eye(size))
        covariance = (covariance + covariance.T) / 2
        variance, split = solve(covariance, index, vectors, hours, generator)
        problems.append(
            {
                "covariance": covariance.tolist(),
                "index": index,
                "vectors": vectors.tolist(),
                "hours": hours,
                "variance": variance,
                "split": split.tolist(),
            }
        )
    path = pathlib.Path("fixtures/reference/planning/c-optimal.json")
    path.parent.mkdir(parents=True, exist_ok=True)
    source = f"SciPy {scipy.__version__} SLSQP, NumPy {numpy.__version__}, Python {sys.version.split()[0]}"
    path.write_text(json.dumps({"source": source, "problems": problems}) + "\n")


main()
