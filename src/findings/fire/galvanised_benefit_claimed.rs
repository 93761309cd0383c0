//! The lower emissivity of a declared zinc coating is used.

use crate::design::model::member::Surface;
use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;
use crate::units::Temperature;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "galvanised-benefit-claimed",
    severity: Severity::Information,
    clause: "EN 1993-1-2, second generation",
    summary: "The lower emissivity of a declared zinc coating is used.",
    answer: "See that the declaration holds for what is delivered.",
    fix: "None: nothing is wrong.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, period: 15, surface: { galvanised: { to: EN ISO 1461, category: A } } }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, period: 15, surface: galvanised }   # no benefit",
};

/// A member whose zinc coating is counted on.
pub(super) fn check(cx: &mut Context<'_>) {
    let surface = cx.keys.get(|keys| &keys.surface).value();
    // Behind protection nothing radiates onto the zinc.
    let protection = cx.keys.get(|keys| &keys.protection).value();
    if protection.is_some_and(|stated| stated.product.is_some()) {
        return;
    }
    if matches!(surface, Some(Surface::GalvanisedTo { category: 'A' | 'B' })) {
        let message = format!(
            "{} is computed with an emissivity of 0.35 up to {} for its declared zinc coating",
            cx.mark,
            cx.temperature(Temperature::from_celsius(500.0))
        );
        cx.add(&DECLARATION, "surface", cx.own().surface.span(), message);
    }
}
