//! A key is missing without which nothing can be said.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "missing-key",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "A key is missing without which nothing can be said.",
    answer: "Add the key to the member, its group or the defaults.",
    fix: "None: the value is the author's to give.",
    before: "- { mark: B1 }   # no section",
    after: "- { mark: B1, section: IPE 300 }",
};
