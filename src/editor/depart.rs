//! Recording that the design departs from a finding on purpose. The reason is the author's to give.

use crate::editor::actions::{Action, ActionKind, edits_in};
use crate::editor::view::{View, Within};
use crate::editor::write::{Page, append, append_entry, held, line_break};
use crate::findings::departures::{departure_expired, departure_outgrown, departure_unused, departure_without_reason};
use crate::findings::finding::{Finding, Severity};
use crate::findings::reading::is_slip;
use crate::findings::registry::Declaration;
use crate::syntax::Value;

/// What a departure from a finding wants beside `from`, with nothing filled in.
pub(super) const fn wanted(from: &Declaration) -> &'static [(&'static str, &'static str)] {
    match from.severity {
        Severity::Error => &[("because", "\"\""), ("by", "\"\""), ("until", "")],
        _ => &[("because", "\"\"")],
    }
}

/// The action that writes a departure from a finding into its member. None from slips of the file, nor from what is wrong
/// with departures, nor where the member departs from it already.
pub(super) fn record(view: &View<'_>, index: usize, finding: &Finding) -> Option<Action> {
    let own = [
        &departure_expired::DECLARATION,
        &departure_outgrown::DECLARATION,
        &departure_unused::DECLARATION,
        &departure_without_reason::DECLARATION,
    ];
    if is_slip(finding) || own.iter().any(|own| std::ptr::eq(*own, finding.declaration)) {
        return None;
    }
    let at = finding.member.filter(|at| at.file == view.file)?;
    let within = Within::Member(at.index);
    let name = finding.name();
    let departures = &view.design.member(at).value().departures;
    if departures.iter().any(|departure| departure.from.value == name) {
        return None;
    }
    let keys: Vec<String> = wanted(finding.declaration)
        .iter()
        .map(|(key, value)| format!(", {key}: {value}"))
        .collect();
    let entry = format!("{{ from: {name}{} }}", keys.concat()).replace(":  }", ": }");
    let (tree, _) = view.tree(within)?;
    let root = tree.root.as_ref()?;
    let text = view.piece(within)?.span.slice(view.text());
    let page = Page::of(view, within)?;
    let edit = match root.get("departures") {
        Some(list) => append_entry(page, list, &entry)?,
        None if page.is_flow(root) => append(page, root, &[("departures", &format!("[{entry}]"))])?,
        None => {
            let column = match &root.value {
                Value::Mapping(entries) => {
                    let key = entries.first()?.key.span.start as usize;
                    let line = text[..key].rfind('\n').map_or(0, |at| at + 1);
                    text[line..key].chars().count()
                }
                _ => return None,
            };
            let below = format!("{}{}- {entry}", line_break(view.text()), " ".repeat(column + 2));
            append(page, root, &[("departures", &below)])?
        }
    };
    Some(Action {
        title: format!("record a departure from {name}"),
        kind: ActionKind::QuickFix,
        edits: edits_in(&view.source().path, held(view, within, vec![edit])?),
        answers: vec![index],
        preferred: false,
    })
}
