//! A bare member rests on a protected one and draws heat into it.

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
