//! A board is to follow the profile; boards box the section in.

use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::insert;
use crate::findings::registry::Declaration;
use crate::protection::product::Kind;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "profile-board",
    severity: Severity::Warning,
    clause: "common practice",
    summary: "A board is to follow the profile; boards box the section in.",
    answer: "Take the box form, or a spray that follows the profile.",
    fix: "Writes `form: box` into the member itself.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: { product: grey board, form: profile } }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: { product: grey board, form: box } }",
};

/// A board in profile form.
pub(super) fn check(cx: &mut Context<'_>) {
    let Some(product) = cx.product else { return };
    let board = product
        .named
        .product
        .as_ref()
        .is_some_and(|product| product.kind == Kind::Board);
    if !board || product.stated.boxed.value() != Some(&false) {
        return;
    }
    let own = product.stated.boxed.span().filter(|_| !cx.own().protection.is_absent());
    let message = format!(
        "{}: `{}` is a board, and boards box the section in: take the box form, or a spray that follows the profile",
        cx.mark, product.name
    );
    cx.add(&DECLARATION, "form", own, message);
    match own {
        Some(span) => cx.fix("write `box`".to_owned(), span, "box".to_owned()),
        None => {
            if let Some(value) = insert::protection(product.stated, &[("form", "box")]) {
                cx.state("box it in here".to_owned(), "protection", &value);
            }
        }
    }
}
