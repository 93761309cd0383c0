//! Publishing: what changed since the last time, and every document that was edited.

use std::sync::Arc;
use std::time::Instant;

use rustc_hash::FxHashMap;
use tokio::runtime::Handle;
use tower_lsp::Client as Editor;
use tower_lsp::lsp_types::{Diagnostic, DiagnosticSeverity, Url};

use crate::analysis::read::kind_by_name;
use crate::check::live::Live;
use crate::lsp::diagnostics::{calms, of_file};
use crate::lsp::documents::{Document, Edited};
use crate::lsp::shared::Snapshot;
use crate::lsp::worker::CALM;
use crate::text::{Buffer, Encoding, Position, Span};

/// What stands published.
pub struct Publisher {
    editor: Editor,
    runtime: Handle,
    published: FxHashMap<Url, Published>,
    /// The designs that were published last, by which unchanged ones are told.
    designs: Vec<Arc<Live>>,
}

#[derive(Debug, Clone, Default)]
struct Published {
    version: Option<i32>,
    /// The line that was left in peace.
    calm: Option<u32>,
    diagnostics: Vec<Diagnostic>,
}

impl Publisher {
    /// Nothing is published yet.
    pub fn new(editor: Editor, runtime: Handle) -> Self {
        Self {
            editor,
            runtime,
            published: FxHashMap::default(),
            designs: Vec::new(),
        }
    }

    /// Publishes a snapshot. Answers when the line that is being typed will have been left in peace long enough.
    pub fn publish(&mut self, snapshot: &Snapshot) -> Option<Instant> {
        let mut calm_until: Option<Instant> = None;
        let mut now: FxHashMap<Url, Published> = FxHashMap::default();
        for live in &snapshot.workspace.designs {
            let same = self.designs.iter().any(|before| Arc::ptr_eq(before, live));
            for (file, source) in live.design.files.iter().enumerate() {
                let Some(uri) = snapshot.uri(&source.path) else {
                    continue;
                };
                let document = snapshot.documents.get(&**source.path);
                let version = document.map(|document| document.version);
                let typed = document.and_then(typed_line);
                let fresh = typed.filter(|(edited, _)| edited.at.elapsed() < CALM);
                let before = self.published.get(&uri);
                let before = before.filter(|before| same && before.version == version && before.calm.is_none());
                if let (None, Some(before), false) = (fresh, before, now.contains_key(&uri)) {
                    now.insert(uri, before.clone());
                    continue;
                }
                let shown = live.shown(file);
                let calm = fresh.filter(|(_, line)| calms(&shown, *line));
                let calm = calm.map(|(edited, _)| edited);
                if let Some(edited) = calm {
                    let until = edited.at + CALM;
                    calm_until = Some(calm_until.map_or(until, |other| other.min(until)));
                }
                let calm_line = calm.map(|edited| edited.line);
                let line = typed.map(|(_, line)| line);
                let diagnostics = of_file(snapshot, (live, file), shown, line, calm.is_some());
                let entry = now.entry(uri).or_insert_with(|| Published {
                    version,
                    calm: calm_line,
                    diagnostics: Vec::new(),
                });
                join(&mut entry.diagnostics, diagnostics);
            }
        }
        for (path, trouble) in &snapshot.workspace.troubles {
            let Some(uri) = snapshot.uri(path) else { continue };
            let diagnostic = Diagnostic {
                severity: Some(DiagnosticSeverity::ERROR),
                source: Some("scorchline".to_owned()),
                message: format!("this file can't be read: {trouble}"),
                ..Diagnostic::default()
            };
            let version = snapshot.documents.get(path).map(|document| document.version);
            now.entry(uri).or_default().version = version;
            if let Some(uri) = snapshot.uri(path)
                && let Some(entry) = now.get_mut(&uri)
            {
                entry.diagnostics.push(diagnostic);
            }
        }
        // A document whose name makes it no design file is answered all the same.
        for (path, document) in &snapshot.documents {
            if kind_by_name(path).is_some() {
                now.entry(document.uri.clone()).or_default().version = Some(document.version);
            }
        }
        if snapshot.client.pulls {
            return None;
        }
        self.send(now);
        self.designs.clone_from(&snapshot.workspace.designs);
        calm_until
    }

    /// Sends what is new, and takes back what is gone.
    fn send(&mut self, now: FxHashMap<Url, Published>) {
        for (uri, published) in &now {
            let before = self.published.get(uri);
            let edited = published.version.is_some() && before.and_then(|before| before.version) != published.version;
            let other = match before {
                Some(before) => before.diagnostics != published.diagnostics,
                None => !published.diagnostics.is_empty(),
            };
            if edited || other {
                let (uri, diagnostics) = (uri.clone(), published.diagnostics.clone());
                self.runtime
                    .block_on(self.editor.publish_diagnostics(uri, diagnostics, published.version));
            }
        }
        for (uri, before) in &self.published {
            if !now.contains_key(uri) && !before.diagnostics.is_empty() {
                self.runtime
                    .block_on(self.editor.publish_diagnostics(uri.clone(), Vec::new(), None));
            }
        }
        self.published = now;
    }
}

/// Joins what several designs say of a file that they share: each thing once, and that nothing is used only where all of
/// them say so.
fn join(known: &mut Vec<Diagnostic>, more: Vec<Diagnostic>) {
    if known.is_empty() {
        *known = more;
        return;
    }
    for diagnostic in more {
        if !known.contains(&diagnostic) {
            known.push(diagnostic);
        }
    }
}

/// The line on which a document was edited last.
fn typed_line(document: &Document) -> Option<(Edited, Span)> {
    let edited = document.edited?;
    Some((edited, line(&document.buffer, edited.line)))
}

fn line(buffer: &Buffer, line: u32) -> Span {
    let at = |line| buffer.offset(Position { line, column: 0 }, Encoding::Utf8);
    let (start, next) = (at(line), at(line.saturating_add(1)));
    Span::new(start, next.max(start + 1) - 1)
}
