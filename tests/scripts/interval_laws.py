"""Holds the interval arithmetic against mpmath, an independent arbitrary-precision library.

Each case is an operation, the intervals of its operands, one member of each, and the two doubles
next to the exact result for these members (computed with 200 bits). `tests/interval_laws.rs` reads
the cases and demands that the interval result holds the exact one.

    python3 tests/scripts/interval_laws.py --check     recompute and compare
    python3 tests/scripts/interval_laws.py --write     make the data anew
"""

import json
import math
import pathlib
import random
import struct
import sys

import mpmath

DATA = pathlib.Path(__file__).parent.parent / "data" / "interval_laws.json"
CASES = 120
mpmath.mp.prec = 200


def bits(x):
    return format(struct.unpack("<Q", struct.pack("<d", x))[0], "016x")


def neighbours(exact):
    """The greatest double not above the exact value and the least not below it."""
    near = float(exact)
    lo = near if mpmath.mpf(near) <= exact else math.nextafter(near, -math.inf)
    hi = near if mpmath.mpf(near) >= exact else math.nextafter(near, math.inf)
    return lo, hi


def spread(rng, lo, hi):
    """A number between the two, often small, sometimes an end."""
    if rng.random() < 0.1:
        return rng.choice([lo, hi])
    return rng.uniform(lo, hi)


def operand(rng, lo, hi):
    a, b = sorted((spread(rng, lo, hi), spread(rng, lo, hi)))
    if rng.random() < 0.4:
        b = min(hi, math.nextafter(a, math.inf) if rng.random() < 0.5 else a + abs(a) * 1e-6)
    if rng.random() < 0.2:
        b = a
    member = rng.choice([a, b, rng.uniform(a, b)])
    return a, b, min(max(member, a), b)


WIDE = (-50.0, 50.0)
UNARY = {
    "sqrt": (mpmath.sqrt, (0.0, 1e6)),
    "exp": (mpmath.exp, (-30.0, 30.0)),
    "ln": (mpmath.log, (1e-9, 1e9)),
    "sin": (mpmath.sin, (-20.0, 20.0)),
    "cos": (mpmath.cos, (-20.0, 20.0)),
    "tan": (mpmath.tan, (-1.5, 1.5)),
    "asin": (mpmath.asin, (-1.0, 1.0)),
    "acos": (mpmath.acos, (-1.0, 1.0)),
    "atan": (mpmath.atan, (-1e3, 1e3)),
    "sqr": (lambda x: x * x, WIDE),
    "cube": (lambda x: x * x * x, WIDE),
    "inverse-square": (lambda x: 1 / (x * x), (0.01, 50.0)),
    "two-thirds": (lambda x: mpmath.power(x, mpmath.mpf(0.66)), (0.01, 50.0)),
}
BINARY = {
    "add": (lambda x, y: x + y, WIDE, WIDE),
    "sub": (lambda x, y: x - y, WIDE, WIDE),
    "mul": (lambda x, y: x * y, WIDE, WIDE),
    "div": (lambda x, y: x / y, WIDE, (1e-3, 50.0)),
    "atan2": (mpmath.atan2, WIDE, (1e-3, 50.0)),
    "hypot": (mpmath.hypot, WIDE, WIDE),
}


def cases():
    rng = random.Random(20_1)
    made = []
    for name, (f, (lo, hi)) in UNARY.items():
        for _ in range(CASES):
            a, b, x = operand(rng, lo, hi)
            below, above = neighbours(f(mpmath.mpf(x)))
            made.append([name, [bits(a), bits(b)], [], bits(below), bits(above)])
    for name, (f, first, second) in BINARY.items():
        for _ in range(CASES):
            a, b, x = operand(rng, *first)
            c, d, y = operand(rng, *second)
            below, above = neighbours(f(mpmath.mpf(x), mpmath.mpf(y)))
            made.append([name, [bits(a), bits(b)], [bits(c), bits(d)], bits(below), bits(above)])
    return made


def main():
    made = cases()
    if sys.argv[1:] == ["--write"]:
        lines = ",\n".join(json.dumps(case) for case in made)
        DATA.write_text(f"[\n{lines}\n]\n")
        return
    stored = json.loads(DATA.read_text())
    if stored != made:
        wrong = sum(a != b for a, b in zip(stored, made)) + abs(len(stored) - len(made))
        sys.exit(f"interval_laws.json: {wrong} of {len(made)} cases differ from mpmath's")
    print(f"interval_laws.json: {len(made)} cases agree with mpmath")


main()
