//! The section factor is below 10 1/m, so 10 is used.

use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "section-factor-low",
    severity: Severity::Information,
    clause: "EN 1993-1-2:2005 4.2.5.1 (5)",
    summary: "The section factor is below 10 1/m, so 10 is used.",
    answer: "Nothing needs doing: it is on the safe side.",
    fix: "None: nothing is wrong.",
    before: "- { mark: T1, role: tie, section: { shape: round, d: 500 } }",
    after: "- { mark: T1, role: tie, section: { shape: round, d: 50 } }",
};

/// A section so stocky that the least factor is used instead of its own.
pub(super) fn check(cx: &mut Context<'_>) {
    let Some(section) = cx.outcome.section.as_ref().filter(|section| section.below_ten) else {
        return;
    };
    let message = format!("{} has {}: 10 1/m is used", cx.mark, cx.factor(section.factor));
    cx.add(&DECLARATION, "section", cx.own().section.span(), message);
}
