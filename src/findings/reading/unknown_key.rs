//! A mapping has a key that it does not take.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "unknown-key",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "A mapping has a key that it does not take.",
    answer: "Correct the spelling or remove the key.",
    fix: "Writes the nearest key, where one is near.",
    before: "- { mark: B1, secton: IPE 300 }",
    after: "- { mark: B1, section: IPE 300 }",
};
