//! A design: a head file with its parts and libraries, and the names that hold throughout it.

use std::sync::Arc;

use rustc_hash::FxHashMap;

use crate::analysis::files::{PathTrouble, ReadTrouble};
use crate::analysis::source::{FileKind, Item, SourceFile};
use crate::design::inherit::Inherited;
use crate::design::model::head::{Basis, Group, Head, Project};
use crate::design::model::library::NamedProduct;
use crate::design::model::member::Member;
use crate::heating::fire::Fire;
use crate::text::Span;
use crate::units::DisplayUnits;

/// Index of a file in [`Design::files`].
pub type FileIndex = usize;

/// A member's place: its file and its index there.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub struct MemberAt {
    /// The file.
    pub file: FileIndex,
    /// Index in the file's members.
    pub index: usize,
}

/// Something wrong between files: a path that leads nowhere or out, a cycle, a part without its head.
#[derive(Debug, Clone, PartialEq)]
pub struct LinkTrouble {
    /// The file that names the other.
    pub file: FileIndex,
    /// The path's characters in it.
    pub span: Span,
    /// The path as written.
    pub written: String,
    /// What is wrong.
    pub kind: LinkKind,
}

/// What is wrong with a path to another file.
#[derive(Debug, Clone, PartialEq)]
pub enum LinkKind {
    /// It can't be followed.
    Path(PathTrouble),
    /// It can't be read.
    Read(ReadTrouble),
    /// It closes a cycle.
    Cycle,
    /// It is a file of another kind than is wanted; the kind wanted.
    OtherKind(FileKind),
    /// The head lists a part that does not name it by `part of`.
    PartNamesNoHead,
    /// A part names a head that does not list it under `parts`.
    HeadListsNoPart,
    /// The part belongs to two heads; the other one's path.
    TwoHeads(String),
}

/// A design, ready to be checked.
#[derive(Debug)]
pub struct Design {
    /// Files: the head first, then its parts, then the libraries.
    pub files: Vec<Arc<SourceFile>>,
    /// Every member of head and parts in order.
    pub members: Arc<Vec<MemberAt>>,
    /// Members by mark; the first that carries it.
    pub marks: Arc<FxHashMap<String, MemberAt>>,
    /// Whether a mark stands twice.
    pub repeated: bool,
    /// Groups by name: file and index there.
    pub groups: FxHashMap<String, (FileIndex, usize)>,
    /// Products by name: file and index there.
    pub products: FxHashMap<String, (FileIndex, usize)>,
    /// Fires by name, the built-in ones included.
    pub fires: FxHashMap<String, Option<Arc<Fire>>>,
    /// What is wrong between files.
    pub troubles: Vec<LinkTrouble>,
}

impl Design {
    /// The head file's own keys.
    #[must_use]
    pub fn head(&self) -> &Head {
        &self.files[0].head
    }

    /// The basis of design.
    #[must_use]
    pub fn basis(&self) -> &Basis {
        &self.head().basis
    }

    /// The units that its messages and papers are in.
    #[must_use]
    pub fn units(&self) -> DisplayUnits {
        if self.basis().imperial {
            DisplayUnits::Imperial
        } else {
            DisplayUnits::Metric
        }
    }

    /// The headings of the papers.
    #[must_use]
    pub fn project(&self) -> &Project {
        &self.head().project
    }

    /// A member's item.
    #[must_use]
    pub fn member(&self, at: MemberAt) -> &Item<Member> {
        &self.files[at.file].members[at.index]
    }

    /// A group by name.
    #[must_use]
    pub fn group(&self, name: &str) -> Option<(FileIndex, &Item<Group>)> {
        self.groups
            .get(name)
            .map(|(file, index)| (*file, &self.files[*file].groups[*index]))
    }

    /// A product by name.
    #[must_use]
    pub fn product(&self, name: &str) -> Option<(FileIndex, &Item<NamedProduct>)> {
        self.products
            .get(name)
            .map(|(file, index)| (*file, &self.files[*file].products[*index]))
    }

    /// A member's keys with those of its group and the defaults.
    #[must_use]
    pub fn inherited<'a>(&'a self, member: &'a Member) -> Inherited<'a> {
        let group = member.keys.group.value().or_else(|| self.head().defaults.group.value());
        Inherited {
            member: &member.keys,
            group: group
                .and_then(|name| self.group(name))
                .map(|(_, item)| &item.value().keys),
            defaults: Some(&self.head().defaults),
        }
    }
}
