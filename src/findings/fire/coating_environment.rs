//! The coating may not serve in the member's environment.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "coating-environment",
    severity: Severity::Error,
    clause: "EN 13381-8, EAD 350402: use categories X, Y, Z1, Z2",
    summary: "The coating may not serve in the member's environment.",
    answer: "Take a coating for the environment.",
    fix: "None: which product serves is a choice.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, environment: X, protection: red film }   # serves in Z2",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, environment: Z2, protection: red film }",
};
