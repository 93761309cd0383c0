//! The items of a list or mapping in block style.

use crate::syntax::item::Form;
use crate::syntax::line::{self, Line, Lines};
use crate::syntax::{SyntaxError, words};
use crate::text::{Edit, Span};

/// An item with the column in which it begins.
#[derive(Debug, Clone, Copy)]
pub(super) struct Found {
    pub(super) span: Span,
    first: Line,
}

/// The items below a section's key, or none where indentation can't tell them.
pub(super) fn items(text: &str, header: Line, end: usize, form: Form) -> Option<Vec<Found>> {
    let mut lines = Lines::new(text, super::frame::line_end(text, header.to), end);
    let Some(first) = lines.next() else {
        return Some(Vec::new());
    };
    let list = form == Form::Listed;
    let fits = if list {
        begins_list(text, first, end)
    } else {
        let content = first.content(text);
        first.indent > header.indent && line::key_end(content).is_some() && !line::is_entry(content)
    };
    if !fits || first.tabbed() || first.content(text).starts_with(['?', '&', '!', '*']) {
        return None;
    }
    let mut found = vec![begin(first, end)];
    let mut walk = Walk::from(text, first, form);
    for line in lines {
        match walk.takes(text, line) {
            Step::Begins => {
                if let Some(last) = found.last_mut() {
                    last.span.end = Span::new(0, line.start).end;
                }
                found.push(begin(line, end));
            }
            Step::GoesOn => {}
            Step::Lost => return None,
        }
    }
    Some(found)
}

/// A walk over the lines of a list or mapping.
pub(super) struct Walk<'a> {
    list: bool,
    /// The key that its first item begins with.
    key: Option<&'a str>,
    /// The column of the item that the walk is in, and that of what stands behind its dash.
    column: usize,
    inner: usize,
}

/// What a line is to the list.
pub(super) enum Step {
    /// It begins an item.
    Begins,
    /// It goes on with the item above.
    GoesOn,
    /// Indentation can't tell the items.
    Lost,
}

impl<'a> Walk<'a> {
    /// A walk that begins at the first line of the first item.
    pub(super) fn from(text: &'a str, first: Line, form: Form) -> Self {
        Self {
            list: form == Form::Listed,
            key: first_key(first.content(text).trim_start_matches('-').trim_start()),
            column: first.indent,
            inner: content_column(text, first),
        }
    }

    /// Goes on from the first line of another item.
    pub(super) fn at(mut self, text: &str, first: Line) -> Self {
        self.column = first.indent;
        self.inner = content_column(text, first);
        self
    }

    pub(super) fn takes(&mut self, text: &str, line: Line) -> Step {
        let (list, column, inner) = (self.list, self.column, self.inner);
        if line.indent > column && !(list && line.indent < inner) || line.tabbed() {
            return Step::GoesOn;
        }
        let content = line.content(text);
        let begins = if list {
            // A dash left of an item's keys can only begin another item, whatever its exact column.
            // So can a line in its column with the key that the first item begins with: its dash is missing.
            content.starts_with('-') && line.indent < inner
                || line.indent == column && self.key.is_some() && first_key(content) == self.key
        } else if line.indent == column {
            if matches!(content.as_bytes()[0], b'?' | b':') && content[1..].starts_with([' ', '\t'])
                || content == "?"
                || content == ":"
            {
                return Step::Lost;
            }
            !content.starts_with(['}', ']'])
        } else {
            line.indent < column && line::key_end(content).is_some()
        };
        if !begins {
            return Step::GoesOn;
        }
        self.column = line.indent;
        self.inner = content_column(text, line);
        Step::Begins
    }
}

/// The key that a line begins with.
fn first_key(content: &str) -> Option<&str> {
    line::key_end(content).map(|end| &content[..end])
}

fn begin(first: Line, end: usize) -> Found {
    Found {
        span: Span::new(first.start, end),
        first,
    }
}

/// Whether a list begins here: with a proper entry, or with `-mark:` where a proper one follows.
fn begins_list(text: &str, first: Line, end: usize) -> bool {
    let content = first.content(text);
    line::is_entry(content)
        || content.starts_with('-')
            && Lines::new(text, first.start, end)
                .any(|line| line.indent == first.indent && line::is_entry(line.content(text)))
}

/// The column of what stands behind the dash.
fn content_column(text: &str, line: Line) -> usize {
    let content = line.content(text);
    let behind = content.trim_start_matches('-').trim_start();
    if behind.is_empty() || !line::is_entry(content) {
        line.indent + 1
    } else {
        line.indent + content.len() - behind.len()
    }
}

/// Items that begin in another column than most.
pub(super) fn uneven(text: &str, items: &[Found]) -> Vec<SyntaxError> {
    let Some(first) = items.first() else { return Vec::new() };
    if items.iter().all(|item| item.first.indent == first.first.indent) {
        return Vec::new();
    }
    let mut counts = std::collections::BTreeMap::new();
    for item in items {
        *counts.entry(item.first.indent).or_insert(0_usize) += 1;
    }
    let column = counts
        .iter()
        .max_by_key(|(_, count)| **count)
        .map_or(0, |(column, _)| *column);
    items
        .iter()
        .filter(|item| item.first.indent != column)
        .map(|item| {
            let lead = Span::new(item.first.start, item.first.from);
            let mut error = words::misplaced(lead, item.first.indent, column);
            if lead.is_empty() {
                error.span = words::character(text, item.first.from);
            }
            error.message = format!(
                "this entry is indented by {}, the others of its list by {column}; they stand in one column",
                item.first.indent
            );
            if let Some(repair) = &mut error.repair {
                let lines = Lines::new(text, item.first.to, item.span.end as usize);
                repair.edits.extend(lines.map(|line| Edit {
                    span: Span::new(line.start, line.from),
                    text: " ".repeat((line.indent + column).saturating_sub(item.first.indent)),
                }));
            }
            error
        })
        .collect()
}
