//! Tests of the unit-scope rule: what is read, and what is refused with both readings.

use super::*;
use crate::resolve::file::{FileError, Files};
use crate::source::{Source, Sources};

struct NoFiles;

impl Files for NoFiles {
    fn read(&self, _: &str) -> Result<Vec<u8>, FileError> {
        Err(FileError::Missing)
    }
}

/// Splits `85 ±3 K` by hand at blanks: numbers, signs and units, as the syntax room would.
struct Words<'t> {
    text: &'t str,
    at: usize,
}

impl Words<'_> {
    fn skip(&mut self) {
        while self.text[self.at..].starts_with(' ') {
            self.at += 1;
        }
    }

    fn span(&self, start: usize) -> Span {
        Span::new(FileId(0), start, self.at)
    }

    fn scalar(&mut self) -> tree::Scalar {
        self.skip();
        let start = self.at;
        let rest = &self.text[start..];
        let mut end = rest.len();
        for (i, c) in rest.char_indices() {
            let range = rest[i..].starts_with("..");
            if range || !(c.is_ascii_digit() || c == '.' || (i == 0 && "+-".contains(c))) {
                end = i;
                break;
            }
        }
        self.at += end;
        let text = rest[..end].to_string();
        let number = tree::Number { value: text.parse().unwrap(), text, span: self.span(start) };
        let number_end = self.at;
        self.skip();
        let start = self.at;
        let rest = &self.text[start..];
        let stop = rest.find(|c: char| " ±+/.".contains(c) && c != '/').unwrap_or(rest.len());
        let stop = match rest.find('/') {
            Some(i) if i < stop && !rest[i + 1..].starts_with(|c: char| c.is_alphabetic()) => i,
            _ => stop,
        };
        let word = &rest[..stop];
        if word.is_empty() || word.starts_with(|c: char| c.is_ascii_digit() || c == '-') {
            self.at = number_end;
            return tree::Scalar { number, unit: None };
        }
        self.at += stop;
        let unit = tree::Name::new(word.to_string(), self.span(start));
        tree::Scalar { number, unit: Some(unit) }
    }

    fn quantity(&mut self) -> tree::Quantity {
        let value = self.scalar();
        self.skip();
        let start = self.at;
        let rest = &self.text[self.at..];
        if rest.starts_with("..") {
            self.at += 2;
            let high = self.scalar();
            let span = self.span(0);
            return tree::Quantity::Range(tree::Range { low: value, high, span });
        }
        let tolerance = if rest.is_empty() {
            None
        } else if let Some(after) = rest.strip_prefix('±') {
            self.at += rest.len() - after.len();
            let t = self.scalar();
            Some(tree::Tolerance {
                deviation: tree::Deviation::Symmetric(t),
                span: self.span(start),
            })
        } else {
            let a = self.scalar();
            self.at += 1;
            let b = self.scalar();
            Some(tree::Tolerance {
                deviation: tree::Deviation::Limits(a, b),
                span: self.span(start),
            })
        };
        tree::Quantity::Group(tree::Group { value, tolerance, span: self.span(0) })
    }
}

/// Reads a quantity in a file of millimetres and degrees Celsius.
fn read(text: &str, expect: Expect) -> Result<Scenario, Diagnostic> {
    let mut sources = Sources::default();
    sources.add(Source::new("a.gap", text));
    let mut cx = Context::new(&mut sources, &NoFiles);
    let quantity = Words { text, at: 0 }.quantity();
    match scenario(&mut cx, &quantity, None, expect) {
        Some(value) => {
            assert_eq!(cx.diagnostics, []);
            Ok(value)
        }
        None => Err(cx.diagnostics.remove(0)),
    }
}

#[track_caller]
fn assert_reads(text: &str, expect: Expect, ends: (f64, f64)) {
    let value = read(text, expect).unwrap_or_else(|d| panic!("{text}: {}", d.message));
    let near = |a: f64, b: f64| (a - b).abs() <= 4e-16 * b.abs().max(a.abs());
    assert!(
        near(value.least, ends.0) && near(value.greatest, ends.1),
        "{text}: {} .. {}",
        value.least,
        value.greatest
    );
}

#[track_caller]
fn assert_refused(text: &str, expect: Expect, code: Code) -> Diagnostic {
    let finding = read(text, expect).expect_err(text);
    assert_eq!(finding.code, code, "{text}: {}", finding.message);
    finding
}

#[test]
fn a_bare_number_takes_the_unit_of_the_file() {
    assert_reads("58 ±0.05", Expect::Size, (0.05795, 0.05805));
    assert_reads("58.00 .. 58.05", Expect::Size, (0.058, 0.05805));
    assert_reads("85 ±3", Expect::Temperature, (355.15, 361.15));
    assert_reads("12", Expect::Difference, (12.0, 12.0));
    assert_reads("0.3 ±0.02", Expect::Of(Kind::PURE), (0.28, 0.32));
}

#[test]
fn a_unit_after_the_first_number_governs_its_group() {
    assert_reads("2.5 in ±0.001", Expect::Size, (0.0634746, 0.0635254));
    assert_reads("2 in .. 3", Expect::Size, (0.0508, 0.0762));
    assert_reads("58 mm ±50 um", Expect::Size, (0.05795, 0.05805));
    assert_reads("58 mm +50 um/-20", Expect::Size, (0.05798, 0.05805));
    assert_reads("58 mm +0.05/-20 um", Expect::Size, (0.05798, 0.05805));
    assert_reads("293 K ±3", Expect::Temperature, (290.0, 296.0));
}

#[test]
fn a_unit_at_the_end_governs_all_where_there_is_no_other() {
    let thickness = Expect::Of(Kind::LENGTH);
    assert_reads("10 ±2 um", thickness, (8e-6, 12e-6));
    assert_reads("23.4 ±0.3 ppm/K", Expect::Of(Kind::EXPANSION), (23.1e-6, 23.7e-6));
    assert_reads("5 .. 9 K", Expect::Difference, (5.0, 9.0));
    assert_reads("58 ±0.05 mm", Expect::Size, (0.05795, 0.05805));
    assert_reads("-40 .. 85 degC", Expect::Temperature, (233.15, 358.15));
}

#[test]
fn a_foreign_unit_after_the_tolerance_is_refused_with_both_readings() {
    let finding = assert_refused("58 ±50 um", Expect::Size, Code::UnitScope);
    assert_eq!(finding.help.as_deref(), Some("write `58 mm ±50 um` or `58 um ±50`"));
    let finding = assert_refused("85 ±3 K", Expect::Temperature, Code::UnitScope);
    assert_eq!(finding.help.as_deref(), Some("write `85 degC ±3 K` or `85 K ±3`"));
    let finding = assert_refused("-40 .. 85 K", Expect::Temperature, Code::UnitScope);
    assert_eq!(finding.help.as_deref(), Some("write `-40 K .. 85 K` or `-40 degC .. 85 K`"));
    assert_refused("0.09 ±0.01 %", Expect::Strain, Code::UnitScope);
}

#[test]
fn per_cent_is_a_share_of_what_is_not_itself_in_per_cent() {
    assert_reads("69 GPa ±2 %", Expect::Of(Kind::STRESS), (67.62e9, 70.38e9));
    assert_reads("0.15 ±10 %", Expect::Of(Kind::PURE), (0.135, 0.165));
    assert_reads("0.8 % ±0.15", Expect::Strain, (0.0065, 0.0095));
    assert_reads("-4150 ppm ±1 %", Expect::Strain, (-4191.5e-6, -4108.5e-6));
    assert_refused("85 ±3 %", Expect::Temperature, Code::WrongKind);
}

#[test]
fn deviations_may_stand_in_either_order() {
    assert_reads("58 +0.05/-0.02", Expect::Size, (0.05798, 0.05805));
    assert_reads("58 -0.02/+0.05", Expect::Size, (0.05798, 0.05805));
    assert_reads("58 -0.02/-0.05", Expect::Size, (0.05795, 0.05798));
    assert_reads("58 0/-0.05", Expect::Size, (0.05795, 0.058));
    assert_refused("58 +0.02/+0.02", Expect::Size, Code::DeviationsEqual);
}

#[test]
fn what_is_no_such_quantity_is_refused() {
    let finding = assert_refused("42 K", Expect::Size, Code::WrongKind);
    assert_eq!(finding.help.as_deref(), Some("a class needs its grade, as `K6`"));
    assert_refused("10 ±2", Expect::Of(Kind::LENGTH), Code::UnitMissing);
    assert_refused("5 mil", Expect::Size, Code::AmbiguousUnit);
    let finding = assert_refused("5 mpa", Expect::Of(Kind::STRESS), Code::UnknownUnit);
    assert_eq!(finding.help.as_deref(), Some("did you mean `MPa`?"));
    assert_refused("-300", Expect::Temperature, Code::BelowAbsoluteZero);
    assert_refused("85 .. -40", Expect::Temperature, Code::LimitsReversed);
}

/// The limits of a requirement as read, least and greatest.
fn limits_of(limit: &str, kind: Kind) -> (Option<f64>, Option<f64>) {
    let text = format!("gap g = 1 mm {{ require {limit} }}");
    let mut sources = Sources::default();
    let file = sources.add(Source::new("a.gap", text.clone()));
    let parsed = crate::syntax::parse(&text, file);
    assert_eq!(parsed.diagnostics, []);
    let Some(tree::Statement::Gap(gap)) = parsed.tree.statements.first() else { panic!("a gap") };
    let mut cx = Context::new(&mut sources, &NoFiles);
    let read = limits(&mut cx, &gap.requirements[0].limit, kind).expect(limit);
    (read.lower.map(|l| l.value), read.upper.map(|l| l.value))
}

#[test]
fn limits_follow_the_file_and_shares_are_pure() {
    assert_eq!(limits_of(">= 0.04", Kind::LENGTH), (Some(4e-5), None));
    assert_eq!(limits_of("0.05 .. 0.5", Kind::LENGTH), (Some(5e-5), Some(5e-4)));
    assert_eq!(limits_of("stress in screw <= 80 % of yield", Kind::STRESS), (None, Some(0.8)));
    assert_eq!(limits_of("torque >= 12 N*m", Kind::TORQUE), (Some(12.0), None));
    let (_, upper) = limits_of("<= 3 deg", Kind::ANGLE);
    assert!(upper.is_some_and(|angle| (angle - 3.0_f64.to_radians()).abs() < 1e-15));
    let (lower, upper) = limits_of("3 ±0.5", Kind::LENGTH);
    assert_eq!((lower, upper), (Some(0.0025), Some(0.0035)));
}
