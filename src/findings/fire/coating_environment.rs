//! The coating may not serve in the member's environment.

use crate::design::model::member::Environment;
use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "coating-environment",
    severity: Severity::Error,
    clause: "EN 13381-8, EAD 350402: use categories X, Y, Z1, Z2",
    summary: "The coating may not serve in the member's environment.",
    answer: "Take a coating for the environment.",
    fix: "None: which product serves is a choice.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, environment: X, protection: red film }   # serves in Z2",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, environment: Z2, protection: red film }",
};

/// A coating outside the environments that it serves in. One for a more severe environment serves the milder ones.
pub(super) fn check(cx: &mut Context<'_>) {
    let Some(product) = cx.product.filter(|product| product.film) else {
        return;
    };
    let wanted = cx.keys.get(|keys| &keys.environment).value().copied();
    let Some(wanted) = wanted else { return };
    let message = match product.named.environment {
        Some(serves) if serves > wanted => Some(format!(
            "{} stands in {}, but `{}` serves in {} at most",
            cx.mark,
            wanted.words(),
            product.name,
            serves.words()
        )),
        // Every coating serves in the mildest; that it serves in more is not to be guessed.
        None if wanted < Environment::Z2 => Some(format!(
            "{} stands in {}, but `{}` states no environment that it serves in",
            cx.mark,
            wanted.words(),
            product.name
        )),
        _ => None,
    };
    if let Some(message) = message {
        cx.add(&DECLARATION, "protection", cx.own().protection.span(), message);
    }
}
