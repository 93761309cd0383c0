//! What an editor offers at a cursor, and what it writes.

use scorchline::editor::actions::{Action, ActionKind, actions};
use scorchline::findings::registry::{EXAMPLE_LIBRARY, REGISTRY, example_files};
use scorchline::text::Span;

use crate::fixture::{Fixture, several};

const FRAME: &str = "steelwork: 1
basis: { default critical temperature: 500 }
libraries: [demo.protection.yaml]
defaults: { role: beam, steel: S355, period: 60, critical temperature: 550 }
groups:
  floors: { section: IPE 300, protection: grey board }
  sprayed: { protection: { product: white spray, primer: \"red, thin\", applied: site } }
members:
";

/// The members in the frame, the cursor at `|`.
fn at(members: &str) -> Fixture {
    with(FRAME, members)
}

fn with(frame: &str, members: &str) -> Fixture {
    several(&[
        ("frame.steelwork.yaml", &format!("{frame}{members}")),
        ("demo.protection.yaml", EXAMPLE_LIBRARY),
    ])
}

fn offered(fixture: &Fixture) -> Vec<Action> {
    let cursor = Span {
        start: fixture.offset,
        end: fixture.offset,
    };
    actions(&fixture.view(), &fixture.checked.findings, cursor)
}

fn titles(fixture: &Fixture) -> Vec<String> {
    offered(fixture).into_iter().map(|action| action.title).collect()
}

/// The head file after the action whose title begins so.
fn after(fixture: &Fixture, title: &str) -> String {
    let offered = offered(fixture);
    let Some(action) = offered.iter().find(|action| action.title.starts_with(title)) else {
        panic!("`{title}` is not among {:#?}", titles(fixture));
    };
    fixture.edited(&action.edits).remove(0).1
}

/// The members after the action.
fn done(members: &str, title: &str) -> String {
    let fixture = at(members);
    let text = after(&fixture, title);
    let crlf = with(&FRAME.replace('\n', "\r\n"), &members.replace('\n', "\r\n"));
    assert_eq!(
        after(&crlf, title),
        text.replace('\n', "\r\n"),
        "in lines that end with CR LF"
    );
    text.strip_prefix(FRAME)
        .expect("nothing changes outside the members")
        .to_owned()
}

fn findings(text: &str) -> Vec<String> {
    let fixture = several(&[
        ("frame.steelwork.yaml", text),
        ("demo.protection.yaml", EXAMPLE_LIBRARY),
    ]);
    let findings = fixture.checked.findings.iter();
    findings
        .map(|finding| format!("{}: {}", finding.name(), finding.message))
        .collect()
}

#[test]
fn the_fixes_of_findings_come_first_and_name_what_they_answer() {
    let fixture = at("  - { mark: B1, secton|: IPE 300 }\n");
    let offered = offered(&fixture);
    assert_eq!(offered[0].title, "write `section`");
    assert_eq!(offered[0].kind, ActionKind::QuickFix);
    assert!(offered[0].preferred, "the meaning is certain");
    assert_eq!(fixture.checked.findings[offered[0].answers[0]].name(), "unknown-key");
    let fixture = at("  - { mark: B1, section: IPE |80, period: 120, protection: white spray }\n");
    let swap = &super::actions::offered(&fixture)[0];
    assert!(swap.title.starts_with("swap to IPE "), "{}", swap.title);
    assert!(!swap.preferred, "another section is a decision");
    let elsewhere = at("  - { mark: B1, section: IPE 80, period: 120, protection: white spray, note: h|ere }\n");
    assert!(!titles(&elsewhere).iter().any(|title| title.starts_with("swap")));
}

#[test]
fn a_range_reaches_all_that_it_touches() {
    let fixture = at("  - { mark: B1, secton: IPE 300, lenth: 4 }\n");
    let text = fixture.view().text();
    let from = u32::try_from(text.find("secton").unwrap()).unwrap();
    let to = u32::try_from(text.find("lenth").unwrap()).unwrap();
    let range = Span { start: from, end: to };
    let told: Vec<String> = actions(&fixture.view(), &fixture.checked.findings, range)
        .into_iter()
        .map(|action| action.title)
        .collect();
    assert!(
        told.contains(&"write `section`".to_owned()) && told.contains(&"write `length`".to_owned()),
        "{told:?}"
    );
}

#[test]
fn missing_keys_are_written_without_values() {
    let bare = "steelwork: 1\nmembers:\n";
    let fixture = with(bare, "  - { mark: B|1, section: IPE 300 }\n");
    let text = after(&fixture, "fill in the missing keys `role`, `steel`, `period`");
    assert_eq!(
        text,
        format!("{bare}  - {{ mark: B1, role: , steel: , period: , section: IPE 300 }}\n")
    );
    assert!(
        !findings(&text).iter().any(|told| told.starts_with("unreadable-yaml")),
        "{:#?}",
        findings(&text)
    );
    let fixture = with(bare, "  - mark: B|1   # first\n    section: IPE 300\n");
    let text = after(&fixture, "fill in the missing keys");
    assert_eq!(
        text,
        format!("{bare}  - mark: B1   # first\n    role:\n    steel:\n    period:\n    section: IPE 300\n")
    );

    let loaded = "steelwork: 1\ndefaults: { role: column, steel: S355, period: 60 }\nmembers:\n";
    let fixture = with(
        loaded,
        "  - { mark: C1, section: HE 200 B, loading: { axi|al: 300 kN } }\n",
    );
    assert_eq!(
        after(&fixture, "fill in the missing key `buckling length`"),
        format!("{loaded}  - {{ mark: C1, section: HE 200 B, loading: {{ axial: 300 kN, buckling length: }} }}\n")
    );
    let fixture = with(
        loaded,
        "  - mark: C1\n    section: HE 200 B\n    loading:\n      axi|al: 300 kN   # in fire",
    );
    assert_eq!(
        after(&fixture, "fill in the missing key `buckling length`"),
        format!(
            "{loaded}  - mark: C1\n    section: HE 200 B\n    loading:\n      axial: 300 kN   # in fire\n      buckling length:"
        )
    );
}

#[test]
fn a_mark_and_the_version_of_the_file_come_first() {
    assert_eq!(
        done("  - { sec|tion: IPE 300 }\n", "fill in the missing key `mark`"),
        "  - { mark: , section: IPE 300 }\n"
    );
    assert_eq!(
        done(
            "  - sec|tion: IPE 300\n    length: 4\n",
            "fill in the missing key `mark`"
        ),
        "  - mark:\n    section: IPE 300\n    length: 4\n"
    );
    let fixture = with("|members:\n", "  - mark: B1\n");
    assert_eq!(
        after(&fixture, "fill in the missing key `steelwork`"),
        "steelwork: 1\nmembers:\n  - mark: B1\n"
    );
}

#[test]
fn a_departure_is_recorded_in_the_style_of_its_member() {
    let error = "{ from: bare-steel-fails, because: \"\", by: \"\", until: }";
    assert_eq!(
        done(
            "  - { mark: |B1, section: IPE 300 }\n",
            "record a departure from bare-steel-fails"
        ),
        format!("  - {{ mark: B1, section: IPE 300, departures: [{error}] }}\n")
    );
    assert_eq!(
        done(
            "  - mark: |B1\n    section: IPE 300   # as found\n\n  - mark: B2\n",
            "record a departure from bare"
        ),
        format!("  - mark: B1\n    section: IPE 300   # as found\n    departures:\n      - {error}\n\n  - mark: B2\n")
    );
    // A warning needs a reason only.
    assert_eq!(
        done(
            "  - mark: B1\n    section: IPE 300\n    protection: { product: grey board, form: pro|file }\n    departures:\n      - { from: thin-steel, because: as built }",
            "record a departure from profile-board"
        ),
        "  - mark: B1\n    section: IPE 300\n    protection: { product: grey board, form: profile }\n    departures:\n      - { from: thin-steel, because: as built }\n      - { from: profile-board, because: \"\" }"
    );
    assert_eq!(
        done(
            "  - { mark: |B1, section: IPE 300, departures: [{ from: thin-steel, because: as built }] }\n",
            "record a departure from bare-steel-fails"
        ),
        format!(
            "  - {{ mark: B1, section: IPE 300, departures: [{{ from: thin-steel, because: as built }}, {error}] }}\n"
        )
    );
    let literal = "  - mark: |B1\n    section: IPE 300\n    note: >\n      as built,\n      says the owner\n";
    assert_eq!(
        done(literal, "record a departure from bare-steel-fails"),
        format!("{}    departures:\n      - {error}\n", literal.replace('|', ""))
    );
}

#[test]
fn a_departure_left_without_its_reason_holds_nothing() {
    for member in [
        "  - { mark: |B1, section: IPE 300 }\n",
        "  - { mark: B1, section: IPE 300, protection: { product: grey board, form: pro|file } }\n",
    ] {
        let fixture = at(member);
        let text = after(&fixture, "record a departure");
        let told = findings(&text);
        assert!(
            told.iter().any(|told| told.starts_with("departure-without-reason")),
            "{told:#?}"
        );
        let departed = text.split("from: ").nth(1).unwrap().split(',').next().unwrap();
        assert!(
            told.iter().any(|told| told.starts_with(departed)),
            "{departed} is not in {told:#?}"
        );
    }
}

#[test]
fn what_a_departure_lacks_is_written_into_it() {
    let members = "  - { mark: B1, section: IPE 300, departures: [{ from: bare-|steel-fails, by: checker }] }\n";
    assert_eq!(
        done(members, "fill in the missing keys `because`, `until`"),
        "  - { mark: B1, section: IPE 300, departures: [{ from: bare-steel-fails, by: checker, because: \"\", until: }] }\n"
    );
}

#[test]
fn no_departure_is_offered_from_slips_or_twice() {
    let none = |members: &str| {
        let told = titles(&at(members));
        assert!(!told.iter().any(|title| title.starts_with("record")), "{told:?}");
    };
    none("  - { mark: B1, secton|: IPE 300, period: { none: yes, because: outside } }\n");
    none("  - { mark: |B1, section: IPE 300, departures: [{ from: bare-steel-fails, because: no }] }\n");
    // What stands there by an alias has no text of its own.
    none(
        "  - { mark: B1, section: IPE 300, departures: &d [] }\n  - { mark: |B2, section: IPE 300, departures: *d }\n",
    );
}

#[test]
fn the_stock_thickness_that_the_verdict_rests_on_can_be_stated() {
    let title = "state the next stock thickness, 20 mm";
    assert_eq!(
        done("  - { mark: B1, section: IPE |300, protection: grey board }\n", title),
        "  - { mark: B1, section: IPE 300, protection: { product: grey board, thickness: 20 } }\n"
    );
    assert_eq!(
        done(
            "  - mark: |B1\n    section: IPE 300\n    protection:\n      product: grey board   # grey\n      form: box\n",
            title
        ),
        "  - mark: B1\n    section: IPE 300\n    protection:\n      product: grey board   # grey\n      form: box\n      thickness: 20\n"
    );
    assert_eq!(
        done("  - mark: |B1\n    group: floors\n", title),
        "  - mark: B1\n    protection: { product: grey board, thickness: 20 }\n    group: floors\n"
    );
    let stated = at("  - { mark: |B1, section: IPE 300, protection: { product: grey board, thickness: 20 } }\n");
    assert!(titles(&stated).is_empty(), "{:?}", titles(&stated));
    let alias = at(
        "  - { mark: B1, section: IPE 300, protection: &p grey board }\n  - { mark: |B2, section: IPE 300, protection: *p }\n",
    );
    assert!(titles(&alias).is_empty(), "{:?}", titles(&alias));
}

#[test]
fn a_film_is_stated_in_micrometres() {
    let text = done(
        "  - { mark: |B1, section: IPE 300, protection: red film }\n",
        "state the next stock film",
    );
    assert!(text.contains("protection: { product: red film, dft: "), "{text}");
    let told = findings(&format!("{FRAME}{text}"));
    assert!(
        !told.iter().any(|told| told.contains("thin") || told.contains("thick")),
        "{told:#?}"
    );
}

#[test]
fn box_form_is_offered_where_the_product_then_holds_the_member() {
    // IPE 300 all round: 216 1/m along its profile and 167 1/m boxed in.
    let slender =
        "  - { mark: B1, section: IPE 100, period: 90, protection: { product: white |spray, thickness: 45 } }\n";
    let told = titles(&at(slender));
    assert!(
        told.iter().any(|title| title.starts_with("move to box form")),
        "{told:?}"
    );
    let text = done(slender, "move to box form");
    assert!(
        text.contains("protection: { product: white spray, thickness: 45, form: box }"),
        "{text}"
    );
    let told = findings(&format!("{FRAME}{text}"));
    assert!(!told.iter().any(|told| told.starts_with("too-slender")), "{told:#?}");
    // Inherited with all that its group says.
    let text = done(
        "  - { mark: |B1, group: sprayed, section: IPE 100, period: 90 }\n",
        "move to box form",
    );
    assert!(
        text.contains("protection: { product: white spray, form: box, primer: 'red, thin', applied: site }"),
        "{text}"
    );
    let holds = titles(&at(
        "  - { mark: |B1, section: IPE 300, protection: { product: white spray, thickness: 30 } }\n",
    ));
    assert!(!holds.iter().any(|title| title.starts_with("move")), "{holds:?}");
    let nothing = titles(&at(
        "  - { mark: |B1, section: IPE 80, period: 180, protection: white spray }\n",
    ));
    assert!(!nothing.iter().any(|title| title.starts_with("move")), "{nothing:?}");
}

#[test]
fn whatever_is_offered_leaves_the_file_readable() {
    let mut made = 0;
    for declaration in REGISTRY {
        for crlf in [false, true] {
            let files = example_files(declaration.before);
            let files: Vec<(String, String)> = files
                .into_iter()
                .map(|(name, text)| (name, if crlf { text.replace('\n', "\r\n") } else { text }))
                .collect();
            let named: Vec<(&str, &str)> = files
                .iter()
                .map(|(name, text)| (name.as_str(), text.as_str()))
                .collect();
            let mut fixture = several(&named);
            let unreadable = |fixture: &Fixture| {
                let findings = fixture.checked.findings.iter();
                findings.filter(|finding| finding.name() == "unreadable-yaml").count()
            };
            for file in 0..fixture.checked.design.files.len() {
                fixture.file = file;
                let whole = Span::new(0, fixture.view().text().len());
                for action in actions(&fixture.view(), &fixture.checked.findings, whole) {
                    let after = fixture.edited(&action.edits);
                    let after: Vec<(&str, &str)> = named
                        .iter()
                        .map(|(name, text)| {
                            let new = after.iter().find(|(other, _)| other == name);
                            (*name, new.map_or(*text, |(_, text)| text.as_str()))
                        })
                        .collect();
                    let after = several(&after);
                    assert!(
                        unreadable(&after) <= unreadable(&fixture),
                        "{}: {action:?}",
                        declaration.name
                    );
                    made += 1;
                }
            }
        }
    }
    assert!(made > 100, "only {made} were made");
}
