//! The voids between deck and flange are not said to be filled, nor how much of the flange the deck touches.

use super::doubt;
use crate::analysis::exposure::{CONTACT, ShieldDoubt};
use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "deck-voids-unfilled",
    severity: Severity::Warning,
    clause: "EN 1994-1-2:2005 4.3.4.2.2",
    summary: "The voids between deck and flange are not said to be filled, nor how much of the flange the deck touches.",
    answer: "Say `voids filled: yes` where they are, or state the `contact` of the deck.",
    fix: "None: what is built above the flange is the author's to say.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: grey board, exposure: three sides, shielded by: { deck: { concrete: yes } } }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: grey board, exposure: three sides, shielded by: { deck: { concrete: yes, voids filled: yes } } }",
};

/// A deck of which nothing is known that would make it a slab.
pub(super) fn check(cx: &mut Context<'_>) {
    if doubt(cx) != Some(ShieldDoubt::VoidsOpen) {
        return;
    }
    let message = format!(
        "{}: the voids above its flange are not said to be filled, nor that the deck touches {:.0} % of it: computed all round",
        cx.mark,
        100.0 * CONTACT
    );
    cx.add(&DECLARATION, "shielded by", cx.own().shield.span(), message);
}
