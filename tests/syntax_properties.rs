//! Splitting a file loses and adds nothing; and no text whatever brings the reader down.

use proptest::prelude::*;
use scorchline::syntax::file::{File, comments, read};
use scorchline::syntax::{Entry, ErrorKind, Node, Value};

/// A tree without places: every scalar as text.
#[derive(Debug, Clone, PartialEq)]
enum Plain {
    Null,
    Text(String),
    List(Vec<Plain>),
    Map(Vec<(Plain, Plain)>),
}

fn plain(node: &Node) -> Plain {
    match &node.value {
        Value::Null | Value::Unreadable => Plain::Null,
        Value::Scalar(scalar) => Plain::Text(scalar.text.clone()),
        Value::Sequence(nodes) => Plain::List(nodes.iter().map(plain).collect()),
        Value::Mapping(entries) => Plain::Map(entries.iter().map(pair).collect()),
    }
}

fn pair(entry: &Entry) -> (Plain, Plain) {
    (plain(&entry.key), plain(&entry.value))
}

/// The file put together again from its pieces, in the order of the text.
fn joined(file: &File) -> Plain {
    let mut top: Vec<(u32, (Plain, Plain))> = Vec::new();
    for item in &file.head {
        if let Some(Value::Mapping(entries)) = item.tree.root.as_ref().map(|root| &root.value) {
            top.extend(entries.iter().map(|entry| (item.span.start, pair(entry))));
        }
    }
    for list in &file.lists {
        let values = list.items.iter().filter_map(|item| item.tree.root.as_ref());
        let value = if list.key == "members" {
            Plain::List(values.map(plain).collect())
        } else {
            let pairs = values.filter_map(|root| match &root.value {
                Value::Mapping(entries) => entries.first().map(pair),
                _ => None,
            });
            Plain::Map(pairs.collect())
        };
        top.push((list.key_span.start, (Plain::Text(list.key.clone()), value)));
    }
    top.sort_by_key(|(at, _)| *at);
    Plain::Map(top.into_iter().map(|(_, pair)| pair).collect())
}

/// What serde_yaml reads, numbers and choices as it would write them.
fn oracle(value: &serde_yaml::Value) -> Plain {
    match value {
        serde_yaml::Value::Null => Plain::Null,
        serde_yaml::Value::Bool(yes) => Plain::Text(yes.to_string()),
        serde_yaml::Value::Number(number) => Plain::Text(number.to_string()),
        serde_yaml::Value::String(text) => Plain::Text(text.clone()),
        serde_yaml::Value::Sequence(list) => Plain::List(list.iter().map(oracle).collect()),
        serde_yaml::Value::Mapping(map) => {
            Plain::Map(map.iter().map(|(key, value)| (oracle(key), oracle(value))).collect())
        }
        serde_yaml::Value::Tagged(tagged) => oracle(&tagged.value),
    }
}

/// serde_yaml resolves numbers, so texts that are the same number are the same.
fn same(ours: &Plain, theirs: &Plain) -> bool {
    match (ours, theirs) {
        (Plain::Text(a), Plain::Text(b)) => {
            a == b || matches!((a.parse::<f64>(), b.parse::<f64>()), (Ok(a), Ok(b)) if a == b)
        }
        (Plain::List(a), Plain::List(b)) => a.len() == b.len() && a.iter().zip(b).all(|(a, b)| same(a, b)),
        (Plain::Map(a), Plain::Map(b)) => {
            a.len() == b.len() && a.iter().zip(b).all(|(a, b)| same(&a.0, &b.0) && same(&a.1, &b.1))
        }
        (a, b) => a == b,
    }
}

/// Texts as they stand in design files.
fn word() -> impl Strategy<Value = String> {
    prop_oneof![
        Just("IPE 360".to_owned()),
        Just("90".to_owned()),
        Just("0.5".to_owned()),
        Just("true".to_owned()),
        Just("no".to_owned()),
        Just("Träger 梁 😀".to_owned()),
        Just("a-b:c#d".to_owned()),
        Just("https://example.org/x".to_owned()),
        "[a-z]{1,6}( [a-z0-9]{1,4}){0,2}".prop_filter("a null is no text", |text| text != "null"),
    ]
}

/// A value as it may be written behind its key in the column `indent`.
fn value(indent: usize) -> impl Strategy<Value = String> {
    let pad = " ".repeat(indent + 3);
    let (a, b, c, d) = (pad.clone(), pad.clone(), pad.clone(), pad);
    prop_oneof![
        4 => word().prop_map(|text| format!(" {text}")),
        1 => word().prop_map(|text| format!("   {text}  # note: {{ [ \" '")),
        1 => word().prop_map(|text| format!(" \"{text} \\\"x\\\" \\u00b5\"")),
        1 => word().prop_map(|text| format!(" '{text} it''s # no comment'")),
        1 => (word(), word()).prop_map(|(x, y)| format!(" [ {x}, '{y}',{x} ]")),
        1 => (word(), word()).prop_map(|(x, y)| format!(" {{ key one: {x}, \"two\": {y}, three: }}")),
        1 => (word(), word())
            .prop_map(move |(x, y)| format!(" {{ a: {x},\n{a}# inside\n{a}b: [{y},\n{a}{x}]\n{a}}}")),
        1 => (word(), word()).prop_map(move |(x, y)| format!(" {x} and\n{b}{y}\n\n{b}more")),
        1 => (word(), prop_oneof![Just("|"), Just("|-"), Just(">+"), Just(">"), Just("|2")])
            .prop_map(move |(x, kind)| format!(" {kind}\n{c}- {x}: x\n{c}  # no comment\n\n{c}members:")),
        1 => (word(), word()).prop_map(move |(x, y)| {
            format!("\n{d}- {x}\n{d}-   - {y}\n{d}    - ~\n{d}-\n{d}- k: {x}\n{d}  l: {y}")
        }),
        1 => Just(String::new()),
        1 => word().prop_map(|text| format!(" !!str {text}")),
    ]
}

fn between() -> impl Strategy<Value = &'static str> {
    prop_oneof![
        6 => Just(""),
        1 => Just("\n"),
        1 => Just("# comment - a: b\n"),
        1 => Just("      # deep\n"),
        1 => Just("\t# tab\n"),
        1 => Just("   \t \n"),
    ]
}

/// A member whose dash stands in a column.
fn member(column: usize) -> impl Strategy<Value = String> {
    let keys = ["mark", "section", "supported by", "\"quoted key\"", "note"];
    let block = (1..4_usize, any::<bool>()).prop_flat_map(move |(gap, own_line)| {
        let indent = column + 1 + gap;
        (
            Just((gap, own_line)),
            proptest::collection::vec(value(indent), 1..5),
            between(),
        )
    });
    let lead = " ".repeat(column);
    let again = lead.clone();
    prop_oneof![
        1 => (word(), word()).prop_map(move |(x, y)| format!("{lead}- {{ mark: {x}, loading: {{ axial: {y} }} }}\n")),
        6 => block.prop_map(move |((gap, own_line), values, between)| {
            let indent = " ".repeat(column + 1 + gap);
            let first = if own_line { format!("\n{indent}") } else { " ".repeat(gap) };
            let lines: Vec<String> = keys.iter().zip(values).map(|(key, value)| format!("{key}:{value}")).collect();
            format!("{again}-{first}{}\n{between}", lines.join(&format!("\n{indent}")))
        }),
    ]
}

/// A whole file, in one of many styles.
fn file() -> impl Strategy<Value = String> {
    let frame = (
        prop_oneof![3 => Just(""), 1 => Just("---\n"), 1 => Just("%YAML 1.2\n--- # begin\n")],
        between(),
        value(0),
        proptest::collection::vec(value(5), 0..4),
        prop_oneof![Just("members: # all\n"), Just("\"members\":\n"), Just("members :\n")],
        proptest::bool::weighted(0.2),
        prop_oneof![3 => Just(""), 1 => Just("...\n"), 1 => Just("# end")],
        any::<bool>(),
    );
    let members = prop_oneof![Just(0_usize), Just(2), Just(5)]
        .prop_flat_map(|column| (Just(column), proptest::collection::vec(member(column), 0..6)));
    (frame, members).prop_map(|(frame, (column, members))| {
        let (marker, head, project, groups, key, anchor, end, crlf) = frame;
        let mut text = format!("{marker}{head}steelwork: 1\nproject:{project}\n");
        if anchor {
            text.push_str("shared: &shared { level: 2, at: [1, 2] }\n");
        }
        if !groups.is_empty() {
            text.push_str("groups:\n");
        }
        for (at, value) in groups.iter().enumerate() {
            text.push_str(&format!("     floor {at}:{value}\n"));
        }
        text.push_str(if members.is_empty() { "members: []\n" } else { key });
        members.iter().for_each(|member| text.push_str(member));
        if anchor && !members.is_empty() {
            text.push_str(&format!("{}- location: *shared\n", " ".repeat(column)));
        }
        text.push_str(end);
        if crlf { text.replace('\n', "\r\n") } else { text }
    })
}

/// Every span lies in its text, on character boundaries.
fn spans_fit(file: &File, text: &str) -> Result<(), TestCaseError> {
    let items = file.head.iter().chain(file.lists.iter().flat_map(|list| &list.items));
    for item in items {
        let own = item.span.slice(text);
        prop_assert!(own.len() == item.span.len() as usize, "{:?}", item.span);
        if let Some(root) = &item.tree.root {
            nodes_fit(root, own)?;
        }
    }
    for error in file.all_errors() {
        let edits = error.repair.iter().flat_map(|repair| &repair.edits);
        for span in edits.map(|edit| edit.span).chain([error.span]) {
            prop_assert!(text.get(span.start as usize..span.end as usize).is_some(), "{error:?}");
        }
    }
    Ok(())
}

fn nodes_fit(node: &Node, text: &str) -> Result<(), TestCaseError> {
    let range = node.span.start as usize..node.span.end as usize;
    prop_assert!(text.get(range).is_some(), "{node:?} in {text:?}");
    match &node.value {
        Value::Sequence(nodes) => nodes.iter().try_for_each(|node| nodes_fit(node, text)),
        Value::Mapping(entries) => entries.iter().try_for_each(|entry| {
            nodes_fit(&entry.key, text)?;
            nodes_fit(&entry.value, text)
        }),
        _ => Ok(()),
    }
}

/// The same text with a root that can't be split: a tag before it makes it one piece.
fn unsplit(text: &str) -> String {
    text.replacen("steelwork:", "!!map\nsteelwork:", 1)
}

/// Whether the parser takes the whole text, without splitting.
fn strict(text: &str) -> bool {
    let options = granit_parser::options! { strict_indentation: true, emit_comments: false };
    granit_parser::Parser::new_from_str_with_options(text, options).all(|event| event.is_ok())
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 1500, max_shrink_iters: 2000, failure_persistence: None, ..ProptestConfig::default() })]

    #[test]
    fn split_whole_and_another_reader_agree(text in file()) {
        let file = read(&text);
        prop_assert_eq!(file.all_errors(), vec![]);
        spans_fit(&file, &text)?;
        let split = joined(&file);
        let whole = read(&unsplit(&text));
        prop_assert_eq!(whole.all_errors(), vec![]);
        prop_assert_eq!(&split, &joined(&whole));
        // The other reader knows the directive of YAML 1.1 only, and no tab on an empty line.
        let theirs = text.replace("%YAML 1.2", "%YAML 1.1").replace("   \t \n", "").replace("   \t \r\n", "");
        let theirs = theirs.replace("\t#", "#");
        let theirs: serde_yaml::Value =
            serde_yaml::from_str(&theirs).map_err(|error| TestCaseError::fail(error.to_string()))?;
        let theirs = oracle(&theirs);
        prop_assert!(same(&split, &theirs), "{:#?}\n{:#?}", split, theirs);
    }

    #[test]
    fn a_changed_text_is_refused_exactly_where_it_is_no_yaml(
        text in file(),
        changes in proptest::collection::vec((any::<prop::sample::Index>(), 0..24_usize), 1..4),
    ) {
        let put = [
            "", "\t", "\"", "'", "{", "}", "[", "]", ": ", ":", "- ", "-", "&a ", "*a", "\n", "\r", "#", "|", ",",
            "é😀", "\0", "\u{feff}", "---\n", "  ",
        ];
        let mut text = text;
        for (at, what) in changes {
            let at = text.floor_char_boundary(at.index(text.len()));
            if what == 0 {
                text.remove(at);
            } else {
                text.insert_str(at, put[what]);
            }
        }
        let file = read(&text);
        spans_fit(&file, &text)?;
        prop_assert!(comments(&text).iter().all(|span| span.slice(&text).starts_with('#')));
        let errors = file.all_errors();
        // Of a byte order mark in a comment the parser thinks now so, now so.
        if text.contains('\u{feff}') {
            return Ok(());
        }
        // What follows a first document is not read, so nothing is said of it.
        if errors.iter().all(|error| error.kind == ErrorKind::NotYaml) {
            prop_assert_eq!(errors.is_empty(), strict(&text), "{:#?}\n{}", errors, text);
        }
    }

    #[test]
    fn any_text_can_be_read(text in "(?s)[ \t\n\r:,#&*!|>'\"{}\\[\\]%@`a-c0-9~-]{0,60}|(?s).{0,80}") {
        let file = read(&text);
        spans_fit(&file, &text)?;
        prop_assert!(comments(&text).iter().all(|span| span.slice(&text).starts_with('#')));
        let errors = file.all_errors();
        if errors.iter().all(|error| error.kind == ErrorKind::NotYaml) {
            prop_assert_eq!(errors.is_empty(), strict(&text), "{:#?}\n{:?}", errors, text);
        }
    }
}
