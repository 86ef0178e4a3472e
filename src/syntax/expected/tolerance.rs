//! Ways out where a tolerance, a class or a range is written in the wrong place or in other words.

use super::hint::last_word;
use crate::syntax::found::token;
use crate::syntax::layout::{Line, word_at};

/// A way out for what stands at `at`, if it is a tolerance, a class or a range gone astray.
pub(super) fn hint(text: &str, line: &Line, at: usize, things: &[&str]) -> Option<String> {
    let rest = text[at..line.end].trim_end();
    let before = text[line.start..at].trim_end();
    if things.contains(&"a size") {
        return first_the_size(rest);
    }
    let keyword = word_at(text, line.start);
    if keyword == "require" {
        return range(before, rest).or_else(|| tolerance(rest).and_then(|_| limit(before)));
    }
    let behind = before.rsplit(char::is_whitespace).next().unwrap_or_default();
    let class = before.contains('=') && is_class(behind);
    if things.contains(&"`..`") || class {
        let unsigned = rest.starts_with(|c: char| c.is_ascii_digit());
        if class && (unsigned || tolerance(rest).is_some()) {
            return Some("a size has a class or a tolerance, not both".to_owned());
        }
        if let Some(mate) = rest.strip_prefix('/').filter(|_| class) {
            let mate = mate.split(|c: char| !c.is_ascii_alphanumeric()).next().unwrap_or_default();
            return Some(format!(
                "each part has its own class: `{behind}` here, `{mate}` at the part that it fits"
            ));
        }
        if unsigned && !rest.contains('/') && things.contains(&"a tolerance") {
            let number = token(text, at);
            return Some(format!("a tolerance has its sign: `±{number}`, or `+{number}/0`"));
        }
    }
    let (tolerance, after) = tolerance(rest)?;
    if before.contains('=') {
        let clause = ["basis", "at", "load", "strain"]
            .iter()
            .any(|word| before.split_whitespace().any(|w| w == *word));
        let cavity = (keyword == "cavity").then(|| {
            "a volume that is computed varies with its sizes and has no tolerance of its own"
                .to_owned()
        });
        return cavity.or_else(|| clause.then(|| behind_its_number(tolerance)));
    }
    own_temperature(before, tolerance)
        .filter(|_| after.is_empty() || after.starts_with([';', '}']))
        .or_else(|| Some(behind_its_number(tolerance)))
}

/// True for a word that reads as a class of ISO 286, such as `K6` or `js6`.
fn is_class(word: &str) -> bool {
    let letters = word.trim_end_matches(|c: char| c.is_ascii_digit());
    let two = ["js", "cd", "ef", "fg", "za", "zb", "zc"];
    let one = letters.len() == 1 && letters.bytes().all(|b| b.is_ascii_alphabetic());
    (one || two.contains(&letters.to_ascii_lowercase().as_str()))
        && (1..=2).contains(&(word.len() - letters.len()))
}

fn behind_its_number(tolerance: &str) -> String {
    format!("write `{tolerance}` right behind the number that it belongs to")
}

/// A tolerance at the beginning of `rest`, and what comes after it.
fn tolerance(rest: &str) -> Option<(&str, &str)> {
    let number =
        |text: &str| text.find(|c: char| !(c.is_ascii_digit() || c == '.')).unwrap_or(text.len());
    let signs = ["±", "+/-", "+-"];
    let end = match signs.iter().find(|sign| rest.starts_with(**sign)) {
        Some(sign) => {
            let from =
                sign.len() + rest[sign.len()..].len() - rest[sign.len()..].trim_start().len();
            from + number(&rest[from..])
        }
        None => {
            rest.strip_prefix(['+', '-'])?;
            let end = rest.find(char::is_whitespace).unwrap_or(rest.len());
            rest[..end].contains('/').then_some(end)?
        }
    };
    Some((&rest[..end], rest[end..].trim_start()))
}

/// `rod 30 K above ±1` is meant for `rod 30 ±1 K above`.
fn own_temperature(before: &str, tolerance: &str) -> Option<String> {
    let row = before.rsplit(['{', ';']).next().unwrap_or(before).trim();
    let words: Vec<&str> = row.split_whitespace().collect();
    let sense = words.iter().position(|word| matches!(*word, "above" | "below"))?;
    let (number, unit) = match words[..sense] {
        [_, number] => (number, ""),
        [_, number, unit] => (number, unit),
        _ => return None,
    };
    number.starts_with(|c: char| c.is_ascii_digit()).then_some(())?;
    let tolerance = tolerance.replacen("+-", "±", 1).replacen("+/-", "±", 1);
    let amount = [words[0], number, &tolerance, unit].join(" ");
    Some(format!(
        "the tolerance stands before the word: `{} {}`",
        amount.trim_end(),
        words[sense..].join(" ")
    ))
}

/// The size stands before its class or tolerance.
fn first_the_size(rest: &str) -> Option<String> {
    let first = rest.split_whitespace().next()?;
    let of = if is_class(first) { first } else { tolerance(rest)?.0 };
    Some(format!("the size stands first, as `20 {of}`"))
}

/// `0.1 - 0.2`, `0.1 to 0.2`, `between 0.1 and 0.2` are meant for `0.1 .. 0.2`.
fn range(before: &str, rest: &str) -> Option<String> {
    let meant = |low: &str, high: &str| {
        let number = |text: &str| text.parse::<f64>().is_ok();
        (number(low) && number(high)).then(|| format!("a range is written `{low} .. {high}`"))
    };
    let first = |text: &str| text.split_whitespace().next().unwrap_or_default().to_owned();
    let words: Vec<&str> = before.split_whitespace().collect();
    match words[..] {
        [.., low, "-", high] if rest.is_empty() => meant(low, high),
        [.., low] => {
            let high = ["to", "and"].iter().find_map(|word| rest.strip_prefix(word))?;
            meant(low, &first(high))
        }
        [] => None,
    }
}

/// What a limit looks like, where a tolerance stands without its middle, or behind other words.
fn limit(before: &str) -> Option<String> {
    Some(if last_word(before).is_empty() || before.contains(" at ") {
        "a tolerance stands right behind the middle, before `at`: `0.3 ±0.2 at hot`".to_owned()
    } else {
        "write the middle before it, as `0.3 ±0.2`, or a limit such as `>= 0.1`".to_owned()
    })
}
