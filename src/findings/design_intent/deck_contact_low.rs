//! The deck touches too little of the flange to count as a slab.

use super::doubt;
use crate::analysis::exposure::{CONTACT, ShieldDoubt};
use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "deck-contact-low",
    severity: Severity::Warning,
    clause: "EN 1994-1-2:2005 4.3.4.2.2",
    summary: "The deck touches too little of the flange to count as a slab.",
    answer: "Have its voids filled above the flange and say `voids filled: yes`, or protect the member all round.",
    fix: "None: what is built above the flange is the author's to say.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: grey board, exposure: three sides, shielded by: { deck: { concrete: yes, contact: 0.5, voids filled: no } } }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: grey board, exposure: three sides, shielded by: { deck: { concrete: yes, contact: 0.9 } } }",
};

/// A deck whose stated contact is less than that of a slab, over voids that are open.
pub(super) fn check(cx: &mut Context<'_>) {
    let Some(ShieldDoubt::LowContact(share)) = doubt(cx) else {
        return;
    };
    let message = format!(
        "{}: the deck touches {} % of the flange, less than {:.0} %, and its voids are not filled: computed all round",
        cx.mark,
        // Cut, not rounded: 84.99 % must not read as the 85 % that would do.
        crate::units::significant((1000.0 * share + 1e-6).floor() / 10.0, 1),
        100.0 * CONTACT
    );
    cx.add(&DECLARATION, "shielded by", cx.own().shield.span(), message);
}
