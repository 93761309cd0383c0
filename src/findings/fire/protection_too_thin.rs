//! The thickness stated is less than the one needed.

use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "protection-too-thin",
    severity: Severity::Error,
    clause: "EN 1993-1-2:2005 4.2.5.2",
    summary: "The thickness stated is less than the one needed.",
    answer: "Take the next stock thickness.",
    fix: "Writes the next stock thickness into the member itself.",
    before: r"- { mark: B1, section: IPE 200, critical temperature: 500, period: 90, protection: { product: grey board, thickness: 15 } }",
    after: r"- { mark: B1, section: IPE 200, critical temperature: 500, period: 90, protection: { product: grey board, thickness: [20, 15] } }",
};

/// A stated thickness below the one needed.
pub(super) fn check(cx: &mut Context<'_>) {
    let (Some(state), Some(product), Some(period)) = (&cx.outcome.protected, cx.product, cx.period) else {
        return;
    };
    let (Ok(needed), true, Some(provided)) = (&state.requirement, state.stated, state.provided) else {
        return;
    };

    if provided.mm() + 1e-9 >= needed.exact.mm() {
        return;
    }
    let next = match &needed.next {
        Some(next) => format!("{} would do", product.build_up(cx, next)),
        None => "no build-up of its stock is so thick".to_owned(),
    };
    let limit = cx.outcome.critical.as_ref().map_or_else(String::new, |critical| {
        format!(" at {}", cx.temperature(critical.protected))
    });
    let message = format!(
        "{}: {} of `{}` is too thin for {:.0} min{limit}; it needs {}; {next}",
        cx.mark,
        cx.thickness(provided, product.film),
        product.name,
        period.min(),
        cx.needed(needed.exact, product.film)
    );
    cx.add(&DECLARATION, "thickness", product.thickness_span(cx), message);
    if let Some(next) = &needed.next {
        product.offer(cx, next);
    }
}
