//! Selections that grow from a cursor outward along the tree.

use crate::editor::layout;
use crate::editor::view::{View, Within};
use crate::syntax::{Node, Value};
use crate::text::Span;

/// What holds an offset, innermost first: word, value, key with value, mapping, item, list, file. Each holds the one
/// before it and more.
#[must_use]
pub fn selection(view: &View<'_>, offset: u32) -> Vec<Span> {
    let text = view.text();
    let within = view.within(offset);
    let mut outward = vec![Span::new(0, text.len())];
    outward.extend(list(view, within));
    if let Some(piece) = view.piece(within) {
        outward.push(layout::content(text, piece.span));
    }
    if let Some((tree, base)) = view.tree(within)
        && let Some(root) = &tree.root
    {
        walk(root, base, offset, &mut outward);
    }
    // Where something is broken a child may reach out of its parent; a selection that does not grow is of no use.
    let mut spans: Vec<Span> = Vec::new();
    for span in outward {
        let inside = spans
            .last()
            .is_none_or(|last| last.start <= span.start && span.end <= last.end && *last != span);
        if inside && span.touches(offset) {
            spans.push(span);
        }
    }
    spans.reverse();
    spans
}

fn walk(node: &Node, base: u32, offset: u32, out: &mut Vec<Span>) {
    let span = node.span.shift(base);
    if !span.touches(offset) || node.through_alias {
        if node.through_alias && span.touches(offset) {
            out.push(span);
        }
        return;
    }
    out.push(span);
    let holds = |node: &Node| node.span.shift(base).touches(offset);
    match &node.value {
        Value::Sequence(nodes) => {
            if let Some(node) = nodes.iter().find(|node| holds(node)) {
                walk(node, base, offset, out);
            }
        }
        Value::Mapping(entries) => {
            let whole = |key: Span, value: Span| key.join(value).shift(base);
            let entry = entries
                .iter()
                .find(|entry| whole(entry.key.span, entry.value.span).touches(offset));
            if let Some(entry) = entry {
                out.push(whole(entry.key.span, entry.value.span));
                let inner = if holds(&entry.key) { &entry.key } else { &entry.value };
                walk(inner, base, offset, out);
            }
        }
        _ => {}
    }
}

/// The list that an item belongs to.
fn list(view: &View<'_>, within: Within) -> Option<Span> {
    let source = view.source();
    let ends = match within {
        Within::Member(_) => (
            "members",
            source.members.first()?.piece.span,
            source.members.last()?.piece.span,
        ),
        Within::Group(_) => (
            "groups",
            source.groups.first()?.piece.span,
            source.groups.last()?.piece.span,
        ),
        Within::Product(_) => (
            "products",
            source.products.first()?.piece.span,
            source.products.last()?.piece.span,
        ),
        Within::Entry(_) | Within::Nothing => return None,
    };
    Some(layout::list(view.text(), ends.0, ends.1, ends.2).0)
}
