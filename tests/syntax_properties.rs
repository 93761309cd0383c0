//! A file read item by item is the file read whole, and both hold what serde_yaml reads; no edit of it makes a panic.

use std::path::PathBuf;
use std::sync::Arc;

use proptest::prelude::*;
use scorchline::analysis::read::read;
use scorchline::syntax::outline::outline;
use scorchline::syntax::recover::parse_item;
use scorchline::syntax::tree::parse;
use scorchline::syntax::{Node, Value};

/// The value as serde_yaml has it, every scalar as text.
fn plain(node: &Node) -> serde_yaml::Value {
    match &node.value {
        Value::Null => serde_yaml::Value::Null,
        Value::Scalar(scalar) => scalar.text.clone().into(),
        Value::Sequence(nodes) => nodes.iter().map(plain).collect::<Vec<_>>().into(),
        Value::Mapping(entries) => {
            let pairs = entries.iter().map(|entry| (plain(&entry.key), plain(&entry.value)));
            serde_yaml::Value::Mapping(pairs.collect())
        }
    }
}

/// A member in one of several styles; every scalar is text in both readings.
fn member() -> impl Strategy<Value = String> {
    let name = "[A-Za-zé梁]{1,6}";
    (name, name, 0..6_usize, any::<bool>()).prop_map(|(mark, note, style, comment)| {
        let tail = if comment { "  # - mark: no: item" } else { "" };
        match style {
            0 => format!("  - {{ mark: m{mark}, note: \"n: {note}\" }}{tail}\n"),
            1 => format!("  - mark: m{mark}{tail}\n    note: 'it''s {note}'\n"),
            2 => format!("  - mark: m{mark}\n    note: |{tail}\n      - {note}: x\n      # {note}\n"),
            3 => format!("  - mark: m{mark}\n\n    # note\n    location: {{ level: l{note},\n      grid: g }}\n"),
            4 => format!("  -   mark: m{mark}{tail}\n      note: n{note}\n        goes on\n"),
            _ => format!("  -\n    mark: m{mark}\n    departures:\n      - from: f{note}\n"),
        }
    })
}

fn file() -> impl Strategy<Value = String> {
    (prop::collection::vec(member(), 0..8), any::<bool>(), any::<bool>()).prop_map(|(members, crlf, blank)| {
        let gap = if blank { "\n# between\n" } else { "" };
        let text = format!(
            "steelwork: one\n{gap}groups:\n  a: {{ role: beam }}\n  b:\n    role: column\nmembers:\n{}",
            members.join(gap)
        );
        if crlf { text.replace('\n', "\r\n") } else { text }
    })
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 256, failure_persistence: None, ..ProptestConfig::default() })]

    #[test]
    fn split_equals_whole_equals_serde_yaml(text in file()) {
        let whole = parse(&text);
        prop_assert!(whole.errors.is_empty(), "{:?}", whole.errors);
        let whole = plain(&whole.root.unwrap());
        let oracle: serde_yaml::Value = serde_yaml::from_str(&text).unwrap();
        prop_assert_eq!(&whole, &oracle);
        let outline = outline(&text);
        prop_assert!(!outline.doubtful);
        let chunk = outline.chunks.iter().find(|chunk| chunk.key == "members").unwrap();
        let split: Vec<serde_yaml::Value> = chunk
            .items
            .iter()
            .map(|span| plain(&parse_item(span.slice(&text), true).node.unwrap()))
            .collect();
        let listed = match &oracle["members"] {
            serde_yaml::Value::Sequence(list) => list.clone(),
            _ => Vec::new(),
        };
        prop_assert_eq!(split, listed);
    }

    #[test]
    fn no_edit_makes_a_panic(text in file(), at in 0.0..1.0_f64, cut in 0..12_usize, put in "[-{}\\[\\]:\"'|>&*#@\t\n ,a]{0,4}") {
        let mut chars: Vec<char> = text.chars().collect();
        let from = (chars.len() as f64 * at) as usize;
        let to = (from + cut).min(chars.len());
        chars.splice(from..to, put.chars());
        let text: String = chars.into_iter().collect();
        let file = read(Arc::new(PathBuf::from("a.steelwork.yaml")), Arc::from(text.as_str()));
        let errors = file.errors.iter().chain(file.members.iter().flat_map(|item| &item.decoded.errors));
        for error in errors {
            prop_assert!(error.span.start <= error.span.end && error.span.end as usize <= text.len());
        }
    }
}
