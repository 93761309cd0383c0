//! A bare member rests on a protected one and draws heat into it.

use super::Support;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

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

/// A bare member on a protected support.
pub(super) fn check(link: &mut Support<'_>) {
    if link.carried.protected.is_none() && link.carried.bare.is_some() && link.outcome.protected.is_some() {
        let message = format!(
            "{0} is bare and rests on {1}, which is protected: run the protection on for 500 mm along {0}",
            link.mark, link.name
        );
        link.add(&DECLARATION, message);
    }
}
