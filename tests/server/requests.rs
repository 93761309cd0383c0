//! Requests over the protocol: each answers for the text that was sent before it.

use serde_json::{Value, json};

use crate::client::{Client, codes, range};
use crate::sync::{TEXT, URI};

fn at(line: u32, character: u32) -> Value {
    json!({ "textDocument": { "uri": URI }, "position": { "line": line, "character": character } })
}

const PAIR: &str = "steelwork: 1
defaults: { role: beam, steel: S355, period: 30, critical temperature: 550 }
groups:
  floors: { exposure: three sides, shielded by: slab }
members:
  - { mark: B1, group: floors, section: IPE 300, supported by: [C1] }
  - { mark: C1, role: column, section: HE 200 B }
";

#[test]
fn names_are_followed_and_renamed() {
    let (mut client, _) = Client::start(json!({}), Value::Null, &[]);
    client.open(URI, 1, PAIR);
    let column = u32::try_from(PAIR.lines().nth(5).unwrap().find("C1").unwrap()).unwrap();
    let found = client.request("textDocument/definition", at(5, column));
    assert_eq!(found[0]["range"], range(6, 12, 14));
    let mut asked = at(6, 13);
    asked["context"] = json!({ "includeDeclaration": true });
    assert_eq!(
        client
            .request("textDocument/references", asked)
            .as_array()
            .unwrap()
            .len(),
        2
    );
    let prepared = client.request("textDocument/prepareRename", at(6, 13));
    assert_eq!(prepared["placeholder"], "C1");
    let mut asked = at(6, 13);
    asked["newName"] = json!("C2");
    let edits = client.request("textDocument/rename", asked);
    assert_eq!(edits["changes"][URI].as_array().unwrap().len(), 2);
    let mut asked = at(6, 13);
    asked["newName"] = json!("B1");
    let id = client.ask("textDocument/rename", asked);
    let answer = client.answer(id);
    assert!(answer["error"]["message"].as_str().unwrap().contains("B1"), "{answer}");
    assert_eq!(client.stop(), 0);
}

#[test]
fn a_file_is_outlined_folded_and_summed() {
    let (mut client, _) = Client::start(json!({}), Value::Null, &[]);
    client.open(URI, 1, PAIR);
    let document = json!({ "textDocument": { "uri": URI } });
    let flat = client.request("textDocument/documentSymbol", document.clone());
    let names: Vec<&str> = flat
        .as_array()
        .unwrap()
        .iter()
        .filter_map(|symbol| symbol["name"].as_str())
        .collect();
    assert!(names.contains(&"B1") && names.contains(&"floors"), "{names:?}");
    let found = client.request("workspace/symbol", json!({ "query": "c1" }));
    assert_eq!(found[0]["name"], "C1");
    assert!(
        client
            .request("textDocument/foldingRange", document.clone())
            .as_array()
            .unwrap()
            .len()
            >= 2
    );
    let lenses = client.request("textDocument/codeLens", document.clone());
    assert!(
        lenses[0]["command"]["title"].as_str().unwrap().contains('2'),
        "{lenses}"
    );
    client.notify(
        "workspace/didChangeConfiguration",
        json!({ "settings": { "scorchline": { "lenses": false } } }),
    );
    assert_eq!(client.request("textDocument/codeLens", document), json!([]));
    let grown = client.request(
        "textDocument/selectionRange",
        json!({ "textDocument": { "uri": URI }, "positions": [{ "line": 5, "character": 13 }] }),
    );
    assert!(grown[0]["parent"]["parent"].is_object(), "{grown}");
    assert_eq!(client.stop(), 0);
}

#[test]
fn a_fix_takes_its_finding_away() {
    let (mut client, _) = Client::start(json!({}), Value::Null, &[]);
    client.open(URI, 1, &TEXT.replace("IPE 80", "IPF 80"));
    let diagnostics = client.diagnostics(URI, 1);
    assert_eq!(codes(&diagnostics), ["unknown-section"]);
    let asked = json!({
        "textDocument": { "uri": URI },
        "range": diagnostics[0]["range"],
        "context": { "diagnostics": diagnostics, "only": ["quickfix"] },
    });
    let actions = client.request("textDocument/codeAction", asked);
    let fix = actions
        .as_array()
        .unwrap()
        .iter()
        .find(|action| action["title"] == "write `IPE 80`")
        .unwrap();
    assert_eq!(fix["diagnostics"][0]["code"], "unknown-section");
    let edits = fix["edit"]["changes"][URI].as_array().unwrap();
    let changes: Vec<Value> = edits
        .iter()
        .map(|edit| json!({ "range": edit["range"], "text": edit["newText"] }))
        .collect();
    client.change(URI, 2, json!(changes));
    assert_eq!(codes(&client.diagnostics(URI, 2)), ["bare-steel-fails", "thin-steel"]);
    assert_eq!(client.stop(), 0);
}

#[test]
fn a_request_answers_for_what_was_typed_before_it() {
    let (mut client, _) = Client::start(json!({}), Value::Null, &[]);
    client.open(URI, 1, PAIR);
    for version in 2..60 {
        let mark = format!("X{version}");
        let text = PAIR.replace("C1", &mark);
        client.change(URI, version, json!([{ "text": text }]));
        let found = client.request("workspace/symbol", json!({ "query": mark }));
        assert_eq!(found[0]["name"], mark);
    }
    assert_eq!(client.stop(), 0);
}

#[test]
fn cancelled_requests_are_answered_and_harm_nothing() {
    let (mut client, _) = Client::start(json!({}), Value::Null, &[]);
    client.open(URI, 1, PAIR);
    for n in 0..50 {
        client.change(
            URI,
            2 + n,
            json!([{ "text": PAIR.replace("550", &format!("{}", 500 + n)) }]),
        );
        let id = client.ask("textDocument/foldingRange", json!({ "textDocument": { "uri": URI } }));
        client.notify("$/cancelRequest", json!({ "id": id }));
        let answer = client.answer(id);
        assert!(
            answer.get("result").is_some() || answer["error"]["code"] == -32800,
            "{answer}"
        );
    }
    assert!(!client.diagnostics(URI, 51).is_empty());
    assert_eq!(client.stop(), 0);
}

#[test]
fn diagnostics_can_be_asked_for() {
    let (mut client, answer) = Client::start(json!({}), json!({ "pull": true }), &[]);
    assert_eq!(
        answer["capabilities"]["diagnosticProvider"]["workspaceDiagnostics"],
        true
    );
    client.open(URI, 1, TEXT);
    let document = json!({ "textDocument": { "uri": URI } });
    let report = client.request("textDocument/diagnostic", document);
    assert_eq!(
        codes(report["items"].as_array().unwrap()),
        ["bare-steel-fails", "thin-steel"]
    );
    let all = client.request("workspace/diagnostic", json!({ "previousResultIds": [] }));
    assert_eq!(all["items"][0]["items"], report["items"]);
    assert!(client.published.is_empty());
    assert_eq!(client.stop(), 0);
}

#[test]
fn the_schedule_and_explanations_come_by_command() {
    let (mut client, _) = Client::start(json!({}), Value::Null, &[]);
    client.open(URI, 1, TEXT);
    let run = |client: &mut Client, command: &str, arguments: Value| {
        client.request(
            "workspace/executeCommand",
            json!({ "command": command, "arguments": arguments }),
        )
    };
    let schedule = run(&mut client, "scorchline.schedule", json!([URI, "json"]));
    let schedule: Value = serde_json::from_str(schedule.as_str().unwrap()).unwrap();
    assert_eq!(schedule["members"][0]["verdict"], "fails");
    let why = run(&mut client, "scorchline.why", json!(["thin-steel"]));
    assert!(why.as_str().unwrap().starts_with("thin-steel"));
    let id = client.ask(
        "workspace/executeCommand",
        json!({ "command": "scorchline.nothing", "arguments": [] }),
    );
    assert!(client.answer(id).get("error").is_some());
    assert_eq!(client.stop(), 0);
}

#[test]
fn what_fits_is_offered_as_it_is_typed() {
    let items = |capabilities: Value, section: &str| {
        let (mut client, _) = Client::start(capabilities, Value::Null, &[]);
        let text = PAIR.replace("IPE 300", section);
        client.open(URI, 1, &text);
        let line = text.lines().nth(5).unwrap();
        let at_end = line.find("section: ").unwrap() + "section: ".len() + section.len();
        let list = client.request("textDocument/completion", at(5, u32::try_from(at_end).unwrap()));
        let mut blank = text.clone();
        blank.push_str("  -");
        client.change(URI, 2, json!([{ "text": blank }]));
        let lines = u32::try_from(blank.lines().count()).unwrap();
        let members = client.request("textDocument/completion", at(lines - 1, 3));
        assert_eq!(client.stop(), 0);
        (list, members)
    };
    let snippets = json!({ "textDocument": { "completion": { "completionItem": { "snippetSupport": true } } } });
    let (list, members) = items(snippets, "heb24");
    assert_eq!(list["items"][0]["label"], "HE 240 B");
    assert_eq!(list["items"][0]["textEdit"]["newText"], "HE 240 B");
    assert_eq!(list["items"][0]["textEdit"]["range"]["start"]["line"], 5);
    assert!(members.to_string().contains("\"insertTextFormat\":2"), "{members}");
    let (list, members) = items(json!({}), "IPE 3");
    let labels: Vec<&str> = list["items"]
        .as_array()
        .unwrap()
        .iter()
        .filter_map(|item| item["label"].as_str())
        .collect();
    assert!(labels.contains(&"IPE 300") && labels.contains(&"IPE 330"), "{labels:?}");
    assert!(!members.to_string().contains("${"), "{members}");
}
