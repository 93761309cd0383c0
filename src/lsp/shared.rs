//! What the handlers and the worker share.

use std::path::PathBuf;
use std::sync::{Arc, Mutex, MutexGuard, PoisonError};

use rustc_hash::FxHashMap;
use tokio::sync::watch;
use tower_lsp::lsp_types::Url;

use crate::analysis::design::FileIndex;
use crate::check::live::Live;
use crate::check::session::Workspace;
use crate::lsp::convert::{self, Lines};
use crate::lsp::documents::{Document, Documents};
use crate::lsp::settings::{Client, Settings};
use crate::text::LineIndex;

/// What the handlers and the worker share.
#[derive(Debug)]
pub struct Shared {
    documents: Mutex<Documents>,
    /// What the editor can do, once it has said so.
    pub client: Mutex<Client>,
    /// What the user wants.
    pub settings: Mutex<Settings>,
    /// The generation that is wanted.
    pub wanted: watch::Sender<u64>,
    /// The newest that was checked.
    pub done: watch::Sender<Arc<Snapshot>>,
}

/// Everything as it was checked at one generation.
#[derive(Debug, Default)]
pub struct Snapshot {
    /// Which.
    pub generation: u64,
    /// The checked designs.
    pub workspace: Workspace,
    /// The open documents that they were checked with.
    pub documents: FxHashMap<PathBuf, Document>,
    /// What the editor can do.
    pub client: Client,
    /// Where the explanations of findings are, for an editor that opens them.
    pub explained: Option<Arc<PathBuf>>,
}

impl Default for Shared {
    fn default() -> Self {
        Self {
            documents: Mutex::default(),
            client: Mutex::default(),
            settings: Mutex::default(),
            wanted: watch::Sender::new(0),
            done: watch::Sender::new(Arc::default()),
        }
    }
}

/// A lock; what a panic elsewhere left behind is whole, for every change is one step.
pub fn lock<T>(mutex: &Mutex<T>) -> MutexGuard<'_, T> {
    mutex.lock().unwrap_or_else(PoisonError::into_inner)
}

impl Shared {
    /// Changes the documents and asks for a check. Never waits for anything but other changes.
    pub fn change(&self, change: impl FnOnce(&mut Documents)) {
        let mut documents = lock(&self.documents);
        documents.generation += 1;
        change(&mut documents);
        self.wanted.send_replace(documents.generation);
    }

    /// The documents as they are.
    pub fn documents(&self) -> MutexGuard<'_, Documents> {
        lock(&self.documents)
    }

    /// The check of everything that has come before this call.
    pub async fn current(&self) -> Option<Arc<Snapshot>> {
        let generation = self.documents().generation;
        let mut done = self.done.subscribe();
        let snapshot = done.wait_for(|done| done.generation >= generation).await;
        snapshot.map(|snapshot| Arc::clone(&snapshot)).ok()
    }
}

impl Snapshot {
    /// The checked design that a document belongs to, and its file there.
    pub fn find(&self, path: &std::path::Path) -> Option<(&Arc<Live>, FileIndex)> {
        self.workspace.find(path)
    }

    /// The lines of a file of a design.
    pub fn lines(&self, live: &Live, file: FileIndex) -> Lines {
        let source = &live.design.files[file];
        match self.documents.get(&**source.path) {
            Some(document) => Lines::Open(document.buffer.clone(), self.client.encoding),
            None => Lines::Closed(
                Arc::clone(&source.text),
                Arc::new(LineIndex::new(&source.text)),
                self.client.encoding,
            ),
        }
    }

    /// How the protocol calls a file.
    pub fn uri(&self, path: &std::path::Path) -> Option<Url> {
        match self.documents.get(path) {
            Some(document) => Some(document.uri.clone()),
            None => convert::uri(path),
        }
    }
}
