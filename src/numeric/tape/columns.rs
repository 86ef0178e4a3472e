//! A tape replayed over columns of draws: operation by operation, each over many draws at once, so
//! that the cost of reading the tape is shared and the compiler makes vectors of the loops.
//!
//! The digits are those of [`Tape::value`] with plain numbers: each loop runs the same operation.

use super::{Binary, Op, Tape, Unary};
use crate::numeric::Number;
use crate::numeric::random::vectorized;

/// Draws that go through the tape together; the columns of a long formula still fit the cache.
const CHUNK: usize = 128;

/// The values of one quantity over the draws.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Column<'a> {
    /// The same value in each draw.
    Fixed(f64),
    /// One value a draw.
    Drawn(&'a [f64]),
}

/// Memory for a replay, kept from one to the next.
#[derive(Debug, Clone, Default)]
pub struct Scratch {
    /// For each operation its value where no drawn input reaches it.
    fixed: Vec<Option<f64>>,
    /// For each operation its values over a chunk of draws.
    chunks: Vec<[f64; CHUNK]>,
}

impl Tape {
    /// Replays the tape for `count` draws and hands each result's values to `take`, a chunk of
    /// draws at a time: the number of the result, that of the chunk's first draw, the chunk.
    ///
    /// What depends on fixed inputs only is computed once.
    ///
    /// # Panics
    /// If `inputs` is shorter than [`Tape::inputs`] or a drawn column shorter than `count`.
    pub fn replay_columns(
        &self,
        inputs: &[Column<'_>],
        count: usize,
        scratch: &mut Scratch,
        mut take: impl FnMut(usize, usize, Column<'_>),
    ) {
        let Scratch { fixed, chunks } = scratch;
        self.fold(inputs, fixed);
        chunks.resize(self.ops.len(), [0.0; CHUNK]);
        for first in (0..count).step_by(CHUNK) {
            let length = CHUNK.min(count - first);
            vectorized(
                #[inline(always)]
                || self.run_chunk(inputs, first, length, fixed, chunks),
            );
            for (result, &output) in self.outputs.iter().enumerate() {
                let chunk = Operands { tape: self, inputs, first, length, fixed, done: chunks };
                take(result, first, chunk.of(output));
            }
        }
    }

    /// Computes what no drawn input reaches.
    fn fold(&self, inputs: &[Column<'_>], fixed: &mut Vec<Option<f64>>) {
        fixed.clear();
        for op in &self.ops {
            let at = |x: u32| fixed[x as usize];
            let value = match *op {
                Op::Input(n) => match inputs[n as usize] {
                    Column::Fixed(x) => Some(x),
                    Column::Drawn(_) => None,
                },
                Op::Constant(c) => Some(f64::enclosed(c)),
                Op::Unary(f, x) => at(x).map(|x| f.run(x)),
                Op::Powi(x, n) => at(x).map(|x| Number::powi(x, n)),
                Op::Binary(f, x, y) => at(x).zip(at(y)).map(|(x, y)| f.run(x, y)),
                Op::Apply(x, c) => at(x).map(|x| self.curves[c as usize].value(x)),
            };
            fixed.push(value);
        }
    }

    /// Runs all operations over one chunk of draws.
    #[inline(always)]
    fn run_chunk(
        &self,
        inputs: &[Column<'_>],
        first: usize,
        length: usize,
        fixed: &[Option<f64>],
        chunks: &mut [[f64; CHUNK]],
    ) {
        for (i, op) in self.ops.iter().enumerate() {
            if fixed[i].is_some() {
                continue;
            }
            let (done, rest) = chunks.split_at_mut(i);
            let out = &mut rest[0][..length];
            let operands = Operands { tape: self, inputs, first, length, fixed, done };
            match *op {
                Op::Input(_) | Op::Constant(_) => {}
                Op::Unary(f, x) => unary(f, operands.of(x), out),
                Op::Powi(x, 2) => one(operands.of(x), out, |x| Number::powi(x, 2)),
                Op::Powi(x, n) => one(operands.of(x), out, |x| Number::powi(x, n)),
                Op::Binary(f, x, y) => binary(f, operands.of(x), operands.of(y), out),
                Op::Apply(x, c) => {
                    let curve = &self.curves[c as usize];
                    one(operands.of(x), out, |x| curve.value(x));
                }
            }
        }
    }
}

/// Where the operands of one chunk are found.
struct Operands<'a> {
    tape: &'a Tape,
    inputs: &'a [Column<'a>],
    first: usize,
    length: usize,
    fixed: &'a [Option<f64>],
    done: &'a [[f64; CHUNK]],
}

impl<'a> Operands<'a> {
    /// The values of an operation; an input's are read where they lie.
    #[inline(always)]
    fn of(&self, op: u32) -> Column<'a> {
        if let Some(x) = self.fixed[op as usize] {
            return Column::Fixed(x);
        }
        if let Op::Input(n) = self.tape.ops[op as usize]
            && let Column::Drawn(column) = self.inputs[n as usize]
        {
            return Column::Drawn(&column[self.first..self.first + self.length]);
        }
        Column::Drawn(&self.done[op as usize][..self.length])
    }
}

/// Runs `f` down one column.
#[inline(always)]
fn one(x: Column<'_>, out: &mut [f64], f: impl Fn(f64) -> f64) {
    match x {
        Column::Fixed(x) => out.fill(f(x)),
        Column::Drawn(x) => out.iter_mut().zip(x).for_each(|(out, x)| *out = f(*x)),
    }
}

/// Runs `f` down two columns.
#[inline(always)]
fn two(x: Column<'_>, y: Column<'_>, out: &mut [f64], f: impl Fn(f64, f64) -> f64) {
    match (x, y) {
        (x, Column::Fixed(y)) => one(x, out, |x| f(x, y)),
        (Column::Fixed(x), y) => one(y, out, |y| f(x, y)),
        (Column::Drawn(x), Column::Drawn(y)) => {
            out.iter_mut().zip(x).zip(y).for_each(|((out, x), y)| *out = f(*x, *y));
        }
    }
}

/// One loop for each operation, so that the compiler knows it within.
#[inline(always)]
fn unary(f: Unary, x: Column<'_>, out: &mut [f64]) {
    macro_rules! loops {
        ($($name:ident)*) => {
            match f { $(Unary::$name => one(x, out, |x| Unary::$name.run(x)),)* }
        };
    }
    loops!(Neg Sqrt Exp Ln Sin Cos Tan Asin Acos Atan Abs);
}

/// As [`unary`].
#[inline(always)]
fn binary(f: Binary, x: Column<'_>, y: Column<'_>, out: &mut [f64]) {
    macro_rules! loops {
        ($($name:ident)*) => {
            match f { $(Binary::$name => two(x, y, out, |x, y| Binary::$name.run(x, y)),)* }
        };
    }
    loops!(Add Sub Mul Div Min Max Atan2 Hypot);
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::numeric::random::Stream;
    use crate::numeric::tape::Recorded;

    /// A formula with every kind of operation.
    fn formula(x: &[Recorded]) -> Recorded {
        let [a, b, c, d] = [0, 1, 2, 3].map(|i| x[i].clone());
        let smooth = (a.clone() * 2.0 + b.clone()).sin() / (c.clone().exp() + 1.5);
        let kinked = (a.clone() - b.clone()).abs().max(c.clone()).min(d.clone().sqrt());
        let powers = a.sqr() - b.clone().powi(-3) + d.clone().ln() * d.clone().cos();
        -(smooth + kinked.atan2(powers)) + (d.atan() * c.powi(5) - b).hypot(x[3].clone())
    }

    #[test]
    fn columns_give_the_digits_of_plain_numbers() {
        let tape = Tape::of(4, formula);
        let draws = 1000;
        let columns: Vec<Vec<f64>> = (0..4_u8)
            .map(|i| (0..draws).map(|k| 0.5 + Stream::new(1, &[i]).uniform(k)).collect())
            .collect();
        let mut scratch = Scratch::default();
        // Every choice of inputs that are held fixed, all and none included.
        for choice in 0..16_u32 {
            let held = |i: usize| choice >> i & 1 == 1;
            let inputs: Vec<Column<'_>> = columns
                .iter()
                .enumerate()
                .map(|(i, x)| if held(i) { Column::Fixed(x[0]) } else { Column::Drawn(x) })
                .collect();
            let mut seen = 0;
            tape.replay_columns(&inputs, draws as usize, &mut scratch, |result, first, values| {
                assert_eq!((result, first), (0, seen));
                for k in 0..CHUNK.min(draws as usize - first) {
                    let x: Vec<f64> =
                        (0..4).map(|i| columns[i][if held(i) { 0 } else { first + k }]).collect();
                    let got = match values {
                        Column::Fixed(value) => value,
                        Column::Drawn(values) => values[k],
                    };
                    assert_eq!(got.to_bits(), tape.value(&x).to_bits(), "{choice}: {x:?}");
                    seen += 1;
                }
            });
            assert_eq!(seen, draws as usize);
        }
    }
}
