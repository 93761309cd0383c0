//! The bare member reaches its critical temperature before its period ends.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "bare-steel-fails",
    severity: Severity::Error,
    clause: "EN 1993-1-2:2005 4.2.5.1",
    summary: "The bare member reaches its critical temperature before its period ends.",
    answer: "Protect it, or take a heavier section.",
    fix: "None: which protection serves is a choice.",
    before: "- { mark: B1, section: IPE 300, critical temperature: 550 }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: grey board }",
};
