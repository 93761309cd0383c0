//! The one sequence that server, command line and tests call: read, evaluate, find, depart.

mod around;
mod kept;
pub mod live;
mod own;
pub mod session;

use std::path::PathBuf;
use std::sync::Arc;

use jiff::civil::Date;

use crate::analysis::design::Design;
use crate::analysis::files::{Files, ReadTrouble};
use crate::analysis::load::load;
use crate::analysis::memo::Memo;
use crate::analysis::outcome::Outcome;
use crate::check::live::Live;
use crate::findings::finding::Finding;

/// A design that was checked.
#[derive(Debug)]
pub struct Checked {
    /// The design.
    pub design: Arc<Design>,
    /// Outcomes in the order of the design's members.
    pub outcomes: Vec<Arc<Outcome>>,
    /// Open findings, by file and position.
    pub findings: Vec<Finding>,
    /// Findings that a departure agrees to.
    pub agreed: Vec<Finding>,
}

/// Checks every design among the files, on a date. Files that can't be read are answered with their trouble.
#[must_use]
pub fn run(files: &dyn Files, paths: &[PathBuf], on: Date, memo: &Memo) -> (Vec<Checked>, Vec<(PathBuf, ReadTrouble)>) {
    let (designs, troubles) = load(files, paths);
    let live = designs
        .into_iter()
        .filter_map(|design| Live::check(design, None, on, memo, &|| false));
    (live.map(|live| live.checked()).collect(), troubles)
}
