//! Reading a changed text again: what a change does not touch is kept.

use std::sync::Arc;

use crate::analysis::read::{member_item, read_beside};
use crate::analysis::source::{Item, SourceFile};
use crate::syntax::outline::{Piece, again};
use crate::text::Change;

/// Reads the new text of a file. Where the change lies within its members, only those that it touches are split and
/// decoded again; otherwise the file is split whole, and equal pieces keep what was read of them.
#[must_use]
pub fn reread(old: &SourceFile, text: Arc<str>) -> SourceFile {
    let Some(change) = Change::between(&old.text, &text) else {
        return SourceFile { text, ..old.clone() };
    };
    within_members(old, &text, change).unwrap_or_else(|| read_products_once(old, text))
}

fn within_members(old: &SourceFile, text: &Arc<str>, change: Change) -> Option<SourceFile> {
    let key = old.steady?;
    let behind = |start: u32| start as usize > change.at;
    // What stands behind the members outside any list, and what is said of it, is read with spans of the file.
    if old.entries.iter().any(|piece| behind(piece.span.start))
        || old.slips.iter().any(|slip| behind(slip.span.end))
        || old.errors.iter().any(|error| behind(error.span.end))
    {
        return None;
    }
    let pieces: Vec<&Piece> = old.members.iter().map(|item| &item.piece).collect();
    let resplit = again(&old.text, text, change, key, &pieces)?;
    let moved = |start: u32| {
        let start = start as usize - change.removed + change.added;
        u32::try_from(start).unwrap_or(u32::MAX)
    };
    let gone = &old.members[resplit.old.clone()];
    let mut members = Vec::with_capacity(old.members.len() + resplit.new.len());
    members.extend_from_slice(&old.members[..resplit.old.start]);
    members.extend(resplit.new.into_iter().map(|piece| {
        let own = piece.span.slice(text);
        let known = gone.iter().find(|item| item.piece.span.slice(&old.text) == own);
        let decoded = known.map_or_else(
            || Arc::new(member_item(piece.tree(text))),
            |item| Arc::clone(&item.decoded),
        );
        Item { piece, decoded }
    }));
    let rest = &old.members[resplit.old.end..];
    members.extend(rest.iter().map(|item| item.moved(moved(item.base()))));
    Some(SourceFile {
        path: Arc::clone(&old.path),
        text: Arc::clone(text),
        kind: old.kind,
        entries: old.entries.clone(),
        head: old.head.clone(),
        groups: behind_members(&old.groups, behind, moved),
        members,
        products: behind_members(&old.products, behind, moved),
        slips: old.slips.clone(),
        errors: old.errors.clone(),
        steady: old.steady,
    })
}

fn behind_members<T>(items: &[Item<T>], behind: impl Fn(u32) -> bool, moved: impl Fn(u32) -> u32) -> Vec<Item<T>> {
    let item = |item: &Item<T>| {
        if behind(item.base()) {
            item.moved(moved(item.base()))
        } else {
            item.clone()
        }
    };
    items.iter().map(item).collect()
}

/// Reads the file whole. A product whose data are what they were keeps its place in memory, by which outcomes are kept.
fn read_products_once(old: &SourceFile, text: Arc<str>) -> SourceFile {
    let mut file = read_beside(Arc::clone(&old.path), text, Some(old));
    for item in &mut file.products {
        let Some(decoded) = Arc::get_mut(&mut item.decoded) else {
            continue;
        };
        let Some(product) = &mut decoded.value.product else {
            continue;
        };
        let known = old.products.iter().filter_map(|item| item.value().product.as_ref());
        if let Some(known) = known.into_iter().find(|known| *known == product) {
            *product = Arc::clone(known);
        }
    }
    file
}
