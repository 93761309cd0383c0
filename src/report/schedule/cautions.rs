//! What a reader of the schedule must know: sentences that stand alone.

use std::collections::BTreeSet;

use super::row::Row;
use crate::analysis::source::FileKind;
use crate::check::Checked;
use crate::findings::finding::Severity;

/// Cautions of every schedule.
const ALWAYS: [&str; 3] = [
    "Local codes, product certification and the judgement of a licensed engineer come before these figures.",
    "Results rest on the data and the assessed range that the product files state; nothing is claimed outside that range.",
    "Temperatures are converged: within 0.5 °C of the limit of vanishing time steps and never more than 0.1 °C below it. \
     Coarse steps of a hand calculation differ from them.",
];

/// The cautions of designs and their rows.
pub(super) fn cautions(checked: &[Checked], rows: &[Row], bases_differ: bool) -> Vec<String> {
    let mut out: Vec<String> = ALWAYS.iter().map(|always| (*always).to_owned()).collect();
    let mut say = |words: &str, hit: &dyn Fn(&Row) -> bool| {
        let n = rows.iter().filter(|row| hit(row)).count();
        if n > 0 {
            out.push(format!("{words}: {n} of {} rows.", rows.len()));
        }
    };
    say("Not verified, which is no pass", &|row| row.verdict == "not verified");
    say("Fail as designed", &|row| row.verdict == "fails");
    say(
        "Can't be protected, for no assessed thickness of their product holds them",
        &|row| row.verdict == "cannot be protected",
    );
    say(
        "Take the named default as critical temperature, which nothing in the design confirms",
        &|row| row.critical_temperature_from.as_deref() == Some("default"),
    );
    say(
        "Computed with the lower emissivity of a declared zinc coating",
        &|row| has(row, "galvanised-benefit-claimed"),
    );
    say("Rest on product evidence that has expired", &|row| {
        has(row, "evidence-expired")
    });
    say("Have agreed departures, which change no verdict", &|row| {
        !row.departures.is_empty()
    });
    say(
        "Left out of the totals of steel, for length, count or section is not known",
        &|row| row.steel_mass_kg.is_none(),
    );
    say(
        "Left out of the totals of their product, for surface or thickness is not known",
        &|row| row.product.is_some() && (row.surface_m2.is_none() || row.provided_thickness_mm.is_none()),
    );
    let unread = checked
        .iter()
        .flat_map(|design| &design.findings)
        .filter(|finding| finding.severity == Severity::Error && finding.mark.is_none())
        .count();
    if unread > 0 {
        out.push(format!(
            "Errors outside the members are open, so that rows may be missing or wrong: {unread}."
        ));
    }
    let invented = invented(checked);
    if !invented.is_empty() {
        out.push(format!(
            "Invented by their own evidence, so that they serve no real building: {}.",
            invented.into_iter().collect::<Vec<_>>().join(", ")
        ));
    }
    if bases_differ {
        out.push(
            "Several designs with different bases stand together; where they differ the basis has no value.".to_owned(),
        );
    }
    out
}

fn has(row: &Row, finding: &str) -> bool {
    row.findings.iter().chain(&row.departures).any(|name| name == finding)
}

/// Products whose evidence calls itself invented.
fn invented(checked: &[Checked]) -> BTreeSet<String> {
    checked
        .iter()
        .flat_map(|design| &design.design.files)
        .filter(|file| file.kind == FileKind::Protection)
        .flat_map(|file| &file.products)
        .map(|item| item.value())
        .filter(|named| {
            named
                .evidence
                .report
                .as_deref()
                .is_some_and(|report| report.contains("invented"))
        })
        .map(|named| named.name.value.clone())
        .collect()
}
