//! The one layout of a `.gap` file.
//!
//! Two columns a level; what belongs together stands in columns; line breaks inside of a statement
//! and empty lines between statements are the writer's (at most one empty line); comments stay where
//! they are. Numbers keep their spelling; units and signs have one.

mod align;
mod token;

use align::{Row, width};
use token::{Kind, blank_between, tokens};

use super::layout::{Block, Layout, Line, skip_blanks, word_at};
use super::tree::Comment;
use crate::span::FileId;

/// Columns of one level.
const LEVEL: usize = 2;

/// Widest line that a block may make of itself.
const WIDEST: usize = 100;

/// The text in the one layout; nothing if it has syntax errors.
pub(super) fn tidy(text: &str, file: FileId) -> Option<String> {
    if !super::parse(text, file).diagnostics.is_empty() {
        return None;
    }
    let layout = Layout::of(text, file);
    let mut printer =
        Printer { text, comments: &layout.comments, rows: Vec::new(), last: 0, first: true };
    printer.lines(&layout.lines, "", 0);
    printer.comments_before(text.len(), 0);
    Some(align::join(printer.rows))
}

struct Printer<'a> {
    text: &'a str,
    /// Comments not yet printed.
    comments: &'a [Comment],
    rows: Vec<Row>,
    /// Offset past what was printed last.
    last: usize,
    /// True at the beginning of the file or of a block, where no empty line stands.
    first: bool,
}

impl Printer<'_> {
    /// Prints the lines of a block, or of the file, whose statement begins with `parent`.
    fn lines(&mut self, lines: &[Line], parent: &str, indent: usize) {
        let rows = is_row_block(parent);
        let mut at = 0;
        while at < lines.len() {
            self.comments_before(lines[at].start, indent);
            // Rows that share a line go on sharing it.
            let together = lines[at..]
                .windows(2)
                .take_while(|pair| {
                    rows && !self.text[pair[0].whole_end()..pair[1].start].contains('\n')
                })
                .count();
            let group = &lines[at..=at + together];
            match self.on_one_line(group, parent) {
                Some(text) if together > 0 => {
                    self.row(group[0].start, group[together].whole_end(), indent, vec![text], None);
                    self.end_comment();
                }
                _ => group.iter().for_each(|line| self.line(line, parent, indent)),
            }
            at += together + 1;
        }
    }

    /// Prints one statement with its block.
    fn line(&mut self, line: &Line, parent: &str, indent: usize) {
        let kind = kind(self.text, line, parent);
        let word = word_at(self.text, line.start);
        let Some(block) = &line.block else {
            self.header(line, kind, indent, "");
            self.end_comment();
            return;
        };
        let inner = if is_single_line(self.text, block) {
            self.on_one_line(&block.lines, word)
        } else {
            None
        };
        if let Some(inner) = inner {
            let block_text =
                if inner.is_empty() { "{}".to_owned() } else { format!("{{ {inner} }}") };
            let single = !self.text[line.start..block.open].contains('\n');
            let header = self.plain(line, kind);
            if single && indent + width(&header) + 1 + width(&block_text) <= WIDEST {
                self.header(line, kind, indent, &block_text);
                self.last = block.end;
                self.end_comment();
                return;
            }
        }
        self.header(line, kind, indent, "{");
        self.last = block.open + 1;
        self.end_comment();
        self.first = true;
        self.lines(&block.lines, word, indent + LEVEL);
        self.comments_before(block.end.saturating_sub(1), indent + LEVEL);
        self.first = true;
        self.row(block.end.saturating_sub(1), block.end, indent, vec!["}".to_owned()], None);
        self.end_comment();
    }

    /// Prints a statement's words, on the lines they were written on, and then `tail`.
    fn header(&mut self, line: &Line, kind: Kind, indent: usize, tail: &str) {
        let tokens = tokens(self.text, line.start, line.end, kind);
        let mut depth = 0usize;
        let mut from = 0;
        let broken = |at: usize| self.text[tokens[at - 1].end..tokens[at].start].contains('\n');
        let breaks: Vec<usize> =
            (1..tokens.len()).filter(|at| broken(*at)).chain([tokens.len()]).collect();
        let many = breaks.len() > 1;
        for to in breaks {
            let piece = &tokens[from..to];
            let Some(first) = piece.first() else { break };
            let mut columns = indent;
            if from > 0 {
                self.comments_before(first.start, indent + LEVEL);
                let operand = !is_operator(&first.text) && !is_clause(self.text, first.start)
                    || first.text == "(";
                columns += LEVEL * (1 + depth) + if operand { LEVEL } else { 0 };
            }
            let mut cells = vec![String::new()];
            for (at, token) in piece.iter().enumerate() {
                let before = at.checked_sub(1).map(|before| &piece[before]);
                let cut = from == 0 && before.is_some() && begins_cell(kind, &tokens, at);
                if cut {
                    cells.push(String::new());
                } else if before.is_some_and(|before| blank_between(before, token)) {
                    cells.last_mut().expect("never empty").push(' ');
                }
                cells.last_mut().expect("never empty").push_str(&token.text);
                depth = match token.text.as_str() {
                    "(" => depth + 1,
                    ")" => depth.saturating_sub(1),
                    _ => depth,
                };
            }
            let last = to == tokens.len();
            if last && !many && !tail.is_empty() {
                let cell = cells.last_mut().expect("never empty");
                cell.push(' ');
                cell.push_str(tail);
            }
            let end = piece.last().map_or(first.end, |token| token.end);
            self.row(first.start, end, columns, cells, (from == 0).then_some(kind));
            if !last || !many && tail == "{" {
                self.end_comment();
            }
            from = to;
        }
        if many && !tail.is_empty() {
            self.end_comment();
            let brace = line.block.as_ref().map_or(line.end, |block| block.open);
            self.comments_before(brace, indent);
            self.row(brace, brace + 1, indent, vec![tail.to_owned()], None);
        }
    }

    /// A statement's words on one line.
    fn plain(&self, line: &Line, kind: Kind) -> String {
        let tokens = tokens(self.text, line.start, line.end, kind);
        let mut out = String::new();
        for (at, token) in tokens.iter().enumerate() {
            if at > 0 && blank_between(&tokens[at - 1], token) {
                out.push(' ');
            }
            out.push_str(&token.text);
        }
        out
    }

    /// Statements with their blocks on one line, if they were written so.
    fn on_one_line(&self, lines: &[Line], parent: &str) -> Option<String> {
        let mut out: Vec<String> = Vec::new();
        for line in lines {
            if self.text[line.start..line.whole_end()].contains('\n') {
                return None;
            }
            let mut text = self.plain(line, kind(self.text, line, parent));
            if let Some(block) = &line.block {
                let inner = self.on_one_line(&block.lines, word_at(self.text, line.start))?;
                text.push_str(&if inner.is_empty() {
                    " {}".to_owned()
                } else {
                    format!(" {{ {inner} }}")
                });
            }
            out.push(text);
        }
        Some(out.join("; "))
    }

    /// Prints the comments before `end`, each on a line of its own.
    fn comments_before(&mut self, end: usize, indent: usize) {
        while let Some((comment, rest)) = self.comments.split_first() {
            if comment.span.start as usize >= end {
                return;
            }
            self.comments = rest;
            let span = comment.span.range();
            self.row(span.start, span.end, indent, vec![comment.text.clone()], None);
        }
    }

    /// Adds the comment that stands after what was printed last, on its line.
    fn end_comment(&mut self) {
        let Some((comment, rest)) = self.comments.split_first() else { return };
        let start = comment.span.start as usize;
        let Some(between) = self.text.get(self.last..start) else { return };
        if between.contains('\n') || between.chars().any(|c| c != ';' && !c.is_whitespace()) {
            return;
        }
        if let Some(row) = self.rows.last_mut().filter(|row| row.comment.is_none()) {
            row.comment = Some(comment.text.clone());
            self.last = comment.span.end as usize;
            self.comments = rest;
        }
    }

    fn row(
        &mut self,
        start: usize,
        end: usize,
        indent: usize,
        cells: Vec<String>,
        kind: Option<Kind>,
    ) {
        let between = self.text.get(self.last..start).unwrap_or("");
        let blank_before = !self.first && between.bytes().filter(|byte| *byte == b'\n').count() > 1;
        let kind = kind.filter(|_| cells.len() > 1);
        self.rows.push(Row { indent, cells, kind, comment: None, blank_before });
        self.last = end;
        self.first = false;
    }
}

/// True if the block's lines are rows, which may share a line.
fn is_row_block(parent: &str) -> bool {
    !matches!(
        parent,
        "" | "part" | "material" | "fit" | "gap" | "result" | "restraint" | "fill" | "joint"
    )
}

fn is_single_line(text: &str, block: &Block) -> bool {
    !text[block.open..block.end].contains('\n')
}

fn kind(text: &str, line: &Line, parent: &str) -> Kind {
    let word = word_at(text, line.start);
    let next = skip_blanks(text, line.start + word.len());
    let rest = &text[next..line.end.max(next)];
    match (parent, word) {
        ("", "gap" | "result" | "let" | "fit") | ("fill", "cavity") => Kind::Expression,
        ("", "condition") => Kind::Condition,
        ("", "general") => Kind::General,
        ("part", "let") if !rest.starts_with('=') => Kind::Expression,
        ("part", "drawing") if rest.starts_with('"') => Kind::Other,
        ("part", _) => Kind::Dimension,
        ("restraint", "squeezed" | "stretched") => Kind::Member,
        _ => Kind::Other,
    }
}

/// True if a column begins at a token.
fn begins_cell(kind: Kind, tokens: &[token::Token], at: usize) -> bool {
    match kind {
        Kind::Dimension => at == 1,
        Kind::Condition => at == 2,
        Kind::Member => {
            let counted = tokens
                .get(1)
                .is_some_and(|token| token.text.ends_with('x') && !token.text.contains('.'))
                && tokens[1].text.starts_with(|c: char| c.is_ascii_digit());
            at == 1 || at == 2 + usize::from(counted)
        }
        _ => false,
    }
}

fn is_operator(text: &str) -> bool {
    text.starts_with(['+', '-', '*', '/', '^', '\u{2212}', '\u{B1}'])
}

/// True if a line goes on at `at` with a clause.
fn is_clause(text: &str, at: usize) -> bool {
    super::layout::carries_on(text, at)
}
