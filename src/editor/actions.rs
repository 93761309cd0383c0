//! What can be done about what was found: the fixes of findings, and what only an editor offers beside them.

use std::path::PathBuf;
use std::sync::Arc;

use crate::editor::view::{View, Within};
use crate::editor::{depart, fill, protect};
use crate::findings::finding::{Finding, FixEdit, Place};
use crate::text::{Edit, Span};

/// What an action is.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum ActionKind {
    /// It answers a finding.
    QuickFix,
    /// It changes the design for another reason.
    Refactor,
}

/// Something that can be done.
#[derive(Debug, Clone, PartialEq)]
pub struct Action {
    /// What it does, in the imperative.
    pub title: String,
    /// What it is.
    pub kind: ActionKind,
    /// What it writes; sorted and disjoint in each file.
    pub edits: Vec<FixEdit>,
    /// The findings that it answers, by their index in those that were asked about.
    pub answers: Vec<usize>,
    /// Whether it is the one to take without a look: the first fix of its finding, whose meaning is certain.
    pub preferred: bool,
}

/// What can be done in a range of a file, the fixes of its findings first. `findings` may be those of the whole design;
/// asked about are those of this file that touch the range. Nothing is offered that changes a group, the defaults or what
/// stands in a member by an alias.
#[must_use]
pub fn actions(view: &View<'_>, findings: &[Finding], range: Span) -> Vec<Action> {
    let path = &view.source().path;
    let here: Vec<(usize, &Finding)> = findings
        .iter()
        .enumerate()
        .filter(|(_, finding)| meets(finding.place.span, range) && finding.place.path == *path)
        .collect();
    let mut found = Vec::new();
    for (index, finding) in &here {
        for (nth, fix) in finding.fixes.iter().enumerate() {
            found.push(Action {
                title: fix.title.clone(),
                kind: ActionKind::QuickFix,
                edits: fix.edits.clone(),
                answers: vec![*index],
                preferred: nth == 0 && fix.safe,
            });
        }
    }
    found.extend(fill::missing_keys(view, &here));
    if let Within::Member(index) = view.within(range.start) {
        found.extend(protect::actions(view, index, &here));
    }
    found.extend(
        here.iter()
            .filter_map(|(index, finding)| depart::record(view, *index, finding)),
    );
    let mut actions: Vec<Action> = Vec::new();
    for action in found {
        // Findings alike are answered by one and the same change.
        match actions.iter_mut().find(|known| known.edits == action.edits) {
            Some(known) => known.answers.extend(action.answers),
            None => actions.push(action),
        }
    }
    actions
}

fn meets(a: Span, b: Span) -> bool {
    a.start <= b.end && b.start <= a.end
}

/// Edits of a file, in their order.
pub(super) fn edits_in(path: &Arc<PathBuf>, edits: Vec<Edit>) -> Vec<FixEdit> {
    let edit = |edit: Edit| FixEdit {
        place: Place {
            path: Arc::clone(path),
            span: edit.span,
        },
        text: edit.text,
    };
    edits.into_iter().map(edit).collect()
}
