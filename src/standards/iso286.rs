//! Limits and fits by ISO 286-1:2010, for sizes up to 3150 mm: standard tolerances IT01 to IT18,
//! fundamental deviations a to zc and A to ZC, and the fits they make.
//!
//! Sizes are millimetres, deviations exact micrometres, positive away from the material of a hole and
//! into the room around a shaft: greater sizes. A hole stands for every internal feature of size, a
//! shaft for every external one. A class that the standard does not define at a size is refused with
//! the clause and with the nearest classes that are; nothing is extrapolated. `docs/standards.md`
//! states where each table was read. Knows nothing of text beyond the spelling of a class.

mod class;
mod deviation_table;
mod fit;
mod grade_table;
mod limits;
mod preferred;
mod refusal;
mod step;

pub use class::{Class, Grade, Kind, Letters, Misspelling};
pub use fit::{Character, Fit, FitError, fit};
pub use limits::{Deviations, classes_at};
pub use preferred::{
    HOLES, PREFERRED_HOLES, PREFERRED_SHAFTS, SHAFTS, hole_basis_fits, preferred_fits,
    shaft_basis_fits,
};
pub use refusal::{NotDefined, Reason};

/// The greatest nominal size of the system, mm.
pub const GREATEST_SIZE: f64 = 3150.0;
