//! What stands at a place: blanks, words, and whether a line there begins a statement or carries one on.

use super::Context;

/// Offset of the first byte at or after `at` that is no blank; line ends are none.
pub(in crate::syntax) fn skip_blanks(text: &str, mut at: usize) -> usize {
    let bytes = text.as_bytes();
    loop {
        let width = match bytes.get(at) {
            Some(b' ' | b'\t' | b'\r') => 1,
            Some(0xC2) if bytes.get(at + 1) == Some(&0xA0) => 2,
            Some(0xE2) if matches!(bytes.get(at + 1..at + 3), Some([0x80, 0x89 | 0xAF])) => 3,
            _ => return at,
        };
        at += width;
    }
}

/// Offset of the first byte at or after `at` that is no blank, line end or comment.
pub(in crate::syntax) fn skip_lines(text: &str, mut at: usize) -> usize {
    let bytes = text.as_bytes();
    loop {
        at = skip_blanks(text, at);
        match bytes.get(at) {
            Some(b'\n') => at += 1,
            Some(b'#') => at = line_end(text, at),
            _ => return at,
        }
    }
}

/// Offset of the line end at or after `at`.
pub(in crate::syntax) fn line_end(text: &str, at: usize) -> usize {
    text.as_bytes()[at..]
        .iter()
        .position(|byte| *byte == b'\n')
        .map_or(text.len(), |length| at + length)
}

/// The word that begins at `at`; empty if none does.
pub(in crate::syntax) fn word_at(text: &str, at: usize) -> &str {
    let rest = text.get(at..).unwrap_or("");
    let length = rest.find(|c: char| !(c.is_alphanumeric() || c == '_')).unwrap_or(rest.len());
    let word = &rest[..length];
    if word.starts_with(|first: char| first.is_ascii_digit()) { "" } else { word }
}

/// True if a file-level statement begins at `at`, so that no block can still be open there.
///
/// The words alone do not tell: `part = 3` is a dimension and `condition 85` might be a part's row.
pub(super) fn begins_file_statement(text: &str, at: usize) -> bool {
    let word = word_at(text, at);
    let next = skip_blanks(text, at + word.len());
    let after_name = || {
        let name = word_at(text, next);
        (!name.is_empty()).then(|| skip_blanks(text, next + name.len()))
    };
    let begins = |place: Option<usize>, signs: &[char], words: &[&str]| {
        place.is_some_and(|place| {
            text[place..].starts_with(signs) || words.contains(&word_at(text, place))
        })
    };
    match word {
        "assembly" | "use" | "note" => text[next..].starts_with('"'),
        "lengths" | "temperatures" => word_at(text, next) == "in",
        "general" => word_at(text, next) == "ISO",
        "part" => begins(after_name(), &[], &["of", "like"]),
        "material" => begins(after_name(), &['{'], &["like"]),
        "fit" | "gap" | "result" => begins(after_name(), &['='], &[]),
        "restraint" | "fill" => begins(after_name(), &['{'], &[]),
        "condition" => {
            let number = |place| {
                text[place..].starts_with(|c: char| c.is_ascii_digit() || "+-\u{2212}.".contains(c))
            };
            after_name().is_some_and(|place| number(place) || word_at(text, place) == "from")
        }
        _ => false,
    }
}

/// True if a line that begins at `at` is clearly a statement of its own, even where one is unfinished.
pub(super) fn begins_statement(text: &str, at: usize) -> bool {
    let word = word_at(text, at);
    if word.is_empty() {
        return false;
    }
    matches!(word, "require" | "let")
        || text[skip_blanks(text, at + word.len())..].starts_with('=')
        || begins_file_statement(text, at)
}

/// True if a line that begins at `at` carries on the statement before it.
pub(super) fn carries_on(text: &str, at: usize, context: Context) -> bool {
    let rows = matches!(context, Context::Rows | Context::Joint);
    if begins_with_operator(&text[at..]) {
        return !rows;
    }
    let word = word_at(text, at);
    let clause = match word {
        "above" | "below" | "spread" | "shift" => true,
        "because" | "at" | "by" | "for" | "concession" | "except" | "before" | "after"
        | "along" | "across" | "load" | "strain" | "basis" | "over" | "on" | "build" | "from"
        | "accepts" | "until" | "approved" | "area" | "stiffness" | "of" | "in" | "like"
        | "lot" | "rev" => !rows,
        _ => false,
    };
    clause && !text[skip_blanks(text, at + word.len())..].starts_with('=')
}

/// True if an expression cannot end with the text before `end`.
pub(super) fn is_unfinished(text: &str, end: usize, context: Context) -> bool {
    let before = &text[..end];
    let operator = before.ends_with(['=', '+', '-', '*', '/', '^', '\u{2212}', '\u{D7}', '\u{B7}']);
    before.ends_with(',') || operator && matches!(context, Context::File | Context::Statements)
}

fn begins_with_operator(rest: &str) -> bool {
    rest.starts_with(['+', '-', '*', '/', '^', '\u{2212}', '\u{D7}', '\u{B7}', '\u{B1}'])
}
