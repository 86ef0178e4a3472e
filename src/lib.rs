//! Gapkeep: proves how parts of different materials fit together at every temperature.
//!
//! The rooms, from the ground up, are listed in `DEVELOPERS.md`; a room uses only those before it,
//! which `tests/tidy.rs` holds.

pub mod cli;
pub mod diagnostic;
pub mod evaluate;
pub mod findings;
pub mod materials;
pub mod mechanics;
pub mod model;
pub mod numeric;
pub mod report;
pub mod resolve;
pub mod source;
pub mod span;
pub mod standards;
pub mod syntax;
pub mod units;
