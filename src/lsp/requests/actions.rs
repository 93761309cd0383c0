//! What can be done about what stands at the cursor.

use tower_lsp::lsp_types::{CodeAction, CodeActionKind, CodeActionOrCommand, CodeActionParams};

use crate::editor::actions::{ActionKind, actions};
use crate::lsp::diagnostics::diagnostic;
use crate::lsp::requests::{AllLines, Asked};

/// The actions of a range, of the kinds that are asked for.
pub fn code_actions(asked: &Asked, params: &CodeActionParams) -> Option<Vec<CodeActionOrCommand>> {
    let span = asked.lines.span(params.range);
    let findings = asked.live.findings_at(asked.file, span);
    let mut lines = AllLines::of(&asked.snapshot);
    let offered = actions(&asked.view(), &findings, span)
        .into_iter()
        .filter_map(|action| {
            let kind = match action.kind {
                ActionKind::QuickFix => CodeActionKind::QUICKFIX,
                ActionKind::Refactor => CodeActionKind::REFACTOR,
            };
            let wanted = params.context.only.as_ref();
            if wanted.is_some_and(|only| !only.iter().any(|asked| is_of(&kind, asked))) {
                return None;
            }
            let answers = action.answers.iter().filter_map(|answer| findings.get(*answer));
            let diagnostics: Vec<_> = answers
                .map(|finding| diagnostic(&asked.snapshot, finding, |place| place.span, &asked.lines, false))
                .collect();
            Some(CodeActionOrCommand::CodeAction(CodeAction {
                title: action.title,
                kind: Some(kind),
                diagnostics: (!diagnostics.is_empty()).then_some(diagnostics),
                edit: Some(lines.edit(&action.edits)?),
                is_preferred: action.preferred.then_some(true),
                ..CodeAction::default()
            }))
        });
    Some(offered.collect())
}

/// Whether a kind is another one or beneath it: `refactor.rewrite` is of `refactor`.
fn is_of(kind: &CodeActionKind, asked: &CodeActionKind) -> bool {
    let (kind, asked) = (kind.as_str(), asked.as_str());
    asked.is_empty() || kind == asked || kind.strip_prefix(asked).is_some_and(|rest| rest.starts_with('.'))
}
