//! A row of the schedule: one member as it is evaluated, with its quantities.

use std::path::PathBuf;
use std::sync::Arc;

use serde::Serialize;

use super::quantities::{Quantities, count, quantities};
use crate::analysis::inputs::{Names, row_of};
use crate::analysis::outcome::Outcome;
use crate::design::given::Given;
use crate::design::model::member::{Member, Period, SectionChoice, Steel};
use crate::protection::product::Kind;
use crate::section::measures::LB_FT_IN;
use crate::section::{Exposure, Face};

/// A row of the schedule. Absent values are `None`; units are in the names.
#[derive(Debug, Clone, Default, Serialize)]
#[allow(missing_docs)] // the names are those of the JSON, units included
pub struct Row {
    pub mark: Option<String>,
    pub count: Option<u32>,
    pub length_m: Option<f64>,
    pub section: Option<String>,
    pub shape: Option<String>,
    pub role: Option<String>,
    pub steel: Option<String>,
    pub exposure: Option<String>,
    pub form: Option<String>,
    pub fire: Option<String>,
    pub period_min: Option<f64>,
    pub area_mm2: Option<f64>,
    pub heated_perimeter_mm: Option<f64>,
    pub section_factor_per_m: Option<f64>,
    pub box_section_factor_per_m: Option<f64>,
    pub effective_thickness_mm: Option<f64>,
    pub weight_over_perimeter_lb_ft_in: Option<f64>,
    pub shadow_factor: Option<f64>,
    pub section_class: Option<u8>,
    pub critical_temperature_c: Option<f64>,
    pub bare_critical_temperature_c: Option<f64>,
    pub protected_critical_temperature_c: Option<f64>,
    pub critical_temperature_from: Option<String>,
    pub governing: Option<String>,
    pub bare_temperature_c: Option<f64>,
    pub bare_resistance_min: Option<f64>,
    pub product: Option<String>,
    pub layers: Option<u32>,
    pub required_thickness_mm: Option<f64>,
    pub provided_thickness_mm: Option<f64>,
    pub protected_temperature_c: Option<f64>,
    pub resistance_min: Option<f64>,
    pub verdict: String,
    pub surface_m2: Option<f64>,
    pub steel_mass_kg: Option<f64>,
    pub cost: Option<f64>,
    pub carbon_kg: Option<f64>,
    pub level: Option<String>,
    pub grid: Option<String>,
    pub zone: Option<String>,
    pub phase: Option<String>,
    pub drawing: Option<String>,
    pub revision: Option<String>,
    pub coats: Option<u32>,
    pub litres: Option<f64>,
    pub evidence: Option<String>,
    pub findings: Vec<String>,
    pub departures: Vec<String>,
    /// The library that describes its product.
    #[serde(skip)]
    pub library: Option<Arc<PathBuf>>,
    /// What the totals are made of.
    #[serde(skip)]
    pub quantities: Quantities,
}

/// The row of a member. Its findings and departures are joined by the caller.
#[must_use]
pub fn row(names: &Names<'_>, member: &Member, outcome: &Outcome) -> Row {
    let design = names.design;
    let keys = design.inherited(member);
    let count = count(&keys);
    let choice = keys.get(|k| &k.section).value();
    let protection = keys.get(|k| &k.protection).value();
    let product = protection.and_then(|stated| stated.product.as_ref());
    let named = product
        .and_then(|name| design.product(&name.value))
        .map(|(_, item)| item.value());
    let coating = named
        .and_then(|named| named.product.as_ref())
        .is_some_and(|product| product.kind == Kind::Coating);
    let section = outcome.section.as_ref();
    let critical = outcome.critical.as_ref();
    let state = outcome.protected.as_ref();
    let provided = state.and_then(|state| state.provided);
    let location = keys.get(|k| &k.location).value();
    let quantities = quantities(design, member, outcome);
    Row {
        mark: member.mark.value().cloned(),
        count,
        length_m: keys.get(|k| &k.length).value().map(|length| length.m()),
        section: match (row_of(choice, &names.options), choice) {
            (Some(row), _) => Some(row.designation.to_string()),
            (None, Some(SectionChoice::Designation(text))) => Some(text.clone()),
            (None, Some(SectionChoice::Shape(shape))) => Some(shape.name().to_owned()),
            (None, Some(SectionChoice::NotCovered(name))) => Some((*name).to_owned()),
            (None, None) => None,
        },
        shape: section.map(|section| section.shape.to_owned()),
        role: keys.get(|k| &k.role).value().map(|role| role.word().to_owned()),
        steel: keys.get(|k| &k.steel).value().map(|steel| match steel {
            Steel::Grade(name) => (*name).to_owned(),
            Steel::Yield(fy) => format!("{} MPa", fy.mpa()),
        }),
        exposure: or_built_in(keys.get(|k| &k.exposure).given, || Exposure::AllRound).map(exposure_words),
        form: protection.filter(|_| product.is_some()).and_then(|stated| {
            let board = named?.product.as_ref().map(|product| product.kind == Kind::Board);
            let boxed = match &stated.boxed {
                Given::Value(boxed) => Some(boxed.value),
                Given::Absent => board,
                Given::Unreadable(_) => None,
            };
            boxed.map(|boxed| if boxed { "box" } else { "profile" }.to_owned())
        }),
        fire: or_built_in(keys.get(|k| &k.fire).given, || "standard".to_owned()),
        period_min: match keys.get(|k| &k.period).value() {
            Some(Period::Of(time)) => Some(time.min()),
            _ => None,
        },
        area_mm2: section.map(|section| section.area.mm2()),
        heated_perimeter_mm: section.map(|section| section.heated_perimeter.mm()),
        section_factor_per_m: section.map(|section| section.factor.per_m()),
        box_section_factor_per_m: section
            .and_then(|section| section.box_factor)
            .map(|factor| factor.per_m()),
        effective_thickness_mm: section.map(|section| section.factor.effective_thickness().mm()),
        weight_over_perimeter_lb_ft_in: section
            .map(|section| section.mass_per_m / section.heated_perimeter.mm() / LB_FT_IN),
        shadow_factor: section
            .filter(|_| product.is_none())
            .map(|section| section.shadow_factor),
        section_class: section.and_then(|section| section.class),
        critical_temperature_c: critical.map(|critical| critical.as_built.celsius()),
        bare_critical_temperature_c: critical.map(|critical| critical.bare.celsius()),
        protected_critical_temperature_c: critical.map(|critical| critical.protected.celsius()),
        critical_temperature_from: critical.map(|critical| critical.from.word().to_owned()),
        governing: critical.map(|critical| critical.governing.clone()),
        bare_temperature_c: outcome.bare.and_then(|bare| bare.at_period).map(|t| t.celsius()),
        bare_resistance_min: outcome.bare.and_then(|bare| bare.resistance).map(|t| t.min()),
        product: product.map(|name| name.value.clone()),
        layers: state.and_then(|state| state.layers).filter(|_| !coating),
        required_thickness_mm: state
            .and_then(|s| s.requirement.as_ref().ok())
            .map(|needed| needed.exact.mm()),
        provided_thickness_mm: provided.map(|provided| provided.mm()),
        protected_temperature_c: state.and_then(|state| state.at_period).map(|t| t.celsius()),
        resistance_min: match state {
            Some(state) => state.resistance.map(|t| t.min()),
            None => outcome.bare.and_then(|bare| bare.resistance).map(|t| t.min()),
        },
        verdict: outcome.verdict.words().to_owned(),
        surface_m2: quantities.surface_m2,
        steel_mass_kg: quantities.steel_mass_kg,
        cost: quantities.cost(),
        carbon_kg: quantities.carbon(),
        level: location.and_then(|l| l.level.clone()),
        grid: location.and_then(|l| l.grid.clone()),
        zone: location.and_then(|l| l.zone.clone()),
        phase: location.and_then(|l| l.phase.clone()),
        drawing: keys.get(|k| &k.drawing).value().cloned(),
        revision: keys.get(|k| &k.revision).value().cloned(),
        coats: state.and_then(|state| state.layers).filter(|_| coating),
        litres: quantities.litres,
        evidence: named.and_then(|named| named.evidence.report.clone()),
        findings: Vec::new(),
        departures: Vec::new(),
        library: product
            .and_then(|name| design.product(&name.value))
            .map(|(file, _)| Arc::clone(&design.files[file].path)),
        quantities,
    }
}

/// The value, or the built-in default where the key is absent. A value that can't be read is not replaced.
fn or_built_in<T: Clone>(given: &Given<T>, built_in: impl FnOnce() -> T) -> Option<T> {
    match given {
        Given::Value(value) => Some(value.value.clone()),
        Given::Absent => Some(built_in()),
        Given::Unreadable(_) => None,
    }
}

fn exposure_words(exposure: Exposure) -> String {
    match exposure {
        Exposure::AllRound => "all round".to_owned(),
        Exposure::ThreeSides => "three sides".to_owned(),
        Exposure::FlangeOnly => "flange only".to_owned(),
        Exposure::Covered(faces) => {
            let names = [
                (Face::Top, "top"),
                (Face::Right, "right"),
                (Face::Bottom, "bottom"),
                (Face::Left, "left"),
            ];
            let covered: Vec<&str> = names
                .iter()
                .filter(|(face, _)| faces.contains(*face))
                .map(|(_, name)| *name)
                .collect();
            format!("covered: {}", covered.join(", "))
        }
        Exposure::Perimeter(length) => format!("perimeter {} mm", length.mm()),
    }
}
