//! `swell { dry 0 %; wet 0.8 % ±0.15 }`: free strain from moisture, counted from the first state.

use super::property::{no_spread, row_group};
use crate::diagnostic::{Code, Diagnostic};
use crate::materials::SwellState;
use crate::resolve::context::Context;
use crate::resolve::quantity::{self, Expect};
use crate::syntax::tree::{self, PropertyValue, RowKey};

/// The states in the order written.
pub(super) fn states(cx: &mut Context, stated: &tree::Property) -> Option<Vec<SwellState>> {
    no_spread(cx, stated)?;
    let PropertyValue::Table(table) = &stated.value else {
        return cx.refuse(
            Diagnostic::new(Code::WrongKind, stated.span, "`swell` is a table of states")
                .help("write `swell { dry 0 %; wet 0.8 % ±0.15 }`"),
        );
    };
    let mut states: Vec<SwellState> = Vec::new();
    for row in &table.rows {
        let RowKey::State(name) = &row.key else {
            return cx.refuse(
                Diagnostic::new(Code::WrongKind, row.span, "a row of `swell` begins with a state")
                    .help("name the moisture, such as `wet 0.8 %`"),
            );
        };
        if states.iter().any(|state| state.name == name.value) {
            let message = format!("`{}` is stated twice", name.value);
            let finding = Diagnostic::new(Code::StatedTwice, name.span, message);
            return cx.refuse(finding.help("keep one of the two"));
        }
        let t = quantity::group(cx, &row_group(row, table), Expect::Strain)?;
        let strain = t.nominal + 0.5 * (t.lower + t.upper);
        let spread = 0.5 * (t.upper - t.lower);
        if states.is_empty() && (strain != 0.0 || spread != 0.0) {
            return cx.refuse(
                Diagnostic::new(
                    Code::SwellOfFirstState,
                    row.value.span,
                    format!("`{}` is the state as drawn, which has swollen by 0 %", name.value),
                )
                .help("put the drawing's state first, and count the others from it"),
            );
        }
        states.push(SwellState { name: name.value.clone(), strain, spread });
    }
    if states.len() < 2 {
        return cx.refuse(
            Diagnostic::new(Code::TableShape, stated.span, "`swell` needs two states or more")
                .help("write `swell { dry 0 %; wet 0.8 % ±0.15 }`"),
        );
    }
    Some(states)
}
