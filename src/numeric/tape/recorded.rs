//! The kind of number that writes down what is done with it.

use super::{Binary, Op, Tape, Unary};
use crate::numeric::{Curve, Interval, Number};
use std::cell::RefCell;
use std::collections::BTreeMap;
use std::ops::{Add, Div, Mul, Neg, Sub};
use std::rc::Rc;
use std::sync::Arc;

/// What makes two operations the same one: their shape with the bits of any constant.
type Key = (u8, u64, u64);

fn key(op: &Op) -> Key {
    let pair = |a: u32, b: u32| u64::from(a) << 32 | u64::from(b);
    match *op {
        Op::Input(n) => (0, u64::from(n), 0),
        Op::Constant(c) => (1, c.lo().to_bits(), c.hi().to_bits()),
        Op::Unary(f, x) => (2, f as u64, u64::from(x)),
        Op::Powi(x, n) => (3, u64::from(x), u64::from(n.cast_unsigned())),
        Op::Binary(f, x, y) => (4, f as u64, pair(x, y)),
        Op::Apply(x, c) => (5, u64::from(x), u64::from(c)),
    }
}

#[derive(Debug, Default)]
struct Sheet {
    ops: Vec<Op>,
    seen: BTreeMap<Key, u32>,
    curves: Vec<Arc<dyn Curve>>,
    inputs: u32,
}

impl Sheet {
    fn push(&mut self, op: Op) -> u32 {
        let next = self.ops.len() as u32;
        let index = *self.seen.entry(key(&op)).or_insert(next);
        if index == next {
            self.ops.push(op);
        }
        index
    }

    fn curve(&mut self, curve: &Arc<dyn Curve>) -> u32 {
        match self.curves.iter().position(|c| Arc::ptr_eq(c, curve)) {
            Some(i) => i as u32,
            None => {
                self.curves.push(curve.clone());
                self.curves.len() as u32 - 1
            }
        }
    }
}

/// Collects the operations of one formula.
#[derive(Debug, Default)]
pub struct Recorder {
    sheet: Rc<RefCell<Sheet>>,
}

impl Recorder {
    /// An empty sheet.
    pub fn new() -> Self {
        Recorder::default()
    }

    /// Adds a variable; variables are numbered in the order asked for.
    pub fn input(&self) -> Recorded {
        let mut sheet = self.sheet.borrow_mut();
        let n = sheet.inputs;
        sheet.inputs += 1;
        let index = sheet.push(Op::Input(n));
        Recorded(Kind::Node(self.sheet.clone(), index))
    }

    /// The tape that computes `results`.
    pub fn finish(self, results: &[Recorded]) -> Tape {
        let outputs = results.iter().map(|r| r.place(&self.sheet)).collect();
        let sheet = self.sheet.take();
        Tape { ops: sheet.ops, curves: sheet.curves, inputs: sheet.inputs as usize, outputs }
    }
}

/// A number that writes down what is done with it; constants are folded, outward, until they meet
/// something that varies.
#[derive(Debug, Clone)]
pub struct Recorded(Kind);

#[derive(Debug, Clone)]
enum Kind {
    Constant(Interval),
    Node(Rc<RefCell<Sheet>>, u32),
}

impl Recorded {
    /// The value, where it depends on no input.
    pub fn constant(&self) -> Option<Interval> {
        match self.0 {
            Kind::Constant(c) => Some(c),
            Kind::Node(..) => None,
        }
    }

    fn is_constant(&self, x: f64) -> bool {
        self.constant() == Some(Interval::point(x))
    }

    fn place(&self, sheet: &Rc<RefCell<Sheet>>) -> u32 {
        match &self.0 {
            Kind::Constant(c) => sheet.borrow_mut().push(Op::Constant(*c)),
            Kind::Node(own, index) => {
                assert!(Rc::ptr_eq(own, sheet), "numbers of two recordings were mixed");
                *index
            }
        }
    }

    fn unary(self, f: Unary) -> Self {
        match self.0 {
            Kind::Constant(c) => Recorded::enclosed(f.run(c)),
            Kind::Node(sheet, x) => {
                let index = sheet.borrow_mut().push(Op::Unary(f, x));
                Recorded(Kind::Node(sheet, index))
            }
        }
    }

    fn binary(self, o: Self, f: Binary) -> Self {
        let sheet = match (&self.0, &o.0) {
            (Kind::Constant(a), Kind::Constant(b)) => return Recorded::enclosed(f.run(*a, *b)),
            (Kind::Node(sheet, _), _) | (_, Kind::Node(sheet, _)) => sheet.clone(),
        };
        let (x, y) = (self.place(&sheet), o.place(&sheet));
        let index = sheet.borrow_mut().push(Op::Binary(f, x, y));
        Recorded(Kind::Node(sheet, index))
    }
}

impl Neg for Recorded {
    type Output = Self;
    fn neg(self) -> Self {
        self.unary(Unary::Neg)
    }
}

impl Add for Recorded {
    type Output = Self;
    fn add(self, o: Self) -> Self {
        if self.is_constant(0.0) {
            o
        } else if o.is_constant(0.0) {
            self
        } else {
            self.binary(o, Binary::Add)
        }
    }
}

impl Sub for Recorded {
    type Output = Self;
    fn sub(self, o: Self) -> Self {
        if let (Kind::Node(_, a), Kind::Node(_, b)) = (&self.0, &o.0)
            && a == b
        {
            // A number less itself: an enclosure would not see it.
            return Recorded::exact(0.0);
        }
        if o.is_constant(0.0) { self } else { self.binary(o, Binary::Sub) }
    }
}

impl Mul for Recorded {
    type Output = Self;
    fn mul(self, o: Self) -> Self {
        if self.is_constant(0.0) || o.is_constant(1.0) {
            self
        } else if o.is_constant(0.0) || self.is_constant(1.0) {
            o
        } else {
            self.binary(o, Binary::Mul)
        }
    }
}

impl Div for Recorded {
    type Output = Self;
    fn div(self, o: Self) -> Self {
        if o.is_constant(1.0) { self } else { self.binary(o, Binary::Div) }
    }
}

impl Add<f64> for Recorded {
    type Output = Self;
    fn add(self, o: f64) -> Self {
        self + Recorded::exact(o)
    }
}

impl Sub<f64> for Recorded {
    type Output = Self;
    fn sub(self, o: f64) -> Self {
        self - Recorded::exact(o)
    }
}

impl Mul<f64> for Recorded {
    type Output = Self;
    fn mul(self, o: f64) -> Self {
        self * Recorded::exact(o)
    }
}

impl Div<f64> for Recorded {
    type Output = Self;
    fn div(self, o: f64) -> Self {
        self / Recorded::exact(o)
    }
}

impl Number for Recorded {
    fn exact(x: f64) -> Self {
        Recorded(Kind::Constant(Interval::point(x)))
    }
    fn enclosed(interval: Interval) -> Self {
        Recorded(Kind::Constant(interval))
    }
    fn powi(self, n: i32) -> Self {
        match self.0 {
            Kind::Constant(c) => Recorded::enclosed(c.powi(n)),
            Kind::Node(sheet, x) => {
                let index = sheet.borrow_mut().push(Op::Powi(x, n));
                Recorded(Kind::Node(sheet, index))
            }
        }
    }
    fn sqrt(self) -> Self {
        self.unary(Unary::Sqrt)
    }
    fn exp(self) -> Self {
        self.unary(Unary::Exp)
    }
    fn ln(self) -> Self {
        self.unary(Unary::Ln)
    }
    fn sin(self) -> Self {
        self.unary(Unary::Sin)
    }
    fn cos(self) -> Self {
        self.unary(Unary::Cos)
    }
    fn tan(self) -> Self {
        self.unary(Unary::Tan)
    }
    fn asin(self) -> Self {
        self.unary(Unary::Asin)
    }
    fn acos(self) -> Self {
        self.unary(Unary::Acos)
    }
    fn atan(self) -> Self {
        self.unary(Unary::Atan)
    }
    fn atan2(self, x: Self) -> Self {
        self.binary(x, Binary::Atan2)
    }
    fn hypot(self, o: Self) -> Self {
        self.binary(o, Binary::Hypot)
    }
    fn abs(self) -> Self {
        self.unary(Unary::Abs)
    }
    fn min(self, o: Self) -> Self {
        self.binary(o, Binary::Min)
    }
    fn max(self, o: Self) -> Self {
        self.binary(o, Binary::Max)
    }
    fn apply(self, curve: &Arc<dyn Curve>) -> Self {
        match self.0 {
            Kind::Constant(c) => Recorded::enclosed(curve.range(c)),
            Kind::Node(sheet, x) => {
                let index = {
                    let mut sheet = sheet.borrow_mut();
                    let c = sheet.curve(curve);
                    sheet.push(Op::Apply(x, c))
                };
                Recorded(Kind::Node(sheet, index))
            }
        }
    }
}
