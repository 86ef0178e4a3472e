//! One mistake a file, named `code.gap` or `code--which.gap`: what is said about it, and that it is
//! said once.

use super::{findings, place, read};
use gapkeep::diagnostic::Code;
use gapkeep::syntax::tree::Name;

fn bad_specs() -> Vec<(String, String)> {
    let folder = std::fs::read_dir(place("bad/syntax")).expect("the folder is part of the project");
    let mut specs: Vec<(String, String)> = folder
        .map(|entry| entry.expect("a readable entry").path())
        .filter(|path| path.extension().is_some_and(|extension| extension == "gap"))
        .map(|path| {
            let name = path.file_stem().expect("a file").to_string_lossy().into_owned();
            (name, std::fs::read_to_string(path).expect("a readable spec"))
        })
        .collect();
    specs.sort();
    assert!(specs.len() >= 80, "bad specs are missing");
    specs
}

#[test]
fn each_is_said_in_words_for_people() {
    let mut settings = insta::Settings::clone_current();
    settings.set_snapshot_path(place("bad/syntax"));
    settings.set_prepend_module_to_snapshot(false);
    settings.set_omit_expression(true);
    settings.bind(|| {
        for (name, text) in bad_specs() {
            insta::assert_snapshot!(name.clone(), format!("{text}\n{}", findings(&text)));
        }
    });
}

#[test]
fn one_mistake_is_one_finding_of_the_code_in_the_name() {
    for (name, text) in bad_specs().into_iter().filter(|(name, _)| name != "three-mistakes") {
        let found: Vec<Code> = read(&text).diagnostics.iter().map(|finding| finding.code).collect();
        assert_eq!(found.len(), 1, "{name}: {found:?}");
        assert_eq!(name.split("--").next(), Some(found[0].text()), "{name}");
    }
}

#[test]
fn no_message_holds_a_name_of_the_grammar() {
    let grammar: String = std::fs::read_dir(place("../grammar"))
        .expect("the folder is part of the project")
        .map(|file| {
            std::fs::read_to_string(file.expect("a readable entry").path()).expect("a grammar file")
        })
        .collect();
    let rules: Vec<&str> = grammar
        .lines()
        .filter_map(|line| line.split_once(" = "))
        .map(|(name, _)| name)
        .filter(|name| name.contains('_') && !name.contains(' '))
        .collect();
    assert!(rules.len() > 100, "no rules found");
    for (name, text) in bad_specs() {
        for finding in read(&text).diagnostics {
            let words = format!("{} {:?} {:?}", finding.message, finding.help, finding.secondary);
            for rule in &rules {
                assert!(!words.contains(rule), "{name}: {words} holds {rule}");
            }
            assert!(!finding.message.ends_with('.'), "{name}: {}", finding.message);
            assert!(finding.message.len() < 200, "{name}: {}", finding.message);
        }
    }
}

#[test]
fn three_mistakes_are_three_findings() {
    let text =
        std::fs::read_to_string(place("bad/syntax/three-mistakes.gap")).expect("a readable spec");
    assert_eq!(
        findings(&text).lines().count(),
        4,
        "the header, two lines in blocks, and the gap's name"
    );
}

#[test]
fn a_broken_statement_leaves_its_neighbours_whole() {
    let text = "part a of m {\n x = 1 ±0.1\n y = = 2\n z = 3 ±0.1\n}\nfoo bar\npart b of m { x = 1 ±0.1 }\n";
    let parsed = read(text);
    assert_eq!(parsed.diagnostics.len(), 2);
    assert_eq!(parsed.tree.statements.len(), 2);
    let spelled = |name: &Option<Name>| name.as_ref().map_or("-", |name| &name.value).to_owned();
    let broken: Vec<String> = parsed
        .tree
        .broken
        .iter()
        .map(|broken| format!("{} in {}", spelled(&broken.name), spelled(&broken.within)))
        .collect();
    assert_eq!(broken, ["y in a", "foo in -"]);
}
