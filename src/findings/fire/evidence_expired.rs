//! The evidence behind the product has expired.

use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "evidence-expired",
    severity: Severity::Warning,
    clause: "common practice",
    summary: "The evidence behind the product has expired.",
    answer: "Get the current report.",
    fix: "None: only a new report answers it.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: old spray }   # its report expired on 2026-01-31",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: white spray }",
};

/// A product whose report has run out on the day of the check.
pub(super) fn check(cx: &mut Context<'_>) {
    let Some(product) = cx.product else { return };
    if let Some(expires) = product
        .named
        .evidence
        .expires
        .as_ref()
        .filter(|date| date.value < cx.on)
    {
        let message = format!(
            "{}: the evidence of `{}` expired on {}",
            cx.mark, product.name, expires.value
        );
        cx.add(&DECLARATION, "protection", cx.own().protection.span(), message);
    }
}
