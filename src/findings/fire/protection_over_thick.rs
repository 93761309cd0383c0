//! The thickness stated is past the next stock size.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "protection-over-thick",
    severity: Severity::Hint,
    clause: "common practice",
    summary: "The thickness stated is past the next stock size.",
    answer: "Take the next stock thickness, unless one size is wanted throughout.",
    fix: "Writes the next stock thickness, where the member states a single one itself.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: { product: grey board, thickness: 30 } }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: { product: grey board, thickness: 15 } }",
};
