//! Every curve of the library, its slope and its bend lie within what they say of an interval; and
//! slopes are slopes.

use gapkeep::materials::Library;
use gapkeep::numeric::{Curve, Interval};
use proptest::prelude::{ProptestConfig, prop_assert, proptest};
use std::sync::{Arc, LazyLock};

struct Named {
    name: String,
    curve: Arc<dyn Curve>,
    range: Interval,
}

/// Expansion curves first, then all other properties.
static CURVES: LazyLock<Vec<Named>> = LazyLock::new(|| {
    let mut curves = Vec::new();
    for material in Library::builtin().all() {
        for (direction, expansion) in material.expansion.each() {
            curves.push(Named {
                name: format!("{} {direction}", material.name),
                curve: expansion.curve.clone(),
                range: expansion.range,
            });
        }
        let properties = [
            &material.modulus,
            &material.poisson,
            &material.yield_strength,
            &material.density,
            &material.bulk_modulus,
        ];
        for property in properties.into_iter().flatten() {
            let range = property.range.intersection(Interval::new(4.0, 800.0)).unwrap();
            let name = format!("{} property", material.name);
            if !range.is_point() {
                curves.push(Named { name, curve: property.curve.clone(), range });
            }
        }
    }
    curves
});

/// A double-precision polynomial is off by some units in the last place of its greatest term; the
/// range is that of the exact one.
fn rounding(curve: &Arc<dyn Curve>, range: Interval) -> f64 {
    1e-14 * curve.range(range).magnitude().min(1e12)
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 2000, ..ProptestConfig::default() })]

    #[test]
    fn a_range_holds_every_value(
        which in 0..CURVES.len(),
        a in -0.1_f64..1.1,
        b in 0.0_f64..1.0,
        inside in 0.0_f64..1.0,
    ) {
        let Named { name, curve, range } = &CURVES[which];
        let span = range.hi() - range.lo();
        // Wide boxes and narrow ones, a little beyond the data on both sides.
        let lo = range.lo() + span * a;
        let hi = lo + span * b * b * b * 1.2;
        let x = (lo + (hi - lo) * inside).clamp(lo, hi);
        let mut order = curve.clone();
        for derivative in 0..3 {
            let enclosure = order.range(Interval::new(lo, hi));
            let slack = rounding(&order, *range);
            for at in [lo, x, hi] {
                let value = order.value(at);
                prop_assert!(
                    enclosure.lo() - slack <= value && value <= enclosure.hi() + slack,
                    "{name}, derivative {derivative}: {value:e} at {at} outside {enclosure:?}"
                );
            }
            order = order.derivative();
        }
    }

    #[test]
    fn a_slope_bounds_every_secant(
        which in 0..CURVES.len(),
        a in 0.0_f64..0.9,
        b in 0.001_f64..0.1,
    ) {
        let Named { name, curve, range } = &CURVES[which];
        let span = range.hi() - range.lo();
        let (lo, hi) = (range.lo() + span * a, range.lo() + span * (a + b));
        let mut order = curve.clone();
        for derivative in 0..2 {
            let slope = order.derivative().range(Interval::new(lo, hi));
            let secant = (order.value(hi) - order.value(lo)) / (hi - lo);
            let slack = 4.0 * rounding(&order, *range) / (hi - lo) + 1e-9 * secant.abs();
            prop_assert!(
                slope.lo() - slack <= secant && secant <= slope.hi() + slack,
                "{name}, derivative {derivative}: {secant:e} outside {slope:?}"
            );
            order = order.derivative();
        }
    }
}

/// A range is not only safe but narrow: over a narrow box it is hardly wider than the values taken.
#[test]
fn a_range_is_narrow() {
    for Named { name, curve, range } in CURVES.iter().filter(|c| c.range.hi() < 1e4) {
        let steps = curve.breakpoints();
        for i in 0..50 {
            let lo = range.lo() + (range.hi() - range.lo()) * f64::from(i) / 50.0;
            let over = Interval::new(lo, lo + 0.7);
            if steps.iter().any(|&s| over.contains(s)) {
                continue;
            }
            let ends = [curve.value(over.lo()), curve.value(over.hi())];
            let taken = (ends[1] - ends[0]).abs();
            let width = curve.range(over).width();
            assert!(width <= taken + 1e-13 * ends[0].abs() + 1e-14, "{name}: {width:e} {taken:e}");
        }
    }
}
