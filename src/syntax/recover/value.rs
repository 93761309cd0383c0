//! Why the value on a key's own line can't be read.

use granit_parser::ErrorKind as Fault;

use super::{Recovery, Rows};
use crate::syntax::line;
use crate::syntax::parse::node;
use crate::syntax::{Entry, Node, Value, words};
use crate::text::{Edit, Span};

impl Recovery<'_> {
    /// The value that begins at `at`; its first line is `value`, without a comment. Lines below that turn out to be
    /// entries of their own go into `entries`.
    pub(super) fn value(
        &mut self,
        rows: Rows<'_>,
        at: usize,
        value: &str,
        stop: &(u32, Fault),
        entries: &mut Vec<Entry>,
        key: &Node,
    ) -> Option<Node> {
        let whole = Span::new(at, at + value.len());
        let unreadable = Some(node(whole, Value::Unreadable));
        match value.as_bytes()[0] {
            b'"' | b'\'' => {
                self.quoted(rows, at, stop);
                return unreadable;
            }
            b'{' | b'[' => {
                let before = self.errors.len();
                let read = self.flow(at, rows.end);
                if self.errors.len() == before {
                    self.errors.push(words::fault(self.text, stop.0, &stop.1));
                }
                return Some(read);
            }
            b'@' | b'`' | b'%' | b'}' | b']' | b',' => {
                let shown = words::character(self.text, at);
                let text = format!(
                    "`{}` can't begin a value; put the text into quotes",
                    shown.slice(self.text)
                );
                let error = words::not_yaml(shown, text);
                self.errors
                    .push(error.repaired("put the value into quotes", false, whole, quote(value)));
                return unreadable;
            }
            b'|' | b'>' | b'&' | b'*' | b'!' => return self.unreadable(at, stop),
            _ => {}
        }
        if let Some(colon) = line::key_end(value) {
            let span = Span::new(at + colon, at + colon + 1);
            let text = "a second colon with a space on this line; put a value that holds one into quotes";
            let error = words::not_yaml(span, text);
            self.errors
                .push(error.repaired("put the value into quotes", false, whole, quote(value)));
            return unreadable;
        }
        let strayed = (1..rows.rows.len()).find(|at| {
            let content = rows.rows[*at].line.content(self.text);
            line::key_end(content).is_some()
        });
        let Some(strayed) = strayed else {
            return self.unreadable(at, stop);
        };
        let column = rows.rows[0].column;
        let own = self.attempt(rows.part(0, strayed), None);
        let below = rows.part(strayed, rows.rows.len());
        let first = below.rows[0].line;
        let mut error = words::misplaced(Span::new(first.start, first.from), first.indent, column);
        if let Some(repair) = &mut error.repair {
            // Everything below moves along.
            for row in &below.rows[1..] {
                let indent = (column + row.line.indent).saturating_sub(first.indent);
                repair.edits.push(Edit {
                    span: Span::new(row.line.start, row.line.from),
                    text: " ".repeat(indent),
                });
            }
        }
        self.errors.push(error);
        if let Value::Mapping(found) = self.block(below).value {
            entries.extend(found);
        }
        match own {
            Ok(mut read) if read.len() == 1 => read.pop().map(|entry| entry.value),
            _ => Some(node(Span::new(key.span.end as usize, at), Value::Unreadable)),
        }
    }

    /// Why a quoted value can't be read.
    fn quoted(&mut self, rows: Rows<'_>, at: usize, stop: &(u32, Fault)) {
        let text = &self.text[..rows.end];
        let mark = &text[at..=at];
        let line_end = rows.rows[0].line.to;
        let Some(end) = line::quote_end(text.as_bytes(), at) else {
            let message = format!("the quote {mark} that opens here is never closed");
            let error = words::not_yaml(Span::new(at, line_end), message);
            let behind = Span::new(line_end, line_end);
            return self
                .errors
                .push(error.repaired("close it at the end of the line", false, behind, mark));
        };
        if matches!(
            stop.1,
            Fault::UnknownQuotedScalarEscape | Fault::InvalidQuotedScalarHexEscape | Fault::InvalidUnicodeEscape
        ) && let Some(escape) = bad_escape(&text[at..end])
        {
            let from = at + escape;
            let span = Span::new(from, words::character(text, from + 1).end as usize);
            let message = format!(
                "`{}` is no escape of YAML; write the backslash twice, or use single quotes",
                span.slice(text)
            );
            let error = words::not_yaml(span, message);
            let gap = Span::new(from, from);
            return self
                .errors
                .push(error.repaired("write the backslash twice", false, gap, "\\"));
        }
        let tail = text[end..].split(['\n', '\r']).next().unwrap_or("");
        let behind = line::without_comment(tail).trim_start();
        if behind.is_empty() {
            return self.errors.push(words::fault(text, stop.0, &stop.1));
        }
        let from = end + tail.len() - tail.trim_start().len();
        let span = Span::new(from, from + behind.len());
        let advice = if mark == "'" {
            "; an apostrophe inside is written twice"
        } else {
            ""
        };
        let message = format!("`{behind}` stands behind the quote that closes the value{advice}");
        self.errors.push(words::not_yaml(span, message));
    }
}

/// The text as a double-quoted scalar.
fn quote(text: &str) -> String {
    format!("\"{}\"", text.replace('\\', "\\\\").replace('"', "\\\""))
}

/// The first backslash with something behind it that YAML 1.2 section 5.7 does not know.
fn bad_escape(text: &str) -> Option<usize> {
    let bytes = text.as_bytes();
    let mut at = 1;
    while at + 1 < bytes.len() {
        if bytes[at] == b'\\' {
            let digits = match bytes[at + 1] {
                b'x' => 2,
                b'u' => 4,
                b'U' => 8,
                known if b"0abtnvfre \"/\\N_LP\t\n\r".contains(&known) => 0,
                _ => return Some(at),
            };
            let hex = bytes.get(at + 2..at + 2 + digits)?;
            if !hex.iter().all(u8::is_ascii_hexdigit) {
                return Some(at);
            }
            at += 1;
        }
        at += 1;
    }
    None
}
