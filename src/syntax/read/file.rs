//! The statements of a file.

use super::super::grammar::Rule;
use super::super::layout::Line;
use super::super::lower::Lower;
use super::super::tree::{GeneralKind, Statement};
use super::Reader;
use crate::syntax::STATEMENT_WORDS;

impl Reader<'_> {
    /// Reads a file-level statement with its block.
    pub(super) fn file_line(&mut self, line: &Line) -> Option<Statement> {
        match self.first_word(line) {
            "assembly" => {
                self.lone(line, Rule::assembly_line, Lower::assembly).map(Statement::Assembly)
            }
            "drawing" => {
                self.lone(line, Rule::drawing_line, Lower::drawing).map(Statement::Drawing)
            }
            "lengths" => {
                self.lone(line, Rule::lengths_line, Lower::default_unit).map(Statement::Lengths)
            }
            "temperatures" => self
                .lone(line, Rule::temperatures_line, Lower::default_unit)
                .map(Statement::Temperatures),
            "reference" => {
                self.lone(line, Rule::reference_line, Lower::reference).map(Statement::Reference)
            }
            "general" if line.block.is_some() => self.general_table(line),
            "general" => {
                self.lone(line, Rule::general_line, Lower::general).map(Statement::General)
            }
            "use" => self.lone(line, Rule::use_line, Lower::used).map(Statement::Use),
            "note" => self.lone(line, Rule::note_line, Lower::note).map(Statement::Note),
            "condition" => self.condition(line),
            "material" => self.material(line),
            "part" => self.part(line),
            "fit" => self.fit(line),
            "gap" => self.gap(line),
            "result" => self.outcome(line),
            "let" => self.lone(line, Rule::let_line, Lower::let_line).map(Statement::Let),
            "restraint" => self.restraint(line),
            "fill" => self.fill(line),
            _ => {
                self.unknown(line, &STATEMENT_WORDS, "a statement");
                None
            }
        }
    }

    fn general_table(&mut self, line: &Line) -> Option<Statement> {
        let header = self.header(line, Rule::general_table_line, Lower::general_table);
        let mut rows = Vec::new();
        self.block(line, |reader, row| {
            rows.extend(reader.lone(row, Rule::decimal_line, Lower::decimal_row))
        });
        let mut general = header?;
        general.kind = GeneralKind::ByDecimals(rows);
        general.span = self.whole(line);
        Some(Statement::General(general))
    }

    fn condition(&mut self, line: &Line) -> Option<Statement> {
        let header = self.header(line, Rule::condition_line, Lower::condition);
        let (mut overrides, mut moisture, mut speeds) = (Vec::new(), Vec::new(), Vec::new());
        self.block(line, |reader, row| match reader.first_word(row) {
            "moisture" => {
                moisture.extend(reader.lone(row, Rule::moisture_line, Lower::moisture_row))
            }
            "speed" if reader.words(row).contains("of") => {
                speeds.extend(reader.lone(row, Rule::speed_line, Lower::speed_row));
            }
            _ => overrides.extend(reader.lone(row, Rule::override_line, Lower::override_row)),
        });
        let mut condition = header?;
        (condition.overrides, condition.moisture, condition.speeds) = (overrides, moisture, speeds);
        condition.span = self.whole(line);
        Some(Statement::Condition(condition))
    }

    fn part(&mut self, line: &Line) -> Option<Statement> {
        let header = self.header(line, Rule::part_line, Lower::part);
        let (mut drawing, mut dimensions, mut lets) = (None, Vec::new(), Vec::new());
        self.block(line, |reader, inner| match reader.first_word(inner) {
            "drawing" if reader.followed_by(inner, '"') => {
                let stated = reader.lone(inner, Rule::drawing_line, Lower::drawing);
                reader.once(&mut drawing, stated, inner);
            }
            "let" if !reader.second_word(inner).is_empty() => {
                lets.extend(reader.lone(inner, Rule::let_line, Lower::let_line));
            }
            _ => dimensions.extend(reader.lone(inner, Rule::dimension_line, Lower::dimension)),
        });
        let mut part = header?;
        (part.drawing, part.dimensions, part.lets) = (drawing, dimensions, lets);
        part.span = self.whole(line);
        Some(Statement::Part(part))
    }

    fn followed_by(&self, line: &Line, sign: char) -> bool {
        self.text[self.after_first_word(line)..line.end].starts_with(sign)
    }

    /// Fills a slot that one line of a block may fill.
    pub(super) fn once<T>(&mut self, slot: &mut Option<T>, stated: Option<T>, line: &Line) {
        if slot.is_some() && stated.is_some() {
            let word = self.first_word(line);
            let span = crate::span::Span::new(self.file, line.start, line.end);
            self.lower.stated_twice(span, &format!("`{word}`"));
        } else if stated.is_some() {
            *slot = stated;
        }
    }
}
