//! The integration tests: one binary, one module a subject.

mod published;
mod syntax;
