//! Findings as text: in full with a snippet of the file each, or briefly where the whole is to fit on a page.

mod brief;
mod snippet;
mod summary;

use std::path::Path;

use crate::check::Checked;
use crate::findings::finding::{Finding, Place, Severity};
use crate::text::{Encoding, LineIndex, Position};

/// Findings shown in full unless all are asked for.
const SHOWN: usize = 50;
/// Columns that text is wrapped at.
const WIDTH: usize = 110;

/// How the text is to be.
pub struct Manner<'a> {
    /// Whether it is the built-in scenario, shown on a page.
    pub demo: bool,
    /// Whether every finding is shown.
    pub all: bool,
    /// Whether it is coloured.
    pub color: bool,
    /// How paths are shown.
    pub show: &'a dyn Fn(&Path) -> String,
}

/// A finding beside the design that it is of.
#[derive(Clone, Copy)]
struct Item<'a> {
    design: &'a Design<'a>,
    finding: &'a Finding,
}

/// A checked design with the lines of its files.
struct Design<'a> {
    checked: &'a Checked,
    lines: Vec<LineIndex>,
}

impl<'a> Design<'a> {
    fn new(checked: &'a Checked) -> Self {
        let lines = checked
            .design
            .files
            .iter()
            .map(|file| LineIndex::new(&file.text))
            .collect();
        Self { checked, lines }
    }

    /// The index of a place's file, and its first character's position there.
    fn position(&self, place: &Place) -> (usize, Position) {
        let files = &self.checked.design.files;
        let at = files.iter().position(|file| file.path == place.path).unwrap_or(0);
        (
            at,
            self.lines[at].position(&files[at].text, place.span.start, Encoding::Utf32),
        )
    }
}

/// The text of a check.
pub fn check(checked: &[Checked], manner: &Manner<'_>) -> String {
    let designs: Vec<Design<'_>> = checked.iter().map(Design::new).collect();
    let mut items: Vec<Item<'_>> = designs
        .iter()
        .flat_map(|design| {
            design
                .checked
                .findings
                .iter()
                .map(move |finding| Item { design, finding })
        })
        .collect();
    items.sort_by_key(|item| item.finding.severity);
    let end = summary::summary(checked, items.len(), manner);
    if manner.demo && !manner.all {
        return brief::page(&items, end, manner);
    }
    let limit = if manner.all { usize::MAX } else { SHOWN };
    let mut out = String::new();
    for item in items.iter().take(limit) {
        out.push_str(&snippet::snippet(item, manner));
        out.push('\n');
    }
    out + &end
}

/// Text in the colour of a severity.
fn painted(text: &str, severity: Severity, color: bool) -> String {
    let code = match severity {
        _ if !color => return text.to_owned(),
        Severity::Error => "1;31",
        Severity::Warning => "1;33",
        Severity::Information => "1;36",
        Severity::Hint => "1;32",
    };
    format!("\u{1b}[{code}m{text}\u{1b}[0m")
}

/// A number with its noun.
fn count(n: usize, noun: &str) -> String {
    let s = if n == 1 || noun == "information" { "" } else { "s" };
    format!("{n} {noun}{s}")
}

/// Text broken at spaces to the width; the first line and those that follow indented.
fn wrapped(text: &str, first: usize, following: usize) -> String {
    let mut out = " ".repeat(first);
    let mut column = first;
    for (n, word) in text.split_whitespace().enumerate() {
        let size = word.chars().count();
        if n > 0 && column + 1 + size > WIDTH {
            out.push('\n');
            out.push_str(&" ".repeat(following));
            column = following;
        } else if n > 0 {
            out.push(' ');
            column += 1;
        }
        out.push_str(word);
        column += size;
    }
    out.push('\n');
    out
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn text_is_broken_at_spaces_only() {
        let text = format!("{} {} end", "a".repeat(60), "b".repeat(60));
        let lines = wrapped(&text, 2, 4);
        assert_eq!(lines, format!("  {}\n    {} end\n", "a".repeat(60), "b".repeat(60)));
        assert_eq!(wrapped(&"x".repeat(300), 0, 4).lines().count(), 1);
    }
}
