//! A utilisation sets the critical temperature of a member that may buckle.

use crate::analysis::outcome::Buckling;
use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;
use crate::units::significant;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "critical-temperature-ignores-buckling",
    severity: Severity::Warning,
    clause: "EN 1993-1-2:2005 4.2.4 (2)",
    summary: "A utilisation sets the critical temperature of a member that may buckle.",
    answer: "Give the axial force in fire with the buckling length, so that buckling in fire is checked.",
    fix: "None: force and length are the author's to give.",
    before: "- { mark: C1, role: column, section: HE 200 B, loading: { utilisation: 0.5 } }",
    after: "- { mark: C1, role: column, section: HE 200 B, loading: { axial: 600 kN, buckling length: 2.1 m } }",
};

/// A member that may be compressed, whose limit comes from (4.22).
pub(super) fn check(cx: &mut Context<'_>) {
    let Some(critical) = &cx.outcome.critical else { return };
    let Some(buckling) = critical.buckling else { return };
    let doubt = match buckling {
        Buckling::LengthUnknown => "its buckling length is not given".to_owned(),
        Buckling::Slender(slenderness) => format!(
            "by its buckling length its slenderness is {} at 20 °C, where above 0.2 buckling counts",
            significant(slenderness, 2)
        ),
    };
    let message = format!(
        "{}: its critical temperature of {} rests on a utilisation, which ignores buckling: {doubt}",
        cx.mark,
        cx.temperature(critical.as_built)
    );
    cx.add(&DECLARATION, "loading", cx.own().loading.span(), message);
}
