//! The load in fire exceeds the resistance at 20 °C.

use crate::analysis::outcome::Gap;
use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "ambient-check-fails",
    severity: Severity::Error,
    clause: "EN 1993-1-2:2005 4.2.3",
    summary: "The load in fire exceeds the resistance at 20 °C.",
    answer: "Take a stronger section, or correct the load.",
    fix: "None: which section serves is a choice.",
    before: "- { mark: B1, section: IPE 300, loading: { utilisation: 1.2 } }",
    after: "- { mark: B1, section: IPE 300, loading: { utilisation: 0.6 } }",
};

/// A member that fails before it is heated.
pub(super) fn check(cx: &mut Context<'_>) {
    let outcome = cx.outcome;
    for gap in &outcome.gaps {
        if let Gap::FailsCold(utilisation) = gap {
            let message = format!(
                "{} fails at once: its load in fire is {utilisation:.2} times its resistance at 20 °C",
                cx.mark
            );
            cx.add(&DECLARATION, "loading", cx.own().loading.span(), message);
        }
    }
}
