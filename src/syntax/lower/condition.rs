//! Conditions and their rows.

use super::{Lower, names, spelled, string};
use crate::diagnostic::{Code, Diagnostic};
use crate::span::Spanned;
use crate::syntax::grammar::{Node, Rule};
use crate::syntax::tree::{
    Condition, Name, Override, OwnTemperature, Quantity, Sense, Speed, Spread, ThermalState,
};

/// Names that no part and no condition may have, because rows and columns give them a meaning.
const RESERVED_NAMES: [&str; 3] = ["moisture", "ambient", "reference"];

impl Lower {
    /// Reports a reserved name.
    pub(super) fn free_name(&mut self, name: &Name, what: &str) {
        if RESERVED_NAMES.contains(&name.value.as_str()) {
            let message = format!("a {what} cannot be named `{}`", name.value);
            self.report(
                Diagnostic::new(Code::ReservedName, name.span, message)
                    .help("`moisture`, `ambient` and `reference` have a meaning of their own; choose another name"),
            );
        }
    }

    pub(in crate::syntax) fn condition(&mut self, node: Node<'_>) -> Option<Condition> {
        let span = node.span();
        let mut name = None;
        let mut state = None;
        let mut spread = None;
        for child in node.children() {
            match child.rule() {
                Rule::name => name = Some(spelled(&child)),
                Rule::history => state = Some(self.history(child)?),
                Rule::quantity => state = Some(ThermalState::Temperature(self.quantity(child)?)),
                Rule::spread => spread = Some(self.spread(child)?),
                _ => {}
            }
        }
        let name = name?;
        self.free_name(&name, "condition");
        let (overrides, moisture, speeds) = (Vec::new(), Vec::new(), Vec::new());
        Some(Condition { name, state: state?, spread, overrides, moisture, speeds, span })
    }

    fn history(&mut self, node: Node<'_>) -> Option<ThermalState> {
        let file = string(&node.child(Rule::string)?);
        let tolerance = match node.child(Rule::tolerance) {
            Some(tolerance) => Some(self.tolerance(tolerance)?),
            None => None,
        };
        Some(ThermalState::History { file, tolerance })
    }

    pub(in crate::syntax) fn override_row(&mut self, node: Node<'_>) -> Option<Override> {
        let span = node.span();
        let mut part = None;
        let mut moisture = None;
        let mut temperature = None;
        let mut spread = None;
        for child in node.children() {
            match child.rule() {
                Rule::name => part = Some(spelled(&child)),
                Rule::state => moisture = Some(spelled(&child.child(Rule::name)?)),
                Rule::own_temperature => {
                    let (own, own_spread) = self.own_temperature(child, part.as_ref()?)?;
                    temperature = Some(own);
                    spread = own_spread;
                }
                _ => {}
            }
        }
        Some(Override { part: part?, moisture, temperature, spread, span })
    }

    fn own_temperature(
        &mut self,
        node: Node<'_>,
        part: &Name,
    ) -> Option<(OwnTemperature, Option<Spread>)> {
        let mut amount = None;
        let mut sense = None;
        let mut base = None;
        let mut spread = None;
        for child in node.children() {
            match child.rule() {
                Rule::quantity => amount = Some(self.quantity(child)?),
                Rule::word_above => sense = Some(Spanned::new(Sense::Above, child.span())),
                Rule::word_below => sense = Some(Spanned::new(Sense::Below, child.span())),
                Rule::name => base = Some(spelled(&child)),
                Rule::spread => spread = Some(self.spread(child)?),
                _ => {}
            }
        }
        let amount = amount?;
        if let Some(sense) = sense {
            return Some((OwnTemperature::Difference { amount, sense, base }, spread));
        }
        let first = match &amount {
            Quantity::Group(group) => &group.value,
            Quantity::Range(range) => &range.low,
        };
        if first.number.has_plus() {
            let number = first.number.text.trim_start_matches('+');
            let unit = first.unit.as_ref().map_or("", |unit| unit.value.as_str());
            let part = &part.value;
            self.report(
                Diagnostic::new(
                    Code::SignedTemperature,
                    first.number.span,
                    format!("`{}` may be a temperature or a difference", first.number.text),
                )
                .help(format!("write `{part} {number}` for the temperature, `{part} {number} {unit}{}above` for the difference", if unit.is_empty() { "K " } else { " " })),
            );
            return None;
        }
        Some((OwnTemperature::Absolute(amount), spread))
    }

    pub(in crate::syntax) fn moisture_row(&mut self, node: Node<'_>) -> Option<Name> {
        Some(spelled(&node.child(Rule::name)?))
    }

    pub(in crate::syntax) fn speed_row(&mut self, node: Node<'_>) -> Option<Speed> {
        let speed = self.quantity(node.child(Rule::quantity)?)?;
        let spread = match node.child(Rule::spread) {
            Some(spread) => Some(self.spread(spread)?),
            None => None,
        };
        let span = node.span();
        Some(Speed { speed, spread, parts: names(node), span })
    }
}
