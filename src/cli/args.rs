//! Arguments.

use std::io::IsTerminal;
use std::path::PathBuf;

use clap::{Parser, Subcommand, ValueEnum};

/// Fire design of structural steel members from plain-text design files.
#[derive(Debug, Parser)]
#[command(name = "scorchline", version, about)]
pub struct Args {
    #[command(subcommand)]
    pub command: Command,
}

#[derive(Debug, Subcommand)]
pub enum Command {
    /// All findings of the files, folders or the current folder.
    Check {
        /// Files or folders.
        paths: Vec<PathBuf>,
        /// Check the built-in scenario instead.
        #[arg(long)]
        demo: bool,
        /// Form of the result.
        #[arg(long = "as", value_name = "FORM", default_value = "text")]
        form: CheckForm,
        /// Least severity that makes the exit status 1 (error; never for --demo).
        #[arg(long)]
        fail_on: Option<FailOn>,
        /// Show every finding, not only the first 50.
        #[arg(long)]
        all: bool,
        /// Date for what expires; today unless given.
        #[arg(long, value_name = "DATE")]
        on: Option<String>,
        /// Colour of the text.
        #[arg(long, default_value = "auto")]
        color: Color,
        /// Write to a file.
        #[arg(long, value_name = "FILE")]
        out: Option<PathBuf>,
    },
    /// The fire protection schedule: a row a member, totals a product.
    Schedule {
        /// Files or folders.
        paths: Vec<PathBuf>,
        /// The built-in scenario instead.
        #[arg(long)]
        demo: bool,
        /// Form of the result.
        #[arg(long = "as", value_name = "FORM", default_value = "table")]
        form: RowForm,
        /// Date for what expires; today unless given.
        #[arg(long, value_name = "DATE")]
        on: Option<String>,
        /// Write to a file.
        #[arg(long, value_name = "FILE")]
        out: Option<PathBuf>,
    },
    /// The section tables: dimensions, area, outline, section factors.
    Sections {
        /// A designation, or words of it.
        words: Vec<String>,
        /// Form of the result.
        #[arg(long = "as", value_name = "FORM", default_value = "table")]
        form: RowForm,
        /// Write to a file.
        #[arg(long, value_name = "FILE")]
        out: Option<PathBuf>,
    },
    /// Writes the built-in scenario as a starter project.
    Begin {
        /// The folder.
        folder: PathBuf,
    },
    /// What a finding means and how to answer it.
    Why {
        /// Its name; all are listed without one.
        finding: Option<String>,
    },
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
    /// Whether to colour what goes to standard output.
    pub fn on(self) -> bool {
        match self {
            Self::Always => true,
            Self::Never => false,
            Self::Auto => std::io::stdout().is_terminal() && std::env::var_os("NO_COLOR").is_none(),
        }
    }
}
