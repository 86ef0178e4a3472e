//! `temperature-outside-data`, `data-extrapolated`: a part colder or hotter than what is known of
//! its material.

use super::number::{Round, with_unit};
use super::words;
use crate::diagnostic::{Code, Diagnostic};
use crate::evaluate::Evaluation;
use crate::model::{Assembly, Owner};

pub(super) fn find(assembly: &Assembly, evaluation: &Evaluation, found: &mut Vec<Diagnostic>) {
    let unit = assembly.defaults.temperature;
    let range = |(from, to): (f64, f64)| {
        format!("{} .. {}", with_unit(from, unit, Round::Down), with_unit(to, unit, Round::Up))
    };
    for beyond in &evaluation.beyond_data {
        let Some(material) = assembly.material_of(beyond.owner) else { continue };
        let material_span = match beyond.owner {
            Owner::Part(part) => assembly.part(part).material_span,
            Owner::Fill(fill) => assembly.subject(fill).span,
        };
        let condition = assembly.condition(beyond.condition);
        // The ends of one temperature may differ by its rounding.
        let end = |si: f64| with_unit(si, unit, Round::Nearest);
        let reached = if end(beyond.temperature.0) == end(beyond.temperature.1) {
            end(beyond.temperature.0)
        } else {
            range(beyond.temperature)
        };
        let valid = format!(
            "{} .. {}",
            with_unit(beyond.valid.0, unit, Round::Nearest),
            with_unit(beyond.valid.1, unit, Round::Nearest)
        );
        let source = match material.sources().first() {
            Some(source) => format!(", {source}"),
            None => String::new(),
        };
        let message = format!(
            "{} reaches {reached} at {}, outside the data of {}",
            words::name(&words::owner(assembly, beyond.owner)),
            words::name(&condition.name),
            words::name(&material.name)
        );
        let (code, help) = if beyond.extrapolated {
            (
                Code::DataExtrapolated,
                "have the material measured that far, or keep the condition within its data"
                    .to_string(),
            )
        } else {
            (
                Code::TemperatureOutsideData,
                "take a material with data that far, or write one `like` it with `extrapolate` and \
                 answer for it"
                    .to_string(),
            )
        };
        found.push(
            Diagnostic::new(code, condition.span, message)
                .here(reached)
                .label(material_span, format!("known over {valid}{source}"))
                .help(help),
        );
    }
}
