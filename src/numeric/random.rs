//! Draws: random numbers that any thread can make for any draw of any unknown, and the loop that
//! runs them over all cores with the same digits out for any number of threads.
//!
//! Knows nothing of what is drawn. The numbers are keyed, not drawn in turn: an unknown's draw
//! depends on the seed, the unknown's key and the draw's number only, so that adding an unknown to
//! a study leaves the draws of the others as they were.

mod normal;
mod run;
mod stream;
mod vectors;

pub use run::{BLOCK, Merge, Moments, monte_carlo, monte_carlo_of};
pub use stream::Stream;
pub use vectors::vectorized;
