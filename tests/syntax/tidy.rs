//! The one layout: nothing lost, nothing changed but blanks and a few spellings, and at rest once done.

use super::{all_specs, place, read, specs};
use gapkeep::span::FileId;
use gapkeep::syntax::tidy;
use proptest::prelude::{ProptestConfig, any, prop_assert_eq, proptest};

fn laid_out(text: &str) -> String {
    tidy(text, FileId(0)).unwrap_or_else(|| panic!("no syntax errors in\n{text}"))
}

/// The tree of a text without its places, in the one spelling.
fn tree(text: &str) -> String {
    let mut tree = read(text).tree;
    tree.comments.clear();
    let shown = format!("{tree:?}");
    let mut out = String::new();
    let mut rest = shown.as_str();
    while let Some((before, after)) = rest.split_once("Span { ") {
        out.push_str(before);
        rest = after.split_once(" }").expect("a span has an end").1;
    }
    out.push_str(rest);
    let spellings = [("\u{B0}C", "degC"), ("\u{B0}", "deg"), ("\u{B5}m", "um"), ("\u{3BC}m", "um")];
    spellings.iter().fold(out, |out, (written, one)| out.replace(written, one))
}

fn comments(text: &str) -> Vec<String> {
    read(text).tree.comments.into_iter().map(|comment| comment.text).collect()
}

/// Holds what is true of every layout.
fn check(name: &str, text: &str) -> String {
    let once = laid_out(text);
    assert_eq!(laid_out(&once), once, "{name} is not at rest");
    assert_eq!(tree(&once), tree(text), "{name} means something else\n{once}");
    assert_eq!(comments(&once), comments(text), "{name} lost a comment");
    assert!(once.lines().all(|line| line.trim_end() == line), "{name} has blanks at a line's end");
    assert!(
        !once.contains("\n\n\n") && !once.starts_with('\n') && !once.ends_with("\n\n"),
        "{name} has empty lines"
    );
    once
}

#[test]
fn specs_keep_their_meaning_and_comments() {
    for (name, text) in all_specs() {
        check(&name, &text);
    }
}

#[test]
fn specs_without_any_layout_of_their_own() {
    for (name, text) in specs() {
        let squeezed: String = text
            .lines()
            .map(|line| {
                format!(
                    "\t{}  \r\n\r\n\r\n",
                    line.trim().replace(" = ", "=").replace(" \u{B1}", "\u{B1}")
                )
            })
            .collect();
        check(&name, &squeezed);
    }
}

#[test]
fn the_layout_is_this() {
    let before = std::fs::read_to_string(place("syntax/untidy.gap")).expect("a readable spec");
    let after = check("untidy", &before);
    let mut settings = insta::Settings::clone_current();
    settings.set_snapshot_path(place("syntax"));
    settings.set_prepend_module_to_snapshot(false);
    settings.set_omit_expression(true);
    settings.bind(|| insta::assert_snapshot!("untidy", after));
}

#[test]
fn a_text_with_mistakes_is_left_alone() {
    assert_eq!(tidy("part p of m { a = = 1 }", FileId(0)), None);
    assert_eq!(tidy("", FileId(0)), Some(String::new()));
}

#[test]
fn a_glued_power_is_no_power_of_a_unit() {
    assert_eq!(laid_out("let v = 2.5 mm ^ 2 * a ^ 2"), "let v = 2.5 mm ^2 * a^2\n");
    assert_eq!(laid_out("let v=a/b -c / d+ -e"), "let v = a/b - c / d + -e\n");
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(64))]

    /// Blanks, line ends and comments are strewn over a spec; its tree must come through.
    #[test]
    fn any_blanks_and_comments(which in 0usize..8, seed in any::<u64>()) {
        let (name, text) = specs().swap_remove(which);
        let mut state = seed | 1;
        let mut strewn = String::new();
        for line in text.lines() {
            for piece in line.split_inclusive(' ') {
                state = state.wrapping_mul(6_364_136_223_846_793_005).wrapping_add(1_442_695_040_888_963_407);
                strewn.push_str(piece);
                if piece.ends_with(' ') && !line.contains('"') && !line.contains('#') {
                    strewn.push_str(["", "  ", "\t", "\u{A0}"][(state >> 60) as usize % 4]);
                }
            }
            strewn.push_str(["\n", " # x\n", "\n# y\n", "\n\n\n"][(state >> 40) as usize % 4]);
        }
        let once = check(&name, &strewn);
        prop_assert_eq!(laid_out(&once), once);
    }
}
