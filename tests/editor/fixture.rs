//! A design in memory with a cursor.

use std::path::{Path, PathBuf};
use std::sync::Arc;

use scorchline::analysis::files::{Files, PathTrouble, ReadTrouble};
use scorchline::analysis::memo::Memo;
use scorchline::check::{Checked, run};
use scorchline::editor::view::View;
use scorchline::findings::finding::{FixEdit, Place};

/// Files held in memory, all in one folder.
struct Held(Vec<(String, String)>);

impl Files for Held {
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

/// A checked design and where the cursor stands in it.
pub struct Fixture {
    pub checked: Checked,
    pub file: usize,
    pub offset: u32,
}

/// The design of several files, the head first.
pub fn several(files: &[(&str, &str)]) -> Fixture {
    let mut cursor = None;
    let held = files
        .iter()
        .map(|(name, text)| {
            if let (None, Some(at)) = (&cursor, text.find('|')) {
                cursor = Some((*name, at));
                let text = format!("{}{}", &text[..at], &text[at + 1..]);
                return ((*name).to_owned(), text);
            }
            ((*name).to_owned(), (*text).to_owned())
        })
        .collect();
    let on = "2026-06-01".parse().unwrap();
    let (mut checked, troubles) = run(&Held(held), &[PathBuf::from(files[0].0)], on, &Memo::default());
    assert!(troubles.is_empty(), "{troubles:?}");
    let checked = checked.remove(0);
    let (name, at) = cursor.unwrap_or((files[0].0, 0));
    let file = checked
        .design
        .files
        .iter()
        .position(|file| file.path.as_path() == Path::new(name));
    Fixture {
        file: file.expect("the file with the cursor belongs to the design"),
        offset: u32::try_from(at).unwrap(),
        checked,
    }
}

impl Fixture {
    pub fn view(&self) -> View<'_> {
        View {
            design: &self.checked.design,
            outcomes: &self.checked.outcomes,
            file: self.file,
        }
    }

    /// Every file with its text after edits.
    pub fn edited(&self, edits: &[FixEdit]) -> Vec<(String, String)> {
        let files = self.checked.design.files.iter();
        files
            .map(|file| {
                let mut text = file.text.to_string();
                let mut own: Vec<&FixEdit> = edits.iter().filter(|edit| edit.place.path == file.path).collect();
                own.sort_by_key(|edit| edit.place.span);
                for edit in own.into_iter().rev() {
                    let span = edit.place.span;
                    text.replace_range(span.start as usize..span.end as usize, &edit.text);
                }
                (file.path.to_str().unwrap().to_owned(), text)
            })
            .collect()
    }

    /// Places as `file:line: text`, lines counted from one.
    pub fn told(&self, places: &[Place]) -> Vec<String> {
        let tell = |place: &Place| {
            let file = self.checked.design.files.iter().find(|file| file.path == place.path);
            let text: &str = &file.unwrap().text;
            let line = text[..place.span.start as usize].matches('\n').count() + 1;
            let name = place.path.to_str().unwrap().split('.').next().unwrap();
            format!("{name}:{line}: {}", place.span.slice(text))
        };
        places.iter().map(tell).collect()
    }
}
