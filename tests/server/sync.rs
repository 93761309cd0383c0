//! Documents: their text is the editor's, in every encoding, and the newest version is the one that is told of.

use serde_json::{Value, json};

use crate::client::{Client, codes, range};

pub const URI: &str = "file:///nowhere/frame.steelwork.yaml";

/// A bare beam whose mark is written in letters of one to four bytes; its section stands behind the mark on one line.
pub const TEXT: &str = "steelwork: 1\r
defaults: { role: beam, steel: S355, period: 60, loading: { utilisation: 0.6 } }\r
members:\r
  - { mark: Träger-梁-😀, section: IPE 80 }\r
";

fn encodings(name: &str) -> Value {
    json!({ "general": { "positionEncodings": [name] } })
}

/// Columns of a line in an encoding.
fn width(text: &str, encoding: &str) -> u32 {
    let width = match encoding {
        "utf-8" => text.len(),
        "utf-16" => text.encode_utf16().count(),
        _ => text.chars().count(),
    };
    u32::try_from(width).unwrap()
}

#[test]
fn places_are_right_behind_letters_of_every_width() {
    for encoding in ["utf-8", "utf-16", "utf-32"] {
        let (mut client, _) = Client::start(encodings(encoding), Value::Null, &[]);
        client.open(URI, 1, TEXT);
        let diagnostics = client.diagnostics(URI, 1);
        let thin = diagnostics
            .iter()
            .find(|diagnostic| diagnostic["code"] == "thin-steel")
            .unwrap();
        let line = TEXT.lines().nth(3).unwrap();
        let from = width(&line[..line.find("IPE").unwrap()], encoding);
        assert_eq!(thin["range"], range(3, from, from + 6), "{encoding}");
        // Typing behind those letters, in the editor's columns: IPE 80 becomes IPE 800, which does not exist.
        client.change(URI, 2, json!([{ "range": range(3, from + 6, from + 6), "text": "0" }]));
        assert_eq!(codes(&client.diagnostics(URI, 2)), ["unknown-section"], "{encoding}");
        client.change(
            URI,
            3,
            json!([{ "range": range(3, from + 4, from + 7), "text": "600" }]),
        );
        assert_eq!(codes(&client.diagnostics(URI, 3)), ["bare-steel-fails"], "{encoding}");
        let uri = json!([URI]);
        let text = client.request(
            "workspace/executeCommand",
            json!({ "command": "scorchline.document", "arguments": uri }),
        );
        assert_eq!(text, TEXT.replace("IPE 80", "IPE 600"), "{encoding}");
        assert_eq!(client.stop(), 0);
    }
}

#[test]
fn several_changes_of_one_message_apply_in_their_order() {
    let (mut client, _) = Client::start(json!({}), Value::Null, &[]);
    client.open(URI, 1, "steelwork: 1\nmembers: []\n");
    client.change(
        URI,
        2,
        json!([
            { "range": range(1, 9, 11), "text": "\n  - mark: A" },
            { "range": range(2, 11, 11), "text": "B\n" },
            { "range": { "start": { "line": 9, "character": 9 }, "end": { "line": 99, "character": 0 } }, "text": "# end" },
        ]),
    );
    let arguments = json!({ "command": "scorchline.document", "arguments": [URI] });
    let text = client.request("workspace/executeCommand", arguments);
    assert_eq!(text, "steelwork: 1\nmembers: \n  - mark: AB\n\n# end");
    assert_eq!(client.stop(), 0);
}

#[test]
fn a_burst_ends_with_its_last_version_and_none_is_told_after_a_newer_one() {
    let (mut client, _) = Client::start(json!({}), Value::Null, &[]);
    client.open(URI, 1, TEXT);
    let mut last = 1;
    for version in 2..200 {
        let size = ["80", "100", "120", "600"][usize::try_from(version % 4).unwrap()];
        client.change(
            URI,
            version,
            json!([{ "text": TEXT.replace("IPE 80", &format!("IPE {size}")) }]),
        );
        if version % 7 == 0 {
            client.until(|client| {
                client
                    .published
                    .get(URI)
                    .is_some_and(|(known, _)| known.unwrap() >= last)
            });
            last = client.published[URI].0.unwrap();
        }
    }
    let diagnostics = client.diagnostics(URI, 199);
    assert_eq!(codes(&diagnostics), ["bare-steel-fails"]);
    assert!(client.publishes[URI] <= 199);
    assert_eq!(client.stop(), 0);
}

#[test]
fn a_change_is_answered_even_where_it_changes_nothing() {
    let (mut client, _) = Client::start(json!({}), Value::Null, &[]);
    client.open(URI, 1, TEXT);
    let before = client.diagnostics(URI, 1);
    client.change(URI, 2, json!([{ "text": TEXT }]));
    assert_eq!(client.diagnostics(URI, 2), before);
    assert_eq!(client.stop(), 0);
}

#[test]
fn a_closed_document_that_is_nowhere_on_disk_takes_its_findings_along() {
    let (mut client, _) = Client::start(json!({}), Value::Null, &[]);
    client.open(URI, 1, TEXT);
    assert!(!client.diagnostics(URI, 1).is_empty());
    client.notify("textDocument/didClose", json!({ "textDocument": { "uri": URI } }));
    client.until(|client| client.published[URI].1.is_empty());
    // It comes back with another text and the same version.
    client.open(URI, 1, &TEXT.replace("IPE 80", "IPE 8"));
    client.until(|client| codes(&client.published[URI].1) == ["unknown-section"]);
    assert_eq!(client.stop(), 0);
}

#[test]
fn five_hundred_are_shown_those_of_the_edited_member_among_them() {
    let (mut client, _) = Client::start(json!({}), Value::Null, &[]);
    let mut text =
        "steelwork: 1\ndefaults: { role: beam, steel: S355, period: 60, loading: { utilisation: 0.6 } }\nmembers:\n"
            .to_owned();
    for n in 0..700 {
        text.push_str(&format!("  - {{ mark: B{n}, section: IPE 80 }}\n"));
    }
    client.open(URI, 1, &text);
    let diagnostics = client.diagnostics(URI, 1);
    assert_eq!(diagnostics.len(), 501);
    assert_eq!(codes(&diagnostics), ["bare-steel-fails"; 500]);
    assert_eq!(diagnostics[500]["severity"], 3);
    assert!(
        diagnostics[500]["message"]
            .as_str()
            .unwrap()
            .starts_with("900 more findings"),
        "{}",
        diagnostics[500]
    );
    // A hint of the last member, which would come last by gravity and place.
    let at = u32::try_from(text.lines().last().unwrap().find("80").unwrap()).unwrap();
    client.change(URI, 2, json!([{ "range": range(702, at, at + 2), "text": "100" }]));
    let diagnostics = client.diagnostics(URI, 2);
    let of_last = diagnostics
        .iter()
        .filter(|diagnostic| diagnostic["range"]["start"]["line"] == 702);
    let mut names: Vec<&str> = of_last.filter_map(|diagnostic| diagnostic["code"].as_str()).collect();
    names.sort_unstable();
    assert_eq!(names, ["bare-steel-fails", "thin-steel"]);
    assert_eq!(client.stop(), 0);
}
