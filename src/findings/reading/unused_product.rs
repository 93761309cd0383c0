//! No member uses the product.

use crate::analysis::design::Design;
use crate::findings::finding::{Finding, Place, Severity};
use crate::findings::registry::Declaration;
use rustc_hash::FxHashSet;
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
pub(super) fn check(design: &Design, out: &mut Vec<Finding>) {
    let mut used: FxHashSet<&str> = FxHashSet::default();
    for at in design.members.iter() {
        let keys = design.inherited(design.member(*at).value());
        let stated = keys.get(|keys| &keys.protection).value();
        used.extend(
            stated
                .and_then(|stated| stated.product.as_ref())
                .map(|name| name.value.as_str()),
        );
    }
    for file in &design.files {
        for item in &file.products {
            let name = &item.value().name;
            if !used.contains(name.value.as_str()) {
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
