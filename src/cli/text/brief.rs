//! Findings on one page: the gravest in full, the rest a line or two each, and what is alike together.

use super::{Item, Manner, painted, snippet, wrapped};
use crate::cli::output::message;
use crate::findings::finding::Severity;

/// Lines of a page, less those of a prompt.
const PAGE: usize = 58;
/// The finding that is shown in full where it occurs; else the first error is.
const HEADLINE: &str = "too-slender-to-protect";

/// Findings that say the same of several members.
struct Alike<'a> {
    name: &'static str,
    severity: Severity,
    items: Vec<&'a Item<'a>>,
}

/// A page of findings with its end. What has many of a kind is shortened first.
pub(super) fn page(items: &[Item<'_>], end: String, manner: &Manner<'_>) -> String {
    let headline = items
        .iter()
        .find(|item| item.finding.name() == HEADLINE)
        .or_else(|| items.first());
    let top = headline.map_or_else(String::new, |item| format!("{}\n", snippet::snippet(item, manner)));
    let end = format!("\n{end}");
    let room = PAGE.saturating_sub(top.lines().count() + end.lines().count());
    let rest: Vec<&Item<'_>> = items
        .iter()
        .filter(|item| headline.is_none_or(|top| !std::ptr::eq(*item, top)))
        .collect();
    let groups = groups(&rest);
    let body = (1..=8)
        .rev()
        .map(|of_a_kind| body(&groups, of_a_kind, manner))
        .find(|body| body.lines().count() <= room)
        .unwrap_or_else(|| {
            body(&groups, 1, manner)
                .lines()
                .take(room)
                .map(|line| format!("{line}\n"))
                .collect()
        });
    top + &body + &end
}

/// By name, and in it by what is said of the member; kept in the order of the findings.
fn groups<'a>(items: &[&'a Item<'a>]) -> Vec<Alike<'a>> {
    let mut groups: Vec<Alike<'a>> = Vec::new();
    for &item in items {
        let found = groups.iter_mut().rev().find(|group| {
            group.name == item.finding.name()
                && group.items[0].finding.severity == item.finding.severity
                && said(group.items[0]).0 == said(item).0
        });
        match found {
            Some(group) => group.items.push(item),
            None => groups.push(Alike {
                name: item.finding.name(),
                severity: item.finding.severity,
                items: vec![item],
            }),
        }
    }
    // Kinds stand together, in the order in which each first occurs.
    let mut order: Vec<&str> = Vec::new();
    for group in &groups {
        if !order.contains(&group.name) {
            order.push(group.name);
        }
    }
    groups.sort_by_key(|group| (group.severity, order.iter().position(|name| *name == group.name)));
    groups
}

/// What a finding says without the mark before it, and whether one stood there.
fn said<'a>(item: &Item<'a>) -> (&'a str, bool) {
    let message = item.finding.message.as_str();
    let mark = item.finding.mark.as_deref().unwrap_or("");
    match message.strip_prefix(mark).and_then(|rest| rest.strip_prefix(": ")) {
        Some(rest) if !mark.is_empty() => (rest, true),
        _ => (message, false),
    }
}

fn body(groups: &[Alike<'_>], of_a_kind: usize, manner: &Manner<'_>) -> String {
    let mut out = String::new();
    let mut severity = None;
    for kind in groups.chunk_by(|a, b| a.name == b.name && a.severity == b.severity) {
        let first = &kind[0];
        if severity != Some(first.severity) {
            severity = Some(first.severity);
            out.push_str(&painted(first.severity.word(), first.severity, manner.color));
            out.push('\n');
        }
        for group in kind.iter().take(of_a_kind) {
            let marks = marks(group.items.iter().copied());
            let said = match said(group.items[0]) {
                (said, true) => format!("{marks}: {said}"),
                (said, false) if group.items.len() > 1 => format!("{said} ({marks})"),
                (said, false) => said.to_owned(),
            };
            let line = format!("{}: {said} [{}]", group.name, place(group.items[0], manner));
            out.push_str(&wrapped(&message(&line), 2, 4));
        }
        let rest = kind
            .iter()
            .skip(of_a_kind)
            .flat_map(|group| group.items.iter().copied());
        let rest = marks(rest);
        if !rest.is_empty() {
            out.push_str(&wrapped(&message(&format!("likewise {rest}")), 4, 4));
        }
    }
    out
}

/// The marks of some findings, each once; of many the first few.
fn marks<'a>(items: impl Iterator<Item = &'a Item<'a>>) -> String {
    let mut marks: Vec<&str> = Vec::new();
    for item in items {
        let mark = item.finding.mark.as_deref().unwrap_or("–");
        if !marks.contains(&mark) {
            marks.push(mark);
        }
    }
    match marks.len() {
        0..=12 => marks.join(", "),
        n => format!("{} and {} more", marks[..10].join(", "), n - 10),
    }
}

/// File and line, the file without what all of its kind end in.
fn place(item: &Item<'_>, manner: &Manner<'_>) -> String {
    let (at, position) = item.design.position(&item.finding.place);
    let path = (manner.show)(&item.design.checked.design.files[at].path);
    format!("{}:{}", path.trim_end_matches(".yaml"), position.line + 1)
}
