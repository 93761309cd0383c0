//! A designation fits several different sections.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "ambiguous-section",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "A designation fits several different sections.",
    answer: "Write the one that is meant, or settle it for the design under `basis`.",
    fix: "Writes one of the candidates.",
    before: "- { mark: B1, section: SHS 150x150x8 }",
    after: "- { mark: B1, section: SHS HF 150x150x8 }",
};
