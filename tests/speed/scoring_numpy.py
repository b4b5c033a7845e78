"""Reads, evaluates and takes norms with plain broadcast NumPy, as scoring.speed.ts does.

usage: scoring_numpy.py CASE.json    prints seconds of CPU time a pass, and the norms of the last file
"""
import json
import sys
import time

import numpy as np

EXACT = {
    "wave": lambda x: np.sin(x - 0.3),
    "front": lambda x, y: np.tanh((x + y - 0.8) / 0.2) + np.exp(-((x - 0.3) ** 2 + (y - 0.6) ** 2) / 0.02),
    "product": lambda x, y: np.sin(x) * np.cos(y),
}


def score(path, exact):
    with np.load(path) as arrays:
        u, axes = arrays["u"], [arrays[name] for name in "xy" if name in arrays]
    weights = []
    for axis in axes:  # trapezoid rule
        w = np.full(axis.size, (axis[-1] - axis[0]) / (axis.size - 1))
        w[[0, -1]] /= 2
        weights.append(w)
    star = exact(*np.meshgrid(*axes, indexing="ij", sparse=True))
    w = weights[0] if len(axes) == 1 else weights[0][:, None] * weights[1]
    e, x = np.abs(u - star), np.abs(star)
    error = [(w * e).sum(), np.sqrt((w * e * e).sum()), e.max()]
    return error + [error[0] / (w * x).sum(), error[1] / np.sqrt((w * x * x).sum()), error[2] / x.max()]


case = json.load(open(sys.argv[1]))
seconds = []
for _ in range(case["passes"]):
    start = time.process_time()
    norms = [score(path, EXACT[case["exact"]]) for path in case["files"]]
    seconds.append(time.process_time() - start)
print(json.dumps(dict(seconds=seconds, norms=[float(v) for v in norms[-1]])))
