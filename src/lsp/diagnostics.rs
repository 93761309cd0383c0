//! Findings as the editor shows them: which of many, how grave while a line is still being typed, and in its terms.

use tower_lsp::lsp_types::{
    Diagnostic, DiagnosticRelatedInformation, DiagnosticSeverity, DiagnosticTag, Location, NumberOrString,
};

use crate::analysis::design::FileIndex;
use crate::check::live::{Live, Shown};
use crate::editor::view::{View, Within};
use crate::findings::finding::{Finding, Place, Severity};
use crate::lsp::convert::Lines;
use crate::lsp::explain;
use crate::lsp::shared::Snapshot;
use crate::text::Span;

/// The most findings that are published of a file.
pub const MOST: usize = 500;

/// The line that is being typed: findings there that more typing may answer are hints for the moment.
pub type Typed = Option<Span>;

/// The findings of a file, those of the member last edited always among them.
pub fn of_file(
    snapshot: &Snapshot,
    (live, file): (&Live, FileIndex),
    shown: Vec<Shown<'_>>,
    edited: Typed,
    calm: bool,
) -> Vec<Diagnostic> {
    let lines = snapshot.lines(live, file);
    let more = shown.len().saturating_sub(MOST);
    let chosen = choose(shown, edited.map(|line| item_around(live, file, line)));
    let mut diagnostics: Vec<Diagnostic> = chosen
        .into_iter()
        .map(|shown| {
            let typed = edited.filter(|_| calm).is_some_and(|line| touches(line, shown.span()));
            let calm = typed && shown.is_slip();
            diagnostic(snapshot, shown.made(), |place| shown.now(place), &lines, calm)
        })
        .collect();
    if more > 0 {
        diagnostics.push(Diagnostic {
            severity: Some(DiagnosticSeverity::INFORMATION),
            source: Some("scorchline".to_owned()),
            message: format!(
                "{more} more findings of this file are not shown here; `scorchline check --all` lists them"
            ),
            ..Diagnostic::default()
        });
    }
    diagnostics
}

/// Whether any finding of the file is shown as a hint for the moment.
pub fn calms(shown: &[Shown<'_>], line: Span) -> bool {
    shown.iter().any(|shown| touches(line, shown.span()) && shown.is_slip())
}

fn touches(line: Span, span: Span) -> bool {
    span.start <= line.end && line.start <= span.end
}

/// The member, group or entry around a line.
fn item_around(live: &Live, file: FileIndex, line: Span) -> Span {
    let view = View {
        design: &live.design,
        outcomes: &live.outcomes,
        file,
    };
    match view.within(line.start) {
        Within::Nothing => line,
        within => view.piece(within).map_or(line, |piece| piece.span),
    }
}

/// The gravest findings in the order of the file, after those of the member last edited.
fn choose<'a>(mut shown: Vec<Shown<'a>>, favoured: Option<Span>) -> Vec<Shown<'a>> {
    let key = |shown: &Shown<'a>| {
        let span = shown.span();
        let far = !favoured.is_some_and(|item| touches(item, span));
        (far, shown.severity(), span)
    };
    if shown.len() > MOST {
        shown.select_nth_unstable_by_key(MOST, key);
        shown.truncate(MOST);
    }
    shown.sort_by_key(|shown| (shown.span(), shown.severity()));
    shown
}

/// A finding in the terms of the protocol; `now` tells where its places are.
pub fn diagnostic(
    snapshot: &Snapshot,
    finding: &Finding,
    now: impl Fn(&Place) -> Span,
    lines: &Lines,
    calm: bool,
) -> Diagnostic {
    let mut message = finding.message.clone();
    let mut related = Vec::new();
    for note in &finding.notes {
        match note
            .place
            .as_ref()
            .filter(|_| snapshot.client.related)
            .and_then(|place| location(snapshot, place, now(place), finding, lines))
        {
            Some(location) => related.push(DiagnosticRelatedInformation {
                location,
                message: note.text.clone(),
            }),
            _ => {
                message.push('\n');
                message.push_str(&note.text);
            }
        }
    }
    let severity = if calm { Severity::Hint } else { finding.severity };
    let unused = finding.name().starts_with("unused-");
    Diagnostic {
        range: lines.range(now(&finding.place)),
        severity: Some(match severity {
            Severity::Error => DiagnosticSeverity::ERROR,
            Severity::Warning => DiagnosticSeverity::WARNING,
            Severity::Information => DiagnosticSeverity::INFORMATION,
            Severity::Hint => DiagnosticSeverity::HINT,
        }),
        code: Some(NumberOrString::String(finding.name().to_owned())),
        code_description: snapshot
            .explained
            .as_deref()
            .and_then(|folder| explain::link(folder, finding.name())),
        source: Some("scorchline".to_owned()),
        message,
        related_information: (!related.is_empty()).then_some(related),
        tags: unused.then(|| vec![DiagnosticTag::UNNECESSARY]),
        ..Diagnostic::default()
    }
}

fn location(snapshot: &Snapshot, place: &Place, span: Span, finding: &Finding, lines: &Lines) -> Option<Location> {
    let uri = snapshot.uri(&place.path)?;
    let range = if place.path == finding.place.path {
        lines.range(span)
    } else {
        let (live, file) = snapshot.find(&place.path)?;
        snapshot.lines(live, file).range(span)
    };
    Some(Location { uri, range })
}
