//! What a failed statement says: what was expected, what was found, and a way out, in words for people.

use super::found::{found, token};
use super::grammar::{Failure, Rule};
use super::layout::{Line, skip_blanks, skip_lines, word_at};
use crate::diagnostic::{Code, Diagnostic};
use crate::span::{FileId, Span};

/// Most things that a message lists; further ones go to the help line.
const LISTED: usize = 4;

/// What a rule is to people.
enum Meaning {
    /// A thing with a description.
    Thing(&'static str),
    /// Words of the language.
    Words(&'static [&'static str]),
    /// Nothing that helps.
    Silent,
}

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
    if end_allowed || listed.is_empty() {
        listed.push("the end of the line".to_owned());
    }
    let span = Span::new(file, at, at + token(text, at).len().min(line.end - at));
    let message = format!("expected {}, found {}", either(&listed), found(text, at));
    let diagnostic = Diagnostic::new(Code::SyntaxError, span, message);
    match hint(text, line, at, &words) {
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

/// A way out of the commoner mistakes.
fn hint(text: &str, line: &Line, at: usize, words: &[&str]) -> Option<String> {
    let rest = &text[at..line.end];
    let before = text[line.start..at].trim_end();
    let previous = last_word(before);
    let found = word_at(text, at);
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
    let glued = before.len() == at - line.start;
    if rest.starts_with('-') && glued && !previous.is_empty() && !word_at(text, at + 1).is_empty() {
        return Some(format!("names have no `-`; write `{previous}_{}`", word_at(text, at + 1)));
    }
    if rest.starts_with('.') && before.ends_with(|c: char| c.is_ascii_digit()) {
        return Some("a number does not end in a point; write `5` or `5.0`".to_owned());
    }
    if previous == "x" && !found.is_empty() {
        let digits = last_number(before[..before.len() - 1].trim_end());
        return Some(format!(
            "write `{digits}x {found}` for independent pieces, without a blank before the x"
        ));
    }
    if rest.starts_with(|c: char| c.is_ascii_digit())
        && rest.contains('/')
        && words.contains(&"exact")
    {
        return Some("each deviation has its sign: `+0.05/-0.02`".to_owned());
    }
    let meant =
        nearest(found, words).or_else(|| nearest(previous, words).filter(|word| *word != previous));
    if let Some(word) = meant {
        return Some(format!("did you mean `{word}`?"));
    }
    (rest.starts_with('"') && words.contains(&"because"))
        .then(|| "write `because` before the reason".to_owned())
}

fn last_word(text: &str) -> &str {
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

/// The text of a word's rule.
fn word(rule: Rule) -> Option<&'static [&'static str]> {
    Some(match rule {
        Rule::word_rev => &["rev"],
        Rule::word_in => &["in"],
        Rule::word_iso => &["ISO"],
        Rule::word_angle => &["angle"],
        Rule::word_from => &["from"],
        Rule::word_above => &["above"],
        Rule::word_below => &["below"],
        Rule::word_of => &["of"],
        Rule::word_like => &["like"],
        Rule::word_instantaneous => &["instantaneous"],
        Rule::word_mean => &["mean"],
        Rule::word_over => &["over"],
        Rule::word_lot => &["lot"],
        Rule::word_internal => &["internal"],
        Rule::word_external => &["external"],
        Rule::word_radius => &["radius"],
        Rule::word_dia => &["dia"],
        Rule::word_exact => &["exact"],
        Rule::word_one => &["one"],
        Rule::word_at => &["at"],
        Rule::word_along => &["along"],
        Rule::word_across => &["across"],
        Rule::word_before => &["before"],
        Rule::word_after => &["after"],
        Rule::word_coating => &["coating"],
        Rule::word_build_up => &["build-up"],
        Rule::word_on => &["on"],
        Rule::word_both => &["both"],
        Rule::word_side => &["side"],
        Rule::word_sides => &["sides"],
        Rule::word_load => &["load"],
        Rule::word_strain => &["strain"],
        Rule::word_basis => &["basis"],
        Rule::word_measured => &["measured"],
        Rule::word_supplier => &["supplier"],
        Rule::word_assumed => &["assumed"],
        Rule::word_drawing => &["drawing"],
        Rule::word_because => &["because"],
        Rule::word_spread => &["spread"],
        Rule::word_normal => &["normal"],
        Rule::word_sorted => &["sorted"],
        Rule::word_uniform => &["uniform"],
        Rule::word_triangular => &["triangular"],
        Rule::word_cpk => &["Cpk"],
        Rule::word_shift => &["shift"],
        Rule::word_clearance => &["clearance"],
        Rule::word_inner => &["inner"],
        Rule::word_outer => &["outer"],
        Rule::word_bore => &["bore"],
        Rule::word_outside => &["outside"],
        Rule::word_solid => &["solid"],
        Rule::word_rz => &["Rz"],
        Rule::word_area => &["area"],
        Rule::word_stiffness => &["stiffness"],
        Rule::word_gap => &["gap"],
        Rule::word_yield => &["yield"],
        Rule::word_except => &["except"],
        Rule::word_by => &["by"],
        Rule::word_worst => &["worst"],
        Rule::word_case => &["case"],
        Rule::word_rss => &["rss"],
        Rule::word_sigma => &["sigma"],
        Rule::word_for => &["for"],
        Rule::word_assemblies => &["assemblies"],
        Rule::word_concession => &["concession"],
        Rule::word_accepts => &["accepts"],
        Rule::word_until => &["until"],
        Rule::word_approved => &["approved"],
        _ => return None,
    })
}

fn meaning(rule: Rule) -> Meaning {
    use Meaning::{Silent, Thing, Words};
    if let Some(word) = word(rule) {
        return Words(word);
    }
    match rule {
        Rule::name | Rule::state => Thing("a name"),
        Rule::string => Thing("words in quotes"),
        Rule::number
        | Rule::signed
        | Rule::scalar
        | Rule::plain
        | Rule::nominal
        | Rule::quantity
        | Rule::group => Thing("a number"),
        Rule::deviation | Rule::signed_number | Rule::zero => Thing("a signed deviation"),
        Rule::unit | Rule::factor_unit => Thing("a unit"),
        Rule::table_unit => Thing("a unit after a comma"),
        Rule::tolerance | Rule::symmetric => Thing("a tolerance"),
        Rule::range_end => Thing("`..`"),
        Rule::slash => Thing("`/`"),
        Rule::equals => Thing("`=`"),
        Rule::closing => Thing("`)`"),
        Rule::standard => Thing("`2768-`"),
        Rule::size => Thing("a size"),
        Rule::class => Thing("a class such as `H7`"),
        Rule::characteristic | Rule::geometrical => Thing("a geometrical tolerance"),
        Rule::expr | Rule::product | Rule::factor | Rule::atom => {
            Thing("a dimension, a number or `(`")
        }
        Rule::path | Rule::term | Rule::pieces => Thing("a dimension"),
        Rule::add | Rule::subtract | Rule::multiply | Rule::divide | Rule::exponent => {
            Thing("an operator")
        }
        Rule::operand => Thing("a size or a dimension"),
        Rule::limit => Thing("a limit such as `>= 0.1`"),
        Rule::comparison => Thing("`>=` or `<=`"),
        Rule::measure => Thing("a quantity such as `clearance`"),
        Rule::date => Thing("a date such as `2027-03-31`"),
        Rule::decimals => Thing("`.XX`"),
        Rule::general_class => Thing("a class such as `m`"),
        Rule::own_temperature => Thing("a temperature"),
        Rule::property => Thing("a property"),
        Rule::side => Words(&["internal", "external"]),
        Rule::form => Words(&["dia", "radius"]),
        Rule::direction => Words(&["along", "across"]),
        Rule::coating => Words(&["before", "after"]),
        Rule::distribution => Words(&["normal", "sorted", "uniform", "triangular", "from"]),
        Rule::normal => Words(&["normal"]),
        Rule::material_condition => Words(&["MMC", "LMC"]),
        _ => Silent,
    }
}
