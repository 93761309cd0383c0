//! JSON of findings, schedules and sections.

use serde_json::{Value, json};

use crate::check::Checked;
use crate::findings::finding::{Finding, Place, Severity};
use crate::report::schedule::Schedule;
use crate::section::catalogue::CatalogueRow;
use crate::section::{Casing, Exposure, heated};
use crate::text::{Encoding, LineIndex, Position};

/// Lines of every file of a design, for positions.
struct Lines<'a>(Vec<(&'a crate::analysis::source::SourceFile, LineIndex)>);

impl Lines<'_> {
    fn position(&self, place: &Place, offset: u32) -> Value {
        let found = self.0.iter().find(|(file, _)| file.path == place.path);
        let position = found.map_or(Position::default(), |(file, lines)| {
            lines.position(&file.text, offset, Encoding::Utf32)
        });
        json!({ "line": position.line + 1, "column": position.column + 1 })
    }

    fn start(&self, place: &Place) -> Value {
        self.position(place, place.span.start)
    }

    fn end(&self, place: &Place) -> Value {
        self.position(place, place.span.end)
    }
}

/// The findings of designs: one-based lines and columns in Unicode scalars, the end excluded.
#[must_use]
pub fn check(checked: &[Checked]) -> String {
    let mut findings = Vec::new();
    for design in checked {
        let lines = Lines(
            design
                .design
                .files
                .iter()
                .map(|file| (&**file, LineIndex::new(&file.text)))
                .collect(),
        );
        findings.extend(design.findings.iter().map(|finding| one(finding, &lines)));
    }
    let count = |severity: Severity| {
        checked
            .iter()
            .flat_map(|design| &design.findings)
            .filter(|finding| finding.severity == severity)
            .count()
    };
    let counts: serde_json::Map<String, Value> = Severity::ALL
        .into_iter()
        .map(|severity| (severity.word().to_owned(), json!(count(severity))))
        .collect();
    pretty(&json!({ "findings": findings, "counts": counts }))
}

fn one(finding: &Finding, lines: &Lines<'_>) -> Value {
    let fixes: Vec<Value> = finding
        .fixes
        .iter()
        .map(|fix| {
            let edits: Vec<Value> = fix
                .edits
                .iter()
                .map(|edit| {
                    json!({
                        "path": edit.place.path.display().to_string(),
                        "start": lines.start(&edit.place), "end": lines.end(&edit.place), "text": edit.text,
                    })
                })
                .collect();
            json!({ "title": fix.title, "safe": fix.safe, "edits": edits })
        })
        .collect();
    json!({
        "finding": finding.name(),
        "severity": finding.severity.word(),
        "message": finding.message,
        "notes": finding.notes.iter().map(|note| note.text.clone()).collect::<Vec<_>>(),
        "path": finding.place.path.display().to_string(),
        "start": lines.start(&finding.place),
        "end": lines.end(&finding.place),
        "mark": finding.mark,
        "key": finding.key,
        "clause": finding.declaration.clause,
        "fixes": fixes,
    })
}

/// A schedule.
#[must_use]
pub fn schedule(schedule: &Schedule) -> String {
    pretty(&serde_json::to_value(schedule).unwrap_or(Value::Null))
}

/// Rows of the section tables with what is computed from their dimensions.
#[must_use]
pub fn sections(rows: &[&CatalogueRow]) -> String {
    pretty(&json!({ "sections": rows.iter().map(|row| section(row)).collect::<Vec<_>>() }))
}

/// One row of the section tables.
#[must_use]
pub fn section(row: &CatalogueRow) -> Value {
    let geometry = row.geometry();
    let factor = |exposure, casing| {
        heated(geometry, exposure, casing)
            .ok()
            .map(|heated| heated.factor.per_m())
    };
    let size = |name: &str| row.shape.dimension(name).map(|length| length.mm());
    json!({
        "designation": &*row.designation,
        "family": &*row.family,
        "shape": row.shape.name(),
        "standard": row.standard,
        "h_mm": size("h"),
        "b_mm": size("b"),
        "tw_mm": size("tw"),
        "tf_mm": size("tf"),
        "r_mm": size("r").or_else(|| size("ro")),
        "t_mm": size("t"),
        "d_mm": size("d"),
        "mass_kg_m": row.mass.kg_m(),
        "area_mm2": geometry.area.mm2(),
        "perimeter_mm": geometry.perimeter.mm(),
        "box_perimeter_mm": geometry.box_perimeter.map(|length| length.mm()),
        "all_round_per_m": factor(Exposure::AllRound, Casing::Profile),
        "three_sides_per_m": factor(Exposure::ThreeSides, Casing::Profile),
        "box_all_round_per_m": factor(Exposure::AllRound, Casing::Box),
        "box_three_sides_per_m": factor(Exposure::ThreeSides, Casing::Box),
    })
}

/// Objects as rows of text, for tables and CSV: the keys, then a row each.
#[must_use]
pub fn rows(values: &[Value]) -> (Vec<String>, Vec<Vec<String>>) {
    let keys: Vec<String> = match values.first() {
        Some(Value::Object(map)) => map.keys().cloned().collect(),
        _ => Vec::new(),
    };
    let cell = |value: &Value| match value {
        Value::Null => String::new(),
        Value::String(text) => text.clone(),
        Value::Array(list) => list
            .iter()
            .map(|v| v.as_str().unwrap_or_default())
            .collect::<Vec<_>>()
            .join("; "),
        other => other.to_string(),
    };
    let rows = values
        .iter()
        .map(|value| keys.iter().map(|key| cell(&value[key.as_str()])).collect())
        .collect();
    (keys, rows)
}

/// The rows of a schedule as objects.
#[must_use]
pub fn schedule_rows(schedule: &Schedule) -> Vec<Value> {
    schedule
        .members
        .iter()
        .map(|row| serde_json::to_value(row).unwrap_or(Value::Null))
        .collect()
}

fn pretty(value: &Value) -> String {
    let mut text = serde_json::to_string_pretty(value).unwrap_or_default();
    text.push('\n');
    text
}
