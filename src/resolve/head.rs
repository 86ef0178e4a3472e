//! The head of a file: its units, its reference temperature, its general tolerances. They hold for
//! the lines of that file only.

use super::context::{Context, General, Head};
use super::quantity::{self, Expect};
use crate::diagnostic::{Code, Diagnostic};
use crate::span::{FileId, Span};
use crate::standards::iso2768;
use crate::syntax::tree::{self, Decimals, GeneralKind, Statement};
use crate::units::{Kind, Unit};
use std::collections::BTreeMap;

/// Reads the head of a file and keeps it; what is not said stays as it is by default.
pub(crate) fn resolve(cx: &mut Context, file: FileId, tree: &tree::File) {
    let mut seen = Seen::default();
    let mut head = Head::default();
    for statement in &tree.statements {
        match statement {
            Statement::Lengths(stated) if seen.first(cx, "lengths", stated.span) => {
                if let Some(unit) = default_unit(cx, stated, Kind::LENGTH) {
                    head.defaults.length = unit;
                }
            }
            Statement::Temperatures(stated) if seen.first(cx, "temperatures", stated.span) => {
                if let Some(unit) = default_unit(cx, stated, Kind::TEMPERATURE) {
                    head.defaults.temperature = unit;
                }
            }
            _ => {}
        }
    }
    // The numbers below take these units, wherever the lines stand.
    cx.set_head(file, head.clone());
    for statement in &tree.statements {
        match statement {
            Statement::Reference(stated) if seen.first(cx, "reference", stated.span) => {
                if let Some(reference) = exact_temperature(cx, &stated.temperature) {
                    head.reference = reference;
                }
            }
            Statement::General(stated) if seen.first(cx, "general", stated.span) => {
                head.general = general(cx, stated);
            }
            _ => {}
        }
    }
    cx.set_head(file, head);
}

/// Where each line of the head was first said.
#[derive(Default)]
struct Seen {
    places: BTreeMap<&'static str, Span>,
}

impl Seen {
    /// True for the first; a finding for the second.
    fn first(&mut self, cx: &mut Context, word: &'static str, span: Span) -> bool {
        let Some(&first) = self.places.get(word) else {
            self.places.insert(word, span);
            return true;
        };
        cx.report(
            Diagnostic::new(Code::StatedTwice, span, format!("`{word}` is stated twice"))
                .label(first, "first stated here")
                .help("keep one of the two"),
        );
        false
    }
}

fn default_unit(cx: &mut Context, stated: &tree::DefaultUnit, kind: Kind) -> Option<&'static Unit> {
    let expect = if kind == Kind::TEMPERATURE { Expect::Temperature } else { Expect::Of(kind) };
    quantity::unit_for(cx, &stated.unit, expect)
}

/// A temperature that must be one value, K.
pub(crate) fn exact_temperature(cx: &mut Context, stated: &tree::Group) -> Option<f64> {
    if let Some(tolerance) = &stated.tolerance {
        let span = tolerance.span;
        return cx.refuse(
            Diagnostic::new(
                Code::ToleranceOfReference,
                span,
                "a reference temperature has no tolerance",
            )
            .help("sizes are stated at one temperature; say in a `condition` what varies"),
        );
    }
    let kelvin = quantity::scalar(cx, &stated.value, Expect::Temperature)?;
    quantity::above_absolute_zero(cx, stated.span, kelvin)?;
    Some(kelvin)
}

fn general(cx: &mut Context, stated: &tree::General) -> Option<General> {
    match &stated.kind {
        GeneralKind::Iso2768(class) => match iso2768::Class::parse(&class.value) {
            Some(found) => Some(General::Iso2768 {
                class: found,
                written: format!("ISO 2768-{}", class.value),
            }),
            None => cx.refuse(
                Diagnostic::new(
                    Code::UnknownGeneralClass,
                    class.span,
                    format!("ISO 2768-1 has no tolerance class `{}`", class.value),
                )
                .help("its classes are `f`, `m`, `c` and `v`"),
            ),
        },
        GeneralKind::ByDecimals(rows) => by_decimals(cx, rows),
    }
}

/// The rows of an inch title block.
fn by_decimals(cx: &mut Context, rows: &[tree::DecimalRow]) -> Option<General> {
    let mut lengths: BTreeMap<usize, (f64, f64)> = BTreeMap::new();
    let mut angle = None;
    let mut first: BTreeMap<Option<usize>, Span> = BTreeMap::new();
    let mut complete = true;
    for row in rows {
        let key = match row.decimals {
            Decimals::Length(n) => Some(n),
            Decimals::Angle => None,
        };
        if let Some(&earlier) = first.get(&key) {
            cx.report(
                Diagnostic::new(Code::StatedTwice, row.span, "this row is stated twice")
                    .label(earlier, "first stated here")
                    .help("keep one of the two"),
            );
            continue;
        }
        first.insert(key, row.span);
        let expect = if key.is_some() { Expect::Size } else { Expect::Of(Kind::ANGLE) };
        match (quantity::tolerance(cx, &row.tolerance, expect), key) {
            (Some(deviations), Some(n)) => {
                lengths.insert(n, deviations);
            }
            (Some(deviations), None) => angle = Some(deviations),
            (None, _) => complete = false,
        }
    }
    complete.then_some(General::ByDecimals { lengths, angle })
}
