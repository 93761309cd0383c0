//! No member carries the mark.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "unknown-mark",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "No member carries the mark.",
    answer: "Correct the mark.",
    fix: "Writes the nearest mark, where one is near.",
    before: r"- { mark: B1, section: IPE 300, supported by: [C9] }
- { mark: C1, role: column, section: HE 200 B }",
    after: r"- { mark: B1, section: IPE 300, supported by: [C1] }
- { mark: C1, role: column, section: HE 200 B }",
};
