//! Roots, logarithms, arcs and quotients whose argument is known to have a value all over a box,
//! where its plain range does not show it.

use super::{Binary, Op, Tape, Unary};
use crate::numeric::Interval;

impl Tape {
    /// The same formula over a box, with the arguments of roots, logarithms, arcs and quotients held
    /// within what is proven of them.
    ///
    /// `prove` gives a range that holds the result of a formula all over the box. Only where that
    /// lies within what the operation is defined for, the argument is held, and by holding it nothing
    /// is changed; what has no value somewhere is left as it is.
    ///
    /// # Panics
    /// If there are fewer ranges than inputs.
    pub fn held(&self, ranges: &[Interval], prove: impl Fn(&Tape) -> Interval) -> Tape {
        let mut held = Tape {
            ops: Vec::with_capacity(self.ops.len()),
            curves: self.curves.clone(),
            inputs: self.inputs,
            outputs: Vec::new(),
        };
        let mut values = Vec::with_capacity(self.ops.len());
        let mut place: Vec<u32> = Vec::with_capacity(self.ops.len());
        for op in &self.ops {
            let mut op = op.moved(|x| place[x as usize]);
            if let Some(argument) = op.limited()
                && !op.is_defined_for(values[argument as usize])
            {
                held.outputs = vec![argument];
                let proven = prove(&held);
                if op.is_defined_for(proven) && proven.is_bounded() {
                    let mut push = |op| {
                        values.push(held.step(op, ranges, &values));
                        held.ops.push(op);
                        held.ops.len() as u32 - 1
                    };
                    let least = push(Op::Constant(Interval::point(proven.lo())));
                    let most = push(Op::Constant(Interval::point(proven.hi())));
                    let above = push(Op::Binary(Binary::Max, argument, least));
                    let within = push(Op::Binary(Binary::Min, above, most));
                    op = op.moved(|x| if x == argument { within } else { x });
                }
            }
            place.push(held.ops.len() as u32);
            values.push(held.step(op, ranges, &values));
            held.ops.push(op);
        }
        held.outputs = self.outputs.iter().map(|&o| place[o as usize]).collect();
        held
    }
}

impl Op {
    /// The same operation on other operands.
    fn moved(self, to: impl Fn(u32) -> u32) -> Op {
        match self {
            Op::Input(_) | Op::Constant(_) => self,
            Op::Unary(f, x) => Op::Unary(f, to(x)),
            Op::Powi(x, n) => Op::Powi(to(x), n),
            Op::Binary(f, x, y) => Op::Binary(f, to(x), to(y)),
            Op::Apply(x, curve) => Op::Apply(to(x), curve),
        }
    }

    /// The operand that has to lie within limits.
    fn limited(self) -> Option<u32> {
        match self {
            Op::Unary(Unary::Sqrt | Unary::Ln | Unary::Asin | Unary::Acos, x) => Some(x),
            Op::Binary(Binary::Div, _, y) => Some(y),
            _ => None,
        }
    }

    /// True when it has a value wherever that operand lies in `x`.
    fn is_defined_for(self, x: Interval) -> bool {
        match self {
            Op::Unary(Unary::Sqrt, _) => x.lo() >= 0.0,
            Op::Unary(Unary::Ln, _) => x.lo() > 0.0,
            Op::Unary(Unary::Asin | Unary::Acos, _) => x.lo() >= -1.0 && x.hi() <= 1.0,
            Op::Binary(Binary::Div, ..) => !x.contains(0.0),
            _ => true,
        }
    }
}
