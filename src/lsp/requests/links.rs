//! Links to libraries, parts and heads.

use tower_lsp::lsp_types::DocumentLink;

use crate::editor::links;
use crate::lsp::disk::Disk;
use crate::lsp::requests::Asked;

/// The files that a file names.
pub fn links(asked: &Asked, folders: Vec<std::path::PathBuf>) -> Option<Vec<DocumentLink>> {
    let disk = Disk { folders };
    let view = asked.view();
    let links = links::links(&view).into_iter().filter_map(|link| {
        let path = disk.target(&view.source().path, link.written).ok()?;
        Some(DocumentLink {
            range: asked.lines.range(link.span),
            target: Some(asked.snapshot.uri(&path)?),
            tooltip: None,
            data: None,
        })
    });
    Some(links.collect())
}
