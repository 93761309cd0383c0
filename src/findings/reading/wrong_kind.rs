//! A value is of another kind than its key wants.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "wrong-kind",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "A value is of another kind than its key wants.",
    answer: "Write a value of the kind named.",
    fix: "Writes the nearest word, or a decimal point for a comma, where that is what was meant.",
    before: "- { mark: B1, section: IPE 300, length: 7,5 }",
    after: "- { mark: B1, section: IPE 300, length: 7.5 }",
};
