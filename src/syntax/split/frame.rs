//! Where the first document of a text begins and ends.

use crate::syntax::line::{Line, Lines};
use crate::syntax::parse::parse;
use crate::syntax::{ErrorKind, SyntaxError, words};
use crate::text::Span;

/// The first document.
#[derive(Debug, Default)]
pub(super) struct Frame {
    /// Where its text begins, behind directives and `---`.
    pub(super) from: usize,
    /// Where it ends.
    pub(super) to: usize,
    /// Directives with their `---` that its pieces need: those with a `%TAG`.
    pub(super) directives: String,
    /// Whether it can only be read together with what stands before it.
    pub(super) odd: bool,
}

/// Finds the first document, and reports a second one. `---` and `...` at the start of a line end a document whatever
/// stands around them (YAML 1.2 section 9.1.2).
pub(super) fn frame(text: &str, errors: &mut Vec<SyntaxError>) -> Frame {
    let mut frame = Frame {
        to: text.len(),
        from: if text.starts_with('\u{FEFF}') { 3 } else { 0 },
        ..Frame::default()
    };
    let mut directives = false;
    let mut begun = false;
    let marker = |line: Line| line.indent == 0 && !line.tabbed() && is_marker(line.content(text));
    let mut lines = Markers { text, at: frame.from };
    // Directives and comments stand before the first marker or content.
    for line in Lines::new(text, frame.from, text.len()) {
        let content = line.content(text);
        if line.start == line.from && content.starts_with('%') {
            directives = true;
        } else if marker(line) && content.starts_with("---") {
            let behind = content[3..].trim_start();
            begun = behind.is_empty() || behind.starts_with('#');
            frame.odd = !begun;
            frame.from = if begun { line_end(text, line.to) } else { frame.from };
            lines.at = line_end(text, line.to);
            break;
        } else {
            break;
        }
    }
    frame.odd |= directives && !begun;
    if directives && begun {
        let head = &text[..frame.from];
        if let Some((at, fault)) = &parse(head, 0, true, None).stop {
            errors.push(words::fault(head, *at, fault));
        } else if head.contains("%TAG") {
            frame.directives = head.trim_start_matches('\u{FEFF}').to_owned();
            if !frame.directives.ends_with('\n') {
                frame.directives.push('\n');
            }
        }
    }
    if let Some(at) = lines.next() {
        frame.to = at;
        second(text, at, errors);
    }
    frame
}

/// Reports what stands behind the end of the first document.
fn second(text: &str, end: usize, errors: &mut Vec<SyntaxError>) {
    let found = if text[end..].starts_with("---") {
        Some(Span::new(end, end + 3))
    } else {
        let behind = text[end + 3..].split(['\n', '\r']).next().unwrap_or("").trim();
        if !behind.is_empty() && !behind.starts_with('#') {
            let at = end + 3 + text[end + 3..].len() - text[end + 3..].trim_start().len();
            errors.push(words::not_yaml(
                Span::new(at, at + behind.len()),
                "nothing but a comment may stand behind `...`",
            ));
            return;
        }
        Lines::new(text, line_end(text, end), text.len())
            .find(|line| !line.content(text).starts_with("..."))
            .map(|line| {
                let content = line.content(text);
                let marker = content.starts_with("---") && is_marker(content);
                Span::new(line.from, if marker { line.from + 3 } else { line.to })
            })
    };
    if let Some(span) = found {
        errors.push(SyntaxError {
            span,
            kind: ErrorKind::SeveralDocuments,
            message: "a second document begins here; a design file is one document, and what follows is not read"
                .to_owned(),
            repair: None,
        });
    }
}

fn is_marker(content: &str) -> bool {
    (content.starts_with("---") || content.starts_with("..."))
        && content.as_bytes().get(3).is_none_or(|b| b.is_ascii_whitespace())
}

/// The offset behind the line break that ends the line of `at`.
pub(super) fn line_end(text: &str, at: usize) -> usize {
    let bytes = text.as_bytes();
    match memchr::memchr2(b'\n', b'\r', &bytes[at..]).map(|found| at + found) {
        Some(end) if bytes[end] == b'\r' && bytes.get(end + 1) == Some(&b'\n') => end + 2,
        Some(end) => end + 1,
        None => text.len(),
    }
}

/// The offsets of document markers.
struct Markers<'a> {
    text: &'a str,
    at: usize,
}

impl Iterator for Markers<'_> {
    type Item = usize;

    fn next(&mut self) -> Option<usize> {
        while self.at < self.text.len() {
            let start = self.at;
            let rest = &self.text.as_bytes()[start..];
            self.at = line_end(self.text, start);
            if (rest.starts_with(b"---") || rest.starts_with(b"..."))
                && rest.get(3).is_none_or(|b| b.is_ascii_whitespace())
            {
                return Some(start);
            }
        }
        None
    }
}
