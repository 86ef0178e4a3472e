//! Expressions: what stands after the `=` of a gap, result, fit, `let` or cavity.

use super::{Name, Scalar};
use crate::span::{Span, Spanned};

/// An expression.
#[derive(Debug, Clone, PartialEq)]
pub struct Expr {
    /// What it is.
    pub kind: ExprKind,
    /// The whole of it, parentheses included.
    pub span: Span,
}

/// The kinds of expression.
///
/// Sums and products are flat, so that a long stack is no deep tree. Operators of one chain have
/// one rank and are read from left to right.
#[derive(Debug, Clone, PartialEq)]
pub enum ExprKind {
    /// `2.5 mm` or a pure `2`
    Constant(Scalar),
    /// `housing.depth`, `half_width` or `pi`
    Path(Path),
    /// `2x bearing.width`: independent pieces.
    Pieces(Count, Path),
    /// `-x`; of `-x^2` it holds the whole power.
    Negate(Box<Expr>),
    /// A sum (`+`, `-`) or a product (`*`, `/`) of two or more; `rest` is never empty.
    Chain(Box<Expr>, Vec<(Spanned<Operator>, Expr)>),
    /// `x^2`: base and exponent; it does not chain.
    Power(Box<Expr>, Box<Expr>),
    /// `change(shelf.pitch from room)`, `atan2(a, b)`, `play(slide)`
    Call {
        /// The function's name as spelled.
        function: Name,
        /// What it is given.
        arguments: Vec<Expr>,
        /// The condition after `from`.
        from: Option<Name>,
    },
    /// `(a - b)`
    Parenthesised(Box<Expr>),
    /// `ring.race after seat`: a dimension (or one in parentheses) once that fit's joint is made.
    After(Box<Expr>, Name),
}

/// An operator between two expressions.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Operator {
    /// `+`
    Add,
    /// `-`
    Subtract,
    /// `*`, `×` or `·`
    Multiply,
    /// `/`
    Divide,
}

/// `2x`: a count of independent pieces.
#[derive(Debug, Clone, PartialEq)]
pub struct Count {
    /// How many; at least 1.
    pub value: u32,
    /// Digits and `x`.
    pub span: Span,
}

/// `housing.bore`, or a bare `bore`.
#[derive(Debug, Clone, PartialEq)]
pub struct Path {
    /// What stands before the dot.
    pub owner: Option<Name>,
    /// What stands after the dot, or alone.
    pub name: Name,
    /// The whole path.
    pub span: Span,
}

/// A dimension with a count of pieces if one is stated, outside of an expression.
#[derive(Debug, Clone, PartialEq)]
pub struct Term {
    /// The count.
    pub count: Option<Count>,
    /// The dimension.
    pub path: Path,
    /// Both.
    pub span: Span,
}
