//! Whatever a member says, its verdict and its findings tell the same: nothing fails or stays unverified in silence, and
//! nothing passes against a finding of its own.

use proptest::prelude::*;
use proptest::sample::select;

use crate::{check_files, mended, messages, names};
use scorchline::analysis::outcome::Verdict;
use scorchline::check::Checked;
use scorchline::findings::finding::Severity;
use scorchline::findings::registry::{EXAMPLE_LIBRARY, find};
use scorchline::report::schedule::schedule;

const SECTIONS: &[&str] = &[
    "IPE 80",
    "IPE 300",
    "HE 300 B",
    "SHS HF 150x150x8",
    "SHS 150x150x8",
    "CHS HF 168.3x10",
    "L 100x100x10",
    "IPE 301",
    "{ shape: round, d: 40 }",
    "{ shape: welded i, h: 900, b top: 300, tf top: 20, b bottom: 300, tf bottom: 20, tw: 8 }",
    "{ shape: box girder }",
    "{ shape: stated, area: 5000, perimeter: 1200 }",
    "12 m",
];
const ROLES: &[&str] = &["beam", "column", "brace", "tie", "hanger", "truss chord", "bem"];
const STEELS: &[&str] = &["S355", "S235", "A992", "{ yield: 350 MPa }", "S999"];
const PERIODS: &[&str] = &[
    "15",
    "30",
    "60",
    "R90",
    "240",
    "{ none: yes, because: off the route }",
    "soon",
];
const FIRES: &[&str] = &[
    "standard",
    "external",
    "hydrocarbon",
    "slow heating",
    "plant",
    "odd points",
    "bonfire",
];
const TEMPERATURES: &[&str] = &["300", "500", "550", "620", "750", "1250", "{ value: 540, by: checker }"];
const LOADINGS: &[&str] = &[
    "{ utilisation: 0.6 }",
    "{ utilisation: 1.2 }",
    "{ utilisation: 0.005 }",
    "{ ambient utilisation: 0.8, reduction: 0.65 }",
    "{ load ratio: 0.5 }",
    "{ axial: 300 kN }",
    "{ axial: 300 kN, buckling length: 2.1 m }",
    "{ axial: 90 MN, buckling length: 2.1 m }",
    "{ axial: -20 kN }",
    "{ bending: 60 kNm }",
    "{ bending: 60 kNm, lateral length: 3 m }",
    "{ bending: 60 kNm, axial: 100 kN, buckling length: 3 m, lateral length: 0 m }",
    "{ bending minor: 5 kNm, shear: 20 kN }",
    "{ shear: 900 kN }",
    "heavy",
];
const PROTECTIONS: &[&str] = &[
    "none",
    "grey board",
    "white spray",
    "old spray",
    "red film",
    "stock film",
    "fitted spray",
    "black box",
    "{ product: grey board, thickness: 15 }",
    "{ product: grey board, thickness: 20, layers: 2 }",
    "{ product: grey board, thickness: 70, form: profile }",
    "{ product: white spray, thickness: 5 }",
    "{ product: red film, dft: 900, reading: 300 }",
    "{ product: red film, dft: 90 }",
    "{ product: grey board, thickness: thick }",
    "{ thickness: 20 }",
];
const EXPOSURES: &[&str] = &[
    "all round",
    "three sides",
    "flange only",
    "{ covered: [left] }",
    "{ covered: [top, bottom, left, right] }",
    "{ perimeter: 600 }",
    "two sides",
];
const SHIELDS: &[&str] = &[
    "slab",
    "wall",
    "none",
    "{ deck: { concrete: yes } }",
    "{ deck: { concrete: yes, contact: 0.5 } }",
    "{ deck: { concrete: no } }",
];
const SURFACES: &[&str] = &["galvanised", "{ galvanised: { to: EN ISO 1461, category: A } }"];
const OTHERS: &[&str] = &[
    "openings: { shape: circular, diameter: 150, spacing: 300 }",
    "taper: { depth at end: 200 }",
    "environment: X",
    "group: nowhere",
    "fier: hydrocarbon",
    "fire: standard, fire: hydrocarbon",
    "location: { levl: 2 }",
    "lenght: 7",
    "wholly strange: 7",
    "length: long",
];

/// Products beside those of the examples: a film of few stock thicknesses, one that is not yet computed, one that says
/// little of itself.
const MORE_PRODUCTS: &str = "protection: 1
products:
  stock film:
    kind: coating
    method: assessed table
    thicknesses: [0.3, 0.6]
    tables:
      - { period: 60, shape: open, sides: 4, steel temperature: [450, 650], rows: { 60: [560, 300], 280: [2600, 1540] } }
  fitted spray:
    kind: spray
    method: regression
    coefficients: [1, 2, 3, 4, 5, 6, 7, 8]
  black box: { kind: board, method: constant properties, conductivity: 0.2, specific heat: 1000, density: 800 }
";

const HEAD: &str = "steelwork: 1
libraries: [demo.protection.yaml, more.protection.yaml]
fires:
  plant: { kind: parametric, opening factor: 0.06, fire load: 511, thermal inertia: 1160, floor area: 180, enclosure area: 480, growth: medium }
  odd points: { kind: points, points: [[0, 20], [10, 700], [60, 300]] }
members:
";

/// A key with one of its values, or without.
fn key(name: &'static str, values: &'static [&'static str], share: f64) -> impl Strategy<Value = String> {
    proptest::option::weighted(share, select(values))
        .prop_map(move |value| value.map_or_else(String::new, |value| format!(", {name}: {value}")))
}

fn member() -> impl Strategy<Value = String> {
    let wanted = (
        key("section", SECTIONS, 0.97),
        key("role", ROLES, 0.97),
        key("steel", STEELS, 0.97),
        key("period", PERIODS, 0.97),
        key("fire", FIRES, 0.3),
    );
    let heat = (
        key("critical temperature", TEMPERATURES, 0.5),
        key("loading", LOADINGS, 0.6),
        key("protection", PROTECTIONS, 0.8),
    );
    let cover = (
        key("exposure", EXPOSURES, 0.4),
        key("shielded by", SHIELDS, 0.4),
        key("surface", SURFACES, 0.1),
        proptest::option::weighted(0.1, select(OTHERS)),
    );
    (wanted, heat, cover).prop_map(|((a, b, c, d, e), (f, g, h), (i, j, k, other))| {
        let other = other.map_or_else(String::new, |other| format!(", {other}"));
        format!("{{ mark: B1{a}{b}{c}{d}{e}{f}{g}{h}{i}{j}{k}{other} }}")
    })
}

fn files(member: &str) -> Vec<(String, String)> {
    vec![
        ("frame.steelwork.yaml".to_owned(), format!("{HEAD}  - {member}\n")),
        ("demo.protection.yaml".to_owned(), EXAMPLE_LIBRARY.to_owned()),
        ("more.protection.yaml".to_owned(), MORE_PRODUCTS.to_owned()),
    ]
}

/// The errors of the member that its verdict must tell too. Where it stands and how long it is change no verdict, nor
/// does the air around its coating.
fn errors(checked: &Checked) -> Vec<&'static str> {
    let own = checked.findings.iter().filter(|finding| {
        let aside = finding.name() == "coating-environment"
            || finding.message.contains("`levl`")
            || finding.message.contains("`lenght`")
            || finding.message.contains("a length in m is wanted");
        finding.mark.as_deref() == Some("B1") && finding.severity == Severity::Error && !aside
    });
    own.map(|finding| finding.name()).collect()
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 1500, failure_persistence: None, ..ProptestConfig::default() })]

    #[test]
    fn verdict_and_findings_agree(member in member()) {
        let checked = check_files(files(&member));
        let said = || format!("{member}\n{:#?}\n{:#?}", checked.outcomes, messages(&checked));
        prop_assert_eq!(checked.outcomes.len(), 1, "{}", said());
        let errors = errors(&checked);
        match checked.outcomes[0].verdict {
            Verdict::Passes => prop_assert!(errors.is_empty(), "{}", said()),
            Verdict::Fails | Verdict::CannotBeProtected | Verdict::NotVerified => {
                prop_assert!(!errors.is_empty(), "{}", said());
            }
            Verdict::NoPeriod => {}
        }
        for finding in &checked.findings {
            prop_assert_eq!(find(finding.name()), Some(finding.declaration));
            let file = checked.design.files.iter().find(|file| *file.path == *finding.place.path).unwrap();
            prop_assert!(file.text.get(finding.place.span.start as usize..finding.place.span.end as usize).is_some());
            prop_assert!(!finding.message.contains("NaN") && !finding.message.contains("inf "), "{}", said());
            prop_assert!(!finding.message.trim_end_matches("..").ends_with('.'), "{}", said());
            prop_assert!(!finding.message.contains("this member"), "{}", said());
            for fix in &finding.fixes {
                let after = check_files(mended(&checked, fix));
                let broken = |checked: &Checked| names(checked).contains(&"unreadable-yaml");
                prop_assert!(broken(&checked) || !broken(&after), "{}\n{}", fix.title, said());
                prop_assert_eq!(after.outcomes.len(), 1);
            }
        }
    }
}

#[test]
fn what_an_error_hides_proves_nothing() {
    let sound = "steelwork: 1
libraries: [demo.protection.yaml]
defaults: { role: beam, steel: S355, period: 15, critical temperature: 550 }
groups:
  floors: { exposure: three sides, fire: external }
members:
  - { mark: B1, group: floors, section: HE 300 B, shielded by: slab }
";
    let verdict = |text: &str| {
        let checked = crate::check(text);
        (checked.outcomes.first().map(|outcome| outcome.verdict), checked)
    };
    let (passes, checked) = verdict(sound);
    assert_eq!(passes, Some(Verdict::Passes), "{:#?}", messages(&checked));
    for (what, broken) in [
        ("fire: external }", "fire: 'external }"),
        ("fire: external }", "fire external } }"),
        ("floors: {", "flors: {"),
        ("section: HE", "section HE"),
        (
            "period: 15, critical temperature: 550 }",
            "period: 15, critical temperature: 550, fire: 'hydrocarbon }",
        ),
        ("defaults: { role", "defaults: { fire: hydrocarbon } }\n  { role"),
        ("defaults: {", "defaults {"),
        ("defaults: {", "defalts: { fire: hydrocarbon }\ndefaults: {"),
        ("defaults: {", "defaults: { fier: hydrocarbon, "),
        ("floors: {", "floors: { fier: hydrocarbon, "),
        ("mark: B1,", "mark: B1, fier: hydrocarbon, "),
        ("mark: B1,", "mark: B1, fire: standard, fire: hydrocarbon, "),
        ("groups:", "basis: { methd: ASCE 29-05 }\ngroups:"),
        ("groups:", "basis: { factors: { gamma M fi: 1x1 } }\ngroups:"),
    ] {
        assert!(sound.contains(what), "{what}");
        let (verdict, checked) = verdict(&sound.replace(what, broken));
        assert!(
            matches!(verdict, None | Some(Verdict::NotVerified)),
            "{broken}: {verdict:?} {:#?}",
            messages(&checked)
        );
        let errors = checked
            .findings
            .iter()
            .any(|finding| finding.severity == Severity::Error);
        assert!(errors, "{broken}: {:#?}", messages(&checked));
        // The schedule names what keeps a member from being verified, wherever that stands.
        for row in schedule(std::slice::from_ref(&checked)).members {
            assert!(!row.findings.is_empty(), "{broken}: {:#?}", messages(&checked));
        }
    }
}

#[test]
fn what_may_be_a_load_is_told_once_where_it_stands() {
    let member = |rest: &str| {
        let checked = crate::check(&format!(
            "- {{ mark: B1, section: HE 300 B, exposure: three sides, shielded by: slab, protection: grey board, {rest} }}"
        ));
        assert_eq!(checked.outcomes[0].verdict, Verdict::NotVerified, "{rest}");
        let mut told = names(&checked);
        told.retain(|name| *name != "unused-product");
        told
    };
    for (rest, told) in [
        ("loading: { utilisation: 0,55 }", "wrong-kind"),
        ("loading: heavy", "wrong-kind"),
        ("loading: { utilisation: 55 kN }", "wrong-unit"),
        ("critical temperature: 550 mm", "wrong-unit"),
        ("critical temperature: hot", "wrong-kind"),
        ("loadng: { utilisation: 0.55 }", "unknown-key"),
        ("role: column, loading: { utilisation: 0,55 }", "wrong-kind"),
        ("role: column, group: nowhere", "unknown-group"),
    ] {
        assert_eq!(member(rest), [told], "{rest}");
    }
}
