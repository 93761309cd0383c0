//! What a cursor is on: the way of keys from a piece of the file down to it.

use crate::analysis::source::FileKind;
use crate::design::keys::member::MEMBER;
use crate::design::keys::protection::{PRODUCT, PROTECTION_FILE};
use crate::design::keys::steelwork::STEELWORK;
use crate::design::keys::{Key, Kind};
use crate::editor::view::{View, Within};
use crate::syntax::{Node, Value};
use crate::text::Span;

/// A key on the way to the cursor.
#[derive(Debug, Clone, PartialEq)]
pub struct Step {
    /// The key as it is written.
    pub name: String,
    /// What the table of keys says of it, where it is known.
    pub key: Option<&'static Key>,
    /// The key's characters in the file.
    pub span: Span,
    /// The value's characters in the file.
    pub value: Span,
    /// The value, where it is plain text.
    pub text: Option<String>,
}

/// What a cursor is on.
#[derive(Debug, Clone, PartialEq)]
pub struct Cursor {
    /// The piece of the file.
    pub within: Within,
    /// The keys down to it, outermost first.
    pub steps: Vec<Step>,
    /// Whether it is on the last key itself, not on its value.
    pub on_key: bool,
}

/// Finds what stands at an offset; `None` where nothing does.
#[must_use]
pub fn at(view: &View<'_>, offset: u32) -> Option<Cursor> {
    let within = view.within(offset);
    let (tree, base) = view.tree(within)?;
    let mut cursor = Cursor {
        within,
        steps: Vec::new(),
        on_key: false,
    };
    let table = match within {
        Within::Member(_) => Some(MEMBER),
        Within::Group(_) | Within::Product(_) => None,
        Within::Entry(_) if view.source().kind == FileKind::Protection => Some(PROTECTION_FILE),
        Within::Entry(_) => Some(STEELWORK),
        Within::Nothing => return None,
    };
    let named = match within {
        Within::Group(_) => Some(MEMBER),
        Within::Product(_) => Some(PRODUCT),
        _ => None,
    };
    walk(tree.root.as_ref()?, base, offset, (table, named), &mut cursor);
    Some(cursor)
}

/// The keys that a mapping may have, or what each of its names may have.
type Tables = (Option<&'static [Key]>, Option<&'static [Key]>);

fn walk(node: &Node, base: u32, offset: u32, tables: Tables, cursor: &mut Cursor) {
    match &node.value {
        Value::Mapping(entries) => {
            for entry in entries {
                let (span, value) = (entry.key.span.shift(base), entry.value.span.shift(base));
                let on_key = span.touches(offset);
                if !on_key && !value.touches(offset) || entry.key.through_alias {
                    continue;
                }
                let (Value::Scalar(name), (table, named)) = (&entry.key.value, tables) else {
                    continue;
                };
                let key = table.and_then(|table| Key::find(table, &name.text));
                cursor.steps.push(Step {
                    name: name.text.clone(),
                    key,
                    span,
                    value,
                    text: match &entry.value.value {
                        Value::Scalar(text) => Some(text.text.clone()),
                        _ => None,
                    },
                });
                cursor.on_key = on_key;
                if !on_key && !entry.value.through_alias {
                    let below = named.map_or_else(
                        || key.map_or((None, None), |key| below(&key.kind)),
                        |keys| (Some(keys), None),
                    );
                    walk(&entry.value, base, offset, below, cursor);
                }
                return;
            }
        }
        Value::Sequence(nodes) => {
            if let Some(node) = nodes
                .iter()
                .find(|node| node.span.shift(base).touches(offset) && !node.through_alias)
            {
                walk(node, base, offset, tables, cursor);
            }
        }
        _ => {}
    }
}

fn below(kind: &'static Kind) -> Tables {
    match kind {
        Kind::Named(inner) => (None, inner.map()),
        Kind::OneOf(kinds) => kinds
            .iter()
            .map(below)
            .find(|tables| *tables != (None, None))
            .unwrap_or_default(),
        other => (other.map(), None),
    }
}
