//! The registry: every finding declared once, with its severity, clause, meaning and an example.

use super::finding::Severity;

/// When a finding is decided.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub enum Phase {
    /// While the text is read.
    Reading,
    /// From one member alone.
    Member,
    /// From several members, groups or products.
    Design,
    /// From the departures, when all else is known.
    Departures,
}

/// Whether a finding comes with a fix, or why it does not.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum FixPolicy {
    /// What the fix does.
    Offered(&'static str),
    /// Why none is offered.
    None(&'static str),
}

/// What is known of a finding before any design is read.
#[derive(Debug, PartialEq, Eq)]
pub struct Declaration {
    /// Kebab-case; reads after "departure from".
    pub name: &'static str,
    /// How grave it is.
    pub severity: Severity,
    /// When it is decided.
    pub phase: Phase,
    /// The clause, or "common practice".
    pub clause: &'static str,
    /// What is wrong, in one sentence.
    pub summary: &'static str,
    /// Why it matters and how to answer it, in plain words.
    pub explanation: &'static str,
    /// A piece of a design file that has it.
    pub before: &'static str,
    /// The same piece, answered.
    pub after: &'static str,
    /// Whether it comes with a fix.
    pub fix: FixPolicy,
}
