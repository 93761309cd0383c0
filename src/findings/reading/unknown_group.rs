//! The design has no such group.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "unknown-group",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "The design has no such group.",
    answer: "Correct the name or add the group.",
    fix: "Writes the nearest name, where one is near.",
    before: r"steelwork: 1
groups:
  floors: { role: beam }
members:
  - { mark: B1, group: flors, section: IPE 300 }",
    after: r"steelwork: 1
groups:
  floors: { role: beam }
members:
  - { mark: B1, group: floors, section: IPE 300 }",
};
