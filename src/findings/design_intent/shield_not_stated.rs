//! Faces are said to be covered, but nothing sound covers them.

use super::doubt;
use crate::analysis::exposure::ShieldDoubt;
use crate::design::model::member::Shield;
use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "shield-not-stated",
    severity: Severity::Warning,
    clause: "EN 1994-1-2:2005 4.3.4.2.2",
    summary: "Faces are said to be covered, but nothing sound covers them.",
    answer: "State `shielded by`: a slab, a concreted deck or a wall.",
    fix: "None: what covers the member is the author's to say.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, exposure: three sides }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, exposure: three sides, shielded by: slab }",
};

/// Faces that are said to be covered by something unsaid, or by nothing that stops a fire.
pub(super) fn check(cx: &mut Context<'_>) {
    let why = match doubt(cx) {
        Some(ShieldDoubt::NotStated) => {
            "nothing is said to cover the rest: state `shielded by` (computed as stated, κ1 = 1)"
        }
        Some(ShieldDoubt::NoShield) => match cx.keys.get(|keys| &keys.shield).value() {
            Some(Shield::Deck { concrete: None, .. }) => {
                "its deck is not said to carry concrete: computed all round until `concrete: yes` is stated"
            }
            Some(Shield::Deck { .. }) => "bare sheeting is no shield: computed all round",
            _ => "it is shielded by nothing: computed all round",
        },
        _ => return,
    };
    let message = format!("{} is exposed on part of its faces, but {why}", cx.mark);
    let (own, key) = match cx.own().shield.span() {
        Some(span) => (Some(span), "shielded by"),
        None => (cx.own().exposure.span(), "exposure"),
    };
    cx.add(&DECLARATION, key, own, message);
}
