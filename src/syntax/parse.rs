//! From the events of the YAML parser to a tree: one document, aliases resolved, up to the first error.

use std::borrow::Cow;

use granit_parser::{ErrorKind as Fault, Event, Parser, ScalarStyle, StructureStyle, Tag};
use rustc_hash::FxHashMap;

use crate::syntax::words;
use crate::syntax::{Entry, ErrorKind, MAX_ALIAS_NODES, MAX_DEPTH, MAX_NODES, Node, Scalar, Style, SyntaxError, Value};
use crate::text::Span;

/// What pieces of one file share: the `%TAG` lines, and the anchors met so far.
#[derive(Debug, Default)]
pub(super) struct Surroundings {
    /// Directives with their `---`, put before each piece that needs them.
    pub(super) directives: String,
    /// The newest value of each anchor.
    anchors: FxHashMap<String, Anchored>,
    /// How many values aliases have brought in.
    copied: usize,
    /// Whether those were too many.
    over: bool,
}

/// An anchored value with its size, so that an alias is weighed before it is copied.
#[derive(Debug, Clone)]
struct Anchored {
    node: Node,
    size: usize,
    depth: usize,
}

/// What the parser made of a text.
#[derive(Debug, Default)]
pub(super) struct Parsed {
    /// The root; after a stop, whatever was complete before it.
    pub(super) root: Option<Node>,
    /// Whether the root is a list or mapping in block style.
    pub(super) block: bool,
    /// Errors that did not stop the parser.
    pub(super) errors: Vec<SyntaxError>,
    /// Where and why the parser stopped before the end.
    pub(super) stop: Option<(u32, Fault)>,
    /// Whether reading ended early at a limit.
    pub(super) cut: bool,
}

/// A list or mapping whose end has not been met yet.
struct Open {
    start: u32,
    flow: bool,
    anchor: usize,
    held: Held,
}

enum Held {
    List(Vec<Node>),
    Entries(Vec<Entry>, Option<Node>),
}

struct Builder<'a> {
    text: &'a str,
    /// Bytes of the directives before the text.
    base: usize,
    /// How deep the text itself is nested in its file.
    depth: usize,
    open: Vec<Open>,
    ids: FxHashMap<usize, Anchored>,
    /// Whether values are kept for aliases.
    keep: bool,
    copied: usize,
    over: bool,
    out: Parsed,
}

/// Reads the first document of a text that stands `depth` levels deep in its file. `strict` holds the lines of flow
/// collections and quoted texts to the indentation that YAML 1.2 asks for.
pub(super) fn parse(text: &str, depth: usize, strict: bool, surroundings: Option<&mut Surroundings>) -> Parsed {
    let mut options = granit_parser::options! {
        strict_indentation: strict,
        emit_unresolved_aliases: true,
        emit_comments: false,
        flow_nesting_limit: MAX_DEPTH,
        block_nesting_limit: MAX_DEPTH,
    };
    let Some(shared) = surroundings else {
        let mut builder = Builder::new(text, 0, depth, text.contains('*'));
        builder.run(text, options, None);
        return builder.out;
    };
    options.emit_anchor_events = true;
    let source: Cow<'_, str> = if shared.directives.is_empty() {
        Cow::Borrowed(text)
    } else {
        Cow::Owned(format!("{}{text}", shared.directives))
    };
    let mut builder = Builder::new(text, shared.directives.len(), depth, true);
    builder.copied = shared.copied;
    builder.over = shared.over;
    builder.run(&source, options, Some(shared));
    builder.out
}

impl<'a> Builder<'a> {
    fn new(text: &'a str, base: usize, depth: usize, keep: bool) -> Self {
        Self {
            text,
            base,
            depth,
            open: Vec::new(),
            ids: FxHashMap::default(),
            keep,
            copied: 0,
            over: false,
            out: Parsed::default(),
        }
    }

    fn run(&mut self, source: &str, options: granit_parser::Options, mut shared: Option<&mut Surroundings>) {
        let mut names: FxHashMap<usize, String> = FxHashMap::default();
        let mut nodes = 0;
        let mut done = false;
        for next in Parser::new_from_str_with_options(source, options) {
            let (event, place) = match next {
                Ok(next) => next,
                Err(error) => {
                    let at = error.marker().byte_offset().unwrap_or(source.len());
                    self.out.stop = Some((self.offset(at), error.kind().clone()));
                    break;
                }
            };
            let span = match place.byte_range() {
                Some(range) => Span {
                    start: self.offset(range.start),
                    end: self.offset(range.end),
                },
                None => Span::default(),
            };
            nodes += 1;
            match event {
                Event::Scalar(text, style, anchor, tag) => {
                    let node = self.scalar(text, style, tag.as_deref(), span);
                    self.close(node, anchor, false);
                }
                Event::SequenceStart(style, anchor, _) => self.begin(span, style, anchor, Held::List(Vec::new())),
                Event::MappingStart(style, anchor, _) => {
                    self.begin(span, style, anchor, Held::Entries(Vec::new(), None));
                }
                Event::SequenceEnd | Event::MappingEnd => self.end(span),
                Event::Alias(id) => {
                    let anchored = self.ids.get(&id).cloned();
                    self.alias(
                        span,
                        anchored.ok_or("an alias inside the value that it names makes an endless value"),
                    );
                }
                Event::UnresolvedAlias(name) => {
                    let anchored = shared.as_ref().and_then(|s| s.anchors.get(name.as_ref())).cloned();
                    self.alias(span, anchored.ok_or(""));
                }
                Event::Anchor(id, name) => {
                    names.insert(id, name.into_owned());
                }
                Event::DocumentEnd => done = true,
                Event::DocumentStart(..) if done => {
                    self.out.stop = Some((span.start, Fault::MultipleDocumentsUnsupported));
                    break;
                }
                _ => {}
            }
            if self.open.len() + self.depth > MAX_DEPTH {
                self.out.stop = Some((span.start, Fault::RecursionLimitExceeded));
                break;
            }
            if nodes > MAX_NODES {
                self.limit(span, format!("more than {MAX_NODES} values in one piece are not read"));
                self.out.cut = true;
                break;
            }
        }
        while !self.open.is_empty() {
            self.end(Span::new(self.text.len(), self.text.len()));
        }
        if let Some(shared) = shared.as_mut() {
            shared.copied = self.copied;
            shared.over = self.over;
            let mut ids: Vec<_> = names.into_iter().collect();
            ids.sort_unstable_by_key(|(id, _)| *id);
            for (id, name) in ids {
                if let Some(anchored) = self.ids.remove(&id) {
                    shared.anchors.insert(name, anchored);
                }
            }
        }
    }

    /// An offset in the text itself, on a character boundary whatever the parser says.
    fn offset(&self, at: usize) -> u32 {
        let at = at.saturating_sub(self.base).min(self.text.len());
        Span::new(0, self.text.floor_char_boundary(at)).end
    }

    fn scalar(&self, text: Cow<'_, str>, style: ScalarStyle, tag: Option<&Tag>, span: Span) -> Node {
        let null = style == ScalarStyle::Plain
            && match tag {
                None => span.is_empty() || matches!(text.as_ref(), "~" | "null" | "Null" | "NULL"),
                Some(tag) => tag.core_suffix() == Some("null"),
            };
        if null {
            return node(self.absent(span), Value::Null);
        }
        let style = match style {
            ScalarStyle::Plain => Style::Plain,
            ScalarStyle::SingleQuoted => Style::SingleQuoted,
            ScalarStyle::DoubleQuoted => Style::DoubleQuoted,
            ScalarStyle::Literal => Style::Literal,
            ScalarStyle::Folded => Style::Folded,
        };
        let text = text.into_owned();
        node(span, Value::Scalar(Scalar { text, style }))
    }

    /// An absent value stands behind the colon of its key.
    fn absent(&self, span: Span) -> Span {
        let rest = &self.text[span.start as usize..];
        let after = rest.trim_start_matches([' ', '\t']);
        let in_value = matches!(
            self.open.last(),
            Some(Open {
                held: Held::Entries(_, Some(_)),
                ..
            })
        );
        if span.is_empty() && in_value && after.starts_with(':') {
            {
                let at = self.text.len() - after.len() + 1;
                Span::new(at, at)
            }
        } else {
            span
        }
    }

    fn begin(&mut self, span: Span, style: StructureStyle, anchor: usize, held: Held) {
        self.open.push(Open {
            start: span.start,
            flow: style == StructureStyle::Flow,
            anchor,
            held,
        });
    }

    fn end(&mut self, span: Span) {
        let Some(open) = self.open.pop() else { return };
        let value = match open.held {
            Held::List(nodes) => Value::Sequence(nodes),
            Held::Entries(mut entries, key) => {
                // Only after a stop is a key left without its value.
                entries.extend(key.map(|key| Entry {
                    value: node(
                        Span {
                            start: key.span.end,
                            end: key.span.end,
                        },
                        Value::Unreadable,
                    ),
                    key,
                }));
                Value::Mapping(entries)
            }
        };
        // The end of a block collection is met at the next token, far behind its last value.
        let end = match &value {
            _ if open.flow => span.end,
            Value::Sequence(nodes) => nodes.last().map_or(open.start, |last| last.span.end),
            Value::Mapping(entries) => entries
                .last()
                .map_or(open.start, |last| last.value.span.end.max(last.key.span.end)),
            _ => open.start,
        };
        let span = Span {
            start: open.start,
            end: end.max(open.start),
        };
        self.close(node(span, value), open.anchor, !open.flow);
    }

    /// Puts a finished value where it belongs.
    fn close(&mut self, node: Node, anchor: usize, block: bool) {
        if anchor != 0 && self.keep {
            let (size, depth) = measure(&node);
            // What is kept for aliases is a copy and weighs like one.
            self.copied += size;
            if self.copied <= MAX_ALIAS_NODES {
                let node = node.clone();
                self.ids.insert(anchor, Anchored { node, size, depth });
            } else {
                self.too_many(node.span);
            }
        }
        match self.open.last_mut().map(|open| &mut open.held) {
            None => {
                self.out.root = Some(node);
                self.out.block = block;
            }
            Some(Held::List(nodes)) => nodes.push(node),
            Some(Held::Entries(entries, key)) => match key.take() {
                None => *key = Some(node),
                Some(key) => entries.push(Entry { key, value: node }),
            },
        }
    }

    fn alias(&mut self, span: Span, anchored: Result<Anchored, &str>) {
        let value = match anchored {
            _ if self.over => Value::Unreadable,
            Err("") => {
                let name = span.slice(self.text).trim_start_matches('*');
                self.out.errors.push(words::unknown_alias(span, name));
                Value::Unreadable
            }
            Err(why) => {
                self.limit(span, why.to_owned());
                Value::Unreadable
            }
            Ok(found) => {
                self.copied += found.size;
                if self.copied > MAX_ALIAS_NODES {
                    self.too_many(span);
                    Value::Unreadable
                } else if self.open.len() + self.depth + found.depth > MAX_DEPTH {
                    self.limit(span, format!("nesting deeper than {MAX_DEPTH} levels is not read"));
                    Value::Unreadable
                } else {
                    let mut copy = found.node;
                    copy.each_node(&mut |node| {
                        node.span = span;
                        node.through_alias = true;
                    });
                    copy.value
                }
            }
        };
        let node = Node {
            span,
            value,
            through_alias: true,
        };
        self.close(node, 0, false);
    }

    fn too_many(&mut self, span: Span) {
        if !self.over {
            self.over = true;
            self.limit(
                span,
                format!(
                    "aliases add more than {MAX_ALIAS_NODES} values to this file; they are not followed from here on"
                ),
            );
        }
    }

    fn limit(&mut self, span: Span, message: String) {
        self.out.errors.push(SyntaxError {
            span,
            message,
            kind: ErrorKind::Limit,
            repair: None,
        });
    }
}

/// A value as written at its own place.
pub(super) fn node(span: Span, value: Value) -> Node {
    Node {
        span,
        value,
        through_alias: false,
    }
}

/// How many values a value holds, itself included, and how many levels.
fn measure(node: &Node) -> (usize, usize) {
    let add = |(size, depth): (usize, usize), inner: &Node| {
        let (more, deeper) = measure(inner);
        (size + more, depth.max(deeper + 1))
    };
    match &node.value {
        Value::Null | Value::Unreadable | Value::Scalar(_) => (1, 0),
        Value::Sequence(nodes) => nodes.iter().fold((1, 1), add),
        Value::Mapping(entries) => entries
            .iter()
            .flat_map(|entry| [&entry.key, &entry.value])
            .fold((1, 1), add),
    }
}

/// The comments of a text, up to its first error.
pub(super) fn comments(text: &str) -> Vec<Span> {
    let options = granit_parser::options! { emit_comments: true, emit_unresolved_aliases: true };
    let mut found = Vec::new();
    let mut reached = text.len();
    for next in Parser::new_from_str_with_options(text, options) {
        match next {
            Ok((Event::Comment(..), place)) => {
                found.extend(place.byte_range().map(|range| Span::new(range.start, range.end)))
            }
            Ok(_) => {}
            Err(error) => {
                reached = error.marker().byte_offset().unwrap_or(0).min(text.len());
                break;
            }
        }
    }
    let last = found.last().map_or(0, |span: &Span| span.end as usize);
    let mut at = text.floor_char_boundary(reached.max(last));
    // Behind an error only lines that are nothing but a comment are told.
    for line in text[at..].split_inclusive('\n') {
        let content = line.trim();
        if content.starts_with('#') {
            let from = at + line.len() - line.trim_start().len();
            found.push(Span::new(from, from + content.len()));
        }
        at += line.len();
    }
    found
}
