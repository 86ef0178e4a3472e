//! From figures and verdicts to findings: what fails, where, by how much, and what would mend it.
//!
//! One file a kind of finding, with its rule and its words. Knows no format and no colour; numbers
//! are put into words in [`number`] only, names in [`words`] only, temperatures in [`window`].

mod beyond_data;
mod concession;
mod contact;
mod friction;
mod full;
mod joining;
mod limit;
mod measured;
mod missing;
pub mod number;
mod scatter;
mod selection;
mod speed;
pub mod standing;
mod statistical;
pub mod thin_margin;
mod undecided;
mod weak;
pub mod window;
pub mod words;
mod yielding;

use crate::diagnostic::Diagnostic;
use crate::evaluate::Evaluation;
use crate::model::Assembly;
pub use standing::{Standing, standing};

/// Everything the figures of an assembly give cause to say, in the order of the spec.
///
/// `today` is the checker's day as `YYYY-MM-DD`; concessions count up to and including their last
/// day.
pub fn findings(assembly: &Assembly, evaluation: &Evaluation, today: &str) -> Vec<Diagnostic> {
    let mut found = Vec::new();
    beyond_data::find(assembly, evaluation, &mut found);
    scatter::find(assembly, evaluation, &mut found);
    missing::find(assembly, evaluation, &mut found);
    contact::find(assembly, evaluation, &mut found);
    limit::find(assembly, evaluation, today, &mut found);
    statistical::find(assembly, evaluation, &mut found);
    weak::find(assembly, evaluation, &mut found);
    measured::find(assembly, evaluation, &mut found);
    speed::find(assembly, &mut found);
    yielding::find(assembly, evaluation, &mut found);
    full::find(assembly, evaluation, &mut found);
    joining::find(assembly, evaluation, &mut found);
    friction::find(assembly, evaluation, &mut found);
    undecided::find(assembly, evaluation, &mut found);
    selection::find(assembly, evaluation, &mut found);
    concession::find(assembly, evaluation, today, &mut found);
    found.sort_by_key(|d| (d.primary.span.file, d.primary.span.start));
    found
}
