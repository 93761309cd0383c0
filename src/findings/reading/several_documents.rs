//! The file holds more than one document.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "several-documents",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "The file holds more than one document.",
    answer: "Keep one document a file.",
    fix: "None: which of the documents is meant is not known.",
    before: r"steelwork: 1
members: []
---
steelwork: 1
",
    after: r"steelwork: 1
members: []
",
};
