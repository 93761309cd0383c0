//! Members support each other in a circle.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "support-cycle",
    severity: Severity::Error,
    clause: "common practice",
    summary: "Members support each other in a circle.",
    answer: "Correct `supported by`.",
    fix: "None: which of the supports is wrong is the author's to say.",
    before: r"- { mark: B1, section: IPE 300, supported by: [B2] }
- { mark: B2, section: IPE 300, supported by: [B1] }",
    after: r"- { mark: B1, section: IPE 300, supported by: [B2] }
- { mark: B2, section: IPE 300 }",
};
