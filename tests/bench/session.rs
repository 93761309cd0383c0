//! Steps of a keystroke.
use scorchline::analysis::files::{Files, PathTrouble, ReadTrouble};
use scorchline::check::session::Session;
use std::path::{Path, PathBuf};
use std::sync::{Arc, Mutex};
use std::time::Instant;

struct Two(Mutex<Arc<str>>, Arc<str>);
impl Files for Two {
    fn follow(&self, _: &Path, r: &str) -> Result<PathBuf, PathTrouble> {
        Ok(PathBuf::from(r))
    }
    fn read(&self, p: &Path) -> Result<Arc<str>, ReadTrouble> {
        Ok(if p.to_str().unwrap().contains("protection") {
            self.1.clone()
        } else {
            self.0.lock().unwrap().clone()
        })
    }
}
fn main() {
    let text = std::fs::read_to_string(std::env::args().nth(1).unwrap()).unwrap();
    let lib = std::fs::read_to_string("/tmp/fr/x.protection.yaml").unwrap();
    let files = Two(Mutex::new(Arc::from(text.as_str())), Arc::from(lib.as_str()));
    let paths = [PathBuf::from("a.steelwork.yaml")];
    let mut session = Session::default();
    let on = jiff::civil::date(2026, 12, 1);
    let t = Instant::now();
    session.check(&files, &paths, on, &|| false).unwrap();
    println!("cold {:?}", t.elapsed());
    let mid = text.len() / 2;
    let at = mid + text[mid..].find("}\n").unwrap_or(0) + 1;
    for i in 0..200 {
        let mut new = text.clone();
        if i % 2 == 0 {
            new.insert(at, 'x');
        }
        *files.0.lock().unwrap() = Arc::from(new.as_str());
        let t = Instant::now();
        session.check(&files, &paths, on, &|| false).unwrap();
        if i > 190 {
            eprintln!("key {:?}", t.elapsed());
        }
    }
}
