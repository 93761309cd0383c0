//! What a key means.

use crate::editor::cursor::Step;

/// A key's meaning, kind and unit, from the one table of keys.
pub fn document(step: &Step, owner: &str) -> Option<String> {
    let key = step.key?;
    let required = if key.required && owner == "member" && key.name != "mark" {
        " Required, of the member itself, its group or `defaults`."
    } else if key.required && owner != "group" && owner != "file" {
        " Required."
    } else {
        ""
    };
    Some(format!(
        "**{}**: {}\n\n{}{required}",
        key.name,
        key.kind.wanted(),
        key.doc
    ))
}
