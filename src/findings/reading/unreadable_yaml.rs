//! The text is not YAML 1.2.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "unreadable-yaml",
    severity: Severity::Error,
    clause: "YAML 1.2",
    summary: "The text is not YAML 1.2.",
    answer: "Repair the characters shown; the other members are checked meanwhile.",
    fix: "Offered where the repair can be guessed, such as a quote or bracket that is not closed.",
    before: r#"- { mark: B1, section: "IPE 300 }"#,
    after: r#"- { mark: B1, section: "IPE 300" }"#,
};
