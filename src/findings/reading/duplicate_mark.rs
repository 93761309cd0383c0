//! A mark stands twice in the design.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "duplicate-mark",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "A mark stands twice in the design.",
    answer: "Give one of the members another mark, or use `count` for equal ones.",
    fix: "None: which of the members keeps the mark is the author's to say.",
    before: r"- { mark: B1, section: IPE 300 }
- { mark: B1, section: IPE 330 }",
    after: r"- { mark: B1, section: IPE 300 }
- { mark: B2, section: IPE 330 }",
};
