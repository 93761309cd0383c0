//! The text of an open document, changed edit by edit.

use ropey::Rope;

use crate::text::{Encoding, Position, Span};

/// A text in a rope: an edit costs the logarithm of its length, not its length. Lines end as in
/// [`LineIndex`](crate::text::LineIndex).
#[derive(Debug, Clone, Default)]
pub struct Buffer {
    rope: Rope,
}

impl Buffer {
    /// A buffer that holds a text.
    #[must_use]
    pub fn new(text: &str) -> Self {
        Self {
            rope: Rope::from_str(text),
        }
    }

    /// The whole text.
    #[must_use]
    pub fn text(&self) -> String {
        String::from(&self.rope)
    }

    /// Writes the whole text over another, whose memory serves again.
    pub fn write_to(&self, text: &mut String) {
        text.clear();
        text.reserve(self.len());
        text.extend(self.rope.chunks());
    }

    /// Its length in bytes.
    #[must_use]
    pub fn len(&self) -> usize {
        self.rope.len_bytes()
    }

    /// Whether it is empty.
    #[must_use]
    pub fn is_empty(&self) -> bool {
        self.len() == 0
    }

    /// Replaces what stands between two positions; answers the bytes that went. A position past the end of its line or
    /// of the text counts as that end, as the language server protocol has it, and an end before the start as the start.
    pub fn replace(&mut self, start: Position, end: Position, encoding: Encoding, text: &str) -> Span {
        let from = self.char_at(start, encoding);
        let to = self.char_at(end, encoding).max(from);
        let gone = Span::new(self.rope.char_to_byte(from), self.rope.char_to_byte(to));
        self.rope.remove(from..to);
        self.rope.insert(from, text);
        gone
    }

    /// The byte offset of a position.
    #[must_use]
    pub fn offset(&self, position: Position, encoding: Encoding) -> usize {
        self.rope.char_to_byte(self.char_at(position, encoding))
    }

    /// The position of a byte offset. One inside a character counts as its start, one past the end as the end.
    #[must_use]
    pub fn position(&self, offset: usize, encoding: Encoding) -> Position {
        let offset = offset.min(self.rope.len_bytes());
        let (chunk, begin, _, first) = self.rope.chunk_at_byte(offset);
        let mut local = offset - begin;
        while !chunk.is_char_boundary(local) {
            local -= 1;
        }
        let (lines, line_start) = breaks(chunk, local);
        let line = first + lines;
        let width = |text: &str| match encoding {
            Encoding::Utf8 => text.len(),
            Encoding::Utf16 => text.encode_utf16().count(),
            Encoding::Utf32 => text.chars().count(),
        };
        let column = match line_start {
            Some(start) => width(&chunk[start..local]),
            // The line began in a chunk before.
            None => {
                let start = self.rope.line_to_byte(line);
                let head = self.rope.byte_slice(start..begin);
                head.chunks().map(width).sum::<usize>() + width(&chunk[..local])
            }
        };
        let small = |number: usize| u32::try_from(number).unwrap_or(u32::MAX);
        Position {
            line: small(line),
            column: small(column),
        }
    }

    /// The index of the character at a position.
    fn char_at(&self, position: Position, encoding: Encoding) -> usize {
        let line = position.line as usize;
        if line >= self.rope.len_lines() {
            return self.rope.len_chars();
        }
        let start = self.rope.line_to_char(line);
        let mut at = start;
        let mut units = 0;
        for character in self.rope.line(line).chars() {
            units += match encoding {
                Encoding::Utf8 => character.len_utf8(),
                Encoding::Utf16 => character.len_utf16(),
                Encoding::Utf32 => 1,
            };
            if matches!(character, '\n' | '\r') || units > position.column as usize {
                break;
            }
            at += 1;
        }
        at
    }
}

/// How many lines end before an offset of a chunk, and where the last of them ends. A CR LF ends where its LF does; chunks
/// never part one.
fn breaks(chunk: &str, to: usize) -> (usize, Option<usize>) {
    let bytes = chunk.as_bytes();
    let ends = |at: &usize| bytes[*at] == b'\n' || bytes.get(at + 1) != Some(&b'\n');
    let mut lines = 0;
    let mut last = None;
    for at in memchr::memchr2_iter(b'\n', b'\r', &bytes[..to]).filter(ends) {
        lines += 1;
        last = Some(at + 1);
    }
    (lines, last)
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::text::LineIndex;
    use proptest::prelude::*;

    const ENCODINGS: [Encoding; 3] = [Encoding::Utf8, Encoding::Utf16, Encoding::Utf32];

    fn text() -> impl Strategy<Value = String> {
        "[ab\n\ré😀\u{2028}\u{85}\u{b}]{0,24}"
    }

    /// The positions of all characters and the offset of each, counted the plain way.
    fn model(text: &str, encoding: Encoding) -> Vec<(Position, usize)> {
        let mut position = Position::default();
        let mut found = Vec::new();
        let mut before = ' ';
        for (at, character) in text.char_indices() {
            if before == '\n' || before == '\r' && character != '\n' {
                position = Position {
                    line: position.line + 1,
                    column: 0,
                };
            }
            found.push((position, at));
            position.column += match encoding {
                Encoding::Utf8 => u32::try_from(character.len_utf8()).unwrap(),
                Encoding::Utf16 => u32::try_from(character.len_utf16()).unwrap(),
                Encoding::Utf32 => 1,
            };
            before = character;
        }
        found
    }

    proptest! {
        #[test]
        fn positions_are_those_of_the_plain_count(text in text(), kind in 0..3_usize) {
            let encoding = ENCODINGS[kind];
            let (index, buffer) = (LineIndex::new(&text), Buffer::new(&text));
            for (position, at) in model(&text, encoding) {
                let offset = u32::try_from(at).unwrap();
                prop_assert_eq!(index.position(&text, offset, encoding), position);
                prop_assert_eq!(buffer.position(at, encoding), position);
                // The LF of a CR LF has no position of its own: a line ends before its break.
                if !text[..at].ends_with('\r') || !text[at..].starts_with('\n') {
                    prop_assert_eq!(index.offset(&text, position, encoding), offset);
                    prop_assert_eq!(buffer.offset(position, encoding), at);
                }
            }
        }

        #[test]
        fn edits_are_those_of_the_plain_text(
            text in text(),
            edits in proptest::collection::vec((0..6_u32, 0..8_u32, 0..6_u32, 0..8_u32, text(), 0..3_usize), 0..5),
        ) {
            let mut plain = text.clone();
            let mut buffer = Buffer::new(&text);
            for (line, column, end_line, end_column, put, kind) in edits {
                let (start, end) = (Position { line, column }, Position { line: end_line, column: end_column });
                let index = LineIndex::new(&plain);
                let from = index.offset(&plain, start, ENCODINGS[kind]) as usize;
                let to = (index.offset(&plain, end, ENCODINGS[kind]) as usize).max(from);
                let gone = buffer.replace(start, end, ENCODINGS[kind], &put);
                prop_assert_eq!(gone, Span::new(from, to));
                plain.replace_range(from..to, &put);
                prop_assert_eq!(&buffer.text(), &plain);
            }
        }
    }
}
