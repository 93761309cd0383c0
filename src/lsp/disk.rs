//! Files on disk, as the core asks for them.

use std::io::Read;
use std::path::{Component, Path, PathBuf};
use std::sync::Arc;

use crate::analysis::files::{Files, PathTrouble, ReadTrouble};
use crate::syntax::MAX_BYTES;
use crate::text::decode;

/// Files on disk.
#[derive(Debug, Default)]
pub struct Disk {
    /// Folders that an editor has open; real paths.
    pub folders: Vec<PathBuf>,
}

/// The workspace of a file: the nearest folder upward that holds `.git`, else the outermost folder of the editor's that
/// holds the file, else its own folder.
fn workspace(file: &Path, folders: &[PathBuf]) -> PathBuf {
    let folder = file.parent().unwrap_or(Path::new("."));
    let folder = std::fs::canonicalize(folder).unwrap_or_else(|_| folder.to_path_buf());
    let versioned = folder.ancestors().find(|above| above.join(".git").exists());
    let open = folders.iter().filter(|open| folder.starts_with(open));
    let outermost = open.min_by_key(|open| open.as_os_str().len());
    versioned
        .or(outermost.map(PathBuf::as_path))
        .unwrap_or(&folder)
        .to_path_buf()
}

impl Disk {
    /// Where a relative path leads by its words, and the workspace that it must stay in.
    fn place(&self, from: &Path, relative: &str) -> Result<(PathBuf, PathBuf), PathTrouble> {
        let wanted = Path::new(relative);
        if wanted.is_absolute() || wanted.has_root() || relative.starts_with('\\') {
            return Err(PathTrouble::Outside("by an absolute path"));
        }
        let root = workspace(from, &self.folders);
        let folder = from.parent().unwrap_or(Path::new("."));
        let mut path = std::fs::canonicalize(folder).map_err(|error| PathTrouble::Unreadable(error.to_string()))?;
        for part in wanted.components() {
            match part {
                Component::ParentDir => {
                    path.pop();
                    if !path.starts_with(&root) {
                        return Err(PathTrouble::Outside("by `..`"));
                    }
                }
                Component::Normal(name) => path.push(name),
                Component::CurDir => {}
                Component::Prefix(_) | Component::RootDir => return Err(PathTrouble::Outside("by an absolute path")),
            }
        }
        Ok((path, root))
    }

    /// Where a relative path leads, whether a file is there or not yet.
    ///
    /// # Errors
    /// [`PathTrouble`], where it leads out of the workspace.
    pub fn target(&self, from: &Path, relative: &str) -> Result<PathBuf, PathTrouble> {
        self.place(from, relative).map(|(path, _)| path)
    }
}

impl Files for Disk {
    fn follow(&self, from: &Path, relative: &str) -> Result<PathBuf, PathTrouble> {
        let (path, root) = self.place(from, relative)?;
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
        let about = std::fs::metadata(path).map_err(system)?;
        // A device or a pipe may never end.
        if !about.is_file() {
            return Err(ReadTrouble::System("it is no file".to_owned()));
        }
        let too_large = |size| ReadTrouble::TooLarge { size, limit: MAX_BYTES };
        if about.len() > MAX_BYTES {
            return Err(too_large(about.len()));
        }
        // Some files hold more than the size they give.
        let mut bytes = Vec::with_capacity(usize::try_from(about.len()).unwrap_or(0));
        let file = std::fs::File::open(path).map_err(system)?;
        file.take(MAX_BYTES + 1).read_to_end(&mut bytes).map_err(system)?;
        if bytes.len() as u64 > MAX_BYTES {
            return Err(too_large(bytes.len() as u64));
        }
        decode(bytes).map(Arc::from).map_err(ReadTrouble::Encoding)
    }
}
