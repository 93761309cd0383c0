//! A support does not last as long as what it carries.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "support-rating-lower",
    severity: Severity::Error,
    clause: "common practice",
    summary: "A support does not last as long as what it carries.",
    answer: "Raise the support's period and protection.",
    fix: "None: the support is another member, and its protection a choice.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, period: 90, protection: grey board, supported by: [C1] }
- { mark: C1, role: column, section: HE 200 B, critical temperature: 500, period: 30, protection: { product: grey board, thickness: 15 } }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, period: 90, protection: grey board, supported by: [C1] }
- { mark: C1, role: column, section: HE 200 B, critical temperature: 500, period: 90, protection: { product: grey board, thickness: 30 } }",
};
