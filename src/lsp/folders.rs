//! The design files in folders.

use std::path::{Path, PathBuf};

use crate::analysis::read::kind_by_name;

/// Folders that hold what programs made, not what engineers wrote.
const SKIPPED: [&str; 2] = ["target", "node_modules"];

/// Adds the design files in a folder and in those below, hidden ones left out, and what can't be searched, in words.
pub fn search(folder: &Path, files: &mut Vec<PathBuf>, troubles: &mut Vec<String>) {
    let entries = match std::fs::read_dir(folder) {
        Ok(entries) => entries,
        Err(error) => {
            troubles.push(format!("{} can't be searched: {error}", folder.display()));
            return;
        }
    };
    for entry in entries.flatten() {
        let path = entry.path();
        let name = entry.file_name();
        let name = name.to_string_lossy();
        // A folder behind a symlink may lead in a circle, so only true folders are searched.
        if entry.file_type().is_ok_and(|kind| kind.is_dir()) {
            if !name.starts_with('.') && !SKIPPED.contains(&&*name) {
                search(&path, files, troubles);
            }
        } else if !path.is_dir() && kind_by_name(&path).is_some() {
            files.push(path);
        }
    }
}
