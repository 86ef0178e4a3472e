//! Probabilities: tails of sums of independent unknowns, bounds on several events at once,
//! confidence limits of counted shares, moments to second order.
//!
//! Knows nothing of requirements or parts: terms are coefficients and distributions, all in the
//! caller's one unit. Shares are fractions of one.

mod confidence;
mod inversion;
mod joint;
mod nested;
mod second_order;
mod tail;

pub use confidence::{ShareInterval, clopper_pearson};
pub use joint::{any_of, any_of_groups};
pub use second_order::{Derivatives, SecondOrder, UnknownMoments, second_order};
pub use tail::{Method, NoMomentFunction, Tail, Term, above, below, mean, variance};
