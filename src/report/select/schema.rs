//! The JSON Schema of selections, made from their types, and held against what is written.
//!
//! `docs/schema/select.schema.json` is the published copy; the test that finds it different prints
//! what it should be.

use super::{
    Candidate, Centring, Choice, Cost, Nearest, Recentred, SCHEMA, Selected, SpacerLength,
    Tolerance, json,
};
use crate::report::wire::schema::not_allowed;
use crate::units::{Unit, find};
use schemars::schema_for;
use serde_json::Value;

/// The schema of the format, made from its types.
fn schema() -> Value {
    let mut schema = schema_for!(Selected).to_value();
    schema["title"] = "A selection of gapkeep".into();
    schema["properties"]["schema"] = serde_json::json!({
        "const": SCHEMA, "description": "The name of the format."
    });
    schema
}

fn mm() -> &'static Unit {
    find("mm").unwrap()
}

fn nearest(margin: Option<f64>) -> Nearest {
    Nearest { requirement: "R-1".into(), condition: Some("hot".into()), margin, unit: mm() }
}

/// A selection in which everything occurs.
fn whole() -> Selected {
    let candidate = Candidate {
        class: "H7/g6".into(),
        deviations_um: vec![(0.0, 25.0), (-25.0, -9.0)],
        tolerance_um: 41.0,
        rank: "preferred fit",
        nearest: nearest(Some(0.004)),
    };
    let choice = Choice {
        dimensions: vec!["hub.bore".into(), "shaft.seat".into()],
        written: vec!["dia 42 ?".into(), "dia 42 ?".into()],
        requirements: vec!["R-1".into()],
        judged: 12,
        serving: vec![candidate],
        room: Some((-0.025, 0.007)),
        unit: mm(),
        open_beside: vec!["lid.bore".into()],
        obstacle: Some("nothing is required of it".into()),
    };
    let recentred = Recentred {
        dimension: "hub.bore".into(),
        stated: 42.0,
        nominal: 42.01,
        unit: mm(),
        breaks: vec!["R-2".into()],
    };
    Selected {
        schema: SCHEMA,
        file: "specs/spindle.gap".into(),
        classes: vec![choice],
        centrings: vec![Centring {
            subject: "race".into(),
            below: nearest(Some(0.01)),
            above: nearest(None),
            shift: 0.002,
            margin: 0.006,
            by: vec![recentred],
            costliest: Some(Cost { name: "hub.bore".into(), share: 0.5 }),
        }],
        tolerances: vec![Tolerance {
            dimension: "hub.bore".into(),
            written: "dia 42 H7".into(),
            each_side: None,
            unit: mm(),
            stopped_by: Some("R-1".into()),
        }],
        spacer: Some(SpacerLength {
            dimension: "ring.width".into(),
            subject: "float".into(),
            conditions: ("cold".into(), "hot".into()),
            stated: 19.7,
            nominal: 19.9,
            unit: mm(),
            mean: 0.3,
            means_stated: (0.2, 0.4),
            unit_of_mean: mm(),
            beyond: vec!["R-2".into()],
        }),
        cautions: vec!["stress and force"],
    }
}

#[test]
fn the_published_schema_of_selections_is_that_of_the_types() {
    let text = format!("{}\n", serde_json::to_string_pretty(&schema()).unwrap());
    let published = include_str!("../../../docs/schema/select.schema.json");
    assert!(published == text, "the schema of the types is\n{text}");
}

#[test]
fn what_is_written_of_a_selection_keeps_to_its_schema() {
    let value: Value = serde_json::from_str(&json(&whole())).unwrap();
    assert_eq!(not_allowed(&schema(), &value), Vec::<String>::new());
    let nothing = Selected {
        classes: Vec::new(),
        centrings: Vec::new(),
        tolerances: Vec::new(),
        spacer: None,
        cautions: Vec::new(),
        ..whole()
    };
    let value: Value = serde_json::from_str(&json(&nothing)).unwrap();
    assert_eq!(not_allowed(&schema(), &value), Vec::<String>::new());
}

#[test]
fn what_does_not_keep_to_the_schema_of_selections_is_found() {
    let mut value: Value = serde_json::from_str(&json(&whole())).unwrap();
    value["schema"] = "gapkeep/select/0".into();
    value["classes"][0]["unit"] = 1.into();
    value["classes"][0]["serving"][0]["deviations_um"][0][1] = "wide".into();
    value["centrings"][0]["above"]["more"] = true.into();
    value["tolerances"][0].as_object_mut().unwrap().remove("written");
    let found = not_allowed(&schema(), &value);
    assert_eq!(found.len(), 5, "{found:?}");
}
