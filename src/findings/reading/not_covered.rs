//! The methods here do not cover the member yet: it is not verified.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "not-covered",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "The methods here do not cover the member yet: it is not verified.",
    answer: "Verify it otherwise, and say so by a departure.",
    fix: "None: nothing in the file is wrong.",
    before: r"- { mark: B1, section: IPE 300, openings: { shape: circular, diameter: 200, spacing: 300 } }",
    after: "- { mark: B1, section: IPE 300 }",
};
