//! No member is of the group.

use crate::analysis::design::Design;
use crate::findings::finding::{Finding, Place, Severity};
use crate::findings::registry::Declaration;
use crate::findings::uses::Uses;
use std::sync::Arc;

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

/// Groups that no member names.
pub(super) fn check(design: &Design, uses: &Uses, out: &mut Vec<Finding>) {
    for file in &design.files {
        for item in &file.groups {
            let name = &item.value().name;
            if !uses.group(&name.value) {
                let message = format!("no member is of the group `{}`", name.value);
                let place = Place {
                    path: Arc::clone(&file.path),
                    span: item.place(name.span),
                };
                out.push(Finding::new(&DECLARATION, place, message));
            }
        }
    }
}
