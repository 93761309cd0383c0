//! A slip of a person typing blanks its own member only, and is reported at the very characters.

use scorchline::syntax::recover::parse_item;
use scorchline::syntax::{Value, outline::outline};

/// A list of ten members in which one item is replaced by the damage.
fn damaged(item: &str) -> String {
    let mut text = String::from("steelwork: 1\nmembers:\n");
    for n in 0..10 {
        if n == 4 {
            text.push_str(item);
        } else {
            text.push_str(&format!("  - mark: B{n}\n    role: beam\n    section: IPE 300\n"));
        }
    }
    text
}

/// The kinds of damage: the item, the characters that are to be shown, and the keys that survive.
const DAMAGE: &[(&str, &str, &[&str])] = &[
    (
        "  - mark: B4\n\t  role: beam\n    section: IPE 300\n",
        "\t  ",
        &["mark", "section"],
    ),
    (
        "  - mark: B4\n    role: beam\n    section HE 240 B\n",
        "section HE 240 B",
        &["mark", "role"],
    ),
    (
        "  - mark: B4\n    role: beam\n    section:IPE 300\n",
        ":",
        &["mark", "role"],
    ),
    (
        "  - mark: B4\n      role: beam\n    section: IPE 300\n",
        "      ",
        &["mark", "section"],
    ),
    (
        "  - mark: B4\n   role: beam\n    section: IPE 300\n",
        "   ",
        &["mark", "section"],
    ),
    (
        "  - mark: B4\n    protection: { product: x, thickness\n    section: IPE 300\n",
        "{",
        &["mark", "section"],
    ),
    (
        "  - mark: B4\n    note: \"to be agreed\n    section: IPE 300\n",
        "\"to be agreed",
        &["mark", "section"],
    ),
    (
        "  - mark: B4\n    location: { level: 2 }}\n    section: IPE 300\n",
        "}",
        &["mark", "section"],
    ),
    ("  - { mark: B4, role: beam section: IPE 300 }\n", "", &["mark"]),
    (
        "  - mark: B4\n    loading: *missing\n    section: IPE 300\n",
        "*missing",
        &["mark", "section", "loading"],
    ),
    (
        "  - mark: B4\n    note: @home\n    section: IPE 300\n",
        "@",
        &["mark", "section"],
    ),
    (
        "  - mark: B4\n    note: a: b\n    section: IPE 300\n",
        ":",
        &["mark", "section"],
    ),
    ("  -mark: B4\n    role: beam\n", "", &[]),
];

#[test]
fn damage_blanks_its_own_member_only() {
    let mut wrong = Vec::new();
    for (item, shown, kept) in DAMAGE {
        let text = damaged(item);
        let outline = outline(&text);
        let members = outline.chunks.iter().find(|chunk| chunk.key == "members").unwrap();
        assert_eq!(members.items.len(), 10, "{item}");
        for (at, span) in members.items.iter().enumerate() {
            let read = parse_item(span.slice(&text), true);
            if read.broken != (at == 4) {
                wrong.push(format!("item {at} of {item}: {:?}", read.errors));
            }
            if at != 4 || !read.broken {
                continue;
            }
            if read.errors.len() != 1 {
                wrong.push(format!("{item}: one cause, one message: {:?}", read.errors));
                continue;
            }
            let error = &read.errors[0];
            let found = error.span.slice(span.slice(&text));
            if !shown.is_empty() && found != *shown {
                wrong.push(format!("{item}shows `{found}`, not `{shown}`: {}", error.message));
            }
            let keys: Vec<String> = match read.node.map(|node| node.value) {
                Some(Value::Mapping(entries)) => entries
                    .into_iter()
                    .filter_map(|e| {
                        if let Value::Scalar(s) = e.key.value {
                            Some(s.text)
                        } else {
                            None
                        }
                    })
                    .collect(),
                _ => Vec::new(),
            };
            for key in *kept {
                if !keys.iter().any(|k| k == key) {
                    wrong.push(format!("{item}loses {key}, keeps {keys:?}"));
                }
            }
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}
