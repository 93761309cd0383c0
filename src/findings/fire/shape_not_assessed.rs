//! The product was not assessed for the shape.

use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;
use crate::protection::refusal::Refusal;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "shape-not-assessed",
    severity: Severity::Error,
    clause: "EN 13381-4, EN 13381-8: scope of the assessment",
    summary: "The product was not assessed for the shape.",
    answer: "Take a product that was assessed for it.",
    fix: "None: which product serves is a choice.",
    before: r"- { mark: B1, section: SHS HF 150x150x8, critical temperature: 550, protection: red film }   # open sections only",
    after: r"- { mark: B1, section: SHS HF 150x150x8, critical temperature: 550, protection: grey board }",
};

/// A product on a shape that it was not assessed for.
pub(super) fn check(cx: &mut Context<'_>) {
    let (Some(state), Some(product)) = (&cx.outcome.protected, cx.product) else {
        return;
    };
    if let Err(Refusal::ShapeNotAssessed(shape)) = &state.requirement {
        let message = format!(
            "{} is not verified: `{}` was not assessed for {} sections",
            cx.mark,
            product.name,
            shape.words()
        );
        cx.add(&DECLARATION, "protection", cx.own().protection.span(), message);
    }
}
