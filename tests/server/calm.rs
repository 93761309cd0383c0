//! A value that is being typed is left in peace: what more typing may answer is a hint for the moment.

use serde_json::{Value, json};

use crate::client::{Client, range};
use crate::sync::{TEXT, URI};

/// A server in which `IPE 80` has just become `IPE 8`, and the grave slip's severity there.
fn typed() -> (Client, u32) {
    let (mut client, _) = Client::start(json!({}), Value::Null, &[]);
    client.open(URI, 1, TEXT);
    client.diagnostics(URI, 1);
    let line: String = TEXT.lines().nth(3).unwrap().to_owned();
    let at = u32::try_from(line[..line.find("80").unwrap()].encode_utf16().count()).unwrap();
    client.change(URI, 2, json!([{ "range": range(3, at + 1, at + 2), "text": "" }]));
    client.diagnostics(URI, 2);
    (client, at)
}

fn severity(client: &Client) -> i64 {
    let (_, diagnostics) = &client.published[URI];
    let slip = diagnostics
        .iter()
        .find(|diagnostic| diagnostic["code"] == "unknown-section")
        .unwrap();
    slip["severity"].as_i64().unwrap()
}

#[test]
fn a_half_typed_value_is_a_hint_and_after_a_while_an_error() {
    let (mut client, _) = typed();
    assert_eq!(severity(&client), 4);
    client.until(|client| severity(client) == 1);
    assert_eq!(client.stop(), 0);
}

#[test]
fn typing_on_another_line_ends_the_calm() {
    let (mut client, _) = typed();
    client.change(URI, 3, json!([{ "range": range(0, 12, 12), "text": " " }]));
    client.diagnostics(URI, 3);
    assert_eq!(severity(&client), 1);
    assert_eq!(client.stop(), 0);
}

#[test]
fn saving_ends_the_calm() {
    let (mut client, _) = typed();
    client.notify("textDocument/didSave", json!({ "textDocument": { "uri": URI } }));
    client.until(|client| severity(client) == 1);
    assert_eq!(client.stop(), 0);
}

#[test]
fn the_headline_is_told_at_once() {
    let (mut client, at) = typed();
    client.change(URI, 3, json!([{ "range": range(3, at + 1, at + 1), "text": "0" }]));
    let diagnostics = client.diagnostics(URI, 3);
    let bare = diagnostics
        .iter()
        .find(|diagnostic| diagnostic["code"] == "bare-steel-fails")
        .unwrap();
    assert_eq!(bare["severity"], 1);
    assert_eq!(client.stop(), 0);
}
