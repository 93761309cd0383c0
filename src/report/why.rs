//! What a finding means, in plain text.

use crate::findings::registry::Declaration;

/// What a finding means: its gravity, clause, how to answer it, and an example before and after.
#[must_use]
pub fn explanation(found: &Declaration) -> String {
    format!(
        "{} ({}; {})\n{}\n{}\nFix: {}\n\nBefore:\n{}\n\nAfter:\n{}\n",
        found.name,
        found.severity.word(),
        found.clause,
        found.summary,
        found.answer,
        found.fix,
        indented(found.before),
        indented(found.after)
    )
}

/// An example, set off from the text around it.
fn indented(example: &str) -> String {
    example
        .lines()
        .map(|line| format!("    {line}"))
        .collect::<Vec<_>>()
        .join("\n")
}
