//! From the model to figures and verdicts: what every quantity can be at every condition, proven.
//!
//! A quantity is recorded once as a tape over its unknowns ([`scene`]), whatever it is; everything
//! else (extremes, contributors, statistics, windows) works on tapes and knows no formula. Knows
//! nothing of source texts, words or formats. SI throughout.

mod contributor;
mod data_range;
mod depends;
mod elastic;
mod expression;
mod figure;
mod filling;
mod joint;
pub mod outcome;
mod quantity;
mod ranges;
mod restraint;
pub mod scene;
pub mod select;
mod selection;
mod size;
mod statistics;
pub mod tally;
mod temperature;
mod thermal;
mod verdict;
mod window;

use crate::model::{Assembly, ConditionId, Quantity, SubjectId, SubjectKind};
use figure::Asked;
pub use outcome::Evaluation;
use outcome::{Chosen, Outcome, Side, Verdict};
use scene::{Response, Unable};
use tally::Tally;

/// How much is wanted besides figures and verdicts.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Detail {
    /// Contributors only of what does not hold.
    Brief,
    /// Contributors of everything.
    Full,
}

/// What an evaluation is asked for.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Options {
    /// How much is wanted besides figures and verdicts.
    pub detail: Detail,
    /// Seed of all draws.
    pub seed: u64,
    /// Number of assemblies drawn where draws are needed; where a width is asked for, the most of
    /// them.
    pub draws: u64,
    /// Draw until the confidence interval of each share is no wider than this, 0 … 1.
    pub to_width: Option<f64>,
}

impl Default for Options {
    fn default() -> Self {
        Options { detail: Detail::Brief, seed: 1, draws: 1_000_000, to_width: None }
    }
}

/// Evaluates every quantity of an assembly at every condition, and every requirement.
pub fn evaluate(assembly: &Assembly, options: &Options) -> Evaluation {
    evaluate_counted(assembly, options, &Tally::default())
}

/// The same, counting its draws where someone may watch them.
pub fn evaluate_counted(assembly: &Assembly, options: &Options, tally: &Tally) -> Evaluation {
    let detail = options.detail;
    let mut run =
        Run { assembly, detail, responses: Vec::new(), evaluation: Evaluation::default() };
    run.evaluation.temperatures = data_range::temperatures(assembly);
    run.evaluation.beyond_data = data_range::beyond(assembly, &run.evaluation.temperatures);
    for subject in assembly.subject_ids() {
        run.subject(subject);
    }
    run.evaluation.shop_cards =
        assembly.subject_ids().filter_map(|s| joint::joining::shop_card(assembly, s)).collect();
    for index in 0..assembly.requirements.len() {
        run.requirement(index);
    }
    let drawing = statistics::Drawing { options, tally };
    statistics::settle(assembly, &run.responses, &mut run.evaluation, drawing);
    selection::settle(assembly, &mut run.evaluation);
    run.evaluation.friction_bands = joint::band::bands(assembly, &run.evaluation.beyond_data);
    run.evaluation.turned_over = joint::band::turned_over(assembly, &run.evaluation);
    run.temperatures();
    run.evaluation.missing.sort();
    run.evaluation.missing.dedup();
    run.evaluation
}

/// Verdicts alone: no figure that nothing is required of, no window.
fn verdicts(assembly: &Assembly, options: &Options) -> Evaluation {
    let detail = Detail::Brief;
    let mut run =
        Run { assembly, detail, responses: Vec::new(), evaluation: Evaluation::default() };
    run.evaluation.temperatures = data_range::temperatures(assembly);
    run.evaluation.beyond_data = data_range::beyond(assembly, &run.evaluation.temperatures);
    for index in 0..assembly.requirements.len() {
        run.requirement(index);
    }
    let drawing = statistics::Drawing { options, tally: &Tally::default() };
    statistics::settle(assembly, &run.responses, &mut run.evaluation, drawing);
    selection::settle(assembly, &mut run.evaluation);
    run.evaluation
}

/// Records one quantity of a subject at a condition, to be replayed with any kind of number; the
/// first member of any `one of` set is taken.
///
/// # Errors
/// When a material does not state what the quantity needs.
pub fn respond(
    assembly: &Assembly,
    subject: SubjectId,
    quantity: Quantity,
    condition: Option<ConditionId>,
) -> Result<Response, Unable> {
    let asked = Asked { subject, quantity, condition, of_yield: false, members: Vec::new() };
    figure::response(assembly, &[], &asked)
}

struct Run<'a> {
    assembly: &'a Assembly,
    detail: Detail,
    /// One for each figure.
    responses: Vec<Response>,
    evaluation: Evaluation,
}

impl Run<'_> {
    /// Figures of a subject at every condition, for each choice from the sets it contains.
    fn subject(&mut self, subject: SubjectId) {
        let choices = selection::choices(self.assembly, subject);
        for quantity in self.shown_quantities(subject) {
            for condition in self.conditions(quantity) {
                for members in &choices {
                    let shares = if self.yields(quantity) { &[false, true][..] } else { &[false] };
                    for &of_yield in shares {
                        let members = members.clone();
                        self.figure(Asked { subject, quantity, condition, of_yield, members });
                    }
                }
            }
        }
    }

    /// True for a stress in a material whose yield strength is known.
    fn yields(&self, quantity: Quantity) -> bool {
        match quantity {
            Quantity::Stress(part) => self.assembly.part(part).material.yield_strength.is_some(),
            _ => false,
        }
    }

    /// What a report shows of a subject even if nothing is required of it.
    fn shown_quantities(&self, subject: SubjectId) -> Vec<Quantity> {
        match &self.assembly.subject(subject).kind {
            SubjectKind::Gap(_) => vec![Quantity::Gap],
            SubjectKind::Result(_) => vec![Quantity::Value],
            SubjectKind::Fit(fit) => match &fit.joint {
                None => vec![Quantity::Clearance],
                Some(joint) => joint::quantities(joint),
            },
            SubjectKind::Restraint(r) => restraint::quantities(r),
            SubjectKind::Fill(f) => filling::quantities(f),
        }
    }

    fn conditions(&self, quantity: Quantity) -> Vec<Option<ConditionId>> {
        if quantity.is_unconditional() {
            vec![None]
        } else {
            self.assembly.condition_ids().map(Some).collect()
        }
    }

    /// The index of a figure, computed now if it is not there yet; `None` where it cannot be.
    fn figure(&mut self, asked: Asked) -> Option<usize> {
        let there = self.evaluation.figures.iter().position(|f| {
            f.subject == asked.subject
                && f.quantity == asked.quantity
                && f.condition == asked.condition
                && f.of_yield == asked.of_yield
                && f.members == asked.members
        });
        if there.is_some() {
            return there;
        }
        let subject = asked.subject;
        match figure::compute(self.assembly, &self.evaluation.beyond_data, asked) {
            Ok((figure, response)) => {
                self.evaluation.figures.push(figure);
                self.responses.push(response);
                Some(self.responses.len() - 1)
            }
            Err(Unable::Missing(part, property)) => {
                self.evaluation.missing.push(outcome::Missing { subject, part, property });
                None
            }
            Err(Unable::BeyondData) => None,
        }
    }

    fn requirement(&mut self, index: usize) {
        let assembly = self.assembly;
        let requirement = &assembly.requirements[index];
        let conditions: Vec<Option<ConditionId>> = if requirement.quantity.is_unconditional() {
            vec![None]
        } else {
            requirement.conditions.iter().map(|&c| Some(c)).collect()
        };
        let of_yield = requirement.of_yield();
        // Requirements on sets are judged over all members at once, afterwards; they stand here
        // with the first.
        let members: Vec<Chosen> = selection::choices(assembly, requirement.subject).swap_remove(0);
        for condition in conditions {
            let figure = self.figure(Asked {
                subject: requirement.subject,
                quantity: requirement.quantity,
                condition,
                of_yield,
                members: members.clone(),
            });
            self.evaluation.verdicts.push(match figure {
                None => Verdict {
                    requirement: index,
                    condition,
                    figure: None,
                    outcome: Outcome::Undecided,
                    governing: Side::Least,
                    margin: f64::NAN,
                    contributors: Vec::new(),
                    window: None,
                    thermal_shifts: Vec::new(),
                    statistics: None,
                },
                Some(at) => {
                    let range = &self.evaluation.figures[at].range;
                    let judged = verdict::judge(range, requirement);
                    let wanted = self.detail == Detail::Full || judged.outcome != Outcome::Holds;
                    let contributors = if wanted {
                        contributor::contributors(&self.responses[at], range)
                    } else {
                        Vec::new()
                    };
                    Verdict {
                        requirement: index,
                        condition,
                        figure: Some(at),
                        outcome: judged.outcome,
                        governing: judged.governing,
                        margin: judged.margin,
                        contributors,
                        window: None,
                        thermal_shifts: Vec::new(),
                        statistics: None,
                    }
                }
            });
        }
    }

    /// What temperature does, and temperature windows, of what is looked into.
    fn temperatures(&mut self) {
        for at in 0..self.evaluation.verdicts.len() {
            let verdict = &self.evaluation.verdicts[at];
            // What has no bounds here has none nearby, and looking for them everywhere is slow.
            let unbounded = |f: usize| {
                let range = &self.evaluation.figures[f].range;
                !range.least.bound.is_finite() || !range.greatest.bound.is_finite()
            };
            let wanted = (self.detail == Detail::Full || verdict.outcome != Outcome::Holds)
                && !verdict.figure.is_some_and(unbounded);
            let Some(figure) = verdict.figure.filter(|_| wanted) else { continue };
            let members = &self.evaluation.figures[figure].members;
            let window = window::window(self.assembly, verdict, members);
            let shifts = match self.detail {
                Detail::Full => thermal::shifts(self.assembly, verdict, members),
                Detail::Brief => Vec::new(),
            };
            let verdict = &mut self.evaluation.verdicts[at];
            (verdict.window, verdict.thermal_shifts) = (window, shifts);
        }
    }
}
