//! Braces and brackets.

use super::Scan;
use super::lines::{indent_after, line_at, quoted_end, unquoted};
use crate::editor::completion::place::{Slot, Step};

/// Braces or brackets that are open.
pub(super) struct Frame {
    braces: bool,
    container: usize,
    /// The key whose value follows.
    key: Option<String>,
    /// Whether the value, or the entry of a list, is written.
    done: bool,
}

impl Frame {
    pub const fn braces(container: usize) -> Self {
        Self {
            braces: true,
            container,
            key: None,
            done: false,
        }
    }

    pub fn brackets(container: usize) -> Self {
        Self {
            braces: false,
            ..Self::braces(container)
        }
    }
}

/// A word in braces or brackets.
struct Word {
    from: usize,
    to: usize,
    quoted: bool,
    /// Where the colon stands that makes it a key.
    colon: Option<usize>,
}

impl Scan<'_> {
    /// Reads braces or brackets from behind their opening on; where they end. Lines that are not indented deeper than
    /// `floor` end them too.
    pub(super) fn flow(&mut self, mut at: usize, floor: Option<usize>, first: Frame) -> usize {
        let mut frames = vec![first];
        while !frames.is_empty() {
            let (next, ended) = self.gap(at, floor);
            let here = !self.met() && at <= self.cursor && self.cursor <= next;
            let word_follows = self.text[next..]
                .chars()
                .next()
                .is_some_and(|c| !matches!(c, ',' | ']' | '}' | '{' | '[' | ':' | '\n'));
            // At the first character of a word the cursor is the word's.
            if here && !(self.cursor == next && word_follows && !ended) {
                self.in_gap(&frames, (at, next), ended);
            }
            if ended || next >= self.text.len() {
                return next;
            }
            at = next;
            let Some(frame) = frames.last_mut() else { return at };
            match self.text.as_bytes()[at] {
                opening @ (b'{' | b'[') => {
                    frame.done = true;
                    let container = self.container();
                    frames.push(if opening == b'{' {
                        Frame::braces(container)
                    } else {
                        Frame::brackets(container)
                    });
                    at += 1;
                }
                b'}' | b']' => {
                    frames.pop();
                    at += 1;
                }
                b',' => {
                    frame.key = None;
                    frame.done = false;
                    at += 1;
                }
                b':' => at += 1,
                _ => at = self.word(&mut frames, at, floor),
            }
        }
        at
    }

    /// Skips blanks, line breaks and comments; where something stands, and whether what is open ends there.
    fn gap(&mut self, mut at: usize, floor: Option<usize>) -> (usize, bool) {
        let bytes = self.text.as_bytes();
        loop {
            match bytes.get(at) {
                Some(b' ' | b'\t' | b'\r') => at += 1,
                Some(b'#') if at == 0 || matches!(bytes[at - 1], b' ' | b'\t' | b'\n') => {
                    let (end, _) = line_at(self.text, at);
                    if !self.met() && at < self.cursor && self.cursor <= end {
                        self.closed = true;
                    }
                    at = end;
                }
                Some(b'\n') => {
                    let start = at + 1;
                    let (end, _) = line_at(self.text, start.min(self.text.len()));
                    let blank = self.text.get(start..end).unwrap_or("").trim().is_empty();
                    let cursor = !self.met() && start <= self.cursor && self.cursor <= end;
                    let indent = if blank && cursor {
                        Some(self.cursor - start)
                    } else {
                        indent_after(self.text, start)
                    };
                    let ends = floor.is_some_and(|floor| indent.is_none_or(|indent| indent <= floor));
                    let rest = self.text.get(start..).unwrap_or("").trim_start();
                    if ends && !(rest.starts_with(['}', ']', ',']) && !(blank && cursor)) {
                        return (start, true);
                    }
                    at = start;
                }
                _ => return (at, at >= self.text.len()),
            }
        }
    }

    /// The way to what the frames hold; of the last one only with `inside`.
    fn way(&self, frames: &[Frame], inside: bool) -> Vec<Step> {
        let mut path = self.path(self.levels.len());
        let count = if inside { frames.len() } else { frames.len() - 1 };
        for frame in &frames[..count] {
            match &frame.key {
                Some(key) => path.push(Step::Key(key.clone())),
                None if !frame.braces => path.push(Step::Entry),
                None => {}
            }
        }
        path
    }

    /// The cursor between words.
    fn in_gap(&mut self, frames: &[Frame], (from, to): (usize, usize), ended: bool) {
        let Some(frame) = frames.last() else { return };
        let same_line = |to: usize| !self.text[self.cursor..to.max(self.cursor)].contains('\n');
        // What ends at the next line does not hold a cursor on it.
        if ended && self.cursor == to && self.text[..to].ends_with('\n') {
            return;
        }
        if frame.done || frame.key.is_some() && !frame.braces {
            self.closed = true;
            return;
        }
        let slot = if frame.braces && frame.key.is_none() {
            Slot::Key { colon: false }
        } else {
            Slot::Value
        };
        let path = self.way(frames, slot == Slot::Value);
        let container = frame.container;
        let valued = frame.key.is_some();
        let next = self.text[to.min(self.text.len())..].chars().next();
        let follows = same_line(to) && next.is_some_and(|c| !matches!(c, ',' | '}' | ']' | '\r' | '\n' | '#'));
        let mut replaces = (self.cursor, self.cursor);
        let mut after = "";
        if follows && !ended {
            // Behind a key's colon the word is its value, if it is no key itself.
            let word = self.read_word(to, None);
            if valued && word.colon.is_none() && !matches!(next, Some('{' | '[')) {
                replaces.1 = word.to;
            } else if matches!(next, Some('{' | '[')) {
                self.closed = true;
                return;
            } else {
                after = if self.cursor == to { ", " } else { "," };
            }
        }
        let tight = valued && from == self.cursor && self.text[..from].ends_with(':');
        self.find(path, slot, replaces, Some(container));
        self.also(|place| {
            place.flow = true;
            place.before = if tight { " " } else { "" };
            place.after = after;
        });
    }

    fn word(&mut self, frames: &mut [Frame], at: usize, floor: Option<usize>) -> usize {
        let mut word = self.read_word(at, floor);
        let alias = self.text[at..].starts_with(['*', '&', '!']);
        if self.text[at..].starts_with(['&', '!']) {
            // An anchor or tag ends at its space; what follows is the node.
            let stop = self.text[at..word.to].find(' ').map_or(word.to, |n| at + n);
            word.to = stop.max(at + 1);
            if !self.met() && at <= self.cursor && self.cursor <= word.to {
                self.closed = true;
            }
            return word.to;
        }
        let Some((frame, _)) = frames.split_last_mut() else {
            return word.to;
        };
        let name = unquoted(&self.text[word.from..word.to]);
        let span = (word.from, word.to);
        let is_key = frame.braces && frame.key.is_none();
        let stop = if word.quoted || word.colon.is_some() {
            word.to
        } else {
            // What is typed behind a space still belongs to the word.
            let (end, _) = line_at(self.text, word.to);
            let spaces = self.text[word.to..end].len() - self.text[word.to..end].trim_start_matches(' ').len();
            if (word.to..=word.to + spaces).contains(&self.cursor) {
                self.cursor
            } else {
                word.to
            }
        };
        let here = !self.met() && word.from <= self.cursor && self.cursor <= stop;
        let container = frame.container;
        if is_key {
            let colon = word.colon.is_some();
            if here {
                let path = self.way(frames, false);
                self.find(path, Slot::Key { colon }, (word.from, stop), Some(container));
                self.also(|place| place.flow = true);
            }
            self.state(container, name.clone(), span);
            if let Some(frame) = frames.last_mut() {
                frame.done = !colon;
                frame.key = colon.then_some(name);
            }
            return word.colon.map_or(stop, |colon| colon + 1);
        }
        if here && alias {
            self.closed = true;
        } else if here {
            let path = self.way(frames, true);
            self.find(path, Slot::Value, (word.from, stop), Some(container));
            self.also(|place| place.flow = true);
        }
        if let Some(frame) = frames.last_mut() {
            frame.done = true;
            if frame.braces {
                if let Some(stated) = self.beside[container].last_mut() {
                    stated.value = name;
                }
            } else {
                frame.key = word.colon.is_some().then(|| name.clone());
                frame.done = word.colon.is_none();
                self.state(container, name, span);
            }
        }
        word.colon.map_or(stop, |colon| colon + 1)
    }

    fn read_word(&self, from: usize, floor: Option<usize>) -> Word {
        let bytes = self.text.as_bytes();
        let (end, _) = line_at(self.text, from);
        let ends_key = |colon: usize| {
            let next = bytes.get(colon + 1);
            next.is_none()
                || colon + 1 == self.cursor
                || matches!(
                    next,
                    Some(b' ' | b'\t' | b'\r' | b'\n' | b',' | b'}' | b']' | b'{' | b'[')
                )
        };
        if let Some(close) = quoted_end(self.text, from, end, floor.unwrap_or(0)) {
            let rest = &self.text[close..];
            let colon = close + (rest.len() - rest.trim_start_matches(' ').len());
            return Word {
                from,
                to: close,
                quoted: true,
                colon: (bytes.get(colon) == Some(&b':')).then_some(colon),
            };
        }
        let mut at = from;
        let mut colon = None;
        while at < end {
            match bytes[at] {
                b',' | b'{' | b'}' | b'[' | b']' => break,
                b'#' if at > from && matches!(bytes[at - 1], b' ' | b'\t') => break,
                b':' if ends_key(at) => {
                    colon = Some(at);
                    break;
                }
                _ => at += 1,
            }
        }
        Word {
            from,
            to: from + self.text[from..at].trim_end_matches([' ', '\t', '\r']).len(),
            quoted: false,
            colon,
        }
    }
}
