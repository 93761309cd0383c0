//! A departure departs from nothing that was found.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "departure-unused",
    severity: Severity::Hint,
    clause: "common practice",
    summary: "A departure departs from nothing that was found.",
    answer: "Remove it.",
    fix: "None: the finding may come back with the next change.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, departures: [ { from: thin-steel, because: as built } ] }",
    after: "- { mark: B1, section: IPE 300, critical temperature: 550 }",
};
