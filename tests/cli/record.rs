//! `record` and `check --recorded`.

use super::{Bench, HOLDS};

#[test]
fn a_record_is_written_beside_its_spec_and_holds_until_something_changes() {
    let bench = Bench::new(&[("specs/sleeve.gap", HOLDS)]);
    let missing = bench.run("check specs --recorded");
    assert_eq!(missing.status, 1);
    assert!(missing.output.contains("there is no record `specs/sleeve.record.yaml`"));
    assert_eq!(bench.run("record specs").status, 0);
    let record = bench.text("specs/sleeve.record.yaml");
    insta::assert_snapshot!(record);
    assert_eq!(bench.run("check specs --recorded").status, 0);

    bench.put("specs/sleeve.gap", &HOLDS.replace("dia 42 g6", "dia 42 f6"));
    let stale = bench.run("check specs --recorded");
    assert_eq!(stale.status, 1);
    insta::assert_snapshot!(stale.output);
    assert_eq!(bench.text("specs/sleeve.record.yaml"), record, "check writes nothing");
}

#[test]
fn a_record_does_not_depend_on_the_folder_or_the_day() {
    let (one, other) = (Bench::new(&[("a.gap", HOLDS)]), Bench::new(&[("deep/er/a.gap", HOLDS)]));
    one.run("record a.gap");
    let later = gapkeep::cli::Environment { today: "2031-01-01".into(), ..other.environment() };
    other.run_with("record deep", "", later);
    assert_eq!(one.text("a.record.yaml"), other.text("deep/er/a.record.yaml"));
}

#[test]
fn a_spec_with_mistakes_has_no_record() {
    let bench = Bench::new(&[("a.gap", &HOLDS.replace("lengths in mm", "lengths in ells"))]);
    let ran = bench.run("record a.gap");
    assert_eq!(ran.status, 2);
    assert!(ran.errors.contains("ells"), "{}", ran.errors);
    assert!(!bench.path().join("a.record.yaml").exists());
}
