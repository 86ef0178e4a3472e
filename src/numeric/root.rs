//! Where a function first reaches zero, proven.
//!
//! The function is given by its enclosure over intervals, so nothing is assumed of its shape: it may
//! rise and fall, step, or be undefined in places. Values are plain; the caller states their unit.

use super::Interval;
use super::tolerance::MOST_ROOT_PIECES;

/// Where a function is first not below zero, on the way from one end to the other.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Crossing {
    /// It is.
    Reached {
        /// Everywhere on the way as far as here, this place included unless it is where the way
        /// begins, it is below zero: proven.
        before: f64,
        /// Here it is not below zero: proven.
        at: f64,
    },
    /// It is below zero all the way: proven.
    Never,
    /// As far as `from` it is below zero, and no place further on could be proven to reach zero.
    Undecided {
        /// Where the doubt begins.
        from: f64,
    },
}

impl Crossing {
    /// The place where zero is reached, if it is known to be.
    pub fn at(self) -> Option<f64> {
        match self {
            Crossing::Reached { at, .. } => Some(at),
            Crossing::Never | Crossing::Undecided { .. } => None,
        }
    }
}

/// Finds where `f` is first not below zero on the way `from … to`, which may lead downward.
///
/// `f` encloses the function over an interval. Bracket: the way itself, halved, its nearer half first;
/// a piece is passed over when its enclosure is below zero throughout. Tolerance: pieces are halved
/// no further than `tolerance`, or than numbers go; a doubt narrower than that is walked past, and
/// then widens what is returned. Cap: [`MOST_ROOT_PIECES`] pieces. Whatever is returned is proven;
/// the cap and the tolerance only decide between an answer and [`Crossing::Undecided`].
pub fn first_reached(
    f: impl Fn(Interval) -> Interval,
    from: f64,
    to: f64,
    tolerance: f64,
) -> Crossing {
    let reaches = |x: f64| f(Interval::point(x)).lo() >= 0.0;
    if !(from.is_finite() && to.is_finite()) {
        return Crossing::Undecided { from };
    }
    if reaches(from) {
        return Crossing::Reached { before: from, at: from };
    }
    let mut doubt = None;
    let mut open = vec![(from, to)];
    let mut looked_at = 0;
    while let Some((near, far)) = open.pop() {
        looked_at += 1;
        if looked_at > MOST_ROOT_PIECES {
            return Crossing::Undecided { from: doubt.unwrap_or(near) };
        }
        if f(Interval::new(near.min(far), near.max(far))).hi() < 0.0 {
            continue;
        }
        let middle = near + 0.5 * (far - near);
        if (far - near).abs() <= tolerance || middle == near || middle == far {
            let before = *doubt.get_or_insert(near);
            if reaches(far) {
                return Crossing::Reached { before, at: far };
            }
        } else {
            open.push((middle, far));
            open.push((near, middle));
        }
    }
    doubt.map_or(Crossing::Never, |from| Crossing::Undecided { from })
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::numeric::Number;

    #[test]
    fn a_rising_function_is_met_within_the_tolerance() {
        let f = |x: Interval| x.sqr() - 2.0;
        let Crossing::Reached { before, at } = first_reached(f, 0.0, 2.0, 1e-12) else {
            panic!("√2 lies between");
        };
        let root = std::f64::consts::SQRT_2;
        assert!(before <= root && root <= at && at - before <= 3e-12);
    }

    #[test]
    fn the_way_may_lead_down() {
        let found = first_reached(|x| -x - 3.0, 5.0, -5.0, 1e-9);
        assert!((found.at().unwrap() + 3.0).abs() < 2e-9 && found.at().unwrap() <= -3.0);
    }

    #[test]
    fn the_first_of_several_is_taken() {
        // (x−1)(x−2)(x−3) is not below zero on 1 … 2 and from 3 on.
        let f = |x: Interval| (x - 1.0) * (x - 2.0) * (x - 3.0);
        assert!((first_reached(f, 0.0, 5.0, 1e-9).at().unwrap() - 1.0).abs() < 1e-8);
        assert!((first_reached(f, 2.5, 5.0, 1e-9).at().unwrap() - 3.0).abs() < 1e-8);
        assert!((first_reached(f, 2.5, 0.0, 1e-9).at().unwrap() - 2.0).abs() < 1e-8);
    }

    #[test]
    fn what_is_never_reached_is_said_to_be() {
        let saturating = |x: Interval| -(-x).exp() - 0.1;
        assert_eq!(first_reached(saturating, 0.0, 700.0, 1e-6), Crossing::Never);
    }

    #[test]
    fn where_it_already_is_nothing_is_sought() {
        let found = first_reached(|x| x, 0.0, 1.0, 1e-9);
        assert_eq!(found, Crossing::Reached { before: 0.0, at: 0.0 });
    }

    #[test]
    fn a_touch_that_cannot_be_proven_is_a_doubt() {
        // −(x−⅓)² reaches zero at no number there is.
        let f = |x: Interval| -(x - 1.0 / 3.0 - 1e-17).sqr();
        let Crossing::Undecided { from } = first_reached(f, 0.0, 1.0, 1e-6) else {
            panic!("neither reached nor missed can be proven");
        };
        assert!(from <= 1.0 / 3.0 && from > 0.333);
        let nowhere = first_reached(|_| Interval::ENTIRE, 0.0, 1.0, 1e-9);
        assert_eq!(nowhere, Crossing::Undecided { from: 0.0 });
    }
}
