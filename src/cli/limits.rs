//! `limits`: limits of size and the fit of ISO 286 classes, at reference and at a temperature.

use super::console::Console;
use super::files::Place;
use super::pipeline::{Everything, Wish, check};
use super::refusal::{Outcome, Refusal};
use crate::diagnostic::Severity;
use crate::evaluate::Options;
use crate::report::diagnostic;
use crate::report::limits::{Limits, at_conditions, at_reference};
use crate::standards::iso286::{Class, Deviations, Kind};
use clap::Args;

/// Arguments of `limits`.
#[derive(Debug, Args)]
#[command(after_help = "Examples:\n  gapkeep limits 42 H7/g6\n  gapkeep limits 42 K6\n  \
    gapkeep limits 42 H7/g6 --materials aluminium_6061_t6,steel_c45 --at -40\n  \
    gapkeep limits 42 H7/g6 --materials aluminium_6061_t6,steel_c45 --at '-40 .. 85'")]
pub(super) struct LimitsArguments {
    /// Nominal size, mm.
    #[arg(value_name = "SIZE", allow_negative_numbers = true)]
    nominal: String,
    /// A class, or hole and shaft such as `H7/g6`.
    #[arg(value_name = "CLASS")]
    classes: String,
    /// Materials of hole and shaft, by their names in the library.
    #[arg(long, value_name = "HOLE,SHAFT", requires = "at")]
    materials: Option<String>,
    /// A temperature in °C, or a range of them.
    #[arg(long, value_name = "TEMPERATURE", requires = "materials", allow_hyphen_values = true)]
    at: Option<String>,
}

/// Shows limits of size.
pub(super) fn run(
    arguments: &LimitsArguments,
    console: &mut Console<'_>,
) -> Result<Outcome, Refusal> {
    let limits = read(arguments)?;
    let look = console.look();
    let mut text = at_reference(&limits, look);
    if let (Some(materials), Some(at)) = (&arguments.materials, &arguments.at) {
        let spec = spec(&limits, &arguments.classes, materials, at)?;
        let pair = materials.replacen(',', " around ", 1);
        let place = Place { root: console.environment().folder.clone(), name: None };
        let wish = Wish { options: Options::default(), today: console.environment().today.clone() };
        let checked = check(&place, spec.as_bytes(), &wish, &Everything);
        let Some(account) = &checked.account else {
            // The reader knows nothing of the spec made here: only the sentences help.
            let first = checked.findings.iter().find(|d| d.severity == Severity::Error);
            return Err(first.map_or_else(
                || Refusal::new("the pair cannot be computed", "check the temperature"),
                |d| Refusal { message: d.message.clone(), help: d.help.clone() },
            ));
        };
        text.push_str(&at_conditions(&limits, &pair, account, look));
        for finding in checked.findings.iter().filter(|d| d.severity > Severity::Note) {
            text.push_str(&format!("\n{}", diagnostic::sentence(finding, look)));
        }
    }
    console.print(text.as_bytes());
    Ok(Outcome::Holds)
}

fn read(arguments: &LimitsArguments) -> Result<Limits, Refusal> {
    let size = arguments.nominal.trim_end_matches("mm").trim();
    let nominal =
        size.parse::<f64>().ok().filter(|n| n.is_finite() && *n > 0.0).ok_or_else(|| {
            Refusal::new(
                format!("`{}` is no nominal size", arguments.nominal),
                "write it in millimetres, as `42` or `12.5`",
            )
        })?;
    let mut limits = Limits { nominal, hole: None, shaft: None };
    let written: Vec<&str> = arguments.classes.split('/').collect();
    if written.len() > 2 {
        return Err(Refusal::new(
            format!("`{}` names more than a hole and a shaft", arguments.classes),
            "write one class, as `K6`, or two, as `H7/g6`",
        ));
    }
    for text in written {
        let (class, deviations) = class(text.trim(), nominal)?;
        let side = match class.kind {
            Kind::Hole => &mut limits.hole,
            Kind::Shaft => &mut limits.shaft,
        };
        if side.replace((class, deviations)).is_some() {
            return Err(Refusal::new(
                format!("`{}` names two classes of one side", arguments.classes),
                "a hole's class is written in upper case, a shaft's in lower case: `H7/g6`",
            ));
        }
    }
    Ok(limits)
}

fn class(text: &str, nominal: f64) -> Result<(Class, Deviations), Refusal> {
    let class =
        Class::parse(text).map_err(|wrong| Refusal::new(wrong.to_string(), wrong.help()))?;
    let deviations = class.limits(nominal).map_err(|refused| {
        let near: Vec<String> =
            refused.alternatives.iter().take(4).map(|c| format!("`{c}`")).collect();
        let help = if near.is_empty() {
            "ISO 286-1 covers sizes over 0 up to 3150 mm".to_string()
        } else {
            format!("defined at this size: {}", near.join(", "))
        };
        Refusal::new(refused.to_string(), help)
    })?;
    Ok((class, deviations))
}

/// The pair as a spec, so that it is computed as any other.
fn spec(limits: &Limits, classes: &str, materials: &str, at: &str) -> Result<String, Refusal> {
    let (Some((hole, _)), Some((shaft, _))) = (limits.hole, limits.shaft) else {
        return Err(Refusal::new(
            format!("`{classes}` is one class, and two materials are named"),
            "write hole and shaft, as `H7/g6`",
        ));
    };
    let plain =
        |name: &str| !name.is_empty() && name.chars().all(|c| c.is_alphanumeric() || c == '_');
    let Some((of_hole, of_shaft)) =
        materials.split_once(',').filter(|(a, b)| plain(a.trim()) && plain(b.trim()))
    else {
        return Err(Refusal::new(
            format!("`{materials}` does not name two materials"),
            "name those of hole and shaft, as `aluminium_6061_t6,steel_c45`",
        ));
    };
    // Only what a temperature is written with, so that the text below stays the statement it is.
    let temperature = |c: char| c.is_ascii_alphanumeric() || " .+-±°/\u{2212}".contains(c);
    if at.is_empty() || !at.chars().all(temperature) {
        return Err(Refusal::new(
            format!("`{at}` is no temperature"),
            "write it in °C, as `-40`, `85 ±3` or `-40 .. 85`",
        ));
    }
    let nominal = limits.nominal;
    Ok(format!(
        "assembly \"limits\"\nlengths in mm\ntemperatures in degC\ncondition there {at}\n\
         part hub of {} {{ bore = dia {nominal} {hole} }}\n\
         part pin of {} {{ size = dia {nominal} {shaft} }}\n\
         result hole = hub.bore\nresult shaft = pin.size\nfit pair = pin.size in hub.bore\n",
        of_hole.trim(),
        of_shaft.trim(),
    ))
}
