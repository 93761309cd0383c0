//! Text: spans, positions in the encodings of editors and reports, and decoding of a file's bytes.

mod buffer;
mod change;
mod decode;
mod lines;

pub use buffer::Buffer;
pub use change::Change;
pub use decode::{DecodeError, decode};
pub use lines::{Encoding, LineIndex, Position};

use std::hash::{Hash, Hasher};

/// A range of byte offsets into a text, the end excluded.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, PartialOrd, Ord, Default)]
pub struct Span {
    /// First byte.
    pub start: u32,
    /// One past the last byte.
    pub end: u32,
}

impl Span {
    /// A span from offsets; those past 4 GiB are held at it (files are refused long before).
    #[must_use]
    pub fn new(start: usize, end: usize) -> Self {
        let held = |offset: usize| u32::try_from(offset).unwrap_or(u32::MAX);
        Self {
            start: held(start),
            end: held(end),
        }
    }

    /// The span moved on by an offset.
    #[must_use]
    pub const fn shift(self, by: u32) -> Self {
        Self {
            start: self.start.saturating_add(by),
            end: self.end.saturating_add(by),
        }
    }

    /// Length in bytes.
    #[must_use]
    pub const fn len(self) -> u32 {
        self.end.saturating_sub(self.start)
    }

    /// Whether it holds nothing.
    #[must_use]
    pub const fn is_empty(self) -> bool {
        self.len() == 0
    }

    /// Whether an offset lies in it, its end included: where a cursor behind the last character still belongs to it.
    #[must_use]
    pub const fn touches(self, offset: u32) -> bool {
        self.start <= offset && offset <= self.end
    }

    /// The text of the span; empty where it lies outside.
    #[must_use]
    pub fn slice(self, text: &str) -> &str {
        text.get(self.start as usize..self.end as usize).unwrap_or("")
    }

    /// The least span that holds both.
    #[must_use]
    pub fn join(self, other: Self) -> Self {
        Self {
            start: self.start.min(other.start),
            end: self.end.max(other.end),
        }
    }
}

/// A replacement of one span of a text.
#[derive(Debug, Clone, PartialEq, Eq, Hash)]
pub struct Edit {
    /// What is replaced; empty where text is put in.
    pub span: Span,
    /// What stands there afterwards.
    pub text: String,
}

/// A value that remembers where it stands. Equality and hash ignore the place, so that moved text is no change.
#[derive(Debug, Clone, Default)]
pub struct Spanned<T> {
    /// The value.
    pub value: T,
    /// Where it stands.
    pub span: Span,
}

impl<T: PartialEq> PartialEq for Spanned<T> {
    fn eq(&self, other: &Self) -> bool {
        self.value == other.value
    }
}

impl<T: Eq> Eq for Spanned<T> {}

impl<T: Hash> Hash for Spanned<T> {
    fn hash<H: Hasher>(&self, state: &mut H) {
        self.value.hash(state);
    }
}
