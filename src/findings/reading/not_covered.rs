//! The methods here do not cover the member yet: it is not verified.

use crate::analysis::outcome::Gap;
use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;
use crate::protection::refusal::Refusal;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "not-covered",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "The methods here do not cover the member yet: it is not verified.",
    answer: "Verify it otherwise, and say so by a departure.",
    fix: "None: nothing in the file is wrong.",
    before: r"- { mark: B1, section: IPE 300, openings: { shape: circular, diameter: 200, spacing: 300 } }",
    after: "- { mark: B1, section: IPE 300 }",
};

/// What the methods do not reach yet.
pub(super) fn check(cx: &mut Context<'_>) {
    let outcome = cx.outcome;
    for gap in &outcome.gaps {
        if let Gap::NotCovered { key, why } = gap {
            let message = format!("{} is not verified: {why}", cx.mark);
            cx.add(&DECLARATION, key, cx.own_span(key), message);
        }
    }
    let requirement = outcome.protected.as_ref().map(|state| &state.requirement);
    if let Some(Err(Refusal::NotCovered(why))) = requirement {
        let message = format!("{} is not verified: {why}", cx.mark);
        cx.add(&DECLARATION, "protection", cx.own().protection.span(), message);
    }
}
