//! Splitting again what a change within a list's items touched, so that a keystroke costs one item.
//!
//! Whatever the change might do beyond those items (anchors, markers of documents, lines that begin another entry of the
//! top level, another column) is left to splitting the whole.

use super::frame::line_end;
use super::items::{Step, Walk};
use crate::syntax::MAX_BYTES;
use crate::syntax::item::Form;
use crate::syntax::line::{Line, Lines, is_entry};
use crate::syntax::outline::{Piece, Resplit};
use crate::text::{Change, Span};

pub(in crate::syntax) fn again(old: &str, new: &str, change: Change, key: Span, items: &[&Piece]) -> Option<Resplit> {
    let start = |index: usize| items[index].span.start as usize;
    let end = |index: usize| items[index].span.end as usize;
    let first = first_line(old, items.first()?)?;
    let (from, to) = (change.at, change.at + change.removed);
    // Of the item before the change every character stands; of the first item its first line must.
    let touched = items
        .partition_point(|item| (item.span.start as usize) < from)
        .checked_sub(1)?;
    let begin = touched.saturating_sub(1);
    if touched == 0 && from < line_end(old, first.to) || !is_entry(first.content(old)) {
        return None;
    }
    let last = items.partition_point(|item| item.span.start as usize <= to) - 1;
    let stop = end(last);
    if to > stop || to == stop && stop < old.len() || new.len() as u64 > MAX_BYTES {
        return None;
    }
    if !items[begin..=last].iter().all(|item| item.is_plain()) {
        return None;
    }
    let region = Span::new(start(begin), stop - change.removed + change.added);
    if unsteady(Span::new(start(begin), stop).slice(old)) || unsteady(region.slice(new)) {
        return None;
    }
    let top = column(old, key)?;
    let mut lines = Lines::new(new, region.start as usize, region.end as usize);
    let head = lines.next()?;
    let mut walk = Walk::from(old, first, Form::Listed).at(new, head);
    let mut pieces = vec![head];
    for line in lines {
        if line.indent <= top && !line.tabbed() && !(line.indent == top && is_entry(line.content(new))) {
            return None;
        }
        if let Step::Begins = walk.takes(new, line) {
            pieces.push(line);
        }
    }
    if pieces.iter().any(|line| line.indent != head.indent) || begins_document(new, region) {
        return None;
    }
    let bounds = pieces.iter().skip(1).map(|line| line.start);
    let ends = bounds.chain([region.end as usize]);
    Some(Resplit {
        old: begin..last + 1,
        new: pieces
            .iter()
            .zip(ends)
            .map(|(line, end)| Piece::new(Span::new(line.start, end), Form::Listed))
            .collect(),
    })
}

fn first_line(text: &str, piece: &Piece) -> Option<Line> {
    Lines::new(text, piece.span.start as usize, piece.span.end as usize).next()
}

/// What may have to do with other pieces.
fn unsteady(text: &str) -> bool {
    memchr::memchr2(b'&', b'*', text.as_bytes()).is_some() || text.contains('\u{FEFF}')
}

/// How far the line of a key is indented.
fn column(text: &str, key: Span) -> Option<usize> {
    let before = text.get(..key.start as usize)?;
    let line = before.rfind(['\n', '\r']).map_or(0, |at| at + 1);
    let lead = before[line..].trim_start_matches('\u{FEFF}');
    lead.bytes().all(|byte| byte == b' ').then_some(lead.len())
}

/// Whether a line of the region begins or ends a document.
fn begins_document(text: &str, region: Span) -> bool {
    let mut at = region.start as usize;
    while at < region.end as usize {
        let rest = &text.as_bytes()[at..];
        let marker = rest.starts_with(b"---") || rest.starts_with(b"...");
        if marker && rest.get(3).is_none_or(u8::is_ascii_whitespace) {
            return true;
        }
        at = line_end(text, at);
    }
    false
}
