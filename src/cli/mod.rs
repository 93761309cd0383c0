//! The command line.

mod args;
mod disk;
mod text;

use std::io::Write;
use std::path::{Path, PathBuf};
use std::process::ExitCode;

use clap::Parser;

use self::args::{Args, CheckForm, Command, FailOn, RowForm};
use crate::analysis::memo::Memo;
use crate::check::{self, Checked};
use crate::exchange::{json, table};
use crate::findings::finding::Severity;
use crate::findings::registry;
use crate::report::schedule;
use crate::scenario;
use crate::section::catalogue::{CatalogueRow, Lookup, LookupOptions, find, rows};

/// A run that could not be done; the words for the user.
type Trouble = String;

/// Runs the command line; 0 nothing at or above the failing level, 1 findings there, 2 could not run.
#[must_use]
pub fn main() -> ExitCode {
    let args = Args::parse();
    match run(&args) {
        Ok(code) => code,
        Err(trouble) => {
            eprintln!("scorchline: {trouble}");
            ExitCode::from(2)
        }
    }
}

fn run(args: &Args) -> Result<ExitCode, Trouble> {
    match &args.command {
        Command::Check {
            paths,
            demo,
            form,
            fail_on,
            all,
            on,
            color,
            out,
        } => {
            let checked = checked(paths, *demo, on.as_deref())?;
            let text = match form {
                CheckForm::Text => text::check(&checked, *demo, *all, color.on()),
                CheckForm::Json => json::check(&checked),
            };
            write(out.as_deref(), &text)?;
            let fail = fail_on.unwrap_or(if *demo { FailOn::Never } else { FailOn::Error });
            Ok(exit(&checked, fail))
        }
        Command::Schedule {
            paths,
            demo,
            form,
            on,
            out,
        } => {
            let checked = checked(paths, *demo, on.as_deref())?;
            let mut text = String::new();
            for design in &checked {
                let schedule = schedule::schedule(design);
                text.push_str(&match form {
                    RowForm::Table => table::schedule(&schedule),
                    RowForm::Json => json::schedule(&schedule),
                    RowForm::Csv => {
                        let (header, rows) = json::rows(&json::schedule_rows(&schedule));
                        table::csv(&header, &rows)
                    }
                });
            }
            write(out.as_deref(), &text)?;
            Ok(ExitCode::SUCCESS)
        }
        Command::Sections { words, form, out } => {
            let found = sections(&words.join(" "));
            if found.is_empty() {
                return Err(format!("no section table has `{}`", words.join(" ")));
            }
            let values: Vec<_> = found.iter().map(|row| json::section(row)).collect();
            let (header, cells) = json::rows(&values);
            let text = match form {
                RowForm::Json => json::sections(&found),
                RowForm::Csv => table::csv(&header, &cells),
                RowForm::Table => sections_table(&found),
            };
            write(out.as_deref(), &text)?;
            Ok(ExitCode::SUCCESS)
        }
        Command::Begin { folder } => begin(folder),
        Command::Why { finding } => why(finding.as_deref()),
    }
}

fn checked(paths: &[PathBuf], demo: bool, on: Option<&str>) -> Result<Vec<Checked>, Trouble> {
    let on = match on {
        Some(text) => text
            .parse()
            .map_err(|_| format!("`{text}` is no date; write one such as 2027-06-30"))?,
        None => jiff::ZonedDateTime::now().date(),
    };
    let memo = Memo::default();
    if demo {
        let files = disk::Scenario;
        let (checked, _) = check::run(&files, &[PathBuf::from(scenario::FILES[0].0)], on, &memo);
        return Ok(checked);
    }
    let paths = if paths.is_empty() {
        vec![PathBuf::from(".")]
    } else {
        paths.to_vec()
    };
    let found = disk::designs(&paths)?;
    if found.is_empty() {
        return Err(
            "no design file (`*.steelwork.yaml`, `*.protection.yaml`) is here; `scorchline begin DIR` writes one"
                .to_owned(),
        );
    }
    let files = disk::Disk;
    let (checked, troubles) = check::run(&files, &found, on, &memo);
    match troubles.first() {
        Some((path, trouble)) => Err(format!("{} can't be read: {trouble}", path.display())),
        None => Ok(checked),
    }
}

fn exit(checked: &[Checked], fail: FailOn) -> ExitCode {
    let worst = checked
        .iter()
        .flat_map(|design| &design.findings)
        .map(|finding| finding.severity)
        .min();
    let failed = match (fail, worst) {
        (FailOn::Never, _) | (_, None) => false,
        (FailOn::Error, Some(worst)) => worst == Severity::Error,
        (FailOn::Warning, Some(worst)) => worst <= Severity::Warning,
    };
    ExitCode::from(u8::from(failed))
}

/// Writes the result. A reader that has gone away is no failure.
fn write(out: Option<&Path>, text: &str) -> Result<(), Trouble> {
    if let Some(path) = out {
        return std::fs::write(path, text).map_err(|error| format!("{}: {error}", path.display()));
    }
    match std::io::stdout().lock().write_all(text.as_bytes()) {
        Err(error) if error.kind() != std::io::ErrorKind::BrokenPipe => Err(error.to_string()),
        _ => Ok(()),
    }
}

/// Rows that a designation means, or whose designation or family holds every word.
fn sections(words: &str) -> Vec<&'static CatalogueRow> {
    if words.trim().is_empty() {
        return rows().iter().collect();
    }
    match find(words, &LookupOptions::default()) {
        Lookup::Found(row) => vec![row],
        Lookup::Ambiguous(rows) => rows,
        Lookup::Unknown { .. } => {
            let words: Vec<String> = words.split_whitespace().map(str::to_lowercase).collect();
            rows()
                .iter()
                .filter(|row| {
                    let name = format!("{} {}", row.family, row.designation).to_lowercase();
                    words
                        .iter()
                        .all(|word| name.split([' ', '_']).any(|part| part == word || name == *word))
                })
                .collect()
        }
    }
}

fn sections_table(found: &[&CatalogueRow]) -> String {
    use crate::section::{Casing, Exposure, heated};
    use crate::units::significant;
    let rows = found
        .iter()
        .map(|row| {
            let geometry = row.geometry();
            let factor = |exposure, casing| {
                heated(geometry, exposure, casing)
                    .map_or_else(|_| "–".to_owned(), |heated| significant(heated.factor.per_m(), 1))
            };
            vec![
                row.designation.to_string(),
                row.standard.to_owned(),
                significant(row.mass.kg_m(), 1),
                significant(geometry.area.mm2(), 0),
                significant(geometry.perimeter.mm(), 0),
                factor(Exposure::AllRound, Casing::Profile),
                factor(Exposure::ThreeSides, Casing::Profile),
                factor(Exposure::AllRound, Casing::Box),
                factor(Exposure::ThreeSides, Casing::Box),
            ]
        })
        .collect();
    let header = [
        "section",
        "standard",
        "kg/m",
        "A mm²",
        "outline mm",
        "all round 1/m",
        "three sides",
        "box 4",
        "box 3",
    ];
    table::table(&header, rows)
}

fn begin(folder: &Path) -> Result<ExitCode, Trouble> {
    for (name, _) in scenario::FILES {
        if folder.join(name).exists() {
            return Err(format!(
                "{} is there already; nothing was written",
                folder.join(name).display()
            ));
        }
    }
    std::fs::create_dir_all(folder).map_err(|error| format!("{}: {error}", folder.display()))?;
    for (name, text) in scenario::FILES {
        let path = folder.join(name);
        std::fs::write(&path, text).map_err(|error| format!("{}: {error}", path.display()))?;
        println!("wrote {}", path.display());
    }
    println!("next: scorchline check {}", folder.display());
    Ok(ExitCode::SUCCESS)
}

fn why(name: Option<&str>) -> Result<ExitCode, Trouble> {
    let Some(name) = name else {
        let mut text = String::new();
        for declaration in registry::REGISTRY {
            text.push_str(&format!(
                "{:<30} {:<12} {}\n",
                declaration.name,
                declaration.severity.word(),
                declaration.summary
            ));
        }
        write(None, &text)?;
        return Ok(ExitCode::SUCCESS);
    };
    let Some(found) = registry::find(name) else {
        let near = crate::design::keys::nearest(name, registry::REGISTRY.iter().map(|d| d.name));
        let near = near.map_or(String::new(), |near| format!("; perhaps `{near}`"));
        return Err(format!("no finding is called `{name}`{near}"));
    };
    let text = format!(
        "{} ({}; {})\n{}\n{}\nFix: {}\n\nBefore:\n{}\n\nAfter:\n{}\n",
        found.name,
        found.severity.word(),
        found.clause,
        found.summary,
        found.answer,
        found.fix,
        indented(found.before),
        indented(found.after)
    );
    write(None, &text)?;
    Ok(ExitCode::SUCCESS)
}

/// An example, set off from the text around it.
fn indented(example: &str) -> String {
    example
        .lines()
        .map(|line| format!("    {line}"))
        .collect::<Vec<_>>()
        .join("\n")
}
