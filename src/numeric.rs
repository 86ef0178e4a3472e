//! Numbers and what is done with them: arithmetic kinds, proven extremes, roots, distributions.
//!
//! Knows nothing of text, units or parts. Values are plain; the caller states their unit.

pub mod distribution;
pub mod probability;
