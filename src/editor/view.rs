//! A file of a checked design as the functions of the editor see it.

use std::sync::Arc;

use crate::analysis::design::{Design, FileIndex, MemberAt};
use crate::analysis::outcome::Outcome;
use crate::analysis::source::{Item, SourceFile};
use crate::syntax::Tree;
use crate::syntax::outline::Piece;

/// A file of a checked design.
#[derive(Debug, Clone, Copy)]
pub struct View<'a> {
    /// The design.
    pub design: &'a Design,
    /// Outcomes in the order of the design's members.
    pub outcomes: &'a [Arc<Outcome>],
    /// The file looked at.
    pub file: FileIndex,
}

/// What an offset lies in.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Within {
    /// The member of this index in the file.
    Member(usize),
    /// The group of this index in the file.
    Group(usize),
    /// The product of this index in the file.
    Product(usize),
    /// The entry of the top level of this index in the file.
    Entry(usize),
    /// None of these.
    Nothing,
}

impl<'a> View<'a> {
    /// The file.
    #[must_use]
    pub fn source(&self) -> &'a SourceFile {
        &self.design.files[self.file]
    }

    /// Its text.
    #[must_use]
    pub fn text(&self) -> &'a str {
        &self.source().text
    }

    /// What an offset lies in. An item reaches to the start of the next one.
    #[must_use]
    pub fn within(&self, offset: u32) -> Within {
        let source = self.source();
        if let Some(index) = holding(&source.members, offset) {
            return Within::Member(index);
        }
        if let Some(index) = holding(&source.groups, offset) {
            return Within::Group(index);
        }
        if let Some(index) = holding(&source.products, offset) {
            return Within::Product(index);
        }
        let entry = source.entries.iter().position(|piece| holds(piece, offset));
        entry.map_or(Within::Nothing, Within::Entry)
    }

    /// The piece of the file that an offset lies in.
    #[must_use]
    pub fn piece(&self, within: Within) -> Option<&'a Piece> {
        let source = self.source();
        match within {
            Within::Member(index) => source.members.get(index).map(|item| &item.piece),
            Within::Group(index) => source.groups.get(index).map(|item| &item.piece),
            Within::Product(index) => source.products.get(index).map(|item| &item.piece),
            Within::Entry(index) => source.entries.get(index),
            Within::Nothing => None,
        }
    }

    /// The tree of a piece and the offset that its spans count from.
    #[must_use]
    pub fn tree(&self, within: Within) -> Option<(Tree, u32)> {
        let piece = self.piece(within)?;
        Some((piece.tree(self.text()), piece.span.start))
    }

    /// What the analysis says of a member.
    #[must_use]
    pub fn outcome(&self, at: MemberAt) -> Option<&'a Arc<Outcome>> {
        let place = self.design.members.binary_search(&at).ok()?;
        self.outcomes.get(place)
    }
}

/// Items stand in the order of the text, so that the one around an offset is found by halving.
fn holding<T>(items: &[Item<T>], offset: u32) -> Option<usize> {
    let after = items.partition_point(|item| item.base() <= offset);
    let index = after.checked_sub(1)?;
    holds(&items[index].piece, offset).then_some(index)
}

fn holds(piece: &Piece, offset: u32) -> bool {
    piece.span.touches(offset)
}
