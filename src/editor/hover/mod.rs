//! What is known of what stands at the cursor, as Markdown.

mod key;
mod member;
mod picture;
mod product;

use crate::analysis::design::MemberAt;
use crate::editor::cursor::{self, Cursor};
use crate::editor::view::{View, Within};
use crate::findings::finding::Finding;
use crate::text::Span;

/// What the editor can show.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub struct HoverOptions {
    /// Whether it shows pictures; otherwise curves are drawn with block characters.
    pub images: bool,
}

/// What is shown.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Hover {
    /// The characters that it is about.
    pub span: Span,
    /// The text.
    pub markdown: String,
}

/// What is known of what stands at an offset. `findings` are those of the file that touch it.
#[must_use]
pub fn hover(view: &View<'_>, findings: &[Finding], offset: u32, options: HoverOptions) -> Option<Hover> {
    let cursor = cursor::at(view, offset)?;
    let last = cursor.steps.last()?;
    let span = if cursor.on_key { last.span } else { last.value };
    let mut parts: Vec<String> = Vec::new();
    if cursor.on_key {
        parts.extend(key::document(last, within_words(&cursor)));
    } else {
        let path = &view.source().path;
        let here = findings
            .iter()
            .filter(|finding| finding.place.path == *path && finding.place.span.touches(offset));
        parts.extend(here.map(finding));
        parts.extend(value(view, &cursor, options));
    }
    if parts.is_empty() {
        parts.extend(key::document(last, within_words(&cursor)));
    }
    let markdown = parts.join("\n\n---\n\n");
    (!markdown.is_empty()).then_some(Hover { span, markdown })
}

fn value(view: &View<'_>, cursor: &Cursor, options: HoverOptions) -> Option<String> {
    match cursor.within {
        Within::Member(index) => {
            let at = MemberAt { file: view.file, index };
            let name = &cursor.steps.first()?.name;
            match name.as_str() {
                "section" => member::section(view, at),
                "protection" => {
                    let outer = member::protection(view, at);
                    Some([outer?, member::summary(view, at, options)?].join("\n\n"))
                }
                "note" | "drawing" | "revision" | "location" => None,
                _ => member::summary(view, at, options),
            }
        }
        Within::Product(index) if cursor.steps.len() == 1 => Some(product::described(view, index)),
        _ => None,
    }
}

fn within_words(cursor: &Cursor) -> &'static str {
    match cursor.within {
        Within::Member(_) => "member",
        Within::Group(_) => "group",
        Within::Product(_) => "product",
        _ => "file",
    }
}

/// A finding: its clause and how to answer it. Its message stands in the editor's own list already, but not in every
/// editor's hover.
fn finding(finding: &Finding) -> String {
    let declaration = finding.declaration;
    format!(
        "**{}** ({}; {})\n\n{}\n\n{}",
        declaration.name,
        finding.severity.word(),
        declaration.clause,
        escaped(&finding.message),
        declaration.answer
    )
}

/// Text as Markdown that shows it as it is.
fn escaped(text: &str) -> String {
    let mut out = String::with_capacity(text.len());
    for c in text.chars() {
        if matches!(c, '\\' | '`' | '*' | '_' | '[' | ']' | '<' | '>' | '#' | '|' | '~') {
            out.push('\\');
        }
        out.push(c);
    }
    out
}
