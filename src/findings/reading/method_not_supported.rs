//! The method or its edition is not supported.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "method-not-supported",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "The method or its edition is not supported.",
    answer: "Name a supported edition.",
    fix: "Writes the nearest supported edition: another edition is another verification, so it wants a decision.",
    before: r#"steelwork: 1
basis: { method: "EN 1993-1-2:1995" }"#,
    after: r#"steelwork: 1
basis: { method: "EN 1993-1-2:2005" }"#,
};
