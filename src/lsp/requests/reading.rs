//! Hovers and hints: what is known of what stands in the text.

use tower_lsp::lsp_types::{
    Hover, HoverContents, InlayHint, InlayHintLabel, MarkupContent, MarkupKind, Position, Range,
};

use crate::editor::hints::{HintKind, hints};
use crate::editor::hover::{HoverOptions, hover};
use crate::lsp::requests::Asked;
use crate::text::Span;

/// What is known of what stands at a position.
pub fn hovered(asked: &Asked, position: Position) -> Option<Hover> {
    let offset = asked.offset(position);
    let at = Span {
        start: offset,
        end: offset,
    };
    let findings = asked.live.findings_at(asked.file, at);
    let client = asked.snapshot.client;
    let options = HoverOptions {
        images: client.images && client.markdown,
    };
    let found = hover(&asked.view(), &findings, offset, options)?;
    let (kind, value) = if client.markdown {
        (MarkupKind::Markdown, found.markdown)
    } else {
        (MarkupKind::PlainText, plain(&found.markdown))
    };
    Some(Hover {
        contents: HoverContents::Markup(MarkupContent { kind, value }),
        range: Some(asked.lines.range(found.span)),
    })
}

/// Our own Markdown as plain text.
fn plain(markdown: &str) -> String {
    let mut out = String::with_capacity(markdown.len());
    let mut letters = markdown
        .replace("**", "")
        .replace("```text\n", "")
        .replace("\n```", "")
        .replace("\n---\n", "\n");
    letters = letters.replace('`', "");
    let mut escape = false;
    for c in letters.chars() {
        if c == '\\' && !escape {
            escape = true;
        } else {
            escape = false;
            out.push(c);
        }
    }
    out
}

/// The hints of a range.
pub fn hinted(asked: &Asked, range: Range) -> Option<Vec<InlayHint>> {
    let settings = asked.settings;
    let wanted = hints(&asked.view(), asked.lines.span(range))
        .into_iter()
        .filter(|hint| match hint.kind {
            HintKind::Section => settings.section_hints,
            HintKind::Thickness => settings.thickness_hints,
        });
    let shown = wanted.map(|hint| InlayHint {
        position: asked.lines.position(hint.at),
        label: InlayHintLabel::String(hint.label),
        kind: None,
        text_edits: None,
        tooltip: None,
        padding_left: Some(true),
        padding_right: None,
        data: None,
    });
    Some(shown.collect())
}
