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
    fix: "Offered where the repair is plain, such as spaces for a tab.",
    before: "- mark: B1\n\tsection: IPE 300",
    after: "- mark: B1\n  section: IPE 300",
};
