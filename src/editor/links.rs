//! Paths to other files.

use crate::editor::view::View;
use crate::text::Span;

/// A path that a file names.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Link<'a> {
    /// Its characters, without quotes.
    pub span: Span,
    /// The path as written, relative to the file. Where it leads is for the caller to find out.
    pub written: &'a str,
}

/// The paths that a file names under `libraries`, `parts` and `part of`, in the order of the text.
#[must_use]
pub fn links<'a>(view: &View<'a>) -> Vec<Link<'a>> {
    let head = &view.source().head;
    let text = view.text();
    let part_of = head.part_of.value().zip(head.part_of.span());
    let lists = head.libraries.iter().chain(&head.parts);
    let mut links: Vec<Link<'a>> = lists
        .map(|path| (&path.value, path.span))
        .chain(part_of)
        .filter(|(written, _)| !written.is_empty())
        .map(|(written, span)| Link {
            span: bare(text, span),
            written,
        })
        .collect();
    links.sort_by_key(|link| link.span);
    links
}

/// A span without the quotes at its ends.
fn bare(text: &str, span: Span) -> Span {
    let written = span.slice(text);
    let quoted = ['"', '\'']
        .into_iter()
        .any(|quote| written.len() > 2 && written.starts_with(quote) && written.ends_with(quote));
    if quoted {
        Span {
            start: span.start + 1,
            end: span.end - 1,
        }
    } else {
        span
    }
}
