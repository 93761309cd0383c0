//! Lines and columns in the units that editors and reports count in.

/// How columns are counted.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Encoding {
    /// Bytes of UTF-8.
    Utf8,
    /// Units of UTF-16.
    Utf16,
    /// Unicode scalar values.
    Utf32,
}

/// A zero-based line and column.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, PartialOrd, Ord, Default)]
pub struct Position {
    /// The line.
    pub line: u32,
    /// The column, in the units of an [`Encoding`].
    pub column: u32,
}

/// The starts of a text's lines. Lines end with LF, CR LF or a lone CR, as the language server protocol has them.
#[derive(Debug, Clone)]
pub struct LineIndex {
    starts: Vec<u32>,
    marks: Vec<Mark>,
}

/// A place inside a long line, with what stands before it in the line. Without these, thousands of places in one line
/// of megabytes would each be counted from its start.
#[derive(Debug, Clone, Copy)]
struct Mark {
    offset: u32,
    utf16: u32,
    utf32: u32,
}

/// Bytes between two marks of a long line; shorter lines have none.
const STRIDE: usize = 2048;

impl LineIndex {
    /// Finds the lines of a text.
    #[must_use]
    pub fn new(text: &str) -> Self {
        let bytes = text.as_bytes();
        let mut starts = vec![0];
        for (at, byte) in bytes.iter().enumerate() {
            let ends = *byte == b'\n' || (*byte == b'\r' && bytes.get(at + 1) != Some(&b'\n'));
            if ends {
                starts.push(u32::try_from(at + 1).unwrap_or(u32::MAX));
            }
        }
        let mut marks = Vec::new();
        for (n, start) in starts.iter().enumerate() {
            let end = starts.get(n + 1).map_or(text.len(), |next| *next as usize);
            mark(text, *start as usize, end, &mut marks);
        }
        Self { starts, marks }
    }

    /// The last mark of the line that begins at `start` before or at an offset, or the start itself.
    fn mark(&self, start: u32, offset: usize) -> Mark {
        let before = self.marks.partition_point(|mark| mark.offset as usize <= offset);
        let last = before.checked_sub(1).map(|at| self.marks[at]);
        last.filter(|mark| mark.offset > start).unwrap_or(Mark {
            offset: start,
            utf16: 0,
            utf32: 0,
        })
    }

    /// The line of an offset, zero-based.
    #[must_use]
    pub fn line(&self, offset: u32) -> u32 {
        let after = self.starts.partition_point(|start| *start <= offset);
        u32::try_from(after.saturating_sub(1)).unwrap_or(u32::MAX)
    }

    /// The offset at which a line begins; the end of the text for lines past the last.
    #[must_use]
    pub fn start(&self, line: u32, text: &str) -> u32 {
        self.starts
            .get(line as usize)
            .copied()
            .unwrap_or_else(|| u32::try_from(text.len()).unwrap_or(u32::MAX))
    }

    /// The position of an offset. An offset inside a character counts as its start.
    #[must_use]
    pub fn position(&self, text: &str, offset: u32, encoding: Encoding) -> Position {
        let mut end = (offset as usize).min(text.len());
        while !text.is_char_boundary(end) {
            end -= 1;
        }
        let line = self.line(u32::try_from(end).unwrap_or(u32::MAX));
        let start = self.start(line, text);
        let mark = self.mark(start, end);
        let after = text.get(mark.offset as usize..end).unwrap_or("");
        let column = match encoding {
            Encoding::Utf8 => end.saturating_sub(start as usize),
            Encoding::Utf16 => mark.utf16 as usize + after.encode_utf16().count(),
            Encoding::Utf32 => mark.utf32 as usize + after.chars().count(),
        };
        Position {
            line,
            column: u32::try_from(column).unwrap_or(u32::MAX),
        }
    }

    /// Line and column as reports count them: from one, in Unicode scalar values.
    #[must_use]
    pub fn report(&self, text: &str, offset: u32) -> (u32, u32) {
        let at = self.position(text, offset, Encoding::Utf32);
        (at.line + 1, at.column + 1)
    }

    /// The offset of a position. A column past the end of its line means the end of the line, before its break.
    #[must_use]
    pub fn offset(&self, text: &str, position: Position, encoding: Encoding) -> u32 {
        let start = self.start(position.line, text);
        let end = self.start(position.line.saturating_add(1), text);
        let line = without_break(text.get(start as usize..end as usize).unwrap_or(""));
        let mut units = 0;
        for (at, c) in line.char_indices() {
            let size = match encoding {
                Encoding::Utf8 => c.len_utf8(),
                Encoding::Utf16 => c.len_utf16(),
                Encoding::Utf32 => 1,
            };
            if units + size > position.column as usize {
                // A column inside a character counts as its start.
                return start + u32::try_from(at).unwrap_or(0);
            }
            units += size;
        }
        start + u32::try_from(line.len()).unwrap_or(0)
    }
}

/// Marks a line, where it is long.
fn mark(text: &str, start: usize, end: usize, marks: &mut Vec<Mark>) {
    let (mut offset, mut utf16, mut utf32) = (start, 0_usize, 0_usize);
    while end - offset > STRIDE {
        let mut next = offset + STRIDE;
        while !text.is_char_boundary(next) {
            next -= 1;
        }
        let piece = text.get(offset..next).unwrap_or("");
        utf16 += piece.encode_utf16().count();
        utf32 += piece.chars().count();
        offset = next;
        let small = |n: usize| u32::try_from(n).unwrap_or(u32::MAX);
        marks.push(Mark {
            offset: small(offset),
            utf16: small(utf16),
            utf32: small(utf32),
        });
    }
}

/// A line without the break that ends it.
fn without_break(line: &str) -> &str {
    let line = line.strip_suffix('\n').unwrap_or(line);
    line.strip_suffix('\r').unwrap_or(line)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn columns_of_long_lines_are_counted_from_their_start() {
        let text = format!("short\n{}\n{}\nend", "a梁😀".repeat(3000), "b".repeat(9000));
        let index = LineIndex::new(&text);
        for (at, _) in text.char_indices().step_by(37) {
            let start = text[..at].rfind('\n').map_or(0, |line| line + 1);
            let before = &text[start..at];
            for (encoding, wanted) in [
                (Encoding::Utf8, before.len()),
                (Encoding::Utf16, before.encode_utf16().count()),
                (Encoding::Utf32, before.chars().count()),
            ] {
                let position = index.position(&text, u32::try_from(at).unwrap(), encoding);
                assert_eq!(position.column as usize, wanted);
                assert_eq!(position.line as usize, text[..at].matches('\n').count());
            }
        }
    }

    #[test]
    fn counts_columns_in_each_encoding() {
        let text = "a\r\n梁😀x\rend";
        let index = LineIndex::new(text);
        let x = u32::try_from(text.find('x').unwrap()).unwrap();
        for (encoding, column) in [(Encoding::Utf8, 7), (Encoding::Utf16, 3), (Encoding::Utf32, 2)] {
            let position = index.position(text, x, encoding);
            assert_eq!(position, Position { line: 1, column });
            assert_eq!(index.offset(text, position, encoding), x);
        }
        assert_eq!(index.line(u32::try_from(text.find("end").unwrap()).unwrap()), 2);
        assert_eq!(index.offset(text, Position { line: 0, column: 99 }, Encoding::Utf16), 1);
        assert_eq!(
            index.offset(text, Position { line: 9, column: 0 }, Encoding::Utf16) as usize,
            text.len()
        );
    }
}
