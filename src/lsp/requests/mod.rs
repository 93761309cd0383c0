//! Answers to requests: each takes what was asked to the editor's functions and their answer back to the protocol.

pub mod actions;
pub mod commands;
pub mod complete;
pub mod diagnose;
pub mod links;
pub mod names;
pub mod outline;
pub mod reading;

use std::path::{Path, PathBuf};
use std::sync::Arc;

use rustc_hash::FxHashMap;
use tower_lsp::jsonrpc::{Error, ErrorCode, Result};
use tower_lsp::lsp_types::{Location, Position, TextEdit, Url, WorkspaceEdit};

use crate::analysis::design::FileIndex;
use crate::check::live::Live;
use crate::editor::view::View;
use crate::findings::finding::{FixEdit, Place};
use crate::lsp::convert::Lines;
use crate::lsp::documents::path_of;
use crate::lsp::settings::Settings;
use crate::lsp::shared::{Shared, Snapshot, lock};

/// A question about a file of a checked design.
pub struct Asked {
    /// Everything as it was checked when the question came.
    pub snapshot: Arc<Snapshot>,
    /// The design.
    pub live: Arc<Live>,
    /// The file.
    pub file: FileIndex,
    /// Its lines.
    pub lines: Lines,
    /// What the user wants.
    pub settings: Settings,
}

impl Asked {
    /// The file as the editor's functions see it.
    pub fn view(&self) -> View<'_> {
        View {
            design: &self.live.design,
            outcomes: &self.live.outcomes,
            file: self.file,
        }
    }

    /// The offset of a position.
    pub fn offset(&self, position: Position) -> u32 {
        self.lines.offset(position)
    }
}

/// Answers a question about a document, once everything that came before it is checked; `None` for what is no design
/// file. A panic is fenced to the question.
///
/// # Errors
/// Where answering broke off.
pub async fn ask<T: Send + 'static>(
    shared: &Shared,
    uri: &Url,
    answer: impl FnOnce(&Asked) -> Option<T> + Send + 'static,
) -> Result<Option<T>> {
    let Some(path) = path_of(uri) else { return Ok(None) };
    let settings = *lock(&shared.settings);
    let Some(snapshot) = shared.current().await else {
        return Ok(None);
    };
    let found = snapshot.find(&path).map(|(live, file)| (Arc::clone(live), file));
    let Some((live, file)) = found else { return Ok(None) };
    fenced(move || {
        let asked = Asked {
            lines: snapshot.lines(&live, file),
            snapshot,
            live,
            file,
            settings,
        };
        answer(&asked)
    })
    .await
}

/// Answers a question about the whole workspace.
///
/// # Errors
/// Where answering broke off.
pub async fn ask_all<T: Send + 'static>(
    shared: &Shared,
    answer: impl FnOnce(&Arc<Snapshot>) -> Option<T> + Send + 'static,
) -> Result<Option<T>> {
    let Some(snapshot) = shared.current().await else {
        return Ok(None);
    };
    fenced(move || answer(&snapshot)).await
}

async fn fenced<T: Send + 'static>(answer: impl FnOnce() -> Option<T> + Send + 'static) -> Result<Option<T>> {
    tokio::task::spawn_blocking(answer).await.map_err(|_| Error {
        code: ErrorCode::InternalError,
        message: "the answer broke off; please report what was asked".into(),
        data: None,
    })
}

/// The lines of any file of the workspace, each made once.
pub struct AllLines<'a> {
    snapshot: &'a Snapshot,
    known: FxHashMap<PathBuf, Option<(Url, Lines)>>,
}

impl<'a> AllLines<'a> {
    /// None is made yet.
    pub fn of(snapshot: &'a Snapshot) -> Self {
        Self {
            snapshot,
            known: FxHashMap::default(),
        }
    }

    fn file(&mut self, path: &Path) -> Option<&(Url, Lines)> {
        let snapshot = self.snapshot;
        let known = self.known.entry(path.to_path_buf()).or_insert_with(|| {
            let (live, file) = snapshot.find(path)?;
            Some((snapshot.uri(path)?, snapshot.lines(live, file)))
        });
        known.as_ref()
    }

    /// A place in the terms of the protocol.
    pub fn location(&mut self, place: &Place) -> Option<Location> {
        let (uri, lines) = self.file(&place.path)?;
        Some(Location::new(uri.clone(), lines.range(place.span)))
    }

    /// Edits in the terms of the protocol.
    pub fn edit(&mut self, edits: &[FixEdit]) -> Option<WorkspaceEdit> {
        let mut changes: std::collections::HashMap<Url, Vec<TextEdit>> = std::collections::HashMap::new();
        for edit in edits {
            let (uri, lines) = self.file(&edit.place.path)?;
            let text = TextEdit::new(lines.range(edit.place.span), edit.text.clone());
            changes.entry(uri.clone()).or_default().push(text);
        }
        Some(WorkspaceEdit::new(changes))
    }
}
