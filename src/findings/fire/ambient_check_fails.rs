//! The load in fire exceeds the resistance at 20 °C.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "ambient-check-fails",
    severity: Severity::Error,
    clause: "EN 1993-1-2:2005 4.2.3",
    summary: "The load in fire exceeds the resistance at 20 °C.",
    answer: "Take a stronger section, or correct the load.",
    fix: "None: which section serves is a choice.",
    before: "- { mark: B1, section: IPE 300, loading: { utilisation: 1.2 } }",
    after: "- { mark: B1, section: IPE 300, loading: { utilisation: 0.6 } }",
};
