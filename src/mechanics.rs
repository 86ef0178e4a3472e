//! (room under construction)

pub mod expansion;
