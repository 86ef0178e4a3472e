//! The thin program: everything happens in the library.

fn main() {}
