//! The report as JSON and as YAML: the format of [`super::wire`], written out.

use super::Report;
use super::wire::document;

/// The report as JSON, two blanks a level, ended by a line end.
pub fn json(report: &Report) -> String {
    // A document of strings, numbers and lists cannot fail to be written; an empty text is what
    // remains to be said if it could.
    let mut text = serde_json::to_string_pretty(&document(report)).unwrap_or_default();
    text.push('\n');
    text
}

/// The report as YAML, ended by a line end.
pub fn yaml(report: &Report) -> String {
    serde_yaml::to_string(&document(report)).unwrap_or_default()
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::report::sample;
    use serde_json::Value;

    #[test]
    fn the_document_of_a_failing_spec() {
        insta::assert_snapshot!(json(&sample::report()));
    }

    #[test]
    fn what_is_not_a_number_is_null_and_keys_occur_once() {
        let mut report = sample::report();
        let account = report.specs[0].account.as_mut().unwrap();
        account.figures[0].greatest = f64::INFINITY;
        account.cases[0].margin = f64::NAN;
        let again = account.figures[0].least_at[0].clone();
        account.figures[0].least_at.push(again);
        let value: Value = serde_json::from_str(&json(&report)).unwrap();
        let spec = &value["specs"][0];
        assert!(spec["results"][0]["greatest"].is_null());
        assert!(spec["requirements"][0]["margin"].is_null());
        assert_eq!(spec["results"][0]["least_at"]["housing.bore (2)"], 41.987);
        assert_eq!(spec["requirements"][1]["window"]["intervals"][1][1], Value::Null);
    }

    #[test]
    fn yaml_says_the_same() {
        let report = sample::report();
        let of_json: Value = serde_json::from_str(&json(&report)).unwrap();
        let of_yaml: Value = serde_yaml::from_str(&yaml(&report)).unwrap();
        assert_eq!(of_json, of_yaml);
    }
}
