//! What surrounds the members of a design, before and after a change: head, groups, products and fires.

use std::sync::Arc;

use crate::analysis::design::Design;
use crate::analysis::source::{Item, SourceFile};
use crate::design::model::head::Head;

/// What has become of the surroundings.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Around {
    /// They are the same, in the same places.
    Same,
    /// They say the same for every member, perhaps in other places or other words.
    Alike,
    /// Members may have other outcomes.
    Changed,
}

/// Compares the surroundings of two versions of a design.
pub(super) fn compare(old: &Design, new: &Design) -> Around {
    let paths = |design: &Design| {
        design
            .files
            .iter()
            .map(|file| Arc::clone(&file.path))
            .collect::<Vec<_>>()
    };
    if old.files.len() != new.files.len() || paths(old) != paths(new) {
        return Around::Changed;
    }
    let files = old.files.iter().zip(&new.files);
    let changed = files.filter(|(old, new)| !Arc::ptr_eq(old, new));
    changed.fold(Around::Same, |around, (old, new)| match (around, file(old, new)) {
        (Around::Changed, _) | (_, Around::Changed) => Around::Changed,
        (Around::Alike, _) | (_, Around::Alike) => Around::Alike,
        _ => Around::Same,
    })
}

fn file(old: &SourceFile, new: &SourceFile) -> Around {
    if old.kind != new.kind || !heads(&old.head, &new.head) {
        return Around::Changed;
    }
    let groups = items(&old.groups, &new.groups);
    let products = items(&old.products, &new.products);
    if groups == Around::Changed || products == Around::Changed {
        return Around::Changed;
    }
    let places = |file: &SourceFile| file.entries.iter().map(|piece| piece.span).collect::<Vec<_>>();
    let entries = old.entries.iter().zip(&new.entries);
    let mut same = entries.map(|(a, b)| a.span.slice(&old.text) == b.span.slice(&new.text));
    if groups == Around::Same && products == Around::Same && places(old) == places(new) && same.all(|same| same) {
        Around::Same
    } else {
        Around::Alike
    }
}

/// Whether two heads say the same for every member. Headings and links say nothing of one.
fn heads(old: &Head, new: &Head) -> bool {
    old.basis == new.basis && old.defaults == new.defaults && old.fires == new.fires && old.doubtful == new.doubtful
}

fn items<T: PartialEq>(old: &[Item<T>], new: &[Item<T>]) -> Around {
    if old.len() != new.len() {
        return Around::Changed;
    }
    old.iter().zip(new).fold(Around::Same, |around, (old, new)| {
        let one = Arc::ptr_eq(&old.decoded, &new.decoded);
        let alike = one || old.value() == new.value() && old.is_broken() == new.is_broken();
        match around {
            _ if !alike => Around::Changed,
            Around::Same if one && old.base() == new.base() => Around::Same,
            Around::Changed => Around::Changed,
            _ => Around::Alike,
        }
    })
}
