//! Every finding's example through the one sequence: the text before has the finding, the text after has not.

use std::path::{Path, PathBuf};
use std::sync::Arc;

use scorchline::analysis::files::{Files, PathTrouble, ReadTrouble};
use scorchline::analysis::memo::Memo;
use scorchline::check::{Checked, run};
use scorchline::findings::registry::{REGISTRY, example_files};

/// Files held in memory, all in one folder.
struct Held(Vec<(String, String)>);

impl Files for Held {
    fn follow(&self, _: &Path, relative: &str) -> Result<PathBuf, PathTrouble> {
        if relative.starts_with("..") {
            return Err(PathTrouble::Outside("by `..`"));
        }
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

fn check(example: &str) -> Checked {
    let files = Held(example_files(example));
    let on = "2026-06-01".parse().unwrap();
    let (mut checked, troubles) = run(&files, &[PathBuf::from("frame.steelwork.yaml")], on, &Memo::default());
    assert!(troubles.is_empty(), "{troubles:?}");
    assert_eq!(checked.len(), 1);
    checked.remove(0)
}

fn names(checked: &Checked) -> Vec<&'static str> {
    checked.findings.iter().map(|finding| finding.name()).collect()
}

fn messages(checked: &Checked) -> Vec<String> {
    checked
        .findings
        .iter()
        .map(|finding| format!("{}: {}", finding.name(), finding.message))
        .collect()
}

#[test]
fn examples_have_their_finding_before_and_not_after() {
    let mut wrong = Vec::new();
    for declaration in REGISTRY {
        let before = check(declaration.before);
        if !names(&before).contains(&declaration.name) {
            wrong.push(format!(
                "{} is not found before: {:#?}",
                declaration.name,
                messages(&before)
            ));
        }
        let after = check(declaration.after);
        if names(&after).contains(&declaration.name) {
            wrong.push(format!("{} is found after: {:#?}", declaration.name, messages(&after)));
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}
