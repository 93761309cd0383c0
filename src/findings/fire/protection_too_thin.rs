//! The thickness stated is less than the one needed.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "protection-too-thin",
    severity: Severity::Error,
    clause: "EN 1993-1-2:2005 4.2.5.2",
    summary: "The thickness stated is less than the one needed.",
    answer: "Take the next stock thickness.",
    fix: "Writes the next stock thickness, where the member states a single one itself.",
    before: r"- { mark: B1, section: IPE 200, critical temperature: 500, period: 90, protection: { product: grey board, thickness: 15 } }",
    after: r"- { mark: B1, section: IPE 200, critical temperature: 500, period: 90, protection: { product: grey board, thickness: [20, 15] } }",
};
