#!/usr/bin/python3
"""Times general-purpose libraries on the scans that bench.ts sends on stdin (JSON); prints medians in ms as JSON.

Each peer gets the same data and model: 13 energies folded at once as one matrix product of the density jumps with
G(x) at the bin edges (numpy, scipy.special.erfc), and a starting point near the truth, which the product does not get.
Only what is installed is run: Debian's python3-scipy, python3-lmfit, python3-iminuit.
"""
import json
import sys
import time

import numpy as np

task = json.load(sys.stdin)
edges = np.array(task["edgesNm"])
mass = np.array(task["mass"])
rho = mass / np.diff(edges)
jump = np.zeros((rho.shape[0], edges.size))
jump[:, :-1] -= rho
jump[:, 1:] += rho
scans = [np.array(y) for y in task["scans"]]
sigma = task["sigma"]
start = np.array(task["start"])
repeats = task["repeats"]


def median_ms(run):
    run(scans[0])
    times = []
    for k in range(repeats):
        t = time.perf_counter()
        run(scans[k % len(scans)])
        times.append(1e3 * (time.perf_counter() - t))
    return float(np.median(times))


out = {"versions": {}, "ms": {}}
try:
    import scipy
    from scipy.optimize import least_squares
    from scipy.special import erfc

    def predict(W, w, top, bulk):
        z = (edges - W) / (np.sqrt(2) * w)
        g = w / np.sqrt(2) * (z * erfc(-z) + np.exp(-z * z) / np.sqrt(np.pi))
        s = jump @ g
        return top + (bulk - top) * s

    def scipy_lm(y):
        least_squares(lambda p: (y - predict(*p)) / sigma, start, method="lm", x_scale=[10, 5, 0.1, 0.1])

    out["versions"]["scipy"] = scipy.__version__
    out["ms"]["scipy-lm"] = median_ms(scipy_lm)
except ImportError:
    sys.exit("scipy is not installed")

try:
    import iminuit

    def minuit(y):
        m = iminuit.Minuit(lambda W, w, t, b: float((((y - predict(W, w, t, b)) / sigma) ** 2).sum()), *start)
        m.errordef = 1.0
        m.limits["w"] = (0.01, None)
        m.limits["t"] = m.limits["b"] = (0, 1)
        m.migrad()
        m.hesse()
        return m

    out["versions"]["iminuit"] = iminuit.__version__
    out["ms"]["iminuit-hesse"] = median_ms(minuit)
    out["ms"]["iminuit-minos"] = median_ms(lambda y: minuit(y).minos("W", "w"))
except ImportError:
    pass

try:
    import lmfit

    def minimizer(y):
        p = lmfit.Parameters()
        for name, value, low, high in zip("W w t b".split(), start, (0, 0.01, 0, 0), (320, 320, 1, 1)):
            p.add(name, value=value, min=low, max=high)
        f = lambda q: (y - predict(q["W"].value, q["w"].value, q["t"].value, q["b"].value)) / sigma
        return lmfit.Minimizer(f, p)

    def interval(y):
        m = minimizer(y)
        lmfit.conf_interval(m, m.minimize(), p_names=["W", "w"], sigmas=[1, 1.96])

    out["versions"]["lmfit"] = lmfit.__version__
    out["ms"]["lmfit"] = median_ms(lambda y: minimizer(y).minimize())
    repeats = max(3, repeats // 10)
    out["ms"]["lmfit-interval"] = median_ms(interval)
except ImportError:
    pass

print(json.dumps(out))
