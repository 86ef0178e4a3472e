//! From the model to figures and verdicts: what every quantity can be at every condition, proven.
//!
//! Knows nothing of source texts, words or formats. SI throughout.

pub mod outcome;

pub use outcome::Evaluation;
