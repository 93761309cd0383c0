//! The critical temperature is neither stated nor derivable.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "critical-temperature-unknown",
    severity: Severity::Error,
    clause: "EN 1993-1-2:2005 4.2.4",
    summary: "The critical temperature is neither stated nor derivable.",
    answer: "Give `loading`, or state a `critical temperature` with who says so.",
    fix: "None: the load is the author's to give.",
    before: "- { mark: C1, role: column, section: HE 200 B }",
    after: r"- { mark: C1, role: column, section: HE 200 B, loading: { axial: 600 kN, buckling length: 2.1 m } }",
};
