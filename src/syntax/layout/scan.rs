//! The pass itself.

use super::lookahead::{
    begins_file_statement, begins_statement, carries_on, is_unfinished, line_end, skip_blanks,
    skip_lines, word_at,
};
use super::{Block, Context, Layout, Line};
use crate::diagnostic::{Code, Diagnostic};
use crate::span::{FileId, Span};
use crate::syntax::found::{found, token};
use crate::syntax::tree::{Comment, MAX_DEPTH};

/// An open block and what is known of it so far.
struct Frame {
    header: Line,
    open: usize,
    context: Context,
    lines: Vec<Line>,
}

pub(super) struct Scanner<'a> {
    text: &'a str,
    file: FileId,
    at: usize,
    stack: Vec<Frame>,
    out: Layout,
}

impl<'a> Scanner<'a> {
    pub(super) fn new(text: &'a str, file: FileId) -> Self {
        let at = if text.starts_with('\u{FEFF}') { '\u{FEFF}'.len_utf8() } else { 0 };
        Scanner { text, file, at, stack: Vec::new(), out: Layout::default() }
    }

    pub(super) fn run(mut self) -> Layout {
        loop {
            self.skip_to_statement();
            match self.peek() {
                None => break,
                Some(b'}') => self.close_block(),
                Some(_) => self.statement(),
            }
        }
        self.close_all_unclosed(None);
        self.out
    }

    fn peek(&self) -> Option<u8> {
        self.text.as_bytes().get(self.at).copied()
    }

    fn span(&self, start: usize, end: usize) -> Span {
        Span::new(self.file, start, end)
    }

    fn context(&self) -> Context {
        self.stack.last().map_or(Context::File, |frame| frame.context)
    }

    fn lines(&mut self) -> &mut Vec<Line> {
        match self.stack.last_mut() {
            Some(frame) => &mut frame.lines,
            None => &mut self.out.lines,
        }
    }

    /// Skips blanks, line ends, semicolons and comments.
    fn skip_to_statement(&mut self) {
        loop {
            self.at = skip_blanks(self.text, self.at);
            match self.peek() {
                Some(b'\n' | b';') => self.at += 1,
                Some(b'#') => self.comment(),
                _ => return,
            }
        }
    }

    fn comment(&mut self) {
        let start = self.at;
        self.at = line_end(self.text, start);
        let before = self.text[..start].rfind('\n').map_or(0, |line| line + 1);
        let own_line = skip_blanks(self.text, before) == start;
        let text = self.text[start..self.at].trim_end();
        let span = self.span(start, start + text.len());
        self.out.comments.push(Comment { text: text.to_owned(), own_line, span });
    }

    /// Reads one statement up to its end, or into its block.
    fn statement(&mut self) {
        if !self.stack.is_empty() && begins_file_statement(self.text, self.at) {
            self.close_all_unclosed(Some(self.at));
        } else if self.cannot_stand_here() {
            self.close_unclosed(Some(self.at));
        }
        let line = self.words();
        if self.peek() != Some(b'{') {
            self.lines().push(line);
        } else if self.stack.len() < MAX_DEPTH {
            self.open_block(line);
        } else {
            self.skip_block(line);
        }
    }

    /// True for a line of the block around the innermost: a requirement in a joint, a property in a table.
    fn cannot_stand_here(&self) -> bool {
        let word = word_at(self.text, self.at);
        match self.context() {
            Context::Joint => word == "require",
            Context::Rows if self.stack.len() > 1 => matches!(
                word,
                "cte"
                    | "expansion"
                    | "modulus"
                    | "bulk"
                    | "poisson"
                    | "yield"
                    | "density"
                    | "swell"
                    | "source"
                    | "extrapolate"
            ),
            _ => false,
        }
    }

    /// Reads the words of a statement; stops before what ends it.
    fn words(&mut self) -> Line {
        let context = self.context();
        let start = self.at;
        let mut line = Line { start, end: start, block: None, sound: true };
        let mut depth = 0usize;
        let mut decided = self.at;
        while let Some(byte) = self.peek() {
            match byte {
                b'{' | b'}' | b';' => break,
                b'#' => {
                    self.comment();
                    continue;
                }
                b'\n' => {
                    if self.at >= decided {
                        decided = skip_lines(self.text, self.at);
                        if !self.goes_on(decided, line.end, depth, context) {
                            if self.text[decided..].starts_with('{') {
                                self.comments_before(decided);
                            }
                            break;
                        }
                    }
                    self.at += 1;
                    continue;
                }
                b'"' => line.sound &= self.string(),
                b'(' => {
                    depth += 1;
                    if depth == MAX_DEPTH + 1 {
                        self.too_deep("parentheses");
                        line.sound = false;
                    }
                    self.at += 1;
                }
                b')' => {
                    depth = depth.saturating_sub(1);
                    self.at += 1;
                }
                b',' => {
                    line.sound &= self.comma(line.sound);
                    self.at += 1;
                }
                _ => {
                    let past = skip_blanks(self.text, self.at);
                    if past > self.at {
                        self.at = past;
                        continue;
                    }
                    self.at += 1;
                }
            }
            line.end = self.at;
        }
        line
    }

    /// True if the statement whose words end at `end` goes on at `next`, on another line.
    fn goes_on(&self, next: usize, end: usize, depth: usize, context: Context) -> bool {
        match self.text.as_bytes().get(next) {
            None | Some(b'{' | b'}') => false,
            Some(_) if depth > 0 || is_unfinished(self.text, end, context) => {
                !begins_statement(self.text, next)
            }
            Some(_) => carries_on(self.text, next, context) && !begins_statement(self.text, next),
        }
    }

    /// Moves on to `brace`, which stands alone after a statement.
    fn comments_before(&mut self, brace: usize) {
        while self.at < brace {
            self.at = skip_blanks(self.text, self.at);
            match self.peek() {
                Some(b'#') => self.comment(),
                Some(b'\n') => self.at += 1,
                _ => break,
            }
        }
    }

    /// Reads a string; false if it is not closed on its line.
    fn string(&mut self) -> bool {
        let start = self.at;
        let bytes = self.text.as_bytes();
        self.at += 1;
        loop {
            match bytes.get(self.at) {
                Some(b'"') => {
                    self.at += 1;
                    return true;
                }
                Some(b'\\') if matches!(bytes.get(self.at + 1), Some(b'"' | b'\\')) => self.at += 2,
                None | Some(b'\n') => break,
                Some(_) => self.at += 1,
            }
        }
        let span = self.span(start, start + self.text[start..self.at].trim_end().len());
        self.report(
            Diagnostic::new(
                Code::UnclosedString,
                span,
                "expected a closing `\"`, found the end of the line",
            )
            .help("words in quotes stand on one line; write `\\\"` for a quote inside of them"),
        );
        false
    }

    /// Reports a comma that is meant as a decimal point; false if it is one.
    fn comma(&mut self, first: bool) -> bool {
        let bytes = self.text.as_bytes();
        let digit =
            |at: Option<usize>| at.and_then(|at| bytes.get(at)).is_some_and(u8::is_ascii_digit);
        if !(digit(self.at.checked_sub(1)) && digit(Some(self.at + 1))) {
            return true;
        }
        if first {
            let numeric = |byte: &u8| byte.is_ascii_digit() || *byte == b'.';
            let before = bytes[..self.at].iter().rev().take_while(|byte| numeric(byte)).count();
            let after = bytes[self.at + 1..].iter().take_while(|byte| numeric(byte)).count();
            let (whole, part) = (
                &self.text[self.at - before..self.at],
                &self.text[self.at + 1..self.at + 1 + after],
            );
            let help = if before + after <= 24 && !whole.contains('.') && !part.contains('.') {
                format!(
                    "write `{whole}.{part}`; a list has a blank after its comma: `{whole}, {part}`"
                )
            } else {
                "write a point; a list has a blank after its comma".to_owned()
            };
            let span = self.span(self.at, self.at + 1);
            self.report(
                Diagnostic::new(
                    Code::DecimalComma,
                    span,
                    "expected a decimal point, found a comma",
                )
                .help(help),
            );
        }
        false
    }

    fn open_block(&mut self, header: Line) {
        let open = self.at;
        self.at += 1;
        let context = match (self.context(), word_at(self.text, header.start)) {
            (Context::File, "condition" | "general") => Context::Rows,
            (Context::File, _) => Context::Statements,
            (Context::Statements, "joint") => Context::Joint,
            _ => Context::Rows,
        };
        self.stack.push(Frame { header, open, context, lines: Vec::new() });
    }

    /// Takes a closing brace; what follows on its line is reported and read as a statement of its own.
    fn close_block(&mut self) {
        let brace = self.at;
        self.at += 1;
        let Some(frame) = self.stack.pop() else {
            let span = self.span(brace, brace + 1);
            self.report(
                Diagnostic::new(Code::StrayBrace, span, "this `}` closes nothing")
                    .help("remove it, or add the `{` that it should close"),
            );
            return;
        };
        self.finish(frame, brace + 1);
        let next = skip_blanks(self.text, self.at);
        if !matches!(self.text.as_bytes().get(next), None | Some(b'\n' | b';' | b'}' | b'#')) {
            let found = found(self.text, next);
            let span = self.span(next, next + token(self.text, next).len());
            self.report(
                Diagnostic::new(
                    Code::SyntaxError,
                    span,
                    format!("expected the end of the line after `}}`, found {found}"),
                )
                .help("begin a new line here"),
            );
        }
    }

    fn finish(&mut self, frame: Frame, end: usize) {
        let mut line = frame.header;
        line.block = Some(Block { open: frame.open, end, lines: frame.lines });
        self.lines().push(line);
    }

    fn close_all_unclosed(&mut self, next: Option<usize>) {
        while !self.stack.is_empty() {
            self.close_unclosed(next);
        }
    }

    /// Ends the innermost block without its brace: at the end of the text, or before the line at `next`.
    fn close_unclosed(&mut self, next: Option<usize>) {
        let Some(frame) = self.stack.pop() else { return };
        let span = self.span(frame.open, frame.open + 1);
        let mut diagnostic = Diagnostic::new(Code::UnclosedBrace, span, "this `{` is never closed");
        diagnostic = match next {
            Some(next) => {
                let word = self.span(next, next + word_at(self.text, next).len());
                let name = word_at(self.text, next);
                diagnostic
                    .label(word, "this cannot stand inside of the block")
                    .help(format!("add a `}}` before the line of `{name}`"))
            }
            None => diagnostic.help("add a `}` at the end of the block"),
        };
        self.report(diagnostic);
        let last = frame.lines.last().map_or(frame.open + 1, Line::whole_end);
        self.finish(frame, last);
    }

    /// Skips a block that is nested too deep, without keeping what is in it.
    fn skip_block(&mut self, mut line: Line) {
        self.too_deep("blocks");
        line.sound = false;
        let mut depth = 0usize;
        while let Some(byte) = self.peek() {
            match byte {
                b'#' => {
                    self.comment();
                    continue;
                }
                b'"' => {
                    let end = self.text[self.at + 1..]
                        .find(['"', '\n'])
                        .map_or(self.text.len(), |n| self.at + 1 + n);
                    self.at = end;
                }
                b'{' => depth += 1,
                b'}' => depth -= 1,
                _ => {}
            }
            self.at = (self.at + 1).min(self.text.len());
            if depth == 0 {
                break;
            }
        }
        line.end = self.at.max(line.end);
        self.lines().push(line);
    }

    fn too_deep(&mut self, what: &str) {
        let span = self.span(self.at, self.at + 1);
        self.report(
            Diagnostic::new(
                Code::NestedTooDeep,
                span,
                format!("{what} nested more than {MAX_DEPTH} deep"),
            )
            .help("name a part of it with `let`, or close what is open"),
        );
    }

    fn report(&mut self, diagnostic: Diagnostic) {
        self.out.diagnostics.push(diagnostic);
    }
}
