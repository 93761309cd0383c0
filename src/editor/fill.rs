//! Keys that are missing, written with their values left for the author.

use crate::editor::actions::{Action, ActionKind, edits_in};
use crate::editor::view::{View, Within};
use crate::editor::write::{Page, append, held, line_break, prepend, put};
use crate::findings::departures::departure_without_reason;
use crate::findings::finding::Finding;
use crate::findings::insert;
use crate::findings::reading::missing_key;
use crate::syntax::{Node, Value};
use crate::text::{Edit, Span};

/// One action for each mapping that lacks keys, with all keys that it lacks. No value is made up.
pub(super) fn missing_keys(view: &View<'_>, here: &[(usize, &Finding)]) -> Vec<Action> {
    let mut spans: Vec<(Span, Vec<usize>, Vec<&str>)> = Vec::new();
    for (index, finding) in here {
        if !std::ptr::eq(finding.declaration, &missing_key::DECLARATION) {
            continue;
        }
        let Some(key) = finding.key.as_deref() else { continue };
        match spans.iter_mut().find(|(span, ..)| *span == finding.place.span) {
            Some((_, answers, keys)) => {
                answers.push(*index);
                if !keys.contains(&key) {
                    keys.push(key);
                }
            }
            None => spans.push((finding.place.span, vec![*index], vec![key])),
        }
    }
    let mut actions: Vec<Action> = spans
        .into_iter()
        .filter_map(|(span, answers, keys)| {
            let edit = edit(view, span, &keys)?;
            Some(action(view, title(&keys), vec![edit], answers))
        })
        .collect();
    for (index, finding) in here {
        if std::ptr::eq(finding.declaration, &departure_without_reason::DECLARATION) {
            actions.extend(reason(view, *index, finding));
        }
    }
    actions
}

fn title(keys: &[&str]) -> String {
    let names: Vec<String> = keys.iter().map(|key| format!("`{key}`")).collect();
    let s = if keys.len() == 1 { "" } else { "s" };
    format!("fill in the missing key{s} {}", names.join(", "))
}

fn action(view: &View<'_>, title: String, edits: Vec<Edit>, answers: Vec<usize>) -> Action {
    Action {
        title,
        kind: ActionKind::QuickFix,
        edits: edits_in(&view.source().path, edits),
        answers,
        preferred: false,
    }
}

fn edit(view: &View<'_>, span: Span, keys: &[&str]) -> Option<Edit> {
    let within = view.within(span.start);
    if let [key @ ("steelwork" | "protection")] = keys
        && span.start == 0
    {
        return version(view, key);
    }
    let (tree, base) = view.tree(within)?;
    let root = tree.root.as_ref()?;
    let page = Page::of(view, within)?;
    let empty: Vec<(&str, &str)> = keys.iter().map(|key| (*key, "")).collect();
    // What a mapping lacks is told at the mapping, or at the mark where a member may inherit it.
    let edit = match (mapping_at(root, span, base), within) {
        (Some(mapping), Within::Member(_)) if keys == ["mark"] => prepend(page, mapping, ("mark", ""))?,
        (Some(mapping), _) => append(page, mapping, &empty)?,
        (None, Within::Member(index)) => return beside_mark(view, index, span, keys),
        (None, _) => return None,
    };
    held(view, within, vec![edit])?.pop()
}

fn mapping_at<'a>(node: &'a Node, span: Span, base: u32) -> Option<&'a Node> {
    let inner = |node: &'a Node| mapping_at(node, span, base);
    let holds = node.span.shift(base);
    if node.through_alias || holds.start > span.start || holds.end < span.end {
        return None;
    }
    match &node.value {
        Value::Mapping(entries) => {
            let within = entries.iter().find_map(|entry| inner(&entry.value));
            within.or_else(|| (holds == span).then_some(node))
        }
        Value::Sequence(nodes) => nodes.iter().find_map(inner),
        _ => None,
    }
}

/// Keys written after the mark of a member.
fn beside_mark(view: &View<'_>, index: usize, span: Span, keys: &[&str]) -> Option<Edit> {
    let item = &view.source().members[index];
    if item.value().mark.span().map(|mark| item.place(mark)) != Some(span) {
        return None;
    }
    let at = crate::analysis::design::MemberAt { file: view.file, index };
    let mut all: Option<Edit> = None;
    for key in keys {
        let (span, text) = insert::key(view.design, at, key, "")?;
        let flow = text.starts_with(',');
        let text = if flow { text } else { text.trim_end().to_owned() };
        match &mut all {
            Some(edit) => edit.text.push_str(&text),
            None => all = Some(Edit { span, text }),
        }
    }
    all
}

/// The version of the format at the head of a file that begins with a key.
fn version(view: &View<'_>, key: &str) -> Option<Edit> {
    let text = view.text();
    let first = text.lines().find(|line| {
        let line = line.trim();
        !line.is_empty() && !line.starts_with('#')
    })?;
    let begins = first
        .chars()
        .next()
        .is_some_and(|c| c.is_alphabetic() || matches!(c, '"' | '\''));
    begins.then(|| put(0, format!("{key}: 1{}", line_break(text))))
}

/// What a departure lacks.
fn reason(view: &View<'_>, index: usize, finding: &Finding) -> Option<Action> {
    let within = view.within(finding.place.span.start);
    let (tree, base) = view.tree(within)?;
    let list = match &tree.root.as_ref()?.get("departures")?.value {
        Value::Sequence(nodes) => nodes,
        _ => return None,
    };
    let at = |node: &Node| {
        node.get("from")
            .is_some_and(|from| from.span.shift(base) == finding.place.span)
    };
    let departure = list.iter().find(|node| at(node))?;
    let wanted = super::depart::wanted(departure_from(departure)?);
    let lacks: Vec<(&str, &str)> = wanted
        .iter()
        .copied()
        .filter(|(key, _)| departure.get(key).is_none())
        .collect();
    if lacks.is_empty() {
        return None;
    }
    let page = Page::of(view, within)?;
    let edits = held(view, within, vec![append(page, departure, &lacks)?])?;
    let keys: Vec<&str> = lacks.iter().map(|(key, _)| *key).collect();
    Some(action(view, title(&keys), edits, vec![index]))
}

fn departure_from(departure: &Node) -> Option<&'static crate::findings::registry::Declaration> {
    match &departure.get("from")?.value {
        Value::Scalar(name) => crate::findings::registry::find(&name.text),
        _ => None,
    }
}
