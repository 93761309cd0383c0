//! Writing keys and entries into a file in the style that it is written in.

use crate::editor::view::{View, Within};
use crate::syntax::item::parse_item;
use crate::syntax::{Entry, Node, Style, Value};
use crate::text::{Edit, Span};

/// The text of a piece, as its tree's spans count in it, with the line break of its file.
#[derive(Clone, Copy)]
pub(super) struct Page<'a> {
    text: &'a str,
    line_break: &'static str,
}

impl<'a> Page<'a> {
    pub(super) fn of(view: &View<'a>, within: Within) -> Option<Self> {
        Some(Self {
            text: view.piece(within)?.span.slice(view.text()),
            line_break: line_break(view.text()),
        })
    }

    pub(super) fn is_flow(self, node: &Node) -> bool {
        node.span.slice(self.text).starts_with(['{', '['])
    }
}

/// A key to be written, with what follows its colon.
pub(super) type Written<'a> = (&'a str, &'a str);

/// What is written, at an offset, so that a mapping has more keys at its end: on lines of their own in block style, before
/// the brace in flow style. Offsets are those of `text`, as the node's are. `None` where the mapping stands there by an
/// alias, or the place can't be told for certain.
pub(super) fn append(page: Page<'_>, mapping: &Node, keys: &[Written<'_>]) -> Option<Edit> {
    let text = page.text;
    let Value::Mapping(entries) = &mapping.value else {
        return None;
    };
    if mapping.through_alias {
        return None;
    }
    let flow = page.is_flow(mapping);
    let Some(last) = entries.last() else {
        let inside = flow.then(|| mapping.span.start + 1)?;
        return Some(put(inside, format!(" {} ", in_flow(keys))));
    };
    if flow {
        let end = end_of(last);
        // A value that is lacking ends at its colon, which a comma must not follow directly.
        let gap = if text[..end as usize].ends_with(':') { " " } else { "" };
        let mut keys = in_flow(keys);
        if text[end as usize..].starts_with([' ', '\r', '\n']) {
            keys.truncate(keys.trim_end().len());
        }
        return Some(put(end, format!("{gap}, {keys}")));
    }
    let indent = column(text, entries.first()?.key.span.start, |c| c == '-')?;
    let (at, before, after) = below(page, end_of(last), &last.value)?;
    let lines: Vec<String> = keys.iter().map(|key| format!("{indent}{}", in_block(*key))).collect();
    Some(put(at, format!("{before}{}{after}", lines.join(page.line_break))))
}

/// What is written so that a mapping begins with a key.
pub(super) fn prepend(page: Page<'_>, mapping: &Node, key: Written<'_>) -> Option<Edit> {
    let text = page.text;
    let Value::Mapping(entries) = &mapping.value else {
        return None;
    };
    let first = entries.first().filter(|_| !mapping.through_alias)?;
    if page.is_flow(mapping) {
        return Some(put(first.key.span.start, format!("{}, ", in_flow(&[key]))));
    }
    let start = first.key.span.start;
    let indent = column(text, start, |c| c == '-')?;
    Some(put(start, format!("{}{}{indent}", in_block(key), page.line_break)))
}

/// What is written so that a list has one more entry, a mapping in flow style.
pub(super) fn append_entry(page: Page<'_>, list: &Node, entry: &str) -> Option<Edit> {
    let text = page.text;
    let Value::Sequence(nodes) = &list.value else {
        return None;
    };
    if list.through_alias {
        return None;
    }
    let flow = page.is_flow(list);
    match nodes.last() {
        Some(last) if flow => Some(put(last.span.end, format!(", {entry}"))),
        None => flow.then(|| put(list.span.start + 1, entry.to_owned())),
        Some(last) => {
            let first = nodes.first()?.span.start as usize;
            let line = text[..first].rfind('\n').map_or(0, |at| at + 1);
            let lead = text[line..first].trim_end().strip_suffix('-')?;
            if !lead.chars().all(|c| c == ' ') {
                return None;
            }
            let (at, before, after) = below(page, last.span.end, last)?;
            Some(put(at, format!("{before}{lead}- {entry}{after}")))
        }
    }
}

/// The edit of a piece's tree as an edit of the file, if the piece then still reads as well as before.
pub(super) fn held(view: &View<'_>, within: Within, edits: Vec<Edit>) -> Option<Vec<Edit>> {
    let piece = view.piece(within)?;
    let before = piece.span.slice(view.text());
    let mut after = before.to_owned();
    for edit in edits.iter().rev() {
        let range = edit.span.start as usize..edit.span.end as usize;
        before.get(range.clone())?;
        after.replace_range(range, &edit.text);
    }
    let reads = |text: &str| {
        let tree = parse_item(text, piece.form);
        (tree.broken, tree.errors.len())
    };
    let base = piece.span.start;
    (reads(&after) <= reads(before)).then(|| {
        let shifted = edits.into_iter().map(|edit| Edit {
            span: edit.span.shift(base),
            text: edit.text,
        });
        shifted.collect()
    })
}

pub(super) const fn put(at: u32, text: String) -> Edit {
    Edit {
        span: Span { start: at, end: at },
        text,
    }
}

fn end_of(entry: &Entry) -> u32 {
    entry.value.span.end.max(entry.key.span.end)
}

/// The line break that a text is written with.
pub(super) fn line_break(text: &str) -> &'static str {
    let first = text.find('\n').unwrap_or(0);
    if text[..first].ends_with('\r') { "\r\n" } else { "\n" }
}

fn in_flow(keys: &[Written<'_>]) -> String {
    let keys: Vec<String> = keys.iter().map(|(key, value)| format!("{key}: {value}")).collect();
    keys.join(", ")
}

fn in_block((key, value): Written<'_>) -> String {
    // A value that begins a line of its own, or is left to the author, follows its colon directly.
    let gap = if value.is_empty() || value.starts_with(['\n', '\r']) {
        ""
    } else {
        " "
    };
    format!("{key}:{gap}{value}")
}

/// Spaces up to the column of an offset, where nothing but spaces and what is `allowed` stands before it in its line.
fn column(text: &str, at: u32, allowed: impl Fn(char) -> bool) -> Option<String> {
    let before = text.get(..at as usize)?;
    let line = before.rfind('\n').map_or(0, |at| at + 1);
    let lead = before[line..].trim_start_matches('\u{feff}');
    lead.chars()
        .all(|c| c == ' ' || allowed(c))
        .then(|| " ".repeat(lead.chars().count()))
}

/// Where a line of its own goes below a value that ends at an offset, and what stands before and after it there.
fn below(page: Page<'_>, end: u32, value: &Node) -> Option<(u32, &'static str, &'static str)> {
    let (text, lines) = (page.text, page.line_break);
    let before = text.get(..end as usize)?;
    if ends_in_block_scalar(value) {
        // Its line breaks are its own.
        return before.ends_with('\n').then_some((end, "", lines));
    }
    let rest = &text[end as usize..];
    let line = &rest[..rest.find('\n').unwrap_or(rest.len())];
    let after = line.trim_start();
    if !(after.is_empty() || after.starts_with('#') && after.len() < line.len()) {
        return None;
    }
    let at = end as usize + line.trim_end_matches('\r').len();
    Some((Span::new(0, at).end, lines, ""))
}

fn ends_in_block_scalar(node: &Node) -> bool {
    match &node.value {
        Value::Scalar(scalar) => !node.through_alias && matches!(scalar.style, Style::Literal | Style::Folded),
        Value::Sequence(nodes) => nodes.last().is_some_and(ends_in_block_scalar),
        Value::Mapping(entries) => entries.last().is_some_and(|last| ends_in_block_scalar(&last.value)),
        _ => false,
    }
}
