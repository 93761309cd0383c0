//! No library of the design has the product.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "unknown-product",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "No library of the design has the product.",
    answer: "Correct the name or add the library.",
    fix: "Writes the nearest name, where one is near.",
    before: "- { mark: B1, section: IPE 300, protection: gray board }",
    after: "- { mark: B1, section: IPE 300, protection: grey board }",
};
