//! The section is class 4 in fire: 350 °C is taken.

use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;
use crate::resistance::critical::CLASS_4;
use crate::units::Temperature;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "class-4-temperature",
    severity: Severity::Warning,
    clause: "EN 1993-1-2:2005 4.2.3.6 (2)",
    summary: "The section is class 4 in fire: 350 °C is taken.",
    answer: "Take a stockier section if 350 °C is too low.",
    fix: "None: which section serves is a choice.",
    before: "- { mark: C1, role: column, section: IPE 360, loading: { utilisation: 0.5 } }",
    after: "- { mark: C1, role: column, section: HE 200 B, loading: { utilisation: 0.5 } }",
};

/// A member that is held to the temperature of class 4.
pub(super) fn check(cx: &mut Context<'_>) {
    let critical = cx.outcome.critical.as_ref();
    let Some((_, why)) = critical.and_then(|critical| critical.governing.split_once("class 4: ")) else {
        return;
    };
    let message = format!(
        "{} is class 4 in fire ({why}), so that it may buckle locally: at most {} is taken",
        cx.mark,
        cx.temperature(Temperature::from_celsius(CLASS_4))
    );
    cx.add(&DECLARATION, "section", cx.own().section.span(), message);
}
