//! What statistics say of a requirement, and of all of them together.

use crate::evaluate::outcome::Drawn;
use crate::findings::number::{Round, difference_with_unit, digits, with_unit};
use crate::report::look::{Look, Role};
use crate::report::text::paragraph;
use crate::report::{Case, FailingShare, Statistics, WorstLot};

/// Shares below this are not told apart.
const LEAST_SHARE: f64 = 1e-18;

/// Writes mean, sigma, capability and the failing share of a requirement.
pub(super) fn render(out: &mut String, case: &Case, s: &Statistics, look: Look) {
    let mean = with_unit(s.mean, case.unit, Round::Nearest);
    let sigma = difference_with_unit(s.sigma, case.unit, Round::Up);
    let text = format!("in statistics mean {mean}, sigma {sigma}; {}", capability(s));
    paragraph(out, 2, &text, Role::Plain, look);
    if let Some((mean, sigma)) = s.second_order {
        let mean = with_unit(mean, case.unit, Round::Nearest);
        let sigma = difference_with_unit(sigma, case.unit, Round::Up);
        let text = format!(
            "to second order mean {mean}, sigma {sigma}: the response bends within its tolerances"
        );
        paragraph(out, 2, &text, Role::Plain, look);
    }
    if let Some(worst) = &s.worst_lot {
        paragraph(out, 2, &worst_lot(worst), Role::Plain, look);
    }
    if s.assumed {
        let text = "ASSUMED: sizes without a stated spread are normal, centred, limits at 3 sigma";
        paragraph(out, 2, text, Role::Warn, look);
    }
}

/// What fails of the worst delivery, which it is, and how it was found.
fn worst_lot(worst: &WorstLot) -> String {
    let ends: Vec<String> = worst
        .at
        .iter()
        .map(|c| format!("{} {}", c.name, if c.value < 0.0 { "least" } else { "greatest" }))
        .collect();
    format!(
        "worst lot: {}{} fail, with {} (the pieces of a delivery share its lots: the greatest \
         share over the ends of their scatter)",
        index(worst.cpk),
        failing(&worst.failing),
        ends.join(", ")
    )
}

/// Capability index and failing share in words.
pub(in crate::report::text) fn capability(s: &Statistics) -> String {
    format!("{}{} fail", index(s.cpk), failing(&s.failing))
}

fn index(cpk: Option<f64>) -> String {
    // Where nothing varies there is no capability.
    let cpk = cpk.filter(|c| c.is_finite());
    cpk.map_or_else(String::new, |c| format!("Cpk {}, ", digits(c, 2, Round::Down)))
}

/// Both in so few words that they fit below a row of figures.
pub(in crate::report::text) fn brief(s: &Statistics) -> String {
    let Some(drawn) = s.failing.drawn else { return capability(s) };
    let cpk = index(s.cpk);
    let (least, greatest) = s.failing.interval;
    let (least, greatest) = between(least, greatest);
    let missed = match drawn.missed {
        Some(width) => format!(", wider than {}", asked(width)),
        None => String::new(),
    };
    match s.failing.share {
        0.0 => format!("{cpk}none of the assemblies drawn fail (at most {greatest}{missed})"),
        share => format!(
            "{cpk}{} of assemblies fail ({least} .. {greatest}{missed})",
            share_of_assemblies(share, Round::Nearest)
        ),
    }
}

/// A share of assemblies with what it is known to lie between.
pub(in crate::report::text) fn failing(f: &FailingShare) -> String {
    let of = share_of_assemblies;
    let (mut least, greatest) = between(f.interval.0, f.interval.1);
    if Form::of(f.interval.1).say(f.interval.0, Round::Up) == greatest {
        least.clone_from(&greatest);
    }
    match f.drawn {
        Some(drawn) if f.share == 0.0 => format!(
            "none of the assemblies drawn (at most {greatest} at 99 % confidence, {})",
            draws(&drawn)
        ),
        Some(drawn) => format!(
            "{} of assemblies ({least} .. {greatest} at 99 % confidence, {})",
            of(f.share, Round::Nearest),
            draws(&drawn)
        ),
        None if f.share > 0.0 && f.share < LEAST_SHARE => {
            "fewer than 1e-18 of assemblies".to_string()
        }
        None if f.share == 0.0 => "no assemblies".to_string(),
        None if least != greatest => format!("{least} .. {greatest} of assemblies"),
        None => format!("{greatest} of assemblies"),
    }
}

/// The share of assemblies that meet everything everywhere, and the share that do not.
pub(in crate::report::text) fn first_pass(f: &FailingShare) -> String {
    // The yield is 1 minus a share that is rounded up.
    let yields = match f.share {
        // None seen in so many draws says no more than this.
        0.0 if f.drawn.is_some() => {
            format!("at least {} %", digits((1.0 - f.interval.1) * 100.0, 4, Round::Down))
        }
        share if share < 1e-6 => "above 99.9999 %".to_string(),
        share => format!("{} %", digits((1.0 - share) * 100.0, 4, Round::Down)),
    };
    format!("first-pass yield {yields}: {} break some requirement at some condition", failing(f))
}

/// How many assemblies were drawn, of which seed, and whether that was enough.
fn draws(drawn: &Drawn) -> String {
    let made = format!("{} of seed {}", number_of_draws(drawn.draws), drawn.seed);
    match drawn.missed {
        Some(width) => {
            format!("{made}, the most allowed; wider than the {} asked for", asked(width))
        }
        None => made,
    }
}

/// A width as it was asked for.
fn asked(width: f64) -> String {
    // Per cent to twelve digits, so that 0.0007 is 0.07 and not 0.06999999999999999.
    format!("{} %", libm::round(width * 1e14) / 1e12)
}

/// Millions in a word where nothing is lost.
fn number_of_draws(draws: u64) -> String {
    const TENTH: u64 = 100_000;
    match draws {
        _ if draws >= 10 * TENTH && draws.is_multiple_of(10 * TENTH) => {
            format!("{} million draws", draws / (10 * TENTH))
        }
        _ if draws >= 10 * TENTH && draws.is_multiple_of(TENTH) => {
            format!("{}.{} million draws", draws / (10 * TENTH), draws / TENTH % 10)
        }
        _ => format!("{draws} draws"),
    }
}

/// How people say a share: in per cent, in parts per million, else as a power of ten.
#[derive(Debug, Clone, Copy)]
enum Form {
    Percent,
    /// With so many digits after the point.
    Ppm(usize),
    Power,
}

impl Form {
    fn of(share: f64) -> Form {
        match share {
            _ if share >= 1e-3 || share == 0.0 => Form::Percent,
            _ if share >= 1e-8 => {
                // Four digits that count.
                let ppm = share * 1e6;
                let decimals = (0..6).find(|&d| ppm * libm::pow(10.0, d as f64) >= 1000.0);
                Form::Ppm(decimals.unwrap_or(6))
            }
            _ => Form::Power,
        }
    }

    fn say(self, share: f64, round: Round) -> String {
        match self {
            _ if share == 0.0 => "0".to_string(),
            Form::Percent => format!("{} %", digits(share * 1e2, 3, round)),
            Form::Ppm(decimals) => format!("{} ppm", digits(share * 1e6, decimals, round)),
            Form::Power => format!("{share:.2e}"),
        }
    }
}

fn share_of_assemblies(x: f64, round: Round) -> String {
    Form::of(x).say(x, round)
}

/// Both ends of what a share lies between, in the form of the greater.
fn between(least: f64, greatest: f64) -> (String, String) {
    let form = Form::of(greatest);
    (form.say(least, Round::Down), form.say(greatest, Round::Up))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn shares_read_as_people_say_them() {
        let exact = |share| FailingShare { share, interval: (share, share), drawn: None };
        assert_eq!(failing(&exact(0.023_194)), "2.320 % of assemblies");
        assert_eq!(failing(&exact(3.24e-5)), "32.40 ppm of assemblies");
        assert_eq!(failing(&exact(0.0)), "no assemblies");
        let known = FailingShare { share: 2e-8, interval: (8.87e-9, 2.759e-8), drawn: None };
        assert_eq!(failing(&known), "0.00887 ppm .. 0.02759 ppm of assemblies");
        assert_eq!(failing(&exact(1e-20)), "fewer than 1e-18 of assemblies");
        let drawn = |draws, missed| FailingShare {
            share: 0.25,
            interval: (0.24, 0.260_000_1),
            drawn: Some(Drawn { draws, seed: 7, missed }),
        };
        assert_eq!(
            failing(&drawn(1000, None)),
            "25.000 % of assemblies (24.000 % .. 26.001 % at 99 % confidence, 1000 draws of seed 7)"
        );
        assert_eq!(
            failing(&drawn(1_500_000, Some(1e-4))),
            "25.000 % of assemblies (24.000 % .. 26.001 % at 99 % confidence, 1.5 million draws of \
             seed 7, the most allowed; wider than the 0.01 % asked for)"
        );
    }

    #[test]
    fn a_yield_says_no_more_than_is_known() {
        let of = |share, interval, drawn: Option<u64>| {
            let drawn = drawn.map(|draws| Drawn { draws, seed: 1, missed: None });
            first_pass(&FailingShare { share, interval, drawn })
        };
        let behind = " break some requirement at some condition";
        assert_eq!(
            of(0.0, (0.0, 5.3e-5), Some(100_000)).strip_suffix(behind),
            Some(
                "first-pass yield at least 99.9947 %: none of the assemblies drawn (at most 53.00 \
                 ppm at 99 % confidence, 100000 draws of seed 1)"
            )
        );
        assert_eq!(
            of(3e-9, (3e-9, 3e-9), None).strip_suffix(behind),
            Some("first-pass yield above 99.9999 %: 3.00e-9 of assemblies")
        );
        assert_eq!(
            of(0.012_345_67, (0.012, 0.0125), None).strip_suffix(behind),
            Some("first-pass yield 98.7654 %: 1.200 % .. 1.250 % of assemblies")
        );
    }

    #[test]
    fn few_digits_are_kept_of_a_small_share() {
        let of = |share| share_of_assemblies(share, Round::Up);
        assert_eq!(of(9.999e-4), "999.9 ppm");
        assert_eq!(of(1.234_56e-6), "1.235 ppm");
        assert_eq!(of(1.2e-8), "0.01200 ppm");
        assert_eq!(of(1.2e-9), "1.20e-9");
    }
}
