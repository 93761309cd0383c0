//! From parser events to the tree.

use granit_parser::{Event, Options, Parser, ScalarStyle};
use rustc_hash::FxHashMap;

use super::{
    Entry, ErrorKind, MAX_ALIAS_NODES, MAX_DEPTH, MAX_NODES, Node, Scalar, Style, SyntaxError, Tree, Value, explain,
};
use crate::text::Span;

/// Reads a text as one YAML document. Where the text breaks off, the tree holds what came before.
#[must_use]
pub fn parse(text: &str) -> Tree {
    let mut options = Options::default();
    options.set_emit_comments(false);
    options.flow_nesting_limit = MAX_DEPTH;
    options.block_nesting_limit = MAX_DEPTH;
    options.emit_unresolved_aliases = true;
    let mut builder = Builder {
        text,
        ..Builder::default()
    };
    let mut documents = 0;
    for event in Parser::new_from_str_with_options(text, options) {
        match event {
            Ok((Event::DocumentStart(..), span)) => {
                documents += 1;
                if documents > 1 {
                    builder.errors.push(several_documents(text, byte_span(&span, text)));
                    break;
                }
            }
            Ok((event, span)) => {
                let span = byte_span(&span, text);
                if !builder.take(event, span) {
                    break;
                }
            }
            Err(error) => {
                builder.errors.push(explain::explain(text, &error));
                break;
            }
        }
    }
    builder.finish()
}

fn several_documents(text: &str, at: Span) -> SyntaxError {
    let marker = text.get(at.start as usize..).filter(|rest| rest.starts_with("---"));
    let end = if marker.is_some() { at.start + 3 } else { at.end };
    SyntaxError {
        span: Span { start: at.start, end },
        kind: ErrorKind::SeveralDocuments,
        message: "a second document begins here; a design file is one document, and what follows is not read"
            .to_owned(),
        repair: None,
    }
}

/// The bytes of a parser's span, held inside the text.
fn byte_span(span: &granit_parser::Span, text: &str) -> Span {
    match span.byte_range() {
        Some(range) => Span::new(range.start.min(text.len()), range.end.min(text.len())),
        None => Span::new(text.len(), text.len()),
    }
}

/// A collection that is still open.
struct Open {
    anchor: usize,
    start: u32,
    value: Value,
    /// The key that waits for its value.
    key: Option<Node>,
}

#[derive(Default)]
struct Builder<'a> {
    text: &'a str,
    open: Vec<Open>,
    root: Option<Node>,
    errors: Vec<SyntaxError>,
    anchors: FxHashMap<usize, (Node, usize)>,
    nodes: usize,
    alias_nodes: usize,
    last_end: u32,
}

impl Builder<'_> {
    /// Takes an event; answers whether to go on.
    fn take(&mut self, event: Event<'_>, span: Span) -> bool {
        self.nodes += 1;
        if self.nodes > MAX_NODES {
            return self.limit(span, format!("more than {MAX_NODES} values in one piece are not read"));
        }
        match event {
            Event::Scalar(text, style, anchor, tag) => {
                let plain = style == ScalarStyle::Plain;
                let null = plain && matches!(&*text, "" | "~" | "null" | "Null" | "NULL") && tag.is_none();
                let value = if null {
                    Value::Null
                } else {
                    Value::Scalar(Scalar {
                        text: text.into_owned(),
                        style: style_of(style),
                    })
                };
                // An empty value has its place right behind the colon, not at the next token.
                let span = if span.is_empty() { self.behind_key(span) } else { span };
                let node = Node {
                    span,
                    value,
                    through_alias: false,
                };
                self.remember(anchor, &node);
                self.place(node)
            }
            Event::SequenceStart(_, anchor, _) => self.begin(anchor, span, Value::Sequence(Vec::new())),
            Event::MappingStart(_, anchor, _) => self.begin(anchor, span, Value::Mapping(Vec::new())),
            Event::SequenceEnd | Event::MappingEnd => {
                self.last_end = self.last_end.max(span.end);
                self.end(span)
            }
            Event::Alias(anchor) => self.alias(anchor, span),
            Event::UnresolvedAlias(name) => {
                self.errors.push(SyntaxError {
                    span,
                    kind: ErrorKind::NotYaml,
                    message: format!("the alias `*{name}` has no anchor `&{name}` before it"),
                    repair: None,
                });
                self.place(Node {
                    span,
                    value: Value::Null,
                    through_alias: true,
                })
            }
            _ => true,
        }
    }

    fn limit(&mut self, span: Span, message: String) -> bool {
        self.errors.push(SyntaxError {
            span,
            kind: ErrorKind::Limit,
            message,
            repair: None,
        });
        false
    }

    fn behind_key(&self, span: Span) -> Span {
        match self.open.last().and_then(|open| open.key.as_ref()) {
            Some(key) => {
                let after = self
                    .text
                    .get(key.span.end as usize..span.start.max(key.span.end) as usize)
                    .unwrap_or("");
                let colon = after
                    .find(':')
                    .map_or(key.span.end, |at| key.span.end + Span::new(0, at + 1).end);
                Span {
                    start: colon,
                    end: colon,
                }
            }
            None => span,
        }
    }

    fn begin(&mut self, anchor: usize, span: Span, value: Value) -> bool {
        if self.open.len() >= MAX_DEPTH {
            return self.limit(span, format!("nesting deeper than {MAX_DEPTH} levels is not read"));
        }
        self.open.push(Open {
            anchor,
            start: span.start,
            value,
            key: None,
        });
        true
    }

    fn end(&mut self, span: Span) -> bool {
        let Some(open) = self.open.pop() else { return true };
        let node = close(open, span, self.text);
        let anchor = node.1;
        self.remember(anchor, &node.0);
        self.place(node.0)
    }

    fn remember(&mut self, anchor: usize, node: &Node) {
        if anchor != 0 {
            self.anchors.insert(anchor, (node.clone(), count(node)));
        }
    }

    fn alias(&mut self, anchor: usize, span: Span) -> bool {
        let Some((node, size)) = self.anchors.get(&anchor) else {
            let message = "an alias inside the value that it names makes an endless value".to_owned();
            return self.limit(span, message);
        };
        self.alias_nodes += size;
        if self.alias_nodes > MAX_ALIAS_NODES {
            let message = format!("aliases add more than {MAX_ALIAS_NODES} values here; they are not followed");
            return self.limit(span, message);
        }
        let mut node = node.clone();
        mark_alias(&mut node, span);
        self.place(node)
    }

    fn place(&mut self, node: Node) -> bool {
        match self.open.last_mut() {
            None => {
                self.root.get_or_insert(node);
            }
            Some(open) => match &mut open.value {
                Value::Sequence(nodes) => nodes.push(node),
                Value::Mapping(entries) => match open.key.take() {
                    None => open.key = Some(node),
                    Some(key) => entries.push(Entry { key, value: node }),
                },
                _ => {}
            },
        }
        true
    }

    /// Closes what is still open, where the text broke off.
    fn finish(mut self) -> Tree {
        let end = Span::new(self.text.len(), self.text.len());
        while !self.open.is_empty() {
            self.end(end);
        }
        Tree {
            root: self.root,
            errors: self.errors,
        }
    }
}

/// The node of a collection, from its first character to its last. A block collection ends with its last value, not
/// with the blank lines and comments behind it.
fn close(open: Open, end: Span, text: &str) -> (Node, usize) {
    let closed = text
        .get(end.start as usize..end.end as usize)
        .is_some_and(|t| t == "}" || t == "]");
    let last = match &open.value {
        Value::Sequence(nodes) => nodes.last().map(|node| node.span.end),
        Value::Mapping(entries) => entries.last().map(|entry| entry.value.span.end.max(entry.key.span.end)),
        _ => None,
    };
    let stop = if closed {
        end.end
    } else {
        last.unwrap_or(open.start).max(open.start)
    };
    (
        Node {
            span: Span {
                start: open.start,
                end: stop,
            },
            value: open.value,
            through_alias: false,
        },
        open.anchor,
    )
}

/// An alias stands for the whole node: every part of it has the alias's place.
fn mark_alias(node: &mut Node, span: Span) {
    node.span = span;
    node.through_alias = true;
    match &mut node.value {
        Value::Sequence(nodes) => nodes.iter_mut().for_each(|node| mark_alias(node, span)),
        Value::Mapping(entries) => {
            for entry in entries {
                mark_alias(&mut entry.key, span);
                mark_alias(&mut entry.value, span);
            }
        }
        _ => {}
    }
}

fn count(node: &Node) -> usize {
    1 + match &node.value {
        Value::Sequence(nodes) => nodes.iter().map(count).sum(),
        Value::Mapping(entries) => entries
            .iter()
            .map(|entry| count(&entry.key) + count(&entry.value))
            .sum(),
        _ => 0,
    }
}

const fn style_of(style: ScalarStyle) -> Style {
    match style {
        ScalarStyle::SingleQuoted => Style::SingleQuoted,
        ScalarStyle::DoubleQuoted => Style::DoubleQuoted,
        ScalarStyle::Literal => Style::Literal,
        ScalarStyle::Folded => Style::Folded,
        _ => Style::Plain,
    }
}
