//! A slip of a person typing blanks its own member only, and is reported once, at the very characters.

use scorchline::syntax::Value;
use scorchline::syntax::file::{File, read};

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

/// The kinds of damage: the item, the characters that are to be shown, and the keys that survive with their values.
const DAMAGE: &[(&str, &str, &[&str])] = &[
    (
        "  - mark: B4\n\t  role: beam\n    section: IPE 300\n",
        "\t  ",
        &["mark", "role", "section"],
    ),
    (
        "  - mark: B4\n\trole: beam\n\tsection: IPE 300\n",
        "\t",
        &["mark", "role", "section"],
    ),
    (
        "  - mark: B4\n    role: beam\n    section HE 240 B\n",
        "section HE 240 B",
        &["mark", "role"],
    ),
    (
        "  - mark: B4\n    role: beam\n    section:IPE 300\n",
        ":",
        &["mark", "role", "section"],
    ),
    (
        "  - mark: B4\n      role: beam\n    section: IPE 300\n",
        "      ",
        &["mark", "role", "section"],
    ),
    (
        "  - mark: B4\n   role: beam\n    section: IPE 300\n",
        "   ",
        &["mark", "role", "section"],
    ),
    (
        "  - mark: B4\n  role: beam\n    section: IPE 300\n",
        "  ",
        &["mark", "role"],
    ),
    (
        "  - mark: B4\n    protection: { product: x, thickness\n    section: IPE 300\n",
        "{",
        &["mark", "protection", "section"],
    ),
    (
        "  - mark: B4\n    steadies: [B1, B2\n    section: IPE 300\n",
        "[",
        &["mark", "steadies", "section"],
    ),
    (
        "  - mark: B4\n    note: \"to be agreed\n    section: IPE 300\n",
        "\"to be agreed",
        &["mark", "section"],
    ),
    (
        "  - mark: B4\n    note: 'to be agreed\n    section: IPE 300\n",
        "'to be agreed",
        &["mark", "section"],
    ),
    (
        "  - mark: B4\n    note: 'it's agreed'\n    section: IPE 300\n",
        "s agreed'",
        &["mark", "section"],
    ),
    (
        "  - mark: B4\n    note: \"C:\\drawings\"\n    section: IPE 300\n",
        "\\d",
        &["mark", "section"],
    ),
    (
        "  - mark: B4\n    location: { level: 2 }}\n    section: IPE 300\n",
        "}",
        &["mark", "location", "section"],
    ),
    (
        "  - mark: B4\n    location: { level: 2 ]\n    section: IPE 300\n",
        "]",
        &["mark", "location", "section"],
    ),
    (
        "  - mark: ]B4\n    role: beam\n    section: IPE 300\n",
        "]",
        &["role", "section"],
    ),
    (
        "  - { mark: B4, role: beam section: IPE 300 }\n",
        "section",
        &["mark", "section"],
    ),
    ("  - { mark: \"B4\" role: beam }\n", "r", &["mark", "role"]),
    (
        "  - mark: B4\n    loading: *missing\n    section: IPE 300\n",
        "*missing",
        &["mark", "section"],
    ),
    (
        "  - mark: B4\n    note: @home\n    section: IPE 300\n",
        "@",
        &["mark", "section"],
    ),
    (
        "  - mark: B4\n    note: `home`\n    section: IPE 300\n",
        "`",
        &["mark", "section"],
    ),
    (
        "  - mark: B4\n    note: a: b\n    section: IPE 300\n",
        ":",
        &["mark", "section"],
    ),
    (
        "  - mark: B4\n    loading:\n      axial 20\n      shear: 3\n    section: IPE 300\n",
        "axial 20",
        &["mark", "section"],
    ),
    (
        "  - mark: B4\n    loading\n      axial: 20\n    section: IPE 300\n",
        "loading",
        &["mark", "loading", "section"],
    ),
    (
        "  - mark: B4\n    departures:\n      - { from: x\n      - { from: y }\n",
        "{",
        &["mark", "departures"],
    ),
    ("  -mark: B4\n    role: beam\n", "-", &["mark", "role"]),
    ("  -mark: B4\n   role: beam\n", "-", &["mark", "role"]),
    ("   - mark: B4\n     role: beam\n", "   ", &["mark", "role"]),
    (" - mark: B4\n   role: beam\n", " ", &["mark", "role"]),
    ("  mark: B4\n", "mark: B4", &["mark"]),
    (
        "  - mark: B4\n    loading: {\n    axial: 20 }\n",
        "a",
        &["mark", "loading"],
    ),
    (
        "  - mark: B4\n    loading: {\n      axial: 20\n    }\n",
        "}",
        &["mark", "loading"],
    ),
    (
        "  - mark: B4\n    note: a\0b\n    role: beam\n",
        "\0",
        &["mark", "role"],
    ),
    (
        "  - mark: B4\n    note: |x\n      text\n    role: beam\n",
        "|",
        &["mark", "role"],
    ),
    (
        "  - mark: B4\n    note: a # b\n      c\n    role: beam\n",
        "#",
        &["mark", "role"],
    ),
];

fn kept(value: Option<&Value>) -> Vec<String> {
    let Some(Value::Mapping(entries)) = value else {
        return Vec::new();
    };
    entries
        .iter()
        .filter(|entry| entry.value.value != Value::Unreadable)
        .filter_map(|entry| match &entry.key.value {
            Value::Scalar(key) => Some(key.text.clone()),
            _ => None,
        })
        .collect()
}

fn check(name: &str, file: &File, text: &str, shown: &str, keys: &[&str], wrong: &mut Vec<String>) {
    let errors = file.all_errors();
    let found: Vec<&str> = errors.iter().map(|error| error.span.slice(text)).collect();
    if found != [shown] {
        wrong.push(format!("{name}: shows {found:?}, not `{shown}`: {errors:#?}"));
    }
    let members = &file.lists[0].items;
    if members.len() != 10 && keys != [""; 0] {
        wrong.push(format!("{name}: {} members", members.len()));
        return;
    }
    for (at, item) in members.iter().enumerate().filter(|(at, _)| *at != 4) {
        let keys = kept(item.tree.root.as_ref().map(|root| &root.value));
        if item.tree.broken && members.len() == 10 || keys != ["mark", "role", "section"] {
            wrong.push(format!("{name}: member {at} is damaged too"));
        }
    }
    if let Some(item) = members.get(4) {
        let found = kept(item.tree.root.as_ref().map(|root| &root.value));
        for key in keys {
            if !found.iter().any(|k| k == key) {
                wrong.push(format!("{name}: loses {key}, keeps {found:?}"));
            }
        }
    }
}

#[test]
fn damage_blanks_its_own_member_only() {
    let mut wrong = Vec::new();
    for (item, shown, keys) in DAMAGE {
        let text = damaged(item);
        check(item, &read(&text), &text, shown, keys, &mut wrong);
        let crlf = text.replace('\n', "\r\n");
        check(&format!("CRLF {item}"), &read(&crlf), &crlf, shown, keys, &mut wrong);
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}

#[test]
fn a_repair_mends_its_damage() {
    for (item, _, _) in DAMAGE {
        let text = damaged(item);
        let Some(repair) = read(&text).all_errors().remove(0).repair else {
            continue;
        };
        let mut mended = text.clone();
        for edit in repair.edits.iter().rev() {
            mended.replace_range(edit.span.start as usize..edit.span.end as usize, &edit.text);
        }
        let left = read(&mended).all_errors();
        assert!(left.is_empty(), "{item}\n{}\n{left:#?}", repair.title);
    }
}
