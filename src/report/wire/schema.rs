//! The JSON Schema of the format, made from its types, and held against what is written.
//!
//! `docs/schema/report.schema.json` is the published copy; the test that finds it different prints
//! what it should be.

use super::{Document, Map, SCHEMA};
use schemars::{JsonSchema, Schema, SchemaGenerator, json_schema, schema_for};
use serde_json::Value;
use std::borrow::Cow;

impl JsonSchema for Map {
    fn schema_name() -> Cow<'static, str> {
        "Map".into()
    }

    fn json_schema(_: &mut SchemaGenerator) -> Schema {
        json_schema!({ "type": "object", "additionalProperties": { "type": ["number", "null"] } })
    }
}

/// The schema of the format, made from its types.
fn schema() -> Value {
    let mut schema = schema_for!(Document).to_value();
    schema["title"] = "A report of gapkeep".into();
    schema["properties"]["schema"] = serde_json::json!({
        "const": SCHEMA, "description": "The name of the format."
    });
    schema
}

/// What of `value` the schema does not allow, with the path to it. Knows the keywords that the
/// schema uses and fails on any other.
fn violations(schema: &Value, root: &Value, value: &Value, path: &str, found: &mut Vec<String>) {
    let Some(keywords) = schema.as_object() else { return };
    let mut wrong = |what: &str| found.push(format!("{path}: {what}: {value}"));
    for (keyword, rule) in keywords {
        match keyword.as_str() {
            "$schema" | "title" | "description" | "$defs" | "format" => {}
            "const" if value != rule => wrong("another constant"),
            "minimum" if value.as_f64() < rule.as_f64() => wrong("too small"),
            "type" if !is_of(value, rule) => wrong("another type"),
            "minItems" if value.as_array().map(Vec::len) < rule.as_u64().map(|n| n as usize) => {
                wrong("too short");
            }
            "maxItems" if value.as_array().map(Vec::len) > rule.as_u64().map(|n| n as usize) => {
                wrong("too long");
            }
            "required" => {
                for name in rule.as_array().into_iter().flatten().filter_map(Value::as_str) {
                    if value.get(name).is_none() {
                        wrong(&format!("`{name}` is missing"));
                    }
                }
            }
            "const" | "minimum" | "type" | "minItems" | "maxItems" => {}
            "$ref" | "anyOf" | "items" | "prefixItems" | "properties" | "additionalProperties" => {}
            other => wrong(&format!("the check does not know `{other}`")),
        }
    }
    if let Some(name) = schema["$ref"].as_str().and_then(|r| r.strip_prefix("#/$defs/")) {
        violations(&root["$defs"][name], root, value, path, found);
    }
    if let Some(choices) = schema["anyOf"].as_array() {
        let fits = choices.iter().any(|choice| {
            let mut none = Vec::new();
            violations(choice, root, value, path, &mut none);
            none.is_empty()
        });
        if !fits {
            found.push(format!("{path}: fits no choice: {value}"));
        }
    }
    if let (Some(items), Some(list)) = (schema.get("items"), value.as_array()) {
        for (i, item) in list.iter().enumerate() {
            violations(items, root, item, &format!("{path}[{i}]"), found);
        }
    }
    if let (Some(Value::Array(items)), Some(list)) = (schema.get("prefixItems"), value.as_array()) {
        for (i, (rule, item)) in items.iter().zip(list).enumerate() {
            violations(rule, root, item, &format!("{path}[{i}]"), found);
        }
    }
    if let Some(object) = value.as_object() {
        for (name, item) in object {
            let path = format!("{path}.{name}");
            let known = schema.get("properties").and_then(|p| p.get(name));
            match known.or_else(|| schema.get("additionalProperties")) {
                Some(rule) => violations(rule, root, item, &path, found),
                // A reader may rely on the schema naming everything that is written.
                None if schema.get("properties").is_some() => {
                    found.push(format!("{path}: not in the schema"));
                }
                None => {}
            }
        }
    }
}

fn is_of(value: &Value, rule: &Value) -> bool {
    let one = |name: &str| match name {
        "null" => value.is_null(),
        "string" => value.is_string(),
        "number" => value.is_number(),
        "integer" => value.is_u64() || value.is_i64(),
        "array" => value.is_array(),
        "object" => value.is_object(),
        "boolean" => value.is_boolean(),
        _ => false,
    };
    match rule {
        Value::String(name) => one(name),
        Value::Array(names) => names.iter().filter_map(Value::as_str).any(one),
        _ => false,
    }
}

/// What of `value` a schema does not allow.
pub(in crate::report) fn not_allowed(schema: &Value, value: &Value) -> Vec<String> {
    let mut found = Vec::new();
    violations(schema, schema, value, "", &mut found);
    found
}

fn found_in(value: &Value) -> Vec<String> {
    not_allowed(&schema(), value)
}

#[test]
fn the_published_schema_is_that_of_the_types() {
    let text = format!("{}\n", serde_json::to_string_pretty(&schema()).unwrap());
    let published = include_str!("../../../docs/schema/report.schema.json");
    assert!(published == text, "the schema of the types is\n{text}");
}

#[test]
fn what_is_written_keeps_to_the_schema() {
    let text = crate::report::json::json(&crate::report::sample::report());
    let value: Value = serde_json::from_str(&text).unwrap();
    assert_eq!(found_in(&value), Vec::<String>::new());
}

#[test]
fn what_does_not_keep_to_it_is_found() {
    let text = crate::report::json::json(&crate::report::sample::report());
    let mut value: Value = serde_json::from_str(&text).unwrap();
    value["schema"] = "gapkeep/0".into();
    value["specs"][0]["requirements"][0]["margin"] = "wide".into();
    // No number is both of another type and too small.
    value["specs"][0]["findings"][0]["line"] = Value::Null;
    value["specs"][0]["results"][0]["least_at"]["housing.bore"] = "here".into();
    value["specs"][0]["more"] = 1.into();
    value["summary"].as_object_mut().unwrap().remove("hold");
    assert_eq!(found_in(&value).len(), 7, "{:?}", found_in(&value));
}
