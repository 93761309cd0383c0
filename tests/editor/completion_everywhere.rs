//! What is offered at every offset of many texts is sound.

use scorchline::editor::completion::{Completion, CompletionKind, MOST};
use scorchline::findings::registry::EXAMPLE_LIBRARY;

use crate::completion::{HEAD, applied, asked};
use crate::fixture::{Fixture, several};

/// Every text of the scenario, whole and broken off, with every offset of it that `step` leaves.
fn everywhere(files: &[(&str, &str)], name: &str, step: usize, mut each: impl FnMut(&Fixture, &str)) {
    let mut fixture = several(files);
    let path = std::path::Path::new(name);
    let place = |file: &std::sync::Arc<scorchline::analysis::source::SourceFile>| file.path.as_path() == path;
    let Some(file) = fixture.checked.design.files.iter().position(place) else {
        return;
    };
    fixture.file = file;
    let text = fixture.view().text().to_owned();
    for offset in (0..=text.len()).step_by(step) {
        fixture.offset = u32::try_from(offset).unwrap();
        each(&fixture, &text);
    }
}

fn sound(fixture: &Fixture, text: &str) {
    let found = asked(fixture);
    assert!(found.items.len() <= MOST);
    for item in &found.items {
        let (from, to) = (item.replaces.start as usize, item.replaces.end as usize);
        assert!(from <= to && text.is_char_boundary(from) && text.is_char_boundary(to));
        assert!(item.replaces.touches(fixture.offset), "{item:?} at {}", fixture.offset);
        assert!(!text[from..to].contains('\n'), "{item:?}");
    }
}

#[test]
fn nothing_breaks_at_any_offset_of_the_scenario() {
    for (name, _) in scorchline::scenario::FILES {
        everywhere(scorchline::scenario::FILES, name, 1, sound);
    }
}

#[test]
fn nothing_breaks_in_a_scenario_that_is_broken_off() {
    for (nth, (name, text)) in scorchline::scenario::FILES.iter().enumerate() {
        for cut in (0..text.len()).step_by(397).filter(|cut| text.is_char_boundary(*cut)) {
            let mut files = scorchline::scenario::FILES.to_vec();
            files[nth].1 = &text[..cut];
            let mut fixture = several(&files);
            let own = |file: &std::sync::Arc<_>| {
                let file: &scorchline::analysis::source::SourceFile = file;
                file.path.as_path() == std::path::Path::new(name)
            };
            let Some(file) = fixture.checked.design.files.iter().position(own) else {
                continue;
            };
            fixture.file = file;
            // Where one types: at the end, and a little before it.
            for back in 0..40.min(cut) {
                fixture.offset = u32::try_from(cut - back).unwrap();
                sound(&fixture, &text[..cut]);
            }
        }
    }
}

/// Members in many ways of writing.
const BLOCK: &str = "members:
  - mark: B1
    group: floors
    length: 7.5   # between grids

    section: IPE 300
    loading:
      axial: 4 kN
      buckling length: 3
    supported by:
      - C1
    protection: { product: grey board, thickness: 20, }
    departures:
      - from: protection-over-thick
        because: one board
  - { mark: C1, role: column, section: { shape: i, h: 200, b: 200, tw: 9, tf: 15 }, loading: { } }
  - mark: \"C 2\"
    steadies: [C1, ]
    exposure:

    section:
  -
";

/// How many places of a text are no YAML.
fn unreadable(text: &str) -> usize {
    scorchline::syntax::file::read(text).all_errors().len()
}

#[test]
fn what_is_chosen_leaves_a_text_that_reads() {
    let block = format!("{HEAD}{BLOCK}");
    let crlf = block.replace('\n', "\r\n");
    let mut texts: Vec<(&str, &str)> = vec![("frame.steelwork.yaml", &block), ("frame.steelwork.yaml", &crlf)];
    texts.push(scorchline::scenario::FILES[0]);
    texts.push(scorchline::scenario::FILES[3]);
    let mut count = 0;
    for (name, text) in texts {
        let before = unreadable(text);
        let files = [(name, text), ("demo.protection.yaml", EXAMPLE_LIBRARY)];
        let step = if text.len() > 3000 { 13 } else { 2 };
        everywhere(&files, name, step, |fixture, text| {
            let kept = |item: &&Completion| item.kind != CompletionKind::Section;
            for item in asked(fixture).items.iter().filter(kept) {
                let after = applied(text, item);
                assert!(
                    unreadable(&after) <= before,
                    "`{}` at {}:\n{after}",
                    item.label,
                    fixture.offset
                );
                count += 1;
            }
        });
    }
    assert!(count > 10_000, "{count}");
}

#[test]
fn what_is_chosen_where_the_text_still_ends_leaves_no_more_that_does_not_read() {
    let whole = format!("{HEAD}{BLOCK}");
    let mut count = 0;
    for cut in (HEAD.len()..whole.len()).step_by(2) {
        let text = &whole[..cut];
        let before = unreadable(text);
        let mut fixture = several(&[
            ("frame.steelwork.yaml", text),
            ("demo.protection.yaml", EXAMPLE_LIBRARY),
        ]);
        fixture.offset = u32::try_from(cut).unwrap();
        sound(&fixture, text);
        for item in asked(&fixture).items.iter().take(40) {
            let after = applied(text, item);
            assert!(unreadable(&after) <= before, "`{}`:\n{after}", item.label);
            count += 1;
        }
    }
    assert!(count > 2_000, "{count}");
}
