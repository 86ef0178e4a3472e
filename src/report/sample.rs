//! A report made by hand, which the tests of every rendering share.

use super::{
    Account, Case, Cause, Contribution, Coordinate, Figure, FrictionBand, Grounds, Measure, Window,
};
use super::{Assumption, MaterialNote, PartTemperature, Report, ShopCard, Spec};
use crate::diagnostic::{Code, Diagnostic};
use crate::findings::Standing;
use crate::source::{Source, Sources};
use crate::span::{FileId, Span};
use crate::units::{Unit, find};

const TEXT: &str = "assembly \"Filter wheel spindle\"\n\nfit outer_race = bearing.outside in housing.bore {\n  \
                    require \"R-12\" clearance 0 .. 0.030\n}\n";

fn unit(name: &str) -> &'static Unit {
    find(name).unwrap()
}

fn figure(subject: &str, quantity: &str, condition: &str, range: (f64, f64, f64)) -> Figure {
    let mm = unit("mm");
    let corner = |bore| {
        vec![
            Coordinate { name: "housing.bore".into(), value: bore, unit: "mm" },
            Coordinate { name: "temperature of hot".into(), value: 85.0, unit: "°C" },
        ]
    };
    let (least, mean, greatest) = range;
    Figure {
        subject: subject.into(),
        kind: if quantity == "gap" { "gap" } else { "fit" },
        quantity: quantity.into(),
        measure: Some(if quantity == "gap" { Measure::Linear } else { Measure::Diametral }),
        condition: Some(condition.into()),
        members: Vec::new(),
        unit: mm,
        least: mm.to_si(least),
        mean: mm.to_si(mean),
        greatest: mm.to_si(greatest),
        met: true,
        character: (quantity != "gap").then_some("transition fit"),
        least_at: corner(41.987),
        greatest_at: corner(42.003),
        secondary: false,
        caution: None,
    }
}

fn case(figures: &[Figure], at: usize, requirement: usize, limits: &str) -> Case {
    let figure = &figures[at];
    let ends: Vec<f64> =
        limits.split(" .. ").map(|l| figure.unit.to_si(l.parse().unwrap())).collect();
    let margin = (figure.least - ends[0]).min(ends[1] - figure.greatest);
    let id = format!("R-{}", 12 + requirement);
    Case {
        requirement,
        id: Some(id.clone()),
        name: id,
        subject: figure.subject.clone(),
        kind: figure.kind,
        quantity: figure.quantity.clone(),
        measure: figure.measure,
        condition: figure.condition.clone(),
        method: "worst case".into(),
        statistical: false,
        limits: limits.into(),
        caution: None,
        lower: Some(ends[0]),
        upper: Some(ends[1]),
        unit: figure.unit,
        figure: Some(at),
        margin,
        reserve: Some(margin / (ends[1] - ends[0])),
        standing: if margin < 0.0 { Standing::Fails } else { Standing::Holds },
        because: (requirement == 0).then(|| "the race must creep, not rattle".into()),
        concession: None,
        contributors: vec![
            contribution("housing.bore", "dia 42 K6", Cause::Size, 0.016, 0.68),
            contribution("temperature of hot", "85 ±3", Cause::Temperature, 0.0075, 0.32),
        ],
        statistics: None,
        thermal_shifts: vec![
            ("housing".into(), figure.unit.to_si(0.0062)),
            ("bearing".into(), figure.unit.to_si(-0.0021)),
        ],
        window: Some(Window {
            words: "holds from 0.0 °C to 58.1 °C and from 77.0 °C on".into(),
            intervals: vec![(273.15, 331.25), (350.15, f64::INFINITY)],
            looked_at: (173.15, 573.15),
            scaled: false,
        }),
    }
}

fn contribution(name: &str, written: &str, cause: Cause, part: f64, share: f64) -> Contribution {
    Contribution {
        name: name.into(),
        written: written.into(),
        cause,
        basis: (cause == Cause::Size).then_some("assumed"),
        sensitivity: if cause == Cause::Size { 1.0 } else { 0.00051 },
        unit: if cause == Cause::Size { "mm" } else { "°C" },
        part: unit("mm").to_si(part),
        share_of_range: share,
        share_of_variance: None,
    }
}

fn grounds() -> Grounds {
    Grounds {
        temperatures: vec![PartTemperature {
            condition: "hot".into(),
            owner: "housing".into(),
            least: 355.15,
            greatest: 361.15,
        }],
        materials: vec![MaterialNote {
            name: "plate_alloy".into(),
            title: "aluminium alloy, wrought".into(),
            parts: vec!["housing".into()],
            valid: (213.15, 423.15),
            sources: vec![("memory", "usual value for the family".into())],
            from_memory: true,
            extrapolated: false,
            cautions: Vec::new(),
        }],
        assumptions: vec![Assumption {
            basis: "assumed",
            what: "housing.bore".into(),
            written: "dia 42 K6".into(),
            because: "no drawing yet".into(),
        }],
        from_drawings: 3,
        signs: vec!["clearance is internal minus external size; a negative one is an interference"],
        cautions: vec![
            "`plate_alloy`: some values are from memory; confirm them before use".into(),
        ],
    }
}

/// One spec of two requirements, one of which fails at one condition, with its finding.
pub(super) fn report() -> Report {
    let figures = vec![
        figure("outer_race", "clearance", "cold", (0.0031, 0.0112, 0.0193)),
        figure("outer_race", "clearance", "hot", (-0.0121, 0.0098, 0.0285)),
        figure("end_float", "gap", "cold", (0.12, 0.25, 0.38)),
        figure("end_float", "gap", "reference", (0.2, 0.3, 0.4)),
    ];
    let cases = vec![
        case(&figures, 0, 0, "0 .. 0.030"),
        case(&figures, 1, 0, "0 .. 0.030"),
        case(&figures, 2, 1, "0.05 .. 0.60"),
    ];
    let mut sources = Sources::default();
    sources.add(Source::new("specs/spindle.gap", TEXT));
    let start = TEXT.find("require").unwrap();
    let at = Span::new(FileId(0), start, start + 35);
    let finding = Diagnostic::new(
        Code::ClearanceBelowLimit,
        at,
        "clearance of `outer_race` is 0.0121 mm below its limit at `hot`",
    )
    .here("least -0.0121 mm (interference 0.0121 mm), limit 0.0000 mm");
    Report {
        specs: vec![Spec {
            file: "specs/spindle.gap".into(),
            sources,
            account: Some(Account {
                title: "Filter wheel spindle".into(),
                place: Span::new(FileId(0), 9, 31),
                drawing: Some(("FW-300".into(), "C".into())),
                notes: Vec::new(),
                length: unit("mm"),
                temperature: unit("degC"),
                reference: 293.15,
                conditions: vec![
                    ("cold".into(), "-40".into()),
                    ("hot".into(), "85 ±3".into()),
                    ("reference".into(), String::new()),
                ],
                figures,
                cases,
                failing: None,
                shop: vec![ShopCard {
                    joint: "outer_race".into(),
                    outer: "housing".into(),
                    inner: "bearing".into(),
                    day: None,
                    ambient: 293.15,
                    clearance: 42e-6,
                    heat: Some(373.21),
                    limit: Some(423.15),
                    outer_data: 423.15,
                    chill: None,
                    inner_data: 173.15,
                    may_be_heated: true,
                    together: None,
                }],
                bands: vec![FrictionBand {
                    joint: "outer_race".into(),
                    condition: "cold".into(),
                    unit: unit("MPa"),
                    coupling: 0.0412,
                    least: 11.52e6,
                    greatest: 14.07e6,
                }],
                grounds: grounds(),
            }),
            findings: vec![finding],
            stale: Vec::new(),
        }],
    }
}
