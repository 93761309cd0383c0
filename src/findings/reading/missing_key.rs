//! A key is missing without which nothing can be said.

use crate::analysis::outcome::Gap;
use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "missing-key",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "A key is missing without which nothing can be said.",
    answer: "Add the key to the member, its group or the defaults.",
    fix: "None: the value is the author's to give.",
    before: "- { mark: B1 }   # no section",
    after: "- { mark: B1, section: IPE 300 }",
};

/// Keys that neither the member nor its group nor the defaults give. A broken member may have them where they can't be
/// read, and an unknown or broken group might give them, so nothing is said of those.
pub(super) fn check(cx: &mut Context<'_>) {
    let outcome = cx.outcome;
    let broken = cx.design.member(cx.at).value().broken || outcome.gaps.contains(&Gap::Unread("group"));
    for gap in &outcome.gaps {
        match gap {
            Gap::Unread(key) if !broken && wanted_and_absent(cx, key) => {
                let message = format!("{} has no `{key}`, nor has its group or `defaults`", cx.mark);
                cx.add(&DECLARATION, key, None, message);
            }
            // Of a key that the member itself lacks it is said once.
            Gap::Missing(key) if !outcome.gaps.contains(&Gap::Unread(key)) => {
                let message = format!(
                    "{} has no `{key}` in its `loading`, which its resistance in fire depends on",
                    cx.mark
                );
                cx.add(&DECLARATION, key, cx.own().loading.span(), message);
            }
            _ => {}
        }
    }
}

fn wanted_and_absent(cx: &Context<'_>, key: &str) -> bool {
    match key {
        "role" => cx.keys.get(|keys| &keys.role).given.is_absent(),
        "section" => cx.keys.get(|keys| &keys.section).given.is_absent(),
        "steel" => cx.keys.get(|keys| &keys.steel).given.is_absent(),
        "period" => cx.keys.get(|keys| &keys.period).given.is_absent(),
        _ => false,
    }
}
