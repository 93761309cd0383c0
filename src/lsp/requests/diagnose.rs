//! Diagnostics for editors that ask for them.

use std::sync::Arc;

use tower_lsp::lsp_types::{
    Diagnostic, DocumentDiagnosticReport, DocumentDiagnosticReportResult, FullDocumentDiagnosticReport,
    RelatedFullDocumentDiagnosticReport, WorkspaceDiagnosticReport, WorkspaceDiagnosticReportResult,
    WorkspaceDocumentDiagnosticReport, WorkspaceFullDocumentDiagnosticReport,
};

use crate::analysis::design::FileIndex;
use crate::check::live::Live;
use crate::lsp::diagnostics::of_file;
use crate::lsp::requests::Asked;
use crate::lsp::shared::Snapshot;

fn full(snapshot: &Snapshot, live: &Live, file: FileIndex) -> FullDocumentDiagnosticReport {
    let items: Vec<Diagnostic> = of_file(snapshot, (live, file), live.shown(file), None, false);
    FullDocumentDiagnosticReport { result_id: None, items }
}

/// Those of a document.
pub fn document(asked: &Asked) -> Option<DocumentDiagnosticReportResult> {
    let report = RelatedFullDocumentDiagnosticReport {
        related_documents: None,
        full_document_diagnostic_report: full(&asked.snapshot, &asked.live, asked.file),
    };
    Some(DocumentDiagnosticReportResult::Report(DocumentDiagnosticReport::Full(
        report,
    )))
}

/// Those of every file of the workspace.
pub fn workspace(snapshot: &Arc<Snapshot>) -> Option<WorkspaceDiagnosticReportResult> {
    let designs = snapshot.workspace.designs.iter();
    let files = designs.flat_map(|live| (0..live.design.files.len()).map(move |file| (live, file)));
    let mut items: Vec<WorkspaceDocumentDiagnosticReport> = Vec::new();
    let mut seen = Vec::new();
    for (live, file) in files {
        let path = &live.design.files[file].path;
        let Some(uri) = snapshot.uri(path).filter(|uri| !seen.contains(uri)) else {
            continue;
        };
        seen.push(uri.clone());
        let document = snapshot.documents.get(&**path);
        items.push(WorkspaceDocumentDiagnosticReport::Full(
            WorkspaceFullDocumentDiagnosticReport {
                uri,
                version: document.map(|document| i64::from(document.version)),
                full_document_diagnostic_report: full(snapshot, live, file),
            },
        ));
    }
    Some(WorkspaceDiagnosticReportResult::Report(WorkspaceDiagnosticReport {
        items,
    }))
}
