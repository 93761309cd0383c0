//! Lines of a block, by their indentation.

use super::lines::{holds_below, indent_after, is_dash, key_at, line_at, line_start, plain_end, quoted_end, unquoted};
use super::{Level, Scan, flow};
use crate::editor::completion::place::Slot;

impl Scan<'_> {
    /// Reads lines of a block from an offset on.
    pub(super) fn block(&mut self, mut at: usize) {
        loop {
            let next = self.line(at);
            if next >= self.text.len() {
                // Behind a last line break is a line too.
                if next > at && self.text.ends_with('\n') && self.cursor == self.text.len() && !self.met() {
                    self.line(next);
                }
                return;
            }
            at = next;
        }
    }

    /// Reads a line; where the next one begins.
    fn line(&mut self, start: usize) -> usize {
        let (end, next) = line_at(self.text, start);
        let content = &self.text[start..end];
        let bom = if start == 0 && content.starts_with('\u{feff}') {
            3
        } else {
            0
        };
        let indent = content[bom..].len() - content[bom..].trim_start_matches(' ').len();
        let from = start + bom + indent;
        let here = !self.met() && start <= self.cursor && self.cursor <= end;
        let rest = self.text[from..end].trim();
        if let Some(column) = self.scalar {
            if rest.is_empty() || indent > column {
                if here && (!rest.is_empty() || self.cursor > start + column) {
                    self.closed = true;
                    return next;
                }
                if !here {
                    return next;
                }
            }
            if !rest.is_empty() {
                self.scalar = None;
            }
        }
        if rest.is_empty() || rest.starts_with('#') {
            if here && (rest.is_empty() || self.cursor < from) {
                self.blank(self.cursor.saturating_sub(start + bom), next);
            } else if here {
                self.closed = true;
            }
            return next;
        }
        if here && self.cursor < from || rest.starts_with('\t') {
            self.closed |= here;
            return next;
        }
        self.entry(from, indent, end).unwrap_or(next)
    }

    /// The cursor on a line that holds nothing.
    fn blank(&mut self, column: usize, next: usize) {
        // A line that follows deeper would become part of what is written here.
        if indent_after(self.text, next).is_some_and(|indent| indent > column) {
            self.closed = true;
            return;
        }
        self.pop(column, true);
        let Some(top) = self.levels.last() else {
            self.closed = true;
            return;
        };
        let (count, at, id) = (self.levels.len(), (self.cursor, self.cursor), top.container);
        match (top.list, top.indent == column, top.filled) {
            (false, true, _) => self.find(self.path(count - 1), Slot::Key { colon: false }, at, Some(id)),
            (true, true, _) => {
                self.find(self.path(count), Slot::Either, at, Some(id));
                self.also(|place| place.before = "- ");
            }
            (list, false, false) if list || top.key.is_some() => {
                self.find(self.path(count), Slot::Either, at, None);
            }
            _ => self.closed = true,
        }
    }

    /// Closes the blocks that a line at a column ends. `keep` keeps a list whose dashes stand at it.
    fn pop(&mut self, column: usize, keep: bool) {
        while let Some(top) = self.levels.last() {
            let ends = top.indent > column || top.list && top.indent == column && !keep;
            if !ends || self.levels.len() == 1 {
                break;
            }
            self.levels.pop();
            if let Some(holder) = self.levels.last_mut() {
                holder.filled = true;
            }
        }
    }

    /// Reads what stands at `pos`, column `column`, of a line that ends at `end`; where reading goes on, if not at the
    /// next line.
    fn entry(&mut self, mut pos: usize, mut column: usize, end: usize) -> Option<usize> {
        let mut dashed = false;
        while is_dash(&self.text[pos..end]) {
            self.pop(column, true);
            if self.levels.last().is_none_or(|top| !top.list || top.indent != column) {
                let container = self.container();
                let level = Level {
                    list: true,
                    ..Level::map(column, container)
                };
                self.levels.push(level);
            }
            if let Some(top) = self.levels.last_mut() {
                top.filled = false;
            }
            let rest = &self.text[pos + 1..end];
            let inside = pos + 1 + (rest.len() - rest.trim_start().len());
            let empty = rest.trim().is_empty() || rest.trim_start().starts_with('#') && self.cursor < inside;
            if !self.met() && self.cursor >= pos && (self.cursor < inside || empty && self.cursor <= end) {
                if self.cursor == pos || !empty {
                    self.closed = true;
                } else {
                    let container = self.levels.last().map(|top| top.container);
                    self.find(
                        self.path(self.levels.len()),
                        Slot::Either,
                        (self.cursor, self.cursor),
                        container,
                    );
                    let gap = if self.cursor == pos + 1 { " " } else { "" };
                    self.also(|place| place.before = gap);
                }
            }
            if empty {
                return None;
            }
            column += inside - pos;
            pos = inside;
            dashed = true;
        }
        if let Some(top) = self.levels.last_mut().filter(|_| dashed) {
            top.filled = true;
        }
        self.content(pos, column, end, dashed)
    }

    fn content(&mut self, pos: usize, column: usize, end: usize, dashed: bool) -> Option<usize> {
        let pos = self.properties(pos, end);
        let rest = &self.text[pos..end];
        if rest.starts_with(['{', '[', '|', '>']) {
            if !dashed {
                self.pop(column, false);
            }
            let floor = self.levels.last_mut().map_or(0, |top| {
                top.filled = true;
                top.indent
            });
            if rest.starts_with(['{', '[']) {
                return self.opened(pos, end, floor);
            }
            self.scalar = Some(floor);
            self.closed |= !self.met() && line_start(self.text, pos) <= self.cursor && self.cursor <= end;
            return None;
        }
        if let Some((to, colon)) = key_at(self.text, pos, end, self.cursor) {
            self.pop(column, false);
            if self.levels.last().is_none_or(|top| top.indent != column || top.list) {
                let container = self.container();
                self.levels.push(Level::map(column, container));
            }
            let above = self.levels.len() - 1;
            let id = self.levels[above].container;
            if !self.met() && pos <= self.cursor && self.cursor <= to {
                self.find(self.path(above), Slot::Key { colon: true }, (pos, to), Some(id));
            }
            let name = unquoted(&self.text[pos..to]);
            if let Some(level) = self.levels.last_mut() {
                level.key = Some(name.clone());
                level.filled = false;
            }
            self.state(id, name, (pos, to));
            return self.value(colon + 1, end, column, id);
        }
        let to = plain_end(self.text, pos, end);
        if let Some(list) = self.levels.last().filter(|_| dashed).map(|top| top.container) {
            self.state(list, unquoted(&self.text[pos..to]), (pos, to));
        }
        if self.met() || self.cursor < pos || self.cursor > end {
            return quoted_end(self.text, pos, end, column).map(|close| line_at(self.text, close).1);
        }
        self.pop(column, false);
        let typed = (pos, self.cursor.max(to));
        if !self.text[to..typed.1].trim().is_empty() {
            self.closed = true;
            return None;
        }
        let top = self.levels.last()?;
        let (count, id) = (self.levels.len(), top.container);
        let (_, next) = line_at(self.text, end);
        let heads = indent_after(self.text, next).is_some_and(|indent| indent > column);
        if !top.list && top.indent == column {
            self.find(self.path(count - 1), Slot::Key { colon: false }, typed, Some(id));
        } else if top.list && dashed || !top.filled && (top.list || top.key.is_some()) {
            self.find(self.path(count), Slot::Either, typed, top.list.then_some(id));
        } else if !top.list && top.key.is_some() && self.list_ended(column) {
            self.find(self.path(count), Slot::Either, typed, None);
        } else {
            self.closed = true;
        }
        self.also(|place| place.heads = heads);
        None
    }

    /// Whether the lines above hold the dashes of a list at a column: what is typed there is its next entry.
    fn list_ended(&self, column: usize) -> bool {
        let before = self.text.get(..self.cursor).unwrap_or("");
        let lines = before.lines().rev().skip(1).filter(|line| !line.trim().is_empty());
        let mut lines = lines.filter(|line| !line.trim_start().starts_with('#'));
        lines
            .find(|line| line.len() - line.trim_start_matches(' ').len() <= column)
            .is_some_and(|line| {
                let rest = line.trim_start_matches(' ');
                line.len() - rest.len() == column && is_dash(rest)
            })
    }

    /// The value of a key behind its colon.
    fn value(&mut self, colon: usize, end: usize, column: usize, id: usize) -> Option<usize> {
        let rest = &self.text[colon..end];
        let mut pos = colon + (rest.len() - rest.trim_start().len());
        let here = !self.met() && self.cursor >= colon && self.cursor <= end;
        if pos == end || self.text[pos..end].starts_with('#') && pos > colon {
            // Lines below that are its value already leave no room for another.
            let (_, next) = line_at(self.text, end);
            let below = here && holds_below(self.text, next, column);
            if here && self.cursor <= pos && !below {
                self.value_place((self.cursor, self.cursor), colon);
            } else if here {
                self.closed = true;
            }
            return None;
        }
        pos = self.properties(pos, end);
        if let Some(level) = self.levels.last_mut() {
            level.filled = true;
        }
        match self.text[pos..end].chars().next() {
            Some('{' | '[') => return self.opened(pos, end, column),
            Some('|' | '>') => {
                self.scalar = Some(column);
                self.closed |= here;
                return None;
            }
            Some('*') => {
                self.closed |= here;
                return None;
            }
            None => {
                self.closed |= here;
                return None;
            }
            _ => {}
        }
        let close = quoted_end(self.text, pos, end, column);
        let to = close.unwrap_or_else(|| plain_end(self.text, pos, end)).min(end);
        let written = unquoted(&self.text[pos..to]);
        if let Some(stated) = self.beside[id].last_mut().filter(|_| id > 0) {
            stated.value = written;
        }
        if here && self.cursor <= pos {
            self.value_place((self.cursor, to), colon);
        } else if here {
            let stop = self.cursor.max(to);
            if self.text[to..stop].trim().is_empty() && (stop == to || close.is_none()) {
                self.value_place((pos, stop), colon);
            } else {
                self.closed = true;
            }
        }
        close
            .filter(|close| *close > end)
            .map(|close| line_at(self.text, close).1)
    }

    fn value_place(&mut self, replaces: (usize, usize), colon: usize) {
        let above = self.levels.len().saturating_sub(1);
        let id = self.levels.get(above).map(|top| top.container);
        self.find(self.path(self.levels.len()), Slot::Value, replaces, id);
        let gap = if replaces.0 == colon { " " } else { "" };
        self.also(|place| place.before = gap);
    }

    /// Braces or brackets that open at `pos`, beneath a block of column `column`.
    fn opened(&mut self, pos: usize, end: usize, column: usize) -> Option<usize> {
        if !self.met() && self.cursor <= pos && line_start(self.text, pos) <= self.cursor {
            self.closed = true;
        }
        let id = self.container();
        let frame = if self.text[pos..].starts_with('{') {
            flow::Frame::braces(id)
        } else {
            flow::Frame::brackets(id)
        };
        let at = self.flow(pos + 1, Some(column), frame);
        if at > 0 && self.text[..at].ends_with('\n') {
            return Some(at);
        }
        let (stop, next) = line_at(self.text, at.max(pos));
        if !self.met() && at.max(pos) <= self.cursor && self.cursor <= stop.max(end) {
            self.closed = true;
        }
        Some(next)
    }

    /// Skips an anchor and a tag.
    fn properties(&mut self, mut pos: usize, end: usize) -> usize {
        while self.text[pos..end].starts_with(['&', '!']) {
            let rest = &self.text[pos..end];
            let word = rest.find(' ').unwrap_or(rest.len());
            let after = pos + word + (rest[word..].len() - rest[word..].trim_start().len());
            if !self.met() && pos <= self.cursor && self.cursor <= pos + word {
                self.closed = true;
            }
            pos = after;
        }
        pos
    }
}
