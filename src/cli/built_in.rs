//! The files of the built-in scenario, as the core asks for them.

use std::path::{Path, PathBuf};
use std::sync::Arc;

use crate::analysis::files::{Files, PathTrouble, ReadTrouble};
use crate::scenario;

/// The files of the built-in scenario.
pub struct BuiltIn;

impl Files for BuiltIn {
    fn follow(&self, _: &Path, relative: &str) -> Result<PathBuf, PathTrouble> {
        let known = scenario::FILES.iter().any(|(name, _)| *name == relative);
        if known {
            Ok(PathBuf::from(relative))
        } else {
            Err(PathTrouble::Missing)
        }
    }

    fn read(&self, path: &Path) -> Result<Arc<str>, ReadTrouble> {
        let found = scenario::FILES.iter().find(|(name, _)| Path::new(name) == path);
        found
            .map(|(_, text)| Arc::from(*text))
            .ok_or_else(|| ReadTrouble::System("no such file".to_owned()))
    }
}
