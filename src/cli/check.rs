//! `check` and `schedule`: both check designs, and differ in what they print of it.

use std::path::PathBuf;

use super::args::{CheckForm, Color, FailOn, Input, RowForm};
use super::built_in::BuiltIn;
use super::search::{self, Shown};
use super::{Ending, Trouble, output, progress, text};
use crate::analysis::memo::Memo;
use crate::check::{self, Checked};
use crate::exchange::{csv, json, table};
use crate::findings::finding::Severity;
use crate::lsp::disk::Disk;
use crate::report::schedule::schedule as schedule_of;
use crate::scenario;

/// Designs that were checked, and what stood in the way of others.
struct Run {
    checked: Vec<Checked>,
    shown: Shown,
    complete: bool,
}

/// All findings.
pub fn check(input: &Input, form: CheckForm, all: bool, color: Color) -> Result<Ending, Trouble> {
    let run = run(input)?;
    let show = |path: &std::path::Path| run.shown.path(path);
    let result = match form {
        CheckForm::Json => json::check(&run.checked, &show),
        CheckForm::Text => {
            let color = color.on(input.out.is_some());
            text::check(
                &run.checked,
                &text::Manner {
                    demo: input.demo,
                    all,
                    color,
                    show: &show,
                },
            )
        }
    };
    output::result(input.out.as_deref(), &result)?;
    Ok(run.ending(input.fails_on()))
}

/// The fire protection schedule.
pub fn schedule(input: &Input, form: RowForm) -> Result<Ending, Trouble> {
    let run = run(input)?;
    let schedule = schedule_of(&run.checked);
    let result = match form {
        RowForm::Table => output::plain(&table::schedule(&schedule)),
        RowForm::Json => json::schedule(&schedule),
        RowForm::Csv => csv::schedule(&schedule),
    };
    output::result(input.out.as_deref(), &result)?;
    Ok(run.ending(input.fails_on()))
}

fn run(input: &Input) -> Result<Run, Trouble> {
    let on = input.on.unwrap_or_else(|| jiff::ZonedDateTime::now().date());
    let memo = Memo::default();
    if input.demo {
        let heads = [PathBuf::from(scenario::FILES[0].0)];
        let (checked, _) = progress::during(&memo, || check::run(&BuiltIn, &heads, on, &memo));
        let shown = Shown::default();
        return Ok(Run {
            checked,
            shown,
            complete: true,
        });
    }
    let here = [PathBuf::from(".")];
    let found = search::designs(if input.paths.is_empty() { &here } else { &input.paths })?;
    if found.files.is_empty() && found.troubles.is_empty() {
        return Err(
            "no design file (`*.steelwork.yaml`, `*.protection.yaml`) is here; `scorchline begin DIR` writes one"
                .to_owned(),
        );
    }
    let (checked, unread) = progress::during(&memo, || check::run(&Disk::default(), &found.files, on, &memo));
    let unread = unread
        .into_iter()
        .map(|(path, trouble)| format!("{} can't be read: {trouble}", found.shown.path(&path)));
    let mut troubles: Vec<String> = found.troubles.into_iter().chain(unread).collect();
    let complete = troubles.is_empty();
    let last = if checked.is_empty() { troubles.pop() } else { None };
    for trouble in &troubles {
        output::notice(trouble);
    }
    if let Some(trouble) = last {
        return Err(trouble);
    }
    Ok(Run {
        checked,
        shown: found.shown,
        complete,
    })
}

impl Run {
    fn ending(&self, fails_on: FailOn) -> Ending {
        let worst = self
            .checked
            .iter()
            .flat_map(|design| &design.findings)
            .map(|finding| finding.severity)
            .min();
        let failed = match (fails_on, worst) {
            (FailOn::Never, _) | (_, None) => false,
            (FailOn::Error, Some(worst)) => worst == Severity::Error,
            (FailOn::Warning, Some(worst)) => worst <= Severity::Warning,
        };
        match (self.complete, failed) {
            (false, _) => Ending::Incomplete,
            (true, true) => Ending::Findings,
            (true, false) => Ending::Clear,
        }
    }
}
