//! The bare member reaches its critical temperature before its period ends.

use crate::analysis::outcome::Verdict;
use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "bare-steel-fails",
    severity: Severity::Error,
    clause: "EN 1993-1-2:2005 4.2.5.1",
    summary: "The bare member reaches its critical temperature before its period ends.",
    answer: "Protect it, or take a heavier section.",
    fix: "None: which protection serves is a choice.",
    before: "- { mark: B1, section: IPE 300, critical temperature: 550 }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, protection: grey board }",
};

/// A bare member that does not last.
pub(super) fn check(cx: &mut Context<'_>) {
    let (Some(critical), Some(state), Some(section), Some(period)) =
        (&cx.outcome.critical, cx.outcome.bare, &cx.outcome.section, cx.period)
    else {
        return;
    };
    if cx.product.is_some() || cx.outcome.protected.is_some() || cx.outcome.verdict != Verdict::Fails {
        return;
    }
    let lasts = state
        .resistance
        .map_or_else(String::new, |time| format!(" after {:.0} min", time.min().floor()));
    // What lasts for less than half of its period is not brought to it by more steel.
    let near = state.resistance.is_some_and(|time| time.min() >= 0.5 * period.min());
    let answer = if near {
        "Protect it, or take a heavier section"
    } else {
        "Protect it"
    };
    let message = format!(
        "{} is bare and reaches its critical temperature of {}{lasts}, but must last {:.0} min: it has {}. {answer}",
        cx.mark,
        cx.temperature(critical.bare),
        period.min(),
        cx.factor(section.bare_factor)
    );
    cx.add(&DECLARATION, "protection", cx.own().protection.span(), message);
}
