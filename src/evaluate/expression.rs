//! Expressions of a spec as recorded numbers.

use super::joint;
use super::scene::{At, Scene, Unable};
use super::size;
use crate::mechanics::place;
use crate::model::{Binary, Expr, ExprKind, Fit, Function, SubjectId, Unknown};
use crate::numeric::{Number, Recorded};

/// The value of an expression in a state of the world; every dimension in it is taken there.
pub(crate) fn value(scene: &Scene<'_>, at: At, expr: &Expr) -> Result<Recorded, Unable> {
    let of = |e: &Expr| value(scene, at, e);
    Ok(match &expr.kind {
        ExprKind::Constant(x) => Recorded::exact(*x),
        ExprKind::Pi => Recorded::pi(),
        ExprKind::Size { dimension, piece } => size::at(scene, at, *dimension, *piece)?,
        ExprKind::Pieces { dimension, count } => {
            let mut sum = size::at(scene, at, *dimension, 1)?;
            for piece in 2..=*count {
                sum = sum + size::at(scene, at, *dimension, piece)?;
            }
            sum
        }
        ExprKind::After { dimension, fit } => joint::after(scene, at, *dimension, *fit)?,
        ExprKind::Named(_, e) => of(e)?,
        ExprKind::Negate(e) => -of(e)?,
        ExprKind::Binary(operator, a, b) => {
            let (a, b) = (of(a)?, of(b)?);
            match operator {
                Binary::Add => a + b,
                Binary::Sub => a - b,
                Binary::Mul => a * b,
                Binary::Div => a / b,
            }
        }
        ExprKind::Power(base, exponent) => of(base)?.pow(*exponent),
        ExprKind::Call(function, arguments) => {
            let values = arguments.iter().map(|a| of(a)).collect::<Result<Vec<_>, _>>()?;
            call(*function, values)
        }
        ExprKind::Clearance(fit) => clearance_of(scene, at, *fit)?,
        ExprKind::Play(fit) => play(scene, at, *fit)?,
        ExprKind::Change { of: e, from } => {
            change(scene, at, from.map_or(At::Reference, At::Condition), e)?
        }
    })
}

/// An expression here less the same there; sums are taken apart, so that each size enters once.
pub(crate) fn change(
    scene: &Scene<'_>,
    here: At,
    there: At,
    expr: &Expr,
) -> Result<Recorded, Unable> {
    let of = |e: &Expr| change(scene, here, there, e);
    Ok(match &expr.kind {
        ExprKind::Constant(_) | ExprKind::Pi => Recorded::exact(0.0),
        ExprKind::Size { dimension, piece } => {
            size::change(scene, here, there, *dimension, *piece)?
        }
        ExprKind::Pieces { dimension, count } => {
            let mut sum = Recorded::exact(0.0);
            for piece in 1..=*count {
                sum = sum + size::change(scene, here, there, *dimension, piece)?;
            }
            sum
        }
        ExprKind::Named(_, e) => of(e)?,
        ExprKind::Negate(e) => -of(e)?,
        ExprKind::Binary(Binary::Add, a, b) => of(a)? + of(b)?,
        ExprKind::Binary(Binary::Sub, a, b) => of(a)? - of(b)?,
        ExprKind::Binary(Binary::Mul, a, b) => match (&a.kind, &b.kind) {
            (ExprKind::Constant(k), _) => of(b)? * *k,
            (_, ExprKind::Constant(k)) => of(a)? * *k,
            _ => value(scene, here, expr)? - value(scene, there, expr)?,
        },
        ExprKind::Binary(Binary::Div, a, b) => match &b.kind {
            ExprKind::Constant(k) => of(a)? / *k,
            _ => value(scene, here, expr)? - value(scene, there, expr)?,
        },
        _ => value(scene, here, expr)? - value(scene, there, expr)?,
    })
}

fn call(function: Function, arguments: Vec<Recorded>) -> Recorded {
    let mut left = arguments.into_iter();
    // The resolver has counted the arguments; nothing given stands for zero.
    let mut next = || left.next().unwrap_or_else(|| Recorded::exact(0.0));
    let first = next();
    match function {
        Function::Sqrt => first.sqrt(),
        Function::Sin => first.sin(),
        Function::Cos => first.cos(),
        Function::Tan => first.tan(),
        Function::Asin => first.asin(),
        Function::Acos => first.acos(),
        Function::Atan => first.atan(),
        Function::Abs => first.abs(),
        Function::Atan2 => first.atan2(next()),
        Function::Min => left.fold(first, Number::min),
        Function::Max => left.fold(first, Number::max),
    }
}

/// Internal minus external size of a fit: positive with play, negative with interference.
pub(crate) fn clearance(scene: &Scene<'_>, at: At, fit: &Fit) -> Result<Recorded, Unable> {
    Ok(value(scene, at, &fit.internal)? - value(scene, at, &fit.external)?)
}

fn clearance_of(scene: &Scene<'_>, at: At, fit: SubjectId) -> Result<Recorded, Unable> {
    match scene.assembly.fit(fit) {
        Some(fit) => clearance(scene, at, fit),
        None => Ok(Recorded::exact(0.0)),
    }
}

/// Half the clearance there is, times where the piece sits in it; nothing when there is none.
fn play(scene: &Scene<'_>, at: At, fit: SubjectId) -> Result<Recorded, Unable> {
    // As drawn nothing has been pushed to either side.
    let At::Condition(condition) = at else { return Ok(Recorded::exact(0.0)) };
    let clearance = clearance_of(scene, at, fit)?;
    Ok(place::in_play(scene.unknown(Unknown::Seat { fit, condition }), clearance))
}
