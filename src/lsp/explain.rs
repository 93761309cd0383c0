//! The explanations of findings as files, so that an editor can open what a diagnostic links to.

use std::path::PathBuf;

use tower_lsp::lsp_types::{CodeDescription, Url};

use crate::findings::registry::REGISTRY;
use crate::report::why::explanation;

/// Where the explanations are written: the user's own folder of files that can be made anew.
fn folder() -> Option<PathBuf> {
    let set = |name: &str| {
        std::env::var_os(name)
            .filter(|value| !value.is_empty())
            .map(PathBuf::from)
    };
    let caches = set("XDG_CACHE_HOME").or_else(|| Some(set("HOME")?.join(".cache")))?;
    Some(caches.join("scorchline").join(env!("CARGO_PKG_VERSION")).join("why"))
}

/// Writes the explanation of every finding; answers the folder, or `None` where it can't be written.
pub fn write() -> Option<PathBuf> {
    let folder = folder()?;
    std::fs::create_dir_all(&folder).ok()?;
    for declaration in REGISTRY {
        let (path, text) = (
            folder.join(format!("{}.txt", declaration.name)),
            explanation(declaration),
        );
        if std::fs::read_to_string(&path).ok().as_deref() != Some(&*text) {
            std::fs::write(&path, text).ok()?;
        }
    }
    Some(folder)
}

/// The link to the explanation of a finding.
pub fn link(folder: &std::path::Path, name: &str) -> Option<CodeDescription> {
    let href = Url::from_file_path(folder.join(format!("{name}.txt"))).ok()?;
    Some(CodeDescription { href })
}
