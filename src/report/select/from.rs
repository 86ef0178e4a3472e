//! From what was found to words and units.

use super::{
    Candidate, Centring, Choice, Cost, Nearest, Recentred, SCHEMA, Selected, SpacerLength,
    Tolerance,
};
use crate::evaluate::select::{self, Governing, Obstacle, Rank, Selections};
use crate::findings::words;
use crate::model::{
    Assembly, ConditionId, DimensionId, Form, Quantity, Requirement, SubjectId, SubjectKind,
};
use crate::report::caution::{self, Caution};
use crate::units::{Kind, Unit};

/// Puts what was found of a spec into words.
pub fn selected(
    assembly: &Assembly,
    file: &str,
    found: &Selections,
    spacer: Option<&select::Spacer>,
) -> Selected {
    Selected {
        schema: SCHEMA,
        file: file.to_string(),
        classes: found.choices.iter().map(|c| choice(assembly, c)).collect(),
        centrings: found.centrings.iter().map(|c| centring(assembly, c)).collect(),
        tolerances: found.tolerances.iter().map(|t| tolerance(assembly, t)).collect(),
        spacer: spacer.map(|spacer| spacer_length(assembly, spacer)),
        // A spacer is found from means of lengths alone; whatever else is said, every requirement
        // has been judged for.
        cautions: match spacer {
            Some(_) => Vec::new(),
            None => caution::lines(
                assembly.requirements.iter().map(|r| Caution::of(assembly, r.subject, r.quantity)),
            ),
        },
    }
}

fn choice(assembly: &Assembly, choice: &select::Choice) -> Choice {
    let written = |d: &DimensionId| assembly.dimension(*d).written.clone();
    let paths = |list: &[DimensionId]| list.iter().map(|d| assembly.path(*d)).collect();
    let unit = assembly.defaults.length;
    Choice {
        dimensions: paths(&choice.dimensions),
        written: choice.dimensions.iter().map(written).collect(),
        requirements: choice.requirements.iter().map(|&r| requirement(assembly, r)).collect(),
        judged: choice.judged,
        serving: choice.serving.iter().map(|c| candidate(assembly, c)).collect(),
        room: choice
            .room
            .map(|(from, to)| (unit.difference_from_si(from), unit.difference_from_si(to))),
        unit,
        open_beside: paths(&choice.open_beside),
        obstacle: choice.obstacle.map(|o| obstacle(assembly, o)),
    }
}

fn candidate(assembly: &Assembly, candidate: &select::Candidate) -> Candidate {
    let classes: Vec<String> = candidate.classes.iter().map(|(c, _)| c.to_string()).collect();
    Candidate {
        class: classes.join("/"),
        deviations_um: candidate
            .classes
            .iter()
            .map(|(_, d)| (d.lower.um(), d.upper.um()))
            .collect(),
        tolerance_um: candidate.tolerance(),
        rank: match candidate.rank {
            Rank::PreferredFit => "preferred fit",
            Rank::Preferred => "preferred",
            Rank::Recommended => "recommended",
            Rank::Defined => "defined",
        },
        nearest: nearest(assembly, &candidate.governing),
    }
}

fn obstacle(assembly: &Assembly, obstacle: Obstacle) -> String {
    match obstacle {
        Obstacle::NothingRequired => "nothing is required of it, so that any class serves".into(),
        Obstacle::SideUnknown => {
            "it may be a hole or a shaft: write `internal` or `external` before its size".into()
        }
        Obstacle::NotComputed(r) => {
            format!("`{}` cannot be computed, whatever the class", requirement(assembly, r))
        }
    }
}

fn nearest(assembly: &Assembly, governing: &Governing) -> Nearest {
    let unit = assembly.requirements[governing.requirement].unit;
    let margin = unit.difference_from_si(governing.margin);
    Nearest {
        requirement: requirement(assembly, governing.requirement),
        condition: governing.condition.map(|c| assembly.condition(c).name.clone()),
        margin: margin.is_finite().then_some(margin),
        unit,
    }
}

fn centring(assembly: &Assembly, centring: &select::Centring) -> Centring {
    let unit = assembly.requirements[centring.below.requirement].unit;
    let recentred = |r: &select::Recentred| {
        let unit = size_unit(assembly, r.dimension);
        Recentred {
            dimension: assembly.path(r.dimension),
            stated: unit.from_si(assembly.dimension(r.dimension).nominal),
            nominal: unit.from_si(r.nominal),
            unit,
            breaks: r.breaks.iter().map(|&b| requirement(assembly, b)).collect(),
        }
    };
    Centring {
        subject: assembly.subject(centring.subject).name.clone(),
        below: nearest(assembly, &centring.below),
        above: nearest(assembly, &centring.above),
        shift: unit.difference_from_si(centring.shift),
        margin: unit.difference_from_si(centring.margin),
        by: centring.by.iter().map(recentred).collect(),
        costliest: centring
            .costliest
            .as_ref()
            .map(|c| Cost { name: words::unknown(assembly, c.unknown), share: c.share_of_range }),
    }
}

fn tolerance(assembly: &Assembly, slack: &select::Slack) -> Tolerance {
    let unit = size_unit(assembly, slack.dimension);
    let each_side = unit.difference_from_si(slack.each_side);
    Tolerance {
        dimension: assembly.path(slack.dimension),
        written: assembly.dimension(slack.dimension).written.clone(),
        each_side: each_side.is_finite().then_some(each_side),
        unit,
        stopped_by: slack.stopped_by.map(|r| requirement(assembly, r)),
    }
}

fn spacer_length(assembly: &Assembly, spacer: &select::Spacer) -> SpacerLength {
    let unit = size_unit(assembly, spacer.dimension);
    let of_mean = assembly.defaults.shown(kind(assembly, spacer.subject));
    let condition = |c: ConditionId| assembly.condition(c).name.clone();
    SpacerLength {
        dimension: assembly.path(spacer.dimension),
        subject: assembly.subject(spacer.subject).name.clone(),
        conditions: (condition(spacer.between.0), condition(spacer.between.1)),
        stated: unit.from_si(assembly.dimension(spacer.dimension).nominal),
        nominal: unit.from_si(spacer.nominal),
        unit,
        mean: of_mean.from_si(spacer.mean),
        means_stated: (of_mean.from_si(spacer.means_now.0), of_mean.from_si(spacer.means_now.1)),
        unit_of_mean: of_mean,
        beyond: beyond(assembly, spacer),
    }
}

/// The requirements at the two conditions whose limits the mean of a spacer is beyond.
fn beyond(assembly: &Assembly, spacer: &select::Spacer) -> Vec<String> {
    let (a, b) = spacer.between;
    let passes = |r: &Requirement| {
        let mean = match r.quantity {
            Quantity::Interference => -spacer.mean,
            Quantity::RadialClearance => 0.5 * spacer.mean,
            _ => spacer.mean,
        };
        r.lower.as_ref().is_some_and(|l| mean < l.value)
            || r.upper.as_ref().is_some_and(|u| mean > u.value)
    };
    let free = |r: &Requirement| {
        matches!(
            r.quantity,
            Quantity::Gap
                | Quantity::Value
                | Quantity::Clearance
                | Quantity::Interference
                | Quantity::RadialClearance
        )
    };
    let of_it = assembly.requirements.iter().filter(|r| {
        r.subject == spacer.subject && (r.conditions.contains(&a) || r.conditions.contains(&b))
    });
    of_it.filter(|r| free(r) && passes(r)).map(|r| words::requirement(assembly, r)).collect()
}

fn requirement(assembly: &Assembly, index: usize) -> String {
    words::requirement(assembly, &assembly.requirements[index])
}

fn size_unit(assembly: &Assembly, dimension: DimensionId) -> &'static Unit {
    match assembly.dimension(dimension).form {
        Form::Angle => assembly.defaults.shown(Kind::ANGLE),
        Form::Diameter | Form::Radius | Form::Linear => assembly.defaults.length,
    }
}

fn kind(assembly: &Assembly, subject: SubjectId) -> Kind {
    match &assembly.subject(subject).kind {
        SubjectKind::Result(e) => e.quantity,
        _ => Kind::LENGTH,
    }
}
