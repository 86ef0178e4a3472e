//! What every formula of the room must obey, on drawn cases.

use gapkeep::mechanics::{Ring, contact, joint};
use gapkeep::numeric::{Interval, Number};
use proptest::prelude::{ProptestConfig, Strategy};
use proptest::{collection, prop_assert, proptest};

/// An interval and a member of it.
#[derive(Debug, Clone, Copy)]
struct Between {
    lo: f64,
    hi: f64,
    member: f64,
}

impl Between {
    fn interval(self) -> Interval {
        Interval::new(self.lo, self.hi)
    }
}

fn between(lo: f64, hi: f64, widest: f64) -> impl Strategy<Value = Between> {
    (lo..hi, 0.0..widest, 0.0..=1.0_f64).prop_map(|(mid, width, share)| {
        let (lo, hi) = (mid - 0.5 * width * mid.abs(), mid + 0.5 * width * mid.abs());
        Between { lo, hi, member: (lo + share * (hi - lo)).clamp(lo, hi) }
    })
}

/// Four walls, moduli, ratios and speeds, and three interferences.
type Drawn = (Vec<Between>, Vec<Between>, Vec<Between>, Vec<Between>, Vec<Between>);

fn drawn() -> impl Strategy<Value = Drawn> {
    (
        collection::vec(between(0.004, 0.02, 0.01), 5),
        collection::vec(between(3e9, 210e9, 0.1), 4),
        collection::vec(between(0.2, 0.4, 0.05), 4),
        collection::vec(between(0.0, 4e9, 0.1), 4),
        collection::vec(between(-20e-6, 40e-6, 0.5), 3),
    )
}

/// Rings whose contact radii are sums of walls, so that neighbours share them.
fn rings<N: Number>(drawn: &Drawn, of: impl Fn(Between) -> N) -> Vec<Ring<N>> {
    let mut radius = of(drawn.0[0]);
    let mut rings = Vec::new();
    for i in 0..4 {
        let outside = radius.clone() + of(drawn.0[i + 1]);
        rings.push(Ring {
            bore: Some(radius),
            outside: outside.clone(),
            modulus: of(drawn.1[i]),
            poisson: of(drawn.2[i]),
            spin: of(drawn.3[i]),
        });
        radius = outside;
    }
    rings
}

fn deltas<N: Number>(drawn: &Drawn, of: impl Fn(Between) -> N) -> Vec<N> {
    drawn.4.iter().map(|&d| of(d)).collect()
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(200))]

    #[test]
    fn members_lie_within_the_enclosure_of_a_compound(drawn in drawn()) {
        let boxed = rings(&drawn, Between::interval);
        let proven = contact::pressures(&boxed, &deltas(&drawn, Between::interval));
        let point = rings(&drawn, |b| b.member);
        let found = contact::pressures(&point, &deltas(&drawn, |b| b.member));
        for k in 0..3 {
            prop_assert!(proven[k].lo() <= found[k] * (1.0 + 1e-9));
            prop_assert!(found[k] * (1.0 - 1e-9) <= proven[k].hi());
        }
        for k in 0..4 {
            let (p_a, p_b) = contact::faces(&found, k);
            let (a, b) = contact::faces(&proven, k);
            let stress = point[k].greatest_von_mises(p_a, p_b);
            let enclosed = boxed[k].greatest_von_mises(a, b);
            prop_assert!(enclosed.lo() <= stress * (1.0 + 1e-9));
            prop_assert!(stress * (1.0 - 1e-9) <= enclosed.hi());
        }
    }

    #[test]
    fn contact_presses_or_is_open_never_both(drawn in drawn()) {
        let point = rings(&drawn, |b| b.member);
        let delta = deltas(&drawn, |b| b.member);
        let p = contact::pressures(&point, &delta);
        let gaps = contact::gaps(&point, &delta, &p);
        for k in 0..3 {
            prop_assert!(p[k] >= 0.0 && gaps[k] >= 0.0);
            // What is left of the gap of a closed contact is rounding.
            prop_assert!(p[k] == 0.0 || gaps[k] <= 1e-15, "{} {}", p[k], gaps[k]);
        }
    }

    #[test]
    fn more_interference_never_means_less_pressure_anywhere(drawn in drawn(), which in 0_usize..3) {
        let point = rings(&drawn, |b| b.member);
        let mut delta = deltas(&drawn, |b| b.member);
        let before = contact::pressures(&point, &delta);
        delta[which] += 5e-6;
        let after = contact::pressures(&point, &delta);
        for k in 0..3 {
            prop_assert!(after[k] >= before[k] * (1.0 - 1e-9));
        }
    }

    #[test]
    fn a_joint_is_a_compound_of_two(drawn in drawn()) {
        let point = rings(&drawn, |b| b.member);
        let (shaft, hub) = (&point[0], &point[1]);
        let still = |ring: &Ring<f64>| Ring { spin: 0.0, ..ring.clone() };
        let c = joint::compliance(shaft, hub);
        let radial = drawn.4[0].member;
        let one = joint::pressure(2.0 * radial, 2.0 * shaft.outside, c);
        let both = contact::pressures(&[still(shaft), still(hub)], &[radial]);
        prop_assert!((one - both[0]).abs() <= 1e-12 * one);
    }
}
