//! The program itself: exit status, standard streams, a reader that goes away.

use super::{Bench, HOLDS, fails};
use std::io::Read;
use std::process::{Command, Output, Stdio};

fn gapkeep(bench: &Bench, arguments: &[&str]) -> Command {
    let mut command = Command::new(env!("CARGO_BIN_EXE_gapkeep"));
    command.current_dir(bench.path()).args(arguments);
    command.env_remove("NO_COLOR").env_remove("CLICOLOR_FORCE");
    command
}

fn output(bench: &Bench, arguments: &[&str]) -> Output {
    gapkeep(bench, arguments).output().unwrap()
}

#[test]
fn the_exit_status_tells_how_it_went() {
    let bench = Bench::new(&[("holds.gap", HOLDS), ("fails.gap", &fails()), ("wrong.gap", "x\n")]);
    for (file, status) in [("holds.gap", 0), ("fails.gap", 1), ("wrong.gap", 2), ("none.gap", 2)] {
        assert_eq!(output(&bench, &["check", file]).status.code(), Some(status), "{file}");
    }
    assert_eq!(output(&bench, &["check", "."]).status.code(), Some(1));
}

#[test]
fn a_pipe_gets_no_colour_unless_forced() {
    let bench = Bench::new(&[("fails.gap", &fails())]);
    let plain = output(&bench, &["check", "fails.gap"]).stdout;
    assert!(!plain.contains(&0x1b));
    let forced =
        gapkeep(&bench, &["check", "fails.gap"]).env("CLICOLOR_FORCE", "1").output().unwrap();
    assert!(forced.stdout.contains(&0x1b));
}

#[test]
fn a_reader_that_goes_away_is_no_mistake() {
    let bench = Bench::new(&[("holds.gap", HOLDS)]);
    let mut child = gapkeep(&bench, &["materials"])
        .stdout(Stdio::piped())
        .stderr(Stdio::piped())
        .spawn()
        .unwrap();
    drop(child.stdout.take());
    let mut errors = String::new();
    child.stderr.take().unwrap().read_to_string(&mut errors).unwrap();
    assert_eq!((child.wait().unwrap().code(), errors.as_str()), (Some(0), ""));
}

#[test]
fn input_of_any_kind_gives_findings_and_no_panic() {
    let bench = Bench::new(&[]);
    let long = format!("assembly \"x\"\ngap g = {}1 mm\n", "(".repeat(100_000));
    let inputs: [&[u8]; 6] = [
        b"",
        b"\xff\xfe\0a",
        b"assembly \"x\"\n\0",
        "assembly \"\u{feff}\"\n}}}}{{{{".as_bytes(),
        b"assembly \"x\"\npart a of steel_c45 { d = 1e999 \xc2\xb11 }\n",
        long.as_bytes(),
    ];
    for (i, bytes) in inputs.iter().enumerate() {
        std::fs::write(bench.path().join("x.gap"), bytes).unwrap();
        let ran = output(&bench, &["check", "x.gap"]);
        assert_eq!(ran.status.code(), Some(2), "input {i}");
        let shown = String::from_utf8(ran.stdout).unwrap();
        assert!(shown.contains("x.gap:") && ran.stderr.is_empty(), "input {i}: {shown}");
    }
}
