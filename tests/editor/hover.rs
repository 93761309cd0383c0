//! Hovers and hints.

use scorchline::editor::hints::hints;
use scorchline::editor::hover::{HoverOptions, hover};
use scorchline::text::Span;

use crate::fixture::{Fixture, several};

const LIBRARY: &str = "protection: 1
products:
  grey board: { kind: board, method: constant properties, conductivity: 0.2, specific heat: 1000, density: 800, thicknesses: [15, 20, 25], assessed: { section factor: [40, 320], thickness: [15, 25], steel temperature: [350, 750], period: [30, 120], shapes: [open], orientation: [beam], fires: [standard] }, evidence: { report: invented, expires: 2030-01-01 } }
";

fn fixture(member: &str) -> Fixture {
    let text = format!(
        "steelwork: 1
libraries: [site.protection.yaml]
defaults: {{ role: beam, steel: S355, loading: {{ utilisation: 0.6 }} }}
groups:
  upper: {{ period: 60 }}
members:
  {member}
"
    );
    several(&[("frame.steelwork.yaml", &text), ("site.protection.yaml", LIBRARY)])
}

fn shown(member: &str, images: bool) -> String {
    let fixture = fixture(member);
    let hover = hover(
        &fixture.view(),
        &fixture.checked.findings,
        fixture.offset,
        HoverOptions { images },
    );
    hover.map_or_else(String::new, |hover| hover.markdown)
}

#[test]
fn a_mark_tells_all_that_is_known_of_its_member() {
    let text = shown(
        "- { mark: B|1, group: upper, section: IPE 300, protection: grey board }",
        false,
    );
    for part in [
        "**B1** IPE 300, beam, S355",
        "section factor: **167 1/m** (V/A 6 mm), all round, box outline",
        "critical temperature: **554 °C** from the loading",
        "(4.22)",
        "bare: critical after",
        "grey board: needs",
        "verdict: **passes**",
        "```text\nsteel behind",
        "`period` from the group",
        "`loading` from `defaults`",
    ] {
        assert!(text.contains(part), "{part:?} in\n{text}");
    }
}

#[test]
fn a_picture_is_drawn_for_editors_that_show_one() {
    let text = shown("- { mark: B|1, group: upper, section: IPE 300 }", true);
    assert!(text.contains("](data:image/svg+xml;base64,"), "{text}");
}

#[test]
fn a_section_tells_its_factors_and_a_product_its_range() {
    let text = shown("- { mark: B1, group: upper, section: IPE| 300 }", false);
    assert!(
        text.contains("**IPE 300**") && text.contains("42.2 kg/m") && text.contains("bare outline: 216 1/m"),
        "{text}"
    );
    let text = shown(
        "- { mark: B1, group: upper, section: IPE 300, protection: grey |board }",
        false,
    );
    assert!(
        text.contains("section factor: 40 1/m to 320 1/m") && text.contains("until 2030-01-01"),
        "{text}"
    );
    assert!(text.contains("verdict: **passes**"), "{text}");
}

#[test]
fn a_finding_tells_its_clause_and_how_to_answer_it() {
    let text = shown(
        "- { mark: B1, group: upper, section: IPE 8|0, protection: grey board }",
        false,
    );
    assert!(text.starts_with("**too-slender-to-protect** (error; "), "{text}");
}

#[test]
fn a_key_tells_what_it_means_and_its_unit() {
    let text = shown("- { mark: B1, group: upper, section: IPE 300, leng|th: 6 }", false);
    assert!(text.starts_with("**length**: a length in m"), "{text}");
    let text = shown(
        "- { mark: B1, section: IPE 300, protection: { product: grey board, thick|ness: 15 } }",
        false,
    );
    assert!(text.starts_with("**thickness**:"), "{text}");
}

#[test]
fn what_is_not_verified_says_why() {
    let text = shown(
        "- { mark: C|1, role: column, section: IPE 300, period: 60, loading: { utilisation: 2 } }",
        false,
    );
    assert!(
        text.contains("verdict: **") && !text.contains("verdict: **passes**"),
        "{text}"
    );
    let text = shown("- { mark: B|1, section: IPE 30, period: 60 }", false);
    assert!(
        text.contains("not verified: `section` is lacking or can't be read"),
        "{text}"
    );
}

#[test]
fn hints_stand_behind_section_and_protection() {
    let fixture =
        fixture("- { mark: B1, group: upper, section: IPE 300, protection: { product: grey board, thickness: 20 } }");
    let view = fixture.view();
    let all = Span::new(0, view.text().len());
    let hints = hints(&view, all);
    let labels: Vec<&str> = hints.iter().map(|hint| hint.label.as_str()).collect();
    assert_eq!(labels.len(), 2, "{labels:?}");
    assert_eq!(labels[0], "167 1/m (V/A 6 mm)");
    assert!(
        labels[1].starts_with("needs 1") && labels[1].ends_with(", has 20 mm"),
        "{labels:?}"
    );
    assert!(view.text()[..hints[0].at as usize].ends_with("IPE 300"));
}

#[test]
fn no_offset_of_the_scenario_is_too_much() {
    for (name, text) in scorchline::scenario::FILES {
        let others = scorchline::scenario::FILES.iter().filter(|(other, _)| other != name);
        let files: Vec<(&str, &str)> = std::iter::once((*name, *text)).chain(others.copied()).collect();
        let fixture = several(&files);
        let view = fixture.view();
        for offset in (0..view.text().len()).step_by(7) {
            let offset = u32::try_from(offset).unwrap();
            let found = hover(&view, &fixture.checked.findings, offset, HoverOptions::default());
            assert!(found.is_none_or(|hover| !hover.markdown.is_empty() && hover.span.touches(offset)));
        }
    }
}
