//! The evidence behind the product has expired.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "evidence-expired",
    severity: Severity::Warning,
    clause: "common practice",
    summary: "The evidence behind the product has expired.",
    answer: "Get the current report.",
    fix: "None: only a new report answers it.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: old spray }   # its report expired on 2026-01-31",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: white spray }",
};
