//! The one sequence that command line and tests call: read, evaluate, find, depart.

use std::path::PathBuf;
use std::sync::Arc;

use jiff::civil::Date;
use rayon::prelude::*;

use crate::analysis::design::Design;
use crate::analysis::files::{Files, ReadTrouble};
use crate::analysis::inputs::{Inputs, Names};
use crate::analysis::load::load;
use crate::analysis::memo::Memo;
use crate::analysis::names::lookup_options;
use crate::analysis::outcome::Outcome;
use crate::findings::finding::Finding;
use crate::findings::{self, departures, reading};

/// A design that was checked.
#[derive(Debug)]
pub struct Checked {
    /// The design.
    pub design: Design,
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
    (
        designs.into_iter().map(|design| check(design, on, memo)).collect(),
        troubles,
    )
}

/// Checks one design.
#[must_use]
pub fn check(design: Design, on: Date, memo: &Memo) -> Checked {
    let names = Names {
        design: &design,
        options: lookup_options(design.basis()),
    };
    let outcomes: Vec<Arc<Outcome>> = design
        .members
        .par_iter()
        .map(|at| memo.outcome(Inputs::of(design.member(*at).value(), &names)))
        .collect();
    let mut findings = Vec::new();
    reading::reading(&design, &mut findings);
    findings::design(&design, &outcomes, &mut findings);
    let mut by_mark: rustc_hash::FxHashMap<String, Vec<Finding>> = rustc_hash::FxHashMap::default();
    let mut open = Vec::new();
    for finding in findings {
        match &finding.mark {
            Some(mark) => by_mark.entry(mark.clone()).or_default().push(finding),
            None => open.push(finding),
        }
    }
    let split: Vec<(Vec<Finding>, Vec<Finding>)> = design
        .members
        .par_iter()
        .zip(&outcomes)
        .map(|(at, outcome)| {
            let mut own = Vec::new();
            findings::member(&design, *at, outcome, on, &mut own);
            let mark = design.member(*at).value().mark.value();
            let first = mark.is_some_and(|mark| design.marks.get(mark) == Some(at));
            if first && let Some(more) = mark.and_then(|mark| by_mark.get(mark)) {
                own.extend(more.iter().cloned());
            }
            departures::apply(&design, *at, outcome, on, own)
        })
        .collect();
    let mut agreed = Vec::new();
    for (mut own, mut accepted) in split {
        open.append(&mut own);
        agreed.append(&mut accepted);
    }
    for finding in by_mark
        .into_iter()
        .filter(|(mark, _)| !design.marks.contains_key(mark))
        .flat_map(|(_, f)| f)
    {
        open.push(finding);
    }
    let order = |finding: &Finding| (finding.place.path.to_path_buf(), finding.place.span, finding.severity);
    open.sort_by_cached_key(order);
    agreed.sort_by_cached_key(order);
    Checked {
        design,
        outcomes,
        findings: open,
        agreed,
    }
}
