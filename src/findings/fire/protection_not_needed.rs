//! The member would last its period bare.

use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "protection-not-needed",
    severity: Severity::Hint,
    clause: "EN 1993-1-2:2005 4.2.5.1",
    summary: "The member would last its period bare.",
    answer: "Consider whether the protection is wanted for another reason.",
    fix: "None: protection is never removed by a fix.",
    before: r"- { mark: B1, section: IPE 600, critical temperature: 600, period: 15, protection: { product: grey board, thickness: 15 } }",
    after: "- { mark: B1, section: IPE 600, critical temperature: 600, period: 15 }",
};

/// A protected member that would last bare.
pub(super) fn check(cx: &mut Context<'_>) {
    let (Some(_), Some(critical), Some(bare), Some(period)) =
        (&cx.outcome.protected, &cx.outcome.critical, cx.outcome.bare, cx.period)
    else {
        return;
    };
    // A stated temperature that the loading contradicts proves nothing.
    if critical.contradicted_by().is_some() || bare.resistance.is_some_and(|time| time.min() < period.min()) {
        return;
    }
    let reaches = bare.at_period.map_or_else(String::new, |steel| {
        format!(
            ": its steel would reach {}, and may reach {}",
            cx.temperature(steel),
            cx.temperature(critical.bare)
        )
    });
    let message = format!("{} would last its {:.0} min bare{reaches}", cx.mark, period.min());
    cx.add(&DECLARATION, "protection", cx.own().protection.span(), message);
}
