//! Materials: expansion, elastic data, the built-in library and its sources.
//!
//! Knows nothing of spans or files.

/// A material with its data and where they come from.
#[derive(Debug, Clone)]
pub struct Material {
    /// Its name in a spec.
    pub name: String,
}
