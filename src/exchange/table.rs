//! Tables to read. Figures are rounded; JSON and CSV have them unrounded.

use comfy_table::presets::ASCII_MARKDOWN;
use comfy_table::{CellAlignment, ContentArrangement, Table};

use crate::report::schedule::Schedule;
use crate::report::schedule::row::Row;
use crate::section::catalogue::CatalogueRow;
use crate::section::{Casing, Exposure, heated};
use crate::units::{DisplayUnits, Length, SectionFactor, Temperature, significant};

/// What stands where there is no value.
const NONE: &str = "–";

fn table(header: &[&str], left: &[usize], rows: Vec<Vec<String>>) -> String {
    let mut table = Table::new();
    table
        .load_style(ASCII_MARKDOWN)
        .set_content_arrangement(ContentArrangement::Disabled);
    table.set_header(header.iter().copied());
    for row in rows {
        table.add_row(row);
    }
    for (at, column) in table.column_iter_mut().enumerate() {
        if !left.contains(&at) {
            column.set_cell_alignment(CellAlignment::Right);
        }
    }
    format!("{table}\n")
}

/// The schedule: the columns that fit a page, the totals, the basis and the cautions.
#[must_use]
pub fn schedule(schedule: &Schedule) -> String {
    let units = match schedule.basis.units.as_deref() {
        Some("imperial") => DisplayUnits::Imperial,
        _ => DisplayUnits::Metric,
    };
    let rows = schedule.members.iter().map(|row| member(row, units)).collect();
    let header = [
        "mark",
        "no.",
        "section",
        "period",
        "factor",
        "limit",
        "bare lasts",
        "product",
        "needs",
        "has",
        "lasts",
        "verdict",
    ];
    let mut out = table(&header, &[0, 2, 7, 11], rows);
    out.push_str(&totals(schedule, units));
    for row in schedule.members.iter().filter(|row| !row.departures.is_empty()) {
        let mark = row.mark.as_deref().unwrap_or(NONE);
        out.push_str(&format!(
            "agreed departure: {mark} from {}\n",
            row.departures.join(", ")
        ));
    }
    out.push_str(&basis(schedule, units));
    for caution in &schedule.cautions {
        out.push_str(&format!("- {caution}\n"));
    }
    out
}

fn member(row: &Row, units: DisplayUnits) -> Vec<String> {
    let text = |value: &Option<String>| value.clone().unwrap_or_else(|| NONE.to_owned());
    let or_none = |value: Option<String>| value.unwrap_or_else(|| NONE.to_owned());
    // What is never reached within the longest time looked at.
    let never = row
        .critical_temperature_c
        .and(row.bare_temperature_c)
        .map(|_| "> 360 min".to_owned());
    let minutes = |value: Option<f64>| or_none(value.map(|min| format!("{} min", significant(floor(min, 1.0), 0))));
    let thickness = |mm: f64| {
        if row.quantities.film {
            units.film(Length::from_mm(mm))
        } else {
            units.thickness(Length::from_mm(mm))
        }
    };
    // What is needed is never rounded down.
    let step = match (units, row.quantities.film) {
        (DisplayUnits::Metric, false) => 0.1,
        (DisplayUnits::Metric, true) => 0.001,
        (DisplayUnits::Imperial, false) => 0.0254,
        (DisplayUnits::Imperial, true) => 0.00254,
    };
    vec![
        text(&row.mark),
        or_none(row.count.map(|count| count.to_string())),
        text(&row.section),
        minutes(row.period_min),
        or_none(
            row.section_factor_per_m
                .map(|factor| units.section_factor(SectionFactor::from_per_m(factor))),
        ),
        or_none(
            row.critical_temperature_c
                .map(|limit| units.temperature(Temperature::from_celsius(limit))),
        ),
        match row.bare_resistance_min {
            None => or_none(never),
            lasts => minutes(lasts),
        },
        text(&row.product),
        or_none(row.required_thickness_mm.map(|mm| thickness(ceiling(mm, step)))),
        or_none(row.provided_thickness_mm.map(thickness)),
        minutes(row.resistance_min),
        row.verdict.clone(),
    ]
}

/// The next multiple at or above; a trace above one counts as that one.
fn ceiling(value: f64, step: f64) -> f64 {
    (value / step - 1e-9).ceil() * step
}

/// The next multiple at or below; a trace below one counts as that one.
fn floor(value: f64, step: f64) -> f64 {
    (value / step + 1e-9).floor() * step
}

fn totals(schedule: &Schedule, units: DisplayUnits) -> String {
    let currency = schedule.basis.currency.as_deref().unwrap_or("");
    let part = |value: Option<f64>, unit: &str| match value {
        Some(value) => format!(", {value:.0} {unit}").trim_end().to_owned(),
        None => String::new(),
    };
    let shown = |value: Option<f64>, show: fn(DisplayUnits, f64) -> String| {
        value.map_or_else(String::new, |value| format!(", {}", show(units, value)))
    };
    let counted = |n: u32, what: &str| {
        if n == 1 {
            format!("1 {what}")
        } else {
            format!("{n} {what}s")
        }
    };
    let mut out = String::new();
    for total in &schedule.products {
        let namesakes = schedule.products.iter().filter(|other| other.product == total.product);
        let library = total.library.as_ref().filter(|_| namesakes.count() > 1);
        let library = library.map_or_else(String::new, |library| format!(" ({library})"));
        out.push_str(&format!(
            "{}{library}: {}, {}{}{}{}{}{}, on {} of steel\n",
            total.product,
            counted(total.members, "piece"),
            units.surface(total.surface_m2),
            total
                .coats
                .map_or_else(String::new, |coats| format!(", {}", counted(coats, "coat"))),
            shown(total.litres, DisplayUnits::volume),
            shown(total.product_mass_kg, DisplayUnits::mass),
            part(total.cost, currency),
            part(total.carbon_kg, "kg CO2e"),
            units.mass(total.steel_mass_kg),
        ));
    }
    let all = &schedule.totals;
    out.push_str(&format!(
        "total: {}, {}, {} of steel, {} protected{}{}\n",
        counted(all.marks, "mark"),
        counted(all.members, "piece"),
        units.mass(all.steel_mass_kg),
        units.surface(all.surface_m2),
        part(all.cost, currency),
        part(all.carbon_kg, "kg CO2e"),
    ));
    out
}

fn basis(schedule: &Schedule, units: DisplayUnits) -> String {
    let basis = &schedule.basis;
    let mut parts = Vec::new();
    for heading in [&basis.project, &basis.reference, &basis.revision, &basis.status] {
        parts.extend(heading.clone());
    }
    parts.extend(basis.method.as_ref().map(|method| format!("method {method}")));
    parts.extend(basis.gamma_m_fi.map(|factor| format!("γM,fi {factor}")));
    parts.extend(
        basis
            .yield_from
            .as_ref()
            .map(|source| format!("yield strengths of {source}")),
    );
    parts.extend(
        basis
            .default_critical_temperature_c
            .map(|limit| units.temperature(Temperature::from_celsius(limit)))
            .map(|limit| format!("default critical temperature {limit}")),
    );
    parts.extend(basis.hollow.as_ref().map(|finish| format!("hollow sections {finish}")));
    let tables = basis.section_tables.as_ref().filter(|tables| !tables.is_empty());
    parts.extend(tables.map(|tables| format!("section tables {}", tables.join(", "))));
    format!("basis: {}\n", parts.join("; "))
}

/// Rows of the section tables with what is computed from their dimensions.
#[must_use]
pub fn sections(found: &[&CatalogueRow]) -> String {
    let rows = found.iter().map(|row| section(row)).collect();
    let header = [
        "section",
        "standard",
        "h mm",
        "b mm",
        "kg/m",
        "A mm²",
        "outline mm",
        "all round 1/m",
        "three sides",
        "box",
        "box three sides",
    ];
    table(&header, &[0, 1], rows)
}

fn section(row: &CatalogueRow) -> Vec<String> {
    let geometry = row.geometry();
    let factor = |exposure, casing| {
        heated(geometry, exposure, casing).map_or_else(|_| NONE.to_owned(), |all| significant(all.factor.per_m(), 1))
    };
    let size = |names: [&str; 2]| {
        let found = names.iter().find_map(|name| row.shape.dimension(name));
        found.map_or_else(|| NONE.to_owned(), |length| significant(length.mm(), 1))
    };
    vec![
        row.designation.to_string(),
        row.standard.to_owned(),
        size(["h", "d"]),
        size(["b", "d"]),
        significant(row.mass.kg_m(), 1),
        significant(geometry.area.mm2(), 0),
        significant(geometry.perimeter.mm(), 0),
        factor(Exposure::AllRound, Casing::Profile),
        factor(Exposure::ThreeSides, Casing::Profile),
        factor(Exposure::AllRound, Casing::Box),
        factor(Exposure::ThreeSides, Casing::Box),
    ]
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn needs_are_rounded_up_and_minutes_down() {
        let needs = |mm: f64, film: bool| {
            let mut row = Row {
                required_thickness_mm: Some(mm),
                resistance_min: Some(59.96),
                ..Row::default()
            };
            row.quantities.film = film;
            let cells = member(&row, DisplayUnits::Metric);
            (cells[8].clone(), cells[10].clone())
        };
        assert_eq!(needs(21.41, false).0, "21.5 mm");
        assert_eq!(needs(20.0, false).0, "20 mm");
        assert_eq!(needs(1.2531, true), ("1254 µm".to_owned(), "59 min".to_owned()));
    }
}
