//! Running the binary.

use std::fs;
use std::path::Path;
use std::process::{Command, Output};

pub fn run(folder: &Path, args: &[&str]) -> Output {
    Command::new(env!("CARGO_BIN_EXE_scorchline"))
        .args(args)
        .current_dir(folder)
        .output()
        .unwrap()
}

pub fn text(output: &Output) -> String {
    String::from_utf8(output.stdout.clone()).unwrap()
}

/// Checks a file of the given bytes; the exit status and the names of the findings.
pub fn check(bytes: &[u8]) -> (i32, Vec<String>, serde_json::Value) {
    let folder = tempfile::tempdir().unwrap();
    fs::write(folder.path().join("a.steelwork.yaml"), bytes).unwrap();
    let output = run(folder.path(), &["check", "--as", "json", "--on", "2026-01-01"]);
    assert!(!String::from_utf8_lossy(&output.stderr).contains("panicked"));
    let json: serde_json::Value = serde_json::from_slice(&output.stdout).unwrap_or_default();
    let names = json["findings"].as_array().map_or_else(Vec::new, |findings| {
        findings
            .iter()
            .map(|finding| finding["finding"].as_str().unwrap().to_owned())
            .collect()
    });
    (output.status.code().unwrap(), names, json)
}

pub fn names(bytes: &[u8]) -> Vec<String> {
    check(bytes).1
}

pub const HEAD: &str = "steelwork: 1\ndefaults: { steel: S355, period: 30, role: beam }\nmembers:\n";
