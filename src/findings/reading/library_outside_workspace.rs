//! A path leads out of the workspace.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "library-outside-workspace",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "A path leads out of the workspace.",
    answer: "Bring the file into the workspace.",
    fix: "None: no file is moved.",
    before: r"steelwork: 1
libraries: [../demo.protection.yaml]",
    after: r"steelwork: 1
libraries: [demo.protection.yaml]",
};
