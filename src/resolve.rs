//! Tree to model: names, units, classes, materials, includes; “did you mean”.
//!
//! Must not know evaluation. Mistakes are reported one by one; a spec with any gives no assembly.

#[allow(dead_code, reason = "the entry that uses it is being built")]
mod context;
#[allow(dead_code, reason = "the entry that uses it is being built")]
mod file;
#[allow(dead_code, reason = "the entry that uses it is being built")]
mod quantity;
#[allow(dead_code, reason = "the entry that uses it is being built")]
mod table;

pub use file::{FileError, Files};
