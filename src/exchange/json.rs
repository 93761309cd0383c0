//! JSON of findings, schedules and sections.

use std::path::Path;
use std::rc::Rc;

use serde::Serialize;
use serde_json::{Map, Value, json};

use crate::analysis::source::SourceFile;
use crate::check::Checked;
use crate::findings::finding::{Finding, FixEdit, Place, Severity};
use crate::report::schedule::Schedule;
use crate::section::catalogue::CatalogueRow;
use crate::section::{Casing, Exposure, heated};
use crate::text::{Encoding, LineIndex, Position};

/// How a path is written.
pub type ShowPath<'a> = dyn Fn(&Path) -> String + 'a;

/// The whole of a check. Written straight from the findings: a large design has hundreds of thousands.
#[derive(Serialize)]
struct Document<'a> {
    findings: Vec<Found<'a>>,
    counts: Counts,
    departures: Vec<Found<'a>>,
}

#[derive(Serialize)]
struct Counts {
    error: usize,
    warning: usize,
    information: usize,
    hint: usize,
}

#[derive(Serialize)]
struct Found<'a> {
    finding: &'a str,
    severity: &'a str,
    message: &'a str,
    notes: Vec<&'a str>,
    path: Rc<str>,
    start: At,
    end: At,
    mark: Option<&'a str>,
    key: Option<&'a str>,
    clause: &'a str,
    fixes: Vec<FoundFix<'a>>,
}

#[derive(Serialize)]
struct FoundFix<'a> {
    title: &'a str,
    safe: bool,
    edits: Vec<FoundEdit<'a>>,
}

#[derive(Serialize)]
struct FoundEdit<'a> {
    path: Rc<str>,
    start: At,
    end: At,
    text: &'a str,
}

/// One-based, the column in Unicode scalars.
#[derive(Clone, Copy, Serialize)]
struct At {
    line: u32,
    column: u32,
}

/// The files of a design with their lines and the words for their paths.
struct Lines<'a>(Vec<(&'a SourceFile, LineIndex, Rc<str>)>);

impl Lines<'_> {
    /// Path, first character and the one after the last.
    fn place(&self, place: &Place) -> (Rc<str>, At, At) {
        let found = self.0.iter().find(|(file, ..)| file.path == place.path);
        let at = |offset: u32| {
            let position = found.map_or(Position::default(), |(file, lines, _)| {
                lines.position(&file.text, offset, Encoding::Utf32)
            });
            At {
                line: position.line + 1,
                column: position.column + 1,
            }
        };
        let path = found.map_or_else(|| Rc::from(place.path.to_string_lossy()), |(.., path)| Rc::clone(path));
        (path, at(place.span.start), at(place.span.end))
    }

    fn found<'a>(&self, finding: &'a Finding) -> Found<'a> {
        let (path, start, end) = self.place(&finding.place);
        let edit = |edit: &'a FixEdit| {
            let (path, start, end) = self.place(&edit.place);
            FoundEdit {
                path,
                start,
                end,
                text: &edit.text,
            }
        };
        let fixes = finding.fixes.iter().map(|fix| FoundFix {
            title: &fix.title,
            safe: fix.safe,
            edits: fix.edits.iter().map(edit).collect(),
        });
        Found {
            finding: finding.name(),
            severity: finding.severity.word(),
            message: &finding.message,
            notes: finding.notes.iter().map(|note| note.text.as_str()).collect(),
            path,
            start,
            end,
            mark: finding.mark.as_deref(),
            key: finding.key.as_deref(),
            clause: finding.declaration.clause,
            fixes: fixes.collect(),
        }
    }
}

/// The findings of designs, and those that a departure agrees to: one-based lines and columns in Unicode scalars, the
/// end excluded.
#[must_use]
pub fn check(checked: &[Checked], show: &ShowPath<'_>) -> String {
    let mut findings = Vec::new();
    let mut departures = Vec::new();
    for design in checked {
        let files = design.design.files.iter();
        let lines = Lines(
            files
                .map(|file| (&**file, LineIndex::new(&file.text), Rc::from(show(&file.path))))
                .collect(),
        );
        findings.extend(design.findings.iter().map(|finding| lines.found(finding)));
        departures.extend(design.agreed.iter().map(|finding| lines.found(finding)));
    }
    let count = |severity: Severity| {
        findings
            .iter()
            .filter(|found| found.severity == severity.word())
            .count()
    };
    let counts = Counts {
        error: count(Severity::Error),
        warning: count(Severity::Warning),
        information: count(Severity::Information),
        hint: count(Severity::Hint),
    };
    pretty(&Document {
        findings,
        counts,
        departures,
    })
}

/// A schedule.
#[must_use]
pub fn schedule(schedule: &Schedule) -> String {
    pretty(schedule)
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
pub(super) fn object(row: &impl Serialize) -> Map<String, Value> {
    match serde_json::to_value(row) {
        Ok(Value::Object(map)) => map,
        _ => Map::new(),
    }
}

fn pretty(value: &impl Serialize) -> String {
    let mut text = serde_json::to_string_pretty(value).unwrap_or_default();
    text.push('\n');
    text
}
