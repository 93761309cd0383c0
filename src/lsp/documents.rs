//! The documents that the editor has open.

use std::path::{Path, PathBuf};
use std::time::Instant;

use rustc_hash::FxHashMap;
use tower_lsp::lsp_types::{TextDocumentContentChangeEvent, Url};

use crate::lsp::convert;
use crate::text::{Buffer, Change, Encoding, Position};

/// An open document.
#[derive(Debug, Clone)]
pub struct Document {
    /// How the editor calls it.
    pub uri: Url,
    /// The editor's number of this version.
    pub version: i32,
    /// The generation in which its text changed last: unlike versions, no two texts share one.
    pub changed: u64,
    /// Its text.
    pub buffer: Buffer,
    /// The last edit since it was opened or saved.
    pub edited: Option<Edited>,
}

/// An edit.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Edited {
    /// The line on which it ended.
    pub line: u32,
    /// When it came.
    pub at: Instant,
}

/// What the editor has open, and a number that grows with every change of it.
#[derive(Debug, Default)]
pub struct Documents {
    /// Documents by path.
    pub open: FxHashMap<PathBuf, Document>,
    /// Folders that the editor has open.
    pub folders: Vec<PathBuf>,
    /// Grows with every change of the documents, the folders or the files on disk.
    pub generation: u64,
    /// Grows where files may have come or gone.
    pub listing: u64,
    /// Files that are said to have changed on disk: their time and size may not show it.
    pub changed_on_disk: Vec<PathBuf>,
}

impl Documents {
    /// Applies changes in their order.
    pub fn change(
        &mut self,
        path: &Path,
        version: i32,
        changes: Vec<TextDocumentContentChangeEvent>,
        encoding: Encoding,
    ) {
        let generation = self.generation;
        let Some(document) = self.open.get_mut(path) else {
            return;
        };
        for change in changes {
            let line = match change.range {
                Some(range) => {
                    let (start, end) = (convert::position(range.start), convert::position(range.end));
                    document.buffer.replace(start, end, encoding, &change.text);
                    start.line + lines(&change.text)
                }
                None => {
                    let old = document.buffer.text();
                    document.buffer = Buffer::new(&change.text);
                    let Some(change) = Change::between(&old, &change.text) else {
                        continue;
                    };
                    document.buffer.position(change.at + change.added, Encoding::Utf8).line
                }
            };
            document.edited = Some(Edited {
                line,
                at: Instant::now(),
            });
        }
        document.version = version;
        document.changed = generation;
    }
}

/// How many line breaks a text has.
fn lines(text: &str) -> u32 {
    let buffer = Buffer::new(text);
    let Position { line, .. } = buffer.position(text.len(), Encoding::Utf8);
    line
}

/// The real path of a document, whether it is on disk yet or not; `None` for what is no file.
pub fn path_of(uri: &Url) -> Option<PathBuf> {
    let path = uri.to_file_path().ok()?;
    if let Ok(real) = std::fs::canonicalize(&path) {
        return Some(real);
    }
    let folder = std::fs::canonicalize(path.parent()?).ok();
    Some(match (folder, path.file_name()) {
        (Some(folder), Some(name)) => folder.join(name),
        _ => path,
    })
}
