//! The texts of a run and their lines and columns. Does no IO: texts are handed in.

use crate::span::{FileId, Span};

/// One text with its name as shown to people (relative to the root of the run, `/` between folders).
#[derive(Debug, Clone)]
pub struct Source {
    name: String,
    text: String,
    line_starts: Vec<u32>,
}

impl Source {
    /// Indexes the lines of `text`.
    pub fn new(name: impl Into<String>, text: impl Into<String>) -> Self {
        let text = text.into();
        let line_starts = std::iter::once(0)
            .chain(text.bytes().enumerate().filter(|(_, b)| *b == b'\n').map(|(i, _)| i as u32 + 1))
            .collect();
        Source { name: name.into(), text, line_starts }
    }

    /// The name shown to people.
    pub fn name(&self) -> &str {
        &self.name
    }

    /// The whole text.
    pub fn text(&self) -> &str {
        &self.text
    }

    /// Line and column of a byte offset, both from 1; the column counts characters.
    pub fn position(&self, offset: usize) -> (usize, usize) {
        let offset = offset.min(self.text.len());
        let line = self.line_starts.partition_point(|&start| start as usize <= offset);
        let start = self.line_starts[line - 1] as usize;
        let column = self.text.get(start..offset).map_or(offset - start, |t| t.chars().count());
        (line, column + 1)
    }

    /// Offset of the first byte of a line (from 1); the end of the text past the last line.
    pub fn line_start(&self, line: usize) -> usize {
        let start = line.checked_sub(1).and_then(|i| self.line_starts.get(i));
        start.map_or(self.text.len(), |&start| start as usize)
    }

    /// The text of a line (from 1) without its line end; empty past the last line.
    pub fn line(&self, line: usize) -> &str {
        let start = match line.checked_sub(1).and_then(|i| self.line_starts.get(i)) {
            Some(&start) => start as usize,
            None => return "",
        };
        let end = self.line_starts.get(line).map_or(self.text.len(), |&next| next as usize);
        self.text[start..end].trim_end_matches(['\n', '\r'])
    }
}

/// All texts of one run, named by [`FileId`].
#[derive(Debug, Clone, Default)]
pub struct Sources {
    files: Vec<Source>,
}

impl Sources {
    /// Adds a text and names it.
    pub fn add(&mut self, source: Source) -> FileId {
        self.files.push(source);
        FileId(self.files.len() as u32 - 1)
    }

    /// The text that `file` names; panics only on a `FileId` of another run.
    pub fn get(&self, file: FileId) -> &Source {
        &self.files[file.0 as usize]
    }

    /// The bytes of a span.
    pub fn slice(&self, span: Span) -> &str {
        self.get(span.file).text().get(span.range()).unwrap_or("")
    }

    /// The file of that name, if it is here already.
    pub fn find(&self, name: &str) -> Option<FileId> {
        self.files.iter().position(|s| s.name == name).map(|i| FileId(i as u32))
    }

    /// All files in the order added.
    pub fn iter(&self) -> impl Iterator<Item = (FileId, &Source)> {
        self.files.iter().enumerate().map(|(i, s)| (FileId(i as u32), s))
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn positions_count_from_one_and_in_characters() {
        let s = Source::new("a.gap", "Ø 12\r\nµm\n");
        assert_eq!(s.position(0), (1, 1));
        assert_eq!(s.position(3), (1, 3));
        assert_eq!(s.position(s.text().len()), (3, 1));
        assert_eq!(s.line(1), "Ø 12");
        assert_eq!(s.line(2), "µm");
        assert_eq!(s.line(9), "");
    }
}
