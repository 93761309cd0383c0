//! No assessed thickness of the product holds the section for the period.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "too-slender-to-protect",
    severity: Severity::Error,
    clause: "EN 13381-4, EN 13381-8: scope of the assessment",
    summary: "No assessed thickness of the product holds the section for the period.",
    answer: "Take a heavier section, box it in, or take another product.",
    fix: "Swaps to the nearest section of the family that the product holds, where the member names its designation itself. It changes the design, so it wants a decision.",
    before: r"- { mark: B1, section: IPE 80, critical temperature: 550, period: 120, protection: white spray }",
    after: r"- { mark: B1, section: IPE 450, critical temperature: 550, period: 120, protection: white spray }",
};
