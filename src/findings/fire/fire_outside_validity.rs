//! The fire lies outside the validity of its formula, or is a test exposure and no design fire.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "fire-outside-validity",
    severity: Severity::Warning,
    clause: "EN 1991-1-2:2002 Annex A (1), EN 13381-8",
    summary: "The fire lies outside the validity of its formula, or is a test exposure and no design fire.",
    answer: "Take another fire, or justify it.",
    fix: "None: which fire is meant is the author's to say.",
    before: "- { mark: B1, section: IPE 300, critical temperature: 550, fire: slow heating }",
    after: "- { mark: B1, section: IPE 300, critical temperature: 550, fire: standard }",
};
