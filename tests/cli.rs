//! The binary from outside: what a user types, and what comes back.

use std::fs;
use std::path::Path;
use std::process::{Command, Output};

fn run(folder: &Path, args: &[&str]) -> Output {
    Command::new(env!("CARGO_BIN_EXE_scorchline"))
        .args(args)
        .current_dir(folder)
        .output()
        .unwrap()
}

fn text(output: &Output) -> String {
    String::from_utf8(output.stdout.clone()).unwrap()
}

/// Checks a file of the given bytes; the exit status and the names of the findings.
fn check(bytes: &[u8]) -> (i32, Vec<String>, serde_json::Value) {
    let folder = tempfile::tempdir().unwrap();
    fs::write(folder.path().join("a.steelwork.yaml"), bytes).unwrap();
    let output = run(folder.path(), &["check", "--as", "json", "--on", "2026-01-01"]);
    assert!(!String::from_utf8_lossy(&output.stderr).contains("panicked"));
    let json: serde_json::Value = serde_json::from_slice(&output.stdout).unwrap_or_default();
    let names = json["findings"].as_array().map_or_else(Vec::new, |findings| {
        findings
            .iter()
            .map(|finding| finding["finding"].as_str().unwrap().to_owned())
            .collect()
    });
    (output.status.code().unwrap(), names, json)
}

fn names(bytes: &[u8]) -> Vec<String> {
    check(bytes).1
}

const HEAD: &str = "steelwork: 1\ndefaults: { steel: S355, period: 30, role: beam }\nmembers:\n";

#[test]
fn the_scenario_fits_a_page_and_shows_every_severity() {
    let output = run(Path::new("."), &["check", "--demo", "--on", "2026-12-01"]);
    assert_eq!(output.status.code(), Some(0));
    let shown = text(&output);
    assert!(shown.lines().count() <= 60, "{}", shown.lines().count());
    for word in [
        "error",
        "warning",
        "information",
        "hint",
        "too-slender-to-protect",
        "Next:",
    ] {
        assert!(shown.contains(word), "{word}");
    }
    let failing = run(Path::new("."), &["check", "--demo", "--fail-on", "error"]);
    assert_eq!(failing.status.code(), Some(1));
}

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
fn hostile_input_is_a_finding() {
    let deep = format!("steelwork: 1\nmembers: {}\n", "[".repeat(100_000));
    let bomb: String = ["steelwork: 1\na: &a [x,x,x,x,x,x,x,x,x]\n".to_owned()]
        .into_iter()
        .chain(
            "abcdefgh"
                .chars()
                .zip("bcdefghi".chars())
                .map(|(from, to)| format!("{to}: &{to} [{}]\n", vec![format!("*{from}"); 9].join(","))),
        )
        .collect();
    let long = format!("{HEAD}  - mark: {}\n", "x".repeat(30_000_000));
    let utf16: Vec<u8> = std::iter::once(0xFEFF_u16)
        .chain(format!("{HEAD}  - {{ mark: B1, sectoin: IPE 300 }}\n").encode_utf16())
        .flat_map(u16::to_le_bytes)
        .collect();
    let cases: [(&[u8], &str); 9] = [
        (b"", "missing-key"),
        (
            b"\xEF\xBB\xBFsteelwork: 1\r\nmembers:\r\n  - mark: B1\r\n    sectoin: IPE 300\r\n",
            "unknown-key",
        ),
        (b"steelwork: 1\nmembers:\n  - mark: B\x001\n", "unreadable-yaml"),
        (deep.as_bytes(), "out-of-bounds"),
        (bomb.as_bytes(), "unknown-key"),
        (long.as_bytes(), "out-of-bounds"),
        (&utf16, "unknown-key"),
        (
            b"steelwork: 1\nmembers:\n  - { mark: B1, length: .nan }\n",
            "out-of-bounds",
        ),
        (
            b"steelwork: 1\nmembers:\n  - { mark: B1, section: { shape: flat, b: -5, t: 1e308 } }\n",
            "out-of-bounds",
        ),
    ];
    for (bytes, wanted) in cases {
        let (code, found, _) = check(bytes);
        assert_eq!(code, 1);
        assert!(found.iter().any(|name| name == wanted), "{wanted}: {found:?}");
    }
    let (code, _, _) = check(b"mark: \xFF\xFE\xFD");
    assert_eq!(code, 2, "bytes that are no text");
}

#[test]
fn paths_stay_in_the_workspace() {
    let names = names(
        b"steelwork: 1\nlibraries: [../x.protection.yaml, /etc/passwd, none.protection.yaml, a.steelwork.yaml]\n",
    );
    let wanted = [
        "library-outside-workspace",
        "library-outside-workspace",
        "unreadable-library",
        "library-cycle",
    ];
    assert_eq!(names, wanted);
}

#[cfg(unix)]
#[test]
fn a_symlink_out_of_the_workspace_is_refused() {
    let outside = tempfile::tempdir().unwrap();
    let folder = tempfile::tempdir().unwrap();
    fs::write(outside.path().join("x.protection.yaml"), "protection: 1\n").unwrap();
    std::os::unix::fs::symlink(
        outside.path().join("x.protection.yaml"),
        folder.path().join("x.protection.yaml"),
    )
    .unwrap();
    fs::write(
        folder.path().join("a.steelwork.yaml"),
        "steelwork: 1\nlibraries: [x.protection.yaml]\n",
    )
    .unwrap();
    let output = run(folder.path(), &["check", "a.steelwork.yaml", "--as", "json"]);
    assert!(text(&output).contains("by a symlink"));
}

#[test]
fn slips_are_shown_at_the_very_characters() {
    let member = "  - { mark: 梁1, section: IPE 300, critical temperature: 550, lenght: 7.5 }\n";
    let (_, found, json) = check(format!("{HEAD}{member}").as_bytes());
    assert!(
        found.contains(&"unknown-key".to_owned()) && found.contains(&"bare-steel-fails".to_owned()),
        "{found:?}"
    );
    let finding = json["findings"]
        .as_array()
        .unwrap()
        .iter()
        .find(|f| f["finding"] == "unknown-key")
        .unwrap();
    let column = member
        .chars()
        .collect::<String>()
        .find("lenght")
        .map(|at| member[..at].chars().count() + 1)
        .unwrap();
    assert_eq!(finding["start"]["line"], 4);
    assert_eq!(finding["start"]["column"], column);
    assert_eq!(finding["fixes"][0]["edits"][0]["text"], "length");
}

#[test]
fn typing_slips_have_their_findings() {
    let cases = [
        ("{ mark: B1, section: IPE 301 }", "unknown-section"),
        ("{ mark: B1, section: SHS 150x150x8 }", "ambiguous-section"),
        ("{ mark: B1, section: IPE 300, length: 20 min }", "wrong-unit"),
        ("{ mark: B1, section: IPE 300, period: R60, length: 7,5 }", "wrong-kind"),
        ("{ mark: B1, section: IPE 300, protection: nothing }", "unknown-product"),
        ("{ mark: B1, section: IPE 300, group: none }", "unknown-group"),
        ("{ mark: B1, section: IPE 300, fire: plant }", "unknown-fire"),
        ("{ mark: B1, section: IPE 300, steel: S999 }", "unknown-steel"),
        ("{ mark: B1, section: IPE 300, supported by: [X9] }", "unknown-mark"),
        ("{ mark: B1, section: IPE 300, supported by: [B1] }", "support-cycle"),
        (
            "{ mark: B1, section: IPE 300 }\n  - { mark: B1, section: IPE 300 }",
            "duplicate-mark",
        ),
        (
            "{ mark: B1, section: IPE 300, role: column }",
            "critical-temperature-unknown",
        ),
        (
            "{ mark: B1, section: IPE 300, loading: { utilisation: 1.2 } }",
            "ambient-check-fails",
        ),
        (
            "{ mark: B1, section: IPE 300, openings: { shape: circular, diameter: 200 } }",
            "not-covered",
        ),
        (
            "{ mark: B1, section: IPE 360, role: column, loading: { utilisation: 0.5 } }",
            "class-4-temperature",
        ),
        (
            "{ mark: B1, section: IPE 300, exposure: three sides, critical temperature: 550 }",
            "shield-not-stated",
        ),
        ("{ mark: B1, section: IPE 300, note: \"open }", "unreadable-yaml"),
    ];
    for (member, wanted) in cases {
        let (_, found, json) = check(format!("{HEAD}  - {member}\n").as_bytes());
        assert!(
            found.iter().any(|name| name == wanted),
            "{member} wants {wanted}: {json}"
        );
    }
}

#[test]
fn a_broken_member_hides_nothing_of_the_others() {
    let text = format!(
        "{HEAD}  - mark: B1\n    section IPE 300\n  - {{ mark: B2, section: IPE 300, critical temperature: 550 }}\n"
    );
    let (_, found, json) = check(text.as_bytes());
    assert!(found.contains(&"unreadable-yaml".to_owned()), "{json}");
    assert!(
        json["findings"]
            .as_array()
            .unwrap()
            .iter()
            .any(|f| f["mark"] == "B2" && f["finding"] == "bare-steel-fails")
    );
}

#[test]
fn a_departure_moves_a_finding_and_changes_no_verdict() {
    let member = |more: &str| {
        format!(
            "{HEAD}  - {{ mark: B1, section: IPE 300, critical temperature: 550, departures: [{{ from: bare-steel-fails{more} }}] }}\n"
        )
    };
    let full = member(", because: sprinklers, by: checker, until: 2027-01-01");
    assert!(!names(full.as_bytes()).contains(&"bare-steel-fails".to_owned()));
    let lacking = names(member(", because: sprinklers").as_bytes());
    assert!(
        lacking.contains(&"bare-steel-fails".to_owned()) && lacking.contains(&"departure-without-reason".to_owned())
    );
    let expired = names(member(", because: x, by: y, until: 2025-01-01").as_bytes());
    assert!(expired.contains(&"departure-expired".to_owned()));
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
    let wrong = run(Path::new("."), &["why", "too-slender"]);
    assert_eq!(wrong.status.code(), Some(2));
    assert_eq!(run(Path::new("."), &["check", "no/such/folder"]).status.code(), Some(2));
}
