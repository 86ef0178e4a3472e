//! Sizes whose class is still to be chosen.

use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Assembly, DimensionId, Origin};
use std::collections::BTreeSet;

/// Dimensions written `dia 42 ?`: without limits nothing can be shown of them. Parts `like` each
/// other share a line, which is named once.
pub(super) fn classes_left_open(assembly: &Assembly) -> Vec<Diagnostic> {
    let mut seen = BTreeSet::new();
    let mut found = Vec::new();
    for (index, dimension) in assembly.dimensions.iter().enumerate() {
        if dimension.origin == Origin::Open && seen.insert(dimension.line) {
            let path = assembly.path(DimensionId(index as u32));
            found.push(
                Diagnostic::new(
                    Code::ClassLeftOpen,
                    dimension.span,
                    format!("the class of `{path}` is left open"),
                )
                .here(format!("`{}` has no limits to check", dimension.written))
                .help("`gapkeep select` lists the classes that meet every requirement"),
            );
        }
    }
    found
}
