//! Which files are checked, and what they are to each other.

use std::fs;

use crate::support::{HEAD, run, text};

#[test]
fn the_starter_project_is_the_scenario() {
    let folder = tempfile::tempdir().unwrap();
    assert_eq!(run(folder.path(), &["begin", "frame"]).status.code(), Some(0));
    assert_eq!(
        run(folder.path(), &["begin", "frame"]).status.code(),
        Some(2),
        "nothing is overwritten"
    );
    let output = run(folder.path(), &["schedule", "frame", "--as", "json"]);
    let schedule: serde_json::Value = serde_json::from_slice(&output.stdout).unwrap();
    let members = schedule["members"].as_array().unwrap();
    assert!(members.len() >= 40);
    let beam = members.iter().find(|row| row["mark"] == "B1").unwrap();
    // IPE 360 boxed on three sides: (2 h + b)/A with h 360, b 170 and A 7273 mm² (EN 10365, from memory): 122.4 1/m.
    assert!((beam["section_factor_per_m"].as_f64().unwrap() - 122.4).abs() < 0.2);
    assert_eq!(beam["verdict"], "fails");
    assert!(beam["shadow_factor"].is_null(), "protected steel has no shadow factor");
}

#[test]
fn folders_are_searched_but_not_what_programs_made() {
    let folder = tempfile::tempdir().unwrap();
    for name in [
        "a.steelwork.yml",
        "deep/b.STEELWORK.yaml",
        ".git/c.steelwork.yaml",
        "target/d.steelwork.yaml",
        "e.yaml",
    ] {
        let path = folder.path().join(name);
        fs::create_dir_all(path.parent().unwrap()).unwrap();
        fs::write(path, "steelwork: 1\nno such key: 1\n").unwrap();
    }
    let paths = |args: &[&str]| -> Vec<String> {
        let output = run(folder.path(), args);
        let json: serde_json::Value = serde_json::from_slice(&output.stdout).unwrap();
        let findings = json["findings"].as_array().unwrap();
        findings
            .iter()
            .map(|finding| finding["path"].as_str().unwrap().to_owned())
            .collect()
    };
    assert_eq!(
        paths(&["check", "--as", "json"]),
        ["a.steelwork.yml", "deep/b.STEELWORK.yaml"]
    );
    // Paths are shown as they were written, and a file is taken by whatever name.
    assert_eq!(
        paths(&["check", "./deep", "e.yaml", "--as", "json"]),
        ["./deep/b.STEELWORK.yaml", "e.yaml"]
    );
    let absolute = folder.path().join("e.yaml");
    assert_eq!(
        paths(&["check", absolute.to_str().unwrap(), "--as", "json"]),
        [absolute.to_str().unwrap()]
    );
}

#[test]
fn a_part_is_checked_with_its_head() {
    let folder = tempfile::tempdir().unwrap();
    assert_eq!(run(folder.path(), &["begin", "."]).status.code(), Some(0));
    let whole = run(folder.path(), &["check", "--as", "json"]);
    let part = run(folder.path(), &["check", "roof.steelwork.yaml", "--as", "json"]);
    assert_eq!(text(&whole), text(&part));
}

#[test]
fn files_that_take_each_other_are_checked_still() {
    let folder = tempfile::tempdir().unwrap();
    for (name, other) in [("a", "b"), ("b", "a")] {
        let text = format!(
            "{HEAD}  - {{ mark: {name}, sectoin: IPE 300 }}\nparts: [{other}.steelwork.yaml]\npart of: {other}.steelwork.yaml\n"
        );
        fs::write(folder.path().join(format!("{name}.steelwork.yaml")), text).unwrap();
    }
    let output = run(folder.path(), &["check", "--as", "json"]);
    assert_eq!(output.status.code(), Some(1));
    let json: serde_json::Value = serde_json::from_slice(&output.stdout).unwrap();
    for path in ["a.steelwork.yaml", "b.steelwork.yaml"] {
        let found = |finding: &serde_json::Value| finding["path"] == path && finding["finding"] == "unknown-key";
        assert!(json["findings"].as_array().unwrap().iter().any(found), "{json}");
    }
}
