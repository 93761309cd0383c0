//! Splitting a file into items by indentation, so that one changed member is one item to read again.
//!
//! Only plain block style is split; whatever else the text holds at its top level is left whole, for the parser to read
//! at once. The split never decides whether a text is YAML.

use crate::text::Span;

/// A file's top level.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Outline {
    /// Top-level entries in order.
    pub chunks: Vec<Chunk>,
    /// Whether something at the top level is beyond the split: the file is to be read whole first, and the chunks
    /// serve only where that fails.
    pub doubtful: bool,
}

/// A top-level entry.
#[derive(Debug, Clone, PartialEq)]
pub struct Chunk {
    /// Its key; empty for a line that has none.
    pub key: String,
    /// The key's characters.
    pub key_span: Span,
    /// All its lines.
    pub span: Span,
    /// Its items, where the value is a block list or block mapping; each from the start of its first line to the start
    /// of the next item's.
    pub items: Vec<Span>,
    /// Whether the items are those of a list; of a mapping otherwise.
    pub list: bool,
}

/// Keys whose values are split into items.
const LISTS: [&str; 1] = ["members"];
const MAPPINGS: [&str; 2] = ["groups", "products"];

/// One line: where it starts, how far it is indented, and its text without the break.
struct Line<'a> {
    start: usize,
    indent: usize,
    content: &'a [u8],
    tab: bool,
}

/// Splits a text.
#[must_use]
pub fn outline(text: &str) -> Outline {
    let mut splitter = Splitter {
        outline: Outline::default(),
        column: 0,
        content_column: 0,
    };
    let bytes = text.as_bytes();
    let mut start = 0;
    while start < bytes.len() {
        let rest = &bytes[start..];
        let length = rest.iter().position(|b| *b == b'\n').map_or(rest.len(), |at| at + 1);
        splitter.line(text, start, &rest[..length]);
        start += length;
    }
    let mut outline = splitter.outline;
    if let Some(chunk) = outline.chunks.last_mut() {
        end_chunk(chunk, text.len());
    }
    // Anchors and aliases may reach from item to item. A rough look is enough: at worst the file is read whole.
    outline.doubtful |= has_reference(bytes);
    outline
}

struct Splitter {
    outline: Outline,
    /// Column of the items of the present chunk.
    column: usize,
    /// Column of the present item's first key.
    content_column: usize,
}

impl Splitter {
    fn line(&mut self, text: &str, start: usize, raw: &[u8]) {
        let indent = raw.iter().take_while(|b| **b == b' ').count();
        let content = trim_break(&raw[indent..]);
        let line = Line {
            start,
            indent,
            content,
            tab: content.first() == Some(&b'\t'),
        };
        // A lone CR is a line break too, which this splitter does not follow.
        self.outline.doubtful |= content.contains(&b'\r');
        if content.is_empty() || content[0] == b'#' {
            return;
        }
        if line.tab {
            self.outline.doubtful = true;
            return;
        }
        let dash = is_dash(content);
        if indent == 0 && !(dash && self.in_list()) {
            self.top(text, &line);
        } else {
            self.inner(&line, dash);
        }
    }

    fn in_list(&self) -> bool {
        self.outline.chunks.last().is_some_and(|chunk| chunk.list)
    }

    fn top(&mut self, text: &str, line: &Line<'_>) {
        if let Some(chunk) = self.outline.chunks.last_mut() {
            end_chunk(chunk, line.start);
        }
        let key = key_end(line.content).map(|end| &text[line.start..line.start + end]);
        let bare = key.is_some_and(|key| strip_comment(&line.content[key.len() + 1..]).is_empty());
        self.outline.doubtful |= key.is_none();
        let key = key.unwrap_or("");
        self.outline.chunks.push(Chunk {
            key: key.to_owned(),
            key_span: Span::new(line.start, line.start + key.len()),
            span: Span::new(line.start, line.start),
            items: Vec::new(),
            list: bare && LISTS.contains(&key),
        });
        self.column = if bare && (LISTS.contains(&key) || MAPPINGS.contains(&key)) {
            usize::MAX
        } else {
            0
        };
    }

    fn inner(&mut self, line: &Line<'_>, dash: bool) {
        let column = self.column;
        let Some(chunk) = self.outline.chunks.last_mut() else {
            self.outline.doubtful = true;
            return;
        };
        let begins = if column == usize::MAX {
            // The first line of the value sets the column of its items.
            if chunk.list != dash || (!chunk.list && key_end(line.content).is_none()) {
                self.column = 0;
                chunk.list = false;
                self.outline.doubtful = true;
                return;
            }
            self.column = line.indent;
            true
        } else if column == 0 && chunk.items.is_empty() {
            false
        } else if chunk.list {
            // A dash left of an item's keys can only begin another item, whatever its exact column.
            (dash || line.content[0] == b'-') && line.indent < self.content_column
        } else {
            line.indent <= column && !dash && key_end(line.content).is_some()
        };
        if begins {
            if let Some(item) = chunk.items.last_mut() {
                item.end = Span::new(0, line.start).end;
            }
            chunk.items.push(Span::new(line.start, line.start));
            let inner = line.content[1..].iter().take_while(|b| **b == b' ').count();
            self.content_column = line.indent + 1 + inner.max(1);
        } else if !chunk.items.is_empty() && line.indent <= column && !(chunk.list && line.content[0] == b'-') {
            // A line left of its items is damage, or a form that is not split.
            self.outline.doubtful = true;
        }
    }
}

fn end_chunk(chunk: &mut Chunk, end: usize) {
    chunk.span.end = Span::new(0, end).end;
    if let Some(item) = chunk.items.last_mut() {
        item.end = chunk.span.end;
    }
}

fn trim_break(line: &[u8]) -> &[u8] {
    let line = line.strip_suffix(b"\n").unwrap_or(line);
    let line = line.strip_suffix(b"\r").unwrap_or(line);
    line.trim_ascii_end()
}

fn is_dash(content: &[u8]) -> bool {
    content[0] == b'-' && content.get(1).is_none_or(|b| *b == b' ' || *b == b'\t')
}

/// Length of the plain key that a line begins with, if a colon follows it.
fn key_end(content: &[u8]) -> Option<usize> {
    if matches!(
        content[0],
        b'"' | b'\'' | b'?' | b'-' | b'[' | b'{' | b'&' | b'*' | b'!' | b'%' | b'|' | b'>' | b':'
    ) {
        return None;
    }
    let colon = content
        .iter()
        .enumerate()
        .position(|(at, b)| *b == b':' && content.get(at + 1).is_none_or(u8::is_ascii_whitespace))?;
    // A comment or a space before the colon is legal YAML but not what this splitter knows as a key.
    let key = &content[..colon];
    (!key.windows(2).any(|pair| pair == b" #") && !key.ends_with(b" ")).then_some(colon)
}

fn strip_comment(rest: &[u8]) -> &[u8] {
    let rest = rest.trim_ascii();
    if rest.first() == Some(&b'#') { &[] } else { rest }
}

/// Whether an anchor or alias may stand in the text.
fn has_reference(bytes: &[u8]) -> bool {
    bytes.iter().enumerate().any(|(at, byte)| {
        matches!(byte, b'&' | b'*')
            && (at == 0 || matches!(bytes[at - 1], b' ' | b'\t' | b'\n' | b'[' | b'{' | b','))
            && bytes.get(at + 1).is_some_and(|next| !next.is_ascii_whitespace())
    })
}

#[cfg(test)]
mod tests {
    use super::*;

    fn items(text: &str) -> Vec<&str> {
        outline(text)
            .chunks
            .iter()
            .flat_map(|c| c.items.iter().map(|s| s.slice(text)))
            .collect()
    }

    #[test]
    fn splits_lists_and_mappings_by_indentation() {
        let text = "steelwork: 1\n# c\ngroups:\n  a: { role: beam }\n  b:\n    role: column\nmembers: # all\n  - mark: B1\n    count: 2\n\n  # next\n  - { mark: B2 }\n";
        let outline = outline(text);
        assert!(!outline.doubtful);
        let keys: Vec<&str> = outline.chunks.iter().map(|c| c.key.as_str()).collect();
        assert_eq!(keys, ["steelwork", "groups", "members"]);
        assert_eq!(
            items(text),
            [
                "  a: { role: beam }\n",
                "  b:\n    role: column\n",
                "  - mark: B1\n    count: 2\n\n  # next\n",
                "  - { mark: B2 }\n"
            ]
        );
    }

    #[test]
    fn a_dash_left_of_the_keys_begins_an_item_whatever_its_column() {
        let text = "members:\n- mark: B1\n  departures:\n    - { from: x }\n - mark: B2\n- mark: B3\n";
        assert_eq!(items(text).len(), 3);
    }

    #[test]
    fn what_is_not_plain_block_style_is_doubtful() {
        for text in [
            "{steelwork: 1}\n",
            "--- \nsteelwork: 1\n",
            "\"members\":\n  - mark: B1\n",
            "members:\n  - &a { mark: B1 }\n  - *a\n",
            "  steelwork: 1\n  members:\n    - mark: B1\n",
            "members:\n\t- mark: B1\n",
        ] {
            assert!(outline(text).doubtful, "{text}");
        }
    }
}
