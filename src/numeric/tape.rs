//! A formula as data: it is run once with [`Recorded`] numbers, which write down every operation, and
//! is then replayed with any other kind of number at the cost of its operations alone.
//!
//! Equal sub-expressions are recorded once; what does not depend on an input is folded into an
//! enclosed constant. The gradient is taken backwards over the tape (one sweep for all inputs); its
//! local slopes come from [`Dual`], so that the rules of differentiation stand in one place.

mod centred;
mod columns;
mod domain;
mod kinks;
mod recorded;

use super::{Curve, Dual, Interval, Number, Ordered};
pub use columns::{Column, Scratch};
pub use recorded::{Recorded, Recorder};
use std::sync::Arc;

/// One operation; operands are the numbers of earlier operations.
#[derive(Debug, Clone, Copy, PartialEq)]
enum Op {
    Input(u32),
    Constant(Interval),
    Unary(Unary, u32),
    Powi(u32, i32),
    Binary(Binary, u32, u32),
    Apply(u32, u32),
}

/// Operations on one operand.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
enum Unary {
    Neg,
    Sqrt,
    Exp,
    Ln,
    Sin,
    Cos,
    Tan,
    Asin,
    Acos,
    Atan,
    Abs,
}

/// Operations on two operands.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
enum Binary {
    Add,
    Sub,
    Mul,
    Div,
    Min,
    Max,
    Atan2,
    Hypot,
}

impl Unary {
    #[inline(always)]
    fn run<N: Number>(self, x: N) -> N {
        match self {
            Unary::Neg => -x,
            Unary::Sqrt => x.sqrt(),
            Unary::Exp => x.exp(),
            Unary::Ln => x.ln(),
            Unary::Sin => x.sin(),
            Unary::Cos => x.cos(),
            Unary::Tan => x.tan(),
            Unary::Asin => x.asin(),
            Unary::Acos => x.acos(),
            Unary::Atan => x.atan(),
            Unary::Abs => x.abs(),
        }
    }
}

impl Binary {
    #[inline(always)]
    fn run<N: Number>(self, a: N, b: N) -> N {
        match self {
            Binary::Add => a + b,
            Binary::Sub => a - b,
            Binary::Mul => a * b,
            Binary::Div => a / b,
            Binary::Min => a.min(b),
            Binary::Max => a.max(b),
            Binary::Atan2 => a.atan2(b),
            Binary::Hypot => a.hypot(b),
        }
    }
}

/// A recorded formula with one or more results.
#[derive(Debug, Clone)]
pub struct Tape {
    ops: Vec<Op>,
    curves: Vec<Arc<dyn Curve>>,
    inputs: usize,
    outputs: Vec<u32>,
}

impl Tape {
    /// Records a formula of `inputs` variables.
    pub fn of(inputs: usize, formula: impl FnOnce(&[Recorded]) -> Recorded) -> Tape {
        let recorder = Recorder::new();
        let variables: Vec<Recorded> = (0..inputs).map(|_| recorder.input()).collect();
        let result = formula(&variables);
        recorder.finish(&[result])
    }

    /// Number of inputs.
    pub fn inputs(&self) -> usize {
        self.inputs
    }

    /// Number of results.
    pub fn outputs(&self) -> usize {
        self.outputs.len()
    }

    /// Number of operations, constants and inputs included.
    pub fn len(&self) -> usize {
        self.ops.len()
    }

    /// True when nothing was recorded.
    pub fn is_empty(&self) -> bool {
        self.ops.is_empty()
    }

    /// The places where the curves read directly by input `input` change their nature, in rising
    /// order: where to split first.
    pub fn breakpoints(&self, input: usize) -> Vec<f64> {
        let mut places = Vec::new();
        for op in &self.ops {
            if let Op::Apply(argument, curve) = *op
                && self.ops[argument as usize] == Op::Input(input as u32)
            {
                places.extend_from_slice(self.curves[curve as usize].breakpoints());
            }
        }
        places.sort_by(f64::total_cmp);
        places.dedup();
        places
    }

    /// Replays the tape and returns its first result.
    ///
    /// # Panics
    /// If `inputs` is shorter than [`Tape::inputs`].
    pub fn value<N: Number>(&self, inputs: &[N]) -> N {
        let values = self.run(inputs);
        values[self.outputs[0] as usize].clone()
    }

    /// Replays the tape and returns all results.
    pub fn values<N: Number>(&self, inputs: &[N]) -> Vec<N> {
        let values = self.run(inputs);
        self.outputs.iter().map(|&o| values[o as usize].clone()).collect()
    }

    /// The first result and its derivative with respect to every input.
    pub fn gradient<N: Ordered>(&self, inputs: &[N]) -> (N, Vec<N>) {
        let values = self.run(inputs);
        let slopes = self.sweep(&values, &[]);
        (values[self.outputs[0] as usize].clone(), slopes)
    }

    /// One sweep backwards over the values of all operations up to the first result. `taken` names
    /// the operand that a `min` or `max` is known to be, where it is known.
    fn sweep<N: Ordered>(&self, values: &[N], taken: &[Option<u32>]) -> Vec<N> {
        let output = self.outputs[0] as usize;
        let mut adjoint = vec![N::exact(0.0); self.ops.len()];
        adjoint[output] = N::exact(1.0);
        let mut slopes = vec![N::exact(0.0); self.inputs];
        for (i, op) in self.ops.iter().enumerate().take(output + 1).rev() {
            let above = adjoint[i].clone();
            if above.is_zero() {
                continue;
            }
            let mut pass = |to: u32, local: N| {
                let at = &mut adjoint[to as usize];
                *at = at.clone() + above.clone() * local;
            };
            let moving = |x: u32| Dual::variable(values[x as usize].clone());
            let fixed = |x: u32| Dual::constant(values[x as usize].clone());
            match *op {
                Op::Input(n) => slopes[n as usize] = above,
                Op::Constant(_) => {}
                Op::Unary(f, x) => pass(x, f.run(moving(x)).slope),
                Op::Powi(x, n) => pass(x, moving(x).powi(n).slope),
                Op::Binary(f, x, y) => match taken.get(i) {
                    Some(&Some(operand)) => pass(operand, N::exact(1.0)),
                    _ => {
                        pass(x, f.run(moving(x), fixed(y)).slope);
                        pass(y, f.run(fixed(x), moving(y)).slope);
                    }
                },
                Op::Apply(x, c) => pass(x, moving(x).apply(&self.curves[c as usize]).slope),
            }
        }
        slopes
    }

    /// The first result, its gradient and its matrix of second derivatives, row by row.
    pub fn hessian<N: Ordered>(&self, inputs: &[N]) -> (N, Vec<N>, Vec<Vec<N>>) {
        let mut rows = Vec::with_capacity(self.inputs);
        let mut first = (N::exact(0.0), Vec::new());
        for along in 0..self.inputs {
            let moved: Vec<Dual<N>> =
                inputs
                    .iter()
                    .enumerate()
                    .map(|(i, x)| {
                        if i == along {
                            Dual::variable(x.clone())
                        } else {
                            Dual::constant(x.clone())
                        }
                    })
                    .collect();
            let (value, slopes) = self.gradient(&moved);
            rows.push(slopes.iter().map(|s| s.slope.clone()).collect());
            first = (value.value, slopes.into_iter().map(|s| s.value).collect());
        }
        if self.inputs == 0 {
            first.0 = self.value(inputs);
        }
        (first.0, first.1, rows)
    }

    fn run<N: Number>(&self, inputs: &[N]) -> Vec<N> {
        let mut values = Vec::with_capacity(self.ops.len());
        self.run_into(inputs, &mut values);
        values
    }

    fn run_into<N: Number>(&self, inputs: &[N], values: &mut Vec<N>) {
        values.clear();
        for op in &self.ops {
            let value = self.step(*op, inputs, values);
            values.push(value);
        }
    }

    #[inline(always)]
    fn step<N: Number>(&self, op: Op, inputs: &[N], values: &[N]) -> N {
        let at = |x: u32| values[x as usize].clone();
        match op {
            Op::Input(n) => inputs[n as usize].clone(),
            Op::Constant(c) => N::enclosed(c),
            Op::Unary(f, x) => f.run(at(x)),
            Op::Powi(x, n) => at(x).powi(n),
            Op::Binary(f, x, y) => f.run(at(x), at(y)),
            Op::Apply(x, c) => at(x).apply(&self.curves[c as usize]),
        }
    }
}
