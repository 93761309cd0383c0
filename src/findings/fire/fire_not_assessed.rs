//! The product was not assessed for the fire.

use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;
use crate::protection::refusal::Refusal;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "fire-not-assessed",
    severity: Severity::Error,
    clause: "EN 13381-4, EN 13381-8: scope of the assessment",
    summary: "The product was not assessed for the fire.",
    answer: "Take a product that was assessed for it.",
    fix: "None: which product serves is a choice.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, fire: hydrocarbon, protection: grey board }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, fire: standard, protection: grey board }",
};

/// A product under a fire that it was not assessed for.
pub(super) fn check(cx: &mut Context<'_>) {
    let (Some(state), Some(product)) = (&cx.outcome.protected, cx.product) else {
        return;
    };
    if state.requirement == Err(Refusal::FireNotAssessed) {
        let fire = cx
            .keys
            .get(|keys| &keys.fire)
            .value()
            .map_or("standard", String::as_str);
        let message = format!(
            "{} is not verified: `{}` was not assessed for the fire `{fire}`",
            cx.mark, product.name
        );
        cx.add(&DECLARATION, "protection", cx.own().protection.span(), message);
    }
}
