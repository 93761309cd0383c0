//! `sections`: the section tables.

use std::path::Path;

use super::args::RowForm;
use super::{Ending, Trouble, output};
use crate::exchange::{csv, json, table};
use crate::section::catalogue::{CatalogueRow, Lookup, LookupOptions, find, rows};

/// Prints the rows that words mean; all without any.
pub fn sections(words: &[String], form: RowForm, out: Option<&Path>) -> Result<Ending, Trouble> {
    let words = words.join(" ");
    let found = rows_of(&words)?;
    let text = match form {
        RowForm::Json => json::sections(&found),
        RowForm::Csv => csv::sections(&found),
        RowForm::Table => table::sections(&found),
    };
    output::result(out, &text)?;
    Ok(Ending::Clear)
}

/// Rows that a designation means, or else those whose designation or family has every word.
fn rows_of(words: &str) -> Result<Vec<&'static CatalogueRow>, Trouble> {
    if words.trim().is_empty() {
        return Ok(rows().iter().collect());
    }
    let nearest = match find(words, &LookupOptions::default()) {
        Lookup::Found(row) => return Ok(vec![row]),
        Lookup::Ambiguous(rows) => return Ok(rows),
        Lookup::Unknown { nearest } => nearest,
    };
    let wanted: Vec<String> = words.split_whitespace().map(str::to_lowercase).collect();
    let found: Vec<&CatalogueRow> = rows()
        .iter()
        .filter(|row| {
            let name = format!("{} {}", row.family, row.designation).to_lowercase();
            wanted
                .iter()
                .all(|word| name.split([' ', '_']).any(|part| part == word))
        })
        .collect();
    if found.is_empty() {
        let names: Vec<String> = nearest
            .iter()
            .take(5)
            .map(|row| format!("`{}`", row.designation))
            .collect();
        let hint = if names.is_empty() {
            String::new()
        } else {
            format!("; the nearest are {}", names.join(", "))
        };
        return Err(format!("no section table has `{}`{hint}", words.trim()));
    }
    Ok(found)
}
