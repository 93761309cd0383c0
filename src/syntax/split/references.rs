//! Aliases that reach from one piece to another, and tags that a `%TAG` line declares.

use rustc_hash::{FxHashMap, FxHashSet};

use super::read_now;
use crate::syntax::outline::{Piece, TopEntry};
use crate::syntax::parse::Surroundings;
use crate::text::Span;

/// Reads at once the pieces whose text alone does not tell their value.
///
/// A rough look finds what may be an anchor or alias; one in a comment or quoted text only costs time.
pub(super) fn resolve(text: &str, entries: &mut [TopEntry], shared: &mut Surroundings) {
    let mut wanted = FxHashSet::default();
    let mut pieces: Vec<&mut Piece> = entries
        .iter_mut()
        .flat_map(|entry| match entry {
            TopEntry::Head(piece) => std::slice::from_mut(piece),
            TopEntry::List(list) => list.items.as_mut_slice(),
        })
        .collect();
    let starts: Vec<u32> = pieces.iter().map(|piece| piece.span.start).collect();
    let owner = |at: usize| starts.partition_point(|start| *start as usize <= at).saturating_sub(1);
    let (anchors, aliases) = candidates(text);
    if !anchors.is_empty() && !aliases.is_empty() {
        let mut homes: FxHashMap<&str, Vec<usize>> = FxHashMap::default();
        for (at, name) in anchors {
            homes.entry(name).or_default().push(owner(at));
        }
        for (at, name) in aliases {
            let here = owner(at);
            let Some(homes) = homes.get(name) else { continue };
            if homes.iter().any(|home| *home != here) {
                wanted.insert(here);
                wanted.extend(homes.iter().copied().filter(|home| *home < here));
            }
        }
    }
    if !shared.directives.is_empty() {
        let tagged = |piece: &&mut Piece| piece.span.slice(text).contains('!');
        wanted.extend(
            pieces
                .iter()
                .enumerate()
                .filter(|(_, piece)| tagged(piece))
                .map(|(at, _)| at),
        );
    }
    let mut wanted: Vec<usize> = wanted.into_iter().collect();
    wanted.sort_unstable();
    // An anchor's value may itself hold aliases, whose homes are wanted then: those were found above as well.
    for at in wanted {
        if let Some(piece) = pieces.get_mut(at) {
            **piece = read_now(text, piece, shared);
        }
    }
}

type Places<'a> = Vec<(usize, &'a str)>;

/// What may be anchors and aliases, each with its offset and name.
fn candidates(text: &str) -> (Places<'_>, Places<'_>) {
    let bytes = text.as_bytes();
    let (mut anchors, mut aliases) = (Vec::new(), Vec::new());
    for at in memchr::memchr2_iter(b'&', b'*', bytes) {
        let before = at.checked_sub(1).map_or(b' ', |at| bytes[at]);
        if before.is_ascii_alphanumeric() || before >= 0x80 {
            continue;
        }
        let rest = &bytes[at + 1..];
        let length = rest
            .iter()
            .position(|b| b.is_ascii_whitespace() || b",[]{}".contains(b))
            .unwrap_or(rest.len());
        let name = Span::new(at + 1, at + 1 + length).slice(text);
        if !name.is_empty() {
            let places = if bytes[at] == b'&' { &mut anchors } else { &mut aliases };
            places.push((at, name));
        }
    }
    (anchors, aliases)
}
