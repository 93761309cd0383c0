//! The member would last its period bare.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "protection-not-needed",
    severity: Severity::Hint,
    clause: "EN 1993-1-2:2005 4.2.5.1",
    summary: "The member would last its period bare.",
    answer: "Consider whether the protection is wanted for another reason.",
    fix: "None: protection is never removed by a fix.",
    before: r"- { mark: B1, section: IPE 600, critical temperature: 600, period: 15, protection: { product: grey board, thickness: 15 } }",
    after: "- { mark: B1, section: IPE 600, critical temperature: 600, period: 15 }",
};
