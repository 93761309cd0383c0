//! Tables for terminals, and CSV (RFC 4180).

use comfy_table::presets::ASCII_MARKDOWN;
use comfy_table::{ContentArrangement, Table};

use crate::report::schedule::Schedule;
use crate::units::significant;

/// CSV with a header; the text as it is.
#[must_use]
pub fn csv(header: &[String], rows: &[Vec<String>]) -> String {
    let mut writer = csv::WriterBuilder::new()
        .terminator(csv::Terminator::CRLF)
        .from_writer(Vec::new());
    // Writing into memory can't fail but by a row of another length, and all have the header's.
    let _ = writer.write_record(header);
    for row in rows {
        let _ = writer.write_record(row);
    }
    String::from_utf8(writer.into_inner().unwrap_or_default()).unwrap_or_default()
}

/// A table with a header.
#[must_use]
pub fn table(header: &[&str], rows: Vec<Vec<String>>) -> String {
    let mut table = Table::new();
    table
        .load_style(ASCII_MARKDOWN)
        .set_content_arrangement(ContentArrangement::Disabled);
    table.set_header(header.iter().copied());
    for row in rows {
        table.add_row(row);
    }
    format!("{table}\n")
}

/// The schedule as a table, the columns that fit a page.
#[must_use]
pub fn schedule(schedule: &Schedule) -> String {
    let number =
        |value: Option<f64>, decimals: usize| value.map_or_else(|| "–".to_owned(), |v| significant(v, decimals));
    let text = |value: &Option<String>| value.clone().unwrap_or_else(|| "–".to_owned());
    let rows = schedule
        .members
        .iter()
        .map(|row| {
            vec![
                text(&row.mark),
                row.count.to_string(),
                text(&row.section),
                number(row.period_min, 0),
                number(row.section_factor_per_m, 0),
                number(row.critical_temperature_c, 0),
                number(row.bare_resistance_min, 1),
                text(&row.product),
                number(row.required_thickness_mm, 2),
                number(row.provided_thickness_mm, 2),
                row.verdict.clone(),
            ]
        })
        .collect();
    let header = [
        "mark", "no.", "section", "R min", "1/m", "θcr °C", "bare min", "product", "needs mm", "has mm", "verdict",
    ];
    let mut out = table(&header, rows);
    for total in &schedule.products {
        let litres = total
            .litres
            .map_or(String::new(), |litres| format!(", {litres:.0} litres"));
        out.push_str(&format!(
            "{}: {} members, {:.0} m²{litres}\n",
            total.product, total.members, total.surface_m2
        ));
    }
    let totals = &schedule.totals;
    out.push_str(&format!(
        "total: {} members, {:.0} kg of steel\n",
        totals.members, totals.steel_mass_kg
    ));
    if let Some(method) = &schedule.basis.method {
        out.push_str(&format!("method: {method}\n"));
    }
    for caution in &schedule.cautions {
        out.push_str(&format!("{caution}\n"));
    }
    out
}
