#!/usr/bin/env python3
"""Tails of sums of mixed distributions, computed without inverting any moment function.

usage: mixed_sums.py --write | --check

Writes tests/data/mixed_sums.json, or recomputes it and fails on any difference. The integration
tests hold the program against the same file to a relative 1e-9.

The way, all in real space and with 60 digits (mpmath):
- Normal terms add up to one of standard deviation S. Rectangular terms of half-widths b_i
  integrate its tail once each, so that with n of them
      P(sum > x) = prod(1/(2 b_i)) * sum over signs e of prod(e_i) * S^n G_n((x - sum e_i b_i)/S),
  G_n the n-th repeated integral of the normal tail: n G_n = G_(n-2) - z G_(n-1). Without normal
  terms S^n G_n(z/S) becomes max(-z, 0)^n / n!.
- A triangular term is two rectangular ones of half its width, a trapezoidal one two of
  (base +- top)/2, a measured list the mean over its values, its gauge's step one rectangle.
- A normal cut at two limits is integrated over, by Gauss-Legendre panels.
--check also repeats the larger shares with scipy, where its quad reaches 1e-9.
"""

import json
import sys
from fractions import Fraction
from pathlib import Path

import mpmath as mp
from scipy import integrate, stats

mp.mp.dps = 60
DATA = Path(__file__).resolve().parent.parent / "data" / "mixed_sums.json"


def normal(sigma, coefficient="1"):
    return {"kind": "normal", "sigma": sigma, "coefficient": coefficient}


def uniform(half, coefficient="1"):
    return {"kind": "uniform", "half": half, "coefficient": coefficient}


def triangular(half, coefficient="1"):
    return {"kind": "triangular", "half": half, "coefficient": coefficient}


def trapezoid(base, top, coefficient="1"):
    return {"kind": "trapezoid", "base": base, "top": top, "coefficient": coefficient}


def sorted_normal(sigma, lower, upper, coefficient="1"):
    return {"kind": "sorted", "sigma": sigma, "lower": lower, "upper": upper,
            "coefficient": coefficient}


def measured(values, resolution, coefficient="1"):
    return {"kind": "measured", "values": values, "resolution": resolution,
            "coefficient": coefficient}


RUN = ["0.011", "-0.004", "0.006", "0.000", "0.013", "-0.009", "0.002", "0.005", "-0.001", "0.008"]
STACK40 = (
    [normal(s) for s in ["0.01", "0.02", "0.005", "0.015"] * 5]
    + [uniform("0.02", "-1")] * 8
    + [triangular("0.04")] * 6
    + [uniform("0.01", "2")] * 6
)

# Name, terms, limits on the sum.
CASES = [
    ("two rectangles", [uniform("1"), uniform("0.25")], ["0", "0.5", "1", "1.2", "1.2499"]),
    ("three rectangles far apart", [uniform("1"), uniform("0.01"), uniform("0.0001")],
     ["0.5", "1", "1.005", "1.0099", "1.0101"]),
    ("five rectangles", [uniform(b) for b in ["0.1", "0.2", "0.3", "0.4", "0.5"]],
     ["0", "0.6", "1.2", "1.45", "1.4999"]),
    ("rectangle and triangle", [uniform("0.3"), triangular("0.1", "-1")],
     ["-0.35", "0.1", "0.25", "0.399"]),
    ("rectangle and narrow normal", [uniform("1"), normal("0.001")],
     ["0.5", "0.999", "1.003", "1.006"]),
    ("rectangle, triangle and narrow normal", [uniform("1"), triangular("0.1"), normal("0.0001")],
     ["0.9", "1.05", "1.0999", "1.1002"]),
    ("rectangle and wide normal", [uniform("0.01"), normal("1")], ["1", "4", "8"]),
    ("all kinds but cut", [normal("0.02"), uniform("0.05", "0.5"), triangular("0.06", "-1"),
                           trapezoid("0.04", "0.015", "1.5")], ["-0.05", "0.05", "0.1", "0.15"]),
    ("trapezoids", [trapezoid("1", "0.5"), trapezoid("0.8", "0.1"), trapezoid("0.3", "0.2")],
     ["0.3", "1.5", "2.0", "2.09"]),
    ("forty contributors", STACK40, ["0.05", "0.2", "0.3", "0.4", "0.5"]),
    ("measured list with a step", [measured(RUN, "0.001"), normal("0.004")],
     ["0", "0.01", "0.02", "0.03"]),
    ("measured list with a coarse step", [measured(RUN, "0.005", "-1.5"), uniform("0.02"),
                                          triangular("0.01")], ["-0.01", "0.01", "0.03"]),
    ("two measured lists", [measured(RUN, "0.001"), measured(RUN[:4], "0.002", "2")],
     ["0.003", "0.02", "0.033"]),
    ("cut normal and normal", [sorted_normal("1", "-1.5", "2"), normal("0.5")],
     ["-2", "0.5", "2", "3.5", "5"]),
    ("cut normal on one side", [sorted_normal("1", "0.5", "4", "-1"), uniform("0.3")],
     ["-3", "-1", "-0.5", "-0.21"]),
    ("cut normal, rectangle, triangle", [sorted_normal("0.02", "-0.05", "0.05"), uniform("0.03"),
                                         triangular("0.02")], ["0.02", "0.06", "0.09", "0.099"]),
    ("cut normal that is nearly a rectangle", [sorted_normal("10", "-1", "1"), normal("0.2"),
                                               uniform("0.4")], ["0.5", "1.2", "2"]),
    ("cut normal that is hardly cut", [sorted_normal("1", "-7", "7"), uniform("1"),
                                       uniform("0.5")], ["1", "4", "7"]),
]


def fraction(text):
    return Fraction(text)


def to_mp(x):
    return mp.mpf(x.numerator) / x.denominator


def repeated_integral(n, z):
    """The n-th repeated integral of the standard normal tail."""
    below, value = mp.npdf(z), mp.erfc(z / mp.sqrt(2)) / 2
    for k in range(1, n + 1):
        below, value = value, (below - z * value) / k
    return value


class Smooth:
    """Normal and rectangular terms together: the tail in closed form."""

    def __init__(self, variance, halves):
        self.sigma = mp.sqrt(to_mp(variance))
        self.n = len(halves)
        self.scale = mp.mpf(1)
        corners = {Fraction(0): 1}
        for b in halves:
            self.scale /= 2 * to_mp(b)
            sums = {}
            for corner, weight in corners.items():
                for sign in (1, -1):
                    key = corner + sign * b
                    sums[key] = sums.get(key, 0) + sign * weight
            corners = sums
        self.corners = [(to_mp(c), w) for c, w in corners.items() if w]
        self.edge = to_mp(sum(halves, Fraction(0)))

    def above(self, x):
        total = mp.mpf(0)
        for corner, weight in self.corners:
            z = x - corner
            if self.sigma > 0:
                part = self.sigma**self.n * repeated_integral(self.n, z / self.sigma)
            elif self.n == 0:
                part = mp.mpf(1 if z < 0 else 0)
            else:
                part = (-z) ** self.n / mp.factorial(self.n) if z < 0 else mp.mpf(0)
            total += weight * part
        return total * self.scale

    def kinks(self):
        if self.sigma > 0:
            return [k * self.sigma for k in (-9, -6, -4, -2, 0, 2, 4, 6, 9)] + [
                c for c, _ in self.corners]
        return [c for c, _ in self.corners]


def share_above(terms, limit):
    """P(sum of coefficient * value > limit); every term but a cut or measured one has mean 0."""
    variance, halves, lists, cuts = Fraction(0), [], [], []
    for term in terms:
        a = fraction(term["coefficient"])
        kind = term["kind"]
        if kind == "normal":
            variance += (a * fraction(term["sigma"])) ** 2
        elif kind == "uniform":
            halves.append(abs(a) * fraction(term["half"]))
        elif kind == "triangular":
            halves += [abs(a) * fraction(term["half"]) / 2] * 2
        elif kind == "trapezoid":
            base, top = fraction(term["base"]), fraction(term["top"])
            halves += [abs(a) * (base + top) / 2, abs(a) * (base - top) / 2]
        elif kind == "measured":
            lists.append([a * fraction(v) for v in term["values"]])
            halves.append(abs(a) * fraction(term["resolution"]) / 2)
        else:
            cuts.append((to_mp(a), *(to_mp(fraction(term[k])) for k in ("sigma", "lower", "upper"))))
    smooth = Smooth(variance, halves)
    offsets = {Fraction(0): Fraction(1)}
    for values in lists:
        sums = {}
        for offset, weight in offsets.items():
            for v in values:
                sums[offset + v] = sums.get(offset + v, Fraction(0)) + weight / len(values)
        offsets = sums
    total = mp.mpf(0)
    for offset, weight in offsets.items():
        x = to_mp(fraction(limit) - offset)
        total += to_mp(weight) * (with_cut(smooth, cuts[0], x) if cuts else smooth.above(x))
    assert len(cuts) < 2
    return total


def with_cut(smooth, cut, x):
    a, sigma, lower, upper = cut
    kept = mp.ncdf(upper / sigma) - mp.ncdf(lower / sigma)
    points = {lower, upper}
    points |= {(x - kink) / a for kink in smooth.kinks()}
    points |= {k * sigma for k in range(-8, 9)}
    points = sorted(p for p in points if lower <= p <= upper)
    with mp.workdps(40):
        integral = mp.quad(
            lambda v: mp.npdf(v / sigma) / sigma * smooth.above(x - a * v), points,
            method="gauss-legendre", maxdegree=5)
    return integral / kept


def scipy_above(terms, limit):
    """The same for two terms by scipy's own distributions and quadrature, or None."""
    if len(terms) != 2 or any(t["kind"] == "measured" for t in terms):
        return None

    def frozen(term):
        a = float(term["coefficient"])
        kind = term["kind"]
        if kind == "normal":
            return stats.norm(0, abs(a) * float(term["sigma"]))
        if kind == "uniform":
            half = abs(a) * float(term["half"])
            return stats.uniform(-half, 2 * half)
        if kind == "triangular":
            half = abs(a) * float(term["half"])
            return stats.triang(0.5, -half, 2 * half)
        if kind == "trapezoid":
            base, top = abs(a) * float(term["base"]), float(term["top"]) / float(term["base"])
            return stats.trapezoid(0.5 - top / 2, 0.5 + top / 2, -base, 2 * base)
        sigma = float(term["sigma"])
        ends = sorted((a * float(term["lower"]), a * float(term["upper"])))
        scale = abs(a) * sigma
        return stats.truncnorm(ends[0] / scale, ends[1] / scale, 0, scale)

    outer, inner = (frozen(t) for t in terms)
    low, high = outer.support()
    low, high = max(low, -40), min(high, 40)
    kinks = [float(limit) - e for e in inner.support()]
    # The inner tail turns from 0 to 1 about here; quad must not step over it.
    kinks += [float(limit) + k * inner.std() for k in (-6, -2, 0, 2, 6)]
    kinks = [k for k in kinks if low < k < high]
    value, _ = integrate.quad(lambda u: outer.pdf(u) * inner.sf(float(limit) - u), low, high,
                              points=sorted(kinks), epsabs=0, epsrel=1e-11, limit=500)
    return value


def compute():
    cases = []
    for name, terms, limits in CASES:
        for limit in limits:
            share = share_above(terms, limit)
            cases.append({"name": name, "terms": terms, "limit": limit,
                          "above": mp.nstr(share, 17)})
    return cases


def main():
    if sys.argv[1:] == ["--write"]:
        lines = ",\n".join(json.dumps(case) for case in compute())
        DATA.write_text(f"[\n{lines}\n]\n")
        return 0
    if sys.argv[1:] != ["--check"]:
        print(__doc__)
        return 2
    stored, fresh, bad, by_scipy = json.loads(DATA.read_text()), compute(), 0, 0
    if len(stored) != len(fresh):
        print(f"{len(stored)} cases stored, {len(fresh)} computed")
        return 1
    for old, new in zip(stored, fresh):
        same = {**old, "above": ""} == {**new, "above": ""}
        difference = abs(mp.mpf(old["above"]) - mp.mpf(new["above"]))
        if not same or difference > mp.mpf("1e-14") * mp.mpf(new["above"]):
            print(f"{new['name']} above {new['limit']}: stored {old['above']}, got {new['above']}")
            bad += 1
        third = scipy_above(new["terms"], new["limit"])
        if third is not None and float(new["above"]) > 1e-6:
            by_scipy += 1
            if abs(third - float(new["above"])) > 1e-9 * third:
                print(f"{new['name']} above {new['limit']}: scipy {third}, got {new['above']}")
                bad += 1
    print(f"{len(fresh)} shares recomputed, {by_scipy} of them by scipy too, {bad} differ")
    return 1 if bad else 0


if __name__ == "__main__":
    sys.exit(main())
