//! Critical temperatures: what is said where they can't be relied on.

use super::{check, messages, names, one};
use scorchline::analysis::outcome::Verdict;
use scorchline::findings::finding::Severity;

#[test]
fn an_unreadable_loading_is_told_once_and_proves_nothing() {
    for loading in ["{ utilisation: 0,55 }", "{ utilisation: 0.5 kN }", "heavy"] {
        let text = format!("- {{ mark: B1, section: IPE 300, protection: grey board, loading: {loading} }}");
        let checked = check(&text);
        let names = names(&checked);
        assert!(
            !names.contains(&"critical-temperature-unknown"),
            "{loading}: {:#?}",
            messages(&checked)
        );
        assert_eq!(checked.outcomes[0].verdict, Verdict::NotVerified, "{loading}");
        let errors = checked
            .findings
            .iter()
            .filter(|finding| finding.severity == Severity::Error);
        assert_eq!(errors.count(), 1, "{loading}: {:#?}", messages(&checked));
    }
}

#[test]
fn a_utilisation_of_what_may_buckle_is_doubted() {
    let of = |role: &str, loading: &str| {
        let text = format!(
            "- {{ mark: C1, role: {role}, section: HE 200 B, period: 30, protection: grey board, loading: {loading} }}"
        );
        let checked = check(&text);
        let doubts = checked
            .findings
            .iter()
            .filter(|f| f.name() == "critical-temperature-ignores-buckling");
        doubts.map(|finding| finding.message.clone()).collect::<Vec<_>>()
    };
    for role in ["column", "brace", "truss chord", "truss web"] {
        let doubts = of(role, "{ utilisation: 0.5 }");
        assert!(doubts[0].contains("its buckling length is not given"), "{doubts:?}");
    }
    // HE 200 B: iz = 50.7 mm, λ1 = 76.4 in S355; 3.5 m gives 0.90, 0.7 m gives 0.18.
    let doubts = of("column", "{ utilisation: 0.5, buckling length: 3.5 m }");
    assert!(doubts[0].contains("slenderness is 0.9 "), "{doubts:?}");
    assert!(of("column", "{ utilisation: 0.5, buckling length: 0.7 m }").is_empty());
    assert!(of("column", "{ axial: 600 kN, buckling length: 3.5 m }").is_empty());
    assert!(of("beam", "{ utilisation: 0.5 }").is_empty());
    assert!(of("tie", "{ utilisation: 0.5 }").is_empty());
}

#[test]
fn a_slip_of_the_file_can_not_be_departed_from() {
    let text = "- { mark: B1, section: IPE 300, colour: red, departures: [{ from: unknown-key, because: we like it, by: A, until: 2030-01-01 }] }";
    let checked = check(text);
    assert!(names(&checked).contains(&"unknown-key"));
    assert!(checked.agreed.is_empty());
    let unused = one(&checked, "departure-unused");
    assert!(unused.message.contains("slip of the file"), "{}", unused.message);
}

/// Status: computed by hand. IPE 360 in S355: c = 360 - 2 (12.7 + 18) = 298.6 mm over 8 mm; 42 · 0.85 √(235/355) = 29.0.
#[test]
fn class_4_says_what_is_slender() {
    let checked = check("- { mark: C1, role: column, section: IPE 360, loading: { utilisation: 0.5 } }");
    let message = &one(&checked, "class-4-temperature").message;
    assert!(message.contains("(web c/t 37.3 > 42ε = 29.0)"), "{message}");
}

#[test]
fn a_heavier_section_is_named_only_where_it_may_do() {
    let of = |section: &str, period: u32| {
        let checked = check(&format!(
            "- {{ mark: B1, section: {section}, period: {period}, critical temperature: 600 }}"
        ));
        one(&checked, "bare-steel-fails").message.clone()
    };
    assert!(of("IPE 300", 90).ends_with("Protect it"));
    assert!(of("IPE 300", 15).ends_with("Protect it, or take a heavier section"));
}

#[test]
fn what_is_enough_is_told_once() {
    let of = |section: &str| {
        let checked = check(&format!(
            "- {{ mark: B1, section: {section}, critical temperature: 550, protection: {{ product: grey board, thickness: 30 }} }}"
        ));
        one(&checked, "protection-over-thick").message.clone()
    };
    assert_eq!(
        of("HE 300 M"),
        "B1: 30 mm of `grey board` is more than the 15 mm needed"
    );
    assert_eq!(
        of("IPE 300"),
        "B1: 30 mm of `grey board` is more than the 17.2 mm needed; 20 mm would do"
    );
}
