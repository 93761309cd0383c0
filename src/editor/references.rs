//! From a name to all that use it.

use std::sync::Arc;

use crate::editor::names;
use crate::editor::view::View;
use crate::findings::finding::Place;

/// Where the name at an offset is used throughout the design, in the order of its files; with `with_declaration` also
/// where it is given. One pass over the design.
#[must_use]
pub fn references(view: &View<'_>, offset: u32, with_declaration: bool) -> Vec<Place> {
    let Some(asked) = names::at(view, offset) else {
        return Vec::new();
    };
    let mut places = Vec::new();
    names::each(view.design, |file, found| {
        if (found.of, found.name) == (asked.of, asked.name) && (with_declaration || !found.declares) {
            places.push(Place {
                path: Arc::clone(&view.design.files[file].path),
                span: found.span,
            });
        }
    });
    places
}
