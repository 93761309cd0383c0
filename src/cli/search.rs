//! Finding the design files among the paths of the command line, and showing paths as the user wrote them.

use std::path::{Path, PathBuf};

use crate::lsp::folders::search;

/// The design files among some paths.
#[derive(Debug, Default)]
pub struct Found {
    /// Files in a fixed order, each once, by their real paths.
    pub files: Vec<PathBuf>,
    /// Folders that can't be searched, in words.
    pub troubles: Vec<String>,
    /// How real paths are shown.
    pub shown: Shown,
}

/// Real paths beside what the user wrote for them.
#[derive(Debug, Default)]
pub struct Shown(Vec<(PathBuf, PathBuf)>);

impl Shown {
    /// A path in the user's own words: beneath an argument as that was written, else relative to the current folder.
    pub fn path(&self, path: &Path) -> String {
        let best = self
            .0
            .iter()
            .filter_map(|(real, written)| Some((real, written, path.strip_prefix(real).ok()?)))
            .max_by_key(|(real, ..)| real.as_os_str().len());
        let shown = match best {
            Some((_, written, rest)) if rest.as_os_str().is_empty() => written.clone(),
            Some((_, written, rest)) if written == Path::new(".") => rest.to_path_buf(),
            Some((_, written, rest)) => written.join(rest),
            None => path.to_path_buf(),
        };
        shown.display().to_string()
    }
}

/// Design files among paths. Folders are searched, hidden ones left out; a file is taken whatever its name.
///
/// # Errors
/// In words, where a path leads to nothing.
pub fn designs(paths: &[PathBuf]) -> Result<Found, String> {
    let mut found = Found::default();
    let current = std::fs::canonicalize(".").ok();
    found.shown.0.extend(current.map(|real| (real, PathBuf::from("."))));
    for path in paths {
        let about = std::fs::metadata(path).map_err(|error| match error.kind() {
            std::io::ErrorKind::NotFound => format!("there is no file or folder `{}`", path.display()),
            _ => format!("{} can't be read: {error}", path.display()),
        })?;
        let real = std::fs::canonicalize(path).unwrap_or_else(|_| path.clone());
        if about.is_dir() {
            search(path, &mut found.files, &mut found.troubles);
        } else {
            found.files.push(path.clone());
        }
        found.shown.0.push((real, path.clone()));
    }
    for path in &mut found.files {
        // What can't be resolved is told when it is read.
        if let Ok(real) = std::fs::canonicalize(&*path) {
            *path = real;
        }
    }
    found.files.sort();
    found.files.dedup();
    Ok(found)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn paths_are_shown_as_they_were_written() {
        let shown = Shown(vec![
            (PathBuf::from("/site"), PathBuf::from(".")),
            (PathBuf::from("/site/mill/east"), PathBuf::from("mill/../mill/east")),
            (
                PathBuf::from("/other/a.steelwork.yaml"),
                PathBuf::from("../other/a.steelwork.yaml"),
            ),
        ]);
        let path = |path: &str| shown.path(Path::new(path));
        assert_eq!(path("/site/b.yaml"), "b.yaml");
        assert_eq!(path("/site/mill/east/b.yaml"), "mill/../mill/east/b.yaml");
        assert_eq!(path("/other/a.steelwork.yaml"), "../other/a.steelwork.yaml");
        assert_eq!(path("/else/c.yaml"), "/else/c.yaml");
    }
}
