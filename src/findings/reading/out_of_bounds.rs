//! A value is outside what is physically possible.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "out-of-bounds",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "A value is outside what is physically possible.",
    answer: "Correct the value.",
    fix: "None: the right value is not known.",
    before: "- { mark: B1, section: IPE 300, length: -7.5 }",
    after: "- { mark: B1, section: IPE 300, length: 7.5 }",
};
