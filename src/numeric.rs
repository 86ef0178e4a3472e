//! Numbers and what is done with them: arithmetic kinds, proven extremes, roots, distributions.
//!
//! Knows nothing of text, units or parts. Values are plain; the caller states their unit.
//!
//! The central idea of the program stands here: a formula is written once, generic over [`Number`],
//! and read with different arithmetics.
//!
//! | number | gives |
//! |---|---|
//! | `f64` | a value at a point |
//! | [`Interval`] | an enclosure that is proven, rounded outward |
//! | [`Dual`] over either | a derivative; the sign of one over a whole box |
//! | [`Lanes`] | eight values at a time |
//! | [`Recorded`] | the formula itself, as a [`Tape`] that any of the others replays, columns of draws too |

pub mod complex;
pub mod curve;
pub mod distribution;
pub mod dual;
pub mod extremes;
pub mod interval;
pub mod lanes;
pub mod number;
pub mod piecewise;
pub mod probability;
pub mod quadrature;
pub mod random;
pub mod root;
pub mod special;
pub mod tape;
pub mod tolerance;

pub use curve::Curve;
pub use dual::Dual;
pub use interval::Interval;
pub use lanes::Lanes;
pub use number::{Number, Ordered};
pub use piecewise::Piecewise;
pub use tape::{Recorded, Tape};
