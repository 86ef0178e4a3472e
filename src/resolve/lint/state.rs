//! Temperatures that are allowed and rarely true.

use crate::diagnostic::{Code, Diagnostic};
use crate::model::{Assembly, DimensionId, Form, Thermal};

/// Parts of words by which people call a state in which heat flows.
const HEATED: [&str; 7] = ["hot", "warm", "running", "operat", "service", "duty", "firing"];

/// One temperature for every part, in a condition whose name says that something heats them.
pub(super) fn one_temperature(assembly: &Assembly) -> Vec<Diagnostic> {
    let mut found = Vec::new();
    for condition in &assembly.conditions {
        let name = condition.name.to_lowercase();
        let heated = HEATED.iter().any(|word| name.contains(word));
        let uniform = matches!(condition.thermal, Thermal::Uniform(_))
            && condition.states.iter().all(|state| state.temperature.is_none());
        if heated && uniform && assembly.parts.len() > 1 {
            found.push(
                Diagnostic::new(
                    Code::OneTemperature,
                    condition.span,
                    format!("every part has one temperature in `{}`", condition.name),
                )
                .help(
                    "parts that carry heat or make it differ: give them their own, as \
                     `{ shaft 12 K above }`",
                ),
            );
        }
    }
    found
}

/// Crystal transition of PTFE, within which its length depends on its history: about 19 °C
/// (transitions at 19 °C and 30 °C; common practice states sizes at 23 °C, as ISO 291 conditions
/// plastics). K.
const PTFE_TRANSITION: (f64, f64) = (291.15, 294.15);

/// PTFE sizes stated where its length jumps.
pub(super) fn ptfe_transition(assembly: &Assembly) -> Vec<Diagnostic> {
    let mut found = Vec::new();
    for (index, dimension) in assembly.dimensions.iter().enumerate() {
        let material = &assembly.part(dimension.part).material;
        let names = [&material.name, &material.title, &material.family];
        let ptfe = names.iter().any(|name| name.to_lowercase().contains("ptfe"));
        let (low, high) = PTFE_TRANSITION;
        let inside = (low..=high).contains(&dimension.reference);
        let expands = dimension.form != Form::Angle && dimension.geometric.is_none();
        if ptfe && inside && expands {
            let path = assembly.path(DimensionId(index as u32));
            found.push(
                Diagnostic::new(
                    Code::PtfeTransition,
                    dimension.line,
                    format!(
                        "`{path}` is stated between 18 °C and 21 °C, where PTFE changes its length"
                    ),
                )
                .label(assembly.part(dimension.part).material_span, "the material")
                .help("measure and state it above the transition: `at 23 degC`"),
            );
        }
    }
    found
}
