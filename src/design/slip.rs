//! What the reading of a design finds wrong: data, to which `findings` gives names and severities.

use std::borrow::Cow;

use crate::text::Span;

/// The kind of a slip.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub enum SlipKind {
    /// A key that its mapping does not take.
    UnknownKey,
    /// A key without which a mapping is incomplete.
    MissingKey,
    /// A value of another kind than the key wants.
    WrongKind,
    /// A unit that measures something else, or is not known.
    WrongUnit,
    /// A value outside what is physically possible.
    OutOfBounds,
    /// A text that is not YAML 1.2 (a key that stands twice in its mapping).
    NotYaml,
    /// A mark that stands twice in the design.
    DuplicateMark,
    /// A designation of no section table.
    UnknownSection,
    /// A designation that fits several rows.
    AmbiguousSection,
    /// A product that no library has.
    UnknownProduct,
    /// A group that the design does not have.
    UnknownGroup,
    /// A steel grade that is not known.
    UnknownSteel,
    /// A fire that the design does not have.
    UnknownFire,
    /// A mark that no member has.
    UnknownMark,
    /// A method or edition that is not supported.
    MethodNotSupported,
}

/// A remark beside a slip, with a place of its own or none.
#[derive(Debug, Clone, PartialEq)]
pub struct Remark {
    /// The text.
    pub text: String,
    /// Where, in the same file.
    pub span: Option<Span>,
}

/// A change to the text that repairs a slip. Edits are sorted and disjoint; their spans are those of the slip's file.
#[derive(Debug, Clone, PartialEq)]
pub struct Repair {
    /// What it does, in the imperative: "write `section`".
    pub title: String,
    /// Whether the meaning is certain; an unsafe repair is a guess that a person should look at.
    pub safe: bool,
    /// The edits.
    pub edits: Vec<Edit>,
}

/// Replaces the text of a span.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Edit {
    /// What is replaced.
    pub span: Span,
    /// What is written instead.
    pub text: String,
}

/// Something wrong with the text of a design.
#[derive(Debug, Clone, PartialEq)]
pub struct Slip {
    /// The kind.
    pub kind: SlipKind,
    /// The characters at fault.
    pub span: Span,
    /// Plain words that stand alone.
    pub message: String,
    /// Remarks beside it.
    pub remarks: Vec<Remark>,
    /// Repairs, the likeliest first.
    pub repairs: Vec<Repair>,
    /// The key concerned.
    pub key: Option<Cow<'static, str>>,
}

impl Slip {
    /// A slip without remarks or repairs.
    #[must_use]
    pub fn new(kind: SlipKind, span: Span, message: impl Into<String>) -> Self {
        Self {
            kind,
            span,
            message: message.into(),
            remarks: Vec::new(),
            repairs: Vec::new(),
            key: None,
        }
    }

    /// Names the key concerned.
    #[must_use]
    pub fn at_key(mut self, key: &'static str) -> Self {
        self.key = Some(Cow::Borrowed(key));
        self
    }

    /// Adds a remark.
    #[must_use]
    pub fn remark(mut self, text: impl Into<String>, span: Option<Span>) -> Self {
        self.remarks.push(Remark {
            text: text.into(),
            span,
        });
        self
    }

    /// Adds a repair that replaces one span.
    #[must_use]
    pub fn repair(mut self, title: impl Into<String>, safe: bool, span: Span, text: impl Into<String>) -> Self {
        self.repairs.push(Repair {
            title: title.into(),
            safe,
            edits: vec![Edit {
                span,
                text: text.into(),
            }],
        });
        self
    }

    /// Moves every span, for an item that was read by itself.
    #[must_use]
    pub fn shifted(mut self, by: u32) -> Self {
        self.span = self.span.shift(by);
        for remark in &mut self.remarks {
            remark.span = remark.span.map(|span| span.shift(by));
        }
        for edit in self.repairs.iter_mut().flat_map(|repair| &mut repair.edits) {
            edit.span = edit.span.shift(by);
        }
        self
    }
}
