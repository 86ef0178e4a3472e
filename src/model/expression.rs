//! Expressions over dimensions, resolved and checked for kinds. Constants are SI.

use super::{ConditionId, DimensionId, SubjectId};
use crate::span::Span;
use crate::units::Kind;
use std::sync::Arc;

/// An expression and what it gives.
#[derive(Debug, Clone)]
pub struct Expr {
    /// What it is.
    pub kind: ExprKind,
    /// Where it was written.
    pub span: Span,
    /// The kind of quantity it gives.
    pub quantity: Kind,
}

/// The forms of an expression.
#[derive(Debug, Clone)]
pub enum ExprKind {
    /// A constant, which does not expand; SI.
    Constant(f64),
    /// The circle constant.
    Pi,
    /// One piece of a dimension, at the condition's temperature.
    Size {
        /// Which dimension.
        dimension: DimensionId,
        /// Which piece, from 1.
        piece: u32,
    },
    /// The sum of pieces 1 to `count`, each its own.
    Pieces {
        /// Which dimension.
        dimension: DimensionId,
        /// How many.
        count: u32,
    },
    /// A bore or outside once a joint is made.
    After {
        /// Which dimension.
        dimension: DimensionId,
        /// The fit whose joint changes it.
        fit: SubjectId,
    },
    /// A named expression (`let`, `gap`, `result`), shared, substituted.
    Named(String, Arc<Expr>),
    /// The opposite.
    Negate(Arc<Expr>),
    /// An operation on two.
    Binary(Binary, Arc<Expr>, Arc<Expr>),
    /// A power with a constant exponent.
    Power(Arc<Expr>, f64),
    /// A function of one or more arguments.
    Call(Function, Vec<Arc<Expr>>),
    /// Internal minus external of a fit.
    Clearance(SubjectId),
    /// Either way up to half the clearance there is.
    Play(SubjectId),
    /// The expression here minus the same at another condition, or at reference.
    Change {
        /// What changes.
        of: Arc<Expr>,
        /// Since when; the reference state if absent.
        from: Option<ConditionId>,
    },
}

/// Operators.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Binary {
    /// `+`
    Add,
    /// `-`
    Sub,
    /// `*`
    Mul,
    /// `/`
    Div,
}

/// Functions.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Function {
    /// Square root.
    Sqrt,
    /// Sine.
    Sin,
    /// Cosine.
    Cos,
    /// Tangent.
    Tan,
    /// Arc sine.
    Asin,
    /// Arc cosine.
    Acos,
    /// Arc tangent.
    Atan,
    /// Arc tangent of two arguments, y first.
    Atan2,
    /// Least of its arguments.
    Min,
    /// Greatest of its arguments.
    Max,
    /// Absolute value.
    Abs,
}

impl Expr {
    /// Visits this expression and all below it, each named one once a mention.
    pub fn walk(&self, visit: &mut impl FnMut(&Expr)) {
        visit(self);
        match &self.kind {
            ExprKind::Named(_, e) | ExprKind::Negate(e) | ExprKind::Power(e, _) => e.walk(visit),
            ExprKind::Change { of, .. } => of.walk(visit),
            ExprKind::Binary(_, a, b) => {
                a.walk(visit);
                b.walk(visit);
            }
            ExprKind::Call(_, arguments) => arguments.iter().for_each(|a| a.walk(visit)),
            ExprKind::Constant(_)
            | ExprKind::Pi
            | ExprKind::Size { .. }
            | ExprKind::Pieces { .. }
            | ExprKind::After { .. }
            | ExprKind::Clearance(_)
            | ExprKind::Play(_) => {}
        }
    }
}
