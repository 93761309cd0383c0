//! A tolerant YAML 1.2 tree with a span on every key and value. Reading never fails: it answers a tree and errors.
//!
//! [`outline::outline`] splits a file's top level into pieces by indentation, so that each can be read and kept by
//! itself; [`item::parse_item`] reads one piece, whose damage does not reach the others; [`file::read`] does both.

pub mod file;
mod flow;
pub mod item;
mod line;
pub mod outline;
mod parse;
mod recover;
mod split;
mod words;

use crate::text::{Edit, Span};

/// The largest file that is read, in bytes.
pub const MAX_BYTES: u64 = 64 * 1024 * 1024;
/// The deepest nesting that is read.
pub const MAX_DEPTH: usize = 64;
/// The most nodes that one piece of a file may have.
pub const MAX_NODES: usize = 4_000_000;
/// The most nodes that aliases may add in one file.
pub const MAX_ALIAS_NODES: usize = 1_000_000;
/// The most errors that are reported of one piece of a file.
pub const MAX_ERRORS: usize = 40;
/// The largest piece of a file, in bytes, in which more than the first error is looked for.
pub const MAX_RECOVERED: usize = 256 * 1024;

/// What a text was read as.
#[derive(Debug, Clone, PartialEq, Eq, Hash, Default)]
pub struct Tree {
    /// The root; none of an empty text, or where nothing could be read.
    pub root: Option<Node>,
    /// What is no YAML 1.2.
    pub errors: Vec<SyntaxError>,
    /// Whether something that its author wrote may be lacking: then no key proves absent.
    pub broken: bool,
}

/// A node.
#[derive(Debug, Clone, PartialEq, Eq, Hash)]
pub struct Node {
    /// Its characters.
    pub span: Span,
    /// What it is.
    pub value: Value,
    /// Whether it came by an alias: its characters are elsewhere, and no fix may touch them.
    pub through_alias: bool,
}

/// What a node is.
#[derive(Debug, Clone, PartialEq, Eq, Hash)]
pub enum Value {
    /// Nothing, `~` or `null`.
    Null,
    /// Something that can't be read. An error says why; whatever else is said of it would be a second message.
    Unreadable,
    /// Text, not yet typed.
    Scalar(Scalar),
    /// A list.
    Sequence(Vec<Node>),
    /// A mapping, in the order of the text; keys may repeat.
    Mapping(Vec<Entry>),
}

/// A scalar.
#[derive(Debug, Clone, PartialEq, Eq, Hash)]
pub struct Scalar {
    /// The text, quotes and escapes resolved.
    pub text: String,
    /// How it is written.
    pub style: Style,
}

/// How a scalar is written.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Style {
    /// Without quotes.
    Plain,
    /// In single quotes.
    SingleQuoted,
    /// In double quotes.
    DoubleQuoted,
    /// A block that keeps its lines.
    Literal,
    /// A block that folds its lines.
    Folded,
}

/// A key with its value.
#[derive(Debug, Clone, PartialEq, Eq, Hash)]
pub struct Entry {
    /// The key.
    pub key: Node,
    /// The value.
    pub value: Node,
}

/// Something that is no YAML 1.2, or more than is read.
#[derive(Debug, Clone, PartialEq, Eq, Hash)]
pub struct SyntaxError {
    /// The characters at fault.
    pub span: Span,
    /// What kind it is.
    pub kind: ErrorKind,
    /// Plain words that stand alone.
    pub message: String,
    /// A likely repair: what it does, and the edits.
    pub repair: Option<Repair>,
}

/// The kinds of syntax error.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum ErrorKind {
    /// Not YAML 1.2.
    NotYaml,
    /// A second document in the file.
    SeveralDocuments,
    /// Valid perhaps, but past a limit of nesting, nodes or size.
    Limit,
}

/// A change of the text that is likely what was meant.
#[derive(Debug, Clone, PartialEq, Eq, Hash)]
pub struct Repair {
    /// What it does, in the imperative.
    pub title: String,
    /// Whether only one meaning is possible.
    pub safe: bool,
    /// The edits, in the order of the text.
    pub edits: Vec<Edit>,
}

impl Node {
    /// The value of a key of a mapping; the first, where the key repeats.
    #[must_use]
    pub fn get(&self, name: &str) -> Option<&Self> {
        match &self.value {
            Value::Mapping(entries) => entries
                .iter()
                .find(|entry| entry.key.is_scalar(name))
                .map(|entry| &entry.value),
            _ => None,
        }
    }

    /// Moves the node and all in it on by an offset, for a piece of text that was read by itself.
    pub fn shift(&mut self, by: u32) {
        self.each_span(&mut |span| *span = span.shift(by));
    }

    /// The innermost keys and values at an offset, outermost first: the way from the root to a cursor.
    #[must_use]
    pub fn path_at(&self, offset: u32) -> Vec<&Self> {
        let mut path = vec![self];
        while let Some(next) = path.last().and_then(|node| node.child_at(offset)) {
            path.push(next);
        }
        path
    }

    fn child_at(&self, offset: u32) -> Option<&Self> {
        let here = |node: &&Self| node.span.touches(offset) && !node.through_alias;
        match &self.value {
            Value::Sequence(nodes) => nodes.iter().find(here),
            Value::Mapping(entries) => entries.iter().flat_map(|entry| [&entry.key, &entry.value]).find(here),
            _ => None,
        }
    }

    /// Calls `change` for the span of the node and of all in it.
    fn each_span(&mut self, change: &mut impl FnMut(&mut Span)) {
        self.each_node(&mut |node| change(&mut node.span));
    }

    /// Calls `visit` for the node and all in it.
    fn each_node(&mut self, visit: &mut impl FnMut(&mut Self)) {
        visit(self);
        match &mut self.value {
            Value::Sequence(nodes) => nodes.iter_mut().for_each(|node| node.each_node(visit)),
            Value::Mapping(entries) => {
                for entry in entries {
                    entry.key.each_node(visit);
                    entry.value.each_node(visit);
                }
            }
            _ => {}
        }
    }

    /// Whether the node is this text.
    #[must_use]
    pub fn is_scalar(&self, text: &str) -> bool {
        matches!(&self.value, Value::Scalar(scalar) if scalar.text == text)
    }
}

impl SyntaxError {
    /// The error moved on by an offset, for an item that was read by itself.
    #[must_use]
    pub fn shifted(mut self, by: u32) -> Self {
        self.each_span(&mut |span| *span = span.shift(by));
        self
    }

    fn each_span(&mut self, change: &mut impl FnMut(&mut Span)) {
        change(&mut self.span);
        for edit in self.repair.iter_mut().flat_map(|repair| &mut repair.edits) {
            change(&mut edit.span);
        }
    }
}

impl Tree {
    fn each_span(&mut self, change: &mut impl FnMut(&mut Span)) {
        if let Some(root) = &mut self.root {
            root.each_span(change);
        }
        self.errors.iter_mut().for_each(|error| error.each_span(change));
    }
}
