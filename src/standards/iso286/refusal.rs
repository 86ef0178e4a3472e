//! Why a class has no limits at a size, with the clause, and what is defined nearby.

use super::class::{Class, Grade, Letters};
use super::deviation_table::distance;
use super::limits::classes_at;
use super::step::{INTERMEDIATE, Step};
use std::fmt;

/// A class that ISO 286-1 does not define at a nominal size.
#[derive(Debug, Clone, PartialEq)]
pub struct NotDefined {
    /// The class asked for.
    pub class: Class,
    /// The nominal size, mm.
    pub nominal: f64,
    /// What stands against it.
    pub reason: Reason,
    /// Classes defined at this size, nearest first: the same letters at other grades, then the
    /// neighbouring letters at the same grade.
    pub alternatives: Vec<Class>,
}

/// What stands against a class at a size.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Reason {
    /// The size is not over 0 up to 3150 mm.
    SizeOutside,
    /// The grade has no standard tolerance at this size.
    GradeAtSize,
    /// The letters have no fundamental deviation at this size, but have one over `over` mm up to and
    /// including `to` mm.
    LettersAtSize {
        /// The size that the first step begins over, mm.
        over: u16,
        /// The end of the last step, mm.
        to: u16,
    },
    /// The letters have no fundamental deviation at this grade.
    GradeOfLetters,
    /// The class is not used for sizes up to 1 mm.
    NotToOneMillimetre,
    /// The hole needs the increment Δ, which is tabled from IT3 on.
    IncrementNotTabled,
}

impl Reason {
    /// Names the place in the standard.
    pub fn clause(self, class: Class) -> &'static str {
        use super::class::Kind::{Hole, Shaft};
        match self {
            Self::SizeOutside => "ISO 286-1:2010, clause 1",
            Self::GradeAtSize => "ISO 286-1:2010, Table 1",
            _ => match class.kind {
                Hole if class.letters <= Letters::M => "ISO 286-1:2010, Table 2",
                Hole => "ISO 286-1:2010, Table 3",
                Shaft if class.letters <= Letters::J => "ISO 286-1:2010, Table 4",
                Shaft => "ISO 286-1:2010, Table 5",
            },
        }
    }
}

impl NotDefined {
    pub(super) fn new(class: Class, nominal: f64, reason: Reason) -> Self {
        Self { class, nominal, reason, alternatives: alternatives(class, nominal) }
    }

    /// Offers what is defined nearby.
    pub fn help(&self) -> String {
        match self.alternatives.as_slice() {
            [] => "state limit deviations instead of a class".to_owned(),
            nearby => {
                let spelled: Vec<String> = nearby.iter().map(|c| format!("`{c}`")).collect();
                format!("defined at this size: {}", spelled.join(", "))
            }
        }
    }
}

impl fmt::Display for NotDefined {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        let Self { class, reason, .. } = self;
        let letters = Class { grade: Grade::IT01, ..*class }.to_string();
        let letters = letters.trim_end_matches("01");
        // A size that came through metres or inches is shown as the drawing states it.
        let nominal = (self.nominal * 1e6).round() / 1e6;
        write!(f, "`{class}` is not defined at {nominal} mm: ")?;
        match reason {
            Reason::SizeOutside => write!(f, "the system holds for sizes over 0 up to 3150 mm")?,
            Reason::GradeAtSize if class.grade <= Grade::IT0 => {
                write!(f, "{} ends at 500 mm", class.grade)?;
            }
            Reason::GradeAtSize => write!(f, "{} begins over 1 mm", class.grade)?,
            Reason::LettersAtSize { over, to } => {
                write!(f, "`{letters}` is tabled over {over} up to {to} mm")?;
            }
            Reason::GradeOfLetters => {
                write!(f, "`{letters}` has no deviation at {} there", class.grade)?;
            }
            Reason::NotToOneMillimetre => write!(f, "it is not used up to 1 mm")?,
            Reason::IncrementNotTabled => {
                write!(f, "the increment of hole `{letters}` is tabled from IT3 on")?;
            }
        }
        write!(f, " ({})", reason.clause(*class))
    }
}

impl std::error::Error for NotDefined {}

/// Says over which sizes the letters are tabled.
pub(super) fn reach(letters: Letters) -> Reason {
    let tabled =
        |end: &u16| Step::of(f64::from(*end)).is_some_and(|step| distance(letters, step).is_some());
    let first = INTERMEDIATE.iter().position(tabled).unwrap_or(0);
    let last = INTERMEDIATE.iter().rposition(tabled).unwrap_or(first);
    Reason::LettersAtSize {
        over: first.checked_sub(1).map_or(0, |before| INTERMEDIATE[before]),
        to: INTERMEDIATE[last],
    }
}

/// Finds defined classes near one that is not: up to one finer and one coarser grade of the same
/// letters, and the next looser and tighter letters at the same grade. None outside the system.
fn alternatives(class: Class, nominal: f64) -> Vec<Class> {
    let defined = |candidate: &Class| candidate.deviations(nominal).is_ok();
    let regraded = |grade| Class { grade, ..class };
    let relettered = |letters| Class { letters, ..class };
    let finer = Grade::all().rev().filter(|&g| g < class.grade).map(regraded).find(defined);
    let coarser = Grade::all().filter(|&g| g > class.grade).map(regraded).find(defined);
    let (looser, tighter): (Vec<Letters>, Vec<Letters>) =
        Letters::ALL.into_iter().filter(|&l| l != class.letters).partition(|&l| l < class.letters);
    let looser = looser.into_iter().rev().map(relettered).find(defined);
    let tighter = tighter.into_iter().map(relettered).find(defined);
    let nearby: Vec<Class> = [finer, coarser, looser, tighter].into_iter().flatten().collect();
    if !nearby.is_empty() {
        return nearby;
    }
    // Letters and grade are both out, as in A14 at 1 mm: the one class that departs least in the two.
    let steps_away = |other: &Class| {
        (other.letters as usize).abs_diff(class.letters as usize)
            + other.grade.column().abs_diff(class.grade.column())
    };
    classes_at(nominal, class.kind)
        .map(|(class, _)| class)
        .min_by_key(steps_away)
        .into_iter()
        .collect()
}

#[cfg(test)]
mod tests {
    use super::*;

    fn refusal(class: &str, nominal: f64) -> NotDefined {
        let class = Class::parse(class).unwrap();
        class.limits(nominal).expect_err("not defined")
    }

    #[test]
    fn a_refusal_names_size_reason_clause_and_cure() {
        let refused = refusal("t6", 20.0);
        assert_eq!(
            refused.to_string(),
            "`t6` is not defined at 20 mm: `t` is tabled over 24 up to 3150 mm \
             (ISO 286-1:2010, Table 5)"
        );
        assert_eq!(refused.help(), "defined at this size: `s6`, `u6`");
        assert_eq!(
            refusal("J9", 10.0).to_string(),
            "`J9` is not defined at 10 mm: `J` has no deviation at IT9 there \
             (ISO 286-1:2010, Table 2)"
        );
        assert_eq!(refusal("J9", 10.0).help(), "defined at this size: `J8`, `JS9`, `M9`");
        assert_eq!(refusal("H7", 4000.0).help(), "state limit deviations instead of a class");
    }

    #[test]
    fn every_alternative_is_defined() {
        for (class, nominal) in
            [("y7", 12.0), ("K9", 40.0), ("a11", 0.8), ("H14", 1.0), ("x8", 900.0)]
        {
            let refused = refusal(class, nominal);
            assert!(!refused.alternatives.is_empty(), "{class}");
            for other in refused.alternatives {
                assert!(other.limits(nominal).is_ok(), "{other} for {class} at {nominal} mm");
            }
        }
    }
}
