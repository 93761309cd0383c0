//! Symbols, folds, links, growing selections and the lines above file and groups.

use scorchline::editor::folding::folding;
use scorchline::editor::lens::lenses;
use scorchline::editor::links::links;
use scorchline::editor::selection::selection;
use scorchline::editor::symbols::{Symbol, SymbolKind, document, workspace};
use scorchline::report::schedule::schedule;

use crate::fixture::{Fixture, several};

const HEAD: &str = "# Two lines that say
# what this is.
steelwork: 1
basis:
  currency: EUR
  rates: { steel: 2 }
libraries: [\"demo.protection.yaml\"]
parts:
  - roof.steelwork.yaml

fires:
  plant room: { kind: points, points: [[0, 20], [30, 800], [90, 700]] }
defaults: { role: beam, steel: S355, period: 60, critical temperature: 550 }
groups:
  # The floors.
  floors:
    section: IPE 360
    protection: { product: grey board, thickness: 20 }
  lost: { fire: plant room }

members:   # all of them
  # The first.
  - mark: B1
    group: floors
    count: 3
    length: 6

  # The second.
  - mark: B2
    group: floors
    length: 4
  - { mark: B3, section: IPE 200, length: 5 }
  - { mark: C1, section: { shape: welded i, h: 300, b: 200, tw: 10, tf: 15 }, count: 2 }
  - { section: IPE 200 }
";
const ROOF: &str = "steelwork: 1
part of: 'frame.steelwork.yaml'
members:
  - { mark: R1, group: floors, length: 8, protection: white spray }
";
const LIBRARY: &str = "protection: 1
products:
  grey board: { kind: board, method: constant properties, conductivity: 0.17, specific heat: 1050, density: 780,
    thicknesses: [15, 20, 25], assessed: { section factor: [40, 320], thickness: [15, 60], steel temperature: [350, 700],
    period: [30, 240], shapes: [open, hollow], orientation: [beam, column] }, price: { per m2: 30 } }
";

fn in_file(name: &str, head: &str) -> Fixture {
    let mut fixture = several(&[
        ("frame.steelwork.yaml", head),
        ("roof.steelwork.yaml", ROOF),
        ("demo.protection.yaml", LIBRARY),
    ]);
    let files = &fixture.checked.design.files;
    fixture.file = files.iter().position(|file| file.path.to_str() == Some(name)).unwrap();
    fixture
}

fn told(symbols: &[Symbol], text: &str, depth: usize, out: &mut Vec<String>) {
    for symbol in symbols {
        assert!(symbol.span.start <= symbol.name_span.start && symbol.name_span.end <= symbol.span.end);
        let detail = symbol.detail.as_deref().unwrap_or("-");
        let line = text[..symbol.name_span.start as usize].matches('\n').count() + 1;
        out.push(format!("{}{line} {}: {detail}", "  ".repeat(depth), symbol.name));
        for child in &symbol.children {
            assert!(
                symbol.span.start <= child.span.start && child.span.end <= symbol.span.end,
                "{child:?}"
            );
        }
        told(&symbol.children, text, depth + 1, out);
    }
}

#[test]
fn a_file_shows_what_it_holds() {
    let fixture = in_file("frame.steelwork.yaml", HEAD);
    let view = fixture.view();
    let mut out = Vec::new();
    told(&document(&view), view.text(), 0, &mut out);
    let wanted = [
        "11 fires: 1",
        "  12 plant room: -",
        "14 groups: 2",
        "  16 floors: -",
        "  19 lost: -",
        "21 members: 5",
        "  23 B1: IPE 360, passes",
        "  29 B2: IPE 360, passes",
        "  32 B3: IPE 200, fails",
        "  33 C1: welded i, fails",
        "  34 (no name): IPE 200, fails",
    ];
    assert_eq!(out, wanted);
    let fixture = in_file("demo.protection.yaml", HEAD);
    let mut out = Vec::new();
    told(&document(&fixture.view()), LIBRARY, 0, &mut out);
    assert_eq!(out, ["2 products: 1", "  3 grey board: board"]);
}

#[test]
fn names_are_found_across_files() {
    let fixture = in_file("frame.steelwork.yaml", HEAD);
    let found = |query: &str, most: usize| {
        let design = (&*fixture.checked.design, &fixture.checked.outcomes[..]);
        // Asked twice, as a file that serves two designs would be.
        let found = workspace([design, design], query, most);
        let told = found.into_iter().map(|symbol| {
            let place = fixture.told(&[symbol.place]).remove(0);
            format!("{place} {}", symbol.detail.unwrap_or_default())
        });
        told.collect::<Vec<_>>()
    };
    assert_eq!(found("R1", 100), ["roof:4: R1 IPE 360, not verified"]);
    assert_eq!(
        found("b", 100),
        [
            "frame:23: B1 IPE 360, passes",
            "frame:29: B2 IPE 360, passes",
            "frame:32: B3 IPE 200, fails",
            "demo:3: grey board board"
        ]
    );
    assert_eq!(found("b2", 1), ["frame:29: B2 IPE 360, passes"]);
    assert_eq!(found("1", 2).len(), 2);
    assert_eq!(found("", 100).len(), 9);
    assert!(found("nothing", 100).is_empty());
    let kind = workspace([(&*fixture.checked.design, &fixture.checked.outcomes[..])], "PLANT", 9)[0].kind;
    assert_eq!(kind, SymbolKind::Fire);
}

#[test]
fn paths_are_links_without_their_quotes() {
    let fixture = in_file("frame.steelwork.yaml", HEAD);
    let view = fixture.view();
    let told: Vec<_> = links(&view)
        .iter()
        .map(|link| (link.span.slice(view.text()), link.written))
        .collect();
    assert_eq!(
        told,
        [
            ("demo.protection.yaml", "demo.protection.yaml"),
            ("roof.steelwork.yaml", "roof.steelwork.yaml")
        ]
    );
    let fixture = in_file("roof.steelwork.yaml", HEAD);
    let view = fixture.view();
    let link = links(&view)[0];
    assert_eq!(
        (link.span.slice(view.text()), link.written),
        ("frame.steelwork.yaml", "frame.steelwork.yaml")
    );
}

fn folds(fixture: &Fixture) -> Vec<(usize, usize, bool)> {
    let view = fixture.view();
    let line = |offset: u32| view.text()[..offset as usize].matches('\n').count() + 1;
    let folds = folding(&view);
    folds
        .iter()
        .map(|fold| (line(fold.span.start), line(fold.span.end), fold.comment))
        .collect()
}

#[test]
fn entries_lists_items_and_comments_fold() {
    let wanted = [
        (1, 2, true),
        (4, 6, false),
        (8, 9, false),
        (11, 12, false),
        (14, 19, false),
        (16, 18, false),
        (21, 34, false),
        (23, 26, false),
        (29, 31, false),
    ];
    assert_eq!(folds(&in_file("frame.steelwork.yaml", HEAD)), wanted);
    let crlf = HEAD.replace('\n', "\r\n");
    assert_eq!(folds(&in_file("frame.steelwork.yaml", &crlf)), wanted);
    assert_eq!(
        folds(&in_file("demo.protection.yaml", HEAD)),
        [(2, 5, false), (3, 5, false)]
    );
}

#[test]
fn a_selection_grows_along_the_tree() {
    let with_cursor = HEAD.replace("thickness: 20 }", "thickness: 2|0 }");
    let fixture = in_file("frame.steelwork.yaml", &with_cursor);
    let view = fixture.view();
    let spans = selection(&view, fixture.offset);
    let told: Vec<&str> = spans.iter().map(|span| span.slice(view.text())).collect();
    assert_eq!(
        told[..4],
        [
            "20",
            "thickness: 20",
            "{ product: grey board, thickness: 20 }",
            "protection: { product: grey board, thickness: 20 }"
        ]
    );
    assert_eq!(told.last(), Some(&HEAD));
    assert!(
        told.iter()
            .any(|text| text.starts_with("groups:") && text.ends_with("plant room }"))
    );
    // Whatever the offset: each holds the one before it, and more.
    for offset in 0..=u32::try_from(HEAD.len()).unwrap() {
        let spans = selection(&view, offset);
        assert!(!spans.is_empty() && spans[0].touches(offset));
        for pair in spans.windows(2) {
            assert!(pair[1].start <= pair[0].start && pair[0].end <= pair[1].end && pair[0] != pair[1]);
        }
    }
}

#[test]
fn file_and_groups_tell_what_they_come_to() {
    let fixture = in_file("frame.steelwork.yaml", HEAD);
    let view = fixture.view();
    let lenses = lenses(&view);
    let told: Vec<(&str, &str)> = lenses
        .iter()
        .map(|lens| (lens.span.slice(view.text()), lens.title.as_str()))
        .collect();
    // IPE 360 weighs 57.1 kg/m by its area of 7,273 mm² and 7,850 kg/m³: 22 m of B1 and B2, 8 m of R1. R1 has a product
    // that no library describes, so that its cost is not known, nor that of C1 and of the last, whose length is lacking.
    assert_eq!(told.len(), 3);
    assert_eq!(told[0].0, "#");
    assert!(
        told[0].1.starts_with("5 marks, 8 members, at least 1.4 t, "),
        "{}",
        told[0].1
    );
    assert!(told[0].1.contains(", 3 fail"), "{}", told[0].1);
    assert_eq!(told[1].0, "floors");
    assert!(told[1].1.starts_with("3 marks, 5 members, 1.7 t, "), "{}", told[1].1);
    assert!(told[1].1.ends_with(", 1 not verified"), "{}", told[1].1);
    assert_eq!(told[2], ("lost", "no members"));
    assert!(lenses[1].sums.cost_incomplete);
}

#[test]
fn the_lens_of_a_file_says_what_its_schedule_says() {
    let single = several(&[
        (
            "frame.steelwork.yaml",
            &HEAD.replace("parts:\n  - roof.steelwork.yaml\n", ""),
        ),
        ("demo.protection.yaml", LIBRARY),
    ]);
    let lens = lenses(&single.view()).remove(0);
    assert_eq!(lens.sums.totals, schedule(&[single.checked]).totals);
    assert!(lens.sums.totals.cost.is_some());
}
