//! Hostile text: no panic, no hang, and a finding with a place wherever something is wrong.

use std::time::{Duration, Instant};

use super::{read, specs};
use gapkeep::diagnostic::Code;
use gapkeep::syntax::Parsed;
use proptest::prelude::{Just, Strategy, any, prop, prop_oneof, proptest};

/// Reads a text and holds what is true of every outcome.
fn survive(text: &str) -> Parsed {
    let parsed = read(text);
    for finding in &parsed.diagnostics {
        let span = finding.primary.span;
        assert!(text.get(span.range()).is_some(), "{} lies outside of the text", finding.message);
        assert!(finding.message.len() < 400, "{}", finding.message);
    }
    let broken = &parsed.tree.broken;
    assert!(
        broken.is_empty() || !parsed.diagnostics.is_empty(),
        "something is lost without a word"
    );
    parsed
}

#[test]
fn every_beginning_of_every_statement() {
    for (name, text) in specs() {
        for statement in read(&text).tree.statements {
            let whole = &text[statement.span().range()];
            for end in (0..whole.len()).filter(|end| whole.is_char_boundary(*end)) {
                let cut = &whole[..end];
                let parsed = survive(cut);
                // The specs have no brace in a string or a comment.
                let open = cut.matches('{').count() > cut.matches('}').count();
                assert!(!open || !parsed.diagnostics.is_empty(), "{name}: {cut}");
            }
        }
    }
}

#[test]
fn every_line_left_out_or_said_twice() {
    for (_, text) in specs() {
        let lines: Vec<&str> = text.lines().collect();
        for at in 0..lines.len() {
            let mut fewer = lines.clone();
            fewer.remove(at);
            survive(&fewer.join("\n"));
            let mut more = lines.clone();
            more.insert(at, lines[at]);
            survive(&more.join("\n"));
        }
    }
}

#[test]
fn every_brace_left_out_is_reported() {
    for (name, text) in specs() {
        for (at, _) in text.match_indices(['{', '}']) {
            let cut = format!("{}{}", &text[..at], &text[at + 1..]);
            assert!(!survive(&cut).diagnostics.is_empty(), "{name}: brace at {at}");
        }
    }
}

#[test]
fn every_token_doubled_left_out_or_replaced() {
    let spoilers =
        ["\0", "\"", "{", "}", "(", ")", "1e+999", "=", "\u{2013}", "\u{FFFD}", "#", ";"];
    for (_, text) in specs() {
        let tokens: Vec<&str> = text.split_inclusive(' ').collect();
        // A long spec is sampled, so that the whole takes seconds.
        for at in (0..tokens.len()).step_by(1 + tokens.len() / 200) {
            let rest = || tokens[at + 1..].concat();
            let before = tokens[..at].concat();
            survive(&format!("{before}{}{}{}", tokens[at], tokens[at], rest()));
            survive(&format!("{before}{}", rest()));
            survive(&format!("{before}{} {}", spoilers[at % spoilers.len()], rest()));
        }
    }
}

#[test]
fn a_name_of_the_grammar_is_no_secret_word() {
    for text in ["EOI", "word_of x", "dimension_line", "WHITESPACE"] {
        assert_eq!(survive(text).diagnostics.len(), 1, "{text}");
    }
}

/// Texts of about a size that tells linear work from quadratic.
fn large() -> Vec<(&'static str, String)> {
    let n = 100_000;
    vec![
        ("broken lines", "part part of of 3 = {{ \"\n".repeat(2_000)),
        ("broken lines in one block", format!("part p of m {{\n{}}}\n", "x = = 3\n".repeat(2_000))),
        ("open braces", "{".repeat(n)),
        ("closed braces", "}".repeat(n / 10)),
        ("nested parts", "part p of m {\n".repeat(2_000)),
        ("nested blocks", "a { ".repeat(n)),
        ("open parentheses", format!("let v = {}", "(".repeat(n))),
        ("open parentheses and lines", format!("let v = {}", "(\n".repeat(n))),
        ("calls", format!("let v = {}", "f(".repeat(n))),
        ("minus signs", format!("let v = {}1", "-".repeat(n))),
        ("powers", format!("let v = 1{}", "^1".repeat(n))),
        ("terms", format!("let v = 1{}", "+1".repeat(n))),
        ("factors", format!("let v = 1{}", "*a.b".repeat(n))),
        ("names", format!("gap g = a {{ require at {} }}", "a, ".repeat(n))),
        ("words", format!("gap g = a {{ require {} }}", "a ".repeat(n))),
        ("digits", format!("let v = {}", "1".repeat(10 * n))),
        ("letters", "x".repeat(10 * n)),
        ("one line", format!("note {}", "a ".repeat(5 * n))),
        ("quotes", "\"".repeat(n)),
        ("backslashes", format!("note \"{}", "\\".repeat(n))),
        ("blank lines after an operator", format!("let v = 1 +{}2", "\n".repeat(10 * n))),
        ("comments after an operator", format!("let v = 1 +{}2", " # c\n".repeat(n))),
        ("comments in blocks", format!("part p of m {{{}}}", "# c\n".repeat(n))),
        ("semicolons", ";".repeat(10 * n)),
        ("commas", format!("let v = {}", ",".repeat(n))),
        ("decimal commas", format!("let v = {}", "1,1 ".repeat(n / 10))),
        ("rows", format!("material m {{ expansion {{\n{}}} }}", "-1 2\n".repeat(n / 10))),
        ("clauses", format!("part p of m {{ a = 1 {} }}", "because \"b\" ".repeat(n / 10))),
        ("nul", "\0".repeat(n)),
        ("blanks", " ".repeat(10 * n)),
        ("wide blanks", "\u{2009}".repeat(n)),
        ("accents", "\u{301}".repeat(n)),
    ]
}

#[test]
fn work_is_linear_in_the_text() {
    for (name, text) in large() {
        let start = Instant::now();
        survive(&text);
        let spent = start.elapsed();
        // A quadratic pass over these takes minutes; a linear one milliseconds. The bound leaves room
        // for a slow machine without optimisation.
        assert!(spent < Duration::from_secs(10), "{name}: {spent:?}");
    }
}

#[test]
fn two_thousand_broken_lines_are_two_thousand_findings() {
    let parsed = survive(&format!("part p of m {{\n{}}}\n", "x = = 3\n".repeat(2_000)));
    assert_eq!(parsed.diagnostics.len(), 2_000);
}

#[test]
fn nesting_is_capped_once() {
    for text in ["{".repeat(1_000), format!("let v = {}1{}", "(".repeat(1_000), ")".repeat(1_000))]
    {
        let parsed = survive(&text);
        let deep =
            parsed.diagnostics.iter().filter(|finding| finding.code == Code::NestedTooDeep).count();
        assert_eq!(deep, 1, "{}", &text[..20]);
    }
    let allowed = format!("let v = {}1{}", "(".repeat(64), ")".repeat(64));
    assert_eq!(survive(&allowed).diagnostics, []);
}

/// Words that belong to the language, and some that do not.
fn token() -> impl Strategy<Value = String> {
    let words = [
        "assembly",
        "part",
        "of",
        "like",
        "material",
        "condition",
        "gap",
        "fit",
        "in",
        "joint",
        "require",
        "at",
        "by",
        "because",
        "spread",
        "normal",
        "before",
        "coating",
        "dia",
        "radius",
        "one",
        "exact",
        "load",
        "over",
        "from",
        "swell",
        "cte",
        "mean",
        "bore",
        "a",
        "a.b",
        "2x ",
        "42",
        "-1.5",
        ".5",
        "1e-6",
        "mm",
        "ppm/K",
        "%",
        "K6",
        "\u{B1}",
        "+",
        "-",
        "*",
        "/",
        "^",
        "(",
        ")",
        "{",
        "}",
        "=",
        "..",
        ">=",
        "<=",
        ",",
        ";",
        "\n",
        "\"t\"",
        "\"",
        "#",
        "?",
        "until",
        "2027-03-31",
        "concession",
        "let",
        "general",
        "ISO",
        "2768-m",
        "preload",
        "cavity",
        "charge",
    ];
    prop_oneof![20 => prop::sample::select(words.to_vec()).prop_map(str::to_owned), 1 => any::<String>(), 1 => Just("\0".to_owned())]
}

proptest! {
    #[test]
    fn any_text(text in any::<String>()) {
        survive(&text);
    }

    #[test]
    fn any_order_of_words(tokens in prop::collection::vec(token(), 0..60)) {
        survive(&tokens.join(" "));
        survive(&tokens.concat());
    }
}
