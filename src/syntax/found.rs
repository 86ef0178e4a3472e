//! What a message says was found at a place.

use super::layout::skip_blanks;

/// Longest piece of the text that a message repeats.
const LONGEST: usize = 24;

/// The word, number, string or sign at `at`; empty at a line end.
pub(super) fn token(text: &str, at: usize) -> &str {
    let rest = text.get(at..).unwrap_or("");
    let rest = &rest[..rest.find('\n').unwrap_or(rest.len())];
    let Some(first) = rest.chars().next() else { return "" };
    let word = |c: char| c.is_alphanumeric() || c == '_';
    let end = if first == '"' {
        rest[1..].find('"').map_or(rest.len(), |closing| closing + 2)
    } else if first.is_ascii_digit() {
        rest.find(|c: char| !word(c) && c != '.').unwrap_or(rest.len())
    } else if word(first) {
        rest.find(|c| !word(c)).unwrap_or(rest.len())
    } else if first == '\r' {
        0
    } else {
        let sign = ["..", ">=", "<=", "+/-", "+-", "==", "=>", "=<"]
            .into_iter()
            .find(|sign| rest.starts_with(sign));
        sign.map_or(first.len_utf8(), str::len)
    };
    &rest[..end]
}

/// What stands at `at` or after the blanks there, in words for people.
pub(super) fn found(text: &str, at: usize) -> String {
    let token = token(text, skip_blanks(text, at));
    if token.is_empty() || token.starts_with(['#', ';']) {
        return "the end of the line".to_owned();
    }
    format!("`{}`", short(token))
}

/// A piece of the text as a message repeats it: not too long, and without control characters.
pub(super) fn short(token: &str) -> String {
    let mut shown: String =
        token.chars().map(|c| if c.is_control() { '\u{FFFD}' } else { c }).take(LONGEST).collect();
    if token.chars().nth(LONGEST).is_some() {
        shown.push('…');
    }
    shown
}

#[cfg(test)]
mod tests {
    use super::found;

    #[test]
    fn says_what_stands_there() {
        let cases = [
            ("  bore = 2", "`bore`"),
            ("12.5mm", "`12.5mm`"),
            ("\"a b\" c", "`\"a b\"`"),
            (" # comment", "the end of the line"),
            ("\r\nx", "the end of the line"),
            ("..5", "`..`"),
            ("\u{1}", "`\u{FFFD}`"),
            ("abcdefghijklmnopqrstuvwxyz", "`abcdefghijklmnopqrstuvwx…`"),
        ];
        for (text, words) in cases {
            assert_eq!(found(text, 0), words, "{text:?}");
        }
    }
}
