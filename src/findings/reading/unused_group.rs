//! No member is of the group.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "unused-group",
    severity: Severity::Hint,
    clause: "format of the design file",
    summary: "No member is of the group.",
    answer: "Remove it if it is not wanted.",
    fix: "None: it may be wanted for members still to come.",
    before: r"steelwork: 1
groups:
  floors: { role: beam }
members: []",
    after: r"steelwork: 1
groups:
  floors: { role: beam }
members:
  - { mark: B1, group: floors, section: IPE 300 }",
};
