//! Faces are said to be covered, but nothing sound covers them.

use crate::analysis::exposure::{ShieldDoubt, reached};
use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;
use crate::section::Exposure;

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

/// Faces that are said to be covered by something unsaid or unsound.
pub(super) fn check(cx: &mut Context<'_>) {
    let exposure = cx.keys.get(|keys| &keys.exposure).value().copied();
    let shield = cx.keys.get(|keys| &keys.shield).value().copied();
    let Some(doubt) = reached(exposure.unwrap_or(Exposure::AllRound), shield).doubt else {
        return;
    };
    let why = match doubt {
        ShieldDoubt::NotStated => {
            "nothing is said to cover the rest: state `shielded by` (computed as stated, κ1 = 1)".to_owned()
        }
        ShieldDoubt::NoShield => "bare sheeting or nothing is no shield: computed all round".to_owned(),
        ShieldDoubt::LowContact(share) => format!(
            "the deck touches {:.0} % of the flange, less than 85 %, and its voids are not filled: computed all round",
            100.0 * share
        ),
        ShieldDoubt::VoidsOpen => {
            "the deck's contact is not stated and its voids are not filled: computed all round".to_owned()
        }
    };
    let message = format!("{} is exposed on part of its faces, but {why}", cx.mark);
    cx.add(&DECLARATION, "exposure", cx.own().exposure.span(), message);
}
