//! The integration tests: one binary, one module a subject.

// A test that cannot go on should say so at once.
#![allow(clippy::unwrap_used, clippy::expect_used)]

mod acceptance;
mod acceptance_fills;
mod acceptance_joints;
mod bad;
mod cli;
mod findings_doc;
mod interval_laws;
mod laws;
mod materials;
mod mechanics;
mod published;
mod samples;
mod select;
mod standards_laws;
mod statistics_laws;
mod statistics_of_temperature;
mod support;
mod syntax;
mod tidy;
mod windows;
