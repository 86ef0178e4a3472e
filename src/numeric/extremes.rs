//! Proven extremes of a recorded formula over a box.
//!
//! A search keeps, for each piece of the box, a bound that holds for certain, and one value that is
//! reached for certain; it ends when the two meet. Unknowns whose derivative keeps its sign go to
//! their end at once, so that an ordinary stack of forty dimensions needs three passes over its tape
//! and never 2⁴⁰ corners; the rest is bisected, worst bound first (Moore, Kearfott and Cloud,
//! *Introduction to Interval Analysis*, ch. 6 on mean value forms, from memory).

use super::tolerance::{MOST_BOXES, RELATIVE_GAP};
use super::{Interval, Tape};
use std::cmp::Ordering;
use std::collections::BinaryHeap;

/// One end of the range of a formula.
#[derive(Debug, Clone, PartialEq)]
pub struct Extreme {
    /// No value lies beyond this: proven.
    pub bound: f64,
    /// A value at or beyond this occurs, at `at`: proven.
    pub reached: f64,
    /// Where: one value for each input.
    pub at: Vec<f64>,
    /// True when bound and value reached are as close as was asked for.
    pub met: bool,
}

/// Both ends of the range of a formula.
#[derive(Debug, Clone, PartialEq)]
pub struct Extremes {
    /// The lower end.
    pub least: Extreme,
    /// The upper end.
    pub greatest: Extreme,
}

/// Finds both ends of the range of `tape` over `ranges`.
///
/// `gap` is how far apart bound and value reached may stay, in the unit of the formula. Where that is
/// not met within [`MOST_BOXES`] pieces, or where the formula is undefined for part of the box, the
/// bounds still hold but `met` is false; a bound may then be infinite.
///
/// # Panics
/// If there are fewer ranges than inputs.
pub fn extremes(tape: &Tape, ranges: &[Interval], gap: f64) -> Extremes {
    extremes_within(tape, ranges, gap, MOST_BOXES)
}

/// As [`extremes`], with at most `most_boxes` pieces for each end: for a search that asks again and
/// again and can do with a coarse answer.
pub fn extremes_within(tape: &Tape, ranges: &[Interval], gap: f64, most_boxes: usize) -> Extremes {
    let breaks: Vec<Vec<f64>> = (0..tape.inputs()).map(|i| tape.breakpoints(i)).collect();
    let mut whole = Piece::of(tape, ranges.to_vec());
    let search = |tape: &Tape, gap, most, whole: &Piece| {
        let one = |side| Search::new(tape, &breaks, gap, most, side).run(whole.clone());
        Extremes { least: one(Side::Least), greatest: one(Side::Greatest) }
    };
    if whole.value.is_bounded() {
        return search(tape, gap, most_boxes, &whole);
    }
    // No value is known for some of it. It may be that a root or a quotient only seems to leave what
    // it is defined for: its argument has a search of its own.
    let held = tape.held(ranges, |argument| {
        let most = most_boxes.min(ARGUMENT_BOXES);
        let found = search(argument, 0.0, most, &Piece::of(argument, ranges.to_vec()));
        Interval::new(found.least.bound, found.greatest.bound)
    });
    whole = Piece::of(&held, whole.ranges);
    search(&held, gap, most_boxes, &whole)
}

/// Pieces that are looked at plainly before a search looks closer: most end sooner.
const PLAIN_BOXES: usize = 32;

/// How many plain looks a closer one counts for, so that a search that gives up takes no longer.
const CLOSE_LOOK: usize = 8;

/// Most pieces that are looked at to show that the argument of a root or a quotient keeps to what that
/// is defined for.
const ARGUMENT_BOXES: usize = 2_000;

/// A box with what is known of the formula on it.
#[derive(Debug, Clone)]
struct Piece {
    ranges: Vec<Interval>,
    value: Interval,
    slopes: Vec<Interval>,
}

impl Piece {
    fn of(tape: &Tape, ranges: Vec<Interval>) -> Self {
        let (value, slopes) = tape.gradient(&ranges);
        Piece { ranges, value, slopes }
    }

    /// A part of this piece: what is known of the whole holds of it too.
    fn smaller(&self, tape: &Tape, ranges: Vec<Interval>) -> Self {
        let (value, slopes) = tape.gradient(&ranges);
        let mut part = Piece { ranges, ..self.clone() };
        part.learn(value, &slopes);
        part
    }

    /// Looks closer, at the cost of many plain looks.
    fn sharpen(&mut self, tape: &Tape) {
        let (value, slopes) = tape.centred_gradient(&self.ranges);
        self.learn(value, &slopes);
    }

    fn learn(&mut self, value: Interval, slopes: &[Interval]) {
        self.value = self.value.intersection(value).unwrap_or(value);
        for (slope, found) in self.slopes.iter_mut().zip(slopes) {
            *slope = slope.intersection(*found).unwrap_or(*found);
        }
    }
}

#[derive(Debug, Clone, Copy, PartialEq)]
enum Side {
    Least,
    Greatest,
}

impl Side {
    /// Turns values so that the search is always for the greatest.
    fn turn(self, x: Interval) -> Interval {
        match self {
            Side::Least => -x,
            Side::Greatest => x,
        }
    }
}

/// A piece still open, ordered by how far it might reach.
struct Open {
    bound: f64,
    piece: Piece,
}

impl PartialEq for Open {
    fn eq(&self, o: &Self) -> bool {
        self.cmp(o) == Ordering::Equal
    }
}

impl Eq for Open {}

impl PartialOrd for Open {
    fn partial_cmp(&self, o: &Self) -> Option<Ordering> {
        Some(self.cmp(o))
    }
}

impl Ord for Open {
    fn cmp(&self, o: &Self) -> Ordering {
        self.bound.total_cmp(&o.bound)
    }
}

struct Search<'a> {
    tape: &'a Tape,
    breaks: &'a [Vec<f64>],
    gap: f64,
    most_boxes: usize,
    side: Side,
    reached: f64,
    at: Vec<f64>,
    /// Widths of the whole box.
    whole: Vec<f64>,
    /// Pieces looked at so far.
    looked_at: usize,
}

impl<'a> Search<'a> {
    fn new(
        tape: &'a Tape,
        breaks: &'a [Vec<f64>],
        gap: f64,
        most_boxes: usize,
        side: Side,
    ) -> Self {
        Search {
            tape,
            breaks,
            gap,
            most_boxes,
            side,
            reached: f64::NEG_INFINITY,
            at: Vec::new(),
            whole: Vec::new(),
            looked_at: 1,
        }
    }

    fn run(mut self, whole: Piece) -> Extreme {
        // Even a formula that is nowhere defined must name some place.
        self.at = whole.ranges.iter().map(|r| r.mid()).collect();
        self.whole = whole.ranges.iter().map(|r| r.width().max(f64::MIN_POSITIVE)).collect();
        let mut open = BinaryHeap::new();
        // What was settled without being split further: its bound counts to the end.
        let mut settled = f64::NEG_INFINITY;
        open.push(self.examine(whole));
        let mut bound = f64::INFINITY;
        while let Some(worst) = open.pop() {
            bound = worst.bound.max(settled);
            let close = bound.is_finite() && bound <= self.reached + self.allowed();
            if close || self.looked_at >= self.most_boxes {
                break;
            }
            let Some((first, second)) = self.split(&worst.piece) else {
                settled = settled.max(worst.bound);
                if settled == f64::INFINITY {
                    bound = settled;
                    break;
                }
                continue;
            };
            for ranges in [first, second] {
                self.looked_at += 1;
                let examined = self.examine(worst.piece.smaller(self.tape, ranges));
                if examined.bound > self.reached {
                    open.push(examined);
                }
            }
            bound = settled.max(self.reached);
        }
        let met = bound.is_finite() && bound <= self.reached + self.allowed();
        // Whatever was dropped lay at or below the value reached.
        let bound = bound.max(self.reached);
        match self.side {
            Side::Greatest => Extreme { bound, reached: self.reached, at: self.at, met },
            Side::Least => Extreme { bound: -bound, reached: -self.reached, at: self.at, met },
        }
    }

    /// How far the bound may stay from the value reached: what was asked for, or a share of the value
    /// that no printed digit shows.
    fn allowed(&self) -> f64 {
        self.gap.max(RELATIVE_GAP * self.reached.abs())
    }

    /// Sends what has a proven sign to its end, bounds the piece, and tries points in it.
    fn examine(&mut self, mut piece: Piece) -> Open {
        let mut bound = f64::INFINITY;
        let mut sharp = false;
        let (corner, here) = loop {
            bound = bound.min(self.side.turn(piece.value).hi());
            let mut corner = Vec::with_capacity(piece.ranges.len());
            let mut moved = false;
            for (range, slope) in piece.ranges.iter_mut().zip(&piece.slopes) {
                let slope = self.side.turn(*slope);
                let end = if slope.mid() >= 0.0 { range.hi() } else { range.lo() };
                corner.push(end);
                if !range.is_point() && (slope.lo() >= 0.0 || slope.hi() <= 0.0) {
                    *range = Interval::point(end);
                    moved = true;
                }
            }
            let here = self.try_point(&corner);
            if piece.ranges.iter().all(|r| r.is_point()) {
                // The corner is the whole piece.
                return Open { bound: here.hi(), piece };
            }
            if bound <= self.reached {
                break (corner, here);
            }
            if moved {
                // On the smaller piece more signs may be certain.
                piece = piece.smaller(self.tape, piece.ranges.clone());
                sharp = false;
            } else if !sharp && (self.closely() || !piece.slopes.iter().all(|s| s.is_bounded())) {
                piece.sharpen(self.tape);
                self.looked_at += CLOSE_LOOK;
                sharp = true;
            } else {
                break (corner, here);
            }
        };
        // The mean value form about the middle is the tightest where little is known of the slopes,
        // that about the likely corner where the wrong signs are nearly excluded.
        let middle: Vec<f64> = piece.ranges.iter().map(|r| r.mid()).collect();
        let at_middle = self.try_point(&middle);
        for (place, value) in [(&middle, at_middle), (&corner, here)] {
            let mut form = value;
            for ((range, slope), m) in piece.ranges.iter().zip(&piece.slopes).zip(place) {
                if !range.is_point() {
                    form = form + self.side.turn(*slope) * (*range - *m);
                }
            }
            bound = bound.min(form.hi());
        }
        Open { bound, piece }
    }

    /// True when plain looks have not led to an end.
    fn closely(&self) -> bool {
        self.looked_at > PLAIN_BOXES
    }

    /// Evaluates at a point, keeps it if it is the best so far, returns the enclosure (turned).
    fn try_point(&mut self, point: &[f64]) -> Interval {
        let at: Vec<Interval> = point.iter().map(|&x| Interval::point(x)).collect();
        let value = self.side.turn(self.tape.value(&at));
        if value.lo() > self.reached {
            self.reached = value.lo();
            self.at = point.to_vec();
        }
        value
    }

    /// Halves the piece across the unknown that costs most, at a place where its curve changes if
    /// there is one inside; `None` when no unknown can be halved any further.
    fn split(&self, piece: &Piece) -> Option<(Vec<Interval>, Vec<Interval>)> {
        let mut worst = None;
        let mut most = f64::NEG_INFINITY;
        for (i, (range, slope)) in piece.ranges.iter().zip(&piece.slopes).enumerate() {
            let width = range.width();
            // A place between the ends must exist, and be worth finding.
            if range.is_point() || width <= 1e-13 * range.magnitude() {
                continue;
            }
            // Where nothing is known of a slope, widths of different units tell nothing: the widest of
            // its kind goes first.
            let cost = if slope.is_bounded() {
                // What a closer look leaves open is how far the slope varies, not how steep it is.
                let uncertain = if self.closely() { slope.width() } else { slope.magnitude() };
                uncertain * width
            } else {
                f64::MAX * (width / self.whole[i]).min(1.0)
            };
            if cost > most {
                most = cost;
                worst = Some(i);
            }
        }
        let i = worst?;
        let range = piece.ranges[i];
        let middle = range.mid();
        let at = self.breaks[i]
            .iter()
            .copied()
            .filter(|&b| range.lo() < b && b < range.hi())
            .min_by(|a, b| (a - middle).abs().total_cmp(&(b - middle).abs()))
            .unwrap_or(middle);
        let part = |r: Interval| {
            let mut ranges = piece.ranges.clone();
            ranges[i] = r;
            ranges
        };
        Some((part(Interval::new(range.lo(), at)), part(Interval::new(at, range.hi()))))
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::numeric::{Number, Recorded};

    fn ranges(pairs: &[(f64, f64)]) -> Vec<Interval> {
        pairs.iter().map(|&(a, b)| Interval::new(a, b)).collect()
    }

    #[test]
    fn a_sum_takes_its_corners_at_once() {
        let tape = Tape::of(3, |x| x[0].clone() - x[1].clone() * 2.0 - x[2].clone());
        let e = extremes(&tape, &ranges(&[(1.0, 2.0), (0.0, 0.5), (-1.0, 1.0)]), 1e-12);
        assert!((e.least.bound + 1.0).abs() < 1e-14 && (e.greatest.bound - 3.0).abs() < 1e-14);
        assert_eq!(e.least.at, [1.0, 0.5, 1.0]);
        assert_eq!(e.greatest.at, [2.0, 0.0, -1.0]);
    }

    #[test]
    fn an_extreme_inside_the_box_is_found() {
        // x·sin x on 0 … 3 is greatest where tan x = −x, at x = 2.028757838110434.
        let tape = Tape::of(1, |x| x[0].clone() * x[0].clone().sin());
        let e = extremes(&tape, &ranges(&[(0.0, 3.0)]), 1e-10);
        assert!(e.greatest.met);
        assert!((e.greatest.bound - 1.819_705_741_159_653).abs() < 2e-10);
        assert!((e.greatest.at[0] - 2.028_757_838).abs() < 1e-4);
    }

    #[test]
    fn common_unknowns_cancel() {
        let tape = Tape::of(2, |x| x[0].clone() * x[1].clone() - x[0].clone());
        let e = extremes(&tape, &ranges(&[(10.0, 10.1), (0.999, 1.001)]), 1e-12);
        assert!((e.greatest.bound - 0.0101).abs() < 1e-12);
        assert!((e.least.bound + 0.0101).abs() < 1e-12);
    }

    #[test]
    fn where_a_formula_is_undefined_nothing_is_claimed() {
        let tape = Tape::of(1, |x| Recorded::exact(1.0) / x[0].clone());
        let e = extremes(&tape, &ranges(&[(-1.0, 1.0)]), 1e-9);
        assert!(!e.greatest.met && e.greatest.bound == f64::INFINITY);
        assert!(!e.least.met && e.least.bound == f64::NEG_INFINITY);
    }

    #[test]
    fn an_argument_that_only_seems_to_leave_its_domain_is_no_obstacle() {
        // y = 1 − x/(x + z) is at most 1 and at least 0.09; plainly it goes down to −9.
        let part = |x: &[Recorded]| {
            Recorded::exact(1.0) - x[0].clone() / (x[0].clone() + x[1].clone() - x[0].clone() * 0.5)
        };
        let over = ranges(&[(0.1, 1.0), (0.6, 1.0)]);
        let tape = Tape::of(2, |x| part(x).acos().sin() * x[1].clone());
        let (plain, _) = tape.gradient(&over);
        assert_eq!(plain, Interval::ENTIRE);
        let e = extremes(&tape, &over, 1e-9);
        assert!(e.least.met && e.greatest.met, "{e:?}");
        for x in [0.1, 0.3, 0.7, 1.0] {
            for z in [0.6, 0.8, 1.0] {
                let value = tape.value(&[x, z]);
                assert!(e.least.bound <= value && value <= e.greatest.bound, "{value} {e:?}");
            }
        }
        // A hair beyond, and some have none: nothing is claimed of it.
        let tape = Tape::of(2, |x| ((part(x) - 0.5).sqrt()).atan());
        let e = extremes(&tape, &over, 1e-9);
        assert!(!e.least.met && e.greatest.bound == f64::INFINITY, "{e:?}");
    }

    #[test]
    fn a_kink_is_no_obstacle() {
        let tape = Tape::of(2, |x| x[0].clone().max(Recorded::exact(0.0)) * x[1].clone());
        let e = extremes(&tape, &ranges(&[(-1.0, 2.0), (-0.5, 0.5)]), 1e-9);
        assert!((e.greatest.bound - 1.0).abs() < 2e-9 && (e.least.bound + 1.0).abs() < 2e-9);
    }
}
