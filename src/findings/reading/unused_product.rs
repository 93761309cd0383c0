//! No member uses the product.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

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
