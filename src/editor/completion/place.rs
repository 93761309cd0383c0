//! Where a cursor stands in a file, as far as what fits there depends on it.

use crate::design::keys::{Key, Kind};
use crate::text::Span;

/// A step from a node to one in it.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) enum Step {
    /// To the value of a key.
    Key(String),
    /// To an entry of a list.
    Entry,
}

/// What may be written at a cursor.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Slot {
    /// A key of the mapping that the path leads to; whether its colon stands there already.
    Key {
        /// A colon follows the word.
        colon: bool,
    },
    /// The value that the path leads to, on the line of its key or in brackets.
    Value,
    /// The value that the path leads to, on a line of its own: a scalar, or the first key of a mapping.
    Either,
}

/// A key, or an entry of a list, that stands beside the cursor.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) struct Stated {
    /// Its text.
    pub name: String,
    /// The text of its value; empty where that is no scalar on the same line.
    pub value: String,
    /// Where the name stands.
    pub span: Span,
}

/// Where a cursor stands.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) struct Place {
    /// The way from the root of the file.
    pub path: Vec<Step>,
    /// What may be written.
    pub slot: Slot,
    /// What it would replace.
    pub replaces: Span,
    /// What stands in the same mapping or list, that under the cursor left out.
    pub beside: Vec<Stated>,
    /// Whether it stands in braces or brackets.
    pub flow: bool,
    /// What has to be written before it: a dash where an entry of a list begins, a space behind a colon.
    pub before: &'static str,
    /// What has to be written behind it: a comma where another entry follows.
    pub after: &'static str,
    /// Whether lines follow that are indented deeper, which a key would take for its value.
    pub heads: bool,
}

impl Place {
    /// The value that stands beside the cursor under a key.
    pub fn value_beside(&self, key: &str) -> Option<&str> {
        self.beside
            .iter()
            .find(|stated| stated.name == key)
            .map(|stated| stated.value.as_str())
    }

    /// The last key on the way.
    pub fn key(&self) -> Option<&str> {
        self.path.iter().rev().find_map(|step| match step {
            Step::Key(name) => Some(name.as_str()),
            Step::Entry => None,
        })
    }

    /// The first key on the way.
    pub fn section(&self) -> Option<&str> {
        match self.path.first() {
            Some(Step::Key(name)) => Some(name),
            _ => None,
        }
    }
}

/// What may stand at the end of a way, and the key that says so.
pub(super) fn fitting(root: &'static [Key], path: &[Step]) -> (Vec<Kind>, Option<&'static Key>) {
    let mut kinds = vec![Kind::Map(root)];
    let mut last = None;
    for step in path {
        let mut next = Vec::new();
        for kind in &kinds {
            follow(kind, step, &mut next, &mut last);
        }
        kinds = Vec::new();
        for kind in &next {
            flatten(kind, &mut kinds);
        }
    }
    (kinds, last)
}

fn follow(kind: &Kind, step: &Step, next: &mut Vec<Kind>, last: &mut Option<&'static Key>) {
    match (kind, step) {
        (Kind::OneOf(kinds), _) => kinds.iter().for_each(|kind| follow(kind, step, next, last)),
        (Kind::Map(keys), Step::Key(name)) => {
            if let Some(key) = Key::find(keys, name) {
                *last = Some(key);
                next.push(key.kind);
            }
        }
        (Kind::Named(kind) | Kind::Numbered(_, kind), Step::Key(_)) => next.push(**kind),
        // A single entry stands for a list of one.
        (Kind::List(kind), Step::Key(_)) => follow(kind, step, next, last),
        (Kind::List(kind) | Kind::Tuple(kind, _), Step::Entry) => next.push(**kind),
        _ => {}
    }
}

fn flatten(kind: &Kind, into: &mut Vec<Kind>) {
    match kind {
        Kind::OneOf(kinds) => kinds.iter().for_each(|kind| flatten(kind, into)),
        other => into.push(*other),
    }
}
