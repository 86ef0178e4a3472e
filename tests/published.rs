//! Values that others have published, one module a subject.

mod distributions;
mod drawn_shares;
mod expansion;
mod gauge_block;
mod mixed_sums;
mod statistics;
