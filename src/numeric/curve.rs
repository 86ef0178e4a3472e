//! Functions of one variable that come from data: expansion curves, moduli against temperature,
//! temperatures against time.
//!
//! A curve is read with every kind of number, so it knows its own enclosure over an interval and its
//! own derivative; that is where all branching on values lives.

use super::Interval;
use std::fmt::Debug;
use std::sync::Arc;

/// A function of one variable given by data.
pub trait Curve: Debug + Send + Sync {
    /// The value at `x`; outside the data, whatever the curve says it continues with (the caller
    /// checks the range of validity).
    fn value(&self, x: f64) -> f64;

    /// An interval that holds every value over `x`, rounded outward. At a step it holds both sides.
    fn range(&self, x: Interval) -> Interval;

    /// The derivative as a curve of its own. At a kink its range holds both sides.
    fn derivative(&self) -> Arc<dyn Curve>;

    /// The places where the function, its slope or its monotony changes, in rising order: where to
    /// split first.
    fn breakpoints(&self) -> &[f64];
}
