//! The critical temperature stated is above the one that the loading gives.

use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;
use crate::units::{DisplayUnits, significant};

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "critical-temperature-too-high",
    severity: Severity::Error,
    clause: "EN 1993-1-2:2005 4.2.4",
    summary: "The critical temperature stated is above the one that the loading gives.",
    answer: "Correct one of the two; without a stated temperature the loading's is used.",
    fix: "Writes the temperature that the loading gives into the member.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 650, loading: { utilisation: 0.6 }, protection: grey board }",
    after: r"- { mark: B1, section: IPE 300, loading: { utilisation: 0.6 }, protection: grey board }",
};

/// A stated temperature that the loading contradicts; the member is not verified while it does.
pub(super) fn check(cx: &mut Context<'_>) {
    let Some(critical) = &cx.outcome.critical else { return };
    let Some(derived) = critical.contradicted_by() else {
        return;
    };
    let message = format!(
        "{} is not verified: it states a critical temperature of {}, but its loading gives {}",
        cx.mark,
        cx.temperature(critical.as_built),
        cx.temperature(derived)
    );
    let span = cx.own().critical_temperature.span();
    cx.add(&DECLARATION, "critical temperature", span, message);
    // Rounded down, in the units of the design.
    let value = match cx.units {
        DisplayUnits::Metric => significant(derived.celsius().floor(), 0),
        DisplayUnits::Imperial => format!("{:.0} °F", (derived.celsius() * 1.8 + 32.0).floor()),
    };
    let shown = if cx.units == DisplayUnits::Metric { " °C" } else { "" };
    let title = format!("state {value}{shown}, which the loading gives");
    match span {
        Some(span) => cx.fix(title, span, value),
        None => cx.state(title, "critical temperature", &value),
    }
}
