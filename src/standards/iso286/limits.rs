//! The limit deviations of a class at a size: the fundamental deviation from its column, and the other
//! limit a standard tolerance away (ISO 286-1:2010, 4.3).

use super::class::{Class, Grade, Kind, Letters};
use super::deviation_table::{distance, hole_j, shaft_j};
use super::grade_table::tolerance;
use super::refusal::{NotDefined, Reason, reach};
use super::step::{MAIN, Step};
use crate::standards::Micrometres;

/// The limit deviations of a feature of size.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Deviations {
    /// Lower limit deviation, EI or ei.
    pub lower: Micrometres,
    /// Upper limit deviation, ES or es.
    pub upper: Micrometres,
}

impl Deviations {
    /// Gives the tolerance: upper less lower.
    pub fn tolerance(self) -> Micrometres {
        self.upper - self.lower
    }
}

impl Class {
    /// Gives the limit deviations of this class at a nominal size, mm.
    ///
    /// # Errors
    /// Refuses a class that the standard does not define at this size, with the reason and with
    /// classes nearby that it defines.
    pub fn limits(self, nominal: f64) -> Result<Deviations, NotDefined> {
        self.deviations(nominal).map_err(|reason| NotDefined::new(self, nominal, reason))
    }

    /// Gives the limits, or the bare reason against them.
    pub(super) fn deviations(self, nominal: f64) -> Result<Deviations, Reason> {
        let step = Step::of(nominal).ok_or(Reason::SizeOutside)?;
        let tolerance = tolerance(self.grade, step).ok_or(Reason::GradeAtSize)?;
        Ok(match fundamental(self, step)? {
            Fundamental::Upper(upper) => Deviations { lower: upper - tolerance, upper },
            Fundamental::Lower(lower) => Deviations { lower, upper: lower + tolerance },
            Fundamental::Centred => {
                Deviations { lower: -tolerance.half(), upper: tolerance.half() }
            }
        })
    }
}

/// Gives every class of a kind that is defined at a nominal size, mm, with its limits: from the loosest
/// letters to the tightest, the finest grade first.
pub fn classes_at(nominal: f64, kind: Kind) -> impl Iterator<Item = (Class, Deviations)> {
    Letters::ALL
        .into_iter()
        .flat_map(move |letters| Grade::all().map(move |grade| Class { kind, letters, grade }))
        .filter_map(move |class| Some((class, class.deviations(nominal).ok()?)))
}

/// The limit that the tables give.
enum Fundamental {
    /// es or ES; the tolerance lies below it.
    Upper(Micrometres),
    /// ei or EI; the tolerance lies above it.
    Lower(Micrometres),
    /// js and JS: half the tolerance to each side, to the last half micrometre.
    Centred,
}

fn fundamental(class: Class, step: Step) -> Result<Fundamental, Reason> {
    let Class { kind, letters, grade } = class;
    match (kind, letters) {
        (_, Letters::Js) => Ok(Fundamental::Centred),
        (Kind::Shaft, Letters::J) => shaft_j(grade.number(), step)
            .map(|um| Fundamental::Lower(Micrometres::whole(-um)))
            .ok_or(Reason::GradeOfLetters),
        (Kind::Hole, Letters::J) => hole_j(grade.number(), step)
            .map(|um| Fundamental::Upper(Micrometres::whole(um)))
            .ok_or(Reason::GradeOfLetters),
        (_, Letters::A | Letters::B) if step.to_one_mm => Err(Reason::NotToOneMillimetre),
        _ => {
            let um = distance(letters, step).ok_or_else(|| reach(letters))?;
            let below = letters <= Letters::H;
            match kind {
                Kind::Shaft if below => Ok(Fundamental::Upper(Micrometres::whole(-um))),
                Kind::Shaft => {
                    Ok(Fundamental::Lower(Micrometres::whole(shaft_above(letters, grade, um))))
                }
                Kind::Hole if below => Ok(Fundamental::Lower(Micrometres::whole(um))),
                Kind::Hole => hole_above(letters, grade, um, step).map(Fundamental::Upper),
            }
        }
    }
}

/// Gives ei of the shafts k to zc. k leaves the nominal size at IT4 to IT7 only (Table 5).
fn shaft_above(letters: Letters, grade: Grade, um: i32) -> i32 {
    if letters == Letters::K && !(4..=7).contains(&grade.number()) { 0 } else { um }
}

/// Gives ES of the holes K to ZC: the mirror of the shaft's ei, raised by Δ at the finer grades, so
/// that hole-basis and shaft-basis fits of one grade apart, H7/p6 and P7/h6, come out alike
/// (Tables 2 and 3).
fn hole_above(letters: Letters, grade: Grade, um: i32, step: Step) -> Result<Micrometres, Reason> {
    let mirrored = Micrometres::whole(-um);
    if step.is_over_500() {
        return Ok(mirrored);
    }
    let finer = match letters {
        Letters::K | Letters::M | Letters::N => grade <= Grade::it(8),
        _ => grade <= Grade::it(7),
    };
    match letters {
        _ if finer => {
            let raised = mirrored + increment(grade, step)?;
            // The one entry of the table that departs from its own rule, over 250 up to 315 mm.
            let departs = letters == Letters::M && grade == Grade::it(6) && MAIN[step.main] == 315;
            Ok(if departs { Micrometres::whole(-9) } else { raised })
        }
        Letters::K if !step.is_first() => Err(Reason::GradeOfLetters),
        Letters::N if step.to_one_mm => Err(Reason::NotToOneMillimetre),
        Letters::N if !step.is_first() => Ok(Micrometres::ZERO),
        _ => Ok(mirrored),
    }
}

/// Gives Δ = ITn − IT(n−1), tabled for IT3 to IT8; nil up to 3 mm.
fn increment(grade: Grade, step: Step) -> Result<Micrometres, Reason> {
    let n = grade.number();
    if n < 3 {
        return Err(Reason::IncrementNotTabled);
    }
    if step.is_first() {
        return Ok(Micrometres::ZERO);
    }
    tolerance(grade, step)
        .zip(tolerance(Grade::it(n - 1), step))
        .map(|(own, finer)| own - finer)
        .ok_or(Reason::GradeAtSize)
}
