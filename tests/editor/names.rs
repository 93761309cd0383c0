//! Definition, references and rename of marks, groups, products and fires.

use scorchline::editor::definition::definition;
use scorchline::editor::references::references;
use scorchline::editor::rename::{prepare_rename, rename};

use crate::fixture::{Fixture, several};

const HEAD: &str = "steelwork: 1
libraries: [demo.protection.yaml]
parts: [roof.steelwork.yaml]
fires:
  plant room: { kind: points, points: [[0, 20], [30, 800], [90, 700]] }
defaults: { steel: S355, period: 60, protection: grey board, fire: plant room }
groups:
  floors: { role: beam, fire: plant room, protection: { product: 'grey board', thickness: 20 } }
members:
  - mark: B1
    group: floors
    section: IPE 360
    supported by: [C1, \"C2\"]
  - { mark: C1, role: column, section: HE 240 B, group: \"floors\", fire: standard }
  - { mark: C2, role: column, section: HE 240 B, protection: none }
";
const ROOF: &str = "steelwork: 1
part of: frame.steelwork.yaml
members:
  - { mark: R1, group: floors, section: IPE 200, supported by: C1 }
  - { mark: BR1, role: brace, section: HE 100 B, steadies: [C1, R1], protection: grey board }
";
const LIBRARY: &str = "protection: 1
products:
  grey board:
    kind: board
    method: constant properties
    conductivity: 0.17
    specific heat: 1050
    density: 780
    thicknesses: [15, 20, 25]
    assessed: { section factor: [40, 320], thickness: [15, 60], fires: [standard, plant room] }
";

/// The design with a cursor put before the nth occurrence of a text in the head (0), the roof (1) or the library (2).
fn at(file: usize, text: &str, nth: usize) -> Fixture {
    let mut files = [HEAD.to_owned(), ROOF.to_owned(), LIBRARY.to_owned()];
    let (place, _) = files[file].match_indices(text).nth(nth).unwrap();
    files[file].insert(place, '|');
    several(&[
        ("frame.steelwork.yaml", &files[0]),
        ("roof.steelwork.yaml", &files[1]),
        ("demo.protection.yaml", &files[2]),
    ])
}

fn defined(fixture: &Fixture) -> Vec<String> {
    fixture.told(&definition(&fixture.view(), fixture.offset))
}

fn used(fixture: &Fixture, with_declaration: bool) -> Vec<String> {
    fixture.told(&references(&fixture.view(), fixture.offset, with_declaration))
}

#[test]
fn a_name_leads_to_where_it_is_given_in_whatever_file() {
    assert_eq!(defined(&at(1, "C1", 0)), ["frame:14: C1"]);
    assert_eq!(defined(&at(1, "floors", 0)), ["frame:8: floors"]);
    assert_eq!(defined(&at(1, "grey board", 0)), ["demo:3: grey board"]);
    assert_eq!(defined(&at(0, "'grey board'", 0)), ["demo:3: grey board"]);
    assert_eq!(defined(&at(0, "plant room", 1)), ["frame:5: plant room"]);
    assert_eq!(defined(&at(2, "plant room", 0)), ["frame:5: plant room"]);
    assert_eq!(defined(&at(1, "R1]", 0)), ["roof:4: R1"]);
    assert!(
        defined(&at(0, "standard", 0)).is_empty(),
        "the standard fire is built in"
    );
    assert!(defined(&at(0, "S355", 0)).is_empty());
    assert!(defined(&at(0, "none", 0)).is_empty(), "a bare member names no product");
    assert!(defined(&at(0, "C1, role", 0)).contains(&"frame:14: C1".to_owned()));
}

#[test]
fn a_mark_that_stands_twice_leads_to_both() {
    let fixture = several(&[(
        "frame.steelwork.yaml",
        "steelwork: 1\nmembers:\n  - mark: B1\n  - mark: B1\n  - { mark: B2, supported by: [|B1] }\n",
    )]);
    assert_eq!(defined(&fixture), ["frame:3: B1", "frame:4: B1"]);
    let refused = rename(&fixture.view(), fixture.offset, "B9").unwrap_err();
    assert!(refused.contains("stands twice"), "{refused}");
}

#[test]
fn every_use_is_found_from_any_use() {
    let marks = ["frame:13: C1", "roof:4: C1", "roof:5: C1"];
    assert_eq!(used(&at(1, "C1", 0), false), marks);
    assert_eq!(
        used(&at(0, "C1", 1), true),
        ["frame:13: C1", "frame:14: C1", "roof:4: C1", "roof:5: C1"]
    );
    assert_eq!(
        used(&at(0, "floors:", 0), false),
        ["frame:11: floors", "frame:14: \"floors\"", "roof:4: floors"]
    );
    assert_eq!(
        used(&at(2, "grey board", 0), true),
        [
            "frame:6: grey board",
            "frame:8: 'grey board'",
            "roof:5: grey board",
            "demo:3: grey board"
        ]
    );
    assert_eq!(
        used(&at(0, "plant room", 0), true),
        [
            "frame:5: plant room",
            "frame:6: plant room",
            "frame:8: plant room",
            "demo:10: plant room"
        ]
    );
    assert_eq!(
        used(&at(0, "standard", 0), true),
        ["frame:14: standard", "demo:10: standard"]
    );
}

#[test]
fn a_rename_reaches_every_file_and_nothing_else() {
    let fixture = at(1, "C1", 0);
    let edits = rename(&fixture.view(), fixture.offset, "C: 1").unwrap();
    let files = fixture.edited(&edits);
    let wanted = |text: &str| {
        text.replace("[C1,", "['C: 1',")
            .replace("mark: C1", "mark: 'C: 1'")
            .replace("by: C1", "by: 'C: 1'")
    };
    assert_eq!(files[0].1, wanted(HEAD));
    assert_eq!(files[1].1, wanted(ROOF));
    assert_eq!(files[2].1, LIBRARY);

    let fixture = at(2, "grey board", 0);
    let edits = rename(&fixture.view(), fixture.offset, "  slate board ").unwrap();
    for ((_, after), before) in fixture.edited(&edits).iter().zip([HEAD, ROOF, LIBRARY]) {
        assert_eq!(*after, before.replace("grey board", "slate board"));
    }
}

#[test]
fn a_rename_keeps_what_the_design_means() {
    for (file, text, nth) in [
        (0, "C1", 0),
        (0, "floors", 0),
        (0, "grey board", 0),
        (0, "plant room", 0),
    ] {
        for new in [
            "null", "it's", "a: b # c", "- x", "\"", "B, 2]", "&a", "!t", "{", "%", "梁 1", "1E2", "true", "? x", "a:",
        ] {
            let fixture = at(file, text, nth);
            let edits = rename(&fixture.view(), fixture.offset, new).unwrap();
            let files = fixture.edited(&edits);
            let again: Vec<(&str, &str)> = files
                .iter()
                .map(|(name, text)| (name.as_str(), text.as_str()))
                .collect();
            let after = several(&again);
            let told = |fixture: &Fixture| {
                let findings = fixture.checked.findings.iter();
                findings.map(|finding| finding.name()).collect::<Vec<_>>()
            };
            assert_eq!(told(&after), told(&fixture), "{text} as {new}: {files:#?}");
        }
    }
}

#[test]
fn a_rename_says_why_it_refuses() {
    let refused = |file, text, nth, new: &str| {
        let fixture = at(file, text, nth);
        rename(&fixture.view(), fixture.offset, new).unwrap_err()
    };
    assert!(refused(0, "C1", 0, " ").contains("is empty"));
    assert!(refused(0, "C1", 0, "C2").contains("`C2` is in the design already"));
    assert!(refused(0, "C1", 0, "R1").contains("`R1` is in the design already"));
    assert!(refused(0, "C1", 0, "a\nb").contains("can't be seen"));
    assert!(refused(0, "plant room", 0, "hydrocarbon").contains("already"));
    assert!(refused(0, "standard", 0, "cellulosic").contains("built in"));
    assert!(refused(0, "grey board", 0, "None").contains("no protection"));
    assert!(refused(0, "S355", 0, "S275").contains("no mark, group, product or fire"));
    assert!(refused(0, "C1", 0, &"x".repeat(201)).contains("longer"));
    let same = at(0, "C1", 0);
    assert!(rename(&same.view(), same.offset, "C1").unwrap().is_empty());
    assert!(
        rename(&same.view(), same.offset, "floors").is_ok(),
        "a group may be called as a mark is"
    );
}

#[test]
fn a_name_behind_an_alias_is_not_renamed() {
    let text = "steelwork: 1
groups:
  &g floors: { role: beam }
members:
  - { mark: &m B1, group: *g }
  - { mark: B2, group: floors, supported by: [*m] }
  - { mark: B3, supported by: [|B2] }
";
    let fixture = several(&[("frame.steelwork.yaml", text)]);
    assert!(prepare_rename(&fixture.view(), fixture.offset).is_some());
    for (name, nth) in [("B1", 0), ("floors", 0), ("floors", 1), ("*m", 0), ("*g", 0)] {
        let plain = text.replace('|', "");
        let (place, _) = plain.match_indices(name).nth(nth).unwrap();
        let offset = u32::try_from(place).unwrap() + 1;
        let refused = rename(&fixture.view(), offset, "new").unwrap_err();
        assert!(refused.contains("behind the alias"), "{name}: {refused}");
        assert_eq!(prepare_rename(&fixture.view(), offset).is_none(), name.starts_with('*'));
    }
}

#[test]
fn the_characters_to_rename_are_told_with_the_name() {
    let fixture = at(0, "floors\"", 0);
    let (span, name) = prepare_rename(&fixture.view(), fixture.offset).unwrap();
    assert_eq!(
        (span.slice(fixture.view().text()), name.as_str()),
        ("\"floors\"", "floors")
    );
    let fixture = at(0, "standard", 0);
    assert_eq!(prepare_rename(&fixture.view(), fixture.offset), None);
}
