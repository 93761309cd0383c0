//! Designations, products, names and words that an editor offers at a cursor.

use scorchline::editor::completion::{CompletionKind, MOST};

use crate::completion::{asked, at, chosen, has, has_not, labels, offered};

#[test]
fn designations_are_found_as_one_types() {
    for members in [
        "  - mark: B1\n    section: heb24|\n",
        "  - { mark: B1, section: heb24| }\n",
        "  - { mark: B1, section: heb24|",
        "  - { mark: B1, section: HE 24|x }\n",
        "  - mark: B1\n    section: \"heb24|\"\n",
    ] {
        let items = offered(members);
        let item = items.iter().find(|item| item.label == "HE 240 B").unwrap();
        // 83.2 kg/m and 130 1/m: EN 10365 and the outline's 1.38 m over its 106 cm2; computed from the dimensions.
        assert!(item.detail.starts_with("83.2 kg/m, 13"), "{}", item.detail);
        assert_eq!(item.kind, CompletionKind::Section);
    }
    assert_eq!(
        chosen("  - { mark: B1, section: heb24| }\n", "HE 240 B"),
        "  - { mark: B1, section: HE 240 B }\n"
    );
    assert_eq!(
        chosen("  - mark: B1\n    section: IPE 3|00   # old\n", "IPE 330"),
        "  - mark: B1\n    section: IPE 330   # old\n"
    );
    assert_eq!(
        chosen("  - mark: B1\n    section: 'ipe 3|00'\n", "IPE 330"),
        "  - mark: B1\n    section: IPE 330\n"
    );
    assert_eq!(
        chosen("  - mark: B1\n    section:|\n", "IPE 330"),
        "  - mark: B1\n    section: IPE 330\n"
    );
    assert_eq!(
        chosen("  - mark: B1\n    section: ipx 33|\n", "IPE 330"),
        "  - mark: B1\n    section: IPE 330\n"
    );
}

#[test]
fn few_designations_are_answered_at_a_time_those_of_the_neighbour_first() {
    let fixture = at("  - { mark: B1, section: HE 240 B }\n  - { mark: B2, section: | }\n");
    let found = asked(&fixture);
    assert!(found.incomplete && found.items.len() == MOST);
    assert!(found.items[0].label.ends_with(" B"), "{}", found.items[0].label);
    let sorted: Vec<&String> = found.items.iter().map(|item| &item.sort).collect();
    assert!(sorted.is_sorted());
    let few = asked(&at("  - { mark: B1, section: IPE 30| }\n"));
    assert!(!few.incomplete && few.items[0].label == "IPE 300");
}

#[test]
fn section_factors_are_those_of_the_exposure() {
    let detail = |more: &str| {
        let items = offered(&format!("  - {{ mark: B1{more}, section: IPE 300| }}\n"));
        items
            .iter()
            .find(|item| item.label == "IPE 300")
            .unwrap()
            .detail
            .clone()
    };
    // EN 1993-1-2:2005 Tables 4.2 and 4.3: P/A, (P - b)/A, 2(b + h)/A of 1.16 m, 53.8 cm2, 150 by 300 mm.
    assert_eq!(detail(""), "42.2 kg/m, 216 1/m");
    assert_eq!(
        detail(", exposure: three sides, shielded by: slab"),
        "42.2 kg/m, 188 1/m"
    );
    assert_eq!(detail(", protection: grey board"), "42.2 kg/m, boxed 167 1/m");
}

#[test]
fn products_that_hold_the_member_come_first() {
    for members in [
        "  - { mark: B1, section: IPE 300, protection: | }\n",
        "  - { mark: B1, section: IPE 300, protection: { product: | } }\n",
        "  - mark: B1\n    section: IPE 300\n    protection: |\n",
        "  - mark: B1\n    section: IPE 300\n    protection:\n      product: gr|\n",
    ] {
        let items = offered(members);
        let first = &items[0];
        assert_eq!(first.kind, CompletionKind::Product);
        assert!(first.detail.contains("needs"), "{}: {}", first.label, first.detail);
    }
    let items = offered("  - { mark: B1, section: IPE 80, period: 120, protection: | }\n");
    let why = items.iter().find(|item| item.label == "white spray").unwrap();
    assert!(
        why.detail.starts_with("no assessed thickness holds it: "),
        "{}",
        why.detail
    );
    let last = items.iter().rposition(|item| item.detail.contains("needs"));
    let first = items.iter().position(|item| item.label == "white spray");
    assert!(last < first, "{items:#?}");
    assert!(items.iter().any(|item| item.label == "none"));
    let fire = offered("  - { mark: B1, section: IPE 300, fire: hydrocarbon, protection: | }\n");
    assert!(fire.iter().any(|item| item.detail == "not assessed for this fire"));
    let unknown = offered("  - { mark: B1, protection: | }\n");
    assert!(unknown.iter().all(|item| !item.detail.contains("needs")));
}

#[test]
fn the_thickness_offered_is_the_one_that_the_member_then_gets() {
    let members = "  - { mark: B1, section: IPE 300, protection: | }\n";
    let fixture = at(members);
    for item in asked(&fixture).items {
        let Some((_, needs)) = item.detail.split_once("needs ") else {
            continue;
        };
        let then = at(&chosen(members, &item.label));
        let state = then.checked.outcomes[0].protected.clone().unwrap();
        let provided = state.provided.unwrap();
        let shown = if needs.ends_with("µm") {
            format!("{:.0} µm", provided.um())
        } else {
            format!("{:.0} mm", provided.mm())
        };
        assert_eq!(shown, needs, "{}", item.label);
    }
}

#[test]
fn names_words_and_values() {
    has("  - { mark: B1, group: | }\n", &["floors"]);
    has(
        "  - { mark: B1, fire: | }\n",
        &["standard", "hydrocarbon", "slow heating"],
    );
    has("  - mark: B1\n    role: |\n", &["beam", "truss chord"]);
    has("  - mark: B1\n    role: be|am\n", &["beam", "column"]);
    has("  - mark: B1\n    steel: S|\n", &["S355", "{ yield: .. }"]);
    has(
        "  - mark: B1\n    exposure: |\n",
        &["all round", "three sides", "{ covered: .. }"],
    );
    has("  - { mark: B1, exposure: { covered: [top, |] } }\n", &["left"]);
    has_not("  - { mark: B1, exposure: { covered: [top, |] } }\n", &["top"]);
    has("  - { mark: B1, period: | }\n", &["60", "90"]);
    has("  - { mark: B1, connection: { same protection: | } }\n", &["yes", "no"]);
    has("  - { mark: B1, section: { shape: | } }\n", &["welded i", "flat"]);
    assert_eq!(
        chosen("  - { mark: B1, role: |}\n", "lintel"),
        "  - { mark: B1, role: lintel}\n"
    );
    assert_eq!(
        chosen("  - { mark: B1, role:|}\n", "lintel"),
        "  - { mark: B1, role: lintel}\n"
    );
    assert_eq!(
        chosen("  - { mark: B1, role: | steel: S355 }\n", "tie"),
        "  - { mark: B1, role: tie, steel: S355 }\n"
    );
    assert_eq!(
        chosen("  - mark: B1\n    role: truss ch|ord   # or web\n", "truss web"),
        "  - mark: B1\n    role: truss web   # or web\n"
    );
}

#[test]
fn marks_of_the_design() {
    let members = "  - { mark: C1, role: column, section: HE 200 B }\n  - { mark: 梁 7 }\n  - { mark: 1E2 }\n  - { mark: B1, supported by: ";
    let with = |tail: &str| labels(&format!("{members}{tail}"));
    assert_eq!(with("[|] }\n"), ["C1", "梁 7", "1E2"]);
    assert_eq!(with("| }\n"), ["C1", "梁 7", "1E2"]);
    assert_eq!(with("[C1, |] }\n"), ["梁 7", "1E2"]);
    assert_eq!(with("[C1, 梁| ] }\n"), ["梁 7"]);
    assert_eq!(with("[|, C1] }\n"), ["梁 7", "1E2"]);
    let block = "  - { mark: C1 }\n  - { mark: C2 }\n  - mark: B1\n    steadies:\n";
    assert_eq!(labels(&format!("{block}      - |\n")), ["C1", "C2"]);
    assert_eq!(labels(&format!("{block}      - C1\n      - |\n")), ["C2"]);
    assert_eq!(
        chosen(&format!("{block}      - C1\n      |\n"), "C2"),
        format!("{block}      - C1\n      - C2\n")
    );
    assert_eq!(
        chosen(&format!("{block}      |\n"), "C2"),
        format!("{block}      - C2\n")
    );
}

#[test]
fn a_hundred_marks_are_answered_at_most() {
    let many: String = (1..=300).map(|n| format!("  - {{ mark: M{n} }}\n")).collect();
    let found = asked(&at(&format!("{many}  - {{ mark: B1, supported by: [|] }}\n")));
    assert!(found.incomplete && found.items.len() == MOST);
    let found = asked(&at(&format!("{many}  - {{ mark: B1, supported by: [m29|] }}\n")));
    assert!(!found.incomplete);
    assert_eq!(found.items.len(), 11);
}

#[test]
fn findings_of_the_member_come_first_in_a_departure() {
    let members =
        "  - { mark: B1, section: IPE 80, period: 120, protection: white spray, departures: [{ from: | }] }\n";
    let items = offered(members);
    assert_eq!(items[0].label, "too-slender-to-protect");
    assert_eq!(items[0].detail, "error, found here");
    assert!(items[0].documentation.contains("B1"));
    assert!(items.iter().any(|item| item.label == "protection-over-thick"));
    has_not(members, &["unknown-key", "departure-expired"]);
    has(
        "  - mark: B1\n    departures:\n      - from: |\n",
        &["bare-steel-fails"],
    );
}

#[test]
fn the_form_that_is_stated_is_the_one_judged() {
    let needs = |form: &str| {
        let items = offered(&format!(
            "  - {{ mark: B1, section: IPE 300, protection: {{ form: {form}, product: | }} }}\n"
        ));
        let item = items.into_iter().find(|item| item.label == "grey board").unwrap();
        item.documentation
    };
    assert_ne!(needs("box"), needs("profile"));
}

#[test]
fn an_editor_finds_what_was_typed_in_the_filter() {
    for (typed, quote) in [
        ("heb2", ""),
        ("HE 2", ""),
        ("unp", ""),
        ("hfshs 150", ""),
        ("\"ipe 3", "\""),
    ] {
        let items = offered(&format!("  - {{ mark: B1, section: {typed}|{quote} }}\n"));
        assert_eq!(items[0].kind, CompletionKind::Section);
        for item in items.iter().filter(|item| item.kind == CompletionKind::Section) {
            assert!(item.filter.starts_with(typed), "{typed}: {}", item.filter);
        }
    }
    let quoted = offered("  - { mark: C1 }\n  - { mark: B1, supported by: ['C|'] }\n");
    assert_eq!((quoted[0].filter.as_str(), quoted[0].text.as_str()), ("'C1", "C1"));
}

#[test]
fn many_products_are_judged_those_first_whose_name_is_typed() {
    let board = |n: u32| {
        format!(
            "  board {n}: {{ kind: board, method: constant properties, conductivity: 0.2, specific heat: 1000, density: 800, assessed: {{ section factor: [40, 400], thickness: [10, 80], steel temperature: [350, 750], period: [30, 180] }} }}\n"
        )
    };
    let library: String = (1..=50).map(board).collect();
    let ask = |typed: &str| {
        let frame = format!(
            "steelwork: 1\nlibraries: [many.protection.yaml]\ndefaults: {{ role: beam, steel: S355, period: 60 }}\nmembers:\n  - {{ mark: B1, section: IPE 300, critical temperature: 550, protection: {typed}| }}\n"
        );
        asked(&crate::fixture::several(&[
            ("frame.steelwork.yaml", &frame),
            ("many.protection.yaml", &format!("protection: 1\nproducts:\n{library}")),
        ]))
    };
    let judged = |label: &str, typed: &str| {
        let found = ask(typed);
        assert!(found.incomplete);
        let item = found.items.into_iter().find(|item| item.label == label);
        item.unwrap().detail.contains("needs")
    };
    assert!(judged("board 1", "") && !judged("board 50", ""));
    assert!(judged("board 50", "board 5"));
}
