//! Byte ranges in source files. Knows nothing of what the bytes say.

/// Names one file of a run; an index into [`crate::source::Sources`].
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash, Default)]
pub struct FileId(pub u32);

/// A half-open range of bytes in one file.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash, Default)]
pub struct Span {
    /// The file the bytes stand in.
    pub file: FileId,
    /// Offset of the first byte.
    pub start: u32,
    /// Offset past the last byte.
    pub end: u32,
}

impl Span {
    /// The range `start..end` of `file`.
    pub fn new(file: FileId, start: usize, end: usize) -> Self {
        debug_assert!(start <= end);
        Span { file, start: start as u32, end: end as u32 }
    }

    /// The smallest range that holds both; both must lie in one file.
    #[must_use]
    pub fn to(self, other: Span) -> Self {
        debug_assert_eq!(self.file, other.file);
        Span { file: self.file, start: self.start.min(other.start), end: self.end.max(other.end) }
    }

    /// The range as `usize` offsets, to index a text with.
    pub fn range(self) -> std::ops::Range<usize> {
        self.start as usize..self.end as usize
    }

    /// Number of bytes.
    pub fn len(self) -> usize {
        (self.end - self.start) as usize
    }

    /// True for a position between two bytes.
    pub fn is_empty(self) -> bool {
        self.start == self.end
    }
}

/// A value and where it was written.
#[derive(Debug, Clone, PartialEq)]
pub struct Spanned<T> {
    /// The value.
    pub value: T,
    /// Where it was written.
    pub span: Span,
}

impl<T> Spanned<T> {
    /// Joins a value to its place.
    pub fn new(value: T, span: Span) -> Self {
        Spanned { value, span }
    }
}
