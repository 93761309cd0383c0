//! A bare member rests on a protected one and draws heat into it.

use super::{Cover, Support};
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;
use crate::units::Length;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "bare-on-protected",
    severity: Severity::Warning,
    clause: "common practice",
    summary: "A bare member rests on a protected one and draws heat into it.",
    answer: "Run the protection on for 500 mm along the bare member.",
    fix: "None: it is done on site and shown on the drawing.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 600, period: 15, supported by: [B2] }
- { mark: B2, section: IPE 400, critical temperature: 550, protection: grey board }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 600, period: 15, protection: grey board, supported by: [B2] }
- { mark: B2, section: IPE 400, critical temperature: 550, protection: grey board }",
};

/// How far the protection runs on along the bare member, in mm.
const RUN_ON: f64 = 500.0;

/// A bare member on a protected support, by what the file states: heat flows whether or not either is verified.
pub(super) fn check(link: &mut Support<'_>) {
    if (link.carried, link.cover) == (Cover::Bare, Cover::Product) {
        let message = format!(
            "{0} is bare and rests on {1}, which is protected: run the protection on for {2} along {0}",
            link.mark,
            link.name,
            link.units.thickness(Length::from_mm(RUN_ON))
        );
        link.add(&DECLARATION, message);
    }
}
