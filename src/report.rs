//! Renderings of a run.
pub mod diagnostic;
pub mod look;
mod wrap;
