//! Curves of any table, not only of real materials: enclosures enclose, the monotone cubic does not
//! overshoot, integrals integrate.

use gapkeep::materials::{Expansion, Per};
use gapkeep::numeric::piecewise::Beyond;
use gapkeep::numeric::{Curve, Interval, Piecewise};
use proptest::prelude::{Strategy, prop_assert, proptest};
use std::sync::Arc;

/// Two to eight entries, unevenly spaced, that rise and fall as they like.
fn tables() -> impl Strategy<Value = Vec<(f64, f64)>> {
    proptest::collection::vec((0.05_f64..3.0, -1.0_f64..1.0), 2..9).prop_map(|steps| {
        let mut x = -2.0;
        let entry = |(step, y): (f64, f64)| {
            x += step;
            (x, y)
        };
        steps.into_iter().map(entry).collect()
    })
}

/// The coefficient of a table by Simpson's rule, 4000 steps: another way to the integral.
fn simpson(alpha: impl Fn(f64) -> f64, from: f64, to: f64) -> f64 {
    let n = 4000;
    let h = (to - from) / f64::from(n);
    let weight = |i: i32| match i {
        0 => 1.0,
        i if i == n => 1.0,
        i if i % 2 == 1 => 4.0,
        _ => 2.0,
    };
    (0..=n).map(|i| weight(i) * alpha(from + h * f64::from(i))).sum::<f64>() * h / 3.0
}

proptest! {
    #[test]
    fn any_curve_encloses_its_values(
        table in tables(),
        base in -3.0_f64..3.0,
        lo in -3.0_f64..12.0,
        width in 0.0_f64..8.0,
    ) {
        let curves: [Arc<dyn Curve>; 5] = [
            Arc::new(Piecewise::linear(&table, Beyond::Straight).unwrap()),
            Arc::new(Piecewise::monotone(&table, Beyond::Straight).unwrap()),
            Expansion::mean(base, &table).unwrap().curve,
            Expansion::instantaneous(&table, Per::ReferenceLength).unwrap().curve,
            Expansion::instantaneous(&table, Per::CurrentLength).unwrap().curve,
        ];
        let over = Interval::new(lo, lo + width);
        for (which, curve) in curves.iter().enumerate() {
            let mut order = curve.clone();
            for derivative in 0..3 {
                let range = order.range(over);
                let slack = 1e-11 * (1.0 + range.magnitude().min(1e6));
                for i in 0..=20 {
                    let x = (lo + width * f64::from(i) / 20.0).min(over.hi());
                    let y = order.value(x);
                    prop_assert!(
                        range.lo() - slack <= y && y <= range.hi() + slack,
                        "curve {which}, derivative {derivative}: {y} at {x} outside {range:?}"
                    );
                }
                order = order.derivative();
            }
        }
    }

    #[test]
    fn the_monotone_cubic_stays_between_its_entries(table in tables()) {
        let curve = Piecewise::monotone(&table, Beyond::Hold).unwrap();
        for pair in table.windows(2) {
            let ((a, ya), (b, yb)) = (pair[0], pair[1]);
            let range = curve.range(Interval::new(a + 1e-9 * (b - a), b - 1e-9 * (b - a)));
            prop_assert!(range.lo() >= ya.min(yb) - 1e-12 && range.hi() <= ya.max(yb) + 1e-12);
            prop_assert!((curve.value(a) - ya).abs() < 1e-14);
        }
    }

    #[test]
    fn an_instantaneous_table_is_integrated(table in tables()) {
        let alpha = Piecewise::linear(&table, Beyond::Hold).unwrap();
        let (from, to) = (table[0].0, table[table.len() - 1].0);
        let per_reference = Expansion::instantaneous(&table, Per::ReferenceLength).unwrap();
        let per_current = Expansion::instantaneous(&table, Per::CurrentLength).unwrap();
        let integral = simpson(|x| alpha.value(x), from, to);
        let strain = |t| per_reference.curve.value(t);
        prop_assert!((strain(to) - strain(from) - integral).abs() < 1e-4);
        for t in [from, to] {
            let grown = libm::expm1(strain(t));
            prop_assert!((per_current.curve.value(t) - grown).abs() < 1e-12 * (1.0 + grown.abs()));
        }
    }
}
