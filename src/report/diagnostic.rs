//! A finding as people read it: one sentence, its own line of the spec first, then the lines that
//! explain it, the cure last.
//!
//! Whole lines of the spec are shown, labels wrap at the width, and the line that the finding is
//! about always comes first, wherever it stands in the file.

use super::look::{Look, Role};
use super::wrap::{blanks, cut, left, right, visible, width, wrap};
use crate::diagnostic::{Diagnostic, Label, Severity};
use crate::source::Sources;
use crate::span::{FileId, Span};

/// A label longer than this beside its mark goes below it.
const LEAST_LABEL_COLUMNS: usize = 24;

/// The finding with the lines it points at, ended by a line end.
pub fn render(diagnostic: &Diagnostic, sources: &Sources, look: Look) -> String {
    let mut out = String::new();
    heading(&mut out, diagnostic, sources, look);
    let lines = lines(diagnostic, sources);
    let digits = lines.iter().map(|l| l.number.to_string().len()).max().unwrap_or(1);
    let page = Page { look, gutter: digits.max(2) + 2 };
    let mut file = diagnostic.primary.span.file;
    for (index, line) in lines.iter().enumerate() {
        if line.file != file {
            let place = format!("in {}", sources.get(line.file).name());
            page.row(&mut out, "", &look.paint(Role::Quiet, &visible(&place)));
            file = line.file;
        } else if index > 0 && line.number != lines[index - 1].number + 1 {
            let gap = right(look.pick("\u{250a}", ":"), page.gutter + 2);
            out.push_str(&look.paint(Role::Quiet, &gap));
            out.push('\n');
        }
        page.line(&mut out, line, diagnostic.severity);
    }
    if let Some(help) = &diagnostic.help {
        let lead = "help: ";
        for (i, text) in wrap(&visible(help), look.width - 2 - lead.len()).iter().enumerate() {
            let lead = if i == 0 { look.paint(Role::Cure, lead) } else { blanks(lead.len()) };
            out.push_str(&format!("  {lead}{text}\n"));
        }
    }
    out
}

/// The colour a severity has.
pub fn role(severity: Severity) -> Role {
    match severity {
        Severity::Error => Role::Bad,
        Severity::Warning => Role::Warn,
        Severity::Note => Role::Cure,
    }
}

/// Severity and sentence, then place and code at the two ends of a line.
fn heading(out: &mut String, diagnostic: &Diagnostic, sources: &Sources, look: Look) {
    out.push_str(&sentence(diagnostic, look));
    place(out, diagnostic, sources, look);
}

/// Severity and sentence alone, for where the reader has no spec to look into.
pub fn sentence(diagnostic: &Diagnostic, look: Look) -> String {
    let mut out = String::new();
    let word = diagnostic.severity.word();
    let indent = word.len() + 2;
    for (i, text) in wrap(&visible(&diagnostic.message), look.width - indent).iter().enumerate() {
        if i == 0 {
            out.push_str(&look.paint(role(diagnostic.severity), &format!("{word}:")));
            out.push_str(&format!(" {}\n", look.paint(Role::Title, text)));
        } else {
            out.push_str(&format!("{}{}\n", blanks(indent), look.paint(Role::Title, text)));
        }
    }
    out
}

/// Place and code at the two ends of a line.
fn place(out: &mut String, diagnostic: &Diagnostic, sources: &Sources, look: Look) {
    let span = diagnostic.primary.span;
    let source = sources.get(span.file);
    let (line, column) = source.position(span.start as usize);
    let place = visible(&format!("  {}:{line}:{column}", source.name()));
    let code = diagnostic.code.text();
    let used = width(&place) + 2 + code.len();
    let shown = look.paint(Role::Quiet, code);
    let place = look.paint(Role::Quiet, &place);
    if used <= look.width {
        out.push_str(&format!("{place}{}{shown}\n", blanks(look.width - used + 2)));
    } else {
        let lead = blanks(look.width.saturating_sub(code.len()));
        out.push_str(&format!("{place}\n{lead}{shown}\n"));
    }
}

/// One line of a spec and what is said on it.
struct Line<'a> {
    file: FileId,
    number: usize,
    text: &'a str,
    marks: Vec<Mark<'a>>,
}

/// A stretch of a line, in bytes of it, and what is said there.
struct Mark<'a> {
    start: usize,
    end: usize,
    text: &'a str,
    primary: bool,
}

/// The finding's own line, then the others in the order of the files, each line once.
fn lines<'a>(diagnostic: &'a Diagnostic, sources: &'a Sources) -> Vec<Line<'a>> {
    let mut rest: Vec<&Label> = diagnostic.secondary.iter().collect();
    rest.sort_by_key(|l| (l.span.file != diagnostic.primary.span.file, l.span.file, l.span.start));
    let mut lines: Vec<Line<'a>> = Vec::new();
    let labels =
        std::iter::once((&diagnostic.primary, true)).chain(rest.into_iter().map(|l| (l, false)));
    for (label, primary) in labels {
        let (file, number, text, mark) = mark(label, primary, sources);
        match lines.iter_mut().find(|l| l.file == file && l.number == number) {
            Some(line) => line.marks.push(mark),
            None => lines.push(Line { file, number, text, marks: vec![mark] }),
        }
    }
    for line in &mut lines {
        line.marks.sort_by_key(|m| (!m.primary, m.start));
    }
    lines
}

/// Where a label stands. Of what spans several lines the first is shown.
fn mark<'a>(
    label: &'a Label,
    primary: bool,
    sources: &'a Sources,
) -> (FileId, usize, &'a str, Mark<'a>) {
    let Span { file, start, end } = label.span;
    let source = sources.get(file);
    let (number, _) = source.position(start as usize);
    let text = source.line(number);
    let begins = source.line_start(number);
    let inside = |offset: u32| {
        let mut at = (offset as usize).saturating_sub(begins).min(text.len());
        while !text.is_char_boundary(at) {
            at -= 1;
        }
        at
    };
    let start = inside(start);
    let end = inside(end).max(start);
    let end = start + text[start..end].trim_end().len();
    (file, number, text, Mark { start, end, text: &label.text, primary })
}

/// Where the text of the spec stands on the page.
struct Page {
    look: Look,
    gutter: usize,
}

impl Page {
    fn row(&self, out: &mut String, number: &str, text: &str) {
        let bar = self.look.pick("\u{2502}", "|");
        let edge = self.look.paint(Role::Quiet, &format!("{} {bar}", right(number, self.gutter)));
        out.push_str(format!("{edge} {text}").trim_end());
        out.push('\n');
    }

    /// A line of the spec with its marks below. A line too long for the page is cut where the
    /// first mark stays in sight.
    fn line(&self, out: &mut String, line: &Line<'_>, severity: Severity) {
        let columns = self.look.width.saturating_sub(self.gutter + 3);
        let shown = visible(line.text);
        let first = width(&visible(&line.text[..line.marks[0].start]));
        let from = if width(&shown) <= columns { 0 } else { first.saturating_sub(columns / 3) };
        self.row(out, &line.number.to_string(), &cut(&shown, from, columns));
        for mark in &line.marks {
            let start = width(&visible(&line.text[..mark.start])).saturating_sub(from);
            let long = width(&visible(&line.text[mark.start..mark.end])).max(1);
            let start = start.min(columns - 1);
            self.mark(out, mark, start, long.min(columns - start), columns, severity);
        }
    }

    /// The mark under its stretch, its label beside it where that is short enough, else below.
    fn mark(
        &self,
        out: &mut String,
        mark: &Mark<'_>,
        start: usize,
        long: usize,
        columns: usize,
        severity: Severity,
    ) {
        let (role, plain) = if mark.primary { (role(severity), "^") } else { (Role::Cure, "-") };
        let line = self.look.pick("\u{2594}", plain).repeat(long);
        let drawn = format!("{}{}", blanks(start), self.look.paint(role, &line));
        let label = visible(mark.text);
        let end = start + long + 1;
        if label.is_empty() || end + width(&label) <= columns {
            let label = self.look.paint(role, &label);
            self.row(out, "", &format!("{drawn} {label}"));
            return;
        }
        self.row(out, "", &drawn);
        // Below the mark, further left where there is too little room from there on.
        let longest = label.split(' ').map(width).max().unwrap_or(0);
        let least = longest.max(LEAST_LABEL_COLUMNS).max(width(&label).min(columns / 2));
        let room = (columns - start).max(least.min(columns));
        let indent = columns - room;
        for text in wrap(&label, room) {
            self.row(
                out,
                "",
                &left(&format!("{}{}", blanks(indent), self.look.paint(role, &text)), 0),
            );
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::diagnostic::Code;
    use crate::source::Source;

    const TEXT: &str = "part rod of steel { d = dia 20 f7 }\n\nfit slide = rod.d in bush.bore {\n  \
                        require \"S-2\" clearance >= 0.02\n}\n";

    fn span(text: &str) -> Span {
        let start = TEXT.find(text).unwrap();
        Span::new(FileId(0), start, start + text.len())
    }

    fn sources(text: &str) -> Sources {
        let mut sources = Sources::default();
        sources.add(Source::new("slide.gap", text));
        sources
    }

    fn finding() -> Diagnostic {
        Diagnostic::new(
            Code::SyntaxError,
            span("require \"S-2\" clearance >= 0.02"),
            "clearance of `slide` is 0.0121 mm below its limit at `cold`",
        )
        .here("least 0.0079 mm, limit 0.0200 mm; also 0.0041 mm at `room`, 0.0011 mm at `warm`")
        .label(span("d = dia 20 f7"), "rod.d makes 12.2 % of the range")
        .help("it holds at every condition with `rod.d` 0.0121 mm smaller")
    }

    #[test]
    fn its_own_line_comes_first_and_the_cure_last() {
        insta::assert_snapshot!(render(&finding(), &sources(TEXT), Look::PLAIN));
    }

    #[test]
    fn drawn_with_more_than_ascii() {
        let look = Look { drawing: true, ..Look::PLAIN };
        insta::assert_snapshot!(render(&finding(), &sources(TEXT), look));
    }

    #[test]
    fn no_line_is_wider_than_the_page_whatever_the_spec_holds() {
        let long = format!("gap g = {}x.y\u{1b}[31m\n", "a.b + ".repeat(60));
        let at = Span::new(FileId(0), long.len() - 20, long.len() - 2);
        let finding = Diagnostic::new(Code::SyntaxError, at, "expected a name")
            .here("a label that is long enough to need more than one line beside such a mark");
        let shown = render(&finding, &sources(&long), Look::PLAIN);
        assert!(shown.lines().all(|l| width(l) <= 80), "{shown}");
        assert!(shown.contains("\u{fffd}[31m") && !shown.contains('\u{1b}'), "{shown}");
    }

    #[test]
    fn places_at_the_end_of_a_text_and_inside_a_character_are_shown_all_the_same() {
        let text = "é";
        for (start, end) in [(0, 1), (1, 2), (2, 2), (0, 2)] {
            let finding = Diagnostic::new(Code::SyntaxError, Span::new(FileId(0), start, end), "x");
            assert!(render(&finding, &sources(text), Look::PLAIN).contains("slide.gap:1:"));
        }
    }
}
