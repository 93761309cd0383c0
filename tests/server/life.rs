//! How the server begins and ends.

use serde_json::{Value, json};

use crate::client::Client;

#[test]
fn it_ends_with_the_status_that_the_protocol_wants() {
    let (client, _) = Client::start(json!({}), Value::Null, &[]);
    assert_eq!(client.stop(), 0);
    let (client, _) = Client::start(json!({}), Value::Null, &[]);
    assert_eq!(client.exit(), 1);
}

#[test]
fn it_counts_columns_as_the_editor_likes_best() {
    for (offered, chosen) in [
        (json!(["utf-8", "utf-16"]), "utf-8"),
        (json!(["utf-32", "utf-16"]), "utf-32"),
        (json!(["utf-16", "utf-8"]), "utf-16"),
        (json!(["utf-7", "utf-8"]), "utf-8"),
        (Value::Null, "utf-16"),
    ] {
        let (client, answer) = Client::start(json!({ "general": { "positionEncodings": offered } }), Value::Null, &[]);
        assert_eq!(answer["capabilities"]["positionEncoding"], chosen);
        assert_eq!(client.stop(), 0);
    }
}

#[test]
fn it_asks_to_watch_design_files_only_of_editors_that_can() {
    let watches = json!({ "workspace": { "didChangeWatchedFiles": { "dynamicRegistration": true } } });
    let (mut client, _) = Client::start(watches, Value::Null, &[]);
    client.until(|client| !client.asked.is_empty());
    let (method, params) = &client.asked[0];
    assert_eq!(method, "client/registerCapability");
    assert_eq!(params["registrations"][0]["method"], "workspace/didChangeWatchedFiles");
    let globs = params["registrations"][0]["registerOptions"]["watchers"].to_string();
    assert!(globs.contains("steelwork") && globs.contains("protection"), "{globs}");
    assert_eq!(client.stop(), 0);
}
