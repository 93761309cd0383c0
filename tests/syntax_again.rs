//! Splitting a changed text again gives what splitting it whole gives, or nothing.

use proptest::prelude::*;
use scorchline::syntax::outline::{ListSection, Outline, Piece, TopEntry, again, outline};
use scorchline::text::Change;

const FILES: [&str; 4] = [
    "steelwork: 1\n# a\ngroups:\n  a: { period: 60 }\nmembers:\n  - mark: B1\n    section: IPE 300\n    note: |\n      x\n\n  # between\n  - { mark: B2, section: IPE 330 }\n  - mark: Träger 梁 😀\n    supported by: [B1,\n      B2]\n  - mark: B4\n",
    "steelwork: 1\r\nmembers:\r\n- mark: B1\r\n  section: IPE 300\r\n- mark: B2\r\n  section: IPE 330\r\n\r\n- mark: B3\r\nproducts:\r\n  x: {}\r\n",
    "\u{feff}members:\n- mark: B1\n- mark: B2\n  loading: { utilisation: 0.5 }\n- mark: B3\n- mark: B4\n- mark: B5\n...\n",
    "steelwork: 1\nmembers:\n  - mark: B1\n    x: &a 1\n  - mark: B2\n    x: 2\n  - mark: B3\n    y: *a\n  - mark: B4\n    y: 3",
];

fn list(outline: &Outline) -> Option<&ListSection> {
    outline.entries.iter().find_map(|entry| match entry {
        TopEntry::List(list) if list.key == "members" => Some(list),
        _ => None,
    })
}

/// The old outline with the change put in.
fn spliced(old: &Outline, change: Change, resplit: &scorchline::syntax::outline::Resplit) -> Outline {
    let by = |start: u32| start + u32::try_from(change.added).unwrap() - u32::try_from(change.removed).unwrap();
    let behind = |piece: &Piece| {
        if piece.span.start as usize > change.at {
            piece.moved(by(piece.span.start))
        } else {
            piece.clone()
        }
    };
    let entries = old.entries.iter().map(|entry| match entry {
        TopEntry::List(list) if list.key == "members" => {
            let mut items: Vec<Piece> = list.items[..resplit.old.start].to_vec();
            items.extend(resplit.new.iter().cloned());
            items.extend(list.items[resplit.old.end..].iter().map(behind));
            TopEntry::List(ListSection { items, ..list.clone() })
        }
        TopEntry::List(list) => {
            let moved = list.key_span.start as usize > change.at;
            let mut key_span = list.key_span;
            if moved {
                key_span.start = by(key_span.start);
                key_span.end = by(key_span.end);
            }
            let items = list.items.iter().map(behind).collect();
            TopEntry::List(ListSection {
                items,
                key_span,
                ..list.clone()
            })
        }
        TopEntry::Head(piece) => TopEntry::Head(behind(piece)),
    });
    Outline {
        entries: entries.collect(),
        ..old.clone()
    }
}

fn put() -> impl Strategy<Value = String> {
    prop_oneof![
        4 => "[a-z0-9 ]{0,3}",
        2 => prop_oneof![
            Just("\n"), Just("\n  - "), Just("- "), Just("\r"), Just("\t"), Just("  "), Just("\n- mark: B9\n"),
            Just("&x "), Just("*a"), Just("---\n"), Just("...\n"), Just("\n...\n"), Just("\nx: 1\n"), Just("{"), Just("]"),
            Just("\"'"), Just("#"), Just("? "), Just(": "), Just("|\n"), Just("😀"), Just("\u{feff}"), Just("mark: "),
        ].prop_map(str::to_owned),
    ]
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(4000))]
    #[test]
    fn splitting_again_is_splitting_whole(
        file in 0..FILES.len(),
        edits in proptest::collection::vec((0.0..1.0_f64, 0..6_usize, put()), 1..4),
    ) {
        let mut text = FILES[file].to_owned();
        for (at, gone, put) in edits {
            let cut = |at: usize| (0..=at.min(text.len())).rev().find(|at| text.is_char_boundary(*at)).unwrap();
            let from = cut((at * text.len() as f64) as usize);
            let to = cut(from + gone).max(from);
            let mut new = text.clone();
            new.replace_range(from..to, &put);
            let old = outline(&text);
            if let (true, Some(members), Some(change)) = (old.steady, list(&old), Change::between(&text, &new)) {
                let items: Vec<&Piece> = members.items.iter().collect();
                if let Some(resplit) = again(&text, &new, change, members.key_span, &items) {
                    prop_assert_eq!(spliced(&old, change, &resplit), outline(&new), "{:?} -> {:?}", text, new);
                }
            }
            text = new;
        }
    }
}

#[test]
fn a_value_typed_within_a_member_splits_two_items() {
    let old = FILES[0];
    let new = old.replace("IPE 330", "IPE 33");
    let outline = outline(old);
    assert!(outline.steady);
    let members = list(&outline).unwrap();
    let items: Vec<&Piece> = members.items.iter().collect();
    let change = Change::between(old, &new).unwrap();
    let resplit = again(old, &new, change, members.key_span, &items).unwrap();
    assert_eq!(resplit.old, 0..2);
    assert_eq!(resplit.new.len(), 2);
}
