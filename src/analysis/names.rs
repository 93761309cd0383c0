//! The names that a member, a group or the defaults use: sections, products, groups and fires must be known.

use rustc_hash::FxHashMap;

use crate::analysis::design::Design;
use crate::design::keys::nearest;
use crate::design::model::head::Basis;
use crate::design::model::member::{MemberKeys, SectionChoice};
use crate::design::slip::{Slip, SlipKind};
use crate::section::catalogue::{CatalogueRow, Finish, Lookup, LookupOptions, Table, find};
use crate::text::Spanned;

/// How designations are looked up in a design.
#[must_use]
pub fn lookup_options(basis: &Basis) -> LookupOptions {
    let tables: Vec<Table> = Table::ALL
        .into_iter()
        .filter(|table| basis.section_tables.contains(&table.code()))
        .collect();
    LookupOptions {
        tables: (!tables.is_empty()).then_some(tables),
        hollow: basis
            .hollow_hot_finished
            .map(|hot| if hot { Finish::HotFinished } else { Finish::ColdFormed }),
    }
}

/// Designations that were looked up before: one that is written wrong often stands in many members.
#[derive(Debug)]
pub struct Sections {
    options: LookupOptions,
    known: FxHashMap<String, Lookup>,
}

impl Sections {
    /// Nothing is looked up yet; designations will be by the design's tables.
    #[must_use]
    pub fn of(basis: &Basis) -> Self {
        Self {
            options: lookup_options(basis),
            known: FxHashMap::default(),
        }
    }

    fn find(&mut self, text: &str) -> &Lookup {
        if !self.known.contains_key(text) {
            self.known.insert(text.to_owned(), find(text, &self.options));
        }
        &self.known[text]
    }

    /// Whether the designation of a row means that row: what one table calls a section may be what others call theirs.
    fn settles(&mut self, row: &CatalogueRow) -> bool {
        matches!(self.find(&row.designation), Lookup::Found(_))
    }
}

/// What is wrong with the names in one block of keys. Spans are those of the block's own text.
pub fn check(keys: &MemberKeys, design: &Design, sections: &mut Sections, slips: &mut Vec<Slip>) {
    if let (Some(SectionChoice::Designation(text)), Some(span)) = (keys.section.value(), keys.section.span()) {
        slips.extend(section_slip(
            &Spanned {
                value: text.as_str(),
                span,
            },
            sections,
        ));
    }
    if let (Some(name), Some(span)) = (keys.group.value(), keys.group.span())
        && !design.groups.contains_key(name)
    {
        let known = design.groups.keys().map(String::as_str);
        slips.push(stranger(
            SlipKind::UnknownGroup,
            "group",
            "group",
            name,
            span,
            known,
            "under `groups`",
        ));
    }
    if let (Some(name), Some(span)) = (keys.fire.value(), keys.fire.span())
        && !design.fires.contains_key(name)
    {
        let known = design.fires.keys().map(String::as_str);
        slips.push(stranger(
            SlipKind::UnknownFire,
            "fire",
            "fire",
            name,
            span,
            known,
            "under `fires`",
        ));
    }
    if let Some(product) = keys
        .protection
        .value()
        .and_then(|protection| protection.product.as_ref())
        && !design.products.contains_key(&product.value)
    {
        let known = design.products.keys().map(String::as_str);
        let place = "in the libraries of the design";
        slips.push(stranger(
            SlipKind::UnknownProduct,
            "protection",
            "product",
            &product.value,
            product.span,
            known,
            place,
        ));
    }
}

fn stranger<'a>(
    kind: SlipKind,
    key: &'static str,
    noun: &str,
    name: &str,
    span: crate::text::Span,
    known: impl Iterator<Item = &'a str>,
    place: &str,
) -> Slip {
    let mut known: Vec<&str> = known.collect();
    known.sort_unstable();
    let near = nearest(name, known.iter().copied());
    let hint = match near {
        Some(near) => format!("; perhaps `{near}`"),
        None if known.is_empty() => String::new(),
        None => {
            let more = if known.len() > 5 { ", .." } else { "" };
            format!(
                "; there are {}{more}",
                known
                    .iter()
                    .take(5)
                    .map(|k| format!("`{k}`"))
                    .collect::<Vec<_>>()
                    .join(", ")
            )
        }
    };
    let slip = Slip::new(kind, span, format!("no {noun} is called `{name}` {place}{hint}")).at_key(key);
    match near {
        Some(near) => slip.repair(format!("write `{near}`"), false, span, near),
        None => slip,
    }
}

fn section_slip(text: &Spanned<&str>, sections: &mut Sections) -> Option<Slip> {
    let listed = |rows: &[&CatalogueRow]| {
        rows.iter()
            .take(5)
            .map(|row| format!("`{}`", row.designation))
            .collect::<Vec<_>>()
            .join(", ")
    };
    match sections.find(text.value) {
        Lookup::Found(_) => None,
        Lookup::Ambiguous(rows) => {
            let rows = rows.clone();
            let all: Vec<String> = rows
                .iter()
                .map(|row| {
                    format!(
                        "`{}` ({}, {:.0} mm²)",
                        row.designation,
                        row.standard,
                        row.geometry().area.mm2()
                    )
                })
                .collect();
            let message = format!(
                "`{}` fits {} different sections: {}",
                text.value,
                rows.len(),
                all.join(", ")
            );
            let mut slip = Slip::new(SlipKind::AmbiguousSection, text.span, message)
                .at_key("section")
                .remark("write the one that is meant, or settle it for the design by `basis: { section tables: [..], hollow: .. }`", None);
            for row in rows.into_iter().filter(|row| sections.settles(row)) {
                slip = slip.repair(
                    format!("write `{}`", row.designation),
                    false,
                    text.span,
                    &*row.designation,
                );
            }
            Some(slip)
        }
        Lookup::Unknown { nearest } => {
            let message = match nearest.as_slice() {
                [] => format!("no section table has `{}`", text.value),
                rows => format!(
                    "no section table has `{}`; the nearest are {}",
                    text.value,
                    listed(rows)
                ),
            };
            let mut slip = Slip::new(SlipKind::UnknownSection, text.span, message).at_key("section");
            let nearest = nearest.clone();
            for row in nearest.into_iter().filter(|row| sections.settles(row)).take(3) {
                slip = slip.repair(
                    format!("write `{}`", row.designation),
                    false,
                    text.span,
                    &*row.designation,
                );
            }
            Some(slip)
        }
    }
}
