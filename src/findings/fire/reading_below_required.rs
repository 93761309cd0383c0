//! The measured dry film is below the one needed.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "reading-below-required",
    severity: Severity::Warning,
    clause: "common practice",
    summary: "The measured dry film is below the one needed.",
    answer: "Add coats, or have the reading judged by who applied it.",
    fix: "None: the film is wanted on the steel, not in the file.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: { product: red film, dft: 2000, reading: 300 } }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: { product: red film, dft: 2000, reading: 2000 } }",
};
