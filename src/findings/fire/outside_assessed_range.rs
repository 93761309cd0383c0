//! The member lies outside what was assessed, or the range is not stated.

use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;
use crate::protection::refusal::Refusal;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "outside-assessed-range",
    severity: Severity::Error,
    clause: "EN 13381-4, EN 13381-8: scope of the assessment",
    summary: "The member lies outside what was assessed, or the range is not stated.",
    answer: "Take a product that was assessed for it.",
    fix: "None: which product serves is a choice.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, period: 240, protection: grey board }   # assessed up to 180 min",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, period: 60, protection: grey board }",
};

/// A member, or a thickness, outside what the product was assessed for.
pub(super) fn check(cx: &mut Context<'_>) {
    let (Some(state), Some(product)) = (&cx.outcome.protected, cx.product) else {
        return;
    };
    let (name, span) = (product.name, cx.own().protection.span());
    match &state.requirement {
        Err(refusal @ (Refusal::Outside(_) | Refusal::OrientationNotAssessed(_))) => {
            let message = format!(
                "{} is not verified, for it lies outside what `{name}` was assessed for: {}",
                cx.mark,
                refusal.words(cx.units)
            );
            cx.add(&DECLARATION, "protection", span, message);
        }
        Ok(needed) if !needed.unstated.is_empty() => {
            let message = format!(
                "{} is not verified: `{name}` states no assessed range of {}",
                cx.mark,
                needed.unstated.join(" or ")
            );
            cx.add(&DECLARATION, "protection", span, message);
        }
        _ => {}
    }
    if let (Ok(_), Some((least, most)), Some(provided)) = (&state.requirement, state.outside_thickness, state.provided)
    {
        let message = format!(
            "{} is not verified: {} of `{name}` lies outside the assessed {} to {}",
            cx.mark,
            cx.thickness(provided, product.film),
            cx.thickness(least, product.film),
            cx.thickness(most, product.film)
        );
        cx.add(&DECLARATION, "protection", span, message);
    }
}
