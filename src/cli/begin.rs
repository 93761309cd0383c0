//! `begin`: the built-in scenario as a starter project.

use std::fs::OpenOptions;
use std::io::Write;
use std::path::Path;

use super::{Ending, Trouble, output};
use crate::scenario;

/// Writes the scenario. Nothing that is there is overwritten.
pub fn begin(folder: &Path) -> Result<Ending, Trouble> {
    for (name, _) in scenario::FILES {
        let path = folder.join(name);
        if path.symlink_metadata().is_ok() {
            return Err(format!("{} is there already; nothing was written", path.display()));
        }
    }
    std::fs::create_dir_all(folder).map_err(|error| format!("{} can't be made: {error}", folder.display()))?;
    let mut told = String::new();
    for (name, text) in scenario::FILES {
        let path = folder.join(name);
        // A file that came since the look above is not overwritten either.
        let written = OpenOptions::new()
            .write(true)
            .create_new(true)
            .open(&path)
            .and_then(|mut file| file.write_all(text.as_bytes()));
        written.map_err(|error| format!("{} can't be written: {error}", path.display()))?;
        told.push_str(&format!("wrote {}\n", path.display()));
    }
    told.push_str(&format!("Next: `scorchline check {}`\n", folder.display()));
    output::result(None, &output::plain(&told))?;
    Ok(Ending::Clear)
}
