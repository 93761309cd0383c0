//! A client of the protocol, of its own making: it speaks to the real binary over pipes.

use std::collections::HashMap;
use std::io::{BufRead, BufReader, Write};
use std::process::{Child, ChildStdin, Command, Stdio};
use std::sync::mpsc::{Receiver, channel};
use std::time::{Duration, Instant};

use serde_json::{Value, json};

/// Long enough for a machine with much else to do; only a test that fails waits so long.
const PATIENCE: Duration = Duration::from_secs(60);

pub struct Client {
    child: Child,
    input: ChildStdin,
    messages: Receiver<Value>,
    next: i64,
    answers: HashMap<i64, Value>,
    /// Published diagnostics by document, each with its version.
    pub published: HashMap<String, (Option<i64>, Vec<Value>)>,
    /// How many times each document was published.
    pub publishes: HashMap<String, usize>,
    /// Requests of the server, by method.
    pub asked: Vec<(String, Value)>,
}

impl Client {
    /// A server that was initialised with these capabilities and options.
    pub fn start(capabilities: Value, options: Value, folders: &[&str]) -> (Self, Value) {
        let mut child = Command::new(env!("CARGO_BIN_EXE_scorchline"))
            .args(["serve", "--stdio"])
            .stdin(Stdio::piped())
            .stdout(Stdio::piped())
            .stderr(Stdio::inherit())
            .spawn()
            .unwrap();
        let (input, output) = (child.stdin.take().unwrap(), child.stdout.take().unwrap());
        let (sender, messages) = channel();
        std::thread::spawn(move || {
            let mut output = BufReader::new(output);
            while let Some(message) = read(&mut output) {
                if sender.send(message).is_err() {
                    return;
                }
            }
        });
        let mut client = Self {
            child,
            input,
            messages,
            next: 0,
            answers: HashMap::new(),
            published: HashMap::new(),
            publishes: HashMap::new(),
            asked: Vec::new(),
        };
        let folders: Vec<Value> = folders.iter().map(|uri| json!({ "uri": uri, "name": "w" })).collect();
        let answer = client.request(
            "initialize",
            json!({ "processId": null, "rootUri": null, "workspaceFolders": folders, "capabilities": capabilities, "initializationOptions": options }),
        );
        client.notify("initialized", json!({}));
        (client, answer)
    }

    pub fn send(&mut self, message: &Value) {
        let text = serde_json::to_vec(message).unwrap();
        write!(self.input, "Content-Length: {}\r\n\r\n", text.len()).unwrap();
        self.input.write_all(&text).unwrap();
        self.input.flush().unwrap();
    }

    pub fn notify(&mut self, method: &str, params: Value) {
        self.send(&json!({ "jsonrpc": "2.0", "method": method, "params": params }));
    }

    /// Sends a request without waiting for its answer; answers its number.
    pub fn ask(&mut self, method: &str, params: Value) -> i64 {
        self.next += 1;
        let id = self.next;
        self.send(&json!({ "jsonrpc": "2.0", "id": id, "method": method, "params": params }));
        id
    }

    /// Sends a request and waits for its result.
    #[track_caller]
    pub fn request(&mut self, method: &str, params: Value) -> Value {
        let id = self.ask(method, params);
        let answer = self.answer(id);
        assert!(answer.get("error").is_none(), "{method}: {answer}");
        answer["result"].clone()
    }

    /// Waits for the answer of a request, result or error.
    #[track_caller]
    pub fn answer(&mut self, id: i64) -> Value {
        self.until(|client| client.answers.contains_key(&id));
        self.answers.remove(&id).unwrap()
    }

    /// Takes messages until something is so.
    #[track_caller]
    pub fn until(&mut self, met: impl Fn(&Self) -> bool) {
        let end = Instant::now() + PATIENCE;
        while !met(self) {
            let left = end.saturating_duration_since(Instant::now());
            let message = self.messages.recv_timeout(left).expect("the server said nothing more");
            self.take(message);
        }
    }

    /// Takes messages until something is so, but no longer than given.
    pub fn within(&mut self, time: Duration, met: impl Fn(&Self) -> bool) {
        let end = Instant::now() + time;
        while !met(self) {
            let left = end.saturating_duration_since(Instant::now());
            match self.messages.recv_timeout(left) {
                Ok(message) => self.take(message),
                Err(_) => return,
            }
        }
    }

    fn take(&mut self, message: Value) {
        match (message.get("method").and_then(Value::as_str), message.get("id")) {
            (Some("textDocument/publishDiagnostics"), _) => {
                let params = &message["params"];
                let uri = params["uri"].as_str().unwrap().to_owned();
                let diagnostics = params["diagnostics"].as_array().unwrap().clone();
                *self.publishes.entry(uri.clone()).or_default() += 1;
                self.published.insert(uri, (params["version"].as_i64(), diagnostics));
            }
            (Some(method), Some(id)) => {
                self.asked.push((method.to_owned(), message["params"].clone()));
                self.send(&json!({ "jsonrpc": "2.0", "id": id, "result": null }));
            }
            (Some(_), None) => {}
            (None, Some(id)) => {
                self.answers.insert(id.as_i64().unwrap(), message);
            }
            (None, None) => panic!("neither method nor id: {message}"),
        }
    }

    pub fn open(&mut self, uri: &str, version: i64, text: &str) {
        let document = json!({ "uri": uri, "languageId": "yaml", "version": version, "text": text });
        self.notify("textDocument/didOpen", json!({ "textDocument": document }));
    }

    pub fn change(&mut self, uri: &str, version: i64, changes: Value) {
        self.notify(
            "textDocument/didChange",
            json!({ "textDocument": { "uri": uri, "version": version }, "contentChanges": changes }),
        );
    }

    /// The diagnostics of a document as they stand for a version or a newer one.
    #[track_caller]
    pub fn diagnostics(&mut self, uri: &str, version: i64) -> Vec<Value> {
        self.until(|client| matches!(client.published.get(uri), Some((Some(known), _)) if *known >= version));
        self.published[uri].1.clone()
    }

    /// Shuts the server down in order; answers the status of its process.
    pub fn stop(mut self) -> i32 {
        self.request("shutdown", Value::Null);
        self.notify("exit", Value::Null);
        self.child.wait().unwrap().code().unwrap()
    }

    /// Ends the server without `shutdown`; answers the status of its process.
    pub fn exit(mut self) -> i32 {
        self.notify("exit", Value::Null);
        self.child.wait().unwrap().code().unwrap()
    }

    /// The most memory that the server has taken, in KiB.
    pub fn peak_memory(&self) -> u64 {
        let status = std::fs::read_to_string(format!("/proc/{}/status", self.child.id())).unwrap();
        let line = status.lines().find(|line| line.starts_with("VmHWM")).unwrap();
        line.split_whitespace().nth(1).unwrap().parse().unwrap()
    }
}

impl Drop for Client {
    fn drop(&mut self) {
        // A test that failed leaves no server behind.
        let _ = self.child.kill();
        let _ = self.child.wait();
    }
}

fn read(output: &mut impl BufRead) -> Option<Value> {
    let mut length = 0;
    loop {
        let mut line = String::new();
        if output.read_line(&mut line).ok()? == 0 {
            return None;
        }
        let line = line.trim();
        if line.is_empty() {
            break;
        }
        if let Some(number) = line.to_ascii_lowercase().strip_prefix("content-length:") {
            length = number.trim().parse().unwrap();
        }
    }
    let mut text = vec![0; length];
    output.read_exact(&mut text).ok()?;
    serde_json::from_slice(&text).ok()
}

/// The names of the findings among diagnostics.
pub fn codes(diagnostics: &[Value]) -> Vec<&str> {
    diagnostics
        .iter()
        .filter_map(|diagnostic| diagnostic["code"].as_str())
        .collect()
}

/// A range on one line.
pub fn range(line: u32, from: u32, to: u32) -> Value {
    json!({ "start": { "line": line, "character": from }, "end": { "line": line, "character": to } })
}
