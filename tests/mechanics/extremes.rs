//! Compound joints proven over their whole box of sizes, moduli and temperatures.

use gapkeep::mechanics::{Ring, contact};
use gapkeep::numeric::extremes::extremes;
use gapkeep::numeric::{Interval, Number, Recorded, Tape};

/// What is asked of a compound.
#[derive(Debug, Clone, Copy)]
enum Asked {
    Pressure(usize),
    VonMises(usize),
    Gap(usize),
}

/// Shaft, bush and housing of 10/20/25/45 mm. Unknowns: temperature (°C), two radial interferences
/// at 20 °C, scatter of the three moduli.
fn compound<N: Number>(asked: Asked, x: &[N]) -> N {
    let n = N::exact;
    let rise = x[0].clone() - 20.0;
    let radii = [0.010, 0.020, 0.025, 0.045];
    let elastic = [(207e9, 0.29), (110e9, 0.34), (70e9, 0.33)];
    let ring = |k: usize| Ring {
        bore: Some(n(radii[k])),
        outside: n(radii[k + 1]),
        modulus: x[3 + k].clone() * elastic[k].0,
        poisson: n(elastic[k].1),
        spin: n(0.0),
    };
    let rings = [ring(0), ring(1), ring(2)];
    let delta = [
        x[1].clone() + rise.clone() * (0.020 * (11.7e-6 - 17.8e-6)),
        x[2].clone() + rise * (0.025 * (17.8e-6 - 23.4e-6)),
    ];
    let p = contact::pressures(&rings, &delta);
    match asked {
        Asked::Pressure(k) => p[k].clone(),
        Asked::VonMises(k) => {
            let (p_a, p_b) = contact::faces(&rings, &delta, k);
            rings[k].greatest_von_mises_at_rest(p_a, p_b)
        }
        Asked::Gap(k) => contact::gaps(&rings, &delta).remove(k) * 1e6,
    }
}

/// Holds the proven ends against those over the corners of the box, where all of these stand.
fn hold(asked: Asked, temperatures: (f64, f64), gap: f64) {
    let sizes = [(15e-6, 25e-6), (2e-6, 9e-6)];
    let scatter = [(0.97, 1.03), (0.95, 1.05), (0.97, 1.03)];
    let ends: Vec<(f64, f64)> = [temperatures].into_iter().chain(sizes).chain(scatter).collect();
    let ranges: Vec<Interval> = ends.iter().map(|&(lo, hi)| Interval::new(lo, hi)).collect();
    let tape = Tape::of(ends.len(), |x: &[Recorded]| compound(asked, x));
    let found = extremes(&tape, &ranges, gap);
    assert!(found.least.met && found.greatest.met, "{asked:?} at {temperatures:?}: {found:?}");
    let (mut least, mut greatest) = (f64::INFINITY, f64::NEG_INFINITY);
    for set in 0..1_usize << ends.len() {
        let end = |(i, &(lo, hi)): (usize, &(f64, f64))| if set >> i & 1 == 1 { hi } else { lo };
        let corner: Vec<f64> = ends.iter().enumerate().map(end).collect();
        let value = compound(asked, &corner);
        least = if value < least { value } else { least };
        greatest = if value > greatest { value } else { greatest };
    }
    let near = |bound: f64, corner: f64| (bound - corner).abs() <= gap + 1e-9 * corner.abs();
    assert!(near(found.least.bound, least), "{asked:?}: {} {least}", found.least.bound);
    assert!(near(found.greatest.bound, greatest), "{asked:?}: {} {greatest}", found.greatest.bound);
}

#[test]
fn closed_contacts_are_proven() {
    let warm = (20.0, 70.0);
    hold(Asked::Pressure(0), warm, 1.0);
    hold(Asked::Pressure(1), warm, 1.0);
    hold(Asked::Gap(1), warm, 1e-6);
    for ring in 0..3 {
        hold(Asked::VonMises(ring), warm, 1e3);
    }
}

#[test]
fn contacts_that_open_on_the_way_are_proven() {
    let wide = (-40.0, 150.0);
    hold(Asked::Pressure(0), wide, 1.0);
    hold(Asked::Pressure(1), wide, 1.0);
    hold(Asked::Gap(1), wide, 1e-6);
    for ring in 0..3 {
        hold(Asked::VonMises(ring), wide, 1e3);
    }
}
