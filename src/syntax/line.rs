//! The lines of a text, and where on a line a key ends.

use memchr::memchr2;

/// A line with something on it that is neither blank nor a comment.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) struct Line {
    /// Where the line begins.
    pub(super) start: usize,
    /// Where its first character that is no space or tab stands.
    pub(super) from: usize,
    /// Where its last character ends, trailing spaces left out.
    pub(super) to: usize,
    /// How many spaces lead it.
    pub(super) indent: usize,
}

impl Line {
    /// Its characters.
    pub(super) fn content(self, text: &str) -> &str {
        text.get(self.from..self.to).unwrap_or("")
    }

    /// Whether a tab stands in its indentation.
    pub(super) fn tabbed(self) -> bool {
        self.from > self.start + self.indent
    }
}

/// The lines of `text[from..to]` that hold something. Lines end with LF, CR LF or a lone CR (YAML 1.2 section 5.4).
pub(super) struct Lines<'a> {
    text: &'a str,
    at: usize,
    to: usize,
}

impl<'a> Lines<'a> {
    pub(super) fn new(text: &'a str, from: usize, to: usize) -> Self {
        Self { text, at: from, to }
    }
}

impl Iterator for Lines<'_> {
    type Item = Line;

    fn next(&mut self) -> Option<Line> {
        let bytes = &self.text.as_bytes()[..self.to];
        while self.at < self.to {
            let start = self.at;
            let mut from = start;
            while bytes.get(from) == Some(&b' ') {
                from += 1;
            }
            let indent = from - start;
            while matches!(bytes.get(from), Some(b' ' | b'\t')) {
                from += 1;
            }
            let mut to = memchr2(b'\n', b'\r', &bytes[from..]).map_or(self.to, |at| from + at);
            self.at = match (bytes.get(to), bytes.get(to + 1)) {
                (Some(b'\r'), Some(b'\n')) => to + 2,
                (Some(_), _) => to + 1,
                (None, _) => to,
            };
            while to > from && matches!(bytes[to - 1], b' ' | b'\t') {
                to -= 1;
            }
            if to > from && bytes[from] != b'#' {
                return Some(Line {
                    start,
                    from,
                    to,
                    indent,
                });
            }
        }
        None
    }
}

/// Whether a list entry begins here: a dash with a space, a tab or nothing behind it.
pub(super) fn is_entry(content: &str) -> bool {
    is_indicator(content, b'-')
}

/// Whether the content begins with this indicator by itself.
pub(super) fn is_indicator(content: &str, indicator: u8) -> bool {
    let bytes = content.as_bytes();
    bytes.first() == Some(&indicator) && bytes.get(1).is_none_or(|b| b.is_ascii_whitespace())
}

/// The colon that ends the key a line begins with, as an offset into its content.
pub(super) fn key_end(content: &str) -> Option<usize> {
    let bytes = content.as_bytes();
    let mut at = match bytes.first()? {
        b'"' | b'\'' => {
            let end = quote_end(bytes, 0)?;
            let gap = bytes[end..].iter().take_while(|b| matches!(b, b' ' | b'\t')).count();
            return ends_key(bytes, end + gap).then_some(end + gap);
        }
        b'[' | b'{' | b'#' | b'|' | b'>' | b'%' | b'@' | b'`' | b',' | b']' | b'}' => return None,
        _ => 0,
    };
    while at < bytes.len() {
        match bytes[at] {
            b':' if ends_key(bytes, at) => return (at > 0).then_some(at),
            b'#' if at > 0 && matches!(bytes[at - 1], b' ' | b'\t') => return None,
            _ => at += 1,
        }
    }
    None
}

fn ends_key(bytes: &[u8], at: usize) -> bool {
    bytes.get(at) == Some(&b':') && bytes.get(at + 1).is_none_or(|b| b.is_ascii_whitespace())
}

/// The offset behind the quote that closes the one at `at`.
pub(super) fn quote_end(bytes: &[u8], at: usize) -> Option<usize> {
    let quote = *bytes.get(at)?;
    let mut here = at + 1;
    while here < bytes.len() {
        match bytes[here] {
            b'\\' if quote == b'"' => here += 1,
            b'\'' if quote == b'\'' && bytes.get(here + 1) == Some(&b'\'') => here += 1,
            byte if byte == quote => return Some(here + 1),
            _ => {}
        }
        here += 1;
    }
    None
}

/// The content without a comment behind it and without the spaces before that.
pub(super) fn without_comment(content: &str) -> &str {
    let bytes = content.as_bytes();
    let mut at = 0;
    // A quote opens only where a value may begin.
    let mut fresh = true;
    while at < bytes.len() {
        match bytes[at] {
            b'"' | b'\'' if fresh => match quote_end(bytes, at) {
                Some(end) => {
                    at = end;
                    fresh = false;
                    continue;
                }
                None => return content,
            },
            b'#' if at == 0 || matches!(bytes[at - 1], b' ' | b'\t') => return content[..at].trim_end(),
            b' ' | b'\t' => {}
            byte => fresh = matches!(byte, b':' | b',' | b'[' | b'{' | b'-'),
        }
        at += 1;
    }
    content.trim_end()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn lines_end_as_yaml_has_it() {
        let text = "a: 1\r\n\r  # note\n\t\n \tb\rc  \n";
        let lines: Vec<(&str, usize, bool)> = Lines::new(text, 0, text.len())
            .map(|line| (line.content(text), line.indent, line.tabbed()))
            .collect();
        assert_eq!(lines, [("a: 1", 0, false), ("b", 1, true), ("c", 0, false)]);
    }

    #[test]
    fn a_key_ends_at_its_colon() {
        assert_eq!(key_end("supported by: [C3]"), Some(12));
        assert_eq!(key_end("mark:"), Some(4));
        assert_eq!(key_end("\"a: b\" : 2"), Some(7));
        assert_eq!(key_end("a:b: c"), Some(3));
        for none in ["section:IPE", "a # b: c", "{ a: b }", ": a", "\"a: b"] {
            assert_eq!(key_end(none), None, "{none}");
        }
    }

    #[test]
    fn comments_are_told_from_values() {
        assert_eq!(without_comment("a: \"b # c\" # d"), "a: \"b # c\"");
        assert_eq!(without_comment("a: b#c"), "a: b#c");
        assert_eq!(without_comment("a: don't # it's"), "a: don't");
    }
}
