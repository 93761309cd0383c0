//! What the core asks of the outside: the text of a file, and where a relative path leads.

use std::path::{Path, PathBuf};
use std::sync::Arc;

use crate::text::DecodeError;

/// Why a path that a file names can't be followed.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum PathTrouble {
    /// It leads out of the workspace; how, in words ("by `..`", "by an absolute path", "by a symlink").
    Outside(&'static str),
    /// There is no such file.
    Missing,
    /// It can't be read; the system's words.
    Unreadable(String),
}

/// Why a file's text can't be had.
#[derive(Debug, Clone, PartialEq)]
pub enum ReadTrouble {
    /// The system refused; its words.
    System(String),
    /// The bytes are no text that YAML allows.
    Encoding(DecodeError),
    /// The file is larger than what is read; its size and the limit in bytes.
    TooLarge {
        /// Size of the file.
        size: u64,
        /// The limit.
        limit: u64,
    },
}

impl std::fmt::Display for ReadTrouble {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        match self {
            Self::System(words) => f.write_str(words),
            Self::Encoding(error) => error.fmt(f),
            Self::TooLarge { size, limit } => write!(f, "it has {size} bytes; at most {limit} are read"),
        }
    }
}

/// Files as the command line or an editor has them.
pub trait Files: Sync {
    /// Follows `relative`, a path named in the file `from`, inside the workspace.
    ///
    /// # Errors
    /// [`PathTrouble`], where it leads out of the workspace or to nothing.
    fn follow(&self, from: &Path, relative: &str) -> Result<PathBuf, PathTrouble>;

    /// The text of a file.
    ///
    /// # Errors
    /// [`ReadTrouble`], where it can't be read.
    fn read(&self, path: &Path) -> Result<Arc<str>, ReadTrouble>;
}
