//! Tails of sums of independent unknowns.
