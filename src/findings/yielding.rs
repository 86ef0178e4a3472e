//! `stress-past-yield`: a ring, wall or member that yields, where elastic figures end.

use super::number::{Round, digits};
use super::words;
use crate::diagnostic::{Code, Diagnostic};
use crate::evaluate::Evaluation;
use crate::evaluate::outcome::Figure;
use crate::model::{Assembly, Quantity, SubjectKind};
use crate::numeric::tolerance::LIMIT_SLACK;

pub(super) fn find(assembly: &Assembly, evaluation: &Evaluation, found: &mut Vec<Diagnostic>) {
    let mut worst: Vec<(&Figure, crate::model::PartId)> = Vec::new();
    for figure in evaluation.figures.iter().filter(|f| f.of_yield) {
        let Quantity::Stress(part) = figure.quantity else { continue };
        if figure.range.greatest.reached <= 1.0 + LIMIT_SLACK {
            continue;
        }
        match worst.iter_mut().find(|(w, p)| w.subject == figure.subject && *p == part) {
            Some((known, _)) if known.range.greatest.bound >= figure.range.greatest.bound => {}
            Some((known, _)) => *known = figure,
            None => worst.push((figure, part)),
        }
    }
    for (figure, part) in worst {
        let (part, subject) = (assembly.part(part), assembly.subject(figure.subject));
        let at = match figure.condition {
            Some(c) => format!(" at {}", words::name(&assembly.condition(c).name)),
            None => String::new(),
        };
        let share = digits(figure.range.greatest.bound * 100.0, 1, Round::Up);
        found.push(
            Diagnostic::new(
                Code::StressPastYield,
                subject.span,
                format!("{} yields in {}{at}", words::name(&part.name), words::name(&subject.name)),
            )
            .here(format!("stress up to {share} % of its yield strength"))
            .label(part.material_span, "of this material")
            .help(match subject.kind {
                SubjectKind::Fill(_) => {
                    "nothing is computed beyond yield, and a wall that has yielded stays wider: \
                     charge less, take a thicker wall or a stronger material"
                }
                SubjectKind::Restraint(_) => {
                    "nothing is computed beyond yield, and preload lost to it does not come back: \
                     take less preload, more area, or a stronger material"
                }
                _ => {
                    "nothing is computed beyond yield, and interference lost to it does not come \
                     back: take less interference, a thicker ring or a stronger material"
                }
            }),
        );
    }
}
