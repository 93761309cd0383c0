//! Reading a whole file at once.

use crate::syntax::outline::{Piece, TopEntry, outline};
use crate::syntax::{Node, SyntaxError, Tree};
use crate::text::Span;

/// A file with the trees of all its pieces.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct File {
    /// The entries of the top level that are no lists of items, in the order of the text.
    pub head: Vec<Item>,
    /// `members`, `groups` and `products`.
    pub lists: Vec<List>,
    /// The root, where it is something else than a mapping.
    pub other: Option<Node>,
    /// What is wrong outside the pieces (spans of the file).
    pub errors: Vec<SyntaxError>,
}

/// A list of items.
#[derive(Debug, Clone, PartialEq)]
pub struct List {
    /// Its key.
    pub key: String,
    /// The key's characters.
    pub key_span: Span,
    /// The items.
    pub items: Vec<Item>,
}

/// A piece that was read.
#[derive(Debug, Clone, PartialEq)]
pub struct Item {
    /// Its place in the file.
    pub span: Span,
    /// Its tree; spans count from the start of the piece.
    pub tree: Tree,
}

/// Reads a text whole, one piece after the other.
#[must_use]
pub fn read(text: &str) -> File {
    let outline = outline(text);
    let item = |piece: &Piece| Item {
        span: piece.span,
        tree: piece.tree(text),
    };
    let mut file = File {
        other: outline.other,
        errors: outline.errors,
        ..File::default()
    };
    for entry in &outline.entries {
        match entry {
            TopEntry::Head(piece) => file.head.push(item(piece)),
            TopEntry::List(list) => file.lists.push(List {
                key: list.key.clone(),
                key_span: list.key_span,
                items: list.items.iter().map(item).collect(),
            }),
        }
    }
    file
}

impl File {
    /// Every error of the file, with spans of the file.
    #[must_use]
    pub fn all_errors(&self) -> Vec<SyntaxError> {
        let items = self.head.iter().chain(self.lists.iter().flat_map(|list| &list.items));
        let within = items.flat_map(|item| {
            item.tree
                .errors
                .iter()
                .map(|error| error.clone().shifted(item.span.start))
        });
        self.errors.iter().cloned().chain(within).collect()
    }
}

/// The comments of a text, each from its `#` to the end of its line. After a syntax error the rest is scanned by line.
#[must_use]
pub fn comments(text: &str) -> Vec<Span> {
    super::parse::comments(text)
}
