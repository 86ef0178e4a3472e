//! From the inner report to the format: figures from SI into their units, places into lines and
//! columns, what is not a number into `null`.

use super::{
    CauseEntry, ContributorEntry, Document, FindingEntry, FrictionBandEntry, LabelEntry, Map,
    RequirementEntry, ResultEntry, SCHEMA, SecondOrderEntry, ShopCardEntry, SpecEntry,
    SummaryEntry, TogetherEntry, WindowEntry, WorstLotEntry, YieldEntry,
};
use crate::diagnostic::{Diagnostic, Label};
use crate::report::cause::by_cause;
use crate::report::summary::summary;
use crate::report::{
    Account, Case, Contribution, Coordinate, Figure, FrictionBand, Member, Report, ShopCard, Spec,
};
use crate::source::Sources;
use crate::units::{Kind, Unit, find};

/// The report in the format `gapkeep/1`.
pub fn document(report: &Report) -> Document {
    let counted = summary(report);
    Document {
        schema: SCHEMA,
        specs: report.specs.iter().map(spec).collect(),
        summary: SummaryEntry {
            requirements: counted.requirements,
            hold: counted.hold,
            fail: counted.fail,
            undecided: counted.undecided,
            conceded: counted.conceded,
            wrong: counted.wrong,
        },
    }
}

fn spec(spec: &Spec) -> SpecEntry {
    let account = spec.account.as_ref();
    let drawing = account.and_then(|a| a.drawing.clone());
    SpecEntry {
        file: spec.file.clone(),
        title: account.map(|a| a.title.clone()),
        drawing: drawing.as_ref().map(|d| d.0.clone()),
        revision: drawing.map(|d| d.1).filter(|r| !r.is_empty()),
        results: account.map_or_else(Vec::new, |a| a.figures.iter().map(result).collect()),
        requirements: account
            .map_or_else(Vec::new, |a| a.cases.iter().map(|c| requirement(a, c)).collect()),
        shop_cards: account.map_or_else(Vec::new, |a| {
            a.shop.iter().map(|card| shop_card(card, a.temperature)).collect()
        }),
        friction_bands: account
            .map_or_else(Vec::new, |a| a.bands.iter().map(friction_band).collect()),
        assembly_yield: account.and_then(|a| a.failing).map(|f| YieldEntry {
            share: number(1.0 - f.share),
            interval: [number(1.0 - f.interval.1), number(1.0 - f.interval.0)],
            share_failing: number(f.share),
            draws: f.drawn.map(|d| d.draws),
            seed: f.drawn.map(|d| d.seed),
            width_missed: f.drawn.and_then(|d| d.missed),
        }),
        cautions: account.map_or_else(Vec::new, |a| a.grounds.cautions.clone()),
        findings: spec.findings.iter().map(|d| finding(d, &spec.sources)).collect(),
    }
}

fn friction_band(band: &FrictionBand) -> FrictionBandEntry {
    FrictionBandEntry {
        joint: band.joint.clone(),
        condition: band.condition.clone(),
        coupling: number(band.coupling),
        unit: band.unit.symbol,
        least: value(band.least, band.unit),
        greatest: value(band.greatest, band.unit),
    }
}

fn shop_card(card: &ShopCard, temperature: &'static Unit) -> ShopCardEntry {
    let of = |kelvin: Option<f64>| kelvin.and_then(|t| value(t, temperature));
    ShopCardEntry {
        joint: card.joint.clone(),
        outer: card.outer.clone(),
        inner: card.inner.clone(),
        unit: temperature.symbol,
        day: card.day.clone(),
        ambient: of(Some(card.ambient)),
        clearance: find("mm").and_then(|mm| value(card.clearance, mm)),
        heat_outer: of(card.heat),
        outer_limit: of(card.limit),
        chill_inner: of(card.chill),
        together: card.together.map(|(heat, chill)| TogetherEntry {
            heat_outer: of(Some(heat)),
            chill_inner: of(chill),
        }),
    }
}

/// A number, or nothing where it is not one or has no end.
fn number(x: f64) -> Option<f64> {
    // Adding zero turns −0 into 0.
    x.is_finite().then_some(x + 0.0)
}

fn value(si: f64, unit: &Unit) -> Option<f64> {
    number(unit.from_si(si))
}

fn result(figure: &Figure) -> ResultEntry {
    let size = |member: &Member| {
        let unit = if member.unit.kind == Kind::LENGTH { "mm" } else { "deg" };
        find(unit).and_then(|unit| value(member.size, unit))
    };
    ResultEntry {
        name: figure.subject.clone(),
        kind: figure.kind,
        quantity: figure.quantity.clone(),
        measure: figure.measure.map(|m| m.word()),
        condition: figure.condition.clone(),
        members: (!figure.members.is_empty())
            .then(|| Map(figure.members.iter().map(|m| (m.name.clone(), size(m))).collect())),
        unit: figure.unit.symbol,
        least: value(figure.least, figure.unit),
        mean: value(figure.mean, figure.unit),
        greatest: value(figure.greatest, figure.unit),
        character: figure.character,
        least_at: corner(&figure.least_at),
        greatest_at: corner(&figure.greatest_at),
    }
}

/// The corner by names; a name that occurs again is numbered, since an object has each key once.
fn corner(at: &[Coordinate]) -> Map {
    let mut entries: Vec<(String, Option<f64>)> = Vec::new();
    for coordinate in at {
        let mut name = coordinate.name.clone();
        let mut copy = 1;
        while entries.iter().any(|(other, _)| *other == name) {
            copy += 1;
            name = format!("{} ({copy})", coordinate.name);
        }
        entries.push((name, number(coordinate.value)));
    }
    Map(entries)
}

fn requirement(account: &Account, case: &Case) -> RequirementEntry {
    let figure = case.figure.map(|f| &account.figures[f]);
    let of = |si: Option<f64>| si.and_then(|si| value(si, case.unit));
    let statistics = case.statistics.as_ref();
    let drawn = statistics.and_then(|s| s.failing.drawn);
    let window = case.window.as_ref().map(|window| {
        let end = |t: f64| {
            if window.scaled { number(t) } else { value(t, account.temperature) }
        };
        let ends = |&(from, to): &(f64, f64)| [end(from), end(to)];
        WindowEntry {
            unit: if window.scaled { "" } else { account.temperature.symbol },
            intervals: window.intervals.iter().map(ends).collect(),
            looked_at: ends(&window.looked_at),
        }
    });
    RequirementEntry {
        id: case.id.clone(),
        subject: case.subject.clone(),
        quantity: case.quantity.clone(),
        condition: case.condition.clone(),
        method: case.method.clone(),
        unit: case.unit.symbol,
        lower: of(case.lower),
        upper: of(case.upper),
        least: of(figure.map(|f| f.least)),
        mean: of(statistics.map(|s| s.mean).or(figure.map(|f| f.mean))),
        greatest: of(figure.map(|f| f.greatest)),
        margin: number(case.unit.difference_from_si(case.margin)),
        thermal_shift: (!case.thermal_shifts.is_empty()).then(|| {
            let of = |si: f64| number(case.unit.difference_from_si(si));
            Map(case.thermal_shifts.iter().map(|(name, si)| (name.clone(), of(*si))).collect())
        }),
        sigma: statistics.and_then(|s| number(case.unit.difference_from_si(s.sigma))),
        second_order: statistics.and_then(|s| s.second_order).map(|(mean, sigma)| {
            SecondOrderEntry {
                mean: value(mean, case.unit),
                sigma: number(case.unit.difference_from_si(sigma)),
            }
        }),
        share_failing: statistics.and_then(|s| number(s.failing.share)),
        share_failing_interval: statistics.map(|s| [s.failing.interval.0, s.failing.interval.1]),
        draws: drawn.map(|d| d.draws),
        seed: drawn.map(|d| d.seed),
        width_missed: drawn.and_then(|d| d.missed),
        cpk: statistics.and_then(|s| s.cpk).and_then(number),
        worst_lot: statistics.and_then(|s| s.worst_lot.as_ref()).map(|w| WorstLotEntry {
            share_failing: number(w.failing.share),
            share_failing_interval: [w.failing.interval.0, w.failing.interval.1],
            draws: w.failing.drawn.map(|d| d.draws),
            seed: w.failing.drawn.map(|d| d.seed),
            width_missed: w.failing.drawn.and_then(|d| d.missed),
            cpk: w.cpk.and_then(number),
            at: corner(&w.at),
        }),
        verdict: case.standing.word(),
        because: case.because.clone(),
        concession: case.concession.clone(),
        window,
        contributors: case.contributors.iter().map(|c| contributor(case, c)).collect(),
        causes: by_cause(&case.contributors)
            .into_iter()
            .map(|sum| CauseEntry {
                cause: sum.cause.word(),
                part: number(case.unit.difference_from_si(sum.part)),
                share_of_range: number(sum.share_of_range),
                share_of_variance: sum.share_of_variance,
            })
            .collect(),
        interaction: statistics.and_then(|s| s.interaction).and_then(number),
    }
}

fn contributor(case: &Case, c: &Contribution) -> ContributorEntry {
    ContributorEntry {
        name: c.name.clone(),
        written: c.written.clone(),
        cause: c.cause.word(),
        sensitivity: number(c.sensitivity),
        unit: c.unit,
        part: number(case.unit.difference_from_si(c.part)),
        share_of_range: number(c.share_of_range),
        share_of_variance: c.share_of_variance,
    }
}

fn finding(diagnostic: &Diagnostic, sources: &Sources) -> FindingEntry {
    let primary = label(&diagnostic.primary, sources);
    FindingEntry {
        code: diagnostic.code.text(),
        severity: diagnostic.severity.word(),
        message: diagnostic.message.clone(),
        file: primary.file.clone(),
        line: primary.line,
        column: primary.column,
        labels: std::iter::once(primary)
            .chain(diagnostic.secondary.iter().map(|l| label(l, sources)))
            .collect(),
        help: diagnostic.help.clone(),
    }
}

fn label(label: &Label, sources: &Sources) -> LabelEntry {
    let source = sources.get(label.span.file);
    let (line, column) = source.position(label.span.start as usize);
    let (end_line, end_column) = source.position(label.span.end as usize);
    LabelEntry {
        file: source.name().to_string(),
        line,
        column,
        end_line,
        end_column,
        text: label.text.clone(),
    }
}
