//! A departure lacks its reason, or from an error who agreed and until when.

use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "departure-without-reason",
    severity: Severity::Error,
    clause: "common practice",
    summary: "A departure lacks its reason, or from an error who agreed and until when.",
    answer: "Add `because`, and from an error `by` and `until`.",
    fix: "None: the reason is the author's to give.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, departures: [ { from: bare-steel-fails, by: checker, until: 2027-06-30 } ] }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, departures: [ { from: bare-steel-fails, because: sprinklers agreed, by: checker, until: 2027-06-30 } ] }",
};
