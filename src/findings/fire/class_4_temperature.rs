//! The section is class 4 in fire: 350 °C is taken.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "class-4-temperature",
    severity: Severity::Warning,
    clause: "EN 1993-1-2:2005 4.2.3.6 (2)",
    summary: "The section is class 4 in fire: 350 °C is taken.",
    answer: "Take a stockier section if 350 °C is too low.",
    fix: "None: which section serves is a choice.",
    before: "- { mark: C1, role: column, section: IPE 360, loading: { utilisation: 0.5 } }",
    after: "- { mark: C1, role: column, section: HE 200 B, loading: { utilisation: 0.5 } }",
};
