//! Definitions, references and renames.

use tower_lsp::jsonrpc::{Error, ErrorCode, Result};
use tower_lsp::lsp_types::{Location, Position, PrepareRenameResponse, WorkspaceEdit};

use crate::editor::view::View;
use crate::editor::{definition, references, rename};
use crate::findings::finding::FixEdit;
use crate::lsp::requests::{AllLines, Asked};

/// Where the name at a position is declared.
pub fn definition(asked: &Asked, position: Position) -> Option<Vec<Location>> {
    let places = definition::definition(&asked.view(), asked.offset(position));
    let mut lines = AllLines::of(&asked.snapshot);
    Some(places.iter().filter_map(|place| lines.location(place)).collect())
}

/// The views of a file: a library may serve several designs.
fn views(asked: &Asked) -> impl Iterator<Item = View<'_>> {
    let path = &asked.live.design.files[asked.file].path;
    asked.snapshot.workspace.designs.iter().filter_map(move |live| {
        let file = live.design.files.iter().position(|file| file.path == *path)?;
        Some(View {
            design: &live.design,
            outcomes: &live.outcomes,
            file,
        })
    })
}

/// Where the name at a position is used, in every design that has the file.
pub fn references(asked: &Asked, position: Position, declaration: bool) -> Option<Vec<Location>> {
    let offset = asked.offset(position);
    let mut lines = AllLines::of(&asked.snapshot);
    let mut locations: Vec<Location> = Vec::new();
    let found = views(asked).flat_map(|view| references::references(&view, offset, declaration));
    for place in found {
        let location = lines.location(&place)?;
        if !locations.contains(&location) {
            locations.push(location);
        }
    }
    Some(locations)
}

/// What a rename at a position would replace.
pub fn prepare(asked: &Asked, position: Position) -> Option<PrepareRenameResponse> {
    let (span, placeholder) = rename::prepare_rename(&asked.view(), asked.offset(position))?;
    Some(PrepareRenameResponse::RangeWithPlaceholder {
        range: asked.lines.range(span),
        placeholder,
    })
}

/// The edits of a rename, in every design that has the file.
///
/// # Errors
/// A sentence for the user, where the new name can't be.
pub fn rename(asked: &Asked, position: Position, name: &str) -> Result<Option<WorkspaceEdit>> {
    let offset = asked.offset(position);
    let mut edits: Vec<FixEdit> = Vec::new();
    for view in views(asked) {
        let more = rename::rename(&view, offset, name).map_err(|message| Error {
            code: ErrorCode::ServerError(-32803),
            message: message.into(),
            data: None,
        })?;
        for edit in more {
            if !edits.contains(&edit) {
                edits.push(edit);
            }
        }
    }
    Ok(AllLines::of(&asked.snapshot).edit(&edits))
}
