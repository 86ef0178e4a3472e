#!/usr/bin/env python3
"""Exact tails of sums against a hundred million draws each.

usage: drawn_sums.py --check

Takes shares from tests/data/mixed_sums.json, to which the integration tests hold the program's
inversion to a relative 1e-9, and draws the same sums with numpy's generators: a way without any
formula for the sum. With 1e8 draws a share p is known to sqrt(p (1 - p)) 1e-4; a difference of more
than four and a half of that has odds of one in 150 000 for each share. The seed is fixed.
"""

import json
import math
import sys
import time
from pathlib import Path

import numpy as np

DATA = Path(__file__).resolve().parent.parent / "data" / "mixed_sums.json"
DRAWS = 100_000_000
BLOCK = 1_000_000
SIGMAS = 4.5
NAMES = ["rectangle and wide normal", "all kinds but cut", "cut normal and normal",
         "measured list with a step"]


def draw(rng, term):
    a, kind = float(term["coefficient"]), term["kind"]
    if kind == "normal":
        return a * float(term["sigma"]) * rng.standard_normal(BLOCK)
    if kind == "uniform":
        return a * float(term["half"]) * (2 * rng.random(BLOCK) - 1)
    if kind == "triangular":
        return a * float(term["half"]) * (rng.random(BLOCK) - rng.random(BLOCK))
    if kind == "trapezoid":
        base, top = float(term["base"]), float(term["top"])
        return a * ((base + top) / 2 * (2 * rng.random(BLOCK) - 1)
                    + (base - top) / 2 * (2 * rng.random(BLOCK) - 1))
    if kind == "measured":
        values = np.array([float(v) for v in term["values"]])
        step = float(term["resolution"])
        return a * (values[rng.integers(0, len(values), BLOCK)] + step * (rng.random(BLOCK) - 0.5))
    if kind == "sorted":
        sigma, lower, upper = (float(term[k]) for k in ("sigma", "lower", "upper"))
        kept = np.empty(0)
        while len(kept) < BLOCK:
            more = sigma * rng.standard_normal(BLOCK)
            kept = np.concatenate([kept, more[(more >= lower) & (more <= upper)]])
        return a * kept[:BLOCK]
    raise ValueError(kind)


def main():
    if sys.argv[1:] != ["--check"]:
        sys.exit(__doc__.split("\n\n")[1])
    cases = json.loads(DATA.read_text())
    bad = shares = 0
    begin = time.monotonic()
    for number, name in enumerate(NAMES):
        limits = [c for c in cases if c["name"] == name]
        assert limits, name
        counts = [0] * len(limits)
        rng = np.random.default_rng([20270101, number])
        for _ in range(DRAWS // BLOCK):
            total = sum(draw(rng, term) for term in limits[0]["terms"])
            for i, case in enumerate(limits):
                counts[i] += int(np.count_nonzero(total > float(case["limit"])))
        for case, count in zip(limits, counts):
            exact, drawn = float(case["above"]), count / DRAWS
            # Below a thousand expected draws the normal limits of a count are not its own.
            if min(exact, 1 - exact) * DRAWS < 1000:
                continue
            shares += 1
            if abs(drawn - exact) > SIGMAS * math.sqrt(exact * (1 - exact) / DRAWS):
                print(f"{name} above {case['limit']}: exact {exact}, drawn {drawn}")
                bad += 1
    assert shares >= 10, "the check would say little"
    print(f"{shares} shares of {len(NAMES)} sums drawn, {bad} differ, "
          f"{time.monotonic() - begin:.0f} s")
    return 1 if bad else 0


if __name__ == "__main__":
    sys.exit(main())
