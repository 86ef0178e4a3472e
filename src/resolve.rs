//! Tree to model: names, units, classes, materials, includes; “did you mean”.
//!
//! Must not know evaluation. Mistakes are reported one by one; a spec with any gives no assembly.

#[allow(dead_code, reason = "the entry that uses it is being built")]
mod condition;
#[allow(dead_code, reason = "the entry that uses it is being built")]
mod context;
#[allow(dead_code, unused_imports, reason = "the entry that uses it is being built")]
mod dimension;
#[allow(dead_code, reason = "the entry that uses it is being built")]
mod file;
#[allow(dead_code, reason = "the entry that uses it is being built")]
mod head;
#[allow(dead_code, reason = "the entry that uses it is being built")]
mod material;
#[allow(dead_code, reason = "the entry that uses it is being built")]
mod part;
#[allow(dead_code, reason = "the entry that uses it is being built")]
mod quantity;
#[allow(dead_code, reason = "the entry that uses it is being built")]
mod table;
#[cfg(test)]
mod tests;

pub use file::{FileError, Files};
