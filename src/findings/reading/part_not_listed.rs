//! A part and its head do not name each other.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "part-not-listed",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "A part and its head do not name each other.",
    answer: "List the part under `parts` of its head, and write `part of` in the part.",
    fix: "None: the other file is wanted, and fixes stay in the file of the finding.",
    before: r"steelwork: 1
parts: [roof.steelwork.yaml]
# roof.steelwork.yaml
steelwork: 1",
    after: r"steelwork: 1
parts: [roof.steelwork.yaml]
# roof.steelwork.yaml
steelwork: 1
part of: frame.steelwork.yaml",
};
