//! Reading an item whose damage must not reach the others, and keeping of it what can be kept.

use super::tree::parse;
use super::{Entry, ErrorKind, Node, SyntaxError, Value};
use crate::text::Span;

/// An item read by itself.
#[derive(Debug, Clone, PartialEq)]
pub struct ItemTree {
    /// The item's node: of a list the entry, of a mapping the mapping of its one name.
    pub node: Option<Node>,
    /// What is no YAML in it.
    pub errors: Vec<SyntaxError>,
    /// Whether it broke off, so that keys may be lacking that its author wrote.
    pub broken: bool,
}

/// Reads the text of one item. `list` tells an entry of a list from one of a mapping. Spans count from its start.
#[must_use]
pub fn parse_item(text: &str, list: bool) -> ItemTree {
    let tree = parse(text);
    let broken = !tree.errors.is_empty();
    let mut errors = tree.errors;
    let mut node = tree.root;
    if broken {
        rescue(text, &mut node, &errors, list);
    }
    if list {
        node = match node.map(|node| (node.span, node.value)) {
            Some((_, Value::Sequence(mut nodes))) if !nodes.is_empty() => Some(nodes.swap_remove(0)),
            Some((span, value @ Value::Mapping(_))) if broken => Some(Node {
                span,
                value,
                through_alias: false,
            }),
            _ => None,
        };
        if node.is_none() && !broken {
            errors.push(no_entry(text));
        }
    }
    let broken = broken || !errors.is_empty();
    ItemTree { node, errors, broken }
}

fn no_entry(text: &str) -> SyntaxError {
    let from = text.len() - text.trim_start().len();
    let end = text[from..].find('\n').map_or(text.len(), |at| from + at);
    SyntaxError {
        span: Span::new(from, end),
        kind: ErrorKind::NotYaml,
        message: "an entry of the list begins with `- `; a space is missing behind the dash".to_owned(),
        repair: None,
    }
}

/// Adds to a partial tree the lines (of a flow mapping: the pieces) behind the error that read as `key: value`.
fn rescue(text: &str, root: &mut Option<Node>, errors: &[SyntaxError], list: bool) {
    let Some(error) = errors.first() else { return };
    let mapping = match root {
        Some(node) => match (list, &mut node.value) {
            (true, Value::Sequence(nodes)) => nodes.first_mut().map(|node| &mut node.value),
            (false, Value::Mapping(entries)) => entries.first_mut().map(|entry| &mut entry.value.value),
            (true, value @ Value::Mapping(_)) => Some(value),
            _ => None,
        },
        None => None,
    };
    let flow = text.trim_start().trim_start_matches(['-', ' ']).starts_with('{');
    let pieces = if flow { flow_pieces(text) } else { lines(text) };
    let found: Vec<Entry> = pieces
        .into_iter()
        .filter(|piece| !overlaps(*piece, error.span))
        .filter_map(|piece| entry(text, piece))
        .collect();
    match mapping {
        Some(Value::Mapping(entries)) => add(entries, found),
        Some(value @ Value::Null) => *value = Value::Mapping(found),
        Some(_) => {}
        None if list && !found.is_empty() => {
            let span = Span::new(0, text.trim_end().len());
            *root = Some(Node {
                span,
                value: Value::Mapping(found),
                through_alias: false,
            });
        }
        None => {}
    }
}

fn add(entries: &mut Vec<Entry>, found: Vec<Entry>) {
    // A value that the parser gave to a key before it broke off may be the damage itself: the line's own reading wins.
    for new in found {
        let same = |entry: &Entry| entry.key.span.start == new.key.span.start;
        let known = entries
            .iter()
            .any(|entry| same(entry) || entry.key.value == new.key.value);
        if !known {
            entries.push(new);
        }
    }
}

const fn overlaps(piece: Span, error: Span) -> bool {
    piece.start < error.end && error.start < piece.end
}

/// A piece of text that reads as one `key: value`.
fn entry(text: &str, piece: Span) -> Option<Entry> {
    let tree = parse(piece.slice(text));
    if !tree.errors.is_empty() {
        return None;
    }
    let Value::Mapping(mut entries) = tree.root?.value else {
        return None;
    };
    if entries.len() != 1 {
        return None;
    }
    let mut entry = entries.swap_remove(0);
    entry.key.shift(piece.start);
    entry.value.shift(piece.start);
    Some(entry)
}

/// The most pieces of a broken item that are looked at, so that hostile text costs no more than its length.
const MOST_PIECES: usize = 200;

/// Lines in the column of the item's first key, without their indentation and dash.
fn lines(text: &str) -> Vec<Span> {
    let mut pieces = Vec::new();
    let mut column = None;
    let mut start = 0;
    for line in text.split_inclusive('\n') {
        let content = line.trim_end();
        let from = content.len() - content.trim_start_matches([' ', '-', '\t']).len();
        let here = *column.get_or_insert(from);
        let is_key = content.len() > from && content.as_bytes()[from] != b'#' && from.abs_diff(here) <= 2;
        if is_key && pieces.len() < MOST_PIECES {
            pieces.push(Span::new(start + from, start + content.len()));
        }
        start += line.len();
    }
    pieces
}

/// The pieces between the outermost commas of a flow mapping.
fn flow_pieces(text: &str) -> Vec<Span> {
    let mut pieces = Vec::new();
    let Some(open) = text.find('{') else { return pieces };
    let mut depth = 0_i32;
    let mut from = open + 1;
    for (at, byte) in text.bytes().enumerate().skip(open + 1) {
        match byte {
            b'{' | b'[' => depth += 1,
            b'}' | b']' if depth > 0 => depth -= 1,
            b',' | b'}' | b'\n' if depth <= 0 || byte == b'\n' => {
                pieces.push(Span::new(from, at));
                from = at + 1;
                depth = 0;
            }
            _ => {}
        }
        if pieces.len() >= MOST_PIECES {
            return pieces;
        }
    }
    if from < text.len() {
        pieces.push(Span::new(from, text.len()));
    }
    let trim = |span: Span| {
        let piece = span.slice(text);
        let lead = piece.len() - piece.trim_start().len();
        let tail = piece.len() - piece.trim_end().len();
        Span {
            start: span.start + Span::new(0, lead).end,
            end: span.end - Span::new(0, tail).end.min(span.len()),
        }
    };
    pieces
        .into_iter()
        .map(trim)
        .filter(|span| span.start < span.end)
        .collect()
}
