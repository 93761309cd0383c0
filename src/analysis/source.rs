//! A file as it was read: its head, and its items with the place where each stands.

use std::path::PathBuf;
use std::sync::Arc;

use crate::design::model::head::{Group, Head};
use crate::design::model::library::NamedProduct;
use crate::design::model::member::Member;
use crate::design::slip::Slip;
use crate::syntax::SyntaxError;
use crate::syntax::outline::Piece;
use crate::text::Span;

/// What kind a file is.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum FileKind {
    /// Members of a frame.
    Steelwork,
    /// Protection products.
    Protection,
}

/// A thing decoded from an item's text alone. Spans count from the start of the item.
#[derive(Debug, PartialEq)]
pub struct Decoded<T> {
    /// The thing.
    pub value: T,
    /// What is wrong with it.
    pub slips: Vec<Slip>,
    /// What is no YAML in it.
    pub errors: Vec<SyntaxError>,
}

/// A decoded thing at its place in the file.
#[derive(Debug)]
pub struct Item<T> {
    /// The item's text in the file's.
    pub piece: Piece,
    /// What was decoded; shared by equal texts.
    pub decoded: Arc<Decoded<T>>,
}

impl<T> Clone for Item<T> {
    fn clone(&self) -> Self {
        self.moved(self.base())
    }
}

impl<T> Item<T> {
    /// Offset of the item's text in the file's.
    #[must_use]
    pub const fn base(&self) -> u32 {
        self.piece.span.start
    }

    /// The item moved to where it begins now.
    #[must_use]
    pub fn moved(&self, start: u32) -> Self {
        Self {
            piece: self.piece.moved(start),
            decoded: Arc::clone(&self.decoded),
        }
    }

    /// The thing.
    #[must_use]
    pub fn value(&self) -> &T {
        &self.decoded.value
    }

    /// Whether a syntax error broke its text: something may be lacking that its author wrote.
    #[must_use]
    pub fn is_broken(&self) -> bool {
        !self.decoded.errors.is_empty()
    }

    /// A span of the item as a span of the file.
    #[must_use]
    pub fn place(&self, span: Span) -> Span {
        span.shift(self.base())
    }
}

/// A file as it was read.
#[derive(Debug, Clone)]
pub struct SourceFile {
    /// Its path.
    pub path: Arc<PathBuf>,
    /// Its text.
    pub text: Arc<str>,
    /// Its kind.
    pub kind: FileKind,
    /// The entries of the top level that are no lists of items, in the order of the file.
    pub entries: Vec<Piece>,
    /// What a steelwork file says outside its members (spans of the file).
    pub head: Head,
    /// Groups in the order of the file.
    pub groups: Vec<Item<Group>>,
    /// Members in the order of the file.
    pub members: Vec<Item<Member>>,
    /// Products in the order of the file.
    pub products: Vec<Item<NamedProduct>>,
    /// Slips outside the items (spans of the file).
    pub slips: Vec<Slip>,
    /// What is no YAML outside the items (spans of the file).
    pub errors: Vec<SyntaxError>,
    /// Where the key of the members stands, if a change within them leaves the rest of the file as it was read.
    pub steady: Option<Span>,
}
