//! Findings as text. Each is shown in its own line of the file: the cost of a snippet grows with what it is cut from.

use miette::{GraphicalReportHandler, GraphicalTheme, LabeledSpan, MietteDiagnostic, NamedSource, Report};

use crate::analysis::outcome::Verdict;
use crate::check::Checked;
use crate::findings::finding::{Finding, Severity};
use crate::text::{Encoding, LineIndex};

/// Findings shown unless all are asked for.
const SHOWN: usize = 50;
/// The most lines of the built-in scenario's findings.
const DEMO_LINES: usize = 44;

/// The text of a check.
pub fn check(checked: &[Checked], demo: bool, all: bool, color: bool) -> String {
    let mut out = String::new();
    for design in checked {
        let lines: Vec<LineIndex> = design
            .design
            .files
            .iter()
            .map(|file| LineIndex::new(&file.text))
            .collect();
        let mut findings: Vec<&Finding> = design.findings.iter().collect();
        findings.sort_by_key(|finding| finding.severity);
        let limit = if all {
            usize::MAX
        } else if demo {
            DEMO_LINES
        } else {
            SHOWN
        };
        for finding in findings.iter().take(limit) {
            out.push_str(&if demo {
                brief(design, finding, &lines)
            } else {
                snippet(design, finding, &lines, color)
            });
        }
        if findings.len() > limit {
            out.push_str(&format!("and {} more; --all shows them\n", findings.len() - limit));
        }
        for finding in &design.agreed {
            out.push_str(&format!(
                "agreed departure from {}: {}\n",
                finding.name(),
                finding.message
            ));
        }
        out.push_str(&summary(design));
    }
    out.push_str("Local codes, product certification and a licensed engineer's judgement come before these figures.\n");
    if demo {
        out.push_str(
            "Invented building and products. Next: `scorchline begin my-frame`, edit, `scorchline check my-frame`;\n",
        );
        out.push_str("`scorchline why too-slender-to-protect` explains a finding, `scorchline schedule --demo` prints the schedule.\n");
    } else {
        out.push_str("`scorchline why FINDING` explains a finding; `scorchline schedule` prints the schedule.\n");
    }
    out
}

fn place(design: &Checked, finding: &Finding, lines: &[LineIndex]) -> (usize, u32, u32) {
    let at = design
        .design
        .files
        .iter()
        .position(|file| file.path == finding.place.path)
        .unwrap_or(0);
    let position = lines[at].position(&design.design.files[at].text, finding.place.span.start, Encoding::Utf32);
    (at, position.line, position.column)
}

fn brief(design: &Checked, finding: &Finding, lines: &[LineIndex]) -> String {
    let (at, line, _) = place(design, finding, lines);
    let name = design.design.files[at]
        .path
        .file_name()
        .map_or_else(String::new, |n| n.to_string_lossy().into_owned());
    let name = name.trim_end_matches(".yaml").trim_end_matches(".steelwork").to_owned();
    format!(
        "{:<11} {name}:{} {}: {}\n",
        finding.severity.word(),
        line + 1,
        finding.name(),
        finding.message
    )
}

fn snippet(design: &Checked, finding: &Finding, lines: &[LineIndex], color: bool) -> String {
    let (at, line, _) = place(design, finding, lines);
    let file = &design.design.files[at];
    let start = lines[at].start(line, &file.text);
    let last = lines[at].line(finding.place.span.end.max(finding.place.span.start));
    let end = lines[at].start(last.min(line + 5) + 1, &file.text);
    let mut piece = file
        .text
        .get(start as usize..end as usize)
        .unwrap_or("")
        .trim_end()
        .to_owned();
    // A very long line is cut; the characters at fault are shown from its start.
    if piece.len() > 4000 {
        piece = piece.chars().take(400).collect();
    }
    let from = (finding.place.span.start - start) as usize;
    let from = from.min(piece.len());
    let until = ((finding.place.span.end - start) as usize).clamp(from, piece.len());
    let severity = match finding.severity {
        Severity::Error => miette::Severity::Error,
        Severity::Warning => miette::Severity::Warning,
        _ => miette::Severity::Advice,
    };
    let help: Vec<String> = finding
        .notes
        .iter()
        .map(|note| note.text.clone())
        .chain(finding.fixes.iter().map(|fix| format!("perhaps: {}", fix.title)))
        .collect();
    let mut diagnostic = MietteDiagnostic::new(finding.message.clone())
        .with_severity(severity)
        .with_code(format!("{} ({})", finding.name(), finding.severity.word()))
        .with_label(LabeledSpan::new(None, from, until - from));
    if !help.is_empty() {
        diagnostic = diagnostic.with_help(help.join("\n"));
    }
    let header = format!("{}:{}\n", file.path.display(), line + 1);
    let report =
        Report::new(diagnostic).with_source_code(NamedSource::new(format!("line {}", line + 1), piece.clone()));
    let theme = if color {
        GraphicalTheme::unicode()
    } else {
        GraphicalTheme::unicode_nocolor()
    };
    let mut text = String::new();
    let handler = GraphicalReportHandler::new_themed(theme)
        .with_width(110)
        .with_context_lines(1);
    if handler.render_report(&mut text, report.as_ref()).is_err() {
        text.clone_from(&finding.message);
    }
    format!("{header}{text}\n")
}

fn summary(design: &Checked) -> String {
    let of = |severity: Severity| {
        design
            .findings
            .iter()
            .filter(|finding| finding.severity == severity)
            .count()
    };
    let verdict = |verdict: Verdict| {
        design
            .outcomes
            .iter()
            .filter(|outcome| outcome.verdict == verdict)
            .count()
    };
    format!(
        "{} errors, {} warnings, {} informations, {} hints\n{} members: {} pass, {} fail, {} cannot be protected, {} not verified, {} without a period\n",
        of(Severity::Error),
        of(Severity::Warning),
        of(Severity::Information),
        of(Severity::Hint),
        design.outcomes.len(),
        verdict(Verdict::Passes),
        verdict(Verdict::Fails),
        verdict(Verdict::CannotBeProtected),
        verdict(Verdict::NotVerified),
        verdict(Verdict::NoPeriod),
    )
}
