//! Formulas of solids against a second way of computing them, and against laws.

mod extremes;
mod laws;
mod rings;
