//! From a name to where it is given.

use std::sync::Arc;

use crate::design::keys::NameOf;
use crate::editor::names::{self, is_built_in};
use crate::editor::view::View;
use crate::findings::finding::Place;
use crate::text::Span;

/// Where the name at an offset is given. Of a mark that stands twice, both places. A fire that is built in has none.
#[must_use]
pub fn definition(view: &View<'_>, offset: u32) -> Vec<Place> {
    let Some(asked) = names::at(view, offset) else {
        return Vec::new();
    };
    let design = view.design;
    let place = |file: usize, span: Span| Place {
        path: Arc::clone(&design.files[file].path),
        span,
    };
    match asked.of {
        // Marks can stand twice, and each is what was meant by one.
        NameOf::Mark => {
            let mut places = Vec::new();
            names::each(design, |file, found| {
                if found.declares && (found.of, found.name) == (asked.of, asked.name) {
                    places.push(place(file, found.span));
                }
            });
            places
        }
        NameOf::Group => {
            let found = design.group(asked.name);
            found.map_or_else(Vec::new, |(file, item)| {
                vec![place(file, item.place(item.value().name.span))]
            })
        }
        NameOf::Product => {
            let found = design.product(asked.name);
            found.map_or_else(Vec::new, |(file, item)| {
                vec![place(file, item.place(item.value().name.span))]
            })
        }
        _ if is_built_in(asked.of, asked.name) => Vec::new(),
        _ => {
            let fires = &design.head().fires;
            let found = fires.iter().find(|fire| fire.name.value == asked.name);
            found.map_or_else(Vec::new, |fire| vec![place(0, fire.name.span)])
        }
    }
}
