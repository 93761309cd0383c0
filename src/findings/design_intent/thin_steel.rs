//! The steel is thin for its period: V/A under 3.5 mm at 60 min and over.

use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "thin-steel",
    severity: Severity::Hint,
    clause: "common practice",
    summary: "The steel is thin for its period: V/A under 3.5 mm at 60 min and over.",
    answer: "Consider a heavier section.",
    fix: "None: which section serves is a choice.",
    before: "- { mark: B1, section: IPE 100, critical temperature: 550 }",
    after: "- { mark: B1, section: HE 200 B, critical temperature: 550 }",
};

/// V/A below which protection for 60 min and over becomes hard, in mm.
const LEAST: f64 = 3.5;

/// Steel that is hard to protect for its period.
pub(super) fn check(cx: &mut Context<'_>) {
    let (Some(section), Some(period)) = (&cx.outcome.section, cx.period) else {
        return;
    };
    if section.factor.effective_thickness().mm() < LEAST && period.min() >= 60.0 {
        let message = format!(
            "{} is thin steel for {:.0} min: {}",
            cx.mark,
            period.min(),
            cx.factor(section.factor)
        );
        cx.add(&DECLARATION, "section", cx.own().section.span(), message);
    }
}
