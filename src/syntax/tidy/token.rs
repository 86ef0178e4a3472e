//! A statement's words, and the blanks between them.
//!
//! Works on text that is known to parse, so it need not ask whether a word may stand where it stands;
//! it only has to tell a sign from an operator, and what is glued from what is not.

use crate::syntax::layout::{skip_blanks, word_at};

/// What a statement is, as far as blanks depend on it.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Kind {
    /// `gap`, `result`, `let`, `fit`, `cavity`: an expression after the `=`.
    Expression,
    /// `bore = dia 42 K6`
    Dimension,
    /// `condition hot 85`
    Condition,
    /// `general ISO 2768-m`
    General,
    /// `squeezed cover.thickness area 160 mm2`
    Member,
    /// Any other.
    Other,
}

#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Class {
    Word,
    Number,
    Unit,
    Text,
    /// A sign before a number or an operand.
    Sign,
    /// An operator with blanks around it.
    Operator,
    /// What is glued on both sides.
    Tight,
    Open,
    Close,
    Comma,
    PlusMinus,
}

/// A word, number, string or sign.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct Token {
    /// As it is written, in the one spelling.
    pub(super) text: String,
    /// Offset of its first byte in the source.
    pub(super) start: usize,
    /// Offset past its last byte.
    pub(super) end: usize,
    class: Class,
    /// True if no blank stands before it in the source.
    glued: bool,
}

/// The tokens of `text[start..end]`, comments left out.
pub(super) fn tokens(text: &str, start: usize, end: usize, kind: Kind) -> Vec<Token> {
    let mut scan =
        Scan { text: &text[..end], at: start, kind, after_equals: false, out: Vec::new() };
    loop {
        let before = scan.at;
        scan.at = crate::syntax::layout::skip_lines(scan.text, before);
        if scan.at >= end {
            return scan.out;
        }
        scan.token(before == scan.at);
    }
}

/// True if a blank stands between two tokens of one line.
pub(super) fn blank_between(before: &Token, after: &Token) -> bool {
    use Class::{Close, Comma, Open, PlusMinus, Sign, Tight, Unit, Word};
    match (before.class, after.class) {
        (_, Comma | Close) | (Open | Sign | PlusMinus, _) => false,
        // After a unit a glued `^` would become the unit's own power.
        (Unit, Tight) if after.text == "^" => true,
        (_, Tight) | (Tight, _) => false,
        (Word, Open) => !after.glued,
        _ => true,
    }
}

struct Scan<'a> {
    text: &'a str,
    at: usize,
    kind: Kind,
    after_equals: bool,
    out: Vec<Token>,
}

impl Scan<'_> {
    fn rest(&self) -> &str {
        &self.text[self.at..]
    }

    fn last(&self) -> Option<Class> {
        self.out.last().map(|token| token.class)
    }

    fn in_expression(&self) -> bool {
        self.kind == Kind::Expression && self.after_equals
    }

    fn push(&mut self, length: usize, class: Class, text: Option<&str>, glued: bool) {
        let (start, end) = (self.at, self.at + length);
        let text = text.map_or_else(|| self.text[start..end].to_owned(), str::to_owned);
        self.out.push(Token { text, start, end, class, glued });
        self.at = end;
    }

    /// Reads one token at a place that is no blank.
    fn token(&mut self, glued: bool) {
        let rest = self.rest();
        let first = rest.chars().next().unwrap_or(' ');
        let second = rest[first.len_utf8()..].chars().next().unwrap_or(' ');
        if self.out.last().is_some_and(|token| token.text == "until") {
            let length = rest.find(|c: char| c.is_whitespace() || c == '"').unwrap_or(rest.len());
            return self.push(length.max(1), Class::Word, None, glued);
        }
        match first {
            '"' => {
                let length = string_length(rest);
                self.push(length, Class::Text, None, glued);
            }
            '0'..='9' => self.number(glued),
            '.' if second.is_ascii_digit() => self.number(glued),
            '.' if second == '.' => self.push(2, Class::Operator, None, glued),
            '\u{D8}' | '\u{2300}' if self.kind == Kind::Dimension && self.after_equals => {
                self.push(first.len_utf8(), Class::Word, Some("dia"), glued);
            }
            '%' => self.unit(glued),
            '.' => self.word(glued),
            '=' => {
                self.after_equals = true;
                self.push(1, Class::Operator, None, glued);
            }
            '>' | '<' if second == '=' => self.push(2, Class::Operator, None, glued),
            '\u{2265}' => self.push(first.len_utf8(), Class::Operator, Some(">="), glued),
            '\u{2264}' => self.push(first.len_utf8(), Class::Operator, Some("<="), glued),
            '\u{B1}' => self.push(first.len_utf8(), Class::PlusMinus, None, glued),
            '+' if rest.starts_with("+/-") => self.push(3, Class::PlusMinus, Some("\u{B1}"), glued),
            '+' if second == '-' && !self.in_expression() => {
                self.push(2, Class::PlusMinus, Some("\u{B1}"), glued)
            }
            '+' | '-' | '\u{2212}' => self.sign(first.len_utf8(), glued),
            '*' | '\u{D7}' | '\u{B7}' => self.factor(first.len_utf8(), "*", glued),
            '/' => self.factor(1, "/", glued),
            '^' => self.push(1, Class::Tight, None, glued),
            '(' => self.push(1, Class::Open, None, glued),
            ')' => self.push(1, Class::Close, None, glued),
            ',' => self.push(1, Class::Comma, None, glued),
            _ if self.last() == Some(Class::Number) || !is_word(first) => self.unit(glued),
            _ => self.word(glued),
        }
    }

    fn number(&mut self, glued: bool) {
        let rest = self.rest();
        let digits = |text: &str| text.bytes().take_while(u8::is_ascii_digit).count();
        let mut length = digits(rest);
        let count = rest[length..]
            .chars()
            .next()
            .filter(|c| length > 0 && matches!(c, 'x' | 'X' | '\u{D7}'));
        if let (Some(sign), true) = (count, self.in_expression() || self.kind == Kind::Member) {
            let after = length + sign.len_utf8();
            if skip_blanks(rest, after) > after || rest[after..].starts_with('\n') {
                let text = format!("{}x", &rest[..length]);
                return self.push(after, Class::Word, Some(&text), glued);
            }
        }
        if rest[length..].starts_with('.') && digits(&rest[length + 1..]) > 0 {
            length += 1 + digits(&rest[length + 1..]);
        }
        let mut power = rest[length..].chars();
        if matches!(power.next(), Some('e' | 'E')) && matches!(power.next(), Some('+' | '-')) {
            let exponent = digits(&rest[length + 2..]);
            length += if exponent > 0 { 2 + exponent } else { 0 };
        }
        self.push(length, Class::Number, None, glued);
    }

    /// A unit, in the one spelling: `degC`, `um`.
    fn unit(&mut self, glued: bool) {
        let rest = self.rest();
        let part = |c: char| is_word(c) || matches!(c, '\u{B0}' | '%' | '\u{B2}' | '\u{B3}');
        let mut length = 0;
        loop {
            length += rest[length..].find(|c| !part(c)).unwrap_or(rest.len() - length);
            let mut next = rest[length..].chars();
            let Some(sign) = next.next().filter(|c| matches!(c, '/' | '*' | '\u{B7}')) else {
                break;
            };
            let multiplies = sign == '*' && self.in_expression();
            if multiplies || !next.next().is_some_and(|c| c.is_alphabetic() || c == '\u{B0}') {
                break;
            }
            length += sign.len_utf8();
        }
        if length == 0 {
            let length = rest.chars().next().map_or(1, char::len_utf8);
            return self.push(length, Class::Word, None, glued);
        }
        let mut text = rest[..length].replace("\u{B0}C", "degC").replace("\u{B0}F", "degF");
        text = text.replace('\u{B0}', "deg").replace(['\u{B5}', '\u{3BC}'], "u");
        self.push(length, Class::Unit, Some(&text), glued);
    }

    fn word(&mut self, glued: bool) {
        let rest = self.rest();
        if rest.starts_with("build-up") {
            return self.push("build-up".len(), Class::Word, None, glued);
        }
        // Where a unit is named without a number, it has the one spelling too.
        let named_unit = match self.out.last() {
            Some(token) if self.kind == Kind::Other => token.text == "," || token.text == "in",
            _ => false,
        };
        if named_unit {
            return self.unit(glued);
        }
        let dot = usize::from(rest.starts_with('.'));
        let mut length = dot + rest[dot..].find(|c| !is_word(c)).unwrap_or(rest.len() - dot);
        let member =
            rest[length..].strip_prefix('.').map(|name| word_at(name, 0).len()).unwrap_or(0);
        if member > 0 {
            length += 1 + member;
        }
        self.push(length.max(1), Class::Word, None, glued);
    }

    fn sign(&mut self, length: usize, glued: bool) {
        if self.kind == Kind::General {
            return self.push(length, Class::Tight, None, glued);
        }
        let before_in =
            self.out.last().is_some_and(|token| token.text == "in" && token.class == Class::Word);
        let operand_before = match self.last() {
            Some(Class::Word) => !before_in,
            Some(Class::Number | Class::Unit | Class::Close) => true,
            _ => false,
        };
        let class =
            if self.in_expression() && operand_before { Class::Operator } else { Class::Sign };
        self.push(length, class, None, glued);
    }

    /// `*` or `/`: in an expression glued where it is glued on both sides, elsewhere always.
    fn factor(&mut self, length: usize, text: &str, glued: bool) {
        let after = self.at + length;
        let tight = glued && crate::syntax::layout::skip_lines(self.text, after) == after;
        let class = if tight || !self.in_expression() { Class::Tight } else { Class::Operator };
        self.push(length, class, Some(text), glued);
    }
}

fn is_word(c: char) -> bool {
    c.is_alphanumeric() || c == '_'
}

fn string_length(text: &str) -> usize {
    let bytes = text.as_bytes();
    let mut at = 1;
    while at < bytes.len() && bytes[at] != b'"' {
        at += if bytes[at] == b'\\' && matches!(bytes.get(at + 1), Some(b'"' | b'\\')) {
            2
        } else {
            1
        };
    }
    (at + 1).min(text.len())
}
