//! A unit measures something else, or is not known.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "wrong-unit",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "A unit measures something else, or is not known.",
    answer: "Write the value in a unit of the kind named.",
    fix: "Writes the number with the unit of the key: a guess that wants a look.",
    before: "- { mark: B1, section: IPE 300, length: 20 min }",
    after: "- { mark: B1, section: IPE 300, length: 7.5 m }",
};
