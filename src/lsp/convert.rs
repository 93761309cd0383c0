//! Places of the core as places of the protocol.

use std::path::Path;
use std::sync::Arc;

use tower_lsp::lsp_types::{self as lsp, Url};

use crate::text::{Buffer, Encoding, LineIndex, Position, Span};

/// A position as the core counts.
pub fn position(position: lsp::Position) -> Position {
    Position {
        line: position.line,
        column: position.character,
    }
}

/// The lines of a text: of an open document by its rope, of another file by an index made once.
#[derive(Debug, Clone)]
pub enum Lines {
    /// An open document.
    Open(Buffer, Encoding),
    /// A file on disk.
    Closed(Arc<str>, Arc<LineIndex>, Encoding),
}

impl Lines {
    /// The position of an offset.
    pub fn position(&self, offset: u32) -> lsp::Position {
        let position = match self {
            Self::Open(buffer, encoding) => buffer.position(offset as usize, *encoding),
            Self::Closed(text, index, encoding) => index.position(text, offset, *encoding),
        };
        lsp::Position::new(position.line, position.column)
    }

    /// The range of a span.
    pub fn range(&self, span: Span) -> lsp::Range {
        lsp::Range::new(self.position(span.start), self.position(span.end))
    }

    /// The offset of a position.
    pub fn offset(&self, at: lsp::Position) -> u32 {
        match self {
            Self::Open(buffer, encoding) => u32::try_from(buffer.offset(position(at), *encoding)).unwrap_or(u32::MAX),
            Self::Closed(text, index, encoding) => index.offset(text, position(at), *encoding),
        }
    }

    /// The span of a range.
    pub fn span(&self, range: lsp::Range) -> Span {
        let (start, end) = (self.offset(range.start), self.offset(range.end));
        Span {
            start: start.min(end),
            end: start.max(end),
        }
    }
}

/// How the protocol calls a file.
pub fn uri(path: &Path) -> Option<Url> {
    Url::from_file_path(path).ok()
}
