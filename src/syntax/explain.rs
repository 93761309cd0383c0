//! What is wrong with a text that is no YAML, at the very characters and in plain words.

use granit_parser::{ErrorKind as Cause, ScanError};

use super::{ErrorKind, MAX_DEPTH, Repair, SyntaxError};
use crate::text::Span;

/// Explains a parser's error. The cause is looked for on the line of the error and the one before, since a parser
/// notices many slips only on the next line.
#[must_use]
pub fn explain(text: &str, error: &ScanError) -> SyntaxError {
    let at = error.marker().byte_offset().unwrap_or(text.len()).min(text.len());
    let at = (0..=at).rev().find(|at| text.is_char_boundary(*at)).unwrap_or(0);
    if matches!(error.kind(), Cause::RecursionLimitExceeded) {
        let message = format!("nesting deeper than {MAX_DEPTH} levels is not read");
        return SyntaxError {
            span: one_char(text, at),
            kind: ErrorKind::Limit,
            message,
            repair: None,
        };
    }
    find_slip(text, at).unwrap_or_else(|| {
        let message = match error.kind() {
            Cause::UnexpectedCharacter { character: found } => {
                format!("`{found}` can't begin a value; put the text into quotes")
            }
            Cause::UnclosedFlowCollection { open: opening } => format!("this `{opening}` is never closed"),
            Cause::MismatchedFlowCollectionEnd { .. } | Cause::MisplacedFlowCollectionEnd => {
                "this bracket closes nothing that is open".to_owned()
            }
            _ => "the text breaks off being YAML here".to_owned(),
        };
        not_yaml(one_char(text, at), message, None)
    })
}

fn not_yaml(span: Span, message: String, repair: Option<Repair>) -> SyntaxError {
    SyntaxError {
        span,
        kind: ErrorKind::NotYaml,
        message,
        repair,
    }
}

fn one_char(text: &str, at: usize) -> Span {
    let len = text
        .get(at..)
        .and_then(|rest| rest.chars().next())
        .map_or(0, char::len_utf8);
    if len > 0 {
        return Span::new(at, at + len);
    }
    // At the end of the text there is no character to show: the last one that is there.
    let trimmed = text.trim_end();
    let last = trimmed.chars().next_back().map_or(0, char::len_utf8);
    Span::new(trimmed.len() - last, trimmed.len())
}

/// A line of the text.
#[derive(Clone, Copy)]
struct Line<'a> {
    start: usize,
    text: &'a str,
}

impl<'a> Line<'a> {
    fn at(text: &'a str, offset: usize) -> Self {
        let start = text[..offset].rfind('\n').map_or(0, |at| at + 1);
        let end = text[offset..].find('\n').map_or(text.len(), |at| offset + at);
        Line {
            start,
            text: text[start..end].trim_end_matches('\r'),
        }
    }

    fn after(self, text: &'a str) -> Option<Self> {
        let next = self.start + text.get(self.start..)?.find('\n')? + 1;
        (next < text.len()).then(|| Self::at(text, next))
    }

    fn before(self, text: &'a str) -> Option<Self> {
        let mut line = self;
        while line.start > 0 {
            line = Self::at(text, line.start - 1);
            let content = line.text.trim_start();
            if !content.is_empty() && !content.starts_with('#') {
                return Some(line);
            }
        }
        None
    }

    fn span(self, from: usize, to: usize) -> Span {
        Span::new(self.start + from, self.start + to)
    }
}

fn find_slip(text: &str, at: usize) -> Option<SyntaxError> {
    let line = Line::at(text, at);
    let before = line.before(text);
    let after = line.after(text);
    tab(line)
        .or_else(|| before.and_then(tab))
        .or_else(|| after.and_then(tab))
        .or_else(|| open_quote(text))
        .or_else(|| open_bracket(text))
        .or_else(|| stray_bracket(line))
        .or_else(|| second_colon(line, at))
        .or_else(|| colon_without_space(line))
        .or_else(|| before.and_then(colon_without_space))
        .or_else(|| missing_colon(line))
        .or_else(|| before.and_then(missing_colon))
        .or_else(|| reserved(line))
        .or_else(|| missing_comma(line, at))
        .or_else(|| indentation(text, line))
}

fn tab(line: Line<'_>) -> Option<SyntaxError> {
    let indent = line.text.len() - line.text.trim_start_matches([' ', '\t', '-']).len();
    let from = line.text[..indent].find('\t')?;
    let to = from + line.text[from..indent].len();
    let span = line.span(from, to);
    let repair = Repair {
        title: "indent with spaces".to_owned(),
        span,
        text: "  ".repeat(to - from),
    };
    Some(not_yaml(
        span,
        "a tab indents this line; YAML indents with spaces".to_owned(),
        Some(repair),
    ))
}

/// Where a quote opens a value that nothing closes.
fn open_quote(text: &str) -> Option<SyntaxError> {
    let scan = Scan::of(text);
    let (at, quote) = scan.open_quote?;
    let line = Line::at(text, at);
    let span = Span::new(at, line.start + line.text.len());
    Some(not_yaml(
        span,
        format!("the quote {quote} that opens here is never closed"),
        None,
    ))
}

fn open_bracket(text: &str) -> Option<SyntaxError> {
    let scan = Scan::of(text);
    let (at, bracket) = *scan.brackets.last()?;
    let closing = if bracket == '{' { '}' } else { ']' };
    let line = Line::at(text, at);
    let content = strip_comment(line.text);
    let repair = (scan.brackets.len() == 1 && content.ends_with(|c| c != bracket)).then(|| {
        let end = line.start + content.trim_end().len();
        Repair {
            title: format!("close it with `{closing}`"),
            span: Span::new(end, end),
            text: format!(" {closing}"),
        }
    });
    let message = format!("this `{bracket}` is never closed; a `{closing}` is missing");
    Some(not_yaml(Span::new(at, at + 1), message, repair))
}

fn stray_bracket(line: Line<'_>) -> Option<SyntaxError> {
    let scan = Scan::of(line.text);
    let (at, bracket) = scan.stray?;
    let span = line.span(at, at + 1);
    Some(not_yaml(
        span,
        format!("this `{bracket}` closes nothing that is open"),
        None,
    ))
}

fn second_colon(line: Line<'_>, at: usize) -> Option<SyntaxError> {
    let scan = Scan::of(line.text);
    let inside_flow = scan.has_flow;
    let colons: Vec<usize> = scan.colons;
    let second = *colons.get(1)?;
    if inside_flow || line.start + second < at.saturating_sub(1) {
        return None;
    }
    let value_from = colons[0] + 1;
    let content = strip_comment(line.text).trim_end();
    let value = content.get(value_from..)?.trim_start();
    let from = content.len() - value.len();
    let span = line.span(from, content.len());
    let quoted = format!("\"{}\"", value.replace('\\', "\\\\").replace('"', "\\\""));
    let repair = Repair {
        title: "put the value into quotes".to_owned(),
        span,
        text: quoted,
    };
    let message = "a second `: ` on this line; put a value that holds one into quotes".to_owned();
    Some(not_yaml(line.span(second, second + 1), message, Some(repair)))
}

fn colon_without_space(line: Line<'_>) -> Option<SyntaxError> {
    let content = strip_comment(line.text);
    if Scan::of(content).has_flow || !Scan::of(content).colons.is_empty() {
        return None;
    }
    let at = content.find(':')?;
    let key = content[..at].trim_start_matches([' ', '-']);
    let wordlike = !key.is_empty() && key.chars().all(|c| c.is_alphanumeric() || c == ' ' || c == '_');
    if !wordlike || content[at + 1..].trim().is_empty() {
        return None;
    }
    let span = line.span(at, at + 1);
    let repair = Repair {
        title: "write a space behind the colon".to_owned(),
        span,
        text: ": ".to_owned(),
    };
    let message = format!("a space is missing behind the colon of `{key}`");
    Some(not_yaml(span, message, Some(repair)))
}

fn missing_colon(line: Line<'_>) -> Option<SyntaxError> {
    let content = strip_comment(line.text).trim_end();
    let scan = Scan::of(content);
    let words = content.trim_start_matches([' ', '-']);
    if !scan.colons.is_empty() || scan.has_flow || words.is_empty() || words.contains(':') {
        return None;
    }
    let from = content.len() - words.len();
    let message = format!("`{words}` has no colon; a line here is `key: value`");
    Some(not_yaml(line.span(from, content.len()), message, None))
}

fn reserved(line: Line<'_>) -> Option<SyntaxError> {
    let scan = Scan::of(line.text);
    let from = scan.colons.first().map_or(0, |at| at + 1);
    let rest = &line.text[from..];
    let value = rest.trim_start_matches([' ', '-', '{', '[']);
    let found = value.chars().next().filter(|c| matches!(c, '@' | '`' | '%'))?;
    let at = line.text.len() - value.len();
    let message = format!("`{found}` can't begin a value; put the text into quotes");
    Some(not_yaml(line.span(at, at + 1), message, None))
}

/// `{ mark: B1 role: beam }` and `{ mark: B1, length 7.5 }`: two entries of a flow mapping run together.
fn missing_comma(line: Line<'_>, at: usize) -> Option<SyntaxError> {
    if !Scan::of(line.text).has_flow {
        return None;
    }
    let offset = at.checked_sub(line.start)?;
    let before = line.text.get(..offset)?;
    let from = before.rfind([',', '{', '[']).map_or(0, |at| at + 1);
    let rest = line.text.get(from..)?;
    let to = rest.find([',', '}', ']']).map_or(line.text.len(), |at| from + at);
    let piece = &line.text[from..to];
    let trimmed = piece.trim();
    if trimmed.is_empty() {
        return None;
    }
    let start = from + (piece.len() - piece.trim_start().len());
    let message = format!("`{trimmed}` is not one `key: value`; a comma or a colon is missing");
    Some(not_yaml(line.span(start, start + trimmed.len()), message, None))
}

fn indentation(text: &str, line: Line<'_>) -> Option<SyntaxError> {
    let indent = line.text.len() - line.text.trim_start_matches(' ').len();
    let before = line.before(text)?;
    let above = before.text.len() - before.text.trim_start_matches([' ', '-']).len();
    if line.text.trim().is_empty() || indent == above {
        return None;
    }
    let span = if indent > 0 {
        line.span(0, indent)
    } else {
        line.span(0, line.text.len().min(1))
    };
    let message =
        format!("this line is indented by {indent}; the one above by {above}. Keys of one mapping stand in one column");
    let repair = Repair {
        title: format!("indent by {above}"),
        span: line.span(0, indent),
        text: " ".repeat(above),
    };
    Some(not_yaml(span, message, Some(repair)))
}

/// The line without its comment.
fn strip_comment(line: &str) -> &str {
    let scan = Scan::of(line);
    scan.comment.map_or(line, |at| &line[..at])
}

/// A rough scan of quotes, brackets, colons and comments.
#[derive(Default)]
struct Scan {
    open_quote: Option<(usize, char)>,
    brackets: Vec<(usize, char)>,
    stray: Option<(usize, char)>,
    /// Offsets of `: ` outside quotes and brackets.
    colons: Vec<usize>,
    has_flow: bool,
    /// Where the first comment begins, for a single line.
    comment: Option<usize>,
}

impl Scan {
    fn of(text: &str) -> Self {
        let mut scan = Self::default();
        let bytes = text.as_bytes();
        let mut at = 0;
        // A quote or bracket opens something only where a value may begin.
        let mut fresh = true;
        while at < bytes.len() {
            let byte = bytes[at];
            match byte {
                b'"' | b'\'' if fresh => match close_quote(bytes, at) {
                    Some(end) => {
                        at = end;
                        fresh = false;
                    }
                    None => {
                        scan.open_quote = Some((at, char::from(byte)));
                        return scan;
                    }
                },
                b'{' | b'[' if fresh || !scan.brackets.is_empty() => {
                    scan.has_flow = true;
                    scan.brackets.push((at, char::from(byte)));
                    fresh = true;
                }
                b'}' | b']' if scan.has_flow || fresh => {
                    let opening = if byte == b'}' { '{' } else { '[' };
                    match scan.brackets.last() {
                        Some((_, open)) if *open == opening => {
                            scan.brackets.pop();
                        }
                        _ => {
                            scan.stray.get_or_insert((at, char::from(byte)));
                        }
                    }
                    fresh = false;
                }
                b'#' if at == 0 || bytes[at - 1].is_ascii_whitespace() => {
                    scan.comment.get_or_insert(at);
                    at = bytes[at..]
                        .iter()
                        .position(|b| *b == b'\n')
                        .map_or(bytes.len(), |end| at + end);
                    fresh = true;
                    continue;
                }
                b':' if bytes.get(at + 1).is_none_or(u8::is_ascii_whitespace) => {
                    if scan.brackets.is_empty() {
                        scan.colons.push(at);
                    }
                    fresh = true;
                }
                b',' if !scan.brackets.is_empty() => fresh = true,
                b'\n' => fresh = true,
                b'-' if fresh && bytes.get(at + 1).is_none_or(u8::is_ascii_whitespace) => {}
                b' ' | b'\t' | b'\r' => {}
                _ => fresh = false,
            }
            at += 1;
        }
        scan
    }
}

/// The offset of the quote that closes the one at `at`.
fn close_quote(bytes: &[u8], at: usize) -> Option<usize> {
    let quote = bytes[at];
    let mut here = at + 1;
    while here < bytes.len() {
        match bytes[here] {
            b'\\' if quote == b'"' => here += 1,
            b'\'' if quote == b'\'' && bytes.get(here + 1) == Some(&b'\'') => here += 1,
            byte if byte == quote => return Some(here),
            _ => {}
        }
        here += 1;
    }
    None
}
