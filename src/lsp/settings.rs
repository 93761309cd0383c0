//! What the editor can do and what its user wants.

use serde::Deserialize;
use tower_lsp::lsp_types::{ClientCapabilities, InsertTextMode, MarkupKind, PositionEncodingKind};

use crate::text::Encoding;

/// What the editor can do.
#[derive(Debug, Clone, Copy)]
pub struct Client {
    /// How it counts columns.
    pub encoding: Encoding,
    /// Whether it inserts snippets.
    pub snippets: bool,
    /// Whether it indents the lines of a completion as the first.
    pub indents: bool,
    /// Whether hovers may be Markdown.
    pub markdown: bool,
    /// Whether it shows pictures in Markdown.
    pub images: bool,
    /// Whether it shows places beside a diagnostic.
    pub related: bool,
    /// Whether it opens what a diagnostic's code links to.
    pub links: bool,
    /// Whether it watches files for the server.
    pub watches: bool,
    /// Whether it shows progress.
    pub progress: bool,
    /// Whether it will ask for diagnostics.
    pub pulls: bool,
    /// Whether symbols may be nested.
    pub nested_symbols: bool,
    /// Whether inlay hints can be asked for again.
    pub refreshes_hints: bool,
    /// Whether code lenses can be asked for again.
    pub refreshes_lenses: bool,
}

/// What the user wants; each can be switched off.
#[derive(Debug, Clone, Copy, Deserialize)]
#[serde(default, rename_all = "camelCase")]
pub struct Settings {
    /// Hints of the section factor.
    pub section_hints: bool,
    /// Hints of the thickness needed.
    pub thickness_hints: bool,
    /// Code lenses.
    pub lenses: bool,
    /// Diagnostics only when the editor asks for them, not of the server's own accord.
    pub pull: bool,
    /// Pictures in hovers, where the editor does not say whether it shows them.
    pub images: Option<bool>,
}

impl Default for Settings {
    fn default() -> Self {
        Self {
            section_hints: true,
            thickness_hints: true,
            lenses: true,
            pull: false,
            images: None,
        }
    }
}

impl Settings {
    /// Settings as an editor hands them over: bare, or under the product's name. `None` where they are neither.
    pub fn read(value: serde_json::Value) -> Option<Self> {
        let own = match value {
            serde_json::Value::Object(mut map) => match map.remove("scorchline") {
                Some(own) => own,
                None => serde_json::Value::Object(map),
            },
            other => other,
        };
        serde_json::from_value(own).ok()
    }
}

impl Default for Client {
    fn default() -> Self {
        Self {
            encoding: Encoding::Utf16,
            snippets: false,
            indents: false,
            markdown: false,
            images: false,
            related: false,
            links: false,
            watches: false,
            progress: false,
            pulls: false,
            nested_symbols: false,
            refreshes_hints: false,
            refreshes_lenses: false,
        }
    }
}

impl Client {
    /// What the capabilities say.
    pub fn of(capabilities: &ClientCapabilities) -> Self {
        let document = capabilities.text_document.as_ref();
        let workspace = capabilities.workspace.as_ref();
        let general = capabilities.general.as_ref();
        let hover = document.and_then(|document| document.hover.as_ref());
        let formats = hover.and_then(|hover| hover.content_format.as_ref());
        let item = document.and_then(|document| document.completion.as_ref()?.completion_item.as_ref());
        let yes = |flag: Option<bool>| flag.unwrap_or(false);
        Self {
            encoding: encoding(general.and_then(|general| general.position_encodings.as_deref())),
            snippets: yes(item.and_then(|item| item.snippet_support)),
            indents: item
                .and_then(|item| item.insert_text_mode_support.as_ref())
                .is_some_and(|modes| modes.value_set.contains(&InsertTextMode::ADJUST_INDENTATION)),
            markdown: formats.is_some_and(|formats| formats.contains(&MarkupKind::Markdown)),
            // No capability tells whether pictures are shown; a parser of web pages' Markdown does show them.
            images: general
                .and_then(|general| general.markdown.as_ref())
                .is_some_and(|markdown| markdown.parser == "marked"),
            related: yes(document.and_then(|document| document.publish_diagnostics.as_ref()?.related_information)),
            links: yes(document.and_then(|document| document.publish_diagnostics.as_ref()?.code_description_support)),
            watches: yes(
                workspace.and_then(|workspace| workspace.did_change_watched_files.as_ref()?.dynamic_registration)
            ),
            progress: yes(capabilities
                .window
                .as_ref()
                .and_then(|window| window.work_done_progress)),
            pulls: false,
            nested_symbols: yes(
                document.and_then(|document| document.document_symbol.as_ref()?.hierarchical_document_symbol_support)
            ),
            refreshes_hints: yes(workspace.and_then(|workspace| workspace.inlay_hint.as_ref()?.refresh_support)),
            refreshes_lenses: yes(workspace.and_then(|workspace| workspace.code_lens.as_ref()?.refresh_support)),
        }
    }
}

/// The first encoding of the editor's liking; UTF-16 where it says nothing.
fn encoding(offered: Option<&[PositionEncodingKind]>) -> Encoding {
    let known = |kind: &PositionEncodingKind| match kind.as_str() {
        "utf-8" => Some(Encoding::Utf8),
        "utf-16" => Some(Encoding::Utf16),
        "utf-32" => Some(Encoding::Utf32),
        _ => None,
    };
    offered.unwrap_or(&[]).iter().find_map(known).unwrap_or(Encoding::Utf16)
}

/// The name of an encoding.
pub fn encoding_kind(encoding: Encoding) -> PositionEncodingKind {
    match encoding {
        Encoding::Utf8 => PositionEncodingKind::UTF8,
        Encoding::Utf16 => PositionEncodingKind::UTF16,
        Encoding::Utf32 => PositionEncodingKind::UTF32,
    }
}
