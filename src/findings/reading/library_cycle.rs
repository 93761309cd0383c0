//! A path closes a cycle of files.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "library-cycle",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "A path closes a cycle of files.",
    answer: "Remove the path.",
    fix: "None: which of the paths is too many is the author's to say.",
    before: r"steelwork: 1
parts: [frame.steelwork.yaml]   # itself",
    after: r"steelwork: 1
parts: []",
};
