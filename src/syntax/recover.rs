//! Reading a broken piece entry by entry: each that reads well by itself is kept, and of each that doesn't the cause
//! is looked for at its very characters.

use granit_parser::ErrorKind as Fault;

use crate::syntax::item::Form;
use crate::syntax::line::{self, Line, Lines};
use crate::syntax::parse::{Surroundings, node, parse};
use crate::syntax::{Entry, Node, Scalar, Style, SyntaxError, Tree, Value, flow, words};
use crate::text::{Edit, Span};

mod value;

/// A line with the column in which it is meant to stand.
#[derive(Debug, Clone, Copy)]
struct Row {
    line: Line,
    column: usize,
}

/// Lines that belong together, up to the offset `end`.
#[derive(Debug, Clone, Copy)]
struct Rows<'r> {
    rows: &'r [Row],
    end: usize,
}

impl<'r> Rows<'r> {
    fn part(self, from: usize, to: usize) -> Self {
        Self {
            rows: &self.rows[from..to],
            end: self.rows.get(to).map_or(self.end, |row| row.line.start),
        }
    }

    fn rest(self) -> Option<Self> {
        (self.rows.len() > 1).then(|| self.part(1, self.rows.len()))
    }
}

struct Recovery<'a> {
    text: &'a str,
    depth: usize,
    shared: &'a mut Surroundings,
    errors: Vec<SyntaxError>,
}

/// Reads what can be read of a piece that is no YAML.
pub(super) fn recover(text: &str, form: Form, shared: &mut Surroundings) -> Tree {
    let rows: Vec<Row> = Lines::new(text, 0, text.len())
        .map(|line| Row {
            line,
            column: line.indent,
        })
        .collect();
    let mut recovery = Recovery {
        text,
        depth: form.depth(),
        shared,
        errors: Vec::new(),
    };
    let rows = Rows {
        rows: &rows,
        end: text.len(),
    };
    let root = if rows.rows.is_empty() {
        None
    } else if form == Form::Listed {
        Some(recovery.listed(rows))
    } else {
        Some(recovery.block(rows))
    };
    Tree {
        root,
        errors: recovery.errors,
        broken: true,
    }
}

impl Recovery<'_> {
    /// A mapping in block style; its first line gives the column of its keys.
    fn block(&mut self, rows: Rows<'_>) -> Node {
        let column = rows.rows[0].column;
        let mut placed = rows.rows.to_vec();
        self.place(&mut placed, column);
        let rows = Rows {
            rows: &placed,
            end: rows.end,
        };
        let mut entries = Vec::new();
        let mut from = 0;
        while from < placed.len() {
            let to = (from + 1..placed.len())
                .find(|at| placed[*at].column <= column)
                .unwrap_or(placed.len());
            self.entry(rows.part(from, to), &mut entries);
            from = to;
        }
        let span = match (entries.first(), entries.last()) {
            (Some(first), Some(last)) => first.key.span.join(last.value.span),
            _ => Span::new(placed[0].line.from, placed[0].line.from),
        };
        node(span, Value::Mapping(entries))
    }

    /// Puts lines that stand left of the keys, or behind a tab, into the column in which they are meant to stand.
    fn place(&mut self, rows: &mut [Row], column: usize) {
        let mut run = None;
        for at in 1..rows.len() {
            let row = rows[at];
            let tab = row.line.tabbed() && row.line.indent <= column;
            if row.column >= column && !tab || row.line.tabbed() && row.line.indent > column {
                if row.line.tabbed() {
                    // Behind enough spaces a tab is separation, and stays.
                    rows[at].line.from = row.line.start + row.line.indent;
                }
                run = None;
                continue;
            }
            let before = rows[at - 1];
            let opens = line::without_comment(before.line.content(self.text)).ends_with(':');
            let closes = row.line.content(self.text).starts_with(['}', ']']);
            rows[at].column = match (tab && opens, closes) {
                (true, _) => before.column + 2,
                (false, true) => column + 1,
                (false, false) if tab => before.column,
                (false, false) => column,
            };
            let lead = Span::new(row.line.start, row.line.from);
            // Neighbouring lines with the same slip are one slip.
            if run == Some((row.line.indent, tab))
                && let Some(repair) = self.errors.last_mut().and_then(|error| error.repair.as_mut())
            {
                repair.edits.push(Edit {
                    span: lead,
                    text: " ".repeat(rows[at].column),
                });
                continue;
            }
            run = Some((row.line.indent, tab));
            self.errors.push(if tab {
                let tabs = Span::new(row.line.start + row.line.indent, row.line.from);
                words::tab(tabs, lead, rows[at].column)
            } else {
                let shown = if lead.is_empty() {
                    words::character(self.text, row.line.from)
                } else {
                    lead
                };
                SyntaxError {
                    span: shown,
                    ..words::misplaced(lead, row.line.indent, rows[at].column)
                }
            });
        }
    }

    /// One entry of a block mapping with the lines that belong to it.
    fn entry(&mut self, rows: Rows<'_>, entries: &mut Vec<Entry>) {
        let stop = match self.attempt(rows, None) {
            Ok(mut read) => return entries.append(&mut read),
            Err(stop) => stop,
        };
        let row = rows.rows[0];
        let from = row.line.from;
        let content = line::without_comment(row.line.content(self.text));
        let Some(colon) = line::key_end(content) else {
            return self.no_key(rows, content, &stop, entries);
        };
        let key = self.key(from, from + colon);
        let value = content[colon + 1..].trim_start();
        let at = from + content.len() - value.len();
        let read = if value.is_empty() {
            match rows.rest() {
                Some(rest) => self.below(rest, &stop),
                None => self.unreadable(from + colon + 1, &stop),
            }
        } else {
            self.value(rows, at, value, &stop, entries, &key)
        };
        if let Some(value) = read {
            // What was found behind the value may have gone in already.
            let place = entries.partition_point(|entry| entry.key.span.start < key.span.start);
            entries.insert(place, Entry { key, value });
        }
    }

    /// A line at which a key is wanted and none is.
    fn no_key(&mut self, rows: Rows<'_>, content: &str, stop: &(u32, Fault), entries: &mut Vec<Entry>) {
        let from = rows.rows[0].line.from;
        let whole = Span::new(from, from + content.len());
        if content.starts_with("- ") {
            let text = "a list entry can't stand between the keys of a mapping; entries stand in one column below \
                        their key";
            return self.errors.push(words::not_yaml(Span::new(from, from + 1), text));
        }
        if content.starts_with([
            '@', '`', '%', '"', '\'', '{', '[', '}', ']', '&', '*', '!', '|', '>', ',',
        ]) {
            return self.errors.push(words::fault(self.text, stop.0, &stop.1));
        }
        // A colon with its space left out.
        let tight = content
            .char_indices()
            .find(|(at, c)| *c == ':' && *at > 0 && content[..*at].chars().all(|c| c.is_alphanumeric() || c == ' '));
        if let Some((at, _)) = tight
            && let Ok(mut read) = self.attempt(rows, Some((from + at + 1, " ")))
        {
            let behind = Span::new(from + at + 1, from + at + 1);
            let text = format!("a space is missing behind the colon of `{}`", &content[..at]);
            let error = words::not_yaml(Span::new(from + at, from + at + 1), text);
            self.errors
                .push(error.repaired("write a space behind the colon", true, behind, " "));
            return entries.append(&mut read);
        }
        // A key whose value stands below, without its colon.
        let end = from + content.len();
        if rows.rows.len() > 1
            && let Ok(mut read) = self.attempt(rows, Some((end, ":")))
        {
            let text = format!("`{content}` has no colon, though its value stands below");
            let error = words::not_yaml(whole, text);
            self.errors
                .push(error.repaired("write a colon behind it", true, Span::new(end, end), ":"));
            return entries.append(&mut read);
        }
        self.errors.push(words::missing_colon(whole, content));
        // Its nested lines may still hold readable entries, but not whose.
        let word = content.find(' ').unwrap_or(content.len());
        entries.push(Entry {
            key: self.key(from, from + word),
            value: node(Span::new(from + word, end), Value::Unreadable),
        });
    }

    /// A value on the lines below its key.
    fn below(&mut self, rows: Rows<'_>, stop: &(u32, Fault)) -> Option<Node> {
        let row = rows.rows[0];
        let content = row.line.content(self.text);
        if content.starts_with('-') && self.is_list(rows) {
            Some(self.list(rows))
        } else if rows
            .rows
            .iter()
            .any(|row| line::key_end(row.line.content(self.text)).is_some())
            && !content.starts_with(['{', '[', '|', '>'])
        {
            Some(self.block(rows))
        } else if content.starts_with(['{', '[']) {
            Some(self.flow(row.line.from, rows.end))
        } else {
            self.unreadable(row.line.from, stop)
        }
    }

    fn is_list(&self, rows: Rows<'_>) -> bool {
        let column = rows.rows[0].column;
        rows.rows
            .iter()
            .any(|row| row.column == column && line::is_entry(row.line.content(self.text)))
            || line::key_end(rows.rows[0].line.content(self.text)).is_none()
    }

    fn list(&mut self, rows: Rows<'_>) -> Node {
        let column = rows.rows[0].column;
        let mut nodes: Vec<Node> = Vec::new();
        let mut from = 0;
        while from < rows.rows.len() {
            let to = (from + 1..rows.rows.len())
                .find(|at| rows.rows[*at].column <= column)
                .unwrap_or(rows.rows.len());
            nodes.push(self.listed(rows.part(from, to)));
            from = to;
        }
        let from = rows.rows[0].line.from;
        let end = nodes.last().map_or(from, |node| node.span.end as usize);
        node(Span::new(from, end.max(from)), Value::Sequence(nodes))
    }

    /// An entry of a list.
    fn listed(&mut self, rows: Rows<'_>) -> Node {
        let made = self.made_up(rows, None);
        let parsed = parse(&made.text, self.depth, true, Some(&mut *self.shared));
        if let (None, true, Some(Value::Sequence(nodes))) =
            (&parsed.stop, parsed.block, parsed.root.as_ref().map(|root| &root.value))
            && let [only] = nodes.as_slice()
        {
            let mut only = only.clone();
            only.each_span(&mut |span| *span = made.real(*span));
            self.take(&made, parsed.errors);
            return only;
        }
        let first = rows.rows[0];
        let dash = first.line.from;
        let content = first.line.content(self.text);
        let inner = content.trim_start_matches('-').trim_start();
        let mut from = dash + content.len() - inner.len();
        let mut column = first.column + from - dash;
        if !content.starts_with('-') {
            let text = "an entry of the list begins with `- `; this line does not";
            let gap = Span::new(dash, dash);
            let error = words::not_yaml(Span::new(dash, first.line.to), text);
            self.errors
                .push(error.repaired("write a dash before it", false, gap, "- "));
            (from, column) = (dash, first.column);
        } else if !line::is_entry(content) {
            let gap = Span::new(dash + 1, dash + 1);
            let error = words::not_yaml(Span::new(dash, dash + 1), "a space is missing behind the dash");
            let mut error = error.repaired("write a space behind the dash", true, gap, " ");
            let (wanted, others) = (
                first.column + 2,
                rows.rows.get(1).map_or(first.column + 2, |row| row.column),
            );
            if let (Some(repair), false) = (&mut error.repair, others == wanted) {
                repair.edits.extend(rows.rows[1..].iter().map(|row| Edit {
                    span: Span::new(row.line.start, row.line.from),
                    text: " ".repeat((row.line.indent + wanted).saturating_sub(others)),
                }));
            }
            self.errors.push(error);
            // The other keys stand where this one would with its space.
            column = rows.rows.get(1).map_or(column, |row| row.column.max(first.column + 1));
        }
        let stop = match parsed.stop {
            Some((at, fault)) => (made.offset(at), fault),
            None => (Span::new(0, dash).end, Fault::ExpectedNodeContent),
        };
        if inner.is_empty() {
            return match rows.rest() {
                Some(rest) => self.below(rest, &stop),
                None => self.unreadable(dash + 1, &stop),
            }
            .unwrap_or_else(|| node(Span::new(dash + 1, dash + 1), Value::Unreadable));
        }
        let mut moved = rows.rows.to_vec();
        moved[0].line.from = from;
        moved[0].column = column;
        let rows = Rows {
            rows: &moved,
            end: rows.end,
        };
        if inner.starts_with(['{', '[']) {
            return self.flow(from, rows.end);
        }
        self.block(rows)
    }

    /// A flow collection, up to the end of its lines at the latest.
    fn flow(&mut self, from: usize, end: usize) -> Node {
        let read = flow::read(&self.text[..end], from, self.depth);
        let rest = line::without_comment(self.text[read.end..end].lines().next().unwrap_or("")).trim_start();
        if read.errors.is_empty() && !rest.is_empty() {
            let at = self.text[..end].len() - self.text[read.end..end].trim_start().len();
            let span = Span::new(at, at + rest.len());
            let error = if rest.starts_with(['}', ']']) {
                let one = Span::new(at, at + 1);
                let text = format!("this `{}` closes nothing that is open", &rest[..1]);
                words::not_yaml(one, text).repaired("delete it", false, one, "")
            } else {
                words::not_yaml(
                    span,
                    format!("`{rest}` stands behind the bracket that closes the value"),
                )
            };
            self.errors.push(error);
        }
        self.errors.extend(read.errors);
        read.node
    }

    /// The entries of a mapping as the parser reads them from these lines, with text put in at an offset.
    fn attempt(&mut self, rows: Rows<'_>, put: Option<(usize, &str)>) -> Result<Vec<Entry>, (u32, Fault)> {
        let made = self.made_up(rows, put);
        let parsed = parse(&made.text, self.depth, true, Some(&mut *self.shared));
        if let Some((at, fault)) = parsed.stop {
            return Err((made.offset(at), fault));
        }
        let at = Span::new(0, rows.rows[0].line.from).end;
        match parsed.root.map(|root| root.value) {
            Some(Value::Mapping(mut entries)) if parsed.block => {
                for entry in &mut entries {
                    entry.key.each_span(&mut |span| *span = made.real(*span));
                    entry.value.each_span(&mut |span| *span = made.real(*span));
                }
                self.take(&made, parsed.errors);
                Ok(entries)
            }
            _ => Err((at, Fault::ExpectedBlockMappingKey)),
        }
    }

    fn take(&mut self, made: &MadeUp, errors: Vec<SyntaxError>) {
        self.errors.extend(errors.into_iter().map(|mut error| {
            error.each_span(&mut |span| *span = made.real(*span));
            error
        }));
    }

    /// Reports what the parser said.
    fn unreadable(&mut self, at: usize, stop: &(u32, Fault)) -> Option<Node> {
        self.errors.push(words::fault(self.text, stop.0, &stop.1));
        Some(node(Span::new(at, at), Value::Unreadable))
    }

    fn key(&self, from: usize, to: usize) -> Node {
        let text = self.text[from..to].trim_end();
        let span = Span::new(from, from + text.len());
        match parse(text, self.depth, true, None).root {
            Some(read) if matches!(read.value, Value::Scalar(_)) => node(span, read.value),
            _ => node(
                span,
                Value::Scalar(Scalar {
                    text: text.to_owned(),
                    style: Style::Plain,
                }),
            ),
        }
    }

    /// The text of lines, each in the column where it is meant to stand.
    fn made_up(&self, rows: Rows<'_>, put: Option<(usize, &str)>) -> MadeUp {
        let mut made = MadeUp::default();
        for (at, row) in rows.rows.iter().enumerate() {
            made.text.push_str(&" ".repeat(row.column));
            let end = rows
                .rows
                .get(at + 1)
                .map_or(rows.end, |next| next.line.start)
                .max(row.line.from);
            match put {
                Some((place, text)) if (row.line.from..end).contains(&place) || place == end => {
                    made.copy(self.text, row.line.from, place);
                    made.text.push_str(text);
                    made.copy(self.text, place, end);
                }
                _ => made.copy(self.text, row.line.from, end),
            }
        }
        made
    }
}

/// A text put together from parts of another.
#[derive(Debug, Default)]
struct MadeUp {
    text: String,
    /// Where each part begins here, where it comes from, and its length.
    parts: Vec<(usize, usize, usize)>,
}

impl MadeUp {
    fn copy(&mut self, text: &str, from: usize, to: usize) {
        self.parts.push((self.text.len(), from, to - from));
        self.text.push_str(&text[from..to]);
    }

    /// The offset in the real text.
    fn offset(&self, at: u32) -> u32 {
        let after = self.parts.partition_point(|part| part.0 <= at as usize);
        match self.parts.get(after.saturating_sub(1)) {
            Some((here, real, length)) => Span::new(0, real + (at as usize).saturating_sub(*here).min(*length)).end,
            None => 0,
        }
    }

    fn real(&self, span: Span) -> Span {
        let start = self.offset(span.start);
        Span {
            start,
            end: self.offset(span.end).max(start),
        }
    }
}
