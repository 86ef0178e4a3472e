//! Limits of size of a hole, a shaft or both (ISO 286-1) as text; at a temperature too, where an
//! account of the same pair at that temperature is at hand.

use super::look::{Look, Role};
use super::wrap::{blanks, left, right, visible, width};
use super::{Account, Figure};
use crate::findings::number::{Round, digits, shown};
use crate::standards::Micrometres;
use crate::standards::iso286::{Class, Deviations, Fit, Kind};

/// A nominal size with one class or two.
#[derive(Debug, Clone, Copy)]
pub struct Limits {
    /// Nominal size, mm.
    pub nominal: f64,
    /// The hole's class with its limit deviations.
    pub hole: Option<(Class, Deviations)>,
    /// The shaft's.
    pub shaft: Option<(Class, Deviations)>,
}

/// Digits after the point: limits of size are stated to the tenth of a micrometre.
const DECIMALS: usize = 4;
/// Columns of a figure.
const FIGURE_COLUMNS: usize = 11;

/// The limits at the reference temperature.
pub fn at_reference(limits: &Limits, look: Look) -> String {
    let classes: Vec<String> =
        [limits.hole, limits.shaft].into_iter().flatten().map(|(c, _)| c.to_string()).collect();
    let fit = limits.fit();
    let character = fit.map_or_else(String::new, |f| format!(", {}", f.character()));
    let title = format!("dia {} {}{character}", limits.nominal, classes.join("/"));
    let clause = "ISO 286-1, at 20 °C";
    let gap = look.width.saturating_sub(width(&title) + width(clause)).max(2);
    let mut out = format!(
        "{}{}{}\n\n",
        look.paint(Role::Title, &title),
        blanks(gap),
        look.paint(Role::Quiet, clause)
    );
    out.push_str(&heads(limits.name_columns(), "deviations, µm", look));
    for (class, deviations) in [limits.hole, limits.shaft].into_iter().flatten() {
        let name = if class.kind == Kind::Hole { "hole" } else { "shaft" };
        let size = |d: Micrometres| limits.nominal + d.mm();
        let (lower, upper) = (size(deviations.lower), size(deviations.upper));
        let figures = [lower, 0.5 * (lower + upper), upper];
        let aside = format!("{} / {}", signed(deviations.upper), signed(deviations.lower));
        out.push_str(&row(
            &format!("{name} {class}"),
            limits.name_columns(),
            figures,
            &aside,
            look,
        ));
    }
    if let Some(fit) = fit {
        let (least, greatest) = (fit.least().mm(), fit.greatest().mm());
        let figures = [least, 0.5 * (least + greatest), greatest];
        out.push_str(&row(
            "clearance",
            limits.name_columns(),
            figures,
            &interference(least, greatest),
            look,
        ));
    }
    out
}

/// The limits at each other condition of an account that names its figures `hole`, `shaft` and
/// `pair`; `pair` says what of.
pub fn at_conditions(limits: &Limits, pair: &str, account: &Account, look: Look) -> String {
    let mut out = String::new();
    for (condition, written) in account.conditions.iter().filter(|(name, _)| name != "reference") {
        let unit = if written.contains(char::is_alphabetic) { "" } else { " °C" };
        let title = visible(&format!("{pair} at {written}{unit}"));
        out.push_str(&format!("\n{}\n", look.paint(Role::Title, &title)));
        out.push_str(&heads(limits.name_columns(), "", look));
        let here = account.figures.iter().filter(|f| f.condition.as_ref() == Some(condition));
        for figure in here {
            let name = if figure.kind == "fit" { "clearance" } else { &figure.subject };
            out.push_str(&of_figure(name, limits.name_columns(), figure, look));
        }
    }
    out
}

impl Limits {
    /// The fit of the pair, where there are two.
    pub fn fit(&self) -> Option<Fit> {
        Some(Fit { hole: self.hole?.1, shaft: self.shaft?.1 })
    }

    fn name_columns(&self) -> usize {
        "clearance".len() + 2
    }
}

fn heads(name: usize, aside: &str, look: Look) -> String {
    let mut line = blanks(name);
    for head in ["least", "mean", "greatest"] {
        line.push_str(&right(head, FIGURE_COLUMNS));
    }
    format!("{}\n", look.paint(Role::Quiet, format!("{line}   {aside}").trim_end()))
}

fn row(name: &str, columns: usize, figures: [f64; 3], aside: &str, look: Look) -> String {
    let rounded = [
        digits(figures[0], DECIMALS, Round::Down),
        digits(figures[1], DECIMALS, Round::Nearest),
        digits(figures[2], DECIMALS, Round::Up),
    ];
    line(name, columns, &rounded, aside, look)
}

fn line(name: &str, columns: usize, figures: &[String; 3], aside: &str, look: Look) -> String {
    let mut line = left(name, columns);
    for figure in figures {
        line.push_str(&right(figure, FIGURE_COLUMNS));
    }
    format!("{}\n", format!("{line}   {}", look.paint(Role::Quiet, aside)).trim_end())
}

fn of_figure(name: &str, columns: usize, figure: &Figure, look: Look) -> String {
    let unit = figure.unit;
    let rounded = [
        shown(figure.least, unit, Round::Down),
        shown(figure.mean, unit, Round::Nearest),
        shown(figure.greatest, unit, Round::Up),
    ];
    let aside = match figure.character {
        Some(character) => {
            let of = interference(unit.from_si(figure.least), unit.from_si(figure.greatest));
            if of.is_empty() { character.to_string() } else { format!("{character}, {of}") }
        }
        None => String::new(),
    };
    line(name, columns, &rounded, &aside, look)
}

/// A negative clearance as the interference it is, mm.
fn interference(least: f64, greatest: f64) -> String {
    if least >= 0.0 {
        return String::new();
    }
    let most = digits(-least, DECIMALS, Round::Up);
    if greatest >= 0.0 {
        format!("interference up to {most}")
    } else {
        format!("interference {} .. {most}", digits(-greatest, DECIMALS, Round::Down))
    }
}

/// A deviation with its sign; zero has none.
fn signed(deviation: Micrometres) -> String {
    let um = deviation.um();
    if um > 0.0 { format!("+{um}") } else { format!("{}", um + 0.0) }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_clearance_fit_reads_as_a_handbook_states_it() {
        // ISO 286-2:2010, over 30 up to 50 mm, from memory: H7 0 … +25 µm, g6 −25 … −9 µm.
        let class = |text| Class::parse(text).unwrap();
        let with = |text| (class(text), class(text).limits(42.0).unwrap());
        let limits = Limits { nominal: 42.0, hole: Some(with("H7")), shaft: Some(with("g6")) };
        insta::assert_snapshot!(at_reference(&limits, Look::PLAIN));
    }

    #[test]
    fn an_interference_is_said() {
        assert_eq!(interference(-0.05, -0.01), "interference 0.0100 .. 0.0500");
        assert_eq!(interference(-0.05, 0.01), "interference up to 0.0500");
        assert_eq!(interference(0.0, 0.01), "");
    }
}
