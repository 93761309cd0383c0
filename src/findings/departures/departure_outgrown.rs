//! The figures have worsened since the departure was agreed.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "departure-outgrown",
    severity: Severity::Error,
    clause: "common practice",
    summary: "The figures have worsened since the departure was agreed.",
    answer: "Agree it anew, or answer the finding.",
    fix: "None: figures are agreed, not filled in.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, departures: [ { from: bare-steel-fails, because: sprinklers agreed, by: checker, until: 2027-06-30, at: { section factor: 180 } } ] }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, departures: [ { from: bare-steel-fails, because: sprinklers agreed, by: checker, until: 2027-06-30, at: { section factor: 220 } } ] }",
};
