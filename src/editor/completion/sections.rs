//! Section designations.

use std::fmt::Write;

use crate::analysis::exposure::reached;
use crate::analysis::inputs::row_of;
use crate::analysis::names::lookup_options;
use crate::design::model::member::SectionChoice;
use crate::editor::completion::item::{Completion, CompletionKind, Completions, Writer, scalar};
use crate::editor::completion::{Here, MOST, value};
use crate::section::catalogue::{CatalogueRow, LookupOptions, alike, beginning};
use crate::section::{Casing, Exposure, heated};
use crate::units::{DisplayUnits, significant};

/// What the figures of a section are worked out for.
struct Shown {
    exposure: Exposure,
    casing: Casing,
    units: DisplayUnits,
}

impl Here<'_> {
    pub(super) fn sections(&self, writer: &Writer, found: &mut Completions) {
        let options = lookup_options(self.view.design.basis());
        let typed = writer.typed.trim();
        // The family of the neighbour is the likeliest.
        let like = self.neighbour(&options);
        let (begun, more) = beginning(typed, &options, like, MOST);
        found.incomplete |= more;
        let shown = self.shown();
        if begun.is_empty() {
            // What is misspelt is compared anew as it changes.
            found.incomplete = true;
            let near = alike(typed, &options).into_iter();
            found.items.extend(near.map(|row| shown.item(writer, row, "")));
            return;
        }
        let items = begun.iter().map(|begun| shown.item(writer, begun.row, &begun.rest));
        found.items.extend(items);
    }

    fn shown(&self) -> Shown {
        let keys = self.inherited();
        let stated = value(keys.as_ref(), |keys| &keys.exposure).copied();
        let shield = value(keys.as_ref(), |keys| &keys.shield).copied();
        let protection = value(keys.as_ref(), |keys| &keys.protection);
        let product = protection.and_then(|stated| {
            let name = stated.product.as_ref()?;
            self.view.design.product(&name.value)?.1.value().product.as_ref()
        });
        let boxed = product.is_some_and(|product| {
            let stated = protection.and_then(|stated| stated.boxed.value().copied());
            stated.unwrap_or_else(|| product.boxes_by_default())
        });
        Shown {
            exposure: reached(stated.unwrap_or(Exposure::AllRound), shield).exposure,
            casing: if boxed { Casing::Box } else { Casing::Profile },
            units: self.units(),
        }
    }

    pub(super) fn units(&self) -> DisplayUnits {
        if self.view.design.basis().imperial {
            DisplayUnits::Imperial
        } else {
            DisplayUnits::Metric
        }
    }

    /// The section of a member shortly before this one.
    fn neighbour(&self, options: &LookupOptions) -> Option<&'static CatalogueRow> {
        let members = &self.view.source().members;
        let before = members.partition_point(|item| item.base() < self.place.replaces.start);
        let own = usize::from(self.member.is_some());
        let near = members[..before.saturating_sub(own)].iter().rev().take(3);
        near.map(|item| item.value().keys.section.value())
            .find_map(|choice: Option<&SectionChoice>| row_of(choice, options))
    }
}

impl Shown {
    fn item(&self, writer: &Writer, row: &'static CatalogueRow, rest: &str) -> Completion {
        let mut item = writer.text(&row.designation, CompletionKind::Section, &scalar(&row.designation));
        if !writer.typed.trim().is_empty() {
            item.filter = writer.filter(rest);
        }
        let mass = format!("{} kg/m", significant(row.mass.kg_m(), 1));
        let factor = heated(row.geometry(), self.exposure, self.casing).ok();
        let word = if self.casing == Casing::Box { "boxed " } else { "" };
        let detail = match factor {
            Some(heated) => format!("{mass}, {word}{}", self.units.section_factor(heated.factor)),
            None => mass,
        };
        item.with(detail, self.table(row))
    }

    /// The section factors of each exposure, with dimensions and standard.
    fn table(&self, row: &CatalogueRow) -> String {
        let geometry = row.geometry();
        let mut text = format!(
            "{}, {} table, {} kg/m, {} mm²\n\n| exposure | profile | box |\n|---|---|---|\n",
            row.standard,
            row.table,
            significant(row.mass.kg_m(), 1),
            significant(geometry.area.mm2(), 0)
        );
        for (words, exposure) in [("all round", Exposure::AllRound), ("three sides", Exposure::ThreeSides)] {
            let cell = |casing| match heated(geometry, exposure, casing) {
                Ok(heated) => format!(
                    "{} (V/A {})",
                    self.units.section_factor(heated.factor),
                    self.units.thickness(heated.effective_thickness())
                ),
                Err(_) => "-".to_owned(),
            };
            // Writing to a string does not fail.
            let _ = writeln!(text, "| {words} | {} | {} |", cell(Casing::Profile), cell(Casing::Box));
        }
        text
    }
}
