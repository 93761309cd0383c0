//! JSON of findings, schedules and sections.

use std::path::Path;

use serde_json::{Map, Value, json};

use crate::analysis::source::SourceFile;
use crate::check::Checked;
use crate::findings::finding::{Finding, Place, Severity};
use crate::report::schedule::Schedule;
use crate::section::catalogue::CatalogueRow;
use crate::section::{Casing, Exposure, heated};
use crate::text::{Encoding, LineIndex, Position};

/// How a path is written.
pub type ShowPath<'a> = dyn Fn(&Path) -> String + 'a;

/// Lines of every file of a design, for positions.
struct Lines<'a>(Vec<(&'a SourceFile, LineIndex)>);

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

/// The findings of designs, and those that a departure agrees to: one-based lines and columns in Unicode scalars, the
/// end excluded.
#[must_use]
pub fn check(checked: &[Checked], show: &ShowPath<'_>) -> String {
    let mut findings = Vec::new();
    let mut agreed = Vec::new();
    for design in checked {
        let files = design.design.files.iter();
        let lines = Lines(files.map(|file| (&**file, LineIndex::new(&file.text))).collect());
        findings.extend(design.findings.iter().map(|finding| one(finding, &lines, show)));
        agreed.extend(design.agreed.iter().map(|finding| one(finding, &lines, show)));
    }
    let count = |severity: Severity| {
        checked
            .iter()
            .flat_map(|design| &design.findings)
            .filter(|finding| finding.severity == severity)
            .count()
    };
    let counts: Map<String, Value> = Severity::ALL
        .into_iter()
        .map(|severity| (severity.word().to_owned(), json!(count(severity))))
        .collect();
    pretty(&json!({ "findings": findings, "counts": counts, "departures": agreed }))
}

fn one(finding: &Finding, lines: &Lines<'_>, show: &ShowPath<'_>) -> Value {
    let fixes: Vec<Value> = finding
        .fixes
        .iter()
        .map(|fix| {
            let edits: Vec<Value> = fix
                .edits
                .iter()
                .map(|edit| {
                    json!({
                        "path": show(&edit.place.path),
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
        "path": show(&finding.place.path),
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
pub(super) fn section(row: &CatalogueRow) -> Map<String, Value> {
    let geometry = row.geometry();
    let factor = |exposure, casing| {
        heated(geometry, exposure, casing)
            .ok()
            .map(|heated| heated.factor.per_m())
    };
    let size = |name: &str| row.shape.dimension(name).map(|length| length.mm());
    let all = json!({
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
    });
    object(&all)
}

/// A row as an object; its keys in their order.
pub(super) fn object(row: &impl serde::Serialize) -> Map<String, Value> {
    match serde_json::to_value(row) {
        Ok(Value::Object(map)) => map,
        _ => Map::new(),
    }
}

fn pretty(value: &Value) -> String {
    let mut text = serde_json::to_string_pretty(value).unwrap_or_default();
    text.push('\n');
    text
}
