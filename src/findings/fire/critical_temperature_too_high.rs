//! The critical temperature stated is above the one that the loading gives.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "critical-temperature-too-high",
    severity: Severity::Error,
    clause: "EN 1993-1-2:2005 4.2.4",
    summary: "The critical temperature stated is above the one that the loading gives.",
    answer: "Correct one of the two; without a stated temperature the loading's is used.",
    fix: "Writes the temperature that the loading gives, where the member states its own.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 650, loading: { utilisation: 0.6 }, protection: grey board }",
    after: r"- { mark: B1, section: IPE 300, loading: { utilisation: 0.6 }, protection: grey board }",
};
