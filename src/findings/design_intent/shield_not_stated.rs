//! Faces are said to be covered, but nothing sound covers them.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "shield-not-stated",
    severity: Severity::Warning,
    clause: "EN 1994-1-2:2005 4.3.4.2.2",
    summary: "Faces are said to be covered, but nothing sound covers them.",
    answer: "State `shielded by`: a slab, a concreted deck or a wall.",
    fix: "None: what covers the member is the author's to say.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, exposure: three sides }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, exposure: three sides, shielded by: slab }",
};
