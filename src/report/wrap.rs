//! Text in columns: width as a terminal counts it, wrapping at blanks, cutting, and what may be
//! shown at all. Must not know what the text says.

use unicode_width::{UnicodeWidthChar, UnicodeWidthStr};

/// Columns a text takes.
pub(crate) fn width(text: &str) -> usize {
    text.width()
}

/// The text with blanks after it up to `columns`.
pub(crate) fn left(text: &str, columns: usize) -> String {
    format!("{text}{}", blanks(columns.saturating_sub(width(text))))
}

/// The text with blanks before it up to `columns`.
pub(crate) fn right(text: &str, columns: usize) -> String {
    format!("{}{text}", blanks(columns.saturating_sub(width(text))))
}

/// So many blanks.
pub(crate) fn blanks(columns: usize) -> String {
    " ".repeat(columns)
}

/// The words of a text in lines of at most `columns`; a longer word has a line of its own.
///
/// A figure and its unit, or a name in backticks, may part at a line's end: what matters is that
/// nothing is lost.
pub(crate) fn wrap(text: &str, columns: usize) -> Vec<String> {
    let mut lines = Vec::new();
    let mut line = String::new();
    for word in text.split_whitespace() {
        if !line.is_empty() && width(&line) + 1 + width(word) > columns {
            lines.push(std::mem::take(&mut line));
        }
        if !line.is_empty() {
            line.push(' ');
        }
        line.push_str(word);
    }
    if !line.is_empty() || lines.is_empty() {
        lines.push(line);
    }
    lines
}

/// The text with everything that could move a cursor, hide or reorder it made visible: tabs become
/// blanks, control and direction characters the replacement character.
pub(crate) fn visible(text: &str) -> String {
    let mut shown = String::with_capacity(text.len());
    for c in text.chars() {
        match c {
            '\t' => shown.push_str("    "),
            // A byte-order mark has no width and says nothing to a reader.
            '\u{feff}' => {}
            c if c.is_control() || is_directional(c) => shown.push('\u{fffd}'),
            c => shown.push(c),
        }
    }
    shown
}

/// Marks that reorder text, which would let a line read otherwise than it is.
fn is_directional(c: char) -> bool {
    matches!(c, '\u{200e}' | '\u{200f}' | '\u{202a}'..='\u{202e}' | '\u{2066}'..='\u{2069}')
}

/// The part of a text from column `from`, at most `columns` wide.
pub(crate) fn cut(text: &str, from: usize, columns: usize) -> String {
    let mut at = 0;
    let mut shown = String::new();
    for c in text.chars() {
        let wide = c.width().unwrap_or(0);
        if at >= from && at + wide <= from + columns {
            shown.push(c);
        }
        at += wide;
    }
    shown
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn lines_break_at_blanks_only() {
        assert_eq!(wrap("one two three", 7), ["one two", "three"]);
        assert_eq!(wrap("a_word_longer_than_that x", 7), ["a_word_longer_than_that", "x"]);
        assert_eq!(wrap("", 7), [""]);
    }

    #[test]
    fn nothing_can_move_the_cursor() {
        assert_eq!(visible("a\tb\u{1b}[2J"), "a    b\u{fffd}[2J");
        assert_eq!(visible("\u{202e}x"), "\u{fffd}x");
    }

    #[test]
    fn columns_count_wide_characters_twice() {
        assert_eq!(width("½ 部"), 4);
        assert_eq!(cut("部品 x", 2, 3), "品 ");
        assert_eq!(right("µm", 4), "  µm");
    }
}
