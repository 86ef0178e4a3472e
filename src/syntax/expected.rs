//! What a failed statement says: what was expected, what was found, and a way out, in words for people.

mod hint;
mod meaning;
mod tolerance;

use hint::hint;
use meaning::{Meaning, meaning};

use super::found::{found, token};
use super::grammar::{Failure, Rule};
use super::layout::{Line, skip_blanks, skip_lines, word_at};
use crate::diagnostic::{Code, Diagnostic};
use crate::span::{FileId, Span};

/// Most things that a message lists; further ones go to the help line.
const LISTED: usize = 4;

/// The finding for a statement that its rule could not read.
pub(super) fn diagnostic(failure: &Failure, text: &str, line: &Line, file: FileId) -> Diagnostic {
    let at = skip_lines(text, line.start + failure.at).min(line.end);
    let mut things: Vec<&str> = Vec::new();
    let mut words: Vec<&str> = Vec::new();
    for rule in &failure.expected {
        match meaning(*rule) {
            Meaning::Thing(thing) if !things.contains(&thing) => things.push(thing),
            Meaning::Words(more) => words.extend(more),
            _ => {}
        }
    }
    words.dedup();
    let end_allowed = failure.expected.contains(&Rule::EOI);
    let mut listed: Vec<String> = things.iter().map(|thing| (*thing).to_owned()).collect();
    let all = listed.len() + words.len() + usize::from(end_allowed) <= LISTED;
    if all {
        listed.extend(words.iter().map(|word| format!("`{word}`")));
    } else {
        listed.truncate(LISTED - 1);
        if !words.is_empty() {
            listed.push(if end_allowed {
                "a clause".to_owned()
            } else {
                "one of the words below".to_owned()
            });
        }
    }
    if end_allowed {
        listed.push("the end of the line".to_owned());
    }
    if listed.is_empty() {
        listed.push("something else".to_owned());
    }
    let span = Span::new(file, at, at + token(text, at).len().min(line.end - at));
    let message = format!("expected {}, found {}", either(&listed), found(text, at));
    let diagnostic = Diagnostic::new(Code::SyntaxError, span, message);
    match hint(text, line, at, &things, &words) {
        Some(hint) => diagnostic.help(hint),
        None if !all && !words.is_empty() => {
            let quoted: Vec<String> = words.iter().map(|word| format!("`{word}`")).collect();
            diagnostic.help(format!("what may stand here: {}", quoted.join(", ")))
        }
        None => diagnostic,
    }
}

/// `a`, `a or b`, `a, b or c`
pub(super) fn either(items: &[String]) -> String {
    match items {
        [] => String::new(),
        [one] => one.clone(),
        [first @ .., last] => format!("{} or {last}", first.join(", ")),
    }
}

/// The word of `words` that `spelled` is most likely meant for.
pub(super) fn nearest<'w>(spelled: &str, words: &[&'w str]) -> Option<&'w str> {
    let spelled: String = spelled.chars().take(32).collect();
    let lower = spelled.to_lowercase();
    let allowed = match spelled.chars().count() {
        0 | 1 => return None,
        2..=3 => 1,
        _ => 2,
    };
    let near = words.iter().map(|word| (strsim::osa_distance(&lower, &word.to_lowercase()), *word));
    near.filter(|(distance, _)| *distance <= allowed)
        .min_by_key(|(distance, _)| *distance)
        .map(|(_, word)| word)
}

/// What stands after a header whose statement takes no block, or a missing block.
pub(super) fn unexpected_block(text: &str, line: &Line, open: usize, file: FileId) -> Diagnostic {
    let word = word_at(text, line.start);
    let span = Span::new(file, open, open + 1);
    let diagnostic =
        Diagnostic::new(Code::SyntaxError, span, "expected the end of the line, found `{`");
    if word.is_empty() { diagnostic } else { diagnostic.help(format!("`{word}` takes no block")) }
}

/// The finding for a header that needs a block and has none.
pub(super) fn missing_block(text: &str, line: &Line, file: FileId) -> Diagnostic {
    let message = format!("expected `{{`, found {}", found(text, skip_blanks(text, line.end)));
    let help = format!("what belongs to `{}` stands in braces after it", word_at(text, line.start));
    Diagnostic::new(Code::SyntaxError, Span::new(file, line.end, line.end), message).help(help)
}
