//! Ways out of the commoner mistakes.

use super::{nearest, tolerance};
use crate::syntax::STATEMENT_WORDS;
use crate::syntax::found::short;
use crate::syntax::layout::{Line, word_at};

/// A way out of the commoner mistakes.
pub(super) fn hint(
    text: &str,
    line: &Line,
    at: usize,
    things: &[&str],
    words: &[&str],
) -> Option<String> {
    let rest = &text[at..line.end];
    let before = text[line.start..at].trim_end();
    let previous = last_word(before);
    let found = word_at(text, at);
    if word_at(text, line.start) == "wall" && at > line.start {
        return Some(
            "name two diameters of the part, as `wall bore body.bore outside body.outside`"
                .to_owned(),
        );
    }
    if rest.starts_with(['\u{2013}', '\u{2014}']) {
        return Some("write `..` for a range and `-` for a minus".to_owned());
    }
    if rest.starts_with(['\u{201C}', '\u{201D}', '\u{201E}', '\u{2018}', '\u{2019}', '\'']) {
        return Some("write `\"` before and after the words".to_owned());
    }
    for (wrong, right) in
        [("=>", ">="), ("=<", "<="), ("==", "="), (":=", "="), ("<", "<="), (">", ">=")]
    {
        if rest.starts_with(wrong) && !rest.starts_with(right) {
            return Some(format!("write `{right}`"));
        }
    }
    if rest.starts_with('=') && things.contains(&"a size or a dimension") {
        return Some("the lines of a joint have no `=`".to_owned());
    }
    if rest.starts_with('^') {
        return Some("powers do not chain; put one of them in parentheses".to_owned());
    }
    if rest.starts_with(')') {
        return Some("this `)` closes nothing; remove it, or add the `(`".to_owned());
    }
    if found == "exact" {
        return Some("a size is exact or has a tolerance, not both".to_owned());
    }
    let glued = before.len() == at - line.start;
    if rest.starts_with('-') && glued && !previous.is_empty() && !word_at(text, at + 1).is_empty() {
        return Some(format!("names have no `-`; write `{previous}_{}`", word_at(text, at + 1)));
    }
    if rest.starts_with("..") {
        return None;
    }
    if rest.starts_with('.') && before.ends_with(|c: char| c.is_ascii_digit()) {
        return Some("a number does not end in a point; write `5` or `5.0`".to_owned());
    }
    if let Some(number) = unsigned_exponent(before, if glued { rest } else { "" }) {
        return Some(format!("an exponent has its sign: `{number}`"));
    }
    if previous == "x" && !found.is_empty() {
        let digits = last_number(before[..before.len() - 1].trim_end());
        return Some(format!(
            "write `{digits}x {found}` for independent pieces, without a blank before the x"
        ));
    }
    if let Some(hint) = tolerance::hint(text, line, at, things) {
        return Some(hint);
    }
    if rest.starts_with(|c: char| c.is_ascii_digit())
        && rest.contains('/')
        && words.contains(&"exact")
    {
        return Some("each deviation has its sign: `+0.05/-0.02`".to_owned());
    }
    if word_at(text, line.start) != "part"
        && matches!(found, "hollow" | "outer" | "inner")
        && words.contains(&"solid")
    {
        return Some(format!(
            "write `{previous} outside 60` or `{previous} bore 20` for the far surface of a ring"
        ));
    }
    if things == ["a name"] && rest.starts_with(|c: char| c.is_ascii_digit()) {
        return Some("a name begins with a letter".to_owned());
    }
    let meant =
        nearest(found, words).or_else(|| nearest(previous, words).filter(|word| *word != previous));
    if let Some(word) = meant {
        return Some(format!("did you mean `{word}`?"));
    }
    if words == ["of", "like"] {
        return Some(format!(
            "write `{previous} of MATERIAL`, or `{previous} like PART` for another piece"
        ));
    }
    if STATEMENT_WORDS.contains(&found) {
        return Some(format!("begin a new line before `{found}`"));
    }
    if words.contains(&"except")
        && !found.is_empty()
        && (before.contains(" at ") || before.contains(" except "))
    {
        return Some(format!("names in a list have a comma between them: `{previous}, {found}`"));
    }
    (rest.starts_with('"') && words.contains(&"because"))
        .then(|| "write `because` before the reason".to_owned())
}

/// The number that `2e10` is meant for, if one ends where the text was understood, or goes on there.
fn unsigned_exponent(before: &str, glued: &str) -> Option<String> {
    let part = |c: char| c.is_ascii_alphanumeric() || c == '.';
    let start = before
        .rfind(|c| !part(c))
        .map_or(0, |at| at + before[at..].chars().next().map_or(1, char::len_utf8));
    let more = glued.find(|c| !part(c)).unwrap_or(glued.len());
    let token = format!("{}{}", short(&before[start..]), short(&glued[..more]));
    let (number, power) = token.split_once(['e', 'E'])?;
    let numeric = |text: &str| !text.is_empty() && text.bytes().all(|byte| byte.is_ascii_digit());
    (numeric(&number.replacen('.', "", 1)) && numeric(power)).then(|| format!("{number}e+{power}"))
}

pub(super) fn last_word(text: &str) -> &str {
    let start = text
        .rfind(|c: char| !(c.is_alphanumeric() || c == '_'))
        .map_or(0, |at| at + text[at..].chars().next().map_or(1, char::len_utf8));
    if text[start..].starts_with(|c: char| c.is_ascii_digit()) { "" } else { &text[start..] }
}

fn last_number(text: &str) -> &str {
    let start = text
        .rfind(|c: char| !c.is_ascii_digit())
        .map_or(0, |at| at + text[at..].chars().next().map_or(1, char::len_utf8));
    &text[start..]
}
