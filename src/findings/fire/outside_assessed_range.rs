//! The member lies outside what was assessed, or the range is not stated.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "outside-assessed-range",
    severity: Severity::Error,
    clause: "EN 13381-4, EN 13381-8: scope of the assessment",
    summary: "The member lies outside what was assessed, or the range is not stated.",
    answer: "Take a product that was assessed for it.",
    fix: "None: which product serves is a choice.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, period: 240, protection: grey board }   # assessed up to 180 min",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, period: 60, protection: grey board }",
};
