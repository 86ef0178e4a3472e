//! Formulas of solids: how parts expand, press, hold each other and enclose.
//!
//! Each stands once, generic over [`crate::numeric::Number`], in the symbols of the book it is from,
//! with its source and what it is valid for. SI throughout; a pull is positive, a pressure is
//! positive as it presses. Knows neither parts, conditions nor text: whoever evaluates a model brings
//! the numbers. What each formula neglects is gathered in `docs/method-joints.md`.

pub mod bearing;
pub mod contact;
pub mod expansion;
pub mod filling;
pub mod joining;
pub mod joint;
pub mod place;
pub mod restraint;
pub mod ring;
pub mod seal;

pub use ring::{Ring, Stress};
