//! Holds the sources to the layers table of `DEVELOPERS.md`: who may import whom, and which outside crate lives where.

use std::collections::BTreeMap;
use std::fs;
use std::path::{Path, PathBuf};

/// Where each outside crate (or part of the standard library) may be named, by top module.
const PLACES: &[(&str, &[&str])] = &[
    ("ropey", &["text"]),
    ("granit_parser", &["syntax"]),
    ("rayon", &["analysis", "check"]),
    ("serde_json", &["exchange", "lsp"]),
    ("serde_yaml", &["exchange"]),
    ("tower_lsp", &["lsp"]),
    ("tokio", &["lsp"]),
    ("clap", &["cli"]),
    ("miette", &["cli"]),
    ("indicatif", &["cli"]),
    ("comfy_table", &["exchange", "cli"]),
    ("std::fs", &["lsp", "cli"]),
    ("std::env", &["lsp", "cli"]),
    ("std::process", &["lsp", "cli", "main"]),
    ("std::net", &[]),
];

fn root() -> PathBuf {
    PathBuf::from(env!("CARGO_MANIFEST_DIR"))
}

fn table() -> BTreeMap<String, Vec<String>> {
    let text = fs::read_to_string(root().join("DEVELOPERS.md")).unwrap();
    let body = text
        .split("```layers\n")
        .nth(1)
        .and_then(|rest| rest.split("```").next())
        .unwrap();
    body.lines()
        .filter(|line| !line.trim().is_empty())
        .map(|line| {
            let (module, allowed) = line.split_once(':').unwrap();
            (
                module.to_owned(),
                allowed.split_whitespace().map(str::to_owned).collect(),
            )
        })
        .collect()
}

fn sources(folder: &Path, found: &mut Vec<PathBuf>) {
    for entry in fs::read_dir(folder).unwrap() {
        let path = entry.unwrap().path();
        if path.is_dir() {
            sources(&path, found);
        } else if path.extension().is_some_and(|e| e == "rs") {
            found.push(path);
        }
    }
}

/// The code of a file without comments and without its unit tests, which may reach further.
fn code(path: &Path) -> String {
    let text = fs::read_to_string(path).unwrap();
    let text = text.split("#[cfg(test)]\nmod tests").next().unwrap();
    text.lines()
        .map(|line| line.split("//").next().unwrap_or(""))
        .collect::<Vec<_>>()
        .join("\n")
}

/// Every `(module, file, code)` below `src`; `lib.rs` and `main.rs` are their own modules.
fn modules() -> Vec<(String, PathBuf, String)> {
    let src = root().join("src");
    let mut found = Vec::new();
    sources(&src, &mut found);
    found
        .into_iter()
        .map(|path| {
            let first = path.strip_prefix(&src).unwrap().components().next().unwrap();
            let module = first.as_os_str().to_string_lossy().trim_end_matches(".rs").to_owned();
            let code = code(&path);
            (module, path, code)
        })
        .collect()
}

#[test]
fn each_module_imports_only_what_its_row_allows() {
    let table = table();
    let mut breaches = Vec::new();
    for (module, path, code) in modules() {
        if module == "lib" || module == "main" {
            continue;
        }
        let Some(allowed) = table.get(&module) else {
            breaches.push(format!("{module} has no row in the layers table"));
            continue;
        };
        for (at, _) in code.match_indices("crate::") {
            let rest = &code[at + "crate::".len()..];
            let names: Vec<String> = if let Some(group) = rest.strip_prefix('{') {
                group
                    .split('}')
                    .next()
                    .unwrap()
                    .split(',')
                    .map(|n| first_word(n.trim()))
                    .collect()
            } else {
                vec![first_word(rest)]
            };
            for name in names.into_iter().filter(|n| table.contains_key(n)) {
                if name != module && !allowed.contains(&name) {
                    breaches.push(format!("{} imports {name}", path.display()));
                }
            }
        }
    }
    assert!(breaches.is_empty(), "{}", breaches.join("\n"));
}

#[test]
fn outside_crates_stay_in_their_places() {
    let mut breaches = Vec::new();
    for (module, path, code) in modules() {
        for (name, places) in PLACES {
            let used = code.contains(&format!("{name}::")) || code.contains(&format!("use {name};"));
            if used && !places.contains(&module.as_str()) {
                breaches.push(format!("{} uses {name}", path.display()));
            }
        }
    }
    assert!(breaches.is_empty(), "{}", breaches.join("\n"));
}

#[test]
fn every_row_stands_below_what_it_imports() {
    let text = fs::read_to_string(root().join("DEVELOPERS.md")).unwrap();
    let body = text
        .split("```layers\n")
        .nth(1)
        .and_then(|rest| rest.split("```").next())
        .unwrap();
    let mut above: Vec<&str> = Vec::new();
    for line in body.lines().filter(|l| !l.trim().is_empty()) {
        let (module, allowed) = line.split_once(':').unwrap();
        for name in allowed.split_whitespace() {
            assert!(
                above.contains(&name),
                "{module} lists {name}, which does not stand above it"
            );
        }
        above.push(module);
    }
}

#[test]
fn files_stay_small() {
    let long: Vec<String> = modules()
        .into_iter()
        .filter_map(|(_, path, _)| {
            let lines = fs::read_to_string(&path).unwrap().lines().count();
            (lines > 500).then(|| format!("{} has {lines} lines", path.display()))
        })
        .collect();
    assert!(long.is_empty(), "split before 500 lines: {}", long.join(", "));
}

fn first_word(text: &str) -> String {
    text.chars().take_while(|c| c.is_alphanumeric() || *c == '_').collect()
}
