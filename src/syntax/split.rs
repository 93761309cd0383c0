//! The work of splitting a file.

use crate::syntax::item::{Form, cap, read_piece};
use crate::syntax::line::{self, Line, Lines};
use crate::syntax::outline::{ListSection, Outline, Piece, TopEntry};
use crate::syntax::parse::{Surroundings, parse};
use crate::syntax::{ErrorKind, MAX_BYTES, Node, SyntaxError, Tree, Value, words};
use crate::text::Span;

pub(super) mod again;
mod frame;
mod items;
mod references;

/// The keys whose values are split into items, and the form of those.
const SECTIONS: [(&str, Form); 3] = [
    ("members", Form::Listed),
    ("groups", Form::Named),
    ("products", Form::Named),
];

fn section(key: &str) -> Option<Form> {
    SECTIONS.iter().find(|(name, _)| *name == key).map(|(_, form)| *form)
}

/// A top-level entry: its first line, and where its lines end.
#[derive(Debug, Clone, Copy)]
struct Chunk {
    first: Line,
    end: usize,
}

pub(super) fn split(text: &str) -> Outline {
    let mut outline = Outline::default();
    if text.len() as u64 > MAX_BYTES {
        let message = format!("files of more than {} MiB are not read", MAX_BYTES >> 20);
        outline.errors.push(SyntaxError {
            span: words::character(text, 0),
            kind: ErrorKind::Limit,
            message,
            repair: None,
        });
        return outline;
    }
    let frame = frame::frame(text, &mut outline.errors);
    let mut shared = Surroundings::default();
    let first = Lines::new(text, frame.from, frame.to).next();
    let before = first.map_or(frame.to, |line| line.start);
    outline.errors.extend(words::unprintable(text, 0, before));
    if outline
        .errors
        .iter()
        .all(|error| error.kind != ErrorKind::SeveralDocuments)
    {
        outline.errors.extend(words::unprintable(text, frame.to, text.len()));
    }
    let Some(first) = first else { return outline };
    if frame.odd || !begins_mapping(text, frame.from, frame.to, first) {
        whole(text, &frame, &mut outline);
        return outline;
    }
    byte_order_mark(text, frame.to, &mut outline.errors);
    outline.steady = frame.directives.is_empty() && line::key_end(first.content(text)).is_some();
    shared.directives = frame.directives;
    let chunks = chunks(text, frame.from, frame.to, first, &mut outline.errors);
    for chunk in &chunks {
        let entry = top_entry(text, *chunk, chunks.len() > 1, &mut outline.errors);
        outline.entries.push(entry);
    }
    references::resolve(text, &mut outline.entries, &mut shared);
    outline.entries = std::mem::take(&mut outline.entries)
        .into_iter()
        .map(|entry| unfold(text, entry, &mut outline.errors))
        .collect();
    cap_file(&mut outline.errors);
    outline.steady &= outline.errors.is_empty();
    outline
}

/// Reports a byte order mark inside the document. A piece may begin with one that its text alone would not show as
/// misplaced, so the parser is asked about the document.
fn byte_order_mark(text: &str, to: usize, errors: &mut Vec<SyntaxError>) {
    let mark = '\u{FEFF}';
    if !text[..to].trim_start_matches(mark).contains(mark) {
        return;
    }
    if let Some((at, fault @ granit_parser::ErrorKind::BomInsideDocument)) = &parse(&text[..to], 0, true, None).stop {
        let error = words::fault(text, *at, fault);
        let span = error.span;
        errors.push(error.repaired("delete it", true, span, ""));
    }
}

/// Whether the root is a mapping in block style, or meant as one.
fn begins_mapping(text: &str, from: usize, to: usize, first: Line) -> bool {
    let content = first.content(text);
    if first.tabbed() || content.starts_with(['{', '[', '|', '>', '&', '!', '*', '?', '%']) || line::is_entry(content) {
        return false;
    }
    // A first line without a colon is a slip only if others have theirs.
    line::key_end(content).is_some()
        || Lines::new(text, from, to)
            .skip(1)
            .take(1000)
            .any(|line| line.indent == first.indent && line::key_end(line.content(text)).is_some())
            && parse(beginning(&text[from..to], 4096), 0, true, None).stop.is_some()
}

/// At most so many bytes of a text, cut between characters.
fn beginning(text: &str, most: usize) -> &str {
    let mut end = most.min(text.len());
    while !text.is_char_boundary(end) {
        end -= 1;
    }
    &text[..end]
}

/// The top-level entries of a block mapping.
fn chunks(text: &str, from: usize, to: usize, first: Line, errors: &mut Vec<SyntaxError>) -> Vec<Chunk> {
    let column = first.indent;
    let mut chunks: Vec<Chunk> = Vec::new();
    let bytes = text.as_bytes();
    // Whether the entry began with `?` and its `: value` is still to come.
    let mut explicit = false;
    for line in Lines::new(text, from, to) {
        if line.indent > column || line.tabbed() {
            continue;
        }
        let content = line.content(text);
        if !chunks.is_empty() && line.indent == column {
            // A list may stand in the column of its key; brackets and `:` go on with what is above.
            let goes_on = match bytes[line.from] {
                b'-' => line::is_entry(content),
                b':' => line::is_indicator(content, b':') && std::mem::take(&mut explicit),
                b'}' | b']' => true,
                _ => false,
            };
            if goes_on {
                continue;
            }
        }
        explicit = line::is_indicator(content, b'?');
        if let Some(last) = chunks.last_mut() {
            last.end = line.start;
        }
        if line.indent < column {
            let lead = Span::new(line.start, line.from);
            let mut error = words::misplaced(lead, line.indent, column);
            if lead.is_empty() {
                error.span = words::character(text, line.from);
            }
            errors.push(error);
        }
        chunks.push(Chunk { first: line, end: to });
    }
    chunks
}

fn top_entry(text: &str, chunk: Chunk, others: bool, errors: &mut Vec<SyntaxError>) -> TopEntry {
    let first = chunk.first;
    let content = line::without_comment(first.content(text));
    let whole = Piece::new(Span::new(first.start, chunk.end), Form::Top);
    let key = content.strip_suffix(':').unwrap_or(content);
    let Some(form) = section(key) else {
        return TopEntry::Head(whole);
    };
    let key_span = Span::new(first.from, first.from + key.len());
    let bare = key.len() == content.len();
    let items = items::items(text, first, chunk.end, form);
    match items {
        Some(items) if !bare || others && !items.is_empty() => {
            if bare {
                let end = Span::new(first.to.min(key_span.end as usize), key_span.end as usize);
                let text = format!("`{key}` has no colon, though its value stands below");
                errors.push(words::not_yaml(key_span, text).repaired("write a colon behind it", true, end, ":"));
            }
            errors.extend(items::uneven(text, &items));
            let begin = items.first().map_or(chunk.end, |item| item.span.start as usize);
            errors.extend(words::unprintable(text, first.to.min(begin), begin));
            errors.extend(words::unprintable(text, first.from, first.to));
            TopEntry::List(ListSection {
                key: key.to_owned(),
                key_span,
                broken: false,
                items: items.iter().map(|item| Piece::new(item.span, form)).collect(),
            })
        }
        _ => TopEntry::Head(whole),
    }
}

/// Takes a list apart that was not split by indentation.
fn unfold(text: &str, entry: TopEntry, errors: &mut Vec<SyntaxError>) -> TopEntry {
    let TopEntry::Head(piece) = &entry else { return entry };
    let own = piece.span.slice(text);
    let content = own.trim_start();
    let odd = content.starts_with(['"', '\'', '?', '&', '!', '*']);
    let named = || SECTIONS.iter().any(|(name, _)| content.starts_with(name));
    if !odd && !named() {
        return entry;
    }
    let mut tree = piece.tree(text);
    tree.each_span(&mut |span| *span = span.shift(piece.span.start));
    match list_of(tree, errors) {
        Ok(list) => TopEntry::List(list),
        Err(tree) => {
            let span = piece.span;
            TopEntry::Head(Piece::read(span, Form::Top, based(tree, span.start)))
        }
    }
}

/// The items of a tree of one top-level entry; spans of the file.
fn list_of(tree: Tree, errors: &mut Vec<SyntaxError>) -> Result<ListSection, Tree> {
    let fits = match tree.root.as_ref().map(|root| &root.value) {
        Some(Value::Mapping(entries)) => match entries.as_slice() {
            [entry] => match (&entry.key.value, &entry.value.value) {
                (Value::Scalar(key), Value::Sequence(_)) => section(&key.text) == Some(Form::Listed),
                (Value::Scalar(key), Value::Mapping(_)) => section(&key.text) == Some(Form::Named),
                _ => false,
            },
            _ => false,
        },
        _ => false,
    };
    let (true, Some(Value::Mapping(mut entries))) = (fits, tree.root.as_ref().map(|root| root.value.clone())) else {
        return Err(tree);
    };
    let Some(entry) = entries.pop() else { return Err(tree) };
    let key = match entry.key.value {
        Value::Scalar(key) => key.text,
        _ => return Err(tree),
    };
    let mut left = tree.errors;
    let mut item = |span: Span, root: Node, form: Form| {
        let inside =
            |error: &SyntaxError| span.start <= error.span.start && error.span.start < span.end.max(span.start + 1);
        let (own, others): (Vec<_>, Vec<_>) = std::mem::take(&mut left).into_iter().partition(inside);
        left = others;
        let tree = Tree {
            broken: tree.broken && !own.is_empty(),
            errors: own,
            root: Some(root),
        };
        Piece::read(span, form, based(tree, span.start))
    };
    let items = match entry.value.value {
        Value::Sequence(nodes) => nodes
            .into_iter()
            .map(|node| item(node.span, node, Form::Listed))
            .collect(),
        Value::Mapping(entries) => entries
            .into_iter()
            .map(|entry| {
                let span = entry.key.span.join(entry.value.span);
                let root = crate::syntax::parse::node(span, Value::Mapping(vec![entry]));
                item(span, root, Form::Named)
            })
            .collect(),
        _ => Vec::new(),
    };
    let list = ListSection {
        key,
        key_span: entry.key.span,
        broken: tree.broken && !left.is_empty(),
        items,
    };
    errors.extend(left);
    Ok(list)
}

/// A tree with spans of the file, counted from `base` instead.
fn based(mut tree: Tree, base: u32) -> Tree {
    tree.each_span(&mut |span| {
        *span = Span {
            start: span.start.saturating_sub(base),
            end: span.end.saturating_sub(base),
        };
    });
    tree
}

/// Reads a file whose root is no mapping in block style.
fn whole(text: &str, frame: &frame::Frame, outline: &mut Outline) {
    let start = if frame.odd { 0 } else { frame.from };
    let own = &text[start..frame.to];
    let parsed = parse(own, 0, true, None);
    let mut tree = Tree {
        broken: parsed.stop.is_some() || !parsed.errors.is_empty(),
        root: parsed.root,
        errors: parsed.errors,
    };
    if let Some((at, fault)) = &parsed.stop {
        let error = words::fault(own, *at, fault);
        let from = own.len() - own.trim_start().len();
        let flow = own[from..].starts_with(['{', '[']) && error.kind != ErrorKind::Limit;
        if flow && own.len() <= crate::syntax::MAX_RECOVERED {
            let read = crate::syntax::flow::read(own, from, 0);
            tree.root = Some(read.node);
            tree.errors.extend(read.errors);
        }
        if tree.errors.is_empty() {
            tree.errors.push(error);
        }
        cap(&mut tree.errors);
    }
    tree.each_span(&mut |span| *span = span.shift(Span::new(0, start).end));
    let Some(root) = tree.root else {
        outline.errors.extend(tree.errors);
        return;
    };
    let Value::Mapping(entries) = root.value else {
        outline.errors.extend(tree.errors);
        outline.other = (root.value != Value::Null).then_some(root);
        return;
    };
    let mut left = tree.errors;
    for entry in entries {
        let span = entry.key.span.join(entry.value.span);
        let inside = |error: &SyntaxError| span.start <= error.span.start && error.span.start < span.end;
        let (own, others): (Vec<_>, Vec<_>) = std::mem::take(&mut left).into_iter().partition(inside);
        left = others;
        let part = Tree {
            broken: tree.broken && !own.is_empty(),
            errors: own,
            root: Some(crate::syntax::parse::node(span, Value::Mapping(vec![entry]))),
        };
        outline.entries.push(match list_of(part, &mut outline.errors) {
            Ok(list) => TopEntry::List(list),
            Err(part) => TopEntry::Head(Piece::read(span, Form::Top, based(part, span.start))),
        });
    }
    outline.errors.extend(left);
    cap_file(&mut outline.errors);
}

/// Reads a piece that needs its surroundings.
fn read_now(text: &str, piece: &Piece, shared: &mut Surroundings) -> Piece {
    let tree = read_piece(piece.span.slice(text), piece.form, Some(shared));
    Piece::read(piece.span, piece.form, tree)
}

fn cap_file(errors: &mut Vec<SyntaxError>) {
    cap(errors);
}
