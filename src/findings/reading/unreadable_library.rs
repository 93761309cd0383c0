//! A file that is named can't be read, or is of another kind.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "unreadable-library",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "A file that is named can't be read, or is of another kind.",
    answer: "Correct the path.",
    fix: "None: what lies elsewhere on the disk is not searched.",
    before: r"steelwork: 1
libraries: [other.protection.yaml]",
    after: r"steelwork: 1
libraries: [demo.protection.yaml]",
};
