//! What can be folded away.

use crate::analysis::source::Item;
use crate::editor::layout;
use crate::editor::view::View;
use crate::text::Span;

/// A part of the text that can be folded to its first line.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Fold {
    /// From the first to the last character; always several lines.
    pub span: Span,
    /// Whether it is nothing but comments.
    pub comment: bool,
}

/// The folds of a file in the order of the text: entries of the top level, lists, their items, and runs of comment
/// lines. One pass over the file.
#[must_use]
pub fn folding(view: &View<'_>) -> Vec<Fold> {
    let source = view.source();
    let text = view.text();
    let mut folds = Vec::new();
    let mut add = |span: Span| {
        let span = Span {
            start: span.start + lead(span.slice(text)),
            end: span.end,
        };
        if span.slice(text).contains('\n') {
            folds.push(Fold { span, comment: false });
        }
    };
    for piece in &source.entries {
        add(layout::content(text, piece.span));
    }
    items(text, "groups", &source.groups, &mut add);
    items(text, "members", &source.members, &mut add);
    items(text, "products", &source.products, &mut add);
    comments(text, &mut folds);
    folds.sort_by_key(|fold| (fold.span.start, std::cmp::Reverse(fold.span.end)));
    folds
}

fn items<T>(text: &str, key: &str, items: &[Item<T>], add: &mut impl FnMut(Span)) {
    if let (Some(first), Some(last)) = (items.first(), items.last()) {
        add(layout::list(text, key, first.piece.span, last.piece.span).0);
    }
    for item in items {
        add(layout::content(text, item.piece.span));
    }
}

/// Bytes of blank lines and comments before the content of a piece.
fn lead(text: &str) -> u32 {
    let mut at = 0;
    for line in text.split_inclusive('\n') {
        let content = line.trim_start();
        if !content.trim_end().is_empty() && !content.starts_with('#') {
            at += line.len() - content.len();
            break;
        }
        at += line.len();
    }
    Span::new(0, at).end
}

/// Runs of at least two lines that are nothing but comments.
fn comments(text: &str, folds: &mut Vec<Fold>) {
    let mut run: Option<(usize, usize, usize)> = None;
    let mut close = |run: &mut Option<(usize, usize, usize)>| {
        if let Some((from, to, lines)) = run.take()
            && lines > 1
        {
            folds.push(Fold {
                span: Span::new(from, to),
                comment: true,
            });
        }
    };
    let mut at = 0;
    for line in text.split_inclusive('\n') {
        let content = line.trim();
        if content.starts_with('#') {
            let from = at + line.len() - line.trim_start().len();
            let to = from + content.len();
            let (first, lines) = run.map_or((from, 0), |(first, _, lines)| (first, lines));
            run = Some((first, to, lines + 1));
        } else {
            close(&mut run);
        }
        at += line.len();
    }
    close(&mut run);
}
