//! No section table has the designation.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "unknown-section",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "No section table has the designation.",
    answer: "Take one of the nearest, or give the shape as a mapping.",
    fix: "Writes one of the nearest designations.",
    before: "- { mark: B1, section: IPE 301 }",
    after: "- { mark: B1, section: IPE 300 }",
};
