//! Files beside the one that is typed: on disk, unsaved, in several folders.

use std::path::Path;

use serde_json::{Value, json};

use crate::client::{Client, codes, range};

const HEAD: &str = "steelwork: 1
libraries: [site.protection.yaml]
defaults: { role: beam, steel: S355, period: 60, loading: { utilisation: 0.6 } }
members:
  - { mark: B1, section: IPE 300, protection: grey board }
";

fn library(conductivity: &str) -> String {
    format!(
        "protection: 1
products:
  grey board: {{ kind: board, method: constant properties, conductivity: {conductivity}, specific heat: 1000, density: 800, thicknesses: [15, 20, 25], assessed: {{ section factor: [40, 320], thickness: [15, 25], steel temperature: [350, 750], period: [30, 180], shapes: [open], orientation: [beam], fires: [standard] }} }}
"
    )
}

fn uri(path: &Path) -> String {
    format!("file://{}", path.display())
}

fn folder() -> tempfile::TempDir {
    let folder = tempfile::tempdir().unwrap();
    std::fs::write(folder.path().join("site.protection.yaml"), library("0.2")).unwrap();
    std::fs::write(folder.path().join("frame.steelwork.yaml"), HEAD).unwrap();
    folder
}

#[test]
fn what_nobody_has_open_is_checked_as_well() {
    let folder = folder();
    std::fs::write(
        folder.path().join("frame.steelwork.yaml"),
        HEAD.replace("IPE 300", "IPE 80"),
    )
    .unwrap();
    let (mut client, _) = Client::start(json!({}), Value::Null, &[&uri(folder.path())]);
    let frame = uri(&folder.path().join("frame.steelwork.yaml"));
    client.until(|client| client.published.contains_key(&frame));
    assert!(
        codes(&client.published[&frame].1).contains(&"too-slender-to-protect"),
        "{:?}",
        client.published
    );
    assert_eq!(client.stop(), 0);
}

#[test]
fn a_library_that_changes_on_disk_changes_what_is_told_of_its_users() {
    for watches in [true, false] {
        let folder = folder();
        let capabilities = json!({ "workspace": { "didChangeWatchedFiles": { "dynamicRegistration": watches } } });
        let (mut client, _) = Client::start(capabilities, Value::Null, &[&uri(folder.path())]);
        let frame = uri(&folder.path().join("frame.steelwork.yaml"));
        client.open(&frame, 1, HEAD);
        assert_eq!(codes(&client.diagnostics(&frame, 1)), [""; 0]);
        let path = folder.path().join("site.protection.yaml");
        std::fs::write(&path, library("0.2").replace("grey board", "gray board")).unwrap();
        // An editor that watches says so; otherwise the server looks for itself.
        if watches {
            let changes = json!({ "changes": [{ "uri": uri(&path), "type": 2 }] });
            client.notify("workspace/didChangeWatchedFiles", changes);
        }
        client.until(|client| codes(&client.published[&frame].1) == ["unknown-product"]);
        std::fs::remove_file(&path).unwrap();
        client.notify(
            "workspace/didChangeWatchedFiles",
            json!({ "changes": [{ "uri": uri(&path), "type": 3 }] }),
        );
        client.until(|client| codes(&client.published[&frame].1).contains(&"unreadable-library"));
        assert_eq!(client.stop(), 0);
    }
}

#[test]
fn an_unsaved_text_wins_over_the_file() {
    let folder = folder();
    let (mut client, _) = Client::start(json!({}), Value::Null, &[&uri(folder.path())]);
    let frame = uri(&folder.path().join("frame.steelwork.yaml"));
    let site = uri(&folder.path().join("site.protection.yaml"));
    client.open(&frame, 1, HEAD);
    client.diagnostics(&frame, 1);
    client.open(&site, 1, &library("0.2"));
    client.diagnostics(&site, 1);
    client.change(&site, 2, json!([{ "range": range(2, 2, 6), "text": "gray" }]));
    client.until(|client| codes(&client.published[&frame].1) == ["unknown-product"]);
    client.notify("textDocument/didClose", json!({ "textDocument": { "uri": site } }));
    client.until(|client| client.published[&frame].1.is_empty());
    // A library that is on no disk yet.
    let new = HEAD.replace("site.protection", "new.protection");
    client.change(&frame, 2, json!([{ "text": new }]));
    assert!(codes(&client.diagnostics(&frame, 2)).contains(&"unreadable-library"));
    let unsaved = uri(&folder.path().join("new.protection.yaml"));
    client.open(&unsaved, 1, &library("0.2"));
    client.until(|client| client.published[&frame].1.is_empty());
    assert_eq!(client.stop(), 0);
}

#[test]
fn several_folders_are_several_workspaces() {
    let (one, two) = (folder(), folder());
    std::fs::write(
        two.path().join("frame.steelwork.yaml"),
        HEAD.replace("grey board", "no board"),
    )
    .unwrap();
    let frames = [&one, &two].map(|folder| uri(&folder.path().join("frame.steelwork.yaml")));
    let (mut client, _) = Client::start(json!({}), Value::Null, &[&uri(one.path())]);
    client.open(&frames[0], 1, HEAD);
    assert!(client.diagnostics(&frames[0], 1).is_empty());
    let folder = json!({ "uri": uri(two.path()), "name": "two" });
    let event = |added: &Value, removed: &Value| json!({ "event": { "added": added, "removed": removed } });
    let change = event(&json!([folder]), &json!([]));
    client.notify("workspace/didChangeWorkspaceFolders", change);
    client.until(|client| {
        client
            .published
            .get(&frames[1])
            .is_some_and(|(_, diagnostics)| !diagnostics.is_empty())
    });
    assert_eq!(codes(&client.published[&frames[1]].1), ["unknown-product"]);
    let change = event(&json!([]), &json!([folder]));
    client.notify("workspace/didChangeWorkspaceFolders", change);
    client.until(|client| client.published[&frames[1]].1.is_empty());
    assert_eq!(client.stop(), 0);
}

#[test]
fn a_file_that_no_text_can_be_made_of_is_told_of() {
    let folder = folder();
    std::fs::write(folder.path().join("bad.steelwork.yaml"), b"steelwork: \xff\xfe\xfd").unwrap();
    let (mut client, _) = Client::start(json!({}), Value::Null, &[&uri(folder.path())]);
    let bad = uri(&folder.path().join("bad.steelwork.yaml"));
    client.until(|client| client.published.contains_key(&bad));
    let message = client.published[&bad].1[0]["message"].as_str().unwrap().to_owned();
    assert!(message.contains("can't be read"), "{message}");
    assert_eq!(client.stop(), 0);
}
