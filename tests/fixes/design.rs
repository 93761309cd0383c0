//! Cases as designs in memory.

use std::path::{Path, PathBuf};
use std::sync::Arc;

use scorchline::analysis::files::{PathTrouble, ReadTrouble};
use scorchline::analysis::memo::Memo;
use scorchline::check::{Checked, run};
use scorchline::findings::registry::EXAMPLE_LIBRARY;
use scorchline::syntax::Value;
use scorchline::syntax::item::{Form, parse_item};

/// Names and texts, the head first.
pub type Files = Vec<(String, String)>;

/// What stands before the members of a case that is no whole file.
const FRAME: &str = "steelwork: 1   # ✎ 梁
libraries: [demo.protection.yaml]
defaults: { role: beam, steel: S355, period: 30, critical temperature: 550 }
groups:
  floors: { section: IPE 200, period: 90, protection: { product: grey board, thickness: 15 } }
  layered: { section: IPE 200, period: 90, protection: { product: grey board, thickness: 15, primer: red oxide, applied: site } }
  followed: { section: IPE 300, protection: { product: grey board, form: profile } }
  slender: { section: IPE 80, period: 120, protection: white spray }
  'odd: name': { section: HE 300 B, protection: grey board }
members:
  # 柱 — before it
  - { mark: Z1, section: HE 300 B, protection: grey board }
";
/// What stands behind them.
const BEHIND: &str = "  # ✎ behind it
  - mark: Z2
    section: HE 300 B
    protection: grey board
";

struct Held<'a>(&'a Files);

impl scorchline::analysis::files::Files for Held<'_> {
    fn follow(&self, _: &Path, relative: &str) -> Result<PathBuf, PathTrouble> {
        let found = self.0.iter().any(|(name, _)| name == relative);
        found.then(|| PathBuf::from(relative)).ok_or(PathTrouble::Missing)
    }

    fn read(&self, path: &Path) -> Result<Arc<str>, ReadTrouble> {
        let found = self.0.iter().find(|(name, _)| Path::new(name) == path);
        found
            .map(|(_, text)| Arc::from(text.as_str()))
            .ok_or_else(|| ReadTrouble::System("there is no such file".to_owned()))
    }
}

/// A case's files: its members between others, or the whole file that it is, with the library of the examples.
pub fn files_of(case: &str) -> Files {
    let head = if case.starts_with("steelwork:") {
        case.to_owned()
    } else {
        let members: String = case.lines().map(|line| format!("  {line}\n")).collect();
        format!("{FRAME}{members}{BEHIND}")
    };
    vec![
        ("frame.steelwork.yaml".to_owned(), head),
        ("demo.protection.yaml".to_owned(), EXAMPLE_LIBRARY.to_owned()),
    ]
}

/// The members of a case, each written in one line in flow style, with a line a key. `None` of other cases, and of those
/// with a comment.
pub fn in_block_style(case: &str) -> Option<String> {
    let mut block = String::new();
    for line in case.lines() {
        if !line.starts_with("- {") || line.contains('#') {
            return None;
        }
        let tree = parse_item(line, Form::Listed);
        let root = tree.root.filter(|_| tree.errors.is_empty())?;
        let Value::Mapping(entries) = &root.value else {
            return None;
        };
        for (n, entry) in entries.iter().enumerate() {
            // A comma in a number is read as a second key in flow style only.
            let both = entry.key.span.join(entry.value.span);
            let text = both.slice(line);
            let previous = n.checked_sub(1).and_then(|n| entries.get(n));
            if previous.is_some_and(|previous| previous.value.span.end + 1 == both.start) {
                block.pop();
                block.push_str(&format!(",{text}\n"));
                continue;
            }
            block.push_str(&format!("{}{text}\n", if n == 0 { "- " } else { "  " }));
        }
    }
    Some(block)
}

/// The case checked.
pub fn check(files: &Files) -> Checked {
    let on = "2026-06-01".parse().unwrap();
    let paths = [PathBuf::from("frame.steelwork.yaml")];
    let (mut checked, troubles) = run(&Held(files), &paths, on, &Memo::default());
    assert!(troubles.is_empty(), "{troubles:?}");
    checked.remove(0)
}
