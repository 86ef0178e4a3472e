//! Special functions of the statistics: the normal curve, the scaled complementary error function
//! of a complex argument, the beta kernel and the incomplete beta function.
//!
//! Pure functions of plain numbers; the real error functions themselves are `libm`'s.

mod beta;
mod error_function;
mod normal;

pub use beta::{beta_quantile, log_binomial_density, regularized_beta};
pub use error_function::scaled_erfc;
pub use normal::{normal_between, normal_density, normal_quantile, normal_tail};
