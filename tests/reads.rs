//! Each file of a design is read once, however many of the others name it.

use std::collections::HashMap;
use std::path::{Path, PathBuf};
use std::sync::{Arc, Mutex};

use scorchline::analysis::files::{Files, PathTrouble, ReadTrouble};
use scorchline::analysis::load::load;
use scorchline::scenario::FILES;

/// The scenario, counting how often each file is asked for.
#[derive(Default)]
struct Counted(Mutex<HashMap<PathBuf, usize>>);

impl Files for Counted {
    fn follow(&self, _: &Path, relative: &str) -> Result<PathBuf, PathTrouble> {
        Ok(PathBuf::from(relative))
    }

    fn read(&self, path: &Path) -> Result<Arc<str>, ReadTrouble> {
        *self.0.lock().unwrap().entry(path.to_owned()).or_default() += 1;
        let found = FILES.iter().find(|(name, _)| Path::new(name) == path);
        Ok(Arc::from(found.unwrap().1))
    }
}

#[test]
fn a_folder_reads_each_file_once() {
    let files = Counted::default();
    let paths: Vec<PathBuf> = FILES.iter().map(|(name, _)| PathBuf::from(name)).collect();
    let (designs, troubles) = load(&files, &paths);
    assert_eq!((designs.len(), troubles.len()), (1, 0));
    assert_eq!(designs[0].members.len(), 43);
    let counts = files.0.lock().unwrap();
    assert_eq!(counts.len(), FILES.len());
    assert!(counts.values().all(|count| *count == 1), "{counts:?}");
}
