//! Symbols, folds, selections and code lenses.

use std::sync::Arc;

use tower_lsp::lsp_types::{
    CodeLens, Command, DocumentSymbol, DocumentSymbolResponse, FoldingRange, FoldingRangeKind, Location, Position,
    SelectionRange, SymbolInformation, SymbolKind,
};

use crate::editor::symbols::{self, Symbol};
use crate::editor::{folding, lens, selection};
use crate::lsp::convert::Lines;
use crate::lsp::requests::{AllLines, Asked};
use crate::lsp::shared::Snapshot;

/// The most symbols of the workspace that are answered.
const MOST: usize = 200;

fn kind(kind: symbols::SymbolKind) -> SymbolKind {
    match kind {
        symbols::SymbolKind::List => SymbolKind::NAMESPACE,
        symbols::SymbolKind::Fire => SymbolKind::EVENT,
        symbols::SymbolKind::Group => SymbolKind::CLASS,
        symbols::SymbolKind::Member => SymbolKind::OBJECT,
        symbols::SymbolKind::Product => SymbolKind::PACKAGE,
    }
}

/// The symbols of a file: nested, or one after the other for editors that know no better.
pub fn document(asked: &Asked) -> Option<DocumentSymbolResponse> {
    let symbols = symbols::document(&asked.view());
    if asked.snapshot.client.nested_symbols {
        let nested = symbols.into_iter().map(|symbol| nested(symbol, &asked.lines));
        return Some(DocumentSymbolResponse::Nested(nested.collect()));
    }
    let uri = asked.snapshot.uri(&asked.live.design.files[asked.file].path)?;
    let mut flat = Vec::new();
    for symbol in symbols {
        flatten(symbol, None, &mut |name, container, symbol_kind, span| {
            let location = Location::new(uri.clone(), asked.lines.range(span));
            flat.push(information(name, container, symbol_kind, location));
        });
    }
    Some(DocumentSymbolResponse::Flat(flat))
}

#[allow(deprecated)]
fn nested(symbol: Symbol, lines: &Lines) -> DocumentSymbol {
    let children: Vec<DocumentSymbol> = symbol.children.into_iter().map(|child| nested(child, lines)).collect();
    DocumentSymbol {
        name: symbol.name,
        detail: symbol.detail,
        kind: kind(symbol.kind),
        tags: None,
        deprecated: None,
        range: lines.range(symbol.span),
        selection_range: lines.range(symbol.name_span),
        children: (!children.is_empty()).then_some(children),
    }
}

type Flat<'a> = dyn FnMut(String, Option<String>, symbols::SymbolKind, crate::text::Span) + 'a;

fn flatten(symbol: Symbol, container: Option<&str>, out: &mut Flat<'_>) {
    out(
        symbol.name.clone(),
        container.map(str::to_owned),
        symbol.kind,
        symbol.span,
    );
    for child in symbol.children {
        flatten(child, Some(&symbol.name), out);
    }
}

#[allow(deprecated)]
fn information(
    name: String,
    container_name: Option<String>,
    symbol_kind: symbols::SymbolKind,
    location: Location,
) -> SymbolInformation {
    SymbolInformation {
        name,
        kind: kind(symbol_kind),
        tags: None,
        deprecated: None,
        location,
        container_name,
    }
}

/// The symbols of the workspace that fit a query.
pub fn workspace(snapshot: &Arc<Snapshot>, query: &str) -> Option<Vec<SymbolInformation>> {
    let designs = snapshot.workspace.designs.iter();
    let designs = designs.map(|live| (&*live.design, live.outcomes.as_slice()));
    let mut lines = AllLines::of(snapshot);
    let found = symbols::workspace(designs, query, MOST)
        .into_iter()
        .filter_map(|symbol| {
            let location = lines.location(&symbol.place)?;
            Some(information(symbol.name, symbol.detail, symbol.kind, location))
        });
    Some(found.collect())
}

/// What can be folded.
pub fn folds(asked: &Asked) -> Option<Vec<FoldingRange>> {
    let folds = folding::folding(&asked.view()).into_iter().map(|fold| {
        let range = asked.lines.range(fold.span);
        // A fold that ends where a line begins ends with the line before.
        let end = if range.end.character == 0 {
            range.end.line.saturating_sub(1)
        } else {
            range.end.line
        };
        FoldingRange {
            start_line: range.start.line,
            end_line: end.max(range.start.line),
            kind: fold.comment.then_some(FoldingRangeKind::Comment),
            ..FoldingRange::default()
        }
    });
    Some(folds.collect())
}

/// The selections around positions, from the innermost outward.
pub fn selections(asked: &Asked, positions: &[Position]) -> Option<Vec<SelectionRange>> {
    let view = asked.view();
    let around = |position: &Position| {
        let spans = selection::selection(&view, asked.offset(*position));
        let outermost = spans
            .into_iter()
            .rev()
            .fold(None, |parent: Option<Box<SelectionRange>>, span| {
                let range = asked.lines.range(span);
                Some(Box::new(SelectionRange { range, parent }))
            });
        let here = tower_lsp::lsp_types::Range::new(*position, *position);
        outermost.map_or(
            SelectionRange {
                range: here,
                parent: None,
            },
            |around| *around,
        )
    };
    Some(positions.iter().map(around).collect())
}

/// What stands above the file and its groups.
pub fn lenses(asked: &Asked) -> Option<Vec<CodeLens>> {
    if !asked.settings.lenses {
        return Some(Vec::new());
    }
    let lenses = lens::lenses(&asked.view()).into_iter().map(|lens| CodeLens {
        range: asked.lines.range(lens.span),
        command: Some(Command::new(lens.title, String::new(), None)),
        data: None,
    });
    Some(lenses.collect())
}
