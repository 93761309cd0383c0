//! Completions.

use tower_lsp::lsp_types::{
    CompletionItem, CompletionItemKind, CompletionItemLabelDetails, CompletionList, CompletionResponse,
    CompletionTextEdit, Documentation, InsertTextFormat, InsertTextMode, MarkupContent, MarkupKind, Position, TextEdit,
};

use crate::editor::completion::{Completion, CompletionKind, completion};
use crate::lsp::requests::Asked;
use crate::text::Span;

/// What may be written at a position.
pub fn completed(asked: &Asked, position: Position) -> Option<CompletionResponse> {
    let offset = asked.offset(position);
    let here = Span {
        start: offset,
        end: offset,
    };
    let view = asked.view();
    let around = view.piece(view.within(offset)).map_or(here, |piece| piece.span);
    let findings = asked.live.findings_at(asked.file, around);
    let found = completion(&view, &findings, offset);
    let indent = indentation(view.text(), offset);
    let items = found.items.into_iter().map(|item| shown(asked, item, indent)).collect();
    Some(CompletionResponse::List(CompletionList {
        is_incomplete: found.incomplete,
        items,
    }))
}

/// The white space that the line of an offset begins with.
fn indentation(text: &str, offset: u32) -> &str {
    let before = text.get(..offset as usize).unwrap_or("");
    let line = &before[before.rfind(['\n', '\r']).map_or(0, |at| at + 1)..];
    &line[..line.len() - line.trim_start_matches([' ', '\t']).len()]
}

fn shown(asked: &Asked, item: Completion, indent: &str) -> CompletionItem {
    let client = asked.snapshot.client;
    let (text, format) = if item.snippet && client.snippets {
        (item.text.clone(), InsertTextFormat::SNIPPET)
    } else {
        (item.plain(), InsertTextFormat::PLAIN_TEXT)
    };
    // An editor that can't indent further lines as the first is given them indented.
    let text = if client.indents {
        text
    } else {
        text.replace('\n', &format!("\n{indent}"))
    };
    let documentation = (!item.documentation.is_empty()).then_some(Documentation::MarkupContent(MarkupContent {
        kind: MarkupKind::Markdown,
        value: item.documentation,
    }));
    CompletionItem {
        label: item.label,
        label_details: (!item.detail.is_empty()).then(|| CompletionItemLabelDetails {
            detail: None,
            description: Some(item.detail.clone()),
        }),
        kind: Some(kind(item.kind)),
        detail: (!item.detail.is_empty()).then_some(item.detail),
        documentation,
        sort_text: Some(item.sort),
        filter_text: Some(item.filter),
        insert_text_format: Some(format),
        insert_text_mode: client.indents.then_some(InsertTextMode::ADJUST_INDENTATION),
        text_edit: Some(CompletionTextEdit::Edit(TextEdit::new(
            asked.lines.range(item.replaces),
            text,
        ))),
        ..CompletionItem::default()
    }
}

fn kind(kind: CompletionKind) -> CompletionItemKind {
    match kind {
        CompletionKind::Key => CompletionItemKind::PROPERTY,
        CompletionKind::Section => CompletionItemKind::CONSTANT,
        CompletionKind::Product => CompletionItemKind::MODULE,
        CompletionKind::Group => CompletionItemKind::CLASS,
        CompletionKind::Fire => CompletionItemKind::EVENT,
        CompletionKind::Member => CompletionItemKind::REFERENCE,
        CompletionKind::Finding => CompletionItemKind::ENUM_MEMBER,
        CompletionKind::Word => CompletionItemKind::ENUM,
        CompletionKind::Value => CompletionItemKind::VALUE,
        CompletionKind::Form => CompletionItemKind::SNIPPET,
    }
}
