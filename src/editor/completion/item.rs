//! What is offered, and how it is written.

use crate::editor::completion::place::Place;
use crate::text::Span;

/// What may be written at a cursor.
#[derive(Debug, Clone, PartialEq, Eq, Default)]
pub struct Completions {
    /// The items, the likeliest first; at most [`MOST`](super::MOST).
    pub items: Vec<Completion>,
    /// Whether others may fit, so that it must be asked again when more is typed.
    pub incomplete: bool,
}

/// Something that may be written at a cursor.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Completion {
    /// Its name.
    pub label: String,
    /// What it is.
    pub kind: CompletionKind,
    /// A few words beside the name: units, figures, why not.
    pub detail: String,
    /// What it means, in Markdown; empty where there is no more to say.
    pub documentation: String,
    /// What an editor compares with the characters that are replaced, up to the cursor.
    pub filter: String,
    /// What an editor sorts by.
    pub sort: String,
    /// The characters of the file that are replaced, on the line of the cursor.
    pub replaces: Span,
    /// What is written. Of several lines, those after the first are indented beyond the indentation of the cursor's line.
    pub text: String,
    /// Whether the text is a snippet, with places to fill in: `$1`, `${1:60}`.
    pub snippet: bool,
}

/// What a completion is.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum CompletionKind {
    /// A key of a mapping.
    Key,
    /// A section designation.
    Section,
    /// A protection product.
    Product,
    /// A group of members.
    Group,
    /// A fire.
    Fire,
    /// A member, by its mark.
    Member,
    /// The name of a finding.
    Finding,
    /// A word, of several that fit.
    Word,
    /// A value, such as a period.
    Value,
    /// A whole mapping or entry to fill in.
    Form,
}

impl Completion {
    /// The text without the places to fill in, for editors that know no snippets.
    #[must_use]
    pub fn plain(&self) -> String {
        if !self.snippet {
            return self.text.clone();
        }
        let mut plain = String::with_capacity(self.text.len());
        let mut chars = self.text.chars().peekable();
        let mut open = 0_usize;
        while let Some(c) = chars.next() {
            match c {
                '\\' => plain.extend(chars.next()),
                '$' => {
                    let braced = chars.next_if_eq(&'{').is_some();
                    while chars.next_if(char::is_ascii_digit).is_some() {}
                    if braced && chars.next_if_eq(&':').is_some() {
                        open += 1;
                    } else if braced {
                        chars.next_if_eq(&'}');
                    }
                }
                '}' if open > 0 => open -= 1,
                other => plain.push(other),
            }
        }
        plain
    }
}

/// Text of a snippet that is to stand as it is.
pub(super) fn escaped(text: &str) -> String {
    let mut escaped = String::with_capacity(text.len());
    for c in text.chars() {
        if matches!(c, '\\' | '$' | '}') {
            escaped.push('\\');
        }
        escaped.push(c);
    }
    escaped
}

/// Writes items at a place.
pub(super) struct Writer {
    replaces: Span,
    before: &'static str,
    after: &'static str,
    /// What was typed up to the cursor.
    pub typed: String,
    /// The quote that was typed before it.
    quote: &'static str,
}

impl Writer {
    pub fn new(place: &Place, typed: &str) -> Self {
        let (quote, typed) = match typed.chars().next() {
            Some('"') => ("\"", &typed[1..]),
            Some('\'') => ("'", &typed[1..]),
            _ => ("", typed),
        };
        Self {
            replaces: place.replaces,
            before: place.before,
            after: place.after,
            typed: typed.to_owned(),
            quote,
        }
    }

    /// An item that writes a text as it stands.
    pub fn text(&self, label: &str, kind: CompletionKind, text: &str) -> Completion {
        Completion {
            label: label.to_owned(),
            kind,
            detail: String::new(),
            documentation: String::new(),
            filter: format!("{}{label}", self.quote),
            sort: String::new(),
            replaces: self.replaces,
            text: format!("{}{text}{}", self.before, self.after),
            snippet: false,
        }
    }

    /// An item that writes a snippet.
    pub fn snippet(&self, label: &str, kind: CompletionKind, text: &str) -> Completion {
        Completion {
            snippet: true,
            ..self.text(label, kind, text)
        }
    }

    /// An item that writes a name.
    pub fn name(&self, name: &str, kind: CompletionKind) -> Completion {
        self.text(name, kind, &scalar(name))
    }

    /// What an editor compares, where the item is found by other characters than its name's: those typed, and the rest.
    pub fn filter(&self, rest: &str) -> String {
        format!("{}{}{rest}", self.quote, self.typed)
    }

    /// How well a name fits what was typed: 0 where it begins so, 1 where it holds it; none where it does not.
    pub fn fits(&self, name: &str) -> Option<u8> {
        let typed = self.typed.trim();
        if typed.is_empty() {
            return Some(0);
        }
        let (name, typed) = (name.to_lowercase(), typed.to_lowercase());
        if name.starts_with(&typed) {
            Some(0)
        } else {
            name.contains(&typed).then_some(1)
        }
    }

    /// The same at a place where an entry of a list has to begin.
    pub fn listed(&self) -> Self {
        Self {
            before: if self.before.is_empty() { "- " } else { self.before },
            typed: self.typed.clone(),
            ..*self
        }
    }
}

/// A name as it is written: in quotes where YAML would not take it for one. Names keep their characters, so that a number
/// needs none.
pub(super) fn scalar(name: &str) -> String {
    if name.starts_with(|c: char| c.is_ascii_digit()) {
        let plain = crate::findings::insert::scalar(&format!("a{name}"));
        if !plain.starts_with('\'') {
            return name.to_owned();
        }
    }
    crate::findings::insert::scalar(name)
}

impl Completion {
    pub(super) fn with(mut self, detail: impl Into<String>, documentation: impl Into<String>) -> Self {
        self.detail = detail.into();
        self.documentation = documentation.into();
        self
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_snippet_without_its_places_is_plain() {
        let place = Place {
            path: Vec::new(),
            slot: super::super::place::Slot::Value,
            replaces: Span::default(),
            beside: Vec::new(),
            flow: false,
            before: "",
            after: "",
            heads: false,
        };
        let writer = Writer::new(&place, "");
        let plain = |text: &str| writer.snippet("x", CompletionKind::Key, text).plain();
        assert_eq!(plain("period: ${1:60}"), "period: 60");
        assert_eq!(plain("{ product: $1, thickness: ${2} }"), "{ product: , thickness:  }");
        assert_eq!(plain(&escaped("5 $ {a}")), "5 $ {a}");
        assert_eq!(plain("{ a: ${1:b} }"), "{ a: b }");
    }

    #[test]
    fn names_are_quoted_where_they_must_be() {
        assert_eq!(scalar("203x203x60"), "203x203x60");
        assert_eq!(scalar("1E2"), "1E2");
        assert_eq!(scalar("red, thin"), "'red, thin'");
        assert_eq!(scalar("梁1"), "梁1");
    }
}
