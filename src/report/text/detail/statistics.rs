//! What statistics say of a requirement, and of all of them together.

use crate::findings::number::{Round, difference_with_unit, digits, share, with_unit};
use crate::report::look::{Look, Role};
use crate::report::text::paragraph;
use crate::report::{Case, FailingShare, Statistics};

/// Second order is worth a line where it moves the mean, or changes sigma, by more than this share
/// of sigma.
const WORTH_SAYING: f64 = 0.01;

/// Interaction is worth a line from this share of the variance on.
const LEAST_INTERACTION: f64 = 0.0005;
/// Shares below this are not told apart.
const LEAST_SHARE: f64 = 1e-18;

/// Writes mean, sigma, capability and the failing share of a requirement.
pub(super) fn render(out: &mut String, case: &Case, s: &Statistics, look: Look) {
    let mean = with_unit(s.mean, case.unit, Round::Nearest);
    let sigma = difference_with_unit(s.sigma, case.unit, Round::Up);
    let text = format!("in statistics mean {mean}, sigma {sigma}; {}", capability(s));
    paragraph(out, 2, &text, Role::Plain, look);
    let (mean, sigma) = s.second_order;
    let differs = (sigma - s.sigma).abs().max((mean - s.mean).abs()) > WORTH_SAYING * s.sigma;
    if mean.is_finite() && differs {
        let mean = with_unit(mean, case.unit, Round::Nearest);
        let sigma = difference_with_unit(sigma, case.unit, Round::Up);
        let text = format!("to second order mean {mean}, sigma {sigma}");
        paragraph(out, 2, &text, Role::Plain, look);
    }
    if let Some(interaction) = s.interaction.filter(|i| i.abs() >= LEAST_INTERACTION) {
        let text = format!("interaction makes {} of the variance", share(interaction));
        paragraph(out, 2, &text, Role::Plain, look);
    }
    if s.assumed {
        let text = "ASSUMED: sizes without a stated spread are normal, centred, limits at 3 sigma";
        paragraph(out, 2, text, Role::Warn, look);
    }
}

/// Capability index and failing share in words.
pub(in crate::report::text) fn capability(s: &Statistics) -> String {
    let cpk = s.cpk.map_or_else(String::new, |c| format!("Cpk {}, ", digits(c, 2, Round::Down)));
    format!("{cpk}{} fail", failing(&s.failing))
}

/// A share of assemblies with what it is known to lie between.
pub(in crate::report::text) fn failing(f: &FailingShare) -> String {
    let of = share_of_assemblies;
    let (least, greatest) = (of(f.interval.0), of(f.interval.1));
    match f.draws {
        Some(draws) => format!(
            "{} of assemblies ({least} .. {greatest} at 99 % confidence, {draws} draws)",
            of(f.share)
        ),
        None if f.share > 0.0 && f.share < LEAST_SHARE => {
            "fewer than 1e-18 of assemblies".to_string()
        }
        None if f.share == 0.0 => "no assemblies".to_string(),
        None if least != greatest => format!("{least} .. {greatest} of assemblies"),
        None => format!("{} of assemblies", of(f.share)),
    }
}

/// A small share as people say it: in per cent, in parts per million, else as a power of ten.
/// Rounded up, so that no share looks smaller than it is.
fn share_of_assemblies(x: f64) -> String {
    match x {
        _ if x >= 1e-3 => format!("{} %", digits(x * 1e2, 3, Round::Up)),
        _ if x >= 1e-9 => format!("{} ppm", digits(x * 1e6, 4, Round::Up)),
        _ if x == 0.0 => "0".to_string(),
        _ => format!("{x:.2e}"),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn shares_read_as_people_say_them() {
        let exact = |share| FailingShare { share, interval: (share, share), draws: None };
        assert_eq!(failing(&exact(0.023_194)), "2.320 % of assemblies");
        assert_eq!(failing(&exact(3.24e-5)), "32.4000 ppm of assemblies");
        assert_eq!(failing(&exact(0.0)), "no assemblies");
        assert_eq!(failing(&exact(1e-20)), "fewer than 1e-18 of assemblies");
        let drawn = FailingShare { share: 0.25, interval: (0.24, 0.26), draws: Some(1000) };
        assert_eq!(
            failing(&drawn),
            "25.000 % of assemblies (24.000 % .. 26.000 % at 99 % confidence, 1000 draws)"
        );
    }
}
