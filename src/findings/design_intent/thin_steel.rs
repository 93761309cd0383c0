//! The steel is thin for its period: V/A under 3.5 mm at 60 min and over.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "thin-steel",
    severity: Severity::Hint,
    clause: "common practice",
    summary: "The steel is thin for its period: V/A under 3.5 mm at 60 min and over.",
    answer: "Consider a heavier section.",
    fix: "None: which section serves is a choice.",
    before: "- { mark: B1, section: IPE 100, critical temperature: 550 }",
    after: "- { mark: B1, section: HE 200 B, critical temperature: 550 }",
};
