//! The measured dry film is below the one needed.

use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "reading-below-required",
    severity: Severity::Warning,
    clause: "common practice",
    summary: "The measured dry film is below the one needed.",
    answer: "Add coats, or have the reading judged by who applied it.",
    fix: "None: the film is wanted on the steel, not in the file.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: { product: red film, dft: 2000, reading: 300 } }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: { product: red film, dft: 2000, reading: 2000 } }",
};

/// A measured film below the one needed.
pub(super) fn check(cx: &mut Context<'_>) {
    let (Some(state), Some(product)) = (&cx.outcome.protected, cx.product) else {
        return;
    };
    let (Ok(needed), Some(reading)) = (&state.requirement, product.stated.reading.value()) else {
        return;
    };
    if reading.mm() + 1e-9 >= needed.exact.mm() {
        return;
    }
    let message = format!(
        "{}: the measured film of {} is below the {} needed",
        cx.mark,
        cx.thickness(*reading, true),
        cx.needed(needed.exact, true)
    );
    let own = product
        .stated
        .reading
        .span()
        .filter(|_| !cx.own().protection.is_absent());
    cx.add(&DECLARATION, "reading", own, message);
}
