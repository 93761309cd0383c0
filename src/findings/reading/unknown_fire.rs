//! The design has no such fire.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "unknown-fire",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "The design has no such fire.",
    answer: "Correct the name or add the fire to the head file.",
    fix: "Writes the nearest name, where one is near.",
    before: "- { mark: B1, section: IPE 300, fire: hydrocarbons }",
    after: "- { mark: B1, section: IPE 300, fire: hydrocarbon }",
};
