//! A tolerant YAML 1.2 tree with a span on every key and value. Reading never fails: it answers a tree and errors.
//!
//! [`outline::outline`] splits a file into items by indentation, so that each can be read and kept by itself;
//! [`tree::parse`] reads a text, [`recover::parse_item`] one item whose damage must not reach the others.

pub mod explain;
pub mod outline;
pub mod recover;
pub mod tree;

use crate::text::Span;

/// The largest file that is read, in bytes.
pub const MAX_BYTES: u64 = 64 * 1024 * 1024;
/// The deepest nesting that is read.
pub const MAX_DEPTH: usize = 64;
/// The most nodes that one item or document may have once its aliases are followed.
pub const MAX_NODES: usize = 4_000_000;
/// The most nodes that aliases may add in one item or document.
pub const MAX_ALIAS_NODES: usize = 100_000;

/// What a text was read as.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Tree {
    /// The root; none of an empty text, or where nothing could be read.
    pub root: Option<Node>,
    /// What is no YAML 1.2.
    pub errors: Vec<SyntaxError>,
}

/// A node.
#[derive(Debug, Clone, PartialEq)]
pub struct Node {
    /// Its characters.
    pub span: Span,
    /// What it is.
    pub value: Value,
    /// Whether it came by an alias: its characters are elsewhere, and no fix may touch them.
    pub through_alias: bool,
}

/// What a node is.
#[derive(Debug, Clone, PartialEq)]
pub enum Value {
    /// Nothing, `~` or `null`.
    Null,
    /// Text, not yet typed.
    Scalar(Scalar),
    /// A list.
    Sequence(Vec<Node>),
    /// A mapping, in the order of the text; keys may repeat.
    Mapping(Vec<Entry>),
}

/// A scalar.
#[derive(Debug, Clone, PartialEq)]
pub struct Scalar {
    /// The text, quotes and escapes resolved.
    pub text: String,
    /// How it is written.
    pub style: Style,
}

/// How a scalar is written.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
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
#[derive(Debug, Clone, PartialEq)]
pub struct Entry {
    /// The key.
    pub key: Node,
    /// The value.
    pub value: Node,
}

/// Something that is no YAML 1.2, or more than is read.
#[derive(Debug, Clone, PartialEq)]
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
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum ErrorKind {
    /// Not YAML 1.2.
    NotYaml,
    /// A second document in the file.
    SeveralDocuments,
    /// Valid perhaps, but past a limit of nesting, nodes or size.
    Limit,
}

/// A change of one span that is likely what was meant.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Repair {
    /// What it does, in the imperative.
    pub title: String,
    /// What is replaced.
    pub span: Span,
    /// By what.
    pub text: String,
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
        self.span = self.span.shift(by);
        match &mut self.value {
            Value::Sequence(nodes) => nodes.iter_mut().for_each(|node| node.shift(by)),
            Value::Mapping(entries) => {
                for entry in entries {
                    entry.key.shift(by);
                    entry.value.shift(by);
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
        self.span = self.span.shift(by);
        if let Some(repair) = &mut self.repair {
            repair.span = repair.span.shift(by);
        }
        self
    }
}
