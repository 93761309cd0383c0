//! The critical temperature is neither stated nor derivable.

use crate::analysis::outcome::{Gap, Verdict};
use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "critical-temperature-unknown",
    severity: Severity::Error,
    clause: "EN 1993-1-2:2005 4.2.4",
    summary: "The critical temperature is neither stated nor derivable.",
    answer: "Give `loading`, or state a `critical temperature` with who says so.",
    fix: "None: the load is the author's to give.",
    before: "- { mark: C1, role: column, section: HE 200 B }",
    after: r"- { mark: C1, role: column, section: HE 200 B, loading: { axial: 600 kN, buckling length: 2.1 m } }",
};

/// A member whose critical temperature nobody knows. Where no period is wanted, no temperature is either.
pub(super) fn check(cx: &mut Context<'_>) {
    if cx.outcome.verdict == Verdict::NoPeriod {
        return;
    }
    let outcome = cx.outcome;
    for gap in &outcome.gaps {
        if let Gap::CriticalTemperature(why) = gap {
            let message = format!(
                "{} is not verified: its critical temperature is unknown, for {why}",
                cx.mark
            );
            cx.add(&DECLARATION, "loading", cx.own().loading.span(), message);
        }
    }
}
