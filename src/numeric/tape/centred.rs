//! The range of a formula and of its slopes over a box, with what its operands have in common kept.
//!
//! A plain replay forgets that two operands move together: of `x − y`, where both grow with the same
//! unknowns, it knows the width of both. Here every operation carries its slopes by all unknowns
//! forward, and its value is cut to its mean value form `v(m) + Σ g_i·(x_i − m_i)`, which is tight
//! where the formula is nearly straight; what is computed from it is then tighter in turn. It costs
//! the number of unknowns times more than [`Tape::gradient`].

use super::{Binary, Op, Tape};
use crate::numeric::{Dual, Interval, Number, Ordered};
use std::cmp::Ordering;

/// What the operations so far have shown.
struct Forward<'a> {
    tape: &'a Tape,
    /// Ranges of the unknowns that move, less their middles.
    offsets: Vec<Interval>,
    /// Value of each operation at the middle of the box.
    centres: Vec<Interval>,
    /// Value of each operation over the box.
    values: Vec<Interval>,
    /// Slopes of each operation by the unknowns that move, one row after another.
    slopes: Vec<Interval>,
    /// The operand that each `min` or `max` is all over the box, where that is shown.
    taken: Vec<Option<u32>>,
}

impl Tape {
    /// The first result and its slopes over a box: the same as [`Tape::gradient`], tighter and dearer.
    ///
    /// Whatever has no value for some member of the box stays [`Interval::ENTIRE`].
    ///
    /// # Panics
    /// If there are fewer ranges than inputs.
    pub fn centred_gradient(&self, ranges: &[Interval]) -> (Interval, Vec<Interval>) {
        let middles: Vec<Interval> = ranges.iter().map(|r| Interval::point(r.mid())).collect();
        let moving: Vec<usize> = (0..self.inputs).filter(|&i| !ranges[i].is_point()).collect();
        let output = self.outputs[0] as usize;
        let mut so_far = Forward {
            tape: self,
            offsets: moving.iter().map(|&i| ranges[i] - middles[i]).collect(),
            centres: self.run(&middles),
            values: Vec::with_capacity(output + 1),
            slopes: Vec::with_capacity((output + 1) * moving.len()),
            taken: vec![None; output + 1],
        };
        for op in &self.ops[..=output] {
            match *op {
                Op::Input(n) => {
                    let unit = |&i: &usize| Interval::point(f64::from(i == n as usize));
                    so_far.slopes.extend(moving.iter().map(unit));
                    so_far.values.push(ranges[n as usize]);
                }
                Op::Constant(c) => so_far.push(c, &[]),
                op => so_far.operation(op),
            }
        }
        // Backwards what several ways to an unknown share is counted once, forwards what several
        // unknowns share: either may be the tighter.
        let mut slopes = self.sweep(&so_far.values, &so_far.taken);
        for (&i, &forward) in moving.iter().zip(so_far.row(output)) {
            slopes[i] = slopes[i].intersection(forward).unwrap_or(forward);
        }
        (so_far.values[output], slopes)
    }
}

impl Forward<'_> {
    fn row(&self, i: usize) -> &[Interval] {
        let n = self.offsets.len();
        &self.slopes[i * n..(i + 1) * n]
    }

    fn operation(&mut self, op: Op) {
        let moving = |x: u32| Dual::variable(self.values[x as usize]);
        match op {
            Op::Input(_) | Op::Constant(_) => {}
            Op::Unary(f, x) => {
                let found = f.run(moving(x));
                self.push(found.value, &[(x, found.slope)]);
            }
            Op::Powi(x, n) => {
                let found = moving(x).powi(n);
                self.push(found.value, &[(x, found.slope)]);
            }
            Op::Apply(x, c) => {
                let found = moving(x).apply(&self.tape.curves[c as usize]);
                self.push(found.value, &[(x, found.slope)]);
            }
            Op::Binary(f @ (Binary::Max | Binary::Min), x, y) => {
                let taken = match (f, self.order(x, y)) {
                    (Binary::Max, Some(Ordering::Less)) => Some(y),
                    (Binary::Max, Some(_)) => Some(x),
                    (_, Some(Ordering::Less)) => Some(x),
                    (_, Some(_)) => Some(y),
                    (_, None) => None,
                };
                if let Some(taken) = taken {
                    self.taken[self.values.len()] = Some(taken);
                    self.push(self.values[taken as usize], &[(taken, Interval::point(1.0))]);
                } else {
                    self.either(f, x, y);
                }
            }
            Op::Binary(Binary::Hypot, x, y) => {
                self.binary(Binary::Hypot, x, y);
                self.sharpen_length(x, y);
            }
            Op::Binary(f, x, y) => self.binary(f, x, y),
        }
    }

    fn binary(&mut self, f: Binary, x: u32, y: u32) {
        let (a, b) = (self.values[x as usize], self.values[y as usize]);
        let first = f.run(Dual::variable(a), Dual::constant(b));
        let second = f.run(Dual::constant(a), Dual::variable(b));
        self.push(first.value, &[(x, first.slope), (y, second.slope)]);
    }

    /// How two operands stand to each other all over the box, also where their ranges overlap.
    fn order(&self, x: u32, y: u32) -> Option<Ordering> {
        let (a, b) = (self.values[x as usize], self.values[y as usize]);
        if !a.is_bounded() || !b.is_bounded() {
            return None;
        }
        let zero = Interval::ZERO;
        let by_values = a.order(&b).or_else(|| self.sum((1.0, x), (-1.0, y)).order(&zero));
        by_values.or_else(|| match (self.tape.ops[x as usize], self.tape.ops[y as usize]) {
            // Of two lengths the difference of the squares has the sign, and it falls into factors.
            (Op::Binary(Binary::Hypot, a, b), Op::Binary(Binary::Hypot, c, d)) => {
                let part = |a, c| self.sum((1.0, a), (-1.0, c)) * self.sum((1.0, a), (1.0, c));
                (part(a, c) + part(b, d)).order(&zero)
            }
            _ => None,
        })
    }

    /// Range of a sum of two operands, each times a number.
    fn sum(&self, (a, x): (f64, u32), (b, y): (f64, u32)) -> Interval {
        let (x, y) = (x as usize, y as usize);
        let of = |u: Interval, v: Interval| u * a + v * b;
        let plain = of(self.values[x], self.values[y]);
        let centre = of(self.centres[x], self.centres[y]);
        let slopes = self.row(x).iter().zip(self.row(y)).zip(&self.offsets);
        let form = slopes.fold(centre, |sum, ((&u, &v), &offset)| sum + of(u, v) * offset);
        plain.intersection(form).unwrap_or(plain)
    }

    /// Adds an operation, given its plain value and its slopes by its operands.
    fn push(&mut self, plain: Interval, operands: &[(u32, Interval)]) {
        let n = self.offsets.len();
        let start = self.slopes.len();
        self.slopes.resize(start + n, Interval::ZERO);
        let (before, row) = self.slopes.split_at_mut(start);
        for &(operand, local) in operands {
            let from = &before[operand as usize * n..][..n];
            for (slope, &inner) in row.iter_mut().zip(from) {
                *slope = *slope + local * inner;
            }
        }
        self.settle(plain);
    }

    /// Adds the greater or less of two operands of which it is not known which it is: its slopes are
    /// those of the one or of the other.
    fn either(&mut self, f: Binary, x: u32, y: u32) {
        for i in 0..self.offsets.len() {
            let slope = self.row(x as usize)[i].hull(self.row(y as usize)[i]);
            self.slopes.push(slope);
        }
        self.settle(f.run(self.values[x as usize], self.values[y as usize]));
    }

    /// Cuts the value of an operation whose slopes were just added to its mean value form.
    fn settle(&mut self, plain: Interval) {
        let at = self.values.len();
        // Nothing is said of what has no value somewhere, however straight it is elsewhere.
        let value = if plain == Interval::ENTIRE {
            plain
        } else {
            let slopes = self.row(at).iter().zip(&self.offsets);
            let form = slopes.fold(self.centres[at], |sum, (&slope, &x)| sum + slope * x);
            plain.intersection(form).unwrap_or(plain)
        };
        self.values.push(value);
    }

    /// Sharpens a length just added, `v = √(x² + y²)`, by what its sides have in common.
    ///
    /// They mostly grow and shrink together, and then the direction of `(x, y)` hardly turns, on which
    /// alone the slopes hang. With `(c, s)` the direction in the middle, `p = cx + sy`,
    /// `q = cy − sx` and `tan φ = q/p`, the length is `p/cos φ` and its slope
    /// `(cx' + sy')·cos φ + (cy' − sx')·sin φ`.
    fn sharpen_length(&mut self, x: u32, y: u32) {
        let at = self.values.len() - 1;
        let (u, v) = (x as usize, y as usize);
        let (c, s) = (self.centres[u].mid(), self.centres[v].mid());
        // Neither (c, s) need be of length 1: that is divided out.
        let size = Interval::point(c).hypot(Interval::point(s));
        let along = self.sum((c, x), (s, y)) / size;
        let across = self.sum((-s, x), (c, y)) / size;
        if along.lo() <= 0.0 || !self.values[at].is_bounded() {
            return;
        }
        let one = Interval::point(1.0);
        let tangent = across / along;
        let cosine = one / one.hypot(tangent);
        let sine = |t: f64| Interval::point(t) / one.hypot(Interval::point(t));
        let sine = sine(tangent.lo()).hull(sine(tangent.hi()));
        let length = along * one.hypot(tangent);
        self.values[at] = self.values[at].intersection(length).unwrap_or(self.values[at]);
        for i in 0..self.offsets.len() {
            let (a, b) = (self.row(u)[i], self.row(v)[i]);
            let slope = ((a * c + b * s) * cosine + (b * c - a * s) * sine) / size;
            let known = &mut self.slopes[at * self.offsets.len() + i];
            *known = known.intersection(slope).unwrap_or(*known);
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::numeric::Recorded;
    use crate::numeric::random::Stream;

    /// Of three unknowns: every kind of operation that is treated for itself, on operands that move
    /// together.
    fn tangled(x: &[Recorded]) -> Recorded {
        let [a, b, c] = x else { panic!("three unknowns") };
        let ratio = (a.clone() + b.clone()) / (b.clone() + c.clone() * 3.0);
        let other = (a.clone() - c.clone()) / (b.clone() * 2.0 + c.clone());
        let taken = ratio.clone().max(other.clone()) - ratio.clone().min(other.clone() * 1.5);
        let length = (ratio - b.clone() * 0.1).hypot(other * 0.4 - a.clone());
        (taken.abs() + length.clone().max(c.clone())).sqrt() * length
    }

    #[test]
    fn every_member_lies_within_value_and_slopes() {
        let tape = Tape::of(3, tangled);
        let dice = Stream::new(5, b"boxes");
        let mut turn = 0;
        let mut draw = |lo: f64, hi: f64| {
            turn += 1;
            lo + (hi - lo) * dice.uniform(turn)
        };
        let mut tighter = 0;
        for _ in 0..500 {
            let widths = draw(0.0, 0.2);
            let ranges: Vec<Interval> = (0..3)
                .map(|_| {
                    let lo = draw(0.5, 2.0);
                    Interval::new(lo, lo + draw(0.0, widths))
                })
                .collect();
            let (plain, _) = tape.gradient(&ranges);
            let (value, slopes) = tape.centred_gradient(&ranges);
            assert!(plain.encloses(value));
            tighter += usize::from(value.width() < 0.7 * plain.width());
            for _ in 0..40 {
                let at: Vec<f64> = ranges.iter().map(|r| draw(r.lo(), r.hi())).collect();
                let (here, steep) = tape.gradient(&at);
                assert!(value.lo() <= here + 1e-12 && here - 1e-12 <= value.hi());
                for (slope, steep) in slopes.iter().zip(steep) {
                    let slack = 1e-9 * steep.abs().max(1.0);
                    assert!(slope.lo() <= steep + slack && steep - slack <= slope.hi());
                }
            }
        }
        assert!(tighter > 250, "only {tighter} of 500 are tighter");
    }

    #[test]
    fn which_of_two_is_greater_is_seen_where_their_ranges_overlap() {
        let tape = Tape::of(2, |x| {
            let more = x[0].clone() * 1.2 + x[1].clone();
            (x[0].clone() + x[1].clone()).max(more)
        });
        let (_, slopes) =
            tape.centred_gradient(&[Interval::new(1.0, 3.0), Interval::new(0.0, 2.0)]);
        assert!(slopes[0].lo() > 1.19 && slopes[0].hi() < 1.21, "{slopes:?}");
        // Where it is open, the slope is one of the two, never their sum.
        let tape = Tape::of(1, |x| x[0].clone().max(x[0].clone() * 2.0 - 1.5));
        let (_, slopes) = tape.centred_gradient(&[Interval::new(1.0, 2.0)]);
        assert!(slopes[0].lo() > 0.99 && slopes[0].hi() < 2.01, "{slopes:?}");
    }

    #[test]
    fn what_has_no_value_somewhere_stays_without() {
        let tape = Tape::of(1, |x| x[0].clone().sqrt().atan() + 1.0);
        let (value, _) = tape.centred_gradient(&[Interval::new(-0.1, 4.0)]);
        assert_eq!(value, Interval::ENTIRE);
    }
}
