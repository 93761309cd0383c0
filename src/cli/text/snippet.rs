//! A finding in full: its message, and the characters at fault in their line.

use miette::{
    GraphicalReportHandler, GraphicalTheme, LabeledSpan, MietteDiagnostic, MietteError, MietteSpanContents, Report,
    SourceCode, SourceSpan, SpanContents,
};

use super::{Item, Manner, WIDTH};
use crate::cli::output::{message, picture, plain};
use crate::findings::finding::Severity;

/// Characters of a line shown before the first and after the first at fault; the rest of a long line is cut.
const BEFORE: usize = 50;
const AFTER: usize = 50;

/// One line of a file, cut to what fits, that knows where it stands. The cost of a snippet grows with the text that it
/// is cut from, so it is never given more.
#[derive(Debug)]
struct Excerpt {
    name: String,
    text: String,
    /// Zero-based line, and column in Unicode scalars of the first character at fault.
    line: usize,
    column: usize,
}

impl SourceCode for Excerpt {
    fn read_span<'a>(
        &'a self,
        _: &SourceSpan,
        _: usize,
        _: usize,
    ) -> Result<Box<dyn SpanContents<'a> + 'a>, MietteError> {
        let whole = (0, self.text.len()).into();
        let (data, name) = (self.text.as_bytes(), self.name.clone());
        let contents = MietteSpanContents::new_named(name, data, whole, self.line, self.column, 1);
        Ok(Box::new(contents))
    }
}

/// The characters at fault with their neighbours of the same line: text, first byte at fault, length.
fn excerpt(text: &str, start: usize, end: usize) -> (String, usize, usize) {
    let breaks = |c: char| c == '\n' || c == '\r';
    let (before, after) = (text.get(..start).unwrap_or(""), text.get(start..).unwrap_or(""));
    let mut left: Vec<char> = before
        .chars()
        .rev()
        .take_while(|c| !breaks(*c))
        .take(BEFORE + 1)
        .collect();
    if left.len() > BEFORE {
        left[BEFORE] = '…';
    }
    // What a cut line has room for on one side is given to the other.
    let room = AFTER + BEFORE.saturating_sub(left.len());
    let mut right: Vec<(usize, char)> = after
        .char_indices()
        .take_while(|(_, c)| !breaks(*c))
        .take(room + 1)
        .collect();
    if right.len() > room {
        right[room].1 = '…';
    }
    let mut out: String = left.iter().rev().map(|c| picture(*c)).collect();
    let from = out.len();
    let mut length = 0;
    for (at, c) in right {
        out.push(picture(c));
        if start + at < end {
            length = out.len() - from;
        }
    }
    // An end of line has no character that a mark could stand under.
    if from == out.len() {
        out.push(' ');
    }
    (out, from, length)
}

/// A finding in full.
pub(super) fn snippet(item: &Item<'_>, manner: &Manner<'_>) -> String {
    let finding = item.finding;
    let (at, position) = item.design.position(&finding.place);
    let file = &item.design.checked.design.files[at];
    let (text, from, length) = excerpt(
        &file.text,
        finding.place.span.start as usize,
        finding.place.span.end as usize,
    );
    let notes = finding.notes.iter().map(|note| match &note.place {
        Some(place) => {
            let (at, position) = item.design.position(place);
            let path = (manner.show)(&item.design.checked.design.files[at].path);
            format!("{} ({path}:{}:{})", note.text, position.line + 1, position.column + 1)
        }
        None => note.text.clone(),
    });
    let fixes = finding.fixes.iter().map(|fix| format!("perhaps: {}", fix.title));
    let help: Vec<String> = notes.chain(fixes).map(|line| message(&line)).collect();
    let severity = match finding.severity {
        Severity::Error => miette::Severity::Error,
        Severity::Warning => miette::Severity::Warning,
        Severity::Information | Severity::Hint => miette::Severity::Advice,
    };
    let mut diagnostic = MietteDiagnostic::new(message(&finding.message))
        .with_severity(severity)
        .with_code(format!("{} ({})", finding.name(), finding.severity.word()))
        .with_label(LabeledSpan::new(None, from, length));
    if !help.is_empty() {
        diagnostic = diagnostic.with_help(help.join("\n"));
    }
    let report = Report::new(diagnostic).with_source_code(Excerpt {
        name: plain(&(manner.show)(&file.path)),
        text,
        line: position.line as usize,
        column: position.column as usize,
    });
    let theme = if manner.color {
        GraphicalTheme::unicode()
    } else {
        GraphicalTheme::unicode_nocolor()
    };
    let handler = GraphicalReportHandler::new_themed(theme)
        .with_width(WIDTH)
        .with_links(false);
    let mut out = String::new();
    match handler.render_report(&mut out, report.as_ref()) {
        Ok(()) => out,
        Err(_) => format!("{}: {}\n", finding.name(), message(&finding.message)),
    }
}

#[cfg(test)]
mod tests {
    use super::excerpt;

    #[test]
    fn a_line_is_cut_round_the_characters_at_fault() {
        let (text, from, length) = excerpt("a: 1\nmark: 梁1\nb: 2", 11, 15);
        assert_eq!((text.as_str(), from, length), ("mark: 梁1", 6, 4));
        let long = format!("x: {}BAD{}", "-".repeat(10_000), "+".repeat(10_000));
        let (text, from, length) = excerpt(&long, 10_003, 10_006);
        assert_eq!(&text[from..from + length], "BAD");
        assert!(text.starts_with('…') && text.ends_with('…') && text.chars().count() < 110);
    }

    #[test]
    fn the_end_of_a_line_can_be_marked() {
        assert_eq!(excerpt("a: \nb: 1", 3, 4), ("a: ".to_owned() + " ", 3, 0));
        assert_eq!(excerpt("", 0, 0), (" ".to_owned(), 0, 0));
        // A span over several lines is marked to the end of its first.
        assert_eq!(excerpt("ab\ncd", 0, 5), ("ab".to_owned(), 0, 2));
    }
}
