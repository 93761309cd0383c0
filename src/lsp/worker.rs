//! The worker: checks the newest version of everything, publishes what it finds, and lets requests see it.

use std::panic::{AssertUnwindSafe, catch_unwind};
use std::path::PathBuf;
use std::sync::Arc;
use std::time::{Duration, Instant};

use rustc_hash::{FxHashMap, FxHashSet};
use tokio::runtime::Handle;
use tokio::sync::watch;
use tower_lsp::Client as Editor;
use tower_lsp::lsp_types::MessageType;

use crate::analysis::read::kind_by_name;
use crate::check::session::{Session, Workspace};
use crate::lsp::documents::Document;
use crate::lsp::explain;
use crate::lsp::folders::search;
use crate::lsp::overlay::Overlay;
use crate::lsp::progress::Progress;
use crate::lsp::publish::Publisher;
use crate::lsp::shared::{Shared, Snapshot, lock};

/// How long a line that is being typed is left in peace.
pub const CALM: Duration = Duration::from_millis(700);
/// How often files on disk are looked at where the editor does not watch them.
const LOOK: Duration = Duration::from_secs(2);

/// The worker's own state.
pub struct Worker {
    shared: Arc<Shared>,
    editor: Editor,
    runtime: Handle,
    session: Session,
    files: Overlay,
    /// Texts of open documents, with the generation that they are of.
    texts: FxHashMap<PathBuf, (u64, Arc<str>)>,
    /// Memory for a text on its way there.
    scratch: String,
    /// Design files in the folders of the editor.
    listed: Vec<PathBuf>,
    listing: Option<u64>,
    publisher: Publisher,
    explained: Option<Arc<PathBuf>>,
}

impl Worker {
    /// A worker that has checked nothing yet.
    pub fn new(shared: Arc<Shared>, editor: Editor, runtime: Handle) -> Self {
        Self {
            publisher: Publisher::new(editor.clone(), runtime.clone()),
            shared,
            editor,
            runtime,
            session: Session::default(),
            files: Overlay::default(),
            texts: FxHashMap::default(),
            scratch: String::new(),
            listed: Vec::new(),
            listing: None,
            explained: None,
        }
    }

    /// Works until the server ends.
    pub fn run(mut self) {
        if lock(&self.shared.client).links {
            self.explained = explain::write().map(Arc::new);
        }
        let mut wanted = self.shared.wanted.subscribe();
        // What was opened before this is wanted too.
        wanted.mark_changed();
        let mut calm: Option<Instant> = None;
        loop {
            let Some(changed) = self.wait(&mut wanted, calm) else {
                return;
            };
            if !changed && calm.is_some_and(|until| until <= Instant::now()) {
                let snapshot = self.shared.done.borrow().clone();
                calm = self.publisher.publish(&snapshot);
                continue;
            }
            if !changed && !self.files.is_stale() {
                continue;
            }
            wanted.borrow_and_update();
            if let Some(snapshot) = self.check() {
                let snapshot = Arc::new(snapshot);
                calm = self.publisher.publish(&snapshot);
                let before = self.shared.done.send_replace(Arc::clone(&snapshot));
                self.refresh(&before, &snapshot);
            }
        }
    }

    /// Waits for a change: `Some(true)`; or for the time to look around: `Some(false)`. `None` when the server ends.
    fn wait(&self, wanted: &mut watch::Receiver<u64>, calm: Option<Instant>) -> Option<bool> {
        let look = Instant::now() + LOOK;
        let until = calm.map_or(look, |calm| calm.min(look));
        self.runtime.block_on(async {
            tokio::select! {
                changed = wanted.changed() => changed.ok().map(|()| true),
                () = tokio::time::sleep_until(until.into()) => Some(false),
            }
        })
    }

    /// Checks the newest version. `None` where a newer one came meanwhile.
    fn check(&mut self) -> Option<Snapshot> {
        let (generation, documents, listing, folders, changed) = {
            let mut documents = self.shared.documents();
            let changed = std::mem::take(&mut documents.changed_on_disk);
            (
                documents.generation,
                documents.open.clone(),
                documents.listing,
                documents.folders.clone(),
                changed,
            )
        };
        self.files.forget(&changed);
        self.take(&documents);
        if self.listing != Some(listing) || self.files.disk.folders != folders {
            self.listing = Some(listing);
            self.listed.clear();
            for folder in &folders {
                // What can't be searched holds nothing that could be checked.
                search(folder, &mut self.listed, &mut Vec::new());
            }
            for path in &mut self.listed {
                if let Ok(real) = std::fs::canonicalize(&*path) {
                    *path = real;
                }
            }
            self.files.disk.folders = folders;
        }
        let mut paths = self.listed.clone();
        paths.extend(documents.keys().filter(|path| kind_by_name(path).is_some()).cloned());
        paths.sort_unstable();
        paths.dedup();
        let workspace = self.checked(&paths, generation)?;
        let used: FxHashSet<PathBuf> = workspace
            .designs
            .iter()
            .flat_map(|live| &live.design.files)
            .map(|file| file.path.to_path_buf())
            .chain(paths)
            .collect();
        self.files.keep(&used);
        let client = *lock(&self.shared.client);
        Some(Snapshot {
            generation,
            workspace,
            documents,
            client,
            explained: self.explained.clone(),
        })
    }

    /// Where something else than the editor's own texts has changed, the editor does not know that hints and lenses have.
    fn refresh(&self, before: &Snapshot, now: &Snapshot) {
        let edited = |(path, document): (&PathBuf, &Document)| {
            before
                .documents
                .get(path)
                .is_none_or(|before| before.changed != document.changed)
        };
        if before.generation == 0 || now.documents.iter().any(edited) {
            return;
        }
        let (editor, client) = (self.editor.clone(), now.client);
        self.runtime.spawn(async move {
            let asked = async {
                if client.refreshes_hints {
                    let _ = editor.inlay_hint_refresh().await;
                }
                if client.refreshes_lenses {
                    let _ = editor.code_lens_refresh().await;
                }
            };
            let _ = tokio::time::timeout(LOOK, asked).await;
        });
    }

    /// Takes over the texts of the open documents.
    fn take(&mut self, documents: &FxHashMap<PathBuf, Document>) {
        self.texts.retain(|path, _| documents.contains_key(path));
        for (path, document) in documents {
            let known = self
                .texts
                .get(path)
                .is_some_and(|(changed, _)| *changed == document.changed);
            if !known {
                document.buffer.write_to(&mut self.scratch);
                let text = Arc::from(self.scratch.as_str());
                self.texts.insert(path.clone(), (document.changed, text));
            }
        }
        let open = self
            .texts
            .iter()
            .map(|(path, (_, text))| (path.clone(), Arc::clone(text)));
        self.files.open = open.collect();
    }

    /// Checks the files. A panic costs what was kept, not the server.
    fn checked(&mut self, paths: &[PathBuf], generation: u64) -> Option<Workspace> {
        let tells = lock(&self.shared.client).progress;
        let _progress = tells.then(|| Progress::watch(&self.runtime, self.editor.clone(), generation));
        let on = jiff::ZonedDateTime::now().date();
        let wanted = self.shared.wanted.subscribe();
        let cancelled = || *wanted.borrow() != generation;
        for _ in 0..2 {
            let (session, files) = (&mut self.session, &self.files);
            let checked = catch_unwind(AssertUnwindSafe(|| session.check(files, paths, on, &cancelled)));
            match checked {
                Ok(workspace) => return workspace,
                Err(_) => {
                    self.session = Session::default();
                    let message = "a check broke off and begins anew; please report what was typed";
                    self.runtime
                        .block_on(self.editor.log_message(MessageType::ERROR, message));
                }
            }
        }
        // What can't be checked at all must not keep requests waiting.
        Some(self.shared.done.borrow().workspace.clone())
    }
}
