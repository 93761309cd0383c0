//! Hostile and odd texts end in a plain error or are read; none brings the reader down.

use scorchline::syntax::file::{File, read};
use scorchline::syntax::{ErrorKind, MAX_ALIAS_NODES, MAX_DEPTH, MAX_ERRORS, Value};

fn kinds(file: &File) -> Vec<ErrorKind> {
    file.all_errors().iter().map(|error| error.kind).collect()
}

fn valid(text: &str) {
    let errors = read(text).all_errors();
    assert!(errors.is_empty(), "{text}\n{errors:#?}");
}

#[test]
fn what_is_yaml_is_read() {
    for text in [
        "",
        "\n",
        "# only a comment",
        "\u{feff}steelwork: 1\n",
        "\u{feff}# a comment\nsteelwork: 1\n",
        "%YAML 1.2\n---\nsteelwork: 1\n...\n# end\n",
        "%TAG !e! tag:example.org,2026:\n--- # begin\nmembers:\n  - !e!beam\n    mark: !!str 007\n",
        "---\n...\n",
        "{ steelwork: 1, members: [ { mark: B1 },\n { mark: B2 } ] }\n",
        "? members\n: - mark: B1\n  - mark: B2\n? steelwork\n: 1\n",
        "\"members\": # quoted\n- mark: B1\n-\n  mark: B2\n",
        "members:\n  - mark: B1\n    note: a text\n      of several\n\n      lines\n    \"x\" : y\n",
        "members:\n  - |\n    - mark: x\n   # a comment\n  - >-2\n     y\n",
        "a: &x 1\nmembers:\n  - *x\n  - mark: *x\ngroups: &g { f: *x }\n",
        "members:\n  -\tmark\n  - { a\t: b,\t\"c\":d }\n",
        "members: !!seq\n  - ! 12\n  - !local x\n",
        "members:\n  - [a, [b, {c: d}], e: f]\n  - ? x\n    : y\n",
        "a: 'it''s'\nb: \"tab\\t, line\\\n  goes on\"\n: empty key\n",
        "key:    # comment\n\n  # another\n  deep: 1\n",
        "steelwork: 1\r\rmembers:\r  - mark: B1\r",
        "just a text\n",
        "- a\n- b\n",
        "  steelwork: 1\n  members:\n  - mark: B1\n  - mark: B2\n",
    ] {
        valid(text);
        valid(&text.replace('\n', "\r\n"));
    }
}

#[test]
fn forms_of_a_list_come_in_one_shape() {
    for text in [
        "members:\n  - mark: B1\n  - mark: B2\n",
        "members:\n- mark: B1\n- mark: B2\n",
        "members: [{ mark: B1 }, { mark: B2 }]\n",
        "members: [mark: B1, mark: B2]\n",
        "{\"members\": [{\"mark\": \"B1\"}, {\"mark\": \"B2\"}]}",
        "? members\n: - mark: B1\n  - mark: B2\n",
        "all: &all\n  - mark: B1\n  - mark: B2\nmembers: *all\n",
        "!!map\nmembers:\n  - &b { mark: B1 }\n  - mark: B2\n",
        "---\nmembers : # here\n  -   mark: B1\n  - mark:\n      B2\n...\n",
        "members:\n  - mark: &m B1\n  - mark: B2\nelse: *m\n",
    ] {
        let file = read(text);
        assert_eq!(file.all_errors(), [], "{text}");
        let marks: Vec<_> = file.lists[0]
            .items
            .iter()
            .map(|item| {
                let mark = item.tree.root.as_ref().unwrap().get("mark").unwrap();
                match &mark.value {
                    Value::Scalar(scalar) => {
                        let span = mark.span.shift(item.span.start);
                        assert!(mark.through_alias || span.slice(text).contains(&scalar.text), "{text}");
                        scalar.text.clone()
                    }
                    other => panic!("{other:?}"),
                }
            })
            .collect();
        assert_eq!(marks, ["B1", "B2"], "{text}");
    }
}

#[test]
fn further_documents_are_shown_where_they_begin() {
    for (text, shown) in [
        ("a: 1\n---\nb: 2\n", "---"),
        ("---\na: 1\n...\n# x\n---\nb: 2\n---\nc: 3\n", "---"),
        ("a: 1\n...\nb: 2\n", "b: 2"),
    ] {
        let errors = read(text).all_errors();
        assert_eq!(errors.len(), 1, "{text}");
        assert_eq!(errors[0].kind, ErrorKind::SeveralDocuments);
        assert_eq!(errors[0].span.slice(text), shown);
    }
    valid("---\na: 1\n...\n");
}

#[test]
fn depth_is_limited() {
    let nested = |levels: usize| format!("a: {}{}\n", "[".repeat(levels), "]".repeat(levels));
    valid(&nested(MAX_DEPTH - 1));
    assert_eq!(kinds(&read(&nested(MAX_DEPTH + 1))), [ErrorKind::Limit]);
    for text in [
        "[".repeat(100_000),
        format!("a: {}", "[".repeat(100_000)),
        format!("members:\n  - {}", "{a: ".repeat(100_000)),
        format!("members:\n  - {}", "- ".repeat(100_000)),
        (0..3000).map(|n| format!("{}a:\n", " ".repeat(n))).collect(),
    ] {
        assert_eq!(kinds(&read(&text)), [ErrorKind::Limit], "{}", &text[..20]);
    }
    // Depth that only aliases build up.
    let mut chain = String::from("a0: &a0 [x]\n");
    for n in 1..200 {
        chain.push_str(&format!("a{n}: &a{n} [*a{}]\n", n - 1));
    }
    assert!(kinds(&read(&chain)).contains(&ErrorKind::Limit));
    assert!(kinds(&read("a: &a [*a]\n")).contains(&ErrorKind::Limit));
}

#[test]
fn aliases_are_limited() {
    let mut bomb = String::from("a0: &a0 [x, x, x, x, x, x, x, x, x, x]\n");
    for n in 1..12 {
        let aliases = vec![format!("*a{}", n - 1); 10].join(", ");
        bomb.push_str(&format!("a{n}: &a{n} [{aliases}]\n"));
    }
    let errors = kinds(&read(&bomb));
    assert!(!errors.is_empty() && errors.len() < 10, "{errors:?}");
    assert!(errors.iter().all(|kind| *kind == ErrorKind::Limit));
    let inside = format!("members:\n  - {{ {} }}\n", bomb.trim_end().replace('\n', ", "));
    let errors = kinds(&read(&inside));
    assert!(errors.contains(&ErrorKind::Limit), "{errors:?} of {MAX_ALIAS_NODES}");
}

#[test]
fn errors_are_counted_not_listed_without_end() {
    let many: String = (0..5000).map(|n| format!("    key{n} without\n")).collect();
    let errors = read(&format!("members:\n  - mark: B1\n{many}")).all_errors();
    assert_eq!(errors.len(), MAX_ERRORS + 1);
    assert!(errors[MAX_ERRORS].message.contains("4960 more"));
}

#[test]
fn large_and_odd_texts_come_to_an_end() {
    let line = format!("note: {}\n", "x".repeat(30 << 20));
    valid(&line);
    let broken = format!("note: [{}\n", "x, ".repeat(2 << 20));
    assert_eq!(kinds(&read(&broken)).len(), 1);
    let quote = format!("members:\n  - note: \"{}\n", "x".repeat(30 << 20));
    assert_eq!(kinds(&read(&quote)), [ErrorKind::NotYaml]);
    assert_eq!(kinds(&read(&"\0".repeat(1 << 20))), [ErrorKind::NotYaml]);
    assert!(!kinds(&read(&"\t".repeat(1 << 20).replace('\t', "\t:\n"))).is_empty());
    let huge = "#".repeat((64 << 20) + 1);
    assert_eq!(kinds(&read(&huge)), [ErrorKind::Limit]);
}

#[test]
fn a_way_leads_from_the_root_to_a_cursor() {
    let text = "members:\n  - mark: B1\n    loading: { axial: 20 }\n";
    let file = read(text);
    let item = &file.lists[0].items[0];
    let at = u32::try_from(text.find("20").unwrap()).unwrap() - item.span.start;
    let root = item.tree.root.as_ref().unwrap();
    let way: Vec<&str> = root
        .path_at(at)
        .iter()
        .map(|node| node.span.shift(item.span.start).slice(text))
        .collect();
    assert_eq!(way, ["mark: B1\n    loading: { axial: 20 }", "{ axial: 20 }", "20"]);
}

#[test]
fn letters_of_every_width_are_cut_nowhere() {
    for lead in 0..4 {
        let text = format!(
            "strange\nkey: {}{}\nmembers: []\n",
            "x".repeat(lead),
            "梁é😀".repeat(2000)
        );
        let read = scorchline::syntax::file::read(&text);
        assert!(!read.all_errors().is_empty());
    }
}
