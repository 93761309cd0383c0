//! What leaves the program, and in which form.

use std::fs;
use std::path::Path;

use crate::support::{HEAD, run, text};

#[test]
fn several_designs_stand_in_one_schedule() {
    let folder = tempfile::tempdir().unwrap();
    for (name, currency) in [("a", "EUR"), ("b", "GBP")] {
        let member = format!("{{ mark: {name}1, section: IPE 300, length: 4, critical temperature: 550 }}");
        let text = format!("{HEAD}  - {member}\nbasis: {{ currency: {currency}, rates: {{ steel: 2 }} }}\n");
        fs::write(folder.path().join(format!("{name}.steelwork.yaml")), text).unwrap();
    }
    let output = run(folder.path(), &["schedule", "--as", "json"]);
    assert_eq!(output.status.code(), Some(1), "both members fail");
    let json: serde_json::Value = serde_json::from_slice(&output.stdout).unwrap();
    assert_eq!(json["members"].as_array().unwrap().len(), 2);
    assert_eq!(json["basis"]["method"], "EN 1993-1-2:2005");
    assert!(json["basis"]["currency"].is_null() && json["totals"]["cost"].is_null());
    // IPE 300 has 42.2 kg/m (EN 10365, from memory): 4 m at 2 a kg.
    assert!((json["members"][0]["cost"].as_f64().unwrap() - 337.7).abs() < 1.0);
    let csv = text(&run(folder.path(), &["schedule", "--as", "csv"]));
    assert_eq!(csv.lines().count(), 3);
}

#[test]
fn a_row_names_the_fault_that_its_member_inherits() {
    let folder = tempfile::tempdir().unwrap();
    let text = "steelwork: 1
defaults: { role: beam, steel: S355, critical temperature: 550 }
groups:
  upper: { period: 60 kN }
  lower: { period: 15 }
members:
  - { mark: A, group: upper, section: IPE 300 }
  - { mark: B, group: lower, section: HE 1000 M }
  - { mark: A, group: lower, section: HE 1000 M, colour: red }
";
    fs::write(folder.path().join("a.steelwork.yaml"), text).unwrap();
    let output = run(folder.path(), &["schedule", "--as", "json"]);
    let json: serde_json::Value = serde_json::from_slice(&output.stdout).unwrap();
    let of = |at: usize| {
        let row = &json["members"][at];
        let names: Vec<String> = serde_json::from_value(row["findings"].clone()).unwrap();
        (row["verdict"].as_str().unwrap().to_owned(), names)
    };
    let (verdict, names) = of(0);
    assert_eq!(verdict, "not verified");
    assert!(names.contains(&"wrong-unit".to_owned()), "{names:?}");
    assert_eq!(of(1), ("passes".to_owned(), Vec::new()));
    // The second of two members of one mark has its own findings, and the first has none of them.
    let (_, names) = of(2);
    assert!(
        names.contains(&"duplicate-mark".to_owned()) && names.contains(&"unknown-key".to_owned()),
        "{names:?}"
    );
    assert!(!of(0).1.contains(&"unknown-key".to_owned()));
}

#[test]
fn totals_are_in_the_units_of_the_design() {
    let folder = tempfile::tempdir().unwrap();
    let design = "steelwork: 1
basis: { units: imperial, default critical temperature: 1000 °F }
members:
  - { mark: B1, role: beam, steel: S355, period: 15, section: { shape: stated, area: 10000, perimeter: 1000 }, length: 10 }
";
    fs::write(folder.path().join("a.steelwork.yaml"), design).unwrap();
    let table = text(&run(folder.path(), &["schedule"]));
    // 10000 mm² of 10 m at 7850 kg/m³ are 785 kg.
    assert!(
        table.contains("total: 1 mark, 1 piece, 1731 lb of steel, 0 ft² protected"),
        "{table}"
    );
    assert!(table.contains("default critical temperature 1000 °F"), "{table}");
}

#[test]
fn namesakes_of_two_libraries_are_not_added_up() {
    let folder = tempfile::tempdir().unwrap();
    for (name, density) in [("a", 400), ("b", 800)] {
        let library = format!(
            "protection: 1\nproducts:\n  grey board: {{ kind: board, method: constant properties, conductivity: 0.2, specific heat: 1000, density: {density}, thicknesses: [15, 20, 25], assessed: {{ section factor: [40, 320], thickness: [15, 25], steel temperature: [350, 750], period: [30, 180], shapes: [open], orientation: [beam], fires: [standard] }} }}\n"
        );
        fs::write(folder.path().join(format!("{name}.protection.yaml")), library).unwrap();
        let text = format!(
            "{HEAD}  - {{ mark: {name}1, section: IPE 300, length: 4, period: 30, critical temperature: 550, protection: grey board }}\nlibraries: [{name}.protection.yaml]\n"
        );
        fs::write(folder.path().join(format!("{name}.steelwork.yaml")), text).unwrap();
    }
    let output = run(folder.path(), &["schedule", "--as", "json"]);
    let json: serde_json::Value = serde_json::from_slice(&output.stdout).unwrap();
    let products = json["products"].as_array().unwrap();
    let libraries: Vec<&str> = products.iter().filter_map(|total| total["library"].as_str()).collect();
    assert_eq!(libraries, ["a.protection.yaml", "b.protection.yaml"]);
    let table = text(&run(folder.path(), &["schedule"]));
    assert!(table.contains("grey board (a.protection.yaml): 1 piece, "), "{table}");
}

/// The keys of a member in the schedule, in their order; CSV has the same.
const MEMBER_KEYS: &str = "mark count length_m section shape role steel exposure form fire period_min area_mm2 \
    heated_perimeter_mm section_factor_per_m box_section_factor_per_m effective_thickness_mm \
    weight_over_perimeter_lb_ft_in shadow_factor section_class critical_temperature_c bare_critical_temperature_c \
    protected_critical_temperature_c critical_temperature_from governing bare_temperature_c bare_resistance_min product \
    layers required_thickness_mm provided_thickness_mm protected_temperature_c resistance_min verdict surface_m2 \
    steel_mass_kg cost carbon_kg level grid zone phase drawing revision coats litres evidence findings departures";

/// The keys of a section.
const SECTION_KEYS: &str = "designation family shape standard h_mm b_mm tw_mm tf_mm r_mm t_mm d_mm mass_kg_m area_mm2 \
    perimeter_mm box_perimeter_mm all_round_per_m three_sides_per_m box_all_round_per_m box_three_sides_per_m";

#[test]
fn json_and_csv_have_the_keys_that_are_promised() {
    let folder = tempfile::tempdir().unwrap();
    for (args, list, wanted) in [
        (&["schedule", "--demo"][..], "members", MEMBER_KEYS),
        (&["sections", "HE"][..], "sections", SECTION_KEYS),
    ] {
        let form = |form: &str| text(&run(folder.path(), &[args, &["--as", form]].concat()));
        let json: serde_json::Value = serde_json::from_str(&form("json")).unwrap();
        let rows = json[list].as_array().unwrap();
        let wanted: Vec<&str> = wanted.split_whitespace().collect();
        assert_eq!(rows[0].as_object().unwrap().keys().collect::<Vec<_>>(), wanted);
        let csv = form("csv");
        let mut reader = csv::Reader::from_reader(csv.as_bytes());
        assert_eq!(reader.headers().unwrap().iter().collect::<Vec<_>>(), wanted);
        for (row, record) in rows.iter().zip(reader.records()) {
            for (key, cell) in wanted.iter().zip(record.unwrap().iter()) {
                match &row[key] {
                    serde_json::Value::Number(number) => assert_eq!(cell.parse::<f64>().ok(), number.as_f64(), "{key}"),
                    serde_json::Value::String(text) => assert_eq!(cell, text),
                    serde_json::Value::Null => assert_eq!(cell, ""),
                    _ => {}
                }
            }
        }
    }
    let json: serde_json::Value =
        serde_json::from_str(&text(&run(folder.path(), &["check", "--demo", "--as", "json"]))).unwrap();
    let keys = |value: &serde_json::Value| value.as_object().unwrap().keys().cloned().collect::<Vec<_>>().join(" ");
    let findings = json["findings"].as_array().unwrap();
    assert_eq!(
        keys(&findings[0]),
        "finding severity message notes path start end mark key clause fixes"
    );
    let fix = &findings
        .iter()
        .find(|finding| finding["fixes"] != serde_json::json!([]))
        .unwrap()["fixes"][0];
    assert_eq!(
        (keys(fix), keys(&fix["edits"][0])),
        ("title safe edits".into(), "path start end text".into())
    );
    assert_eq!(keys(&json["counts"]), "error warning information hint");
    let errors = findings.iter().filter(|finding| finding["severity"] == "error").count();
    assert_eq!(json["counts"]["error"], errors);
}

#[test]
fn results_go_where_they_are_told() {
    let folder = tempfile::tempdir().unwrap();
    let printed = run(folder.path(), &["schedule", "--demo", "--as", "csv"]);
    let written = run(folder.path(), &["schedule", "--demo", "--as", "csv", "--out", "s.csv"]);
    assert!(written.stdout.is_empty() && written.status.success());
    assert_eq!(fs::read(folder.path().join("s.csv")).unwrap(), printed.stdout);
    let colored = |args: &[&str]| text(&run(folder.path(), args)).contains('\u{1b}');
    assert!(colored(&["check", "--demo", "--color", "always"]));
    assert!(!colored(&["check", "--demo"]), "a pipe is no terminal");
}

#[test]
fn sections_are_found_however_they_are_written() {
    for name in [
        "HEB240",
        "he 240 b",
        "w14 x 90",
        "305x305x97 UC",
        "CHS 168.3x10",
        "L 100x100x10",
    ] {
        let output = run(Path::new("."), &["sections", name, "--as", "json"]);
        let json: serde_json::Value = serde_json::from_slice(&output.stdout).unwrap();
        assert_eq!(json["sections"].as_array().unwrap().len(), 1, "{name}");
    }
    assert_eq!(run(Path::new("."), &["sections", "IPE 301"]).status.code(), Some(2));
}

#[test]
fn why_explains_and_misspellings_are_met() {
    let output = run(Path::new("."), &["why", "too-slender-to-protect"]);
    assert!(text(&output).contains("No assessed thickness"));
    let wrong = run(Path::new("."), &["why", "too-slendr-to-protect"]);
    assert_eq!(wrong.status.code(), Some(2));
    assert!(String::from_utf8_lossy(&wrong.stderr).contains("perhaps `too-slender-to-protect`"));
    let all = text(&run(Path::new("."), &["why"]));
    for declaration in scorchline::findings::registry::REGISTRY {
        let line = all
            .lines()
            .find(|line| line.split(' ').next() == Some(declaration.name))
            .unwrap();
        assert!(line.contains(declaration.severity.word()) && line.ends_with(declaration.summary));
        let one = text(&run(Path::new("."), &["why", declaration.name]));
        assert!(one.contains(declaration.clause) && one.contains("Before:") && one.contains("After:"));
    }
    assert_eq!(run(Path::new("."), &["check", "no/such/folder"]).status.code(), Some(2));
}

/// What the README shows is what comes out.
#[test]
fn the_readme_shows_what_is_answered() {
    let readme = include_str!("../../README.md");
    let file = readme.split("```yaml\n").nth(1).unwrap().split("```").next().unwrap();
    let shown = readme
        .split("three hints:\n\n```\n")
        .nth(1)
        .unwrap()
        .split("```")
        .next()
        .unwrap();
    let folder = tempfile::tempdir().unwrap();
    for (name, library) in scorchline::scenario::FILES
        .iter()
        .filter(|(name, _)| name.contains("protection"))
    {
        fs::write(folder.path().join(name), library).unwrap();
    }
    fs::write(folder.path().join("first.steelwork.yaml"), file).unwrap();
    let answer = text(&run(folder.path(), &["check", "--on", "2026-06-01"]));
    assert!(
        answer.starts_with(shown) && answer.contains("1 error, 3 hints"),
        "{answer}"
    );
}
