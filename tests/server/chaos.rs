//! A long session of everything at once: edits, undos, saves, renames, closes, library changes and cancelled requests.
//! After each stretch the server holds the text that the editor holds, and tells what a fresh check finds.
//!
//! `CHAOS_STEPS` and `CHAOS_SEED` in the environment make it longer or another one.

use std::collections::BTreeMap;
use std::path::{Path, PathBuf};
use std::sync::Arc;

use jiff::ZonedDateTime;
use scorchline::analysis::files::{Files, PathTrouble, ReadTrouble};
use scorchline::analysis::memo::Memo;
use scorchline::check::run;
use scorchline::findings::finding::{Finding, Severity};
use scorchline::scenario::FILES;
use scorchline::text::{Encoding, LineIndex};
use serde_json::{Value, json};

use crate::client::Client;

struct Random(u64);

impl Random {
    fn below(&mut self, most: usize) -> usize {
        self.0 ^= self.0 << 13;
        self.0 ^= self.0 >> 7;
        self.0 ^= self.0 << 17;
        usize::try_from(self.0 % most.max(1) as u64).unwrap()
    }
}

/// What is typed.
const TYPED: [&str; 30] = [
    "0",
    "1",
    "5",
    "x",
    " ",
    ":",
    "#",
    "{",
    "}",
    "[",
    "]",
    "'",
    "\"",
    "\n",
    "\r\n",
    "\t",
    "é",
    "梁",
    "😀",
    "-",
    "\n  - mark: Z1\n",
    "IPE 100",
    "period: 240",
    "supported by: [C1]",
    "group: ",
    "&a ",
    "*a",
    "\n---\n",
    "protection: none",
    "0,5",
];

/// What the editor and the disk hold.
struct Model {
    folder: PathBuf,
    disk: BTreeMap<String, String>,
    open: BTreeMap<String, (i64, String)>,
    past: Vec<(String, String)>,
    encoding: Encoding,
    renamed: usize,
}

impl Model {
    fn uri(&self, name: &str) -> String {
        format!("file://{}", self.folder.join(name).display())
    }

    fn names(&self) -> Vec<String> {
        let mut names: Vec<String> = self.disk.keys().chain(self.open.keys()).cloned().collect();
        names.sort();
        names.dedup();
        names
    }

    /// Changes an open text in the editor and tells the server only what changed.
    fn replace(&mut self, client: &mut Client, name: &str, from: usize, to: usize, put: &str) {
        let uri = self.uri(name);
        let encoding = self.encoding;
        let (version, text) = self.open.get_mut(name).unwrap();
        let index = LineIndex::new(text);
        let position = |at: usize| {
            let position = index.position(text, u32::try_from(at).unwrap(), encoding);
            json!({ "line": position.line, "character": position.column })
        };
        let range = json!({ "start": position(from), "end": position(to) });
        let before = text.clone();
        text.replace_range(from..to, put);
        *version += 1;
        let version = *version;
        self.past.push((name.to_owned(), before));
        client.change(&uri, version, json!([{ "range": range, "text": put }]));
    }

    fn step(&mut self, client: &mut Client, random: &mut Random) {
        let names = self.names();
        let name = names[random.below(names.len())].clone();
        let uri = self.uri(&name);
        if !self.open.contains_key(&name) {
            match random.below(3) {
                // The file changes on disk while nobody has it open.
                0 => {
                    let text = self.disk.get_mut(&name).unwrap();
                    let at = cut(text, random.below(text.len()));
                    text.insert_str(at, TYPED[random.below(TYPED.len())]);
                    std::fs::write(self.folder.join(&name), &*text).unwrap();
                    let changes = json!({ "changes": [{ "uri": uri, "type": 2 }] });
                    client.notify("workspace/didChangeWatchedFiles", changes);
                }
                _ => {
                    let text = self.disk[&name].clone();
                    client.open(&uri, 1, &text);
                    self.open.insert(name, (1, text));
                }
            }
            return;
        }
        let text = self.open[&name].1.clone();
        match random.below(40) {
            0 => {
                client.notify("textDocument/didClose", json!({ "textDocument": { "uri": uri } }));
                self.open.remove(&name);
            }
            1 => {
                std::fs::write(self.folder.join(&name), &text).unwrap();
                self.disk.insert(name, text);
                client.notify("textDocument/didSave", json!({ "textDocument": { "uri": uri } }));
            }
            2 => {
                // A request that the editor has lost interest in, and one that it has not.
                let position = json!({ "line": random.below(60), "character": random.below(60) });
                let params = json!({ "textDocument": { "uri": uri }, "position": position });
                let methods = [
                    "textDocument/hover",
                    "textDocument/completion",
                    "textDocument/definition",
                    "textDocument/prepareRename",
                ];
                let id = client.ask(methods[random.below(methods.len())], params.clone());
                client.notify("$/cancelRequest", json!({ "id": id }));
                client.answer(id);
                let id = client.ask("textDocument/definition", params);
                let answer = client.answer(id);
                assert!(answer.get("error").is_none(), "{answer}");
            }
            3 => self.rename(client, random, &name),
            4..=9 => {
                if let Some((name, before)) = self.past.pop().filter(|(name, _)| self.open.contains_key(name)) {
                    let all = self.open[&name].1.len();
                    self.replace(client, &name, 0, all, &before);
                    self.past.pop();
                }
            }
            // Damage does not pile up for ever: now and then the scenario comes back.
            10 if random.below(6) == 0 => {
                let fresh = fresh(&name, random.below(2) == 0);
                let all = text.len();
                self.replace(client, &name, 0, all, &fresh);
            }
            _ => {
                let from = cut(&text, random.below(text.len() + 1));
                let to = cut(&text, from + [0, 0, 0, 1, 1, 2, 40][random.below(7)]).max(from);
                self.replace(client, &name, from, to, TYPED[random.below(TYPED.len())]);
            }
        }
        let most = self.past.len().saturating_sub(200);
        self.past.drain(..most);
    }

    /// Renames the first mark of a text by the server's own edits.
    fn rename(&mut self, client: &mut Client, _: &mut Random, name: &str) {
        let (uri, text) = (self.uri(name), self.open[name].1.clone());
        let Some(at) = text.find("mark: ").map(|at| at + 6) else {
            return;
        };
        let position = LineIndex::new(&text).position(&text, u32::try_from(at).unwrap(), self.encoding);
        self.renamed += 1;
        let params = json!({
            "textDocument": { "uri": uri },
            "position": { "line": position.line, "character": position.column },
            "newName": format!("R{}", self.renamed),
        });
        let id = client.ask("textDocument/rename", params);
        let answer = client.answer(id);
        let Some(changes) = answer["result"]["changes"].as_object().cloned() else {
            return;
        };
        for (uri, edits) in changes {
            let Some(name) = self.open.keys().find(|name| self.uri(name) == uri).cloned() else {
                continue;
            };
            let mut edits: Vec<(usize, usize, String)> = edits
                .as_array()
                .unwrap()
                .iter()
                .map(|edit| {
                    let text = &self.open[&name].1;
                    let index = LineIndex::new(text);
                    let offset = |at: &Value| {
                        let number = |key: &str| u32::try_from(at[key].as_u64().unwrap()).unwrap();
                        let position = scorchline::text::Position {
                            line: number("line"),
                            column: number("character"),
                        };
                        index.offset(text, position, self.encoding) as usize
                    };
                    let new = edit["newText"].as_str().unwrap().to_owned();
                    (offset(&edit["range"]["start"]), offset(&edit["range"]["end"]), new)
                })
                .collect();
            edits.sort();
            for (from, to, new) in edits.into_iter().rev() {
                self.replace(client, &name, from, to, &new);
            }
        }
    }
}

fn cut(text: &str, at: usize) -> usize {
    let mut at = at.min(text.len());
    // An editor does not part a CR LF, nor a character.
    while !text.is_char_boundary(at) || (text[..at].ends_with('\r') && text[at..].starts_with('\n')) {
        at -= 1;
    }
    at
}

fn fresh(name: &str, crlf: bool) -> String {
    let text = FILES.iter().find(|(known, _)| *known == name).unwrap().1;
    if crlf {
        text.replace('\n', "\r\n")
    } else {
        text.to_owned()
    }
}

/// The same files for a fresh check.
struct Fresh<'a>(&'a Model);

impl Files for Fresh<'_> {
    fn follow(&self, from: &Path, relative: &str) -> Result<PathBuf, PathTrouble> {
        let disk = scorchline::lsp::disk::Disk {
            folders: vec![self.0.folder.clone()],
        };
        disk.follow(from, relative)
    }

    fn read(&self, path: &Path) -> Result<Arc<str>, ReadTrouble> {
        let name = path.file_name().unwrap().to_str().unwrap();
        let text = self
            .0
            .open
            .get(name)
            .map(|(_, text)| text)
            .or_else(|| self.0.disk.get(name));
        text.map(|text| Arc::from(text.as_str()))
            .ok_or_else(|| ReadTrouble::System("missing".to_owned()))
    }
}

fn severity(finding: &Finding) -> i64 {
    match finding.severity {
        Severity::Error => 1,
        Severity::Warning => 2,
        Severity::Information => 3,
        Severity::Hint => 4,
    }
}

type Told = BTreeMap<String, Vec<(String, String, i64, String)>>;

/// What a fresh check tells of every file, as an editor would show it.
fn expected(model: &Model) -> Told {
    let paths: Vec<PathBuf> = model.names().iter().map(|name| model.folder.join(name)).collect();
    let (checked, _) = run(&Fresh(model), &paths, ZonedDateTime::now().date(), &Memo::default());
    let mut told: Told = model.names().into_iter().map(|name| (name, Vec::new())).collect();
    for checked in checked {
        for file in &checked.design.files {
            let name = file.path.file_name().unwrap().to_str().unwrap();
            let index = LineIndex::new(&file.text);
            let entry = told.get_mut(name).unwrap();
            for finding in checked
                .findings
                .iter()
                .filter(|finding| finding.place.path == file.path)
            {
                let position = |at| {
                    let position = index.position(&file.text, at, model.encoding);
                    format!("{}:{}", position.line, position.column)
                };
                let span = finding.place.span;
                let place = format!("{}-{}", position(span.start), position(span.end));
                let mut message = finding.message.clone();
                for note in &finding.notes {
                    message.push('\n');
                    message.push_str(&note.text);
                }
                let line = (place, finding.name().to_owned(), severity(finding), message);
                if !entry.contains(&line) {
                    entry.push(line);
                }
            }
            entry.sort();
            // What is published of a file is capped, and the cap is another test's.
            assert!(entry.len() < 500);
        }
    }
    told
}

fn published(client: &Client, model: &Model) -> Told {
    let of = |name: String| {
        let published = client
            .published
            .get(&model.uri(&name))
            .map(|(_, diagnostics)| diagnostics.as_slice());
        let mut lines: Vec<_> = published
            .unwrap_or(&[])
            .iter()
            .map(|diagnostic| {
                let position = |at: &Value| format!("{}:{}", at["line"], at["character"]);
                let range = &diagnostic["range"];
                (
                    format!("{}-{}", position(&range["start"]), position(&range["end"])),
                    diagnostic["code"].as_str().unwrap_or("").to_owned(),
                    diagnostic["severity"].as_i64().unwrap(),
                    diagnostic["message"].as_str().unwrap().to_owned(),
                )
            })
            .collect();
        lines.sort();
        (name, lines)
    };
    model.names().into_iter().map(of).collect()
}

#[track_caller]
fn agrees(client: &mut Client, model: &Model) {
    for (name, (_, text)) in &model.open {
        let arguments = json!({ "command": "scorchline.document", "arguments": [model.uri(name)] });
        assert_eq!(
            client.request("workspace/executeCommand", arguments),
            json!(text),
            "{name}"
        );
    }
    let expected = expected(model);
    // Lines that are being typed come to rest, and files that changed on disk are read, before all agree.
    let end = std::time::Instant::now() + std::time::Duration::from_secs(20);
    while published(client, model) != expected && std::time::Instant::now() < end {
        let count: usize = client.publishes.values().sum();
        client.within(std::time::Duration::from_millis(200), |client| {
            client.publishes.values().sum::<usize>() > count
        });
    }
    let told = published(client, model);
    for (name, lines) in &expected {
        for (ours, theirs) in told[name].iter().zip(lines) {
            assert_eq!(ours, theirs, "{name}");
        }
        assert_eq!(told[name].len(), lines.len(), "{name}");
    }
}

fn number(name: &str, default: u64) -> u64 {
    std::env::var(name).ok().map_or(default, |value| value.parse().unwrap())
}

fn chaos(encoding: Encoding, name: &str, seed: u64, steps: u64) {
    let folder = tempfile::tempdir().unwrap();
    let folder = std::fs::canonicalize(folder.path()).map(|path| (path, folder)).unwrap();
    let mut model = Model {
        folder: folder.0.clone(),
        disk: FILES
            .iter()
            .map(|(name, _)| ((*name).to_owned(), fresh(name, false)))
            .collect(),
        open: BTreeMap::new(),
        past: Vec::new(),
        encoding,
        renamed: 0,
    };
    for (name, text) in &model.disk {
        std::fs::write(model.folder.join(name), text).unwrap();
    }
    let capabilities = json!({ "general": { "positionEncodings": [name] } });
    let (mut client, _) = Client::start(capabilities, Value::Null, &[&format!("file://{}", folder.0.display())]);
    let mut random = Random(seed);
    for step in 0..steps {
        model.step(&mut client, &mut random);
        // The pipe to a server that is behind fills up, so the editor waits for it now and then as a user would.
        if step % 50 == 49 {
            client.request("workspace/symbol", json!({ "query": "nothing" }));
        }
        if step % 200 == 199 {
            agrees(&mut client, &model);
        }
    }
    agrees(&mut client, &model);
    let peak = client.peak_memory() / 1024;
    println!("{steps} steps in {name}: {peak} MiB at the most");
    assert!(peak < 400, "{peak} MiB");
    assert_eq!(client.stop(), 0);
}

#[test]
fn anything_at_once_in_utf_8() {
    chaos(
        Encoding::Utf8,
        "utf-8",
        number("CHAOS_SEED", 11),
        number("CHAOS_STEPS", 10_000),
    );
}

#[test]
fn anything_at_once_in_utf_16() {
    chaos(
        Encoding::Utf16,
        "utf-16",
        number("CHAOS_SEED", 23),
        number("CHAOS_STEPS", 10_000),
    );
}
