//! What every formula of the room must obey, on drawn cases.

use gapkeep::mechanics::{Ring, contact, filling, joint, restraint};
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
            let (p_a, p_b) = contact::faces(&point, &deltas(&drawn, |b| b.member), k);
            let (a, b) = contact::faces(&boxed, &deltas(&drawn, Between::interval), k);
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
        let gaps = contact::gaps(&point, &delta);
        for k in 0..3 {
            prop_assert!(p[k] >= 0.0 && gaps[k] >= 0.0);
            prop_assert!(p[k] == 0.0 || gaps[k] == 0.0, "{} {}", p[k], gaps[k]);
        }
    }

    #[test]
    fn the_rings_meet_where_they_touch_and_part_where_they_do_not(drawn in drawn()) {
        let point = rings(&drawn, |b| b.member);
        let delta = deltas(&drawn, |b| b.member);
        let p = contact::pressures(&point, &delta);
        let gaps = contact::gaps(&point, &delta);
        for k in 0..3 {
            let (a, b) = contact::faces(&point, &delta, k);
            let (c, d) = contact::faces(&point, &delta, k + 1);
            for (one, other) in [(b, p[k]), (c, p[k])] {
                prop_assert!((one - other).abs() <= 1e-9 * p[k].max(1e3), "{one} {other}");
            }
            let r = point[k].outside;
            let apart = r * (point[k + 1].bore_strain(c, d) - point[k].outside_strain(a, b));
            prop_assert!((apart - delta[k] - gaps[k]).abs() <= 1e-15, "{apart} {} {}", delta[k], gaps[k]);
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

    #[test]
    fn members_lie_within_the_enclosure_of_a_filling(
        liquid in between(0.95, 1.1, 0.02),
        bulk in between(0.5e9, 3e9, 0.1),
        yielding in between(0.0, 1e-9, 0.5),
    ) {
        let one = Interval::point(1.0);
        let boxed = [liquid.interval(), one, bulk.interval(), yielding.interval()];
        let [l, v, k, c] = boxed;
        let proven = filling::full_pressure(l, v, k, c);
        let p = filling::full_pressure(liquid.member, 1.0, bulk.member, yielding.member);
        prop_assert!(proven.lo() <= p * (1.0 + 1e-9) && p * (1.0 - 1e-9) <= proven.hi());
        // The mass is where it was.
        let left = liquid.member * libm::exp(-p / bulk.member);
        prop_assert!(p == 0.0 || (left / (1.0 + yielding.member * p) - 1.0).abs() < 1e-14);
    }

    #[test]
    fn members_lie_within_the_enclosure_of_a_clamp(
        take_up in between(-50e-6, 200e-6, 0.5),
        length in between(0.02, 0.2, 0.02),
        modulus in between(60e9, 210e9, 0.1),
        area in between(50e-6, 500e-6, 0.05),
    ) {
        let c = restraint::compliance(length.interval(), modulus.interval(), area.interval());
        let proven = restraint::force(take_up.interval(), c);
        let c = restraint::compliance(length.member, modulus.member, area.member);
        let f = restraint::force(take_up.member, c);
        prop_assert!(proven.lo() <= f && f <= proven.hi() && proven.lo() >= 0.0);
        let x = take_up.member;
        prop_assert!((f * c - restraint::separation(x) - x).abs() <= 1e-12 * x.abs());
    }

    #[test]
    fn a_full_cylinder_is_a_ring_that_also_grows_long(q in 1.05..4.0_f64, nu in 0.0..0.49_f64) {
        // Twice the hoop strain of the bore and once the strain along it, from Lamé's stresses with
        // the ends' force p/(Q²−1) in the wall.
        let wall = Ring { bore: Some(0.02), outside: 0.02 * q, modulus: 1.0, poisson: nu, spin: 0.0 };
        let inside = wall.stress_inside(1.0, 0.0);
        let along = 1.0 / (q * q - 1.0);
        let hoop = inside.hoop() - nu * (inside.radial() + along);
        let long = along - nu * (inside.radial() + inside.hoop());
        let found = filling::closed_cylinder_compliance(&wall);
        prop_assert!((found / (2.0 * hoop + long) - 1.0).abs() < 1e-10);
    }
}
