//! Reading a broken flow collection: every entry that can be told is kept, every slip is shown where it is.

use crate::syntax::line::{quote_end, without_comment};
use crate::syntax::parse::{node, parse};
use crate::syntax::{Entry, MAX_DEPTH, Node, SyntaxError, Value, words};
use crate::text::Span;

/// What was read, and where it ends.
pub(super) struct Read {
    pub(super) node: Node,
    pub(super) end: usize,
    pub(super) errors: Vec<SyntaxError>,
}

/// Reads the flow collection that opens at `from`; the text ends where it must end.
pub(super) fn read(text: &str, from: usize, depth: usize) -> Read {
    let mut reader = Reader {
        text,
        bytes: text.as_bytes(),
        at: from,
        depth,
        errors: Vec::new(),
    };
    let node = reader.collection();
    Read {
        node,
        end: reader.at,
        errors: reader.errors,
    }
}

struct Reader<'a> {
    text: &'a str,
    bytes: &'a [u8],
    at: usize,
    depth: usize,
    errors: Vec<SyntaxError>,
}

impl Reader<'_> {
    /// A list or mapping; `at` stands on its bracket.
    fn collection(&mut self) -> Node {
        let open = self.at;
        let map = self.bytes[open] == b'{';
        let closing = if map { b'}' } else { b']' };
        self.at += 1;
        self.depth += 1;
        let mut nodes = Vec::new();
        let mut entries = Vec::new();
        // Whether a comma is wanted before the next entry.
        let mut comma = false;
        loop {
            self.space();
            let Some(&byte) = self.bytes.get(self.at) else {
                self.unclosed(open, closing);
                break;
            };
            match byte {
                b'}' | b']' if byte == closing => {
                    self.at += 1;
                    break;
                }
                b'}' | b']' => {
                    let span = Span::new(self.at, self.at + 1);
                    let text = format!(
                        "this `{}` closes the `{}` before it; a `{}` is wanted",
                        char::from(byte),
                        char::from(self.bytes[open]),
                        char::from(closing)
                    );
                    let right = char::from(closing).to_string();
                    let error = words::not_yaml(span, text);
                    self.errors
                        .push(error.repaired(format!("write `{right}`"), false, span, right));
                    self.at += 1;
                    break;
                }
                b',' => {
                    if !comma {
                        let span = Span::new(self.at, self.at + 1);
                        let error = words::not_yaml(span, "nothing stands before this comma");
                        self.errors.push(error.repaired("delete the comma", false, span, ""));
                    }
                    comma = false;
                    self.at += 1;
                }
                b'{' | b'[' if map && !comma && !entries.is_empty() => {
                    // A collection can't be a key here: the mapping before it was never closed.
                    self.unclosed(open, closing);
                    break;
                }
                _ if self.depth > MAX_DEPTH => {
                    self.at = self.bytes.len();
                    break;
                }
                _ => {
                    if comma {
                        let span = words::character(self.text, self.at);
                        let gap = Span::new(self.at, self.at);
                        let error = words::not_yaml(span, "a comma is missing before this");
                        self.errors.push(error.repaired("write a comma", false, gap, ", "));
                    }
                    let before = self.at;
                    self.entry(map, &mut nodes, &mut entries);
                    comma = true;
                    if self.at == before {
                        self.at += self.text[before..].chars().next().map_or(1, char::len_utf8);
                    }
                }
            }
        }
        self.depth -= 1;
        let value = if map {
            Value::Mapping(entries)
        } else {
            Value::Sequence(nodes)
        };
        node(Span::new(open, self.at.max(open + 1)), value)
    }

    /// One entry, with its value if it has one.
    fn entry(&mut self, map: bool, nodes: &mut Vec<Node>, entries: &mut Vec<Entry>) {
        let key = self.single();
        let save = self.at;
        self.space();
        if self.bytes.get(self.at) != Some(&b':') {
            self.at = save;
            if map {
                let end = key.span.end as usize;
                let value = node(Span::new(end, end), Value::Unreadable);
                entries.push(Entry { key, value });
            } else {
                nodes.push(key);
            }
            return;
        }
        self.at += 1;
        let behind = self.at;
        self.space();
        let mut value = match self.bytes.get(self.at) {
            None | Some(b',' | b'}' | b']') => node(Span::new(behind, behind), Value::Null),
            Some(_) => self.single(),
        };
        // `a: 1 b: 2`: the plain text before the second colon ends with the next key.
        let mut next = None;
        if self.bytes.get(self.at) == Some(&b':')
            && let Value::Scalar(_) = &value.value
        {
            let words = value.span.slice(self.text);
            if let Some(gap) = words.rfind(' ') {
                let start = value.span.start as usize + gap + 1;
                let span = Span::new(start, value.span.end as usize);
                let error = words::not_yaml(span, "a comma is missing before this key");
                let put = Span::new(start - 1, start - 1);
                self.errors.push(error.repaired("write a comma", false, put, ","));
                next = Some(start);
            } else {
                let span = Span::new(self.at, self.at + 1);
                self.errors.push(words::not_yaml(
                    span,
                    "a second colon; put a value that holds one into quotes",
                ));
                self.at += 1;
                self.space();
                if !matches!(self.bytes.get(self.at), None | Some(b',' | b'}' | b']')) {
                    self.single();
                }
            }
            value = node(value.span, Value::Unreadable);
        }
        if map {
            entries.push(Entry { key, value });
        } else {
            let span = key.span.join(value.span);
            nodes.push(node(span, Value::Mapping(vec![Entry { key, value }])));
        }
        if let Some(start) = next {
            self.at = start;
            self.entry(map, nodes, entries);
        }
    }

    /// A single value: a collection, a quoted or a plain text.
    fn single(&mut self) -> Node {
        let from = self.at;
        match self.bytes[from] {
            b'{' | b'[' if self.depth <= MAX_DEPTH => return self.collection(),
            b'"' | b'\'' => match quote_end(self.bytes, from) {
                Some(end) => self.at = end,
                None => {
                    let line = self.text[from..]
                        .find(['\n', '\r'])
                        .map_or(self.text.len(), |at| from + at);
                    let mark = &self.text[from..=from];
                    let message = format!("the quote {mark} that opens here is never closed");
                    self.errors.push(words::not_yaml(Span::new(from, line), message));
                    self.at = self.text.len();
                    return node(Span::new(from, line), Value::Unreadable);
                }
            },
            _ => self.plain(),
        }
        let span = Span::new(from, self.at);
        let parsed = parse(span.slice(self.text), self.depth.min(MAX_DEPTH - 1), false, None);
        match (parsed.stop, parsed.root) {
            (None, Some(mut read)) if parsed.errors.is_empty() => {
                read.shift(span.start);
                read
            }
            (Some((at, fault)), _) => {
                self.errors.push(words::fault(self.text, span.start + at, &fault));
                node(span, Value::Unreadable)
            }
            _ => node(span, Value::Unreadable),
        }
    }

    fn plain(&mut self) {
        let from = self.at;
        while let Some(byte) = self.bytes.get(self.at) {
            let next = self.bytes.get(self.at + 1);
            match byte {
                b',' | b'{' | b'}' | b'[' | b']' | b'\n' | b'\r' => break,
                b':' if next.is_none_or(|b| b.is_ascii_whitespace() || b",{}[]".contains(b)) => break,
                b'#' if self.at > from && self.bytes[self.at - 1] == b' ' => break,
                _ => self.at += 1,
            }
        }
        while self.at > from && matches!(self.bytes[self.at - 1], b' ' | b'\t') {
            self.at -= 1;
        }
    }

    /// Skips spaces, line breaks and comments.
    fn space(&mut self) {
        while let Some(byte) = self.bytes.get(self.at) {
            match byte {
                b' ' | b'\t' | b'\n' | b'\r' => self.at += 1,
                b'#' if self.at == 0 || self.bytes[self.at - 1].is_ascii_whitespace() => {
                    while !matches!(self.bytes.get(self.at), None | Some(b'\n' | b'\r')) {
                        self.at += 1;
                    }
                }
                _ => break,
            }
        }
    }

    /// Reports a bracket that nothing closes.
    fn unclosed(&mut self, open: usize, closing: u8) {
        let (opening, closing) = (char::from(self.bytes[open]), char::from(closing));
        // Behind the last line that is more than a comment.
        let mut before = self.text[open..self.at].trim_end();
        let end = loop {
            let line = before.rfind(['\n', '\r']).map_or(0, |at| at + 1);
            let content = without_comment(&before[line..]).trim_end();
            if line == 0 || !content.is_empty() {
                break open + line + content.len();
            }
            before = before[..line].trim_end();
        };
        let message = format!("this `{opening}` is never closed; a `{closing}` is missing");
        let error = words::not_yaml(Span::new(open, open + 1), message);
        let gap = Span::new(end, end);
        self.errors
            .push(error.repaired(format!("close it with `{closing}`"), false, gap, format!(" {closing}")));
    }
}
