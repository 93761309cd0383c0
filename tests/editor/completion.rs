//! Keys that an editor offers at a cursor in half-typed text.

use scorchline::editor::completion::{Completion, CompletionKind, Completions, completion};
use scorchline::findings::registry::EXAMPLE_LIBRARY;

use crate::fixture::{Fixture, several};

pub const HEAD: &str = "steelwork: 1
basis: { default critical temperature: 500 }
libraries: [demo.protection.yaml]
defaults: { role: beam, steel: S355, period: 60, critical temperature: 550 }
groups:
  floors: { section: IPE 300, protection: grey board }
";

fn design(head: &str, rest: &str) -> Fixture {
    several(&[
        ("frame.steelwork.yaml", &format!("{head}{rest}")),
        ("demo.protection.yaml", EXAMPLE_LIBRARY),
    ])
}

/// The members in the frame, the cursor at `|`.
pub fn at(members: &str) -> Fixture {
    design(HEAD, &format!("members:\n{members}"))
}

pub fn asked(fixture: &Fixture) -> Completions {
    completion(&fixture.view(), &fixture.checked.findings, fixture.offset)
}

pub fn offered(members: &str) -> Vec<Completion> {
    let items = asked(&at(members)).items;
    let crlf = design(
        &HEAD.replace('\n', "\r\n"),
        &format!("members:\n{members}").replace('\n', "\r\n"),
    );
    let labels = |items: &[Completion]| items.iter().map(|item| item.label.clone()).collect::<Vec<_>>();
    assert_eq!(
        labels(&asked(&crlf).items),
        labels(&items),
        "in lines that end with CR LF"
    );
    items
}

pub fn labels(members: &str) -> Vec<String> {
    offered(members).into_iter().map(|item| item.label).collect()
}

/// The text after an item is written, snippets without their places. Lines of an item are indented as an editor does.
pub fn applied(text: &str, item: &Completion) -> String {
    let (from, to) = (item.replaces.start as usize, item.replaces.end as usize);
    let line = text[..from].rfind('\n').map_or(0, |at| at + 1);
    let indent: String = text[line..].chars().take_while(|c| *c == ' ').collect();
    let written = item.plain().replace('\n', &format!("\n{indent}"));
    format!("{}{written}{}", &text[..from], &text[to..])
}

/// The members after the item of this label is chosen.
#[track_caller]
pub fn chosen(members: &str, label: &str) -> String {
    let fixture = at(members);
    let items = asked(&fixture).items;
    let Some(item) = items.iter().find(|item| item.label == label) else {
        let labels: Vec<&str> = items.iter().map(|item| item.label.as_str()).collect();
        panic!("`{label}` is not among {labels:?}");
    };
    let text = applied(fixture.view().text(), item);
    text.strip_prefix(&format!("{HEAD}members:\n")).unwrap().to_owned()
}

#[track_caller]
pub fn has(members: &str, wanted: &[&str]) {
    let labels = labels(members);
    for label in wanted {
        assert!(labels.iter().any(|known| known == label), "no {label}: {labels:?}");
    }
}

#[track_caller]
pub fn has_not(members: &str, unwanted: &[&str]) {
    let labels = labels(members);
    for label in unwanted {
        assert!(!labels.iter().any(|known| known == label), "{label} in {labels:?}");
    }
}

#[test]
fn keys_fit_in_a_member_wherever_it_is_typed() {
    for members in [
        "  - mark: B1\n    sec|\n",
        "  - mark: B1\n    |\n",
        "  - mark: B1\n    |\n    length: 4\n",
        "  - mark: B1\n    loading: { utilisation: 0.5 }\n    |",
        "  - { mark: B1, sec|\n",
        "  - { mark: B1, | }\n",
        "  - { mark: B1,| }\n",
        "  - { mark: B1, sec| }\n  - { mark: B2 }\n",
        "  - { mark: B1,\n      se|\n    }\n",
        "  - { mark: Träger 梁 1, |\n",
        "  - mark: \"B1: # x\"\n    |\n",
    ] {
        has(members, &["section", "count", "protection"]);
        has_not(members, &["mark"]);
    }
    has("  - |\n", &["mark", "section", "a new member"]);
    has("  - mark: B0\n  - |\n", &["mark", "section", "a new member"]);
    has("  - mark: B0\n  - sec|", &["mark", "section"]);
    has_not(
        "  - mark: B1\n    length: 4\n    |\n    section: IPE 300\n",
        &["section", "length"],
    );
}

#[test]
fn a_key_is_written_with_its_colon_once() {
    assert_eq!(
        chosen("  - mark: B1\n    sec|\n", "section"),
        "  - mark: B1\n    section: \n"
    );
    assert_eq!(
        chosen("  - mark: B1\n    sec|x: IPE 300   # why\n", "section"),
        "  - mark: B1\n    section: IPE 300   # why\n"
    );
    assert_eq!(
        chosen("  - { mark: B1, per| }\n", "period"),
        "  - { mark: B1, period: 60 }\n"
    );
    assert_eq!(
        chosen("  - { mark: B1, per| section: IPE 300 }\n", "period"),
        "  - { mark: B1, period: 60, section: IPE 300 }\n"
    );
    assert_eq!(
        chosen("  - mark: B1\n    load|\n      utilisation: 0.5\n", "loading"),
        "  - mark: B1\n    loading:\n      utilisation: 0.5\n"
    );
    assert_eq!(
        chosen("  - mark: B1\n    dep|\n", "departures"),
        "  - mark: B1\n    departures: [{ from: , because: \"\" }]\n"
    );
}

#[test]
fn keys_tell_their_units() {
    let items = offered("  - mark: B1\n    |\n");
    let length = items.iter().find(|item| item.label == "length").unwrap();
    assert_eq!(length.detail, "a length in m");
    assert!(length.documentation.contains("Length of one member"));
    assert_eq!(length.kind, CompletionKind::Key);
    let first = &items[0];
    assert_eq!(first.label, "section", "what is still wanted comes first");
}

#[test]
fn keys_of_nested_mappings() {
    has(
        "  - mark: B1\n    protection: { product: grey board, | }\n",
        &["form", "thickness", "dft"],
    );
    has(
        "  - mark: B1\n    protection:\n      |\n",
        &["product", "form", "grey board"],
    );
    has(
        "  - mark: B1\n    protection:\n      product: grey board\n      th|\n",
        &["thickness"],
    );
    has_not(
        "  - mark: B1\n    protection:\n      product: grey board\n      th|\n",
        &["product", "mark"],
    );
    has(
        "  - { mark: B1, loading: { axial: 4 kN, | } }\n",
        &["buckling length", "bending"],
    );
    has_not(
        "  - { mark: B1, loading: { axial: 4 kN, | } }\n",
        &["utilisation", "load ratio", "axial"],
    );
    has("  - { mark: B1, section: { shape: angle, | } }\n", &["h", "toe"]);
    has_not("  - { mark: B1, section: { shape: angle, | } }\n", &["tw", "area"]);
    has(
        "  - { mark: B1, shielded by: { deck: { | } } }\n",
        &["contact", "voids filled"],
    );
    has("  - mark: B1\n    departures:\n      - fr|\n", &["from", "because"]);
    has(
        "  - mark: B1\n    departures:\n      - from: profile-board\n        |\n",
        &["because", "until"],
    );
    has("  - mark: B1\n    location: {|}\n", &["level", "grid"]);
}

#[test]
fn keys_of_groups_defaults_and_the_top_level() {
    let labels = |text: &str| -> Vec<String> {
        let fixture = design("steelwork: 1\n", text);
        asked(&fixture).items.into_iter().map(|item| item.label).collect()
    };
    let group = labels("groups:\n  floors: { role: beam, | }\nmembers: []\n");
    assert!(group.contains(&"section".to_owned()), "{group:?}");
    assert!(
        !group
            .iter()
            .any(|label| matches!(label.as_str(), "mark" | "departures" | "role"))
    );
    let defaults = labels("defaults:\n  role: beam\n  |\nmembers: []\n");
    assert!(
        defaults.contains(&"group".to_owned()) && !defaults.contains(&"mark".to_owned()),
        "{defaults:?}"
    );
    let top = labels("members:\n  - { mark: B1 }\n|");
    assert!(
        top.contains(&"groups".to_owned()) && top.contains(&"basis".to_owned()),
        "{top:?}"
    );
    assert!(
        !top.iter()
            .any(|label| matches!(label.as_str(), "members" | "steelwork"))
    );
    let half = labels("gro|");
    assert!(half.contains(&"groups".to_owned()), "{half:?}");
    let part = labels("part of: mill.steelwork.yaml\n|");
    assert!(
        part.contains(&"members".to_owned()) && !part.contains(&"basis".to_owned()),
        "{part:?}"
    );
    let basis = labels("basis: { | }\n");
    assert!(basis.contains(&"yield from".to_owned()), "{basis:?}");
    let factors = labels("basis:\n  factors:\n    |\n");
    assert!(factors.contains(&"gamma M fi".to_owned()), "{factors:?}");
    let fire = labels("fires:\n  plant: { kind: | }\n");
    assert_eq!(fire, ["parametric", "points"]);
    let fires = labels("fires:\n  |\n");
    assert_eq!(fires, ["a new fire"]);
}

#[test]
fn keys_of_products() {
    let labels = |text: &str| -> Vec<String> {
        let fixture = several(&[("demo.protection.yaml", text)]);
        asked(&fixture).items.into_iter().map(|item| item.label).collect()
    };
    let product = labels("protection: 1\nproducts:\n  board:\n    kind: board\n    |\n");
    assert!(
        product.contains(&"conductivity".to_owned()) && !product.contains(&"kind".to_owned()),
        "{product:?}"
    );
    let assessed = labels("protection: 1\nproducts:\n  board:\n    kind: board\n    assessed: { shapes: [open, |] }\n");
    assert!(
        assessed.contains(&"hollow".to_owned()) && !assessed.contains(&"open".to_owned()),
        "{assessed:?}"
    );
    let table = labels("protection: 1\nproducts:\n  film:\n    tables:\n      - { period: 60, | }\n");
    assert!(
        table.contains(&"rows".to_owned()) && table.contains(&"sides".to_owned()),
        "{table:?}"
    );
    assert_eq!(labels("protection: 1\nproducts:\n  film:\n    method: |\n").len(), 3);
}

#[test]
fn a_new_member_is_written_in_the_style_of_the_last() {
    assert_eq!(
        chosen("  - mark: B09\n    section: IPE 300\n  |\n", "a new member"),
        "  - mark: B09\n    section: IPE 300\n  - mark: B10\n    group: \n    section: \n"
    );
    assert_eq!(
        chosen("  - mark: B9\n    section: IPE 300\n  - |\n", "a new member"),
        "  - mark: B9\n    section: IPE 300\n  - mark: B10\n    group: \n    section: \n"
    );
    assert_eq!(
        chosen("  - { mark: B1 }\n  - { mark: B2 }\n  |\n", "a new member"),
        "  - { mark: B1 }\n  - { mark: B2 }\n  - { mark: B3, group: , section:  }\n"
    );
    assert_eq!(
        chosen("  |\n", "a new member"),
        "  - mark: \n    group: \n    section: \n"
    );
}

#[test]
fn nothing_is_offered_where_nothing_fits() {
    for members in [
        "  - mark: B1   # a comment |\n",
        "  # se|\n  - mark: B1\n",
        "  - mark: B1\n  |  section: IPE 300\n",
        "  - mark: B1\n    note: |x\n      any\n      te|\n",
        "  - mark: B1\n    length: |\n",
        "  - mark: B1\n|\n    section: IPE 300\n",
        "  - mark: |\n",
        "  - &a { mark: B1 }|\n",
        "  - { mark: B1, protection: *x| }\n",
    ] {
        let members = members.replacen("|x", ">", 1);
        assert_eq!(labels(&members), Vec::<String>::new(), "{members}");
    }
}
