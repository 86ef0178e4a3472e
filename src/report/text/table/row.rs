//! One line of the table: figures put into words.

use crate::findings::Standing;
use crate::findings::number::{
    Round, decimals, difference, difference_with_unit, digits, is_nothing,
};
use crate::report::text::detail::statistics::brief;
use crate::report::wrap::visible;
use crate::report::{Account, Case, Figure};
use crate::units::Kind;

/// Most digits that tiny figures get beyond those of their unit.
const MOST_MORE: usize = 4;

/// One line of figures, ready but for its alignment. Empty figures are not known.
pub(super) struct Row {
    pub(super) name: String,
    pub(super) least: String,
    pub(super) mean: String,
    pub(super) greatest: String,
    pub(super) margin: String,
    pub(super) standing: Option<Standing>,
    pub(super) band: Option<(f64, f64, f64)>,
    pub(super) aside: String,
}

/// The row of a figure, judged by a requirement if there is one.
pub(super) fn row(account: &Account, figure: &Figure, case: Option<&Case>) -> Row {
    let unit = figure.unit;
    let places = places(account, figure);
    let shown = |si: f64, round| digits(unit.from_si(si), places, round);
    let mut name = figure.condition.clone().unwrap_or_else(|| "any".to_string());
    name.extend(figure.members.iter().map(|member| format!(", {}", member.shown())));
    let margin = case.map(|c| c.margin).filter(|m| !m.is_nan());
    // A row is about what decides: the proven bounds, or the spread from assembly to assembly.
    let statistics = case.filter(|c| c.statistical).and_then(|c| c.statistics.as_ref());
    let (least, mean, greatest) = match statistics.filter(|s| s.mean.is_finite()) {
        Some(s) => {
            let (low, high) =
                (s.low.0 - s.shown_sigmas * s.low.1, s.high.0 + s.shown_sigmas * s.high.1);
            (low, s.mean, high)
        }
        None => (figure.least, figure.mean, figure.greatest),
    };
    // Nothing at all is a plain 0 with no strip of its own scale; a length has a drawing's digits.
    let nothing = !matches!(unit.kind, Kind::TEMPERATURE | Kind::LENGTH)
        && [least, mean, greatest].iter().all(|si| is_nothing(*si, unit));
    let (least, mean, greatest) = if nothing { (0.0, 0.0, 0.0) } else { (least, mean, greatest) };
    let shown = |si: f64, round| if nothing { "0".to_string() } else { shown(si, round) };
    let aside = match statistics {
        Some(s) => brief(s),
        None => aside(figure),
    };
    Row {
        name: visible(&name),
        least: shown(least, Round::Down),
        mean: shown(mean, Round::Nearest),
        greatest: shown(greatest, Round::Up),
        margin: margin
            .map_or_else(String::new, |m| digits(unit.difference_from_si(m), places, Round::Down)),
        standing: case.map(|c| c.standing),
        band: Some((least, mean, greatest)),
        aside,
    }
}

/// Digits after the point for the figures of one quantity: those of the unit, and more where all of
/// them are so small that nothing would be seen.
fn places(account: &Account, figure: &Figure) -> usize {
    let usual = decimals(figure.unit);
    if figure.unit.kind == Kind::TEMPERATURE {
        return usual;
    }
    let alike = account.figures.iter().filter(|f| {
        f.subject == figure.subject && f.quantity == figure.quantity && f.unit == figure.unit
    });
    let size = alike
        .flat_map(|f| [f.least, f.greatest])
        .filter(|si| !is_nothing(*si, figure.unit))
        .map(|si| figure.unit.from_si(si).abs())
        .filter(|size| size.is_finite())
        .fold(0.0, f64::max);
    let mut places = usual;
    // A length keeps the digits of a drawing as long as any are seen; of others the greatest has three.
    let seen = if figure.unit.kind == Kind::LENGTH { 10.0 } else { 100.0 };
    while size > 0.0 && size * libm::pow(10.0, places as f64) < seen && places < usual + MOST_MORE {
        places += 1;
    }
    places
}

/// The row of a requirement whose figure could not be computed.
pub(super) fn unknown(case: &Case) -> Row {
    Row {
        name: visible(case.condition.as_deref().unwrap_or("any")),
        least: String::new(),
        mean: String::new(),
        greatest: String::new(),
        margin: String::new(),
        standing: Some(case.standing),
        band: None,
        aside: String::new(),
    }
}

/// A negative clearance as the interference it is, and the reverse.
fn aside(figure: &Figure) -> String {
    let other = match figure.quantity.as_str() {
        "clearance" => "interference",
        "radial clearance" => "radial interference",
        "interference" => "clearance",
        _ => return String::new(),
    };
    // What prints as zero is no interference worth a line.
    let least_digit = libm::pow(10.0, -(decimals(figure.unit) as f64));
    if figure.unit.from_si(figure.least) > -least_digit {
        return String::new();
    }
    let most = difference_with_unit(-figure.least, figure.unit, Round::Up);
    if figure.greatest >= 0.0 {
        format!("{other} up to {most}")
    } else {
        let fewest = difference(-figure.greatest, figure.unit, Round::Down);
        format!("{other} {fewest} .. {most}")
    }
}
