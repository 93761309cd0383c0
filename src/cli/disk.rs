//! Files on disk, and those of the built-in scenario.

use std::path::{Component, Path, PathBuf};
use std::sync::Arc;

use crate::analysis::files::{Files, PathTrouble, ReadTrouble};
use crate::analysis::read::kind_by_name;
use crate::scenario;
use crate::syntax::MAX_BYTES;
use crate::text::decode;

/// Files on disk.
pub struct Disk;

/// The workspace of a file: the nearest folder upward that holds `.git`, else its own folder.
fn workspace(file: &Path) -> PathBuf {
    let folder = file.parent().unwrap_or(Path::new("."));
    let folder = std::fs::canonicalize(folder).unwrap_or_else(|_| folder.to_path_buf());
    folder
        .ancestors()
        .find(|above| above.join(".git").exists())
        .unwrap_or(&folder)
        .to_path_buf()
}

impl Files for Disk {
    fn follow(&self, from: &Path, relative: &str) -> Result<PathBuf, PathTrouble> {
        let wanted = Path::new(relative);
        if wanted.is_absolute() || relative.starts_with('\\') {
            return Err(PathTrouble::Outside("by an absolute path"));
        }
        let root = workspace(from);
        let folder = from.parent().unwrap_or(Path::new("."));
        let folder = std::fs::canonicalize(folder).map_err(|error| PathTrouble::Unreadable(error.to_string()))?;
        let mut path = folder;
        for part in wanted.components() {
            match part {
                Component::ParentDir => {
                    path.pop();
                    if !path.starts_with(&root) {
                        return Err(PathTrouble::Outside("by `..`"));
                    }
                }
                Component::Normal(name) => path.push(name),
                _ => {}
            }
        }
        match std::fs::canonicalize(&path) {
            Ok(real) if !real.starts_with(&root) => Err(PathTrouble::Outside("by a symlink")),
            Ok(real) if real.is_file() => Ok(real),
            Ok(_) => Err(PathTrouble::Unreadable("it is no file".to_owned())),
            Err(error) if error.kind() == std::io::ErrorKind::NotFound => Err(PathTrouble::Missing),
            Err(error) => Err(PathTrouble::Unreadable(error.to_string())),
        }
    }

    fn read(&self, path: &Path) -> Result<Arc<str>, ReadTrouble> {
        let system = |error: std::io::Error| ReadTrouble::System(error.to_string());
        let size = std::fs::metadata(path).map_err(system)?.len();
        if size > MAX_BYTES {
            return Err(ReadTrouble::TooLarge { size, limit: MAX_BYTES });
        }
        let bytes = std::fs::read(path).map_err(system)?;
        decode(bytes).map(Arc::from).map_err(ReadTrouble::Encoding)
    }
}

/// Design files among paths; folders are searched, hidden ones left out.
pub fn designs(paths: &[PathBuf]) -> Result<Vec<PathBuf>, String> {
    let mut found = Vec::new();
    for path in paths {
        if path.is_dir() {
            search(path, &mut found);
        } else if path.exists() {
            found.push(path.clone());
        } else {
            return Err(format!("there is no file or folder `{}`", path.display()));
        }
    }
    let mut real: Vec<PathBuf> = found
        .iter()
        .filter_map(|path| std::fs::canonicalize(path).ok())
        .collect();
    real.sort();
    real.dedup();
    Ok(real)
}

fn search(folder: &Path, found: &mut Vec<PathBuf>) {
    let Ok(entries) = std::fs::read_dir(folder) else { return };
    for entry in entries.flatten() {
        let path = entry.path();
        let name = entry.file_name();
        let hidden = name.to_string_lossy().starts_with('.') || name == "target" || name == "node_modules";
        // A folder behind a symlink may lead in a circle.
        let kind = entry.file_type();
        if kind.as_ref().is_ok_and(std::fs::FileType::is_dir) && !hidden {
            search(&path, found);
        } else if path.is_file() && kind_by_name(&path).is_some() {
            found.push(path);
        }
    }
}

/// The files of the built-in scenario.
pub struct Scenario;

impl Files for Scenario {
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
