//! What a person typing gets told.

use std::fs;
use std::path::Path;

use crate::support::{HEAD, check, names, run, text};

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
    assert!(shown.lines().all(|line| line.chars().count() <= 110), "{shown}");
    let failing = run(Path::new("."), &["check", "--demo", "--fail-on", "error"]);
    assert_eq!(failing.status.code(), Some(1));
    let all = run(Path::new("."), &["check", "--demo", "--all"]);
    assert!(text(&all).lines().count() > 60, "--all shows every finding in full");
}

#[test]
fn fifty_findings_are_shown_unless_all_are_asked_for() {
    let members: String = (0..60)
        .map(|n| format!("  - {{ mark: B{n}, sectoin: IPE 300 }}\n"))
        .collect();
    let folder = tempfile::tempdir().unwrap();
    fs::write(folder.path().join("a.steelwork.yaml"), format!("{HEAD}{members}")).unwrap();
    let shown = |args: &[&str]| text(&run(folder.path(), args)).matches("(error)").count();
    assert_eq!(shown(&["check"]), 50);
    let all = shown(&["check", "--all"]);
    assert!(all >= 120, "{all}");
    let text = text(&run(folder.path(), &["check"]));
    assert!(
        text.contains(&format!("{} more are not shown; --all shows them", all - 50)),
        "{text}"
    );
}

#[test]
fn the_failing_level_can_be_chosen() {
    let folder = tempfile::tempdir().unwrap();
    let member = "{ mark: B1, section: HE 600 B, critical temperature: 600, exposure: three sides, period: 15 }";
    fs::write(folder.path().join("a.steelwork.yaml"), format!("{HEAD}  - {member}\n")).unwrap();
    let code = |level: &[&str]| run(folder.path(), &[&["check"], level].concat()).status.code();
    assert_eq!(code(&[]), Some(0), "{}", text(&run(folder.path(), &["check"])));
    assert_eq!(code(&["--fail-on", "warning"]), Some(1));
    assert_eq!(code(&["--fail-on", "never"]), Some(0));
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
