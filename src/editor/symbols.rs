//! What a file and a design hold, by name: for outlines and for finding one's way.

use std::sync::Arc;

use crate::analysis::design::{Design, FileIndex};
use crate::analysis::outcome::Outcome;
use crate::analysis::source::{Item, SourceFile};
use crate::design::given::Given;
use crate::design::model::library::NamedProduct;
use crate::design::model::member::{Member, SectionChoice};
use crate::editor::layout;
use crate::editor::view::View;
use crate::findings::finding::Place;
use crate::protection::product::Kind;
use crate::text::Span;

/// What a symbol is.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum SymbolKind {
    /// `fires`, `groups`, `members` or `products`.
    List,
    /// A fire.
    Fire,
    /// A group.
    Group,
    /// A member.
    Member,
    /// A product.
    Product,
}

/// A symbol of a file.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Symbol {
    /// Its name; never empty.
    pub name: String,
    /// What stands beside the name: a member's section and verdict, a product's kind.
    pub detail: Option<String>,
    /// What it is.
    pub kind: SymbolKind,
    /// All of it.
    pub span: Span,
    /// Its name's characters; within `span`.
    pub name_span: Span,
    /// What it holds.
    pub children: Vec<Symbol>,
}

/// A symbol of a design.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct FoundSymbol {
    /// Its name.
    pub name: String,
    /// What stands beside the name.
    pub detail: Option<String>,
    /// What it is.
    pub kind: SymbolKind,
    /// Its name's characters.
    pub place: Place,
}

/// The symbols of a file: its fires, groups, members and products, each list under its key. One pass over the file.
#[must_use]
pub fn document(view: &View<'_>) -> Vec<Symbol> {
    let source = view.source();
    let text = view.text();
    let outcomes = outcomes_of(view.design, view.outcomes, view.file);
    let mut lists = Vec::new();
    if let (Some(first), Some(last)) = (source.head.fires.first(), source.head.fires.last()) {
        let fires = source.head.fires.iter().map(|fire| Symbol {
            name: shown(Some(&fire.name.value)),
            detail: None,
            kind: SymbolKind::Fire,
            span: fire.name.span,
            name_span: fire.name.span,
            children: Vec::new(),
        });
        lists.push(list(text, "fires", first.name.span, last.name.span, fires.collect()));
    }
    let groups = source.groups.iter().map(|item| {
        let group = item.value();
        symbol(
            item,
            Some(&group.name.value),
            item.place(group.name.span),
            group.extent.0,
        )
    });
    let groups = groups.map(|symbol| Symbol {
        kind: SymbolKind::Group,
        ..symbol
    });
    lists.extend(of_items(text, "groups", &source.groups, groups.collect()));
    let members = source.members.iter().enumerate().map(|(index, item)| {
        let member = item.value();
        let name_span = item.place(member.mark.span().unwrap_or(member.extent.0));
        let outcome = outcomes.get(index).map(|outcome| &**outcome);
        Symbol {
            detail: member_detail(view.design, member, outcome),
            ..symbol(item, member.mark.value(), name_span, member.extent.0)
        }
    });
    lists.extend(of_items(text, "members", &source.members, members.collect()));
    let products = source.products.iter().map(|item| {
        let product = item.value();
        let name_span = item.place(product.name.span);
        Symbol {
            kind: SymbolKind::Product,
            detail: product_detail(product),
            ..symbol(item, Some(&product.name.value), name_span, product.extent.0)
        }
    });
    lists.extend(of_items(text, "products", &source.products, products.collect()));
    lists.sort_by_key(|list| list.span);
    lists
}

/// The symbols of designs whose names hold the query, letter case aside: at most `most`, those first whose name is the
/// query, then those that begin with it. An empty query asks for all. A file that serves several designs is told once.
#[must_use]
pub fn workspace<'a>(
    designs: impl IntoIterator<Item = (&'a Design, &'a [Arc<Outcome>])>,
    query: &str,
    most: usize,
) -> Vec<FoundSymbol> {
    let query = query.trim().to_lowercase();
    let mut found: [Vec<FoundSymbol>; 3] = Default::default();
    let mut seen: Vec<&Arc<std::path::PathBuf>> = Vec::new();
    for (design, outcomes) in designs {
        for (file, source) in design.files.iter().enumerate() {
            if seen.contains(&&source.path) {
                continue;
            }
            seen.push(&source.path);
            collect(design, outcomes, (file, source), &query, most, &mut found);
        }
    }
    found.into_iter().flatten().take(most).collect()
}

fn collect(
    design: &Design,
    outcomes: &[Arc<Outcome>],
    (file, source): (FileIndex, &SourceFile),
    query: &str,
    most: usize,
    found: &mut [Vec<FoundSymbol>; 3],
) {
    let mut offer = |name: &str, kind: SymbolKind, span: Span, detail: &dyn Fn() -> Option<String>| {
        let Some(rank) = rank(name, query).filter(|_| !name.is_empty()) else {
            return;
        };
        if found[rank].len() < most {
            found[rank].push(FoundSymbol {
                name: name.to_owned(),
                detail: detail(),
                kind,
                place: Place {
                    path: Arc::clone(&source.path),
                    span,
                },
            });
        }
    };
    for fire in &source.head.fires {
        offer(&fire.name.value, SymbolKind::Fire, fire.name.span, &|| None);
    }
    for item in &source.groups {
        let name = &item.value().name;
        offer(&name.value, SymbolKind::Group, item.place(name.span), &|| None);
    }
    let outcomes = outcomes_of(design, outcomes, file);
    for (index, item) in source.members.iter().enumerate() {
        if let Given::Value(mark) = &item.value().mark {
            offer(&mark.value, SymbolKind::Member, item.place(mark.span), &|| {
                member_detail(design, item.value(), outcomes.get(index).map(|outcome| &**outcome))
            });
        }
    }
    for item in &source.products {
        let name = &item.value().name;
        let detail = || product_detail(item.value());
        offer(&name.value, SymbolKind::Product, item.place(name.span), &detail);
    }
}

/// How well a name answers a query in small letters: 0 is the name itself.
fn rank(name: &str, query: &str) -> Option<usize> {
    // Most names are told apart without a copy in small letters.
    if query.is_empty() {
        return Some(2);
    }
    let name = name.to_lowercase();
    match name.find(query)? {
        0 if name.len() == query.len() => Some(0),
        0 => Some(1),
        _ => Some(2),
    }
}

/// The outcomes of one file's members.
pub(super) fn outcomes_of<'a>(design: &Design, outcomes: &'a [Arc<Outcome>], file: FileIndex) -> &'a [Arc<Outcome>] {
    let from = design.members.partition_point(|at| at.file < file);
    let to = design.members.partition_point(|at| at.file <= file);
    outcomes.get(from..to).unwrap_or(&[])
}

fn symbol<T>(item: &Item<T>, name: Option<&String>, name_span: Span, extent: Span) -> Symbol {
    let extent = item.place(extent);
    // A value that comes by an alias may stand elsewhere than its item.
    let inside = extent.start <= name_span.start && name_span.end <= extent.end;
    Symbol {
        name: shown(name),
        detail: None,
        kind: SymbolKind::Member,
        span: extent,
        name_span: if inside { name_span } else { extent },
        children: Vec::new(),
    }
}

/// Editors want a name of every symbol.
fn shown(name: Option<&String>) -> String {
    match name {
        Some(name) if !name.trim().is_empty() => name.clone(),
        _ => "(no name)".to_owned(),
    }
}

fn of_items<T>(text: &str, key: &str, items: &[Item<T>], children: Vec<Symbol>) -> Option<Symbol> {
    let (first, last) = (items.first()?, items.last()?);
    Some(list(text, key, first.piece.span, last.piece.span, children))
}

fn list(text: &str, key: &str, first: Span, last: Span, children: Vec<Symbol>) -> Symbol {
    let (span, name_span) = layout::list(text, key, first, last);
    Symbol {
        name: key.to_owned(),
        detail: Some(children.len().to_string()),
        kind: SymbolKind::List,
        span,
        name_span,
        children,
    }
}

/// `IPE 360, passes`: the section as the file writes it, the member's own or inherited.
fn member_detail(design: &Design, member: &Member, outcome: Option<&Outcome>) -> Option<String> {
    let section = match design.inherited(member).get(|keys| &keys.section).value() {
        Some(SectionChoice::Designation(text)) => Some(text.as_str()),
        Some(SectionChoice::Shape(shape)) => Some(shape.name()),
        Some(SectionChoice::NotCovered(name)) => Some(*name),
        None => None,
    };
    let verdict = outcome.map(|outcome| outcome.verdict.words());
    let parts: Vec<&str> = section.into_iter().chain(verdict).collect();
    (!parts.is_empty()).then(|| parts.join(", "))
}

fn product_detail(product: &NamedProduct) -> Option<String> {
    let kind = match product.product.as_ref()?.kind {
        Kind::Board => "board",
        Kind::Spray => "spray",
        Kind::Coating => "coating",
        Kind::Concrete => "concrete",
    };
    Some(kind.to_owned())
}
