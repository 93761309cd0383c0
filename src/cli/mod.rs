//! The command line.

mod args;
mod begin;
mod built_in;
mod check;
mod output;
mod progress;
mod search;
mod sections;
mod text;
mod why;

use std::process::ExitCode;

use clap::Parser;

use self::args::{Args, Command};

/// A run that could not be done; the words for the user.
type Trouble = String;

/// How a run ended that could be done.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Ending {
    /// Nothing at or above the failing level.
    Clear,
    /// Findings at or above it.
    Findings,
    /// Something could not be read; a notice said what.
    Incomplete,
}

/// Runs the command line; 0 nothing at or above the failing level, 1 findings there, 2 could not run.
#[must_use]
pub fn main() -> ExitCode {
    let args = Args::parse();
    if let Command::Serve { .. } = args.command {
        let status = crate::lsp::serve().unwrap_or_else(|error| {
            output::notice(&format!("the server can't start: {error}"));
            2
        });
        return ExitCode::from(status);
    }
    let ending = run(&args).unwrap_or_else(|trouble| {
        output::notice(&trouble);
        Ending::Incomplete
    });
    ExitCode::from(match ending {
        Ending::Clear => 0,
        Ending::Findings => 1,
        Ending::Incomplete => 2,
    })
}

fn run(args: &Args) -> Result<Ending, Trouble> {
    match &args.command {
        Command::Check { input, form, all } => check::check(input, *form, *all, args.color),
        Command::Schedule { input, form } => check::schedule(input, *form),
        Command::Sections { words, form, out } => sections::sections(words, *form, out.as_deref()),
        Command::Begin { folder } => begin::begin(folder),
        Command::Why { finding } => why::why(finding.as_deref()),
        // The server runs until its editor ends it, and has a status of its own.
        Command::Serve { .. } => Ok(Ending::Clear),
    }
}
