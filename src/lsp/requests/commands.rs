//! Commands that an editor may run.

use std::sync::Arc;

use serde_json::Value;
use tower_lsp::jsonrpc::{Error, Result};
use tower_lsp::lsp_types::{ExecuteCommandParams, Url};

use crate::check::live::Live;
use crate::exchange::{json, table};
use crate::findings::registry;
use crate::lsp::documents::path_of;
use crate::lsp::shared::Snapshot;
use crate::report::schedule::schedule;
use crate::report::why::explanation;

/// The schedule of the design that a document belongs to, as a table; with a second argument `json` as that.
const SCHEDULE: &str = "scorchline.schedule";
/// What a finding means, by its name.
const WHY: &str = "scorchline.why";
/// The text of a document as the server holds it, to be compared where the two seem to differ.
const DOCUMENT: &str = "scorchline.document";

/// Every command.
pub const NAMES: [&str; 3] = [SCHEDULE, WHY, DOCUMENT];

/// Runs a command.
///
/// # Errors
/// Where there is no such command, or its arguments are not what it wants.
pub fn run(snapshot: &Arc<Snapshot>, params: &ExecuteCommandParams) -> Result<Option<Value>> {
    let first = params.arguments.first().and_then(Value::as_str).unwrap_or("");
    let path = Url::parse(first).ok().and_then(|uri| path_of(&uri));
    let text = match params.command.as_str() {
        SCHEDULE => {
            let path = path.ok_or_else(|| wrong("the first argument is the URI of a design file"))?;
            let (live, _) = snapshot
                .find(&path)
                .ok_or_else(|| wrong("the document is no file of a design"))?;
            let checked = Live::checked(live);
            let schedule = schedule(std::slice::from_ref(&checked));
            if params.arguments.get(1).and_then(Value::as_str) == Some("json") {
                json::schedule(&schedule)
            } else {
                table::schedule(&schedule)
            }
        }
        WHY => explanation(registry::find(first).ok_or_else(|| wrong("the first argument is the name of a finding"))?),
        DOCUMENT => {
            let document = path.and_then(|path| snapshot.documents.get(&path));
            document.ok_or_else(|| wrong("the document is not open"))?.buffer.text()
        }
        _ => return Err(Error::method_not_found()),
    };
    Ok(Some(Value::String(text)))
}

fn wrong(message: &'static str) -> Error {
    Error::invalid_params(message)
}
