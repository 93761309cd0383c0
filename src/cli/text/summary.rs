//! What stands under the findings: how many, how the members fare, what was agreed, and what to do next.

use super::{Manner, SHOWN, count, painted, wrapped};
use crate::analysis::outcome::Verdict;
use crate::check::Checked;
use crate::cli::output::message;
use crate::findings::finding::{Finding, Severity};

/// Agreed departures listed unless all are asked for.
const AGREED: usize = 10;

pub(super) fn summary(checked: &[Checked], findings: usize, manner: &Manner<'_>) -> String {
    let of = |severity: Severity| {
        checked
            .iter()
            .flat_map(|design| &design.findings)
            .filter(|finding| finding.severity == severity)
            .count()
    };
    let mut out = String::new();
    if !manner.demo && !manner.all && findings > SHOWN {
        out.push_str(&format!("{} more are not shown; --all shows them\n", findings - SHOWN));
    }
    let counts: Vec<String> = [
        (Severity::Error, "error"),
        (Severity::Warning, "warning"),
        (Severity::Information, "information"),
        (Severity::Hint, "hint"),
    ]
    .into_iter()
    .filter(|(severity, _)| of(*severity) > 0)
    .map(|(severity, noun)| painted(&count(of(severity), noun), severity, manner.color))
    .collect();
    out.push_str(&match counts.as_slice() {
        [] => "No findings.\n".to_owned(),
        counts => format!("{}\n", counts.join(", ")),
    });
    out.push_str(&members(checked));
    let agreed: Vec<&Finding> = checked.iter().flat_map(|design| &design.agreed).collect();
    let listed = if manner.all { usize::MAX } else { AGREED };
    for finding in agreed.iter().take(listed) {
        let line = message(&format!(
            "agreed departure from {}: {}",
            finding.name(),
            finding.message
        ));
        out.push_str(&wrapped(&line, 0, 4));
    }
    if agreed.len() > listed {
        out.push_str(&format!(
            "and {}\n",
            count(agreed.len() - listed, "more agreed departure")
        ));
    }
    out.push_str(
        "Local codes, product certification and the judgement of a licensed engineer come before these figures.\n",
    );
    out + &next(of(Severity::Error), manner)
}

/// How the members fare; each mark counts once, however many pieces it stands for.
fn members(checked: &[Checked]) -> String {
    let verdicts: Vec<Verdict> = checked
        .iter()
        .flat_map(|design| design.outcomes.iter().map(|outcome| outcome.verdict))
        .collect();
    let of = |verdict: Verdict| verdicts.iter().filter(|other| **other == verdict).count();
    let words = [
        (Verdict::Passes, "pass"),
        (Verdict::Fails, "fail"),
        (Verdict::CannotBeProtected, "cannot be protected"),
        (Verdict::NotVerified, "not verified (which is no pass)"),
        (Verdict::NoPeriod, "without a period"),
    ];
    let parts: Vec<String> = words
        .into_iter()
        .filter(|(verdict, _)| of(*verdict) > 0)
        .map(|(verdict, words)| format!("{} {words}", of(verdict)))
        .collect();
    if parts.is_empty() {
        return "No members.\n".to_owned();
    }
    format!("{}: {}\n", count(verdicts.len(), "member"), parts.join(", "))
}

fn next(errors: usize, manner: &Manner<'_>) -> String {
    if manner.demo {
        return "Building and products are invented; they serve no real one.\n\
                Next: `scorchline begin my-frame` writes these files to start from, `scorchline check my-frame` checks them,\n\
                `scorchline why too-slender-to-protect` explains a finding, `scorchline schedule --demo` prints the schedule.\n"
            .to_owned();
    }
    if errors > 0 {
        "Next: answer the errors, or agree a departure; `scorchline why NAME` explains each.\n".to_owned()
    } else {
        "Next: `scorchline schedule` prints the fire protection schedule.\n".to_owned()
    }
}
