#!/usr/bin/env python3
"""Thick rings and compound joints by numerical integration, without Lame's formulas.

usage: ring_ode.py --write | --check

Writes tests/data/rings.json, or recomputes it and fails on any difference. The integration tests
hold the program against the same file to a relative 1e-9.

The way:
- A ring is radial equilibrium with Hooke's law in plane stress, as two first-order equations for
  v = u/r and s = sigma_r over E:
      v' = ((1-nu^2) s - (1+nu) v)/r,   s' = (v - (1-nu) s)/r - rho omega^2 r/E,
  sigma_theta/E = v + nu s. scipy integrates it from the bore (DOP853) and meets the pressure on
  the outside by superposing two shots. A solid disc, singular at its centre, is solved by
  collocation (solve_bvp with its singular term).
- A compound takes the compliances of its rings from such integrations, so no closed form enters;
  contact (pressure or gap, never a pull) is the least-squares problem of scipy's nnls with the
  Cholesky factor of the compliance.
- Where every contact is closed, all rings at once are also one matrix for the constants of
  u = A r + B/r; both ways must agree.

All in m, Pa, kg/m3, rad/s.
"""

import json
import math
import sys
from pathlib import Path

import numpy as np
from scipy.integrate import solve_bvp, solve_ivp
from scipy.optimize import nnls

DATA = Path(__file__).resolve().parent.parent / "data" / "rings.json"
AGREEMENT = 2e-10


def ring(a, b, e, nu, rho=0.0, omega=0.0):
    return {"bore": a, "outside": b, "modulus": e, "poisson": nu, "density": rho, "speed": omega}


def integrated(r, p_a, p_b, radii, turning=True):
    """v = u/r and s = sigma_r/E at each of `radii`."""
    b, e, nu = r["outside"], r["modulus"], r["poisson"]
    load = r["density"] * r["speed"] ** 2 / e if turning else 0.0
    if r["bore"] is None:
        # The pressure and the turning are brought to one size, so that one tolerance does for both.
        size = max(abs(p_b) / e, load * b * b, 1e-300)

        def inside(x, y):
            return np.vstack([np.zeros_like(x), -load * b * b / size * x])

        def ends(centre, rim):
            # At the centre the singular term must vanish, which leaves one condition there.
            return np.array([centre[0] - (1 - nu) * centre[1], rim[1] + p_b / e / size])

        singular = np.array([[-(1 + nu), 1 - nu * nu], [1.0, -(1 - nu)]])
        x = np.linspace(0.0, 1.0, 41)
        found = solve_bvp(inside, ends, x, np.zeros((2, x.size)), S=singular, tol=1e-12,
                          max_nodes=100000)
        assert found.success, found.message
        return found.sol(np.array(radii) / b) * size

    a = r["bore"]

    def slope(turn):
        def f(x, y):
            v, s = y
            return [((1 - nu * nu) * s - (1 + nu) * v) / x, (v - (1 - nu) * s) / x - turn * x]
        return f

    def shot(start, turn):
        found = solve_ivp(slope(turn), (a, b), start, method="DOP853", rtol=3e-14, atol=1e-30,
                          dense_output=True)
        assert found.success, found.message
        at = np.array([found.sol(x) if a < x < b else found.y[:, 0 if x <= a else -1]
                       for x in radii])
        return at.T, found.y[:, -1]

    start = np.array([0.0, -p_a / e])
    forced, at_end = shot(start, load)
    free, free_end = shot([1.0, 0.0], 0.0)
    c = (-p_b / e - at_end[1]) / free_end[1]
    return forced + c * free


def single(name, r, p_a, p_b):
    a, b = r["bore"] or 0.0, r["outside"]
    radii = [a, a + 0.3 * (b - a), a + 0.7 * (b - a), b]
    v, s = integrated(r, p_a, p_b, radii)
    e, nu = r["modulus"], r["poisson"]
    return {
        "name": name, "ring": r, "p_a": p_a, "p_b": p_b, "radii": radii,
        "bore_strain": None if r["bore"] is None else v[0], "outside_strain": v[-1],
        "radial": list(e * s), "hoop": list(e * (v + nu * s)),
    }


def faces(r, p_a, p_b, turning):
    """u/r at bore and outside."""
    a = r["bore"] if r["bore"] is not None else 0.0
    v, _ = integrated(r, p_a, p_b, [a, r["outside"]], turning)
    return v


def compound(name, rings, interference):
    n = len(interference)
    m = np.zeros((n, n))
    f = np.array(interference, dtype=float)
    unit = 1e6
    for k, r in enumerate(rings):
        still = {**r, "speed": 0.0}
        turn = faces(r, 0.0, 0.0, True) if r["speed"] else np.zeros(2)
        outer = faces(still, 0.0, unit, False) / unit
        if k > 0:
            inner = faces(still, unit, 0.0, False) / unit
            m[k - 1, k - 1] += r["bore"] * inner[0]
            f[k - 1] -= r["bore"] * turn[0]
        if k < n:
            m[k, k] -= r["outside"] * outer[1]
            f[k] += r["outside"] * turn[1]
        if 0 < k < n:
            m[k - 1, k] += r["bore"] * outer[0]
            m[k, k - 1] -= r["outside"] * inner[1]
    radii = np.array([r["outside"] for r in rings[:n]])
    # Per force on each contact instead of pressure the compliance is symmetric.
    k = m / radii
    assert np.allclose(k, k.T, rtol=1e-9)
    lower = np.linalg.cholesky((k + k.T) / 2)
    forces, _ = nnls(lower.T, np.linalg.solve(lower, f))
    # nnls finds which contacts are closed; their pressures once more from M itself.
    closed = forces > 0
    p = np.zeros(n)
    p[closed] = np.linalg.solve(m[np.ix_(closed, closed)], f[closed])
    assert (p >= 0).all() and (m @ p - f >= -1e-15).all()
    if closed.all():
        all_at_once(rings, interference, p)
    stress = []
    for i, r in enumerate(rings):
        a = r["bore"] if r["bore"] is not None else 0.0
        p_a, p_b = (p[i - 1] if i > 0 else 0.0), (p[i] if i < n else 0.0)
        v, s = integrated(r, p_a, p_b, list(np.linspace(a, r["outside"], 201)))
        hoop = v + r["poisson"] * s
        stress.append(float(r["modulus"] * np.sqrt(s * s - s * hoop + hoop * hoop).max()))
    return {"name": name, "rings": rings, "interference": list(interference),
            "pressures": list(p), "gaps": [0.0 if c else g for c, g in zip(closed, m @ p - f)],
            "von_mises": stress}


def all_at_once(rings, interference, p):
    """Every ring's u = A r + B/r - particular, all boundary conditions in one matrix."""
    n = len(rings)
    lhs, rhs = np.zeros((2 * n, 2 * n)), np.zeros(2 * n)

    def part(r):
        return r["density"] * r["speed"] ** 2 / r["modulus"]

    def u(k, x):
        r = rings[k]
        nu = r["poisson"]
        row = np.zeros(2 * n)
        row[2 * k], row[2 * k + 1] = x, 1 / x
        return row, -part(r) * (1 - nu * nu) * x ** 3 / 8

    def radial(k, x):
        r = rings[k]
        e, nu = r["modulus"], r["poisson"]
        row = np.zeros(2 * n)
        row[2 * k], row[2 * k + 1] = e / (1 - nu), -e / (1 + nu) / x ** 2
        return row, -part(r) * e * (3 + nu) * x ** 2 / 8

    i = 0

    def equation(row, right):
        nonlocal i
        size = np.abs(row).max()
        lhs[i], rhs[i] = row / size, right / size
        i += 1

    if rings[0]["bore"] is None:
        row = np.zeros(2 * n)
        row[1] = 1.0
        equation(row, 0.0)
    else:
        row, known = radial(0, rings[0]["bore"])
        equation(row, -known)
    for k, delta in enumerate(interference):
        x = rings[k]["outside"]
        (s1, c1), (s2, c2) = radial(k, x), radial(k + 1, x)
        equation(s1 - s2, c2 - c1)
        (u1, d1), (u2, d2) = u(k, x), u(k + 1, x)
        equation(u2 - u1, delta + d1 - d2)
    row, known = radial(n - 1, rings[-1]["outside"])
    equation(row, -known)
    # Columns are of very different size too.
    columns = np.abs(lhs).max(axis=0)
    constants = np.linalg.solve(lhs / columns, rhs) / columns
    for k in range(n - 1):
        row, known = radial(k, rings[k]["outside"])
        other = -(row @ constants + known)
        assert abs(other - p[k]) <= 1e-8 * abs(p[k]), (other, p[k])


def chain(radii, materials, speeds=None):
    speeds = speeds or [0.0] * len(materials)
    return [ring(a if a > 0 else None, b, e, nu, rho, w)
            for (a, b), (e, nu, rho), w in zip(zip(radii, radii[1:]), materials, speeds)]


STEEL, BRONZE, ALLOY = (207e9, 0.29, 7850.0), (110e9, 0.34, 8800.0), (70e9, 0.33, 2700.0)
CARBON, MAGNET = (150e9, 0.3, 1600.0), (160e9, 0.24, 7500.0)


def expanded(radius, delta, rise, inner, outer):
    """Radial interference at temperature of rings of constant coefficients, ppm/K."""
    return (radius + delta) * (1 + inner * 1e-6 * rise) - radius * (1 + outer * 1e-6 * rise)


def made():
    turn = 2 * math.pi / 60
    singles = [
        single("hub", ring(0.02, 0.04, *ALLOY), 35e6, 0.0),
        single("hollow shaft", ring(0.01, 0.02, *STEEL), 0.0, 35e6),
        single("thin sleeve, both faces", ring(0.0495, 0.05, *STEEL), 12e6, 9e6),
        single("turning ring", ring(0.02, 0.09, *ALLOY, 2500.0), 0.0, 0.0),
        single("turning and pressed", ring(0.05, 0.07, *CARBON, 1900.0), 80e6, 5e6),
        single("solid shaft", ring(None, 0.02, *STEEL), 0.0, 60e6),
        single("turning disc", ring(None, 0.15, *STEEL, 1200.0), 0.0, 0.0),
        single("turning disc, shrunk into a ring", ring(None, 0.15, *STEEL, 1200.0), 0.0, 40e6),
    ]
    joint = [0.01, 0.02, 0.04]
    least = (20.030 * (1 + 11.7e-6 * 40) - 20.0125 * (1 + 23.4e-6 * 40) - 0.004) * 1e-3
    most = (20.038 * (1 + 11.7e-6 * 40) - 20.0 * (1 + 23.4e-6 * 40) - 0.004) * 1e-3
    three = [0.010, 0.020, 0.025, 0.045]
    materials = [STEEL, BRONZE, ALLOY]
    rpm9000 = [9000 * turn] * 3
    rotor = [0.0, 0.030, 0.036, 0.040]
    compounds = [
        compound("alloy hub on a hollow shaft, least at 60 degC", chain(joint, [STEEL, ALLOY]),
                 [least]),
        compound("alloy hub on a hollow shaft, greatest at 60 degC", chain(joint, [STEEL, ALLOY]),
                 [most]),
        compound("shaft, bush, housing at 70 degC and 9000 rpm", chain(three, materials, rpm9000),
                 [20e-6 + 0.020 * (11.7e-6 - 17.8e-6) * 50,
                  25e-6 + 0.025 * (17.8e-6 - 23.4e-6) * 50]),
        compound("the same loose at 150 degC", chain(three, materials),
                 [20e-6 + 0.020 * (11.7e-6 - 17.8e-6) * 130,
                  6e-6 + 0.025 * (17.8e-6 - 23.4e-6) * 130]),
        compound("rotor under a sleeve", chain(rotor, [STEEL, MAGNET, CARBON], [1900.0] * 3),
                 [12e-6, 130e-6]),
        compound("rotor whose magnets lift", chain(rotor, [STEEL, MAGNET, CARBON], [4200.0] * 3),
                 [-12e-6, 60e-6]),
        compound("four sleeves, the second loose",
                 chain([0.0, 0.01, 0.014, 0.015, 0.02, 0.03],
                       [STEEL, ALLOY, (3e9, 0.4, 1400.0), BRONZE, ALLOY]),
                 [25e-6, -30e-6, 8e-6, 4e-6]),
        compound("contact that only its neighbour closes",
                 chain([0.010, 0.020, 0.022, 0.040], [STEEL, BRONZE, ALLOY]), [30e-6, -10e-6]),
    ]
    return {"single": singles, "compound": compounds}


def differences(a, b, where=""):
    if isinstance(a, dict):
        assert a.keys() == b.keys(), where
        return [d for key in a for d in differences(a[key], b[key], f"{where}.{key}")]
    if isinstance(a, list):
        assert len(a) == len(b), where
        # A list of numbers is as exact as its largest.
        if a and all(isinstance(x, float) for x in a):
            size = max(map(abs, a))
            return [f"{where}: {x} {y}" for x, y in zip(a, b) if abs(x - y) > AGREEMENT * size]
        return [d for i, (x, y) in enumerate(zip(a, b)) for d in differences(x, y, f"{where}[{i}]")]
    if isinstance(a, float):
        return [] if abs(a - b) <= AGREEMENT * abs(a) else [f"{where}: {a} {b}"]
    return [] if a == b else [f"{where}: {a} {b}"]


def main():
    fresh = json.loads(json.dumps(made()))
    if sys.argv[1:] == ["--write"]:
        DATA.write_text(json.dumps(fresh, indent=1) + "\n")
    elif sys.argv[1:] == ["--check"]:
        found = differences(json.loads(DATA.read_text()), fresh)
        if found:
            sys.exit("rings.json differs from what scipy computes:\n" + "\n".join(found))
        print(f"{DATA.name}: every value recomputed")
    else:
        sys.exit(__doc__.split("\n\n")[1])


if __name__ == "__main__":
    main()
