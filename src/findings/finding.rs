//! A finding: data that the command line, the reports and the editor show.

use std::path::PathBuf;
use std::sync::Arc;

use crate::analysis::design::MemberAt;
use crate::text::Span;

/// How grave a finding is.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub enum Severity {
    /// Does not work, or can't be verified.
    Error,
    /// Wants a decision.
    Warning,
    /// Worth knowing.
    Information,
    /// Could be better.
    Hint,
}

impl Severity {
    /// All, the gravest first.
    pub const ALL: [Self; 4] = [Self::Error, Self::Warning, Self::Information, Self::Hint];

    /// The word of reports and JSON.
    #[must_use]
    pub const fn word(self) -> &'static str {
        match self {
            Self::Error => "error",
            Self::Warning => "warning",
            Self::Information => "information",
            Self::Hint => "hint",
        }
    }
}

/// A place in a file of the design.
#[derive(Debug, Clone, PartialEq, Eq, Hash)]
pub struct Place {
    /// The file.
    pub path: Arc<PathBuf>,
    /// The characters, as byte offsets into the file's text.
    pub span: Span,
}

/// A remark beside a finding, with or without a place.
#[derive(Debug, Clone, PartialEq)]
pub struct Note {
    /// The text, a sentence that stands alone.
    pub text: String,
    /// Where it belongs.
    pub place: Option<Place>,
}

/// A change to a file's text.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct FixEdit {
    /// The file and the characters replaced.
    pub place: Place,
    /// What is written instead.
    pub text: String,
}

/// A change that answers a finding. Edits are sorted and disjoint.
#[derive(Debug, Clone, PartialEq)]
pub struct Fix {
    /// What it does, in the imperative.
    pub title: String,
    /// Whether the meaning is certain. An unsafe fix changes the design and wants a decision.
    pub safe: bool,
    /// The edits.
    pub edits: Vec<FixEdit>,
}

/// Something that the design's author should know.
#[derive(Debug, Clone, PartialEq)]
pub struct Finding {
    /// What it is: one of the registry.
    pub declaration: &'static super::registry::Declaration,
    /// How grave it is here.
    pub severity: Severity,
    /// Plain words that carry the numbers and stand alone.
    pub message: String,
    /// Remarks beside it.
    pub notes: Vec<Note>,
    /// The characters at fault.
    pub place: Place,
    /// The member concerned.
    pub member: Option<MemberAt>,
    /// The member, group, fire or product concerned, by name.
    pub mark: Option<String>,
    /// The key concerned.
    pub key: Option<String>,
    /// What answers it, the likeliest first.
    pub fixes: Vec<Fix>,
}

impl Finding {
    /// A finding as grave as it is declared, without notes or fixes.
    #[must_use]
    pub fn new(declaration: &'static super::registry::Declaration, place: Place, message: String) -> Self {
        Self {
            declaration,
            severity: declaration.severity,
            message,
            notes: Vec::new(),
            place,
            member: None,
            mark: None,
            key: None,
            fixes: Vec::new(),
        }
    }

    /// The stable name: `too-slender-to-protect`.
    #[must_use]
    pub const fn name(&self) -> &'static str {
        self.declaration.name
    }
}
