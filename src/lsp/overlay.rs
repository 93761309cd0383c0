//! Files as the editor has them: its own texts first, those on disk else.

use std::path::{Path, PathBuf};
use std::sync::{Arc, Mutex, PoisonError};
use std::time::SystemTime;

use rustc_hash::FxHashMap;

use crate::analysis::files::{Files, PathTrouble, ReadTrouble};
use crate::lsp::disk::Disk;

/// When a file was changed, and its size: while both stay, its text is not read again.
type Stamp = (Option<SystemTime>, u64);

/// A text as it was read from disk, and the stamp of its file then.
type ReadText = (Stamp, Result<Arc<str>, ReadTrouble>);

/// Files on disk beneath the texts of the editor.
#[derive(Debug, Default)]
pub struct Overlay {
    /// Files on disk.
    pub disk: Disk,
    /// Texts of the editor.
    pub open: FxHashMap<PathBuf, Arc<str>>,
    read: Mutex<FxHashMap<PathBuf, ReadText>>,
}

fn stamp(path: &Path) -> Option<Stamp> {
    let about = std::fs::metadata(path).ok()?;
    Some((about.modified().ok(), about.len()))
}

impl Overlay {
    /// Whether a file that was read from disk has changed there since.
    pub fn is_stale(&self) -> bool {
        let read = self.read.lock().unwrap_or_else(PoisonError::into_inner);
        read.iter().any(|(path, (then, _))| stamp(path) != Some(*then))
    }

    /// Forgets what was read of files that are said to have changed.
    pub fn forget(&self, paths: &[PathBuf]) {
        let mut read = self.read.lock().unwrap_or_else(PoisonError::into_inner);
        for path in paths {
            read.remove(path);
        }
    }

    /// Forgets what was read of files that nobody asks for any more.
    pub fn keep(&self, paths: &rustc_hash::FxHashSet<PathBuf>) {
        let mut read = self.read.lock().unwrap_or_else(PoisonError::into_inner);
        read.retain(|path, _| paths.contains(path));
    }
}

impl Files for Overlay {
    fn follow(&self, from: &Path, relative: &str) -> Result<PathBuf, PathTrouble> {
        match self.disk.follow(from, relative) {
            // A file that the editor has and has not saved yet.
            Err(PathTrouble::Missing) => {
                let path = self.disk.target(from, relative)?;
                if self.open.contains_key(&path) {
                    Ok(path)
                } else {
                    Err(PathTrouble::Missing)
                }
            }
            other => other,
        }
    }

    fn read(&self, path: &Path) -> Result<Arc<str>, ReadTrouble> {
        if let Some(text) = self.open.get(path) {
            return Ok(Arc::clone(text));
        }
        let now = stamp(path);
        let mut read = self.read.lock().unwrap_or_else(PoisonError::into_inner);
        if let (Some((then, text)), Some(now)) = (read.get(path), now)
            && *then == now
        {
            return text.clone();
        }
        let text = self.disk.read(path);
        if let Some(now) = now {
            read.insert(path.to_path_buf(), (now, text.clone()));
        }
        text
    }
}
