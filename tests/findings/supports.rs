//! Findings between members: supports, inherited ones too, decks, and departures whose figures are gone.

use crate::{check, messages, names, one};
use scorchline::findings::finding::Severity;

const INHERITING: &str = "steelwork: 1
libraries: [demo.protection.yaml]
defaults: { role: beam, steel: S355, period: 60, critical temperature: 550 }
groups:
  floors: { section: IPE 300, protection: grey board, supported by: [C1] }
members:
";

#[test]
fn an_inherited_support_is_checked_like_ones_own() {
    let checked = check(&format!(
        "{INHERITING}  - {{ mark: B1, group: floors }}
  - {{ mark: C1, role: column, section: HE 200 B, period: 15 }}"
    ));
    let finding = one(&checked, "support-rating-lower");
    assert_eq!(finding.mark.as_deref(), Some("B1"));
    let text = &checked.design.files[0].text;
    assert_eq!(finding.place.span.slice(text), "B1");
    let note = &finding.notes[0];
    assert_eq!(note.text, "the group `floors` gives B1 its `supported by`");
    assert_eq!(note.place.as_ref().unwrap().span.slice(text), "C1");
}

#[test]
fn a_strange_mark_of_a_group_is_told_once_there() {
    let text = INHERITING.replace("C1", "COL1");
    let checked = check(&format!(
        "{text}  - {{ mark: B1, group: floors }}
  - {{ mark: B2, group: floors }}
  - {{ mark: COL11, role: column, section: HE 200 B, protection: grey board }}"
    ));
    let strange: Vec<_> = checked.findings.iter().filter(|f| f.name() == "unknown-mark").collect();
    assert_eq!(strange.len(), 1, "{:#?}", messages(&checked));
    assert_eq!(
        strange[0].message,
        "each member of the group `floors` is said to be supported by COL1, but no member carries that mark; perhaps COL11"
    );
    assert_eq!(strange[0].place.span.slice(&checked.design.files[0].text), "COL1");
}

#[test]
fn a_period_is_carried_down_to_the_foundations() {
    let chain = |below: u32| {
        check(&format!(
            "- {{ mark: B1, section: IPE 300, critical temperature: 550, period: 90, protection: grey board, supported by: [B2] }}
- {{ mark: B2, section: HE 300 B, critical temperature: 550, period: 30, protection: {{ product: grey board, thickness: 30 }}, supported by: [C1] }}
- {{ mark: C1, role: column, section: HE 200 B, critical temperature: 500, period: {below}, protection: grey board }}"
        ))
    };
    let weak = chain(30);
    let finding = one(&weak, "support-rating-lower");
    assert_eq!(finding.mark.as_deref(), Some("B2"));
    assert!(
        finding.message.starts_with(
            "B2 must last 90 min for the sake of B1, which rests on it, but C1, which supports it, lasts "
        ),
        "{}",
        finding.message
    );
    let sound = chain(90);
    assert!(
        !names(&sound).contains(&"support-rating-lower"),
        "{:#?}",
        messages(&sound)
    );
}

#[test]
fn a_bare_member_on_a_protected_one_is_told_by_what_the_file_states() {
    let rests = |upper: &str, lower: &str| {
        check(&format!(
            "- {{ mark: B1, section: IPE 300, supported by: [B2]{upper} }}
- {{ mark: B2, section: IPE 400{lower} }}"
        ))
    };
    // Nothing is verified here, for no critical temperature is known; heat flows all the same.
    let found = rests("", ", protection: grey board");
    assert!(
        one(&found, "bare-on-protected").message.contains("500 mm"),
        "{:#?}",
        messages(&found)
    );
    for (upper, lower) in [
        (", protection: grey board", ", protection: grey board"),
        (", protection: no such board", ", protection: grey board"),
        (
            ", protection: { product: grey board, thickness: thick }",
            ", protection: grey board",
        ),
        ("", ""),
    ] {
        let not = rests(upper, lower);
        assert!(!names(&not).contains(&"bare-on-protected"), "{:#?}", messages(&not));
    }
}

#[test]
fn a_long_circle_is_named_in_short_and_every_closing_link_told() {
    let member = |n: usize| {
        let next = if n == 2000 { 1 } else { n + 1 };
        format!("- {{ mark: B{n}, section: IPE 300, supported by: [B{next}, B1] }}\n")
    };
    let checked = check(&(1..=2000).map(member).collect::<String>());
    let circles: Vec<_> = messages(&checked)
        .into_iter()
        .filter(|message| message.starts_with("support-cycle"))
        .collect();
    assert_eq!(circles.len(), 2001);
    assert!(
        circles.contains(
            &"support-cycle: B1, B2, B3, B4, B5, B6 and 1994 more support each other in a circle, which B1 closes"
                .to_owned()
        ),
        "{:#?}",
        circles.last()
    );
}

#[test]
fn each_doubt_about_a_deck_has_its_own_finding() {
    const ALL: [&str; 3] = ["shield-not-stated", "deck-contact-low", "deck-voids-unfilled"];
    for (shield, expected) in [
        ("", Some("shield-not-stated")),
        (", shielded by: none", Some("shield-not-stated")),
        (", shielded by: { deck: { contact: 0.9 } }", Some("shield-not-stated")),
        (", shielded by: { deck: { concrete: no } }", Some("shield-not-stated")),
        (
            ", shielded by: { deck: { concrete: yes, contact: 0.84 } }",
            Some("deck-contact-low"),
        ),
        (
            ", shielded by: { deck: { concrete: yes } }",
            Some("deck-voids-unfilled"),
        ),
        (
            ", shielded by: { deck: { concrete: yes, contact: 0.2, voids filled: yes } }",
            None,
        ),
        (", shielded by: { deck: { concrete: yes, contact: 0.85 } }", None),
        (", shielded by: slab", None),
        (", shielded by: slap", None),
    ] {
        let checked = check(&format!(
            "- {{ mark: B1, section: IPE 300, critical temperature: 550, protection: grey board, exposure: three sides{shield} }}"
        ));
        let found: Vec<_> = names(&checked).into_iter().filter(|name| ALL.contains(name)).collect();
        assert_eq!(found, Vec::from_iter(expected), "{shield}: {:#?}", messages(&checked));
        for name in found {
            assert_eq!(one(&checked, name).severity, Severity::Warning);
        }
    }
}

#[test]
fn a_departure_lapses_when_nothing_is_known_any_more() {
    let with = |at: &str, rest: &str| {
        check(&format!(
            "- {{ mark: B1, section: IPE 200, period: 90, departures: [ {{ from: bare-steel-fails, because: agreed, by: checker, until: 2027-06-30, at: {{ {at} }} }} ]{rest} }}"
        ))
    };
    for at in ["needs: 24 mm", "resistance: 5 min"] {
        let gone = with(at, "");
        let message = &one(&gone, "departure-outgrown").message;
        assert!(message.contains("known"), "{message}");
    }
    let held = with("resistance: 5 min", ", critical temperature: 550");
    assert!(
        held.agreed.iter().any(|finding| finding.name() == "bare-steel-fails"),
        "{:#?}",
        messages(&held)
    );
}

#[test]
fn a_coating_says_where_it_serves() {
    let checked = check(
        "steelwork: 1
libraries: [own.protection.yaml]
defaults: { role: beam, steel: S355, period: 60, critical temperature: 550, section: IPE 300, protection: own film }
members:
  - { mark: B1, environment: X }
  - { mark: B2, environment: Z2 }
  - { mark: B3 }
# own.protection.yaml
protection: 1
products:
  own film:
    kind: coating
    method: assessed table
    tables:
      - { period: 60, shape: open, sides: 4, steel temperature: [450, 650], rows: { 60: [560, 300], 280: [2600, 1540] } }",
    );
    let found: Vec<_> = messages(&checked)
        .into_iter()
        .filter(|message| message.starts_with("coating-environment"))
        .collect();
    assert_eq!(
        found,
        ["coating-environment: B1 stands in X (exposed), but `own film` states no environment that it serves in"]
    );
}

#[test]
fn zinc_behind_protection_is_no_benefit() {
    let with = |protection: &str| {
        check(&format!(
            "- {{ mark: B1, section: IPE 300, critical temperature: 550, surface: {{ galvanised: {{ to: EN ISO 1461, category: A }} }}, protection: {protection} }}"
        ))
    };
    assert!(names(&with("none")).contains(&"galvanised-benefit-claimed"));
    assert!(!names(&with("grey board")).contains(&"galvanised-benefit-claimed"));
}
