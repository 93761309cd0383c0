//! Arguments.

use std::io::IsTerminal;
use std::path::PathBuf;

use clap::{Args as Group, Parser, Subcommand, ValueEnum};
use jiff::civil::Date;

/// Fire design of structural steel members from plain-text design files.
#[derive(Debug, Parser)]
#[command(name = "scorchline", version, about)]
pub struct Args {
    #[command(subcommand)]
    pub command: Command,
    /// Colour of text.
    #[arg(long, global = true, value_name = "WHEN", default_value = "auto")]
    pub color: Color,
}

#[derive(Debug, Subcommand)]
pub enum Command {
    /// All findings of the files, folders or the current folder.
    Check {
        #[command(flatten)]
        input: Input,
        /// Form of the result.
        #[arg(long = "as", value_name = "FORM", default_value = "text")]
        form: CheckForm,
        /// Show every finding and departure, not only the first 50.
        #[arg(long)]
        all: bool,
    },
    /// The fire protection schedule: a row a member, totals a product.
    Schedule {
        #[command(flatten)]
        input: Input,
        /// Form of the result.
        #[arg(long = "as", value_name = "FORM", default_value = "table")]
        form: RowForm,
    },
    /// The section tables: dimensions, area, outline, section factors.
    Sections {
        /// A designation, or words of it.
        words: Vec<String>,
        /// Form of the result.
        #[arg(long = "as", value_name = "FORM", default_value = "table")]
        form: RowForm,
        /// Write to a file instead of standard output.
        #[arg(long, value_name = "FILE")]
        out: Option<PathBuf>,
    },
    /// Writes the built-in scenario as a starter project.
    Begin {
        /// The folder; made where it is missing.
        folder: PathBuf,
    },
    /// What a finding means, its clause, and how to answer it.
    Why {
        /// Its name; all are listed without one.
        finding: Option<String>,
    },
    /// The language server, on standard input and output.
    Serve {
        /// Accepted and ignored: there is no other way.
        #[arg(long)]
        stdio: bool,
    },
}

/// What is checked, on which day, and what counts as failing.
#[derive(Debug, Group)]
pub struct Input {
    /// Files or folders; the current folder without any.
    #[arg(value_name = "PATH")]
    pub paths: Vec<PathBuf>,
    /// Take the built-in scenario instead.
    #[arg(long, conflicts_with = "paths")]
    pub demo: bool,
    /// Least severity that makes the exit status 1 [default: error; never with --demo].
    #[arg(long, value_name = "SEVERITY")]
    pub fail_on: Option<FailOn>,
    /// Day for what expires, such as 2027-06-30; today without it.
    #[arg(long, value_name = "DATE")]
    pub on: Option<Date>,
    /// Write to a file instead of standard output.
    #[arg(long, value_name = "FILE")]
    pub out: Option<PathBuf>,
}

impl Input {
    /// The severity that makes the exit status 1.
    pub fn fails_on(&self) -> FailOn {
        self.fail_on
            .unwrap_or(if self.demo { FailOn::Never } else { FailOn::Error })
    }
}

#[derive(Debug, Clone, Copy, PartialEq, Eq, ValueEnum)]
pub enum CheckForm {
    Text,
    Json,
}

#[derive(Debug, Clone, Copy, PartialEq, Eq, ValueEnum)]
pub enum RowForm {
    Table,
    Csv,
    Json,
}

#[derive(Debug, Clone, Copy, PartialEq, Eq, ValueEnum)]
pub enum FailOn {
    Error,
    Warning,
    Never,
}

#[derive(Debug, Clone, Copy, PartialEq, Eq, ValueEnum)]
pub enum Color {
    Auto,
    Always,
    Never,
}

impl Color {
    /// Whether to colour; by itself only a terminal is coloured, never a file.
    pub fn on(self, to_file: bool) -> bool {
        match self {
            Self::Always => true,
            Self::Never => false,
            Self::Auto => !to_file && std::io::stdout().is_terminal() && std::env::var_os("NO_COLOR").is_none(),
        }
    }
}
