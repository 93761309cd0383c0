//! A workspace that is checked again and again while its files change.

use std::path::{Path, PathBuf};
use std::sync::Arc;

use jiff::civil::Date;

use crate::analysis::design::{Design, FileIndex};
use crate::analysis::files::{Files, ReadTrouble};
use crate::analysis::load::{Kept, load_again};
use crate::analysis::memo::Memo;
use crate::check::live::{Cancelled, Live};

/// What was worked out of a workspace so far.
#[derive(Debug, Default)]
pub struct Session {
    kept: Kept,
    designs: Vec<Arc<Live>>,
    memo: Memo,
}

/// A workspace as it was checked.
#[derive(Debug, Clone, Default)]
pub struct Workspace {
    /// Its designs.
    pub designs: Vec<Arc<Live>>,
    /// Files that can't be read.
    pub troubles: Vec<(PathBuf, ReadTrouble)>,
}

impl Session {
    /// Checks the workspace of these files, on a date. `None` where the work was cancelled: what was known before stays
    /// known.
    pub fn check(
        &mut self,
        files: &dyn Files,
        paths: &[PathBuf],
        on: Date,
        cancelled: Cancelled<'_>,
    ) -> Option<Workspace> {
        let older: Vec<Arc<Design>> = self.designs.iter().map(|live| Arc::clone(&live.design)).collect();
        let (designs, troubles) = load_again(files, paths, &mut self.kept, &older);
        let mut checked = Vec::with_capacity(designs.len());
        let mut members = 0;
        for design in designs {
            members += design.members.len();
            let head = &design.files[0].path;
            let before = self.designs.iter().find(|live| live.design.files[0].path == *head);
            match before.filter(|live| live.is_of(&design, on)) {
                Some(live) => checked.push(Arc::clone(live)),
                None => {
                    let older = before.map(Arc::as_ref);
                    checked.push(Arc::new(Live::check(design, older, on, &self.memo, cancelled)?));
                }
            }
        }
        self.designs = checked;
        self.memo.settle(members);
        Some(Workspace {
            designs: self.designs.clone(),
            troubles,
        })
    }

    /// How many members were worked out, those known before not counted.
    #[must_use]
    pub fn evaluated(&self) -> u64 {
        self.memo.evaluated()
    }
}

impl Workspace {
    /// The design that a file belongs to, and its place there. Of several designs that share a library, the first.
    #[must_use]
    pub fn find(&self, path: &Path) -> Option<(&Arc<Live>, FileIndex)> {
        self.designs.iter().find_map(|live| {
            let file = live.design.files.iter().position(|file| **file.path == *path)?;
            Some((live, file))
        })
    }
}
