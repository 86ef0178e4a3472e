#!/usr/bin/env python3
"""The draws of tests/benches/statistics.rs in numpy, one column at a time as numpy is fastest.

usage: numpy_draws.py            prints samples a second, the best of twenty runs
       numpy_draws.py --beside   runs the Rust benchmark too, in turns with numpy, and prints both with
                                 their ratio
"""

import re
import subprocess
import sys
import time

import numpy as np

DRAWS = 204_800
rng = np.random.default_rng(1)


def forty_normals():
    total = np.zeros(DRAWS)
    for i in range(40):
        x = rng.standard_normal(DRAWS)
        x *= 0.01 * (i + 1)
        total += x
    return int((total > 1.0).sum())


JOINT = [
    (40.068, 0.003), (40.012, 0.003), (80.0, 0.05), (20.0, 0.05), (70e3, 700.0),
    (207e3, 2000.0), (0.33, 0.005), (0.29, 0.005), (11.7e-6, 0.2e-6), (40.0, 1.0),
]


def shrink_joint():
    x = [mean + sigma * rng.standard_normal(DRAWS) for mean, sigma in JOINT]
    shaft, bore, outer, inner, e_hub, e_shaft, nu_hub, nu_shaft, alpha, kelvin = x
    interference = shaft - bore - 40.0 * alpha * kelvin
    q2, r2 = (outer / 40.0) ** 2, (inner / 40.0) ** 2
    hub = ((q2 + 1.0) / (q2 - 1.0) + nu_hub) / e_hub
    core = ((1.0 + r2) / (1.0 - r2) - nu_shaft) / e_shaft
    p = np.maximum(interference, 0.0) / (40.0 * (hub + core))
    return int((p > 31.0).sum())


def fastest(run):
    best = float("inf")
    for _ in range(20):
        start = time.perf_counter()
        run()
        best = min(best, time.perf_counter() - start)
    return DRAWS / best


def of_bench(name):
    """Samples a second of a benchmark's fastest run."""
    command = ["cargo", "bench", "--quiet", "--bench", "statistics", "--", "--max-time", "3", name]
    printed = subprocess.run(command, check=True, capture_output=True, text=True).stdout
    number, unit = re.search(r"([\d.]+) ([GMK]?)item/s", printed).groups()
    return float(number) * {"G": 1e9, "M": 1e6, "K": 1e3, "": 1.0}[unit]


PAIRS = [
    (forty_normals, "yield_of_forty_normals"),
    (shrink_joint, "yield_of_a_recorded_shrink_joint"),
]

for run, bench in PAIRS:
    ours = of_bench(bench) if "--beside" in sys.argv else None
    numpy = fastest(run)
    print(f"{run.__name__}: numpy {numpy / 1e6:.2f} M samples/s, share {run() / DRAWS:.5f}")
    if ours is not None:
        print(f"  {bench}: {ours / 1e6:.1f} M samples/s, {ours / numpy:.1f} times numpy's")
if "--beside" in sys.argv:
    bare = of_bench("bare_loop_of_forty_normals")
    print(f"bare loop of forty normals: {bare / 1e6:.1f} M samples/s")
