//! The film takes more than three coats.

use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "too-many-coats",
    severity: Severity::Warning,
    clause: "common practice",
    summary: "The film takes more than three coats.",
    answer: "Consider a heavier section or a board.",
    fix: "None: what to take instead is a choice.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: { product: red film, dft: 2400 } }   # at most 500 µm a coat",
    after: r"- { mark: B1, section: HE 300 B, critical temperature: 550, protection: { product: red film, dft: 1400 } }",
};

/// Coats beyond which another protection is usually the better choice.
const MOST: u32 = 3;

/// A film of many coats.
pub(super) fn check(cx: &mut Context<'_>) {
    let (Some(state), Some(product)) = (&cx.outcome.protected, cx.product) else {
        return;
    };
    if let (true, Some(coats), Some(film)) = (product.film, state.layers.filter(|coats| *coats > MOST), state.provided)
    {
        let message = format!(
            "{}: {} of `{}` takes {coats} coats; more than {MOST} are slow to apply and hard to keep even",
            cx.mark,
            cx.thickness(film, true),
            product.name
        );
        cx.add(&DECLARATION, "protection", cx.own().protection.span(), message);
    }
}
