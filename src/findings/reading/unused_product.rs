//! No member uses the product.

use crate::analysis::design::Design;
use crate::findings::finding::{Finding, Place, Severity};
use crate::findings::registry::Declaration;
use crate::findings::uses::Uses;
use std::sync::Arc;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "unused-product",
    severity: Severity::Hint,
    clause: "format of the design file",
    summary: "No member uses the product.",
    answer: "Remove it if it is not wanted.",
    fix: "None: a library may serve other designs.",
    before: r"steelwork: 1
libraries: [own.protection.yaml]
# own.protection.yaml
protection: 1
products:
  own board: { kind: board, method: constant properties, conductivity: 0.2, specific heat: 1000, density: 800 }",
    after: r"steelwork: 1
libraries: [own.protection.yaml]
members:
  - { mark: B1, section: IPE 300, protection: own board }
# own.protection.yaml
protection: 1
products:
  own board: { kind: board, method: constant properties, conductivity: 0.2, specific heat: 1000, density: 800 }",
};

/// Products of the design's libraries that no member uses.
pub(super) fn check(design: &Design, uses: &Uses, out: &mut Vec<Finding>) {
    for file in &design.files {
        for item in &file.products {
            let name = &item.value().name;
            if !uses.product(&name.value) {
                let message = format!("no member uses the product `{}`", name.value);
                let place = Place {
                    path: Arc::clone(&file.path),
                    span: item.place(name.span),
                };
                out.push(Finding::new(&DECLARATION, place, message));
            }
        }
    }
}
