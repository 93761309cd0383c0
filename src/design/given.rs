//! A value of a key as the file has it.

use crate::text::{Span, Spanned};

/// What a key holds. A value that can't be read is not the same as none: it must not be inherited over, and no verdict
/// may rest on a default in its stead.
#[derive(Debug, Clone, PartialEq, Eq, Hash, Default)]
pub enum Given<T> {
    /// The key isn't there.
    #[default]
    Absent,
    /// The key is there but its value can't be read; a slip says why.
    Unreadable(Unread),
    /// The value.
    Value(Spanned<T>),
}

/// Where an unreadable value stands. Equal to any other, as spans don't count for equality.
#[derive(Debug, Clone, Copy, Default)]
pub struct Unread {
    /// The value's characters.
    pub span: Span,
}

impl PartialEq for Unread {
    fn eq(&self, _: &Self) -> bool {
        true
    }
}

impl Eq for Unread {}

impl std::hash::Hash for Unread {
    fn hash<H: std::hash::Hasher>(&self, _: &mut H) {}
}

impl<T> Given<T> {
    /// A value read at a span.
    pub const fn new(value: T, span: Span) -> Self {
        Self::Value(Spanned { value, span })
    }

    /// A value that could not be read.
    #[must_use]
    pub const fn unreadable(span: Span) -> Self {
        Self::Unreadable(Unread { span })
    }

    /// The value, if it is there and can be read.
    pub const fn value(&self) -> Option<&T> {
        match self {
            Self::Value(spanned) => Some(&spanned.value),
            _ => None,
        }
    }

    /// Where the value stands, readable or not.
    pub const fn span(&self) -> Option<Span> {
        match self {
            Self::Absent => None,
            Self::Unreadable(unread) => Some(unread.span),
            Self::Value(spanned) => Some(spanned.span),
        }
    }

    /// Whether the key isn't there.
    pub const fn is_absent(&self) -> bool {
        matches!(self, Self::Absent)
    }

    /// Whether the key is there with a value that can't be read.
    pub const fn is_unreadable(&self) -> bool {
        matches!(self, Self::Unreadable(_))
    }

    /// The value turned into another, at the same place.
    pub fn map<U>(self, f: impl FnOnce(T) -> U) -> Given<U> {
        match self {
            Self::Absent => Given::Absent,
            Self::Unreadable(unread) => Given::Unreadable(unread),
            Self::Value(Spanned { value, span }) => Given::new(f(value), span),
        }
    }
}
