//! Hints within the text: the section factor behind a section, the thickness needed behind a period or protection.

use crate::analysis::design::MemberAt;
use crate::editor::view::View;
use crate::protection::product::Kind;
use crate::text::Span;
use crate::units::Length;

/// What a hint tells.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum HintKind {
    /// The section factor.
    Section,
    /// The thickness needed and provided.
    Thickness,
}

/// A hint.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Hint {
    /// The offset that it stands behind.
    pub at: u32,
    /// What it tells.
    pub kind: HintKind,
    /// Its text.
    pub label: String,
}

/// The hints of the members in a range.
#[must_use]
pub fn hints(view: &View<'_>, range: Span) -> Vec<Hint> {
    let members = &view.source().members;
    let first = members.partition_point(|item| item.piece.span.end < range.start);
    let shown = members[first..].iter().take_while(|item| item.base() <= range.end);
    shown
        .enumerate()
        .flat_map(|(n, _)| {
            let index = first + n;
            let at = MemberAt { file: view.file, index };
            [section(view, at), thickness(view, at)].into_iter().flatten()
        })
        .filter(|hint| range.touches(hint.at))
        .collect()
}

fn section(view: &View<'_>, at: MemberAt) -> Option<Hint> {
    let item = view.design.member(at);
    let written = item.place(item.value().keys.section.span()?);
    let section = view.outcome(at)?.section.as_ref()?;
    let units = view.design.units();
    let thickness = units.thickness(section.factor.effective_thickness());
    Some(Hint {
        at: written.end,
        kind: HintKind::Section,
        label: format!("{} (V/A {thickness})", units.section_factor(section.factor)),
    })
}

/// At the protection, or where the member inherits that, at its own period.
fn thickness(view: &View<'_>, at: MemberAt) -> Option<Hint> {
    let item = view.design.member(at);
    let keys = view.design.inherited(item.value());
    let state = view.outcome(at)?.protected.as_ref()?;
    let needed = state.requirement.as_ref().ok()?;
    let own = &item.value().keys;
    let written = own.protection.span().or_else(|| own.period.span())?;
    let name = &keys.get(|k| &k.protection).value()?.product.as_ref()?.value;
    let product = view.design.product(name)?.1.value().product.as_ref()?;
    let units = view.design.units();
    let film = product.kind == Kind::Coating;
    let shown = |value: Length| {
        if film {
            units.film(value)
        } else {
            units.thickness(value)
        }
    };
    let needs = |value: Length| {
        if film {
            units.needed_film(value)
        } else {
            units.needed_thickness(value)
        }
    };
    let has = match state.provided {
        Some(provided) if state.stated => format!(", has {}", shown(provided)),
        Some(provided) => format!(", takes {}", shown(provided)),
        None => String::new(),
    };
    Some(Hint {
        at: item.place(written).end,
        kind: HintKind::Thickness,
        label: format!("needs {}{has}", needs(needed.exact)),
    })
}
