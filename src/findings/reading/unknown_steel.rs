//! The steel grade is not known.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "unknown-steel",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "The steel grade is not known.",
    answer: "Correct it, or state `steel: { yield: 350 MPa }`.",
    fix: "Writes the nearest grade, where one is near.",
    before: "- { mark: B1, section: IPE 300, steel: S350 }",
    after: "- { mark: B1, section: IPE 300, steel: S355 }",
};
