//! Splitting a file's top level into pieces, so that one changed member is one piece to read again.
//!
//! Indentation alone decides in block style. What it can't decide (flow style, aliases of anchors in other pieces,
//! tags of `%TAG` lines) is read here at once and handed on in the same shape.

use std::hash::{Hash, Hasher};
use std::ops::Range;
use std::sync::Arc;

use rustc_hash::FxHasher;

use crate::syntax::item::{Form, parse_item};
use crate::syntax::{Node, SyntaxError, Tree, split};
use crate::text::{Change, Span};

/// A file's top level.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Outline {
    /// Its entries in the order of the text.
    pub entries: Vec<TopEntry>,
    /// The root, where it is something else than a mapping (spans of the file).
    pub other: Option<Node>,
    /// What is wrong outside the pieces (spans of the file).
    pub errors: Vec<SyntaxError>,
    /// Whether a change within the items of a list leaves the rest as it was split; see [`again`].
    pub steady: bool,
}

/// An entry of the top level.
#[derive(Debug, Clone, PartialEq)]
pub enum TopEntry {
    /// An entry that is read in one piece; its tree is a mapping of it.
    Head(Piece),
    /// A list of members, or a mapping of groups or products.
    List(ListSection),
}

/// `members`, `groups` or `products` with a value of the right form, item by item. A value of another form is a
/// [`TopEntry::Head`].
#[derive(Debug, Clone, PartialEq)]
pub struct ListSection {
    /// The key.
    pub key: String,
    /// The key's characters.
    pub key_span: Span,
    /// Whether items may be lacking because of an error.
    pub broken: bool,
    /// The items.
    pub items: Vec<Piece>,
}

/// A piece of a file that can be read by itself.
#[derive(Debug, Clone, PartialEq)]
pub struct Piece {
    /// Its place in the file; of a block item from the start of its first line to the start of the next one's.
    pub span: Span,
    /// What it is.
    pub form: Form,
    /// Its tree, where its text alone does not tell it.
    parsed: Option<Arc<Tree>>,
}

impl Piece {
    pub(super) const fn new(span: Span, form: Form) -> Self {
        Self {
            span,
            form,
            parsed: None,
        }
    }

    pub(super) fn read(span: Span, form: Form, tree: Tree) -> Self {
        Self {
            span,
            form,
            parsed: Some(Arc::new(tree)),
        }
    }

    /// Whether its text alone tells its tree.
    #[must_use]
    pub const fn is_plain(&self) -> bool {
        self.parsed.is_none()
    }

    /// The piece moved to where it begins now.
    #[must_use]
    pub fn moved(&self, start: u32) -> Self {
        Self {
            span: Span {
                start,
                end: start.saturating_add(self.span.len()),
            },
            form: self.form,
            parsed: self.parsed.clone(),
        }
    }

    /// Reads the piece; `file` is the text that was split. Spans count from the start of the piece.
    #[must_use]
    pub fn tree(&self, file: &str) -> Tree {
        match &self.parsed {
            Some(tree) => Tree::clone(tree),
            None => parse_item(self.span.slice(file), self.form),
        }
    }

    /// A number that is the same for pieces whose trees are the same wherever they stand, and hardly ever for others:
    /// what has been made of a tree can be kept under it.
    #[must_use]
    pub fn fingerprint(&self, file: &str) -> u64 {
        let mut hasher = FxHasher::default();
        self.form.hash(&mut hasher);
        match &self.parsed {
            Some(tree) => tree.hash(&mut hasher),
            None => self.span.slice(file).hash(&mut hasher),
        }
        hasher.finish()
    }
}

/// What a change within the items of a list makes of them.
#[derive(Debug, Clone, PartialEq)]
pub struct Resplit {
    /// The items that are gone.
    pub old: Range<usize>,
    /// The pieces that stand in their place.
    pub new: Vec<Piece>,
}

/// Splits a changed text again where the change lies within the items of `members`, whose key stands at `key` and whose
/// pieces are `items` in the old text; the outline of that was [steady](Outline::steady). `None` where the change may
/// reach further. The items behind keep their texts, moved on.
#[must_use]
pub fn again(old: &str, new: &str, change: Change, key: Span, items: &[&Piece]) -> Option<Resplit> {
    split::again::again(old, new, change, key, items)
}

/// Splits a text.
#[must_use]
pub fn outline(text: &str) -> Outline {
    split::split(text)
}
