//! Where a recorded formula is not smooth along a straight line: both sides of a contact, the rows
//! of a table.

use super::{Binary, Op, Tape, Unary};
use crate::numeric::Interval;
use crate::numeric::number::Ordered;

/// Equal parts of the line that are looked at for a change; two changes that undo one another
/// within one of them are not seen.
const LOOKS: usize = 16;
/// Most kinks that are told apart: the rows of a long history are more than an integral needs.
const MOST: usize = 64;
/// Halvings that locate a kink: to the last bit of a share of the line.
const HALVINGS: usize = 52;

impl Tape {
    /// The places t, 0 < t < 1 and rising, at which the first result changes its formula on the
    /// straight line `from + t·(to − from)`: another operand of a `min` or `max`, another sign under
    /// an absolute value, another piece of a curve.
    ///
    /// # Panics
    /// If `from` or `to` is shorter than [`Tape::inputs`].
    pub fn kinks_along(&self, from: &[f64], to: &[f64]) -> Vec<f64> {
        let mut places = Vec::new();
        if !self.ops.iter().any(|op| self.branches(op)) {
            return places;
        }
        let mut values = Vec::new();
        let mut side = |t: f64| {
            let point: Vec<f64> = from.iter().zip(to).map(|(a, b)| a + t * (b - a)).collect();
            self.run_into(&point, &mut values);
            self.branch(&values)
        };
        let (mut at, mut here) = (0.0, side(0.0));
        for look in 1..=LOOKS {
            let end = look as f64 / LOOKS as f64;
            let there = side(end);
            while here != there && places.len() < MOST {
                // The last place that still looks like `here`, and the first that does not.
                let (mut same, mut other) = (at, end);
                let mut next = there.clone();
                for _ in 0..HALVINGS {
                    let middle = 0.5 * (same + other);
                    let found = side(middle);
                    if found == here {
                        same = middle;
                    } else {
                        other = middle;
                        next = found;
                    }
                }
                // A limit touched at either end of the line splits nothing.
                if same > 0.0 && other < 1.0 {
                    places.push(other);
                }
                (at, here) = (other, next);
            }
            at = end;
            here = there;
        }
        places
    }

    /// True where a `min`, a `max` or an absolute value is part of the formula.
    pub fn has_sides(&self) -> bool {
        let sides = |op: &Op| {
            matches!(op, Op::Unary(Unary::Abs, _) | Op::Binary(Binary::Min | Binary::Max, ..))
        };
        self.ops.iter().any(sides)
    }

    /// True where a `min`, a `max` or an absolute value may change its side within these ranges: a
    /// second derivative says nothing of how far the result leaves its tangent there. What a curve
    /// does at its rows, its own derivatives enclose.
    ///
    /// # Panics
    /// If `ranges` is shorter than [`Tape::inputs`].
    pub fn may_kink_within(&self, ranges: &[Interval]) -> bool {
        let values = self.run(ranges);
        let zero = Interval::point(0.0);
        self.ops.iter().any(|op| match *op {
            Op::Unary(Unary::Abs, x) => values[x as usize].order(&zero).is_none(),
            Op::Binary(Binary::Min | Binary::Max, a, b) => {
                values[a as usize].order(&values[b as usize]).is_none()
            }
            _ => false,
        })
    }

    fn branches(&self, op: &Op) -> bool {
        match *op {
            Op::Unary(Unary::Abs, _) | Op::Binary(Binary::Min | Binary::Max, _, _) => true,
            Op::Apply(_, curve) => !self.curves[curve as usize].breakpoints().is_empty(),
            _ => false,
        }
    }

    /// Which formula holds where the operations have these values: one number a choice.
    fn branch(&self, values: &[f64]) -> Vec<usize> {
        let of = |op: &Op| match *op {
            Op::Unary(Unary::Abs, x) => usize::from(values[x as usize] < 0.0),
            Op::Binary(Binary::Min | Binary::Max, a, b) => {
                usize::from(values[a as usize] < values[b as usize])
            }
            Op::Apply(x, curve) => {
                let x = values[x as usize];
                self.curves[curve as usize].breakpoints().partition_point(|&place| place < x)
            }
            _ => 0,
        };
        self.ops.iter().filter(|op| self.branches(op)).map(of).collect()
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::numeric::{Number, Recorded};

    fn kinks(formula: impl FnOnce(&[Recorded]) -> Recorded, from: &[f64], to: &[f64]) -> Vec<f64> {
        Tape::of(from.len(), formula).kinks_along(from, to)
    }

    #[test]
    fn a_smooth_formula_has_none() {
        assert!(kinks(|x| x[0].clone().exp() * x[1].clone(), &[0.0, 1.0], &[2.0, 3.0]).is_empty());
    }

    #[test]
    fn a_contact_and_a_sign_are_found_where_they_are() {
        let formula = |x: &[Recorded]| {
            (x[0].clone() - 0.3).max(Recorded::exact(0.0)) + (x[1].clone() + 1.0).abs()
        };
        let found = kinks(formula, &[0.0, -2.0], &[1.0, 0.5]);
        assert_eq!(found.len(), 2);
        assert!((found[0] - 0.3).abs() < 1e-15 && (found[1] - 0.4).abs() < 1e-15, "{found:?}");
    }

    #[test]
    fn two_kinks_within_one_look_are_told_apart() {
        let formula = |x: &[Recorded]| {
            let rising = (x[0].clone() - 0.51).max(Recorded::exact(0.0));
            rising.min(Recorded::exact(0.02))
        };
        let found = kinks(formula, &[0.0], &[1.0]);
        assert_eq!(found.len(), 2);
        assert!((found[0] - 0.51).abs() < 1e-15 && (found[1] - 0.53).abs() < 1e-15, "{found:?}");
    }

    #[test]
    fn a_kink_is_seen_where_sides_may_change() {
        let tape = Tape::of(2, |x| x[0].clone().min(x[1].clone() * 2.0) + x[0].clone().abs());
        let within = |a: (f64, f64), b: (f64, f64)| {
            tape.may_kink_within(&[Interval::new(a.0, a.1), Interval::new(b.0, b.1)])
        };
        assert!(tape.has_sides());
        assert!(!Tape::of(1, |x| x[0].clone().exp()).has_sides());
        assert!(!within((1.0, 2.0), (3.0, 4.0)));
        assert!(within((1.0, 7.0), (3.0, 4.0)));
        assert!(within((-1.0, 2.0), (3.0, 4.0)));
    }

    #[test]
    fn a_limit_touched_at_an_end_splits_nothing() {
        let formula = |x: &[Recorded]| x[0].clone().max(Recorded::exact(0.0));
        assert!(kinks(formula, &[0.0], &[1.0]).is_empty());
        assert!(kinks(formula, &[-1.0], &[0.0]).is_empty());
    }
}
