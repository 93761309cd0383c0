//! The named default of the basis is taken as critical temperature.

use crate::analysis::outcome::LimitFrom;
use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "critical-temperature-assumed",
    severity: Severity::Warning,
    clause: "EN 1993-1-2:2005 4.2.4",
    summary: "The named default of the basis is taken as critical temperature.",
    answer: "Give the loading when it is known.",
    fix: "None: the load is the author's to give.",
    before: r"- { mark: B1, section: IPE 300, exposure: three sides, shielded by: slab, protection: grey board }",
    after: r"- { mark: B1, section: IPE 300, exposure: three sides, shielded by: slab, protection: grey board, loading: { utilisation: 0.6 } }",
};

/// A member that takes the named default.
pub(super) fn check(cx: &mut Context<'_>) {
    let assumed = cx
        .outcome
        .critical
        .as_ref()
        .filter(|critical| critical.from == LimitFrom::Default);
    let Some(critical) = assumed else { return };
    let message = format!(
        "{} states neither loading nor a critical temperature: the named default of {} is taken",
        cx.mark,
        cx.temperature(critical.as_built)
    );
    cx.add(&DECLARATION, "loading", cx.own().loading.span(), message);
}
