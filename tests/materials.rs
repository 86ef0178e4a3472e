//! The material library: what holds for every entry, and that its enclosures enclose.

mod document;
mod enclosure;
mod laws;
mod random_tables;
