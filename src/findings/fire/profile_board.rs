//! A board is to follow the profile; boards box the section in.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "profile-board",
    severity: Severity::Warning,
    clause: "common practice",
    summary: "A board is to follow the profile; boards box the section in.",
    answer: "Take the box form, or a spray that follows the profile.",
    fix: "Writes `form: box`, where the member states the form itself.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: { product: grey board, form: profile } }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: { product: grey board, form: box } }",
};
