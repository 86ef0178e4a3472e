//! Published standards as tables, each with its clause: limits and fits (ISO 286-1), general
//! tolerances (ISO 2768-1), and what a geometrical tolerance contributes to a dimension chain.
//!
//! The tables are authoritative; the formulas a standard gives beside them only check them, in the
//! tests. Sizes come in as millimetres, because the steps of the standards are stated in them;
//! deviations go out as exact decimals. Knows nothing of files or spans.

pub mod geometry;
pub mod iso2768;
pub mod iso286;
mod micrometres;

pub use micrometres::Micrometres;

/// How far from the end of a size step a size still counts as that end, mm.
///
/// A size that reached us through metres or inches differs from the decimal on the drawing by a few
/// units in the last place; 50 mm must not fall into the step over 50 mm for that. No drawing states
/// a size to a picometre.
const CONVERSION_NOISE: f64 = 1e-9;

/// True when `size` is at most `end`, both mm, but for noise of conversion.
fn up_to_and_including(size: f64, end: f64) -> bool {
    size <= end + CONVERSION_NOISE
}
