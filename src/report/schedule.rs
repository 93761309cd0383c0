//! The fire protection schedule: a row a member, totals a product.

use serde::Serialize;

use crate::analysis::inputs::row_of;
use crate::analysis::names::lookup_options;
use crate::analysis::outcome::Outcome;
use crate::check::Checked;
use crate::design::model::head::Method;
use crate::design::model::library::NamedProduct;
use crate::design::model::member::{Member, Period, SectionChoice, Steel};
use crate::findings::finding::Finding;
use crate::protection::product::Kind;
use crate::section::Exposure;
use crate::section::measures::LB_FT_IN;

/// The cautions that every report carries.
pub const CAUTIONS: &[&str] = &[
    "Temperatures are converged: within 0.5 °C of the limit of vanishing time steps, never more than 0.1 °C below it.",
    "Results rest on the data and the assessed range that the product files state; product certification comes first.",
    "What is not verified is not a pass.",
    "Local codes and the judgement of a licensed engineer come before these figures.",
];

/// A row of the schedule. Absent values are `None`; units are in the names.
#[derive(Debug, Clone, Default, Serialize)]
#[allow(missing_docs)] // the names are those of the JSON, units included
pub struct Row {
    pub mark: Option<String>,
    pub count: u32,
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
}

/// Totals of a product.
#[derive(Debug, Clone, Default, Serialize)]
#[allow(missing_docs)] // the names are those of the JSON
pub struct Total {
    pub product: String,
    pub members: u32,
    pub surface_m2: f64,
    pub litres: Option<f64>,
}

/// Totals of the design.
#[derive(Debug, Clone, Default, Serialize)]
#[allow(missing_docs)] // the names are those of the JSON
pub struct Totals {
    pub members: u32,
    pub steel_mass_kg: f64,
    pub surface_m2: f64,
    pub cost: Option<f64>,
    pub carbon_kg: Option<f64>,
}

/// The basis that the schedule rests on.
#[derive(Debug, Clone, Default, Serialize)]
#[allow(missing_docs)] // the names are those of the JSON
pub struct Basis {
    pub method: Option<String>,
    pub currency: Option<String>,
    pub default_critical_temperature_c: Option<f64>,
}

/// The schedule.
#[derive(Debug, Clone, Default, Serialize)]
#[allow(missing_docs)] // the names are those of the JSON
pub struct Schedule {
    pub members: Vec<Row>,
    pub products: Vec<Total>,
    pub totals: Totals,
    pub basis: Basis,
    pub cautions: Vec<String>,
}

/// Makes the schedule of a design.
#[must_use]
pub fn schedule(checked: &Checked) -> Schedule {
    let design = &checked.design;
    let mut by_mark: rustc_hash::FxHashMap<&str, (Vec<String>, Vec<String>)> = rustc_hash::FxHashMap::default();
    let name = |finding: &Finding| finding.name().to_owned();
    for finding in &checked.findings {
        if let Some(mark) = &finding.mark {
            by_mark.entry(mark).or_default().0.push(name(finding));
        }
    }
    for finding in &checked.agreed {
        if let Some(mark) = &finding.mark {
            by_mark.entry(mark).or_default().1.push(name(finding));
        }
    }
    let mut schedule = Schedule {
        cautions: CAUTIONS.iter().map(|caution| (*caution).to_owned()).collect(),
        basis: Basis {
            method: match design.basis().method.value() {
                Some(method) => Some(method.edition().to_owned()),
                None if design.basis().method.is_absent() => Some(Method::default().edition().to_owned()),
                None => None,
            },
            currency: design.basis().currency.clone(),
            default_critical_temperature_c: design.basis().default_critical.value().map(|t| t.celsius()),
        },
        ..Schedule::default()
    };
    for (at, outcome) in design.members.iter().zip(&checked.outcomes) {
        let member = design.member(*at).value();
        let mut row = row(checked, member, outcome);
        if let Some((findings, departures)) = row.mark.as_deref().and_then(|mark| by_mark.get(mark)) {
            row.findings.clone_from(findings);
            row.departures.clone_from(departures);
        }
        add(&mut schedule, &row);
        schedule.members.push(row);
    }
    schedule
}

fn add(schedule: &mut Schedule, row: &Row) {
    let totals = &mut schedule.totals;
    totals.members += row.count;
    totals.steel_mass_kg += row.steel_mass_kg.unwrap_or(0.0);
    if let Some(cost) = row.cost {
        *totals.cost.get_or_insert(0.0) += cost;
    }
    if let Some(carbon) = row.carbon_kg {
        *totals.carbon_kg.get_or_insert(0.0) += carbon;
    }
    let Some(product) = &row.product else { return };
    totals.surface_m2 += row.surface_m2.unwrap_or(0.0);
    let at = schedule
        .products
        .iter()
        .position(|total| total.product == *product)
        .unwrap_or_else(|| {
            schedule.products.push(Total {
                product: product.clone(),
                ..Total::default()
            });
            schedule.products.len() - 1
        });
    let total = &mut schedule.products[at];
    total.members += row.count;
    total.surface_m2 += row.surface_m2.unwrap_or(0.0);
    if let Some(litres) = row.litres {
        *total.litres.get_or_insert(0.0) += litres;
    }
}

fn row(checked: &Checked, member: &Member, outcome: &Outcome) -> Row {
    let design = &checked.design;
    let keys = design.inherited(member);
    let count = keys.get(|k| &k.count).value().copied().unwrap_or(1);
    let length = keys.get(|k| &k.length).value().map(|length| length.m());
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
    let total = length.map(|length| length * f64::from(count));
    let surface = total
        .zip(section)
        .map(|(length, section)| length * section.heated_perimeter.m());
    let mass = total.zip(section).map(|(length, section)| length * section.mass_per_m);
    let provided = state.and_then(|state| state.provided);
    let location = keys.get(|k| &k.location).value();
    let on_site = protection.and_then(|stated| stated.on_site);
    let boxed = protection.and_then(|stated| stated.boxed.value().copied());
    let litres = litres(named, surface.zip(provided.map(|p| p.mm())), on_site);
    let (cost, carbon_kg) = money(checked, named, mass, surface, provided.map(|p| p.mm()), litres);
    Row {
        mark: member.mark.value().cloned(),
        count,
        length_m: length,
        section: match (row_of(choice, &lookup_options(design.basis())), choice) {
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
        exposure: Some(exposure_words(keys.get(|k| &k.exposure).value().copied())),
        form: product.map(|_| {
            let boxed = boxed.unwrap_or(
                named
                    .and_then(|n| n.product.as_ref())
                    .is_some_and(|p| p.kind == Kind::Board),
            );
            if boxed { "box" } else { "profile" }.to_owned()
        }),
        fire: Some(
            keys.get(|k| &k.fire)
                .value()
                .cloned()
                .unwrap_or_else(|| "standard".to_owned()),
        ),
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
        surface_m2: surface,
        steel_mass_kg: mass,
        cost,
        carbon_kg,
        level: location.and_then(|l| l.level.clone()),
        grid: location.and_then(|l| l.grid.clone()),
        zone: location.and_then(|l| l.zone.clone()),
        phase: location.and_then(|l| l.phase.clone()),
        drawing: keys.get(|k| &k.drawing).value().cloned(),
        revision: keys.get(|k| &k.revision).value().cloned(),
        coats: state.and_then(|state| state.layers).filter(|_| coating),
        litres,
        evidence: named.and_then(|named| named.evidence.report.clone()),
        findings: Vec::new(),
        departures: Vec::new(),
    }
}

fn exposure_words(exposure: Option<Exposure>) -> String {
    match exposure {
        None | Some(Exposure::AllRound) => "all round".to_owned(),
        Some(Exposure::ThreeSides) => "three sides".to_owned(),
        Some(Exposure::FlangeOnly) => "flange only".to_owned(),
        Some(Exposure::Covered(_)) => "covered faces".to_owned(),
        Some(Exposure::Perimeter(length)) => format!("perimeter {} mm", length.mm()),
    }
}

/// Litres of a coating: dry volume over volume solids over one less the loss. Not claimed without the solids.
fn litres(named: Option<&NamedProduct>, film: Option<(f64, f64)>, on_site: Option<bool>) -> Option<f64> {
    let named = named?;
    let product = named.product.as_ref().filter(|product| product.kind == Kind::Coating)?;
    let (surface, mm) = film?;
    let rates = &named.rates;
    let loss = if on_site == Some(true) {
        rates.loss_site
    } else {
        rates.loss_shop
    };
    Some(surface * mm / product.volume_solids? / (1.0 - loss.unwrap_or(0.0)))
}

/// Cost and carbon. Without the rates nothing is claimed.
fn money(
    checked: &Checked,
    named: Option<&NamedProduct>,
    mass: Option<f64>,
    surface: Option<f64>,
    mm: Option<f64>,
    litres: Option<f64>,
) -> (Option<f64>, Option<f64>) {
    let basis = checked.design.basis();
    let steel = basis.steel_rate.zip(mass).map(|(rate, mass)| rate * mass);
    let carbon = basis.carbon_rate.zip(mass).map(|(rate, mass)| rate * mass);
    let Some(named) = named else { return (steel, carbon) };
    let rates = &named.rates;
    let term = |rate: Option<f64>, amount: Option<f64>| match rate {
        None => Some(0.0),
        Some(rate) => amount.map(|amount| rate * amount),
    };
    let priced = rates.per_m2.is_some() || rates.per_m2_mm.is_some() || rates.per_litre.is_some();
    let volume = surface.zip(mm).map(|(surface, mm)| surface * mm);
    let protection = term(rates.per_m2, surface)
        .zip(term(rates.per_m2_mm, volume))
        .zip(term(rates.per_litre, litres))
        .map(|((a, b), c)| a + b + c)
        .filter(|_| priced && rates.per_kg.is_none());
    // The carbon of a product is by its mass, which only its density gives.
    let density = named.product.as_ref().and_then(|product| match &product.method {
        crate::protection::product::Method::Properties(insulation) => Some(insulation.density.kg_m3()),
        _ => None,
    });
    let own = rates
        .carbon
        .zip(density)
        .zip(volume)
        .map(|((carbon, density), volume)| carbon * density * volume / 1000.0);
    (
        steel.zip(protection).map(|(a, b)| a + b),
        carbon.zip(own).map(|(a, b)| a + b),
    )
}
