"""Band bending below a semiconductor surface by two integrators that share nothing with the library under test.

Poisson's equation in reduced units, v'' = (1 - exp(-v)) + r (exp(v) - 1), v(0) = v_s, v(inf) = 0, r = exp(-2 u_F):
  - SciPy solve_ivp (DOP853, rtol 1e-13) on the second-order equation from the linear tail up to the surface,
  - SciPy solve_bvp (tol 1e-10) on the same equation with both ends held, for the cases that it can mesh,
  - mpmath quadrature (30 digits) of the first integral for the depth at which v has fallen to given values.

Run from the project root:  python3 tests/reference/electrostatics.py > fixtures/reference/electrostatics/band-bending.json
"""

import json
import platform
import sys

import mpmath
import numpy as np
import scipy
from scipy.integrate import solve_bvp, solve_ivp

CASES = [
    # name, v_s, u_F (None leaves out minority carriers)
    ("depletion", 8.0, 13.4),
    ("weak inversion", 20.0, 13.4),
    ("strong inversion", 32.0, 13.4),
    ("inversion of a nearly intrinsic bulk", 5.0, 1.1),
    ("no minority carriers", 40.0, None),
    ("accumulation", -7.0, 13.4),
    ("almost flat", 0.02, 13.4),
]
DEPTHS = [0.0, 0.05, 0.3, 1.0, 2.0, 3.5, 5.0, 7.0, 9.0, 12.0]


def charge(v, r):
    return -np.expm1(-v) + r * np.expm1(v)


def shoot(v_s, r):
    """From the tail up to the surface: the growing mode, so errors shrink."""
    sign = np.sign(v_s)
    start = sign * min(1e-10, abs(v_s) * 1e-6)
    slope = start * np.sqrt(1 + r)

    def reached(_s, state):
        return state[0] - v_s

    reached.terminal = True
    run = solve_ivp(
        lambda _s, state: [state[1], charge(state[0], r), np.exp(-state[0])],
        [0.0, 200.0],
        [start, slope, 0.0],
        method="DOP853",
        rtol=1e-13,
        atol=1e-22,
        events=reached,
        dense_output=True,
    )
    s_surface = run.t_events[0][0]
    end = run.y_events[0][0]

    def at(depth):
        s = s_surface - depth
        if s < 0:
            return start * np.exp(np.sqrt(1 + r) * s), None
        state = run.sol(s)
        return state[0], end[2] - state[2]

    return [at(depth) for depth in DEPTHS], end[1]


def boundary_value(v_s, r):
    far = 40.0
    mesh = np.unique(np.concatenate([np.linspace(0, 12, 2001), np.linspace(12, far, 400)]))
    guess = v_s * np.exp(-mesh / max(1.0, np.sqrt(abs(v_s))))
    run = solve_bvp(
        lambda _x, y: np.vstack([y[1], charge(y[0], r)]),
        lambda a, b: np.array([a[0] - v_s, b[1] + np.sqrt(1 + r) * b[0]]),
        mesh,
        np.vstack([guess, np.gradient(guess, mesh)]),
        tol=1e-10,
        max_nodes=200000,
    )
    return [float(run.sol(depth)[0]) for depth in DEPTHS] if run.success else None


def depth_at(v_s, r, fractions):
    mpmath.mp.dps = 30
    big_r = mpmath.mpf(r)

    def integrand(v):
        return 1 / mpmath.sqrt(2 * ((mpmath.exp(-v) + v - 1) + big_r * (mpmath.exp(v) - v - 1)))

    out = []
    for fraction in fractions:
        v = mpmath.mpf(v_s) * mpmath.mpf(fraction)
        points = [v + (mpmath.mpf(v_s) - v) * k / 16 for k in range(17)]
        out.append(float(abs(mpmath.quad(integrand, points))))
    return out


def main():
    cases = []
    fractions = [0.9, 0.5, 0.1, 0.01]
    for name, v_s, u_f in CASES:
        r = 0.0 if u_f is None else float(np.exp(-2 * u_f))
        states, slope = shoot(v_s, r)
        cases.append(
            {
                "name": name,
                "surface": v_s,
                "fermi": u_f,
                "surfaceSlope": float(-slope),
                "depths": DEPTHS,
                "potential": [float(v) for v, _ in states],
                "share": [None if m is None else float(m) for _, m in states],
                "boundaryValuePotential": boundary_value(v_s, r) if abs(v_s) < 25 else None,
                "fractions": fractions,
                "depthAtFraction": depth_at(v_s, r, fractions),
            }
        )
    json.dump(
        {
            "about": "Reduced band bending v(depth) with depth in Debye lengths of the majority carriers",
            "script": "tests/reference/electrostatics.py",
            "versions": {
                "python": platform.python_version(),
                "numpy": np.__version__,
                "scipy": scipy.__version__,
                "mpmath": mpmath.__version__,
            },
            "cases": cases,
        },
        sys.stdout,
        indent=1,
    )
    print()


main()
