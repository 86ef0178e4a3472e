//! The language page: every example on it is a spec, and every word of the grammar is on it.

use super::{findings, place};
use gapkeep::span::FileId;
use gapkeep::syntax::tidy;

fn page() -> String {
    std::fs::read_to_string(place("../docs/language.md")).expect("the page is part of the project")
}

#[test]
fn every_example_parses_and_is_in_the_one_layout() {
    let page = page();
    let examples: Vec<&str> = page
        .split("```gap\n")
        .skip(1)
        .filter_map(|rest| rest.split_once("```"))
        .map(|(example, _)| example)
        .collect();
    assert!(examples.len() >= 10, "examples are missing");
    for example in examples {
        assert_eq!(findings(example), "", "in\n{example}");
        assert_eq!(tidy(example, FileId(0)).as_deref(), Some(example));
    }
}

#[test]
fn every_word_is_explained() {
    let page = page();
    let grammar = std::fs::read_to_string(place("../grammar/words.pest")).expect("a grammar file");
    let words: Vec<&str> = grammar
        .lines()
        .filter(|line| line.starts_with("word_"))
        .filter_map(|line| line.split('"').nth(1))
        .collect();
    assert!(words.len() > 80, "no words found");
    let missing: Vec<&&str> = words
        .iter()
        .filter(|word| {
            !page.split(|c: char| !(c.is_alphanumeric() || c == '-')).any(|found| found == **word)
        })
        .collect();
    assert!(missing.is_empty(), "the page does not mention {missing:?}");
}

#[test]
fn every_rule_of_the_grammar_says_what_it_reads() {
    for entry in std::fs::read_dir(place("../grammar")).expect("the folder is part of the project")
    {
        let path = entry.expect("a readable entry").path();
        let text = std::fs::read_to_string(&path).expect("a grammar file");
        let lines: Vec<&str> = text.lines().collect();
        for at in 1..lines.len() {
            let rule =
                lines[at].split_once(" = ").filter(|(name, _)| !name.contains([' ', '/', '|']));
            if let Some((name, _)) = rule {
                assert!(
                    lines[at - 1].starts_with("/// "),
                    "{}: `{name}` has no words",
                    path.display()
                );
            }
        }
    }
}
