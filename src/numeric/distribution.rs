//! Distributions of a single unknown.
