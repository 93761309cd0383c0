//! The wording of errors, each with its likely repair.

use granit_parser::ErrorKind as Fault;

use crate::syntax::{ErrorKind, MAX_DEPTH, Repair, SyntaxError};
use crate::text::{Edit, Span};

/// An error of a text that is no YAML 1.2.
pub(super) fn not_yaml(span: Span, message: impl Into<String>) -> SyntaxError {
    SyntaxError {
        span,
        kind: ErrorKind::NotYaml,
        message: message.into(),
        repair: None,
    }
}

impl SyntaxError {
    /// Adds a repair that replaces one span.
    pub(super) fn repaired(
        mut self,
        title: impl Into<String>,
        safe: bool,
        span: Span,
        text: impl Into<String>,
    ) -> Self {
        self.repair = Some(Repair {
            title: title.into(),
            safe,
            edits: vec![Edit {
                span,
                text: text.into(),
            }],
        });
        self
    }
}

/// An alias without its anchor.
pub(super) fn unknown_alias(span: Span, name: &str) -> SyntaxError {
    not_yaml(
        span,
        format!("the alias `*{name}` has no anchor `&{name}` before it; a text that begins with `*` needs quotes"),
    )
}

/// A tab in the indentation.
pub(super) fn tab(span: Span, lead: Span, column: usize) -> SyntaxError {
    not_yaml(span, "a tab indents this line; YAML indents with spaces").repaired(
        "indent with spaces",
        false,
        lead,
        " ".repeat(column),
    )
}

/// A key out of the column of its mapping.
pub(super) fn misplaced(lead: Span, indent: usize, column: usize) -> SyntaxError {
    not_yaml(
        lead,
        format!("this line is indented by {indent}, the keys of its mapping by {column}; they stand in one column"),
    )
    .repaired(format!("indent by {column}"), false, lead, " ".repeat(column))
}

/// A line without a colon.
pub(super) fn missing_colon(span: Span, words: &str) -> SyntaxError {
    let error = not_yaml(span, String::new());
    // Keys are words in small letters: the value begins at the first capital or digit, or else behind the first word.
    let value = words
        .match_indices(' ')
        .map(|(at, _)| at)
        .find(|at| words[at + 1..].starts_with(|c: char| c.is_uppercase() || c.is_ascii_digit() || "{[\"'".contains(c)))
        .or_else(|| words.find(' '));
    let Some(at) = value else {
        let message = format!("`{words}` has no colon; a line here is `key: value`");
        return SyntaxError { message, ..error };
    };
    let repaired = format!("{}: {}", &words[..at], words[at + 1..].trim_start());
    let message = format!("`{words}` has no colon; perhaps `{repaired}` is meant");
    SyntaxError { message, ..error }.repaired(format!("write `{repaired}`"), false, span, repaired)
}

/// What the parser found, where nothing closer to the cause is known.
pub(super) fn fault(text: &str, at: u32, fault: &Fault) -> SyntaxError {
    let span = character(text, at as usize);
    let message = match fault {
        Fault::RecursionLimitExceeded => {
            return SyntaxError {
                span,
                kind: ErrorKind::Limit,
                message: format!("nesting deeper than {MAX_DEPTH} levels is not read"),
                repair: None,
            };
        }
        Fault::UnexpectedCharacter { character } if character.is_control() => {
            format!(
                "the control character U+{:04X} can't stand in YAML",
                u32::from(*character)
            )
        }
        Fault::UnexpectedCharacter { character } => {
            format!("`{character}` can't begin a value; put the text into quotes")
        }
        Fault::BomInsideDocument => "a byte order mark stands in the middle of the text; delete it".to_owned(),
        Fault::UndeclaredTagHandle => "this tag has a handle that no `%TAG` line declares".to_owned(),
        Fault::UnsupportedYamlMajorVersion => "this version of YAML is not read; write `%YAML 1.2`".to_owned(),
        Fault::CommentInterceptedScalar => "a comment stands inside a text of several lines; put it before".to_owned(),
        Fault::CommentNotSeparated => "a comment needs a space before its `#`".to_owned(),
        Fault::InvalidSimpleKey | Fault::SimpleKeyExpected => {
            "a key is one line of at most 1024 characters with its colon".to_owned()
        }
        Fault::ZeroBlockScalarIndent | Fault::InvalidBlockScalarHeader => {
            "behind `|` or `>` may stand only `+` or `-`, a digit from 1 to 9, and a comment".to_owned()
        }
        Fault::InvalidBlockScalarIndent | Fault::TabAtBlockScalarStart => {
            "the lines of this text block are not indented alike with spaces".to_owned()
        }
        Fault::MissingAnchorOrAliasName => {
            "a name is wanted behind `&` or `*`; a text that begins so needs quotes".to_owned()
        }
        Fault::MissingDocumentEndBeforeDirective | Fault::ExpectedDocumentStart => {
            "`---` is wanted between lines that begin with `%` and the text".to_owned()
        }
        Fault::BlockSequenceEntryNotAllowed | Fault::BlockEntryInFlowCollection => {
            "a list entry can't begin here; entries stand below their key, each on a line of its own".to_owned()
        }
        Fault::MappingValueNotAllowed | Fault::MappingKeyNotAllowed => {
            "a key can't stand here; each stands on a line of its own, in the column of the others".to_owned()
        }
        Fault::UnclosedFlowCollection { open } => format!("this `{open}` is never closed"),
        Fault::UnclosedQuotedScalar => "the quote that opens here is never closed".to_owned(),
        _ => "the text breaks off being YAML 1.2 here".to_owned(),
    };
    not_yaml(span, message)
}

/// The character at an offset; at the end of the text or of a line, the last one before it.
pub(super) fn character(text: &str, at: usize) -> Span {
    let at = text.floor_char_boundary(at.min(text.len()));
    match text[at..].chars().next() {
        Some(c) if c != '\n' && c != '\r' => Span::new(at, at + c.len_utf8()),
        _ => {
            let before = text[..at].trim_end();
            match before.chars().next_back() {
                Some(c) => Span::new(before.len() - c.len_utf8(), before.len()),
                None => Span::new(at, at),
            }
        }
    }
}

/// The first character of a stretch of comments that YAML 1.2 section 5.1 does not allow.
pub(super) fn unprintable(text: &str, from: usize, to: usize) -> Option<SyntaxError> {
    let allowed = |c: char| matches!(c, '\t' | '\n' | '\r' | ' '..='~' | '\u{85}' | '\u{a0}'..='\u{d7ff}' | '\u{e000}'..='\u{fffd}' | '\u{10000}'..);
    let begins = |at: usize| from + at == 0 || text[..from + at].ends_with(['\n', '\r']);
    let mut characters = text.get(from..to)?.char_indices();
    // A byte order mark may stand only where a document begins.
    let (at, character) = characters.find(|(at, c)| !allowed(*c) || *c == '\u{FEFF}' && !begins(*at))?;
    Some(fault(
        text,
        Span::new(0, from + at).end,
        &Fault::UnexpectedCharacter { character },
    ))
}
