//! A departure has run out.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "departure-expired",
    severity: Severity::Error,
    clause: "common practice",
    summary: "A departure has run out.",
    answer: "Agree it anew, or answer the finding.",
    fix: "None: a date is agreed, not filled in.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, departures: [ { from: bare-steel-fails, because: sprinklers agreed, by: checker, until: 2025-06-30 } ] }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, departures: [ { from: bare-steel-fails, because: sprinklers agreed, by: checker, until: 2027-06-30 } ] }",
};
