//! The thickness stated is past the next stock size.

use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "protection-over-thick",
    severity: Severity::Hint,
    clause: "common practice",
    summary: "The thickness stated is past the next stock size.",
    answer: "Take the next stock thickness, unless one size is wanted throughout.",
    fix: "Writes the next stock thickness into the member itself.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: { product: grey board, thickness: 30 } }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: { product: grey board, thickness: 20 } }",
};

/// A stated thickness past the next stock size.
pub(super) fn check(cx: &mut Context<'_>) {
    let (Some(state), Some(product)) = (&cx.outcome.protected, cx.product) else {
        return;
    };
    let (Ok(needed), true, Some(provided)) = (&state.requirement, state.stated, state.provided) else {
        return;
    };
    let Some(next) = needed
        .next
        .as_ref()
        .filter(|next| provided.mm() > next.total().mm() + 1e-6)
    else {
        return;
    };
    let (stated, enough) = (cx.thickness(provided, product.film), product.build_up(cx, next));
    let needs = cx.needed(needed.exact, product.film);
    let message = if needs == enough {
        format!(
            "{}: {stated} of `{}` is more than the {needs} needed",
            cx.mark, product.name
        )
    } else {
        format!(
            "{}: {stated} of `{}` is more than the {needs} needed; {enough} would do",
            cx.mark, product.name
        )
    };
    cx.add(&DECLARATION, "thickness", product.thickness_span(cx), message);
    product.offer(cx, next);
}
