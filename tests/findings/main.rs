//! Every finding's example through the one sequence: the text before has the finding, the text after has not.

mod every_verdict;
mod limits;
mod supports;

use std::path::{Path, PathBuf};
use std::sync::Arc;

use scorchline::analysis::files::{Files, PathTrouble, ReadTrouble};
use scorchline::analysis::memo::Memo;
use scorchline::check::{Checked, run};
use scorchline::findings::registry::{REGISTRY, example_files};

/// Files held in memory, all in one folder.
struct Held(Vec<(String, String)>);

impl Files for Held {
    fn follow(&self, _: &Path, relative: &str) -> Result<PathBuf, PathTrouble> {
        if relative.starts_with("..") {
            return Err(PathTrouble::Outside("by `..`"));
        }
        let found = self.0.iter().any(|(name, _)| name == relative);
        found.then(|| PathBuf::from(relative)).ok_or(PathTrouble::Missing)
    }

    fn read(&self, path: &Path) -> Result<Arc<str>, ReadTrouble> {
        let found = self.0.iter().find(|(name, _)| Path::new(name) == path);
        found
            .map(|(_, text)| Arc::from(text.as_str()))
            .ok_or_else(|| ReadTrouble::System("there is no such file".to_owned()))
    }
}

fn check(example: &str) -> Checked {
    let files = Held(example_files(example));
    let on = "2026-06-01".parse().unwrap();
    let (mut checked, troubles) = run(&files, &[PathBuf::from("frame.steelwork.yaml")], on, &Memo::default());
    assert!(troubles.is_empty(), "{troubles:?}");
    assert_eq!(checked.len(), 1);
    checked.remove(0)
}

fn names(checked: &Checked) -> Vec<&'static str> {
    checked.findings.iter().map(|finding| finding.name()).collect()
}

fn messages(checked: &Checked) -> Vec<String> {
    checked
        .findings
        .iter()
        .map(|finding| format!("{}: {}", finding.name(), finding.message))
        .collect()
}

#[test]
fn examples_have_their_finding_before_and_not_after() {
    let mut wrong = Vec::new();
    for declaration in REGISTRY {
        let before = check(declaration.before);
        if !names(&before).contains(&declaration.name) {
            wrong.push(format!(
                "{} is not found before: {:#?}",
                declaration.name,
                messages(&before)
            ));
        }
        let after = check(declaration.after);
        if names(&after).contains(&declaration.name) {
            wrong.push(format!("{} is found after: {:#?}", declaration.name, messages(&after)));
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}

/// A design with the edits of a fix made in its head file.
fn mended(checked: &Checked, fix: &scorchline::findings::finding::Fix) -> Vec<(String, String)> {
    let mut files: Vec<(String, String)> = checked
        .design
        .files
        .iter()
        .map(|file| (file.path.to_str().unwrap().to_owned(), file.text.to_string()))
        .collect();
    for edit in fix.edits.iter().rev() {
        let path = edit.place.path.to_str().unwrap();
        let (_, text) = files.iter_mut().find(|(name, _)| name == path).unwrap();
        text.replace_range(edit.place.span.start as usize..edit.place.span.end as usize, &edit.text);
    }
    files
}

fn check_files(files: Vec<(String, String)>) -> Checked {
    let on = "2026-06-01".parse().unwrap();
    run(
        &Held(files),
        &[PathBuf::from("frame.steelwork.yaml")],
        on,
        &Memo::default(),
    )
    .0
    .remove(0)
}

#[test]
fn what_is_said_of_fixes_is_so() {
    let mut wrong = Vec::new();
    for declaration in REGISTRY {
        let before = check(declaration.before);
        let found = before
            .findings
            .iter()
            .find(|finding| finding.name() == declaration.name)
            .unwrap();
        let offers = !declaration.fix.starts_with("None");
        if offers == found.fixes.is_empty() {
            wrong.push(format!("{}: {:?}", declaration.name, found.fixes));
        }
        let Some(fix) = found.fixes.first() else { continue };
        let count = |checked: &Checked| {
            names(checked)
                .into_iter()
                .filter(|name| *name == declaration.name)
                .count()
        };
        let after = check_files(mended(&before, fix));
        if count(&after) >= count(&before) || names(&after).contains(&"unreadable-yaml") {
            wrong.push(format!(
                "{} is not answered by `{}`: {:#?}",
                declaration.name,
                fix.title,
                messages(&after)
            ));
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}

fn one<'a>(checked: &'a Checked, name: &str) -> &'a scorchline::findings::finding::Finding {
    checked
        .findings
        .iter()
        .find(|finding| finding.name() == name)
        .unwrap_or_else(|| panic!("{name} is not among {:#?}", messages(checked)))
}

#[test]
fn the_headline_carries_its_numbers_and_what_would_do() {
    let checked =
        check("- { mark: RP3, section: IPE 80, critical temperature: 550, period: 120, protection: white spray }");
    let finding = one(&checked, "too-slender-to-protect");
    for part in [
        "RP3",
        "120 min",
        "IPE 80",
        "1/m (V/A 2.3 mm)",
        "`white spray` holds at most",
        "550 °C",
        "The nearest",
    ] {
        assert!(finding.message.contains(part), "{part}: {}", finding.message);
    }
    let fix = &finding.fixes[0];
    assert!(!fix.safe);
    let heavier = check_files(mended(&checked, fix));
    assert!(
        !names(&heavier).contains(&"too-slender-to-protect"),
        "{:#?}",
        messages(&heavier)
    );
}

#[test]
fn an_inherited_value_is_met_at_the_member_and_pointed_at() {
    let text = "steelwork: 1
libraries: [demo.protection.yaml]
defaults: { role: beam, steel: S355, period: 240 }
groups:
  floors: { protection: grey board, critical temperature: 550 }
members:
  - { mark: B1, group: floors, section: IPE 300 }";
    let checked = check(text);
    let finding = one(&checked, "outside-assessed-range");
    let file = &checked.design.files[0].text;
    assert_eq!(finding.place.span.slice(file), "B1");
    assert!(finding.fixes.is_empty());
    let note = &finding.notes[0];
    assert!(
        note.text.contains("the group `floors` gives B1 its `protection`"),
        "{}",
        note.text
    );
    assert_eq!(note.place.as_ref().unwrap().span.slice(file), "grey board");
}

#[test]
fn a_thickness_needed_is_shown_rounded_up() {
    let member = |thickness: &str| {
        check(&format!(
            "- {{ mark: B1, section: IPE 200, critical temperature: 500, period: 90, protection: {{ product: grey board, thickness: {thickness} }} }}"
        ))
    };
    let thin = member("15");
    let message = &one(&thin, "protection-too-thin").message;
    let needed = message.split("it needs ").nth(1).unwrap().split(';').next().unwrap();
    let enough = member(needed);
    assert!(
        !names(&enough).contains(&"protection-too-thin"),
        "{:#?}",
        messages(&enough)
    );
}

#[test]
fn a_support_that_is_not_verified_is_no_proof() {
    let checked = check(
        "- { mark: B1, section: IPE 300, critical temperature: 550, protection: grey board, supported by: [C1] }
- { mark: C1, role: column, section: HE 200 B }",
    );
    let finding = one(&checked, "support-rating-lower");
    assert_eq!(finding.severity, scorchline::findings::finding::Severity::Warning);
    assert!(
        finding.message.contains("C1, which supports it, is not verified"),
        "{}",
        finding.message
    );
}

#[test]
fn a_circle_is_reported_once_with_its_members() {
    let checked = check(
        "- { mark: B1, section: IPE 300, supported by: [B2] }
- { mark: B2, section: IPE 300, supported by: [B3] }
- { mark: B3, section: IPE 300, supported by: [B1, B2] }
- { mark: B4, section: IPE 300, supported by: [B1, B4] }",
    );
    let circles: Vec<String> = messages(&checked)
        .into_iter()
        .filter(|message| message.starts_with("support-cycle"))
        .collect();
    assert_eq!(
        circles,
        [
            "support-cycle: B1, B2 and B3 support each other in a circle, which B1 closes",
            "support-cycle: B2 and B3 support each other in a circle, which B2 closes",
            "support-cycle: B4 is said to support itself",
        ]
    );
}

#[test]
fn a_stated_temperature_that_the_loading_contradicts_proves_nothing() {
    use scorchline::analysis::outcome::Verdict;
    let member = |stated: u32| {
        check(&format!(
            "- {{ mark: B1, section: HE 300 B, critical temperature: {stated}, loading: {{ utilisation: 0.6 }}, protection: grey board }}"
        ))
    };
    let high = member(650);
    assert!(names(&high).contains(&"critical-temperature-too-high"));
    assert_eq!(high.outcomes[0].verdict, Verdict::NotVerified);
    let low = member(500);
    assert!(!names(&low).contains(&"critical-temperature-too-high"));
    assert_eq!(low.outcomes[0].verdict, Verdict::Passes);
    let cold = check(
        "- { mark: B1, section: HE 300 B, critical temperature: 500, loading: { utilisation: 1.2 }, protection: grey board }",
    );
    assert!(names(&cold).contains(&"ambient-check-fails"));
    assert_eq!(cold.outcomes[0].verdict, Verdict::Fails);
}

#[test]
fn messages_show_the_units_asked_for() {
    let text = "steelwork: 1
basis: { units: imperial }
libraries: [demo.protection.yaml]
defaults: { role: beam, steel: S355, period: 60, critical temperature: 1000 °F }
members:
  - { mark: B1, section: IPE 300 }
  - { mark: B2, section: IPE 300, critical temperature: 550 °F, protection: grey board }
  - { mark: B3, section: IPE 300, period: 10, surface: { galvanised: { to: EN ISO 1461, category: A } } }
  - { mark: B4, section: HE 300 B, critical temperature: 1200 °F, loading: { utilisation: 0.6 }, protection: grey board }";
    let checked = check(text);
    let message = &one(&checked, "bare-steel-fails").message;
    assert!(message.contains("1000 °F") && message.contains(" in)"), "{message}");
    let message = &one(&checked, "outside-assessed-range").message;
    assert!(message.contains("is 550 °F; assessed is 662 °F to"), "{message}");
    let message = &one(&checked, "galvanised-benefit-claimed").message;
    assert!(message.contains("932 °F"), "{message}");
    // (4.22) gives 554.28 °C, by hand: 1029.7 °F.
    let high = one(&checked, "critical-temperature-too-high");
    assert_eq!(high.fixes[0].title, "state 1029 °F, which the loading gives");
    let mended = check_files(mended(&checked, &high.fixes[0]));
    assert!(!names(&mended).contains(&"critical-temperature-too-high"));
    for finding in &checked.findings {
        let message = &finding.message;
        assert!(!message.contains("°C") && !message.contains(" mm"), "{message}");
    }
}

const GROUPED: &str = "steelwork: 1
libraries: [demo.protection.yaml]
defaults: { role: beam, steel: S355, period: 90, critical temperature: 500 }
groups:
  floors: { section: IPE 200, protection: { product: grey board, thickness: 15 } }
members:
";

/// The text of the head file after the first fix of a finding.
fn fixed(member: &str, name: &str) -> String {
    let checked = check(&format!("{GROUPED}{member}"));
    let fix = one(&checked, name)
        .fixes
        .first()
        .unwrap_or_else(|| panic!("no fix of {name}"))
        .clone();
    let files = mended(&checked, &fix);
    let after = check_files(files.clone());
    assert!(!names(&after).contains(&name), "{:#?}", messages(&after));
    assert!(!names(&after).contains(&"unreadable-yaml"));
    files[0].1[GROUPED.len()..].to_owned()
}

#[test]
fn an_inherited_value_is_overridden_in_the_member_in_its_own_style() {
    let name = "protection-too-thin";
    assert_eq!(
        fixed("  - { mark: B1, group: floors }\n", name),
        "  - { mark: B1, protection: { product: grey board, thickness: [20, 15] }, group: floors }\n"
    );
    assert_eq!(
        fixed("  - mark: B1   # first\n    group: floors\n", name),
        "  - mark: B1   # first\n    protection: { product: grey board, thickness: [20, 15] }\n    group: floors\n"
    );
    assert_eq!(
        fixed("  - group: floors\n    mark: B1", name),
        "  - group: floors\n    mark: B1\n    protection: { product: grey board, thickness: [20, 15] }\n"
    );
}

#[test]
fn nothing_is_offered_through_an_alias() {
    let text = "steelwork: 1
libraries: [demo.protection.yaml]
defaults: { role: beam, steel: S355, period: 90, critical temperature: 500 }
members:
  - { mark: B1, section: &s IPE 200, protection: &p { product: grey board, thickness: 15 } }
  - { mark: B2, section: *s, protection: *p }";
    let checked = check(text);
    let thin: Vec<_> = checked
        .findings
        .iter()
        .filter(|finding| finding.name() == "protection-too-thin")
        .collect();
    assert_eq!(thin.len(), 2, "{:#?}", messages(&checked));
    assert!(!thin[0].fixes.is_empty());
    assert!(thin[1].fixes.is_empty(), "{:?}", thin[1].fixes);
}

#[test]
fn a_departure_lapses_when_its_figures_worsen_or_vanish() {
    let member = |needs: &str, period: u32| {
        check(&format!(
            "- {{ mark: B1, section: IPE 200, critical temperature: 500, period: {period}, protection: {{ product: grey board, thickness: 15 }}, departures: [ {{ from: protection-too-thin, because: agreed, by: checker, until: 2027-06-30, at: {{ needs: {needs} }} }} ] }}"
        ))
    };
    let agreed = member("33.3 mm", 90);
    assert!(
        agreed
            .agreed
            .iter()
            .any(|finding| finding.name() == "protection-too-thin")
    );
    assert_eq!(
        agreed.outcomes[0].verdict,
        scorchline::analysis::outcome::Verdict::Fails
    );
    let worse = member("30 mm", 90);
    assert!(names(&worse).contains(&"departure-outgrown") && names(&worse).contains(&"protection-too-thin"));
    let message = &one(&worse, "departure-outgrown").message;
    assert!(message.contains("it needed 30 mm, now 33.2 mm"), "{message}");
    let gone = member("33.3 mm", 240);
    assert!(names(&gone).contains(&"departure-outgrown"), "{:#?}", messages(&gone));
}

#[test]
fn protection_is_not_judged_where_no_period_is_wanted() {
    let checked =
        check("- { mark: R1, section: IPE 140, period: { none: yes, because: off the route }, protection: old spray }");
    assert!(
        !names(&checked).contains(&"evidence-expired"),
        "{:#?}",
        messages(&checked)
    );
}

#[test]
fn a_support_verified_in_another_fire_is_no_proof() {
    let with = |fire: &str| {
        check(&format!(
            "- {{ mark: B1, section: IPE 300, critical temperature: 550, protection: grey board, supported by: [C1] }}
- {{ mark: C1, role: column, section: HE 200 B, critical temperature: 1000, protection: none, fire: {fire} }}"
        ))
    };
    let other = with("external");
    let finding = one(&other, "support-rating-lower");
    assert!(
        finding.message.contains("in the fire `external` only"),
        "{}",
        finding.message
    );
    assert_eq!(finding.severity, scorchline::findings::finding::Severity::Warning);
    assert!(!names(&with("standard")).contains(&"support-rating-lower"));
}
