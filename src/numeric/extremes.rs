//! Proven extremes.
