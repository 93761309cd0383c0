//! The fire lies outside the validity of its formula, or is a test exposure and no design fire.

use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;
use crate::heating::fire::Fire;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "fire-outside-validity",
    severity: Severity::Warning,
    clause: "EN 1991-1-2:2002 Annex A (1), EN 13381-8",
    summary: "The fire lies outside the validity of its formula, or is a test exposure and no design fire.",
    answer: "Take another fire, or justify it.",
    fix: "None: which fire is meant is the author's to say.",
    before: "- { mark: B1, section: IPE 300, critical temperature: 550, fire: slow heating }",
    after: "- { mark: B1, section: IPE 300, critical temperature: 550, fire: standard }",
};

/// A fire that is no design fire, or whose formula does not reach so far.
pub(super) fn check(cx: &mut Context<'_>) {
    let name = cx
        .keys
        .get(|keys| &keys.fire)
        .value()
        .map_or("standard", String::as_str);
    let span = cx.own().fire.span();
    match cx.design.fires.get(name).and_then(Option::as_deref) {
        Some(Fire::SlowHeating) => {
            let message = format!(
                "{} is computed in slow heating, which is a test exposure and no design fire",
                cx.mark
            );
            cx.add(&DECLARATION, "fire", span, message);
        }
        Some(Fire::Parametric(parametric)) => {
            for breach in parametric.outside_validity() {
                let message = format!(
                    "{}: the fire `{name}` is outside its validity: {}, {} is covered",
                    cx.mark, breach.what, breach.bound
                );
                cx.add(&DECLARATION, "fire", span, message);
            }
        }
        _ => {}
    }
}
